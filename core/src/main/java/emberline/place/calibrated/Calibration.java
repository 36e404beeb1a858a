package emberline.place.calibrated;

import java.util.List;
import java.util.Optional;

/**
 * Everything that the calibrated witness has learned: the loci of the features, the correlation of
 * their residuals, and the error of published types.
 */
public final class Calibration {

    private final List<Locus> loci;
    private final double[][] correlation;
    private final LabelError labelError;

    /**
     * A calibration.
     *
     * @param loci the loci
     * @param correlation correlation of the residuals, in the order of the loci
     * @param labelError error of published types
     */
    Calibration(List<Locus> loci, double[][] correlation, LabelError labelError) {
        if (correlation.length != loci.size()) {
            throw new IllegalArgumentException(
                    correlation.length + " rows of correlations for " + loci.size() + " loci");
        }
        this.loci = List.copyOf(loci);
        this.correlation = correlation;
        this.labelError = labelError;
    }

    /**
     * The product's calibration, from the public spectra named in its files.
     *
     * @return the calibration
     */
    public static Calibration standard() {
        return CalibrationFiles.standard();
    }

    /** The loci in the order of the correlations. */
    List<Locus> loci() {
        return loci;
    }

    /** The correlation of the residuals of two loci. */
    double correlation(int one, int two) {
        return correlation[one][two];
    }

    /** The error of published types. */
    LabelError labelError() {
        return labelError;
    }

    /** This calibration with another label error. */
    Calibration with(LabelError other) {
        return new Calibration(loci, correlation, other);
    }

    /**
     * The mean of a feature along the sequence, for charts and comparisons.
     *
     * @param feature feature id
     * @param typeNumber type number (M0 = 0 to Y1 = 31)
     * @param lowGravity 0 field, 0.5 intermediate, 1 very low gravity
     * @return mean and one-sigma scatter of objects, or empty where the feature has no locus
     */
    public Optional<Expected> expected(String feature, double typeNumber, double lowGravity) {
        return loci.stream()
                .filter(locus -> locus.feature().equals(feature))
                .findFirst()
                .map(
                        locus ->
                                new Expected(
                                        locus.mean(typeNumber, lowGravity),
                                        locus.scatter(typeNumber)));
    }

    /**
     * What a feature is expected to be.
     *
     * @param mean in the unit of the feature
     * @param scatter one-sigma scatter of objects, in the unit of the feature
     */
    public record Expected(double mean, double scatter) {}
}
