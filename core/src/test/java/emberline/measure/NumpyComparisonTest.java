package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.SharedSpectra;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Role;
import emberline.catalogue.Window;
import emberline.prepare.PreparedSpectrum;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.SpectrumReader;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.Medium;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * Window means and equivalent widths of two real spectra against numpy; the script that made the
 * values stands beside them and writes windows and fractional pixels out once more.
 *
 * <p>Tolerance 1e-6: both sum the same terms in another order, which costs some 1e-12; widths take
 * the continuum by a series whose rest is below 1e-10 for these slopes; the reader keeps the digits
 * of the files.
 */
@Tag("slow")
class NumpyComparisonTest {

    private static final double TOLERANCE = 1e-6;
    private static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();

    @Test
    void sixEquivalentWidthsAgree() throws Exception {
        List<NamedCsvRecord> rows = rows("width");
        assertEquals(6, rows.size());
        for (NamedCsvRecord row : rows) {
            String id = row.getField("feature");
            Window line = CATALOGUE.feature(id).orElseThrow().window(Role.LINE);
            assertEquals(number(row, "low_micron"), line.lowMicron(), 1e-9, id);
            assertEquals(number(row, "high_micron"), line.highMicron(), 1e-9, id);
            double expected = number(row, "value");
            double value = TestSpectra.value(TestSpectra.measure(prepared(row)), id);
            assertEquals(expected, value, TOLERANCE * Math.abs(expected), id);
        }
    }

    @Test
    void twentyWindowMeansAgree() throws Exception {
        List<NamedCsvRecord> rows = rows("mean");
        assertEquals(20, rows.size());
        for (NamedCsvRecord row : rows) {
            Window window = new Window(number(row, "low_micron"), number(row, "high_micron"));
            PreparedSpectrum prepared = prepared(row);
            WindowOperator operator =
                    WindowOperator.of(
                            prepared.spectrum(),
                            prepared.resolvingPower().value(),
                            List.of(
                                    new WindowFunctional(
                                            window,
                                            OptionalDouble.empty(),
                                            WindowFunctional.Over.MEAN)));
            double expected = number(row, "value");
            double value = operator.apply(prepared.spectrum())[0];
            assertEquals(expected, value, TOLERANCE * Math.abs(expected), row.toString());
        }
    }

    private static PreparedSpectrum prepared(NamedCsvRecord row)
            throws UnreadableSpectrumException {
        Path file = SharedSpectra.folder().resolve(row.getField("spectrum"));
        return new Preparer()
                .prepare(
                        new SpectrumReader().read(file),
                        Preparing.withDefaults()
                                .withMedium(Medium.VACUUM)
                                .withResolvingPower(2000));
    }

    private static double number(NamedCsvRecord row, String column) {
        return Double.parseDouble(row.getField(column));
    }

    private static List<NamedCsvRecord> rows(String what) throws IOException {
        List<NamedCsvRecord> rows = new ArrayList<>();
        try (CsvReader<NamedCsvRecord> reader =
                CsvReader.builder()
                        .commentStrategy(CommentStrategy.SKIP)
                        .ofNamedCsvRecord(
                                new InputStreamReader(
                                        NumpyComparisonTest.class.getResourceAsStream(
                                                "/emberline/derived/numpy/widths_and_means.csv"),
                                        StandardCharsets.UTF_8))) {
            for (NamedCsvRecord row : reader) {
                if (row.getField("what").equals(what)) {
                    rows.add(row);
                }
            }
        }
        return rows;
    }
}
