package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.reports.survey.SurveyPage;
import emberline.reports.survey.SurveyRow;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.regex.Matcher;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.By;
import org.openqa.selenium.Keys;
import org.openqa.selenium.WebElement;
import org.openqa.selenium.interactions.Actions;

/** The survey page of a real run in a real browser. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class SurveyPageInBrowserTest {

    private static final String EVIL = "</script><img src=x onerror=\"window.bad=1\"> 'q', \"r\"";
    private static final String EVIL_NOTE = "=1+1 <b>\"so\"</b>, 'yes'\nsecond line </script>";

    private Path folder;
    private Browser browser;
    private Path list;
    private Path out;

    @BeforeAll
    void sortAList(@TempDir Path temporary) throws IOException {
        folder = temporary;
        browser = Browser.start(folder.resolve("downloads"));
        list = folder.resolve("list.csv");
        out = folder.resolve("out");
        List<String> rows = new ArrayList<>(Files.readAllLines(DemoRun.survey()).subList(0, 14));
        String spectra = DemoRun.survey().toAbsolutePath().getParent() + "/spectra/";
        rows.replaceAll(row -> row.replace(",spectra/", "," + Matcher.quoteReplacement(spectra)));
        int cells = rows.get(0).split(",", -1).length;
        rows.add('"' + EVIL.replace("\"", "\"\"") + "\",none.csv" + ",".repeat(cells - 2));
        Files.write(list, rows);
        CommandRun run = CommandRun.of("sort", list, "--out", out);
        assertEquals(ExitCode.SOME_FAILED, run.code(), run.err());
    }

    @AfterAll
    void closeTheBrowser() throws IOException {
        if (browser != null) {
            browser.close();
        }
    }

    @BeforeEach
    void openThePage() {
        browser.open(page(), "");
        browser.run("localStorage.clear()");
        browser.open(page(), "");
    }

    @AfterEach
    void nothingWasComplainedOfOrAskedFor() {
        assertEquals(List.of(), browser.complaints());
        List<String> requests = browser.requests();
        assertFalse(requests.isEmpty(), "the page itself is a request");
        for (String address : requests) {
            assertTrue(
                    address.matches("(file|data|blob|about|chrome-extension|chrome):.*"), address);
        }
    }

    private Path page() {
        return out.resolve("survey.html");
    }

    private Map<String, NamedCsvRecord> results() throws IOException {
        Map<String, NamedCsvRecord> rows = new LinkedHashMap<>();
        try (CsvReader<NamedCsvRecord> csv =
                CsvReader.builder().ofNamedCsvRecord(out.resolve("results.csv"))) {
            csv.forEach(row -> rows.put(row.getField("name"), row));
        }
        return rows;
    }

    private List<String> names() {
        List<?> names =
                (List<?>)
                        browser.run(
                                "return [...document.querySelectorAll('#body td.name')]"
                                        + ".map(cell => cell.textContent)");
        return names.stream().map(Object::toString).toList();
    }

    private void head(String title) {
        browser.driver().findElements(By.cssSelector("#head button")).stream()
                .filter(button -> button.getText().equals(title))
                .findFirst()
                .orElseThrow()
                .click();
    }

    private String selected() {
        return browser.find("#body tr[aria-selected=true] td.name").getText();
    }

    private void click(String name) {
        browser.driver().findElements(By.cssSelector("#body tr.row")).stream()
                .filter(row -> row.findElement(By.cssSelector("td.name")).getText().equals(name))
                .findFirst()
                .orElseThrow()
                .findElement(By.cssSelector("td.name"))
                .click();
    }

    @Test
    void theTableSortsByEveryColumn() throws IOException {
        for (String column : new String[] {"type_number", "snr", "p_substellar", "score"}) {
            String title =
                    Map.of("type_number", "Type", "snr", "S/N", "score", "Score")
                            .getOrDefault(column, "P(sub)");
            List<String> expected = new ArrayList<>();
            results().values().stream()
                    .filter(row -> !row.getField(column).isEmpty())
                    .sorted(
                            Comparator.comparingDouble(
                                    row -> Double.parseDouble(row.getField(column))))
                    .forEach(row -> expected.add(row.getField(column)));
            head(title);
            if (column.equals("score")) { // the best stand first
                head(title);
            }
            List<String> order = names().subList(0, expected.size());
            Map<String, NamedCsvRecord> rows = results();
            assertEquals(expected, order.stream().map(n -> rows.get(n).getField(column)).toList());
            WebElement cell = browser.find("th[aria-sort]");
            assertEquals("ascending", cell.getDomAttribute("aria-sort"));
            head(title);
            assertEquals("descending", cell.getDomAttribute("aria-sort"));
            assertEquals(
                    expected.get(expected.size() - 1), rows.get(names().get(0)).getField(column));
        }
    }

    @Test
    void theTableFilters() throws IOException {
        Map<String, NamedCsvRecord> rows = results();
        assertEquals(rows.size() + " objects", browser.find("#count").getText());
        browser.choose("#decision", "substellar");
        List<String> substellar =
                rows.values().stream()
                        .filter(r -> r.getField("decision").equals("substellar"))
                        .map(r -> r.getField("name"))
                        .toList();
        assertFalse(substellar.isEmpty());
        assertEquals(substellar, names());
        browser.find("#tools button[type=reset]").click();
        Browser.await(() -> names().size() == rows.size(), "the filters were not cleared");
        browser.find("#from").sendKeys("L1");
        browser.find("#to").sendKeys("L4");
        List<String> middle =
                rows.values().stream()
                        .filter(r -> !r.getField("type_number").isEmpty())
                        .filter(
                                r -> {
                                    double type =
                                            Double.parseDouble(r.getField("type_number")) + 0.25;
                                    return type >= 11 && type < 15;
                                })
                        .map(r -> r.getField("name"))
                        .toList();
        Browser.await(() -> names().equals(middle), middle + " expected, found " + names());
        browser.find("#from").sendKeys("?");
        assertEquals("true", browser.find("#from").getDomAttribute("aria-invalid"));
        browser.find("#tools button[type=reset]").click();
        browser.find("#words").sendKeys("no such file");
        Browser.await(() -> names().equals(List.of(EVIL)), "found " + names());
        browser.find("#words").clear();
        browser.find("#words").sendKeys("nothing like this");
        Browser.await(
                () -> browser.texts("#body td.empty").equals(List.of("No object matches.")),
                "an empty table does not say so");
    }

    @Test
    void theHistogramFilters() {
        browser.driver()
                .findElements(By.cssSelector("#histogram .bar"))
                .get(1)
                .sendKeys(Keys.ENTER);
        String code = browser.find("#from").getDomProperty("value");
        assertFalse(code.isEmpty());
        assertTrue(names().size() < 14, "the bar selects nothing");
        assertEquals(names().size() + " of 14 objects", browser.find("#count").getText());
    }

    /** Where the ring of the selected object stands on a plot, relative to its middle. */
    private int[] ring(String plot) {
        List<?> place =
                (List<?>)
                        browser.run(
                                "const box=document.querySelector(arguments[0]+' canvas')"
                                        + ".getBoundingClientRect();"
                                        + "const r=document.querySelector(arguments[0]+' .picked')"
                                        + ".getBoundingClientRect();"
                                        + "return [r.x+r.width/2-box.x-box.width/2,"
                                        + "r.y+r.height/2-box.y-box.height/2]",
                                plot);
        return place.stream().mapToInt(n -> (int) Math.round(((Number) n).doubleValue())).toArray();
    }

    @Test
    void pointsSelectRowsAndRowsMarkPoints() {
        for (String plot : new String[] {"#map", "#diagram"}) {
            String first = names().get(0);
            String other = names().get(4);
            click(first);
            int[] at = ring(plot);
            click(other);
            assertEquals(other, selected());
            assertNotEquals(List.of(at[0], at[1]), List.of(ring(plot)[0], ring(plot)[1]));
            WebElement canvas = browser.find(plot + " canvas");
            new Actions(browser.driver()).moveToElement(canvas, at[0], at[1]).click().perform();
            assertEquals(first, selected());
            assertTrue(browser.find("#card h2").getText().contains(first));
            canvas.sendKeys(Keys.ARROW_RIGHT);
            canvas.sendKeys(Keys.ARROW_LEFT, Keys.ARROW_DOWN, Keys.ARROW_UP);
            assertTrue(names().contains(selected()));
        }
    }

    @Test
    void aFrameKeepsWhatIsInIt() {
        WebElement canvas = browser.find("#map canvas");
        int wide = canvas.getSize().getWidth() / 2 - 2;
        int tall = canvas.getSize().getHeight() / 2 - 2;
        new Actions(browser.driver())
                .moveToElement(canvas, -wide, -tall)
                .clickAndHold()
                .moveToElement(canvas, 0, 0)
                .moveToElement(canvas, wide, tall)
                .release()
                .perform();
        int inside = names().size();
        assertTrue(inside > 5 && inside < 14, inside + " in a frame around the whole map");
        assertTrue(browser.find("#region").getText().contains(String.valueOf(inside)));
        browser.find("#region").click();
        assertEquals(14, names().size());
    }

    @Test
    void bothMapsHaveAPlaceForTheObjects() {
        click(names().get(2));
        int[] near = ring("#map");
        browser.choose("#plane", "principal axes");
        int[] axes = ring("#map");
        assertNotEquals(List.of(near[0], near[1]), List.of(axes[0], axes[1]));
    }

    @Test
    void theKeyboardMovesAndOpens() {
        Actions keys = new Actions(browser.driver());
        keys.sendKeys(Keys.ARROW_DOWN).sendKeys(Keys.ARROW_DOWN).perform();
        assertEquals(names().get(1), selected());
        String row = browser.find("#body tr[aria-selected=true]").getDomAttribute("id");
        assertEquals(row, browser.find("#table").getDomAttribute("aria-activedescendant"));
        new Actions(browser.driver()).sendKeys(Keys.END).perform();
        assertEquals(EVIL, selected());
        new Actions(browser.driver()).sendKeys("v").perform();
        assertEquals("call", browser.run("return document.activeElement.id"));
        new Actions(browser.driver()).sendKeys(Keys.ESCAPE).sendKeys("/").perform();
        assertEquals("words", browser.run("return document.activeElement.id"));
    }

    @Test
    void linksOpenTheReportAndAnAddressSelectsARow() {
        String name = names().get(3);
        click(name);
        String fragment = browser.run("return location.hash").toString();
        browser.open(page(), fragment);
        assertEquals(name, selected());
        WebElement link = browser.find("#body tr[aria-selected=true] a");
        String address = link.getDomProperty("href");
        assertTrue(Files.exists(Path.of(java.net.URI.create(address))), address);
        link.click();
        Browser.await(
                () -> address.equals(browser.driver().getCurrentUrl()),
                address + " was not opened");
        assertTrue(address.endsWith(".pdf"), address);
    }

    @Test
    void whatAListSaysNeverRuns() {
        assertTrue(names().contains(EVIL), names().toString());
        click(EVIL);
        assertEquals(EVIL, browser.find("#card h2").getText());
        assertNull(browser.run("return window.bad"));
        assertEquals(0L, browser.run("return document.images.length"));
    }

    @Test
    void itHasBothColoursAndLabelsForEverything() {
        Set<Object> papers = new HashSet<>();
        for (int i = 0; i < 3; i++) {
            papers.add(browser.run("return getComputedStyle(document.body).backgroundColor"));
            browser.find("#theme").click();
        }
        assertEquals(2, papers.size(), papers.toString());
        Object nameless =
                browser.run(
                        "return [...document.querySelectorAll('input,select,textarea,button,canvas')]"
                                + ".filter(e => !e.hidden && !e.getAttribute('aria-label')"
                                + " && !(e.labels && e.labels.length) && !e.textContent.trim())"
                                + ".map(e => e.outerHTML)");
        assertEquals(List.of(), nameless);
    }

    @Test
    void aVerdictIsTypedExportedAndTakenBack() throws IOException {
        Path downloads = folder.resolve("downloads");
        String name = names().get(2);
        click(name);
        browser.choose("#call", "giant");
        browser.find("#said-type").sendKeys("M7 III");
        browser.find("#note").sendKeys(EVIL_NOTE);
        click(EVIL);
        browser.choose("#call", "bad data");
        assertEquals(
                "2 not exported",
                browser.find("#kept").getText(),
                () ->
                        browser.find("#card h2").getText()
                                + " "
                                + browser.find("#call").getDomProperty("value")
                                + " "
                                + browser.run("return JSON.stringify(localStorage)"));
        browser.open(page(), "");
        click(name);
        assertEquals(EVIL_NOTE, browser.find("#note").getDomProperty("value"));
        String row = browser.find("#body tr[aria-selected=true]").getText();
        assertTrue(row.contains("M7 III") && row.contains("giant"), row);
        browser.choose("#judged", "differs");
        assertTrue(names().contains(name), names().toString());

        Path file = downloads.resolve("verdicts.csv");
        Files.deleteIfExists(file);
        browser.find("#export").click();
        Browser.await(() -> Files.exists(file), "nothing was exported");
        assertEquals("2 with verdict", browser.find("#kept").getText());

        CommandRun run = CommandRun.of("sort", list, "--out", out, "--verdicts", file);
        assertEquals(ExitCode.SOME_FAILED, run.code(), run.err());
        assertVerdict(results().get(name));
        assertEquals("bad data", results().get(EVIL).getField("verdict"));
        browser.open(page(), "");
        click(name);
        assertEquals(
                "[]",
                browser.run(
                        "return localStorage.getItem('emberline verdicts ' + location.pathname)"));
        assertEquals(EVIL_NOTE, browser.find("#note").getDomProperty("value"));
        assertEquals("giant", browser.find("#call").getDomProperty("value"));

        assertEquals(
                ExitCode.SOME_FAILED,
                CommandRun.of("sort", list, "--out", out, "--no-reports").code());
        assertVerdict(results().get(name));
        Files.delete(out.resolve("verdicts.csv"));
        CommandRun.of("sort", list, "--out", out);
    }

    /** Ten thousand rows: few are in the page at a time, and none is lost. */
    @Test
    void aLargeSurveyOpens() throws IOException {
        List<String> rows = new ArrayList<>();
        for (Object row :
                (List<?>)
                        browser.run(
                                "const d=JSON.parse(document.getElementById('data').textContent);"
                                        + "return d.rows.filter(r=>r[0].startsWith('Tamarisk'))"
                                        + ".map(r=>JSON.stringify(r.slice(0,-2)"
                                        + ".concat([r[r.length-2].map(n=>d.texts[n])])))")) {
            rows.add(row.toString());
        }
        assertEquals(13, rows.size());
        int many = 10_000;
        Path large = folder.resolve("large.html");
        try (SurveyPage page = SurveyPage.open(large, "Large", "0.1.0")) {
            for (int i = 0; i < many; i++) {
                page.add(
                        SurveyRow.parse(
                                        rows.get(i % rows.size())
                                                .replaceFirst("Tamarisk", "Object " + i + " "))
                                .ranked(i + 1));
            }
        }
        assertTrue(Files.size(large) < 15_000_000, Files.size(large) + " bytes");
        browser.open(large, "");
        assertEquals(many + " objects", browser.find("#count").getText());
        assertTrue(names().size() < 60, names().size() + " rows in the page");
        assertEquals(
                "principal axes",
                browser.run("return document.getElementById('plane').textContent"));
        new Actions(browser.driver()).sendKeys(Keys.END).perform();
        assertTrue(selected().startsWith("Object 9999 "), selected());
        browser.find("#words").sendKeys("object 7777 ");
        Browser.await(() -> names().size() == 1, "found " + names());
    }

    private static void assertVerdict(NamedCsvRecord row) {
        assertEquals("giant", row.getField("verdict"));
        assertEquals("M7 III", row.getField("verdict_type"));
        assertEquals("'" + EVIL_NOTE, row.getField("verdict_note"));
        assertEquals("giant", row.getField("final_kind"));
        assertEquals("M7 III", row.getField("final_type"));
        assertEquals("observer", row.getField("final_by"));
        assertEquals("late dwarf", row.getField("kind"));
    }
}
