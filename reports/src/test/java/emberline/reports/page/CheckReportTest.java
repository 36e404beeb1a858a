package emberline.reports.page;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.TypeEstimate;
import emberline.reports.attach.CheckJson;
import emberline.reports.attach.CheckTables;
import emberline.survey.Status;
import emberline.survey.score.CheckScore;
import emberline.survey.score.ScoredObject;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

class CheckReportTest {

    private static final List<String> GRAVITIES = List.of("", "FLD-G", "INT-G", "VL-G", "young");

    /** Invented dwarfs from M0 to Y1, some far off. */
    private static CheckScore score(int count) {
        Random random = new Random(2);
        List<ScoredObject> objects = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            double known = 31.0 * i / Math.max(1, count - 1);
            double sigma = 0.4 + random.nextDouble();
            double found = known + sigma * random.nextGaussian() + (i % 37 == 36 ? 9 : 0);
            objects.add(
                    new ScoredObject(
                            i == 0 ? "=1+1" : "Ember " + i,
                            "Ember " + i,
                            "set " + i % 4,
                            List.of("A", "B", "C").get(i % 3),
                            new ScoredObject.Known(
                                    "dwarf",
                                    OptionalDouble.of(known),
                                    GRAVITIES.get(i % 5),
                                    Optional.empty()),
                            new ScoredObject.Found(
                                    Optional.of(TypeEstimate.normal(found, sigma)),
                                    Optional.empty(),
                                    "",
                                    Optional.empty()),
                            OptionalDouble.of(120),
                            OptionalDouble.of(30),
                            Status.MEASURED,
                            "",
                            List.of("one-relation")));
        }
        return CheckScore.of(objects);
    }

    private static byte[] pdf(CheckScore score, Paper paper, String list) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        new CheckReport(ReportSettings.of("0.1.0", 7).withPaper(paper))
                .write(score, list, "Spectra degraded: snr 20.0, resolution 100.0, band H.", bytes);
        return bytes.toByteArray();
    }

    @ParameterizedTest
    @EnumSource(Paper.class)
    void thePageIsOneAndWellSet(Paper paper) throws IOException {
        byte[] pdf = pdf(score(260), paper, "known objects of a list with a long name".repeat(4));
        PageLayout.assertWellSet(pdf, paper);
        try (PDDocument document = Loader.loadPDF(pdf)) {
            assertEquals(1, document.getNumberOfPages());
        }
        String text = PdfText.all(pdf).replaceAll("\\s+", " ");
        assertTrue(text.contains("What this cannot tell"), text);
        assertTrue(text.contains("Spectra degraded: snr 20.0"), text);
        assertTrue(text.contains("M4 and later, tiers A and B"), text);
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 7})
    void aShortListIsDrawnToo(int count) throws IOException {
        PageLayout.assertWellSet(pdf(score(count), Paper.A4, "few.csv"), Paper.A4);
    }

    @Test
    void theSameScoreGivesTheSameBytes() throws IOException {
        assertArrayEquals(
                pdf(score(40), Paper.A4, "list.csv"), pdf(score(40), Paper.A4, "list.csv"));
    }

    @Test
    void withoutATypeThereIsNothingToDraw() {
        CheckScore none = CheckScore.of(List.of());
        assertFalse(CheckReport.canReport(none));
        assertThrows(IllegalArgumentException.class, () -> pdf(none, Paper.A4, "none.csv"));
        assertTrue(CheckTables.text(none, "").contains("The kind is not judged."));
    }

    /** Tables and JSON carry the same digits, and formulas do not reach a spreadsheet. */
    @Test
    void tablesAndJsonTellTheSame() {
        CheckScore score = score(120);
        String text = CheckTables.text(score, "As observed.");
        String json = new CheckJson("0.1.0", "list.csv", Map.of(), 7).text(score);
        String line =
                text.lines().filter(l -> l.startsWith("all dwarfs")).findFirst().orElseThrow();
        String[] cells = line.split(" {2,}", -1);
        assertTrue(
                json.contains(
                        "{\"label\": \"all dwarfs\", \"objects\": "
                                + cells[1].trim()
                                + ", \"typed\": "
                                + cells[2].trim()
                                + ", \"bias\": "
                                + cells[3].trim()),
                line + json);
        List<String> rows = CheckTables.residuals(score).lines().toList();
        assertEquals(121, rows.size());
        assertTrue(rows.get(1).startsWith("'=1+1,"), rows.get(1));
        assertFalse(score.outliers().isEmpty());
        assertTrue(text.contains(score.outliers().get(0).name()), text);
    }
}
