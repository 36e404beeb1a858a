package emberline.place.calibrated;

import emberline.measure.Measurement.Measured;
import emberline.place.calibrated.TrainingSet.Dwarf;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * How one dwarf of known type stands beside the loci, feature by feature, in sigma of scatter and
 * noise, and how far the errors of its published type and gravity may have put it there.
 */
final class Residuals {

    /** Residuals are cut at this many sigma. */
    private static final double CUT = 3;

    private final double weight;
    private final double[] residual;
    private final double[] ofType;
    private final double[] ofGravity;

    /**
     * The residuals of a dwarf.
     *
     * @param loci the loci
     * @param dwarf the dwarf
     */
    Residuals(List<Locus> loci, Dwarf dwarf) {
        this.weight = dwarf.weight();
        this.residual = new double[loci.size()];
        this.ofType = new double[loci.size()];
        this.ofGravity = new double[loci.size()];
        Arrays.fill(residual, Double.NaN);
        double type = dwarf.typeNumber();
        for (int i = 0; i < residual.length; i++) {
            Locus locus = loci.get(i);
            Optional<Measured> value = dwarf.row().feature(locus.feature());
            if (value.isPresent()) {
                double sigma = Math.hypot(locus.scatter(type), value.get().oneSigma());
                double difference = value.get().value() - locus.mean(type, dwarf.lowGravity());
                residual[i] = cut(difference / sigma);
                ofType[i] = cut(TrainingSet.TYPE_NOISE_SUBCLASS * locus.slope(type) / sigma);
                ofGravity[i] = cut(TrainingSet.GRAVITY_NOISE * locus.shift(type) / sigma);
            }
        }
    }

    private static double cut(double sigmas) {
        return Math.max(-CUT, Math.min(CUT, sigmas));
    }

    /**
     * Whether two features were measured.
     *
     * @param a index of a locus
     * @param b index of a locus
     * @return true where both have a residual
     */
    boolean hasBoth(int a, int b) {
        return !Double.isNaN(residual[a]) && !Double.isNaN(residual[b]);
    }

    /**
     * The product of two residuals.
     *
     * @param a index of a measured feature
     * @param b index of a measured feature
     * @return product, weighted by how far the dwarf is trusted
     */
    double product(int a, int b) {
        return weight * residual[a] * residual[b];
    }

    /**
     * What the errors of published type and gravity are expected to put into that product.
     *
     * @param a index of a measured feature
     * @param b index of a measured feature
     * @return expected product, weighted alike
     */
    double productOfLabels(int a, int b) {
        return weight * (ofType[a] * ofType[b] + ofGravity[a] * ofGravity[b]);
    }
}
