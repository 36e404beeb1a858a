package emberline.place.calibrated;

import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The values of one object that have a locus, with the covariance of their noise. */
final class Sample {

    private final List<Locus> loci = new ArrayList<>();
    private final List<Integer> places = new ArrayList<>();
    private final List<Measured> values = new ArrayList<>();
    private double[][] noise = {};
    private double[][] correlation = {};

    private Sample() {}

    /**
     * What was measured on an object.
     *
     * @param calibration the loci
     * @param measurements all features
     * @return the sample, perhaps empty
     */
    static Sample of(Calibration calibration, Measurements measurements) {
        Sample sample = new Sample();
        for (int i = 0; i < calibration.loci().size(); i++) {
            sample.add(calibration, i, measurements.measured(calibration.loci().get(i).feature()));
        }
        sample.noise = measurements.covariance(sample.loci.stream().map(Locus::feature).toList());
        sample.correlation = sample.correlations(calibration);
        return sample;
    }

    /**
     * Values whose noise is known feature by feature only, as in the reference table.
     *
     * @param calibration the loci
     * @param measured values with errors by feature id
     * @return the sample, perhaps empty
     */
    static Sample of(Calibration calibration, Map<String, Measured> measured) {
        Sample sample = new Sample();
        for (int i = 0; i < calibration.loci().size(); i++) {
            String feature = calibration.loci().get(i).feature();
            sample.add(calibration, i, Optional.ofNullable(measured.get(feature)));
        }
        sample.noise = new double[sample.size()][sample.size()];
        for (int f = 0; f < sample.size(); f++) {
            sample.noise[f][f] = Math.pow(sample.values.get(f).oneSigma(), 2);
        }
        sample.correlation = sample.correlations(calibration);
        return sample;
    }

    private void add(Calibration calibration, int place, Optional<Measured> value) {
        if (value.isPresent() && Double.isFinite(value.get().oneSigma())) {
            loci.add(calibration.loci().get(place));
            places.add(place);
            values.add(value.get());
        }
    }

    private double[][] correlations(Calibration calibration) {
        double[][] all = new double[size()][size()];
        for (int f = 0; f < all.length; f++) {
            for (int g = 0; g < all.length; g++) {
                all[f][g] = calibration.correlation(places.get(f), places.get(g));
            }
        }
        return all;
    }

    int size() {
        return loci.size();
    }

    Locus locus(int f) {
        return loci.get(f);
    }

    Measured measured(int f) {
        return values.get(f);
    }

    double value(int f) {
        return values.get(f).value();
    }

    /** Correlation of the residuals of two features from their loci. */
    double correlation(int f, int other) {
        return correlation[f][other];
    }

    /** Covariance of the noise of two features. */
    double noise(int f, int other) {
        return noise[f][other];
    }
}
