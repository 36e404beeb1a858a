package emberline.place.calibrated;

import emberline.measure.Measurement.Measured;
import emberline.place.GravityClass;
import emberline.place.LowerFactor;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * Spectra that have not been taken yet: draws what would be measured on an object of some type and
 * gravity, and places it. The features scatter about their loci as objects do, with the
 * correlations of the calibration, and have the noise of the signal-to-noise asked for; noise is
 * taken as independent from feature to feature.
 */
public final class Forecast {

    private final Calibration calibration;
    private final CalibratedWitness witness;
    private final FeatureNoise noise;

    /**
     * A forecast.
     *
     * @param calibration the loci
     * @param prior what is thought of types before
     * @param noise how noisy features are
     */
    public Forecast(Calibration calibration, TypePrior prior, FeatureNoise noise) {
        this.calibration = calibration;
        this.witness = new CalibratedWitness(calibration, prior);
        this.noise = noise;
    }

    /**
     * An instrument and an object before it.
     *
     * @param typeNumber type of the object (M0 = 0 to Y1 = 31)
     * @param gravity its gravity class
     * @param resolvingPower resolving power of the spectrum
     */
    public record Setting(double typeNumber, GravityClass gravity, double resolvingPower) {}

    /**
     * The features that such a spectrum shows.
     *
     * @param setting object and instrument
     * @return feature ids; empty where no spectrum like this is known
     */
    public List<String> features(Setting setting) {
        return calibration.loci().stream()
                .map(Locus::feature)
                .filter(
                        feature ->
                                noise.atUnitSignal(
                                                feature,
                                                setting.typeNumber(),
                                                setting.resolvingPower())
                                        .isPresent())
                .toList();
    }

    /**
     * Draws one spectrum and places it.
     *
     * @param setting object and instrument
     * @param signalToNoise median signal-to-noise a pixel, positive
     * @param seed start of the random numbers
     * @return what the calibrated witness would say
     */
    public CalibratedType draw(Setting setting, double signalToNoise, long seed) {
        UniformRandomProvider random = RandomSource.XO_RO_SHI_RO_128_PP.create(seed);
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        List<Integer> places = new ArrayList<>();
        List<Double> errors = new ArrayList<>();
        for (int i = 0; i < calibration.loci().size(); i++) {
            OptionalDouble error =
                    noise.atUnitSignal(
                            calibration.loci().get(i).feature(),
                            setting.typeNumber(),
                            setting.resolvingPower());
            if (error.isPresent()) {
                places.add(i);
                errors.add(error.getAsDouble() / signalToNoise);
            }
        }
        double[] residuals = correlated(places, normal);
        Map<String, Measured> values = new LinkedHashMap<>();
        double lowGravity =
                GravityScale.centre(setting.gravity())
                        + GravityScale.spread(setting.gravity()) * normal.sample();
        for (int f = 0; f < residuals.length; f++) {
            Locus locus = calibration.loci().get(places.get(f));
            double value =
                    locus.mean(setting.typeNumber(), lowGravity)
                            + locus.scatter(setting.typeNumber()) * residuals[f]
                            + errors.get(f) * normal.sample();
            values.put(locus.feature(), new Measured(value, errors.get(f)));
        }
        return witness.witness(Sample.of(calibration, values));
    }

    /** Normal deviates with the correlation of the residuals of some loci. */
    private double[] correlated(List<Integer> places, ZigguratSampler.NormalizedGaussian normal) {
        int size = places.size();
        double[][] matrix = new double[size][size];
        double[] independent = new double[size];
        for (int row = 0; row < size; row++) {
            for (int column = row; column < size; column++) {
                matrix[row][column] = calibration.correlation(places.get(row), places.get(column));
            }
            independent[row] = normal.sample();
        }
        return LowerFactor.of(matrix).colour(independent);
    }
}
