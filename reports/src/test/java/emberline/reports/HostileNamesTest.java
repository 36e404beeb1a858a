package emberline.reports;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.jr.ob.JSON;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.reports.attach.AtomicFile;
import emberline.reports.attach.ObjectJson;
import emberline.reports.attach.ResultColumns;
import emberline.reports.attach.ResultTable;
import emberline.reports.attach.SafeFileNames;
import emberline.reports.page.PdfReport;
import emberline.reports.page.ReportSettings;
import emberline.reports.survey.SurveyPage;
import emberline.spectrum.Candidate;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.stream.Stream;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Names and notes made to harm, in every output: files, CSV, JSON, PDF and the survey page. */
class HostileNamesTest {

    private static final String SCRIPT = "</script><script>alert(1)</script>";

    @TempDir private Path folder;

    static Stream<String> names() {
        return Stream.of(
                "../../outside",
                "/absolute",
                "C:\\Windows\\x",
                "..",
                ".",
                "a/../../b",
                "con",
                "COM1.txt",
                "lpt9",
                "aux.",
                "CONOUT$",
                "trailing.",
                "trailing ",
                "a:stream",
                "bell\u0007escape\u001b[31m",
                "two\nlines\r\n",
                "tab\t",
                "nul\u0000byte",
                "\u202egnp.exe",
                "\u200b\u200d\ufeff",
                "\ud83d\ude80 \ud835\udd38",
                "\u0627\u0644\u0646\u062c\u0645",
                "e\u0301\u0301\u0301\u0301",
                "\u00e9",
                "x".repeat(300),
                "\ud83d\ude80".repeat(150),
                SCRIPT,
                "<img src=x onerror=alert(1)>",
                "\" onmouseover=\"alert(1)",
                "javascript:alert(1)",
                "&lt;b&gt; &amp;",
                "]]><!--",
                "a\u2028b\u2029",
                "@DATA@ @STYLE@ ${x} %" + "s %" + "n",
                "\\input{/etc/passwd} $x^2$ % & # _ { } ~ ^",
                "=HYPERLINK(\"http://127.0.0.1\",\"x\")",
                "+1+cmd|' /C calc'!A0",
                "-2+3",
                "@SUM(1)",
                "\uff1d1+1",
                "'; DROP TABLE objects; --",
                "$(touch made) `touch made`",
                "-rf",
                "--out");
    }

    private static ObjectResult named(String name) {
        Map<String, String> cells = new LinkedHashMap<>();
        cells.put("name", name);
        cells.put("note", name);
        ObjectResult dwarf = Samples.lDwarf();
        return Samples.object(
                name, cells, List.of(dwarf.spectra().get(0).prepared().spectrum()), 120);
    }

    @ParameterizedTest
    @MethodSource("names")
    void everyOutputHoldsTheNameAndNothingElseHappens(String name) throws IOException {
        Path out = Files.createDirectory(folder.resolve("out"));
        ObjectResult result = named(name);
        String stem = SafeFileNames.of(List.of(name)).stem(0);
        AtomicFile.write(out.resolve(stem + ".json"), ObjectJson.text(result));
        ByteArrayOutputStream pdf = new ByteArrayOutputStream();
        new PdfReport(ReportSettings.of("0.1.0", 1), Samples.CATALOGUE).write(result, pdf);
        AtomicFile.write(out.resolve(stem + ".pdf"), pdf.toByteArray());
        try (ResultTable table =
                ResultTable.open(
                        out.resolve("results.csv"),
                        ResultColumns.forList(List.of("name", "note", name)))) {
            table.write(result);
        }
        try (SurveyPage page = SurveyPage.open(out.resolve("survey.html"), name, "0.1.0")) {
            page.add(result, stem, true);
            page.add(
                    Chain.failed(new Candidate(name, 2, List.of(name), Map.of()), name),
                    stem,
                    false);
        }
        requireFiles(out, Set.of(stem + ".json", stem + ".pdf", "results.csv", "survey.html"));
        requireJson(out.resolve(stem + ".json"), name);
        requireCsv(out.resolve("results.csv"), name);
        requirePage(Files.readString(out.resolve("survey.html")));
        try (PDDocument document = Loader.loadPDF(pdf.toByteArray())) {
            String text = new PDFTextStripper().getText(document);
            assertTrue(text.contains("subclass") || text.contains("Emberline"), text);
            assertTrue(text.chars().noneMatch(c -> c < ' ' && c != '\n' && c != '\r'), "control");
            assertFalse(text.contains("\u202e"), "a mark that turns the order of letters");
        }
    }

    private void requireFiles(Path out, Set<String> expected) throws IOException {
        try (Stream<Path> all = Files.walk(folder)) {
            Set<String> found = new HashSet<>();
            all.filter(Files::isRegularFile).forEach(f -> found.add(out.relativize(f).toString()));
            assertEquals(expected, found);
        }
    }

    private static void requireJson(Path file, String name) throws IOException {
        String text = Files.readString(file);
        assertTrue(text.chars().noneMatch(c -> c < ' ' && c != '\n'), "control characters");
        Object read = JSON.std.mapFrom(text).get("name");
        assertEquals(name, read);
    }

    private static void requireCsv(Path file, String name) throws IOException {
        try (CsvReader<NamedCsvRecord> csv = CsvReader.builder().ofNamedCsvRecord(file)) {
            List<NamedCsvRecord> rows = csv.stream().toList();
            assertEquals(1, rows.size());
            for (String cell :
                    List.of(rows.get(0).getField("name"), rows.get(0).getField("note"))) {
                assertFalse(cell.matches("(?s)[=@\\t\\r\\n\uff1d+-].*"), cell);
                String bare = cell.startsWith("'") ? cell.substring(1) : cell;
                assertTrue(bare.equals(name) || cell.equals(name), cell);
            }
        }
    }

    private static void requirePage(String html) {
        String lower = html.toLowerCase(Locale.ROOT);
        assertEquals(2, lower.split("<script", -1).length - 1, "number of script elements");
        assertEquals(2, lower.split("</script", -1).length - 1, "number of script ends");
        assertFalse(lower.contains("<img"), "an element of a name got into the page");
        assertFalse(html.contains("\" onmouseover=\"alert"), "an attribute of a name got in");
        assertFalse(html.contains("\u2028"), "a line separator got into the script");
    }

    /** Together in one run all names have files of their own, on every file system. */
    @Test
    void allNamesTogetherHaveFilesOfTheirOwn() {
        List<String> all = new ArrayList<>(names().toList());
        names().map(name -> name.toUpperCase(Locale.ROOT)).forEach(all::add);
        names().map(name -> name + " ").forEach(all::add);
        SafeFileNames files = SafeFileNames.of(all);
        Set<String> stems = new HashSet<>();
        for (int k = 0; k < all.size(); k++) {
            String stem = files.stem(k);
            assertTrue(stems.add(stem.toLowerCase(Locale.ROOT)), all.get(k));
            assertTrue(stem.matches("[A-Za-z0-9+_][A-Za-z0-9+._-]{0,99}"), stem);
            assertFalse(stem.endsWith("."), stem);
            assertFalse(stem.matches("(?i)(con|prn|aux|nul|com\\d|lpt\\d)(\\..*)?"), stem);
        }
    }

    /** A link that stands where the temporary file will be must not lead the output elsewhere. */
    @ParameterizedTest
    @ValueSource(strings = {"results.csv", "survey.html", "plain.json"})
    void linksAtTheTemporaryNameAreNotFollowed(String name) throws IOException {
        Path precious = Files.writeString(folder.resolve("precious"), "mine");
        Path out = Files.createDirectory(folder.resolve("out"));
        Path file = out.resolve(name);
        Files.createSymbolicLink(out.resolve("." + name + ".part"), precious);
        Files.createSymbolicLink(file, precious);
        switch (name) {
            case "results.csv" -> ResultTable.open(file, ResultColumns.standard()).close();
            case "survey.html" -> SurveyPage.open(file, "t", "0.1.0").close();
            default -> AtomicFile.write(file, "{}");
        }
        assertEquals("mine", Files.readString(precious, StandardCharsets.UTF_8));
        assertTrue(Files.isRegularFile(file) && !Files.isSymbolicLink(file), "still a link");
    }
}
