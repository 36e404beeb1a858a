package emberline.judge;

import emberline.judge.PropertyRelations.Quantity;
import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
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
     * @param field on the field sequence
     * @param young on the sequence of young objects
     */
    record Measured(
            MagnitudeBand band, double absoluteMag, double absoluteSigma, LogL field, LogL young) {

        LogL on(Sequence sequence) {
            return sequence == Sequence.YOUNG ? young : field;
        }
    }

    /**
     * A luminosity.
     *
     * @param value log10 of solar
     * @param sigmaDex one sigma (dex)
     */
    record LogL(double value, double sigmaDex) {}

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
        Optional<LogL> field = logL(band, Sequence.FIELD, absolute, absoluteSigma);
        Optional<LogL> young = logL(band, Sequence.YOUNG, absolute, absoluteSigma);
        return field.isPresent() && young.isPresent()
                ? Optional.of(new Measured(band, absolute, absoluteSigma, field.get(), young.get()))
                : Optional.empty();
    }

    private Optional<LogL> logL(
            MagnitudeBand band, Sequence sequence, double absolute, double sigmaMag) {
        return relations
                .at(Quantity.LOG_L_FROM_MAG, band, sequence, absolute)
                .map(
                        relation -> {
                            double byMag = 0.4 * sigmaMag;
                            double rms = relation.rms(absolute);
                            return new LogL(
                                    relation.at(absolute),
                                    Math.sqrt(rms * rms + floorDex * floorDex + byMag * byMag));
                        });
    }

    /**
     * How probable the measurement is at each log L of the axis: alone, or as a pair whose excess
     * is even up to that of two equal objects.
     */
    double[] curve(LogL measured) {
        double[] curve = new double[NodeTable.LOG_L_SIZE];
        double sigma = measured.sigmaDex();
        add(curve, measured.value(), sigma, 1 - pairs - OUTLIERS);
        add(curve, measured.value(), OUTLIER_DEX, OUTLIERS);
        for (int k = 0; k < PAIR_STEPS; k++) {
            double excess = excessDex * (k + 0.5) / PAIR_STEPS;
            add(curve, measured.value() - excess, sigma, pairs / PAIR_STEPS);
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
