package emberline.reports.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.jr.ob.JSON;
import emberline.reports.Samples;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
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
        assertEquals(120, first.get(keys.indexOf("spark")).toString().length());
        assertNull(second.get(keys.indexOf("type_number")));
        assertEquals("no such file", second.get(keys.indexOf("reason")));
        assertEquals(keys.size(), first.size());
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
