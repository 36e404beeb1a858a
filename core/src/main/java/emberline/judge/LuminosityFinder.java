package emberline.judge;

import emberline.judge.PropertyRelations.Quantity;
import java.util.Optional;

/**
 * The luminosity of an object with a distance that does not rest on its type: from the absolute
 * magnitude in the band whose relation scatters least.
 */
final class LuminosityFinder {

    private static final MagnitudeBand[] ORDER = {
        MagnitudeBand.H_2MASS,
        MagnitudeBand.H_MKO,
        MagnitudeBand.K_2MASS,
        MagnitudeBand.K_MKO,
        MagnitudeBand.J_2MASS,
        MagnitudeBand.J_MKO,
        MagnitudeBand.W1,
        MagnitudeBand.W2
    };

    private static final double TAIL = 5;
    private static final int PAIR_STEPS = 6;

    /** A wrong parallax or magnitude must not drag the answer: its share, and how far it strays. */
    private static final double OUTLIERS = 0.01;

    private static final double OUTLIER_DEX = 0.5;

    private final PropertyRelations relations;
    private final double floorDex;
    private final double pairs;
    private final double excessDex;

    LuminosityFinder(PropertyRelations relations, JudgeNumbers numbers) {
        this.relations = relations;
        this.floorDex = numbers.of("luminosity-floor");
        this.pairs = numbers.of("binary-share");
        this.excessDex = numbers.of("binary-excess");
    }

    /**
     * A luminosity that was measured: log10 of solar and one sigma (dex) on each sequence.
     *
     * @param band from which magnitude
     * @param absoluteMag absolute magnitude (mag)
     * @param absoluteSigma its one-sigma error (mag)
     * @param logL by sequence as in {@link TypeKernel#SEQUENCES}
     * @param sigma by sequence
     */
    record Measured(
            MagnitudeBand band,
            double absoluteMag,
            double absoluteSigma,
            double[] logL,
            double[] sigma) {}

    Optional<Measured> find(Evidence evidence, DistanceEstimate distance) {
        for (MagnitudeBand band : ORDER) {
            Magnitude magnitude = evidence.photometry().get(band);
            if (magnitude == null) {
                continue;
            }
            double absolute = magnitude.mag() - 5 * Math.log10(distance.pc().median() / 10);
            Optional<Measured> found = measured(band, absolute, magnitude, distance);
            if (found.isPresent()) {
                return found;
            }
        }
        return Optional.empty();
    }

    private Optional<Measured> measured(
            MagnitudeBand band, double absolute, Magnitude magnitude, DistanceEstimate distance) {
        double distanceMag = 5 / Math.log(10) * distance.relativeSigma();
        double absoluteSigma = Math.hypot(magnitude.sigmaMag(), distanceMag);
        double[] logL = new double[TypeKernel.SEQUENCES.length];
        double[] sigma = new double[TypeKernel.SEQUENCES.length];
        for (int s = 0; s < logL.length; s++) {
            Optional<TypeRelation> relation =
                    relations.at(
                            Quantity.LOG_L_FROM_MAG, band, TypeKernel.SEQUENCES[s], absolute);
            if (relation.isEmpty()) {
                return Optional.empty();
            }
            logL[s] = relation.get().at(absolute);
            double byMag = 0.4 * absoluteSigma;
            sigma[s] =
                    Math.sqrt(
                            Math.pow(relation.get().rms(absolute), 2)
                                    + floorDex * floorDex
                                    + byMag * byMag);
        }
        return Optional.of(new Measured(band, absolute, absoluteSigma, logL, sigma));
    }

    /**
     * How probable the measurement is at each log L of the axis: alone, or as a pair whose excess
     * is even up to that of two equal objects.
     */
    double[] curve(Measured measured, int sequence) {
        double[] curve = new double[NodeTable.LOG_L_SIZE];
        double sigma = measured.sigma()[sequence];
        add(curve, measured.logL()[sequence], sigma, 1 - pairs - OUTLIERS);
        add(curve, measured.logL()[sequence], OUTLIER_DEX, OUTLIERS);
        for (int k = 0; k < PAIR_STEPS; k++) {
            double excess = excessDex * (k + 0.5) / PAIR_STEPS;
            add(curve, measured.logL()[sequence] - excess, sigma, pairs / PAIR_STEPS);
        }
        return curve;
    }

    private static void add(double[] curve, double mean, double sigma, double weight) {
        for (int i = 0; i < curve.length; i++) {
            double off = (NodeTable.FIRST_LOG_L + i * NodeTable.LOG_L_STEP - mean) / sigma;
            if (Math.abs(off) < TAIL) {
                curve[i] += weight * Math.exp(-off * off / 2) / sigma;
            }
        }
    }
}
