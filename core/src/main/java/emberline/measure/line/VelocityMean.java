package emberline.measure.line;

import emberline.measure.Measurement.Measured;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.apache.commons.statistics.distribution.ChiSquaredDistribution;

/**
 * The mean velocity of lines. Lines further from the median than {@value #OUTLIER} times their
 * error and the scatter of all (from the median deviation) are set aside. The others are averaged
 * by the inverse squares of their errors. Where chance gives their scatter in less than one case in
 * twenty, a common variance is added to all of them, by the estimator of DerSimonian and Laird
 * (1986, Controlled Clinical Trials 7, 177; from memory): it stands for blends and errors of the
 * wavelength scale, and keeps one line of little noise from deciding alone.
 */
final class VelocityMean {

    private static final double OUTLIER = 4;
    private static final double MAD_TO_SIGMA = 1.4826;
    private static final double CHANCE = 0.05;

    private final List<LineVelocity> used = new ArrayList<>();
    private final List<LineSetAside> rejected = new ArrayList<>();

    /** Sorts the lines; at least one. */
    VelocityMean(List<LineVelocity> lines) {
        double median = median(lines.stream().mapToDouble(LineVelocity::kms).toArray());
        double scatter =
                MAD_TO_SIGMA
                        * median(
                                lines.stream()
                                        .mapToDouble(line -> Math.abs(line.kms() - median))
                                        .toArray());
        for (LineVelocity line : lines) {
            if (Math.abs(line.kms() - median) > OUTLIER * Math.hypot(line.sigmaKms(), scatter)) {
                rejected.add(
                        new LineSetAside(
                                line.species(),
                                line.restMicron(),
                                String.format(
                                        Locale.ROOT,
                                        "outlier: %.0f +- %.0f km/s, the median is %.0f",
                                        line.kms(),
                                        line.sigmaKms(),
                                        median)));
            } else {
                used.add(line);
            }
        }
    }

    List<LineVelocity> used() {
        return used;
    }

    List<LineSetAside> rejected() {
        return rejected;
    }

    /** The weighted mean of the lines used (km/s). */
    Measured mean() {
        double extra = 0;
        Measured mean = weighted(0);
        double chiSquare = 0;
        double sum = 0;
        double sumOfSquares = 0;
        for (LineVelocity line : used) {
            double weight = 1 / (line.sigmaKms() * line.sigmaKms());
            chiSquare += weight * Math.pow(line.kms() - mean.value(), 2);
            sum += weight;
            sumOfSquares += weight * weight;
        }
        int freedom = used.size() - 1;
        if (freedom > 0
                && ChiSquaredDistribution.of(freedom).survivalProbability(chiSquare) < CHANCE) {
            extra = (chiSquare - freedom) / (sum - sumOfSquares / sum);
        }
        return extra > 0 ? weighted(extra) : mean;
    }

    private Measured weighted(double extraVariance) {
        double sum = 0;
        double product = 0;
        for (LineVelocity line : used) {
            double weight = 1 / (line.sigmaKms() * line.sigmaKms() + extraVariance);
            sum += weight;
            product += weight * line.kms();
        }
        return new Measured(product / sum, 1 / Math.sqrt(sum));
    }

    private static double median(double[] values) {
        Arrays.sort(values);
        int middle = values.length / 2;
        return values.length % 2 == 1 ? values[middle] : (values[middle - 1] + values[middle]) / 2;
    }
}
