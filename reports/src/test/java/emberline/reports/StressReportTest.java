package emberline.reports;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.jr.ob.JSON;
import emberline.measure.Measuring;
import emberline.reports.attach.ObjectJson;
import emberline.reports.attach.ResultColumns;
import emberline.reports.attach.ResultTable;
import emberline.reports.page.PdfReport;
import emberline.reports.page.ReportSettings;
import emberline.reports.survey.SurveyPage;
import emberline.spectrum.Candidate;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import emberline.survey.SurveySettings;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Whatever the numbers of a spectrum are, every output of its result can be made. */
class StressReportTest {

    private static final Chain CHAIN =
            new Chain(Samples.CATALOGUE, Measuring.withDefaults(), SurveySettings.withDefaults());

    @TempDir private Path folder;

    private static String cells(String kind, double f, int pixel) {
        double noise = 0.02 * Math.sin(pixel * 12.9898 + pixel * pixel * 0.37);
        double flux = f + noise;
        return switch (kind) {
            case "tiny" -> (flux * 1e-20) + "," + 2e-22;
            case "huge" -> (flux * 1e20) + "," + 2e18;
            case "beyond float" -> (flux * 1e250) + "," + 2e248;
            case "below float" -> (flux * 1e-250) + "," + 2e-252;
            case "negative" -> -flux + ",0.02";
            case "zero sigma" -> flux + ",0";
            case "infinite sigma" -> flux + ",inf";
            case "islands" -> pixel / 40 % 2 == 0 ? flux + ",0.02" : "nan,nan";
            case "nothing" -> pixel > 1 ? "nan,nan" : flux + ",0.02";
            case "constant" -> "1,0.02";
            case "zero" -> "0,0.02";
            case "faint" -> (0.01 * flux) + ",0.02";
            case "ray" -> (pixel == 300 ? 1e15 : flux) + ",0.02";
            default -> flux + ",0.02";
        };
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "plain",
                "tiny",
                "huge",
                "beyond float",
                "below float",
                "negative",
                "zero sigma",
                "infinite sigma",
                "islands",
                "nothing",
                "constant",
                "zero",
                "faint",
                "ray",
                "two",
                "ten"
            })
    void everyOutputCanBeMade(String kind) throws IOException {
        int pixels = kind.equals("two") ? 2 : kind.equals("ten") ? 10 : 700;
        StringBuilder text = new StringBuilder("wavelength_micron,flux,sigma\n");
        for (int i = 0; i < pixels; i++) {
            double w = 0.8 + 1.7 * i / (pixels - 1.0);
            double f = Math.exp(-0.5 * Math.pow((w - 1.3) / 0.45, 2));
            f *= 1 - 0.5 * Math.exp(-0.5 * Math.pow((w - 1.4) / 0.06, 2));
            text.append(String.format(Locale.ROOT, "%.6f,", w)).append(cells(kind, f, i));
            text.append('\n');
        }
        Files.writeString(folder.resolve("s.csv"), text);
        ObjectResult result =
                CHAIN.run(new Candidate(kind, 1, List.of("s.csv"), Map.of("name", kind)), folder);
        assertFalse(result.reason().contains("internal error"), result.reason());
        String json = ObjectJson.text(result);
        assertEquals(kind, JSON.std.mapFrom(json).get("name"));
        assertFalse(json.matches("(?s).*[:,\\[] ?-?(NaN|Infinity).*"), "no number");
        Path csv = folder.resolve("results.csv");
        try (ResultTable table = ResultTable.open(csv, ResultColumns.standard())) {
            table.write(result);
        }
        assertFalse(Files.readString(csv).matches("(?s).*,-?NaN[,\n].*"));
        Path html = folder.resolve("survey.html");
        try (SurveyPage page = SurveyPage.open(html, "t", "0.1.0")) {
            page.add(result, "s", true);
        }
        if (PdfReport.canReport(result)) {
            ByteArrayOutputStream pdf = new ByteArrayOutputStream();
            new PdfReport(ReportSettings.of("0.1.0", 1), Samples.CATALOGUE).write(result, pdf);
            assertTrue(pdf.size() > 10_000, "a report of " + pdf.size() + " bytes");
        } else {
            assertFalse(result.reason().isBlank(), "no report and no reason");
        }
    }
}
