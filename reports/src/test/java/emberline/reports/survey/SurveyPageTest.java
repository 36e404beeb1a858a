package emberline.reports.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.jr.ob.JSON;
import emberline.reports.Samples;
import emberline.reports.page.FindingSentence;
import emberline.spectrum.Finding.Severity;
import emberline.spectrum.Spectrum;
import emberline.survey.ObjectResult;
import emberline.survey.verdict.Verdict;
import emberline.survey.verdict.VerdictCall;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class SurveyPageTest {

    private static final String EVIL = "</script><img src=x onerror=alert(1)>\u2028&amp;\"'";

    @TempDir private Path folder;

    private String page(String title, List<ObjectResult> results) throws IOException {
        Path file = folder.resolve("survey.html");
        try (SurveyPage page = SurveyPage.open(file, title, "0.1.0")) {
            for (int i = 0; i < results.size(); i++) {
                page.add(results.get(i), "stem" + i, !results.get(i).spectra().isEmpty());
            }
        }
        return Files.readString(file);
    }

    private static String data(String html) {
        String start = "<script type=\"application/json\" id=\"data\">";
        int from = html.indexOf(start) + start.length();
        return html.substring(from, html.indexOf("</script>", from));
    }

    @Test
    void rowsCarryTheNumbersOfTheResults() throws IOException {
        ObjectResult dwarf = Samples.lDwarf();
        String html = page("Survey", List.of(dwarf, Samples.failed("b", "no such file")));
        Map<String, Object> data = JSON.std.mapFrom(data(html));
        List<?> keys = (List<?>) data.get("keys");
        List<?> rows = (List<?>) data.get("rows");
        assertEquals(2, rows.size());
        List<?> first = (List<?>) rows.get(0);
        List<?> second = (List<?>) rows.get(1);
        double number = dwarf.placement().orElseThrow().type().orElseThrow().typeNumber();
        assertEquals(number, (Double) first.get(keys.indexOf("type_number")), 0.005);
        assertEquals("stem0", first.get(keys.indexOf("file")));
        assertEquals(true, first.get(keys.indexOf("report")));
        List<?> sparks = (List<?>) first.get(keys.indexOf("sparks"));
        assertEquals(1, sparks.size());
        assertEquals(120, sparks.get(0).toString().length());
        assertEquals(FindingSentence.of(dwarf), first.get(keys.indexOf("sentence")));
        assertEquals(6, ((List<?>) first.get(keys.indexOf("map"))).size());
        assertNull(second.get(keys.indexOf("map")));
        List<?> texts = (List<?>) data.get("texts");
        assertEquals(
                dwarf.findings().stream().filter(f -> f.severity() != Severity.NOTE).count(),
                texts.size());
        assertEquals(texts.size(), ((List<?>) first.get(keys.indexOf("cautions"))).size());
        List<?> values = (List<?>) first.get(keys.indexOf("values"));
        assertEquals(((List<?>) data.get("quantities")).size(), values.size());
        assertEquals(
                dwarf.best().orElseThrow().measured("allers2013/h-cont").orElseThrow().value(),
                ((Number) values.get(0)).doubleValue(),
                0.0006);
        assertNull(second.get(keys.indexOf("type_number")));
        assertEquals("no such file", second.get(keys.indexOf("reason")));
        assertEquals(keys.size(), first.size());
    }

    @Test
    void everySpectrumOfAnObjectIsDrawn() throws IOException {
        Spectrum infrared = Samples.spectrum(0.8, 2.45, 600, Samples.Bands.L_DWARF, 60, 3);
        Spectrum blue = Samples.spectrum(0.38, 0.55, 300, Samples.Bands.L_DWARF, 20, 3);
        ObjectResult both =
                Samples.object("two", Map.of("name", "two"), List.of(infrared, blue), 120);
        Map<String, Object> data = JSON.std.mapFrom(data(page("Survey", List.of(both))));
        List<?> keys = (List<?>) data.get("keys");
        List<?> sparks =
                (List<?>)
                        ((List<?>) ((List<?>) data.get("rows")).get(0)).get(keys.indexOf("sparks"));
        assertEquals(2, sparks.size());
        assertTrue(sparks.get(1).toString().startsWith("0.380~0.550~"), sparks.get(1).toString());
    }

    @Test
    void aVerdictStandsInItsRow() throws IOException {
        Verdict verdict =
                new Verdict(Optional.of(VerdictCall.GIANT), "M7 III", Optional.empty(), EVIL);
        ObjectResult said = Samples.lDwarf().withVerdict(Optional.of(verdict));
        Map<String, Object> data = JSON.std.mapFrom(data(page("Survey", List.of(said))));
        List<?> keys = (List<?>) data.get("keys");
        List<?> row = (List<?>) ((List<?>) data.get("rows")).get(0);
        assertEquals("giant", row.get(keys.indexOf("verdict")));
        assertEquals("M7 III", row.get(keys.indexOf("verdict_type")));
        assertEquals(EVIL, row.get(keys.indexOf("verdict_note")));
        assertTrue(((List<?>) data.get("calls")).contains("giant"));
    }

    @Test
    void theMapHoldsTheReferencesAndAPlaceForEachMeasuredObject() throws IOException {
        List<ObjectResult> results =
                List.of(Samples.lDwarf(), Samples.failed("b", "gone"), Samples.tDwarf());
        Map<String, Object> data = JSON.std.mapFrom(data(page("Survey", results)));
        Map<?, ?> map = (Map<?, ?>) data.get("map");
        int references = ((List<?>) map.get("references")).size();
        assertTrue(references > 500, references + " references");
        assertEquals(references, ((List<?>) map.get("near_references")).size());
        assertEquals(List.of(0, 2), map.get("near_rows"));
        assertEquals(2, ((List<?>) map.get("near")).size());
    }

    @Test
    void aRowCanBeKeptAsTextAndPutOnAPageLater() throws IOException {
        ObjectResult dwarf = Samples.lDwarf();
        String kept = SurveyRow.of(dwarf, "stem0", true).text();
        Path file = folder.resolve("later.html");
        try (SurveyPage page = SurveyPage.open(file, "Survey", "0.1.0")) {
            page.add(SurveyRow.parse(kept));
        }
        assertEquals(
                data(page("Survey", List.of(dwarf))).lines().toList().get(2),
                data(Files.readString(file)).lines().toList().get(2));
        List<Object> ranked = JSON.std.listFrom(SurveyRow.parse(kept).ranked(7).text(List.of()));
        assertEquals(7, ranked.get(SurveyRow.pageKeys().indexOf("rank")));
        assertTrue(
                assertThrows(IOException.class, () -> SurveyRow.parse("[1,2]"))
                        .getMessage()
                        .contains("of another version"));
    }

    @Test
    void textOfTheListCannotBecomeMarkup() throws IOException {
        String html = page(EVIL, List.of(Samples.failed(EVIL, EVIL)));
        assertFalse(html.contains("<img"), "markup of a name got into the page");
        assertFalse(data(html).contains("\u2028"), "a line separator got into the data");
        assertEquals(2, html.split("<script", -1).length - 1, "number of script elements");
        assertEquals(2, html.split("</script>", -1).length - 1, "number of script ends");
        Map<String, Object> data = JSON.std.mapFrom(data(html));
        assertEquals(EVIL, ((List<?>) ((List<?>) data.get("rows")).get(0)).get(0));
    }

    @Test
    void marksInATitleAreNotFilledIn() throws IOException {
        String html = page("@SCRIPT@ $1 \\ @DATA@", List.of());
        assertTrue(html.contains("<title>&#64;SCRIPT&#64; $1 \\ &#64;DATA&#64;</title>"));
    }

    @Test
    void thePageNeedsNoNetwork() throws IOException {
        String html = page("Survey", List.of(Samples.tDwarf()));
        String withoutNamespace = html.replace("http://www.w3.org/2000/svg", "");
        assertFalse(withoutNamespace.contains("http:"));
        assertFalse(withoutNamespace.contains("https:"));
        assertTrue(html.contains("default-src 'none'"));
    }

    @Test
    void anAbandonedPageLeavesTheFormerOne() throws IOException {
        Path file = folder.resolve("survey.html");
        Files.writeString(file, "former");
        try (SurveyPage page = SurveyPage.open(file, "Survey", "0.1.0")) {
            page.add(Samples.failed("b", "gone"), "b", false);
            page.abandon();
        }
        assertEquals("former", Files.readString(file));
        try (var left = Files.list(folder)) {
            assertEquals(List.of(file), left.toList());
        }
    }

    @Test
    void theSameResultsGiveTheSameBytes() throws IOException {
        List<ObjectResult> results = List.of(Samples.lDwarf(), Samples.tDwarf());
        assertEquals(page("Survey", results), page("Survey", results));
    }

    @Test
    void aSparklineKeepsGapsAndThePeak() {
        String spark =
                Sparkline.of(
                        Samples.withGap(
                                Samples.spectrum(0.8, 2.45, 600, Samples.Bands.L_DWARF, 60, 9),
                                1.34,
                                1.45));
        assertTrue(spark.startsWith("....."), "nothing is known below 0.8 micron: " + spark);
        assertTrue(spark.substring(40, 90).contains("....."), "the gap is lost: " + spark);
        assertTrue(spark.contains("_"), "no column reaches the peak: " + spark);
    }
}
