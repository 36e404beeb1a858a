package emberline.measure;

import static emberline.PublishedRows.number;
import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.PublishedRows;
import emberline.catalogue.Role;
import emberline.prepare.ExtinctionLaw;
import java.io.IOException;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Indices on simple noiseless fluxes against values that an independent script computed from the
 * printed windows (tables beside this test). The grid is fine enough that pixels do not matter.
 */
class AnalyticValuesTest {

    private static Measurements onPowerLaw(double exponent) {
        return TestSpectra.measure(TestSpectra.fine(micron -> Math.pow(micron, exponent)));
    }

    @Tag("slow")
    @ParameterizedTest
    @ValueSource(
            strings = {
                "index-values-nir.csv",
                "index-values-optical.csv",
                "index-values-lambda.csv"
            })
    void powerLawsGiveTheComputedIndices(String table) throws IOException {
        List<NamedCsvRecord> rows = PublishedRows.of(table);
        Map<String, Measurements> byExponent = new HashMap<>();
        assertAll(
                rows.stream()
                        .map(
                                row ->
                                        () -> {
                                            String exponent = row.getField("flux_exponent");
                                            Measurements measured =
                                                    byExponent.computeIfAbsent(
                                                            exponent,
                                                            e -> onPowerLaw(Double.parseDouble(e)));
                                            String id = row.getField("feature");
                                            double expected = number(row, "expected");
                                            assertEquals(
                                                    expected,
                                                    TestSpectra.value(measured, id),
                                                    number(row, "tolerance")
                                                            * Math.max(1, Math.abs(expected)),
                                                    id + " on lambda^" + exponent);
                                        }));
    }

    @Tag("slow")
    @Test
    void reddeningOfAFlatFluxChangesIndicesAsComputed() throws IOException {
        Map<String, Measurements> byCase = new HashMap<>();
        Measurements flat = onPowerLaw(0);
        assertAll(
                PublishedRows.of("index-reddening-factors.csv").stream()
                        .map(
                                row ->
                                        () -> {
                                            String id = row.getField("feature");
                                            String reddening =
                                                    row.getField("law")
                                                            + " "
                                                            + row.getField("r_v")
                                                            + " "
                                                            + row.getField("a_v");
                                            Measurements measured =
                                                    byCase.computeIfAbsent(
                                                            reddening, r -> reddened(row));
                                            assertEquals(
                                                    number(row, "expected"),
                                                    TestSpectra.value(measured, id)
                                                            / TestSpectra.value(flat, id),
                                                    number(row, "tolerance"),
                                                    id + " behind " + reddening);
                                        }));
    }

    private static Measurements reddened(NamedCsvRecord row) {
        double rv = number(row, "r_v");
        ExtinctionLaw law =
                row.getField("law").equals("F99")
                        ? ExtinctionLaw.fitzpatrick1999(rv)
                        : ExtinctionLaw.cardelli1989(rv);
        double av = number(row, "a_v");
        return TestSpectra.measure(
                TestSpectra.fine(micron -> Math.pow(10, -0.4 * av * law.relativeTo(micron))));
    }

    /** Every index of a constant flux is known: ratios are 1 or the sum of weights, widths 0. */
    @Test
    void aConstantFluxHasNoBandsAndNoLines() {
        Measurements measured = onPowerLaw(0);
        assertAll(
                measured.all().stream()
                        .filter(m -> m.result() instanceof Measurement.Measured)
                        .map(
                                m ->
                                        () ->
                                                assertEquals(
                                                        expectedOnConstant(m),
                                                        TestSpectra.value(
                                                                measured, m.feature().id()),
                                                        1e-9,
                                                        m.feature().id())));
    }

    private static double expectedOnConstant(FeatureMeasurement m) {
        return switch (m.feature().form()) {
            case NORMALISED_DIFFERENCE,
                    MAGNITUDE_OF_RATIO,
                    EQUIVALENT_WIDTH_LINEAR_CONTINUUM,
                    EQUIVALENT_WIDTH_FITTED_CONTINUUM,
                    EQUIVALENT_WIDTH_MEAN_CONTINUUM,
                    METALLICITY_SHORTFALL ->
                    0;
            case SUM_OF_FEATURES -> m.feature().parts().size();
            case RATIO_OF_WEIGHTED_SUMS ->
                    m.feature().windows(Role.NUMERATOR).stream().mapToDouble(w -> w.weight()).sum()
                            / m.feature().windows(Role.DENOMINATOR).stream()
                                    .mapToDouble(w -> w.weight())
                                    .sum();
            default -> 1;
        };
    }
}
