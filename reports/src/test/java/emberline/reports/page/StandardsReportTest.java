package emberline.reports.page;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.standard.Standard;
import emberline.place.standard.StandardComparison;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.reports.Samples;
import emberline.reports.attach.ObjectJson;
import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumns;
import emberline.reports.attach.StandardsText;
import emberline.reports.chart.ChartSize;
import emberline.reports.chart.Curve;
import emberline.reports.chart.SpectrumChart;
import emberline.reports.chart.Tone;
import emberline.spectrum.ResolvingPower;
import emberline.survey.ObjectResult;
import emberline.survey.SpectrumResult;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.Test;

/** The comparison with standards in tables, JSON, chart and PDF. */
public class StandardsReportTest {

    /** An invented L dwarf beside eight invented standards. */
    public static ObjectResult compared() {
        ObjectResult object = Samples.lDwarf();
        List<Standard> standards = new ArrayList<>();
        for (int k = 0; k < 8; k++) {
            Samples.Bands bands = new Samples.Bands(0.06 + 0.06 * k, 0, 0.03 + 0.03 * k);
            standards.add(
                    new Standard(
                            "Standard " + k,
                            10 + k,
                            "Standard " + k,
                            "",
                            new PreparedSpectrum(
                                    Samples.spectrum(0.8, 2.45, 3000, bands, 200, k),
                                    new ResolvingPower(600, ResolvingPower.Basis.GIVEN),
                                    NoiseModel.INDEPENDENT,
                                    List.of())));
        }
        return object.withStandards(
                new StandardComparison(standards)
                        .compare(
                                object.spectra().stream().map(SpectrumResult::prepared).toList(),
                                s -> false));
    }

    @Test
    void columnsAndJsonHoldTheComparison() {
        ObjectResult result = compared();
        Map<String, String> cells =
                ResultColumns.standard().stream()
                        .filter(column -> column.name().contains("standard"))
                        .collect(
                                Collectors.toMap(
                                        ResultColumn::name, column -> column.text(result)));
        assertEquals("Standard 3", cells.get("best_standard"), cells.toString());
        assertEquals("L3", cells.get("standard_type"));
        assertTrue(Double.parseDouble(cells.get("best_standard_chi2")) < 2, cells.toString());
        assertEquals("none", cells.get("pair_standards"));
        String json = ObjectJson.text(result);
        for (String key : List.of("by_range", "f_test_confidence", "p_false_alarm")) {
            assertTrue(json.contains("\"" + key + "\""), key);
        }
        assertTrue(ObjectJson.text(Samples.lDwarf()).contains("\"standards\": null"));
    }

    @Test
    void theBestStandardLiesOverTheSpectrum() {
        SpectrumChart.Drawn drawn =
                new SpectrumChart(
                                Samples.CATALOGUE,
                                new ChartSize(500, 250, 7),
                                (text, sizePoint) -> 4 * text.length())
                        .of(compared());
        Curve overlay =
                drawn.chart().layers().stream()
                        .filter(Curve.class::isInstance)
                        .map(Curve.class::cast)
                        .filter(curve -> curve.tone() == Tone.STANDARD)
                        .findFirst()
                        .orElseThrow();
        assertTrue(overlay.size() > 300 && overlay.size() < 1200, "points: " + overlay.size());
        double highest = 0;
        for (int i = 0; i < overlay.size(); i++) {
            highest = Math.max(highest, overlay.y(i));
        }
        assertEquals(1, highest, 0.1);
        assertTrue(drawn.remark().contains("Standard 3 (L3)"), drawn.remark());
    }

    @Test
    void theReportShowsTheBestFive() throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        new PdfReport(ReportSettings.of("1", 1), Samples.CATALOGUE).write(compared(), bytes);
        try (PDDocument pdf = Loader.loadPDF(bytes.toByteArray())) {
            String text = new PDFTextStripper().getText(pdf).replaceAll("\\s+", " ");
            for (String words :
                    List.of("Standard 3 (L3)", "Comparison with standards", "By range: ")) {
                assertTrue(text.contains(words), words + ": " + text);
            }
        }
    }

    @Test
    void whatWasNotComparedSaysSo() {
        ObjectResult result = compared();
        assertEquals(4, StandardsText.lines(result.standards().orElseThrow()).size());
    }
}
