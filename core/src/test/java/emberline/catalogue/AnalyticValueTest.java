package emberline.catalogue;

import static org.junit.jupiter.api.Assertions.assertEquals;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.ToDoubleFunction;
import org.junit.jupiter.api.Test;

/**
 * Windows, weights and forms of all features, by the values they have on two simple fluxes. The
 * forms are written out here once more, for window means that are known without a spectrum.
 */
class AnalyticValueTest {

    private static final double ANGSTROM_PER_MICRON = 1e4;

    private final FeatureCatalogue catalogue = FeatureCatalogue.standard();

    @Test
    void allFeaturesHaveTheirAnalyticValues() throws IOException {
        Map<String, NamedCsvRecord> expected = new HashMap<>();
        for (NamedCsvRecord row :
                TestTable.rows(AnalyticValueTest.class, "published/analytic_values.csv")) {
            expected.put(row.getField("feature"), row);
        }
        assertEquals(expected.size(), catalogue.features().size());
        for (Feature feature : catalogue.features()) {
            NamedCsvRecord row = expected.get(feature.id());
            assertEquals(
                    TestTable.number(row, "on_constant_flux"),
                    value(feature, window -> 1),
                    1e-9,
                    feature.id());
            double rising = TestTable.number(row, "on_flux_equal_to_wavelength");
            assertEquals(
                    rising,
                    value(feature, Window::centreMicron),
                    1e-5 * (1 + Math.abs(rising)),
                    feature.id());
        }
    }

    private double value(Feature f, ToDoubleFunction<Window> mean) {
        return switch (f.form()) {
            case RATIO_OF_MEANS, RATIO_OF_WEIGHTED_SUMS ->
                    sum(f, Role.NUMERATOR, mean) / sum(f, Role.DENOMINATOR, mean);
            case NORMALISED_DIFFERENCE -> {
                double a = sum(f, Role.BAND_A, mean);
                double b = sum(f, Role.BAND_B, mean);
                yield (a - b) / (0.5 * (a + b));
            }
            case DOUBLE_RATIO ->
                    (sum(f, Role.NUMERATOR_1, mean) / sum(f, Role.DENOMINATOR_1, mean))
                            / (sum(f, Role.NUMERATOR_2, mean) / sum(f, Role.DENOMINATOR_2, mean));
            case PRODUCT_OF_POWERS ->
                    f.windows().stream()
                            .mapToDouble(
                                    w -> Math.pow(mean.applyAsDouble(w.window()), w.exponent()))
                            .reduce(1, (x, y) -> x * y);
            case INTERPOLATED_CONTINUUM_OVER_LINE -> straight(f, mean) / sum(f, Role.LINE, mean);
            case EQUIVALENT_WIDTH_LINEAR_CONTINUUM -> width(f, mean, straight(f, mean));
            case EQUIVALENT_WIDTH_MEAN_CONTINUUM, EQUIVALENT_WIDTH_FITTED_CONTINUUM ->
                    width(f, mean, meanOrFitted(f, mean));
            case SUM_OF_FEATURES ->
                    f.parts(PartRole.TERM).stream().mapToDouble(p -> part(p, mean)).sum();
            case RATIO_OF_FEATURES ->
                    part(f.parts(PartRole.DIVIDEND).get(0), mean)
                            / part(f.parts(PartRole.DIVISOR).get(0), mean);
            case METALLICITY_SHORTFALL -> {
                double argument = part(f.parts(PartRole.ARGUMENT).get(0), mean);
                double solar = catalogue.solarCurve(f).orElseThrow().value(argument);
                yield (1 - part(f.parts(PartRole.TIO5).get(0), mean)) / (1 - solar);
            }
            default -> throw new IllegalStateException(f.form().toString());
        };
    }

    private double part(Part part, ToDoubleFunction<Window> mean) {
        return value(catalogue.feature(part.feature()).orElseThrow(), mean);
    }

    private static double sum(Feature f, Role role, ToDoubleFunction<Window> mean) {
        return f.windows(role).stream()
                .mapToDouble(w -> w.weight() * mean.applyAsDouble(w.window()))
                .sum();
    }

    /** The line through two continua at the centre of LINE. */
    private static double straight(Feature f, ToDoubleFunction<Window> mean) {
        Window one = f.window(Role.CONTINUUM_1);
        Window two = f.window(Role.CONTINUUM_2);
        double share =
                (f.window(Role.LINE).centreMicron() - one.centreMicron())
                        / (two.centreMicron() - one.centreMicron());
        return (1 - share) * mean.applyAsDouble(one) + share * mean.applyAsDouble(two);
    }

    /** A straight flux is its own fit; a mean continuum is the mean of the window means. */
    private static double meanOrFitted(Feature f, ToDoubleFunction<Window> mean) {
        if (f.form() == Form.EQUIVALENT_WIDTH_FITTED_CONTINUUM) {
            return mean.applyAsDouble(f.window(Role.LINE));
        }
        List<FeatureWindow> continua =
                f.windows().stream().filter(w -> w.role() != Role.LINE).toList();
        return continua.stream()
                .mapToDouble(w -> mean.applyAsDouble(w.window()))
                .average()
                .orElseThrow();
    }

    /** Width of a straight flux over a continuum that is its value at the centre of LINE. */
    private static double width(Feature f, ToDoubleFunction<Window> mean, double continuum) {
        Window line = f.window(Role.LINE);
        return line.widthMicron()
                * ANGSTROM_PER_MICRON
                * (1 - mean.applyAsDouble(line) / continuum);
    }
}
