package emberline.judge;

import emberline.judge.PropertyRelations.Quantity;
import emberline.place.GravityClass;
import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.Optional;

/**
 * Finds the distance: from a parallax of some weight with a prior even in volume; otherwise from
 * one magnitude and the absolute magnitudes of the types, marginalised over type and gravity class,
 * times the likelihood of a weak parallax where there is one. Unresolved pairs are not looked for.
 */
final class DistanceFinder {

    /** Bands for a photometric distance, the best first; the first that has a value is used. */
    private static final MagnitudeBand[] ORDER = {
        MagnitudeBand.W2,
        MagnitudeBand.K_MKO,
        MagnitudeBand.K_2MASS,
        MagnitudeBand.H_2MASS,
        MagnitudeBand.H_MKO,
        MagnitudeBand.J_MKO,
        MagnitudeBand.J_2MASS,
        MagnitudeBand.W1
    };

    private static final double MU_STEP = 0.05;
    private static final double TAIL = 5;
    private static final int CELLS = 240;
    private static final double ENOUGH = 0.5;

    private final PropertyRelations relations;
    private final double leastSnr;

    DistanceFinder(PropertyRelations relations, JudgeNumbers numbers) {
        this.relations = relations;
        this.leastSnr = numbers.of("parallax-least-snr");
    }

    /** Whether a parallax alone gives the distance. */
    boolean byParallax(Astrometry astrometry) {
        return astrometry.parallaxMas().isPresent()
                && astrometry.parallaxMas().getAsDouble()
                        >= leastSnr * astrometry.parallaxSigmaMas().orElseThrow();
    }

    Optional<DistanceEstimate> find(Evidence evidence, TypeMix mix) {
        if (byParallax(evidence.astrometry())) {
            return Optional.of(parallax(evidence.astrometry()));
        }
        for (MagnitudeBand band : ORDER) {
            Magnitude magnitude = evidence.photometry().get(band);
            if (magnitude != null) {
                Optional<DistanceEstimate> found =
                        photometric(band, magnitude, evidence.astrometry(), mix);
                if (found.isPresent()) {
                    return found;
                }
            }
        }
        return Optional.empty();
    }

    /** Density of the parallax times the square of the distance, on cells of distance. */
    private static DistanceEstimate parallax(Astrometry astrometry) {
        double parallax = astrometry.parallaxMas().orElseThrow();
        double sigma = astrometry.parallaxSigmaMas().orElseThrow();
        double near = 1000 / (parallax + TAIL * sigma);
        double far = 1000 / Math.max(parallax - TAIL * sigma, parallax / 4);
        double[] edges = new double[CELLS + 1];
        double[] weights = new double[CELLS];
        for (int i = 0; i <= CELLS; i++) {
            edges[i] = near * Math.pow(far / near, i / (double) CELLS);
        }
        for (int i = 0; i < CELLS; i++) {
            double d = Math.sqrt(edges[i] * edges[i + 1]);
            double off = (1000 / d - parallax) / sigma;
            weights[i] = d * d * (edges[i + 1] - edges[i]) * Math.exp(-off * off / 2);
        }
        return new DistanceEstimate(Estimate.of(edges, weights), "parallax");
    }

    static Sequence sequence(GravityClass gravity) {
        return switch (gravity) {
            case FLD_G -> Sequence.FIELD;
            case INT_G -> Sequence.INT_G;
            case VL_G -> Sequence.VL_G;
        };
    }

    /** Absolute magnitudes by type and class: mean and scatter, added up with their weights. */
    private Optional<DistanceEstimate> photometric(
            MagnitudeBand band, Magnitude magnitude, Astrometry astrometry, TypeMix mix) {
        int cells = (int) Math.round(40 / MU_STEP);
        double first = magnitude.mag() - 30;
        double[] density = new double[cells];
        double covered = 0;
        double all = 0;
        for (int n = 0; n < TypeAxis.SIZE; n++) {
            double type = TypeAxis.type(n);
            for (GravityClass gravity : GravityClass.values()) {
                double p = mix.type(n) > 0 ? mix.type(n, gravity) : 0;
                all += p;
                Optional<TypeRelation> relation =
                        p > 0
                                ? relations.at(Quantity.ABS_MAG, band, sequence(gravity), type)
                                : Optional.empty();
                if (relation.isPresent()) {
                    covered += p;
                    double sigma = Math.hypot(relation.get().rms(type), magnitude.sigmaMag());
                    double mu = magnitude.mag() - relation.get().at(type);
                    addNormal(density, (mu - first) / MU_STEP, sigma / MU_STEP, p);
                }
            }
        }
        if (covered < ENOUGH * all) {
            return Optional.empty();
        }
        String method = "photometry (" + band.label() + ")";
        if (astrometry.parallaxMas().isPresent()) {
            method += " and parallax";
            for (int i = 0; i < cells; i++) {
                double mas = 1000 / distance(first + (i + 0.5) * MU_STEP);
                double off =
                        (mas - astrometry.parallaxMas().getAsDouble())
                                / astrometry.parallaxSigmaMas().orElseThrow();
                density[i] *= Math.exp(-off * off / 2);
            }
        }
        double[] edges = new double[cells + 1];
        for (int i = 0; i <= cells; i++) {
            edges[i] = distance(first + i * MU_STEP);
        }
        double sum = 0;
        for (double one : density) {
            sum += one;
        }
        return sum > 0
                ? Optional.of(new DistanceEstimate(Estimate.of(edges, density), method))
                : Optional.empty();
    }

    /** Distance (pc) of a distance modulus. */
    static double distance(double modulus) {
        return Math.pow(10, 1 + modulus / 5);
    }

    private static void addNormal(double[] cells, double mean, double sigma, double weight) {
        int low = Math.max(0, (int) (mean - TAIL * sigma));
        int high = Math.min(cells.length - 1, (int) (mean + TAIL * sigma) + 1);
        for (int i = low; i <= high; i++) {
            double off = (i + 0.5 - mean) / sigma;
            cells[i] += weight * Math.exp(-off * off / 2) / sigma;
        }
    }
}
