package emberline.demo;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * Magnitudes and parallax of an object: as {@code objects.csv} gives them, else from the absolute
 * magnitudes of its type ({@code magnitudes.csv}) and its made-up distance; with errors that grow
 * towards the faint end.
 */
final class Photometry {

    private static final List<String> BANDS =
            List.of("j_mag", "h_mag", "k_mag", "w1_mag", "w2_mag");

    /** Error of a bright object (mag). */
    private static final double LEAST_ERROR_MAG = 0.02;

    private final Map<String, Double> trueMagnitude = new LinkedHashMap<>();
    private final Map<String, Double> measured = new LinkedHashMap<>();
    private final Map<String, Double> error = new LinkedHashMap<>();

    private Photometry() {}

    /**
     * Measures an object.
     *
     * @param object the object; its name seeds the errors
     * @return its magnitudes and parallax
     */
    static Photometry of(SurveyObject object) {
        Photometry photometry = new Photometry();
        UniformRandomProvider random =
                RandomSource.XO_RO_SHI_RO_128_PP.create(Seeds.of("sky/" + object.name()));
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        DemoTable.Row row = object.row();
        for (String band : BANDS) {
            double magnitude = apparent(object, band);
            double sigma =
                    Math.hypot(
                            LEAST_ERROR_MAG,
                            0.1 * StrictMath.pow(10, 0.3 * (magnitude - limit(band))));
            double draw = normal.sample();
            photometry.trueMagnitude.put(band, magnitude);
            if (!band.startsWith("w") || row.text("wise").equals("yes")) {
                photometry.measured.put(band, magnitude + sigma * draw);
                photometry.error.put(band, sigma);
            }
        }
        double draw = normal.sample();
        if (!row.isBlank("parallax_err_mas")) {
            double sigma = row.number("parallax_err_mas");
            double parallax = row.isBlank("distance_pc") ? 0.2 : 1000 / row.number("distance_pc");
            photometry.measured.put("parallax_mas", parallax + sigma * draw);
            photometry.error.put("parallax_mas", sigma);
        }
        return photometry;
    }

    /** The magnitude at which the error reaches a tenth: roughly that of the all-sky surveys. */
    private static double limit(String band) {
        return switch (band) {
            case "j_mag" -> 16.2;
            case "h_mag" -> 15.5;
            case "k_mag" -> 15.0;
            case "w1_mag" -> 17.0;
            default -> 15.8;
        };
    }

    /** The true apparent magnitude, as given or by type and distance; of a pair that of both. */
    private static double apparent(SurveyObject object, String band) {
        DemoTable.Row row = object.row();
        if (!row.isBlank(band)) {
            return row.number(band);
        }
        double type = object.typeNumber().orElseThrow();
        double absolute = AbsoluteMagnitudes.of(type, object.gravity(), band);
        if (object.pairTypeNumber().isPresent()) {
            double other =
                    AbsoluteMagnitudes.of(
                            object.pairTypeNumber().getAsDouble(), object.gravity(), band);
            absolute -= 2.5 * StrictMath.log10(1 + StrictMath.pow(10, 0.4 * (absolute - other)));
        }
        return absolute + 5 * StrictMath.log10(row.number("distance_pc")) - 5;
    }

    /** The magnitude without error, e.g. of {@code j_mag}. */
    double trueMagnitude(String band) {
        return trueMagnitude.get(band);
    }

    /** The measured value of a band or of {@code parallax_mas}; empty where not measured. */
    OptionalDouble measured(String quantity) {
        Double value = measured.get(quantity);
        return value == null ? OptionalDouble.empty() : OptionalDouble.of(value);
    }

    /** The one-sigma error of {@link #measured}; empty where not measured. */
    OptionalDouble error(String quantity) {
        Double value = error.get(quantity);
        return value == null ? OptionalDouble.empty() : OptionalDouble.of(value);
    }
}
