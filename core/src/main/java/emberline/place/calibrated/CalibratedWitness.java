package emberline.place.calibrated;

import emberline.measure.Measurements;
import emberline.place.GravityClass;
import emberline.place.TypePosterior;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Turns measurements into a posterior over type and gravity class. The likelihood is normal, with
 * the scatter and the correlations of the calibration and the noise of the measurement; features
 * that do not fit at any probable type get a larger sigma, so that one bad window cannot drag the
 * answer. The error of published types widens the result, which is about the type that would be
 * published.
 */
public final class CalibratedWitness {

    /** Distance of the grid (subclass). */
    private static final double STEP = 0.1;

    private static final int GRID = 311;
    private static final int GRID_STEPS_A_KNOT = 5;

    /** Degrees of freedom of the Student distribution by which outliers are judged. */
    private static final double FREEDOM = 4;

    /** Fewest features from which a type is taken. */
    private static final int FEWEST = 3;

    /** Knots less probable than the best by more than this logarithm are not followed up. */
    private static final double NEGLIGIBLE = 14;

    /** The first look takes features as independent; so many of them may count fully. */
    private static final double INDEPENDENT = 6;

    /** Inflation of sigma from which a feature counts as set aside. */
    private static final double ASIDE = Math.sqrt(2);

    private static final int ROUNDS = 2;

    private final Calibration calibration;

    /** Logarithm of the prior at the knots and on the grid, by gravity class. */
    private final Map<GravityClass, double[]> logPriorAtKnots;

    private final Map<GravityClass, double[]> logPriorOnGrid;

    /** Probability of an error of published types by steps of the grid. */
    private final double[] labelError = new double[GRID];

    /**
     * A witness.
     *
     * @param calibration what was learned
     * @param prior what is thought before
     */
    public CalibratedWitness(Calibration calibration, TypePrior prior) {
        this.calibration = calibration;
        this.logPriorAtKnots = logPrior(prior, TypeKnots.COUNT, TypeKnots.STEP);
        this.logPriorOnGrid = logPrior(prior, GRID, STEP);
        for (int i = 0; i < GRID; i++) {
            labelError[i] = calibration.labelError().probability(i * STEP, STEP);
        }
    }

    private static Map<GravityClass, double[]> logPrior(TypePrior prior, int size, double step) {
        Map<GravityClass, double[]> log = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            double[] ofClass = new double[size];
            for (int i = 0; i < size; i++) {
                ofClass[i] = Math.log(prior.density(i * step, gravity));
            }
            log.put(gravity, ofClass);
        }
        return log;
    }

    /**
     * Places an object.
     *
     * @param measurements what was measured on it
     * @return posterior and contributions, or why there are none
     */
    public CalibratedType witness(Measurements measurements) {
        return witness(Sample.of(calibration, measurements));
    }

    /** Places a sample. */
    CalibratedType witness(Sample sample) {
        if (sample.size() < FEWEST) {
            return CalibratedType.none(
                    "only "
                            + sample.size()
                            + " of the "
                            + calibration.loci().size()
                            + " features with a calibrated locus were measured; at least "
                            + FEWEST
                            + " are needed");
        }
        double[] inflation = new double[sample.size()];
        KnotLikelihood[] knots = fit(sample, inflation);
        Map<GravityClass, double[]> grid = onGrid(knots);
        if (!Double.isFinite(best(grid))) {
            return CalibratedType.none(
                    "the measured values lie beyond all reason from those of any type: look at the"
                            + " spectrum for bad pixels");
        }
        TypePosterior alone = posterior(grid, false);
        KnotLikelihood nearest = knots[(int) Math.round(mean(alone) / TypeKnots.STEP)];
        return new CalibratedType(
                Optional.of(posterior(grid, true)),
                "",
                nearest == null ? List.of() : contributions(sample, nearest, inflation, alone),
                nearest == null ? 0 : nearest.gravitySeparationSigma(),
                logEvidence(grid));
    }

    /**
     * The posterior without the error of published types, from which that error can be found.
     *
     * @param sample what was measured
     * @return the posterior; empty where too little was measured
     */
    Optional<TypePosterior> withoutLabelError(Sample sample) {
        if (sample.size() < FEWEST) {
            return Optional.empty();
        }
        Map<GravityClass, double[]> grid = onGrid(fit(sample, new double[sample.size()]));
        return Double.isFinite(best(grid)) ? Optional.of(posterior(grid, false)) : Optional.empty();
    }

    /** The likelihood at all knots that matter; fills in how much each sigma had to be widened. */
    private KnotLikelihood[] fit(Sample sample, double[] inflation) {
        Arrays.fill(inflation, 1);
        Map<GravityClass, double[]> logAtKnots = firstLook(sample);
        KnotLikelihood[] prepared = new KnotLikelihood[TypeKnots.COUNT];
        KnotLikelihood[] knots = new KnotLikelihood[TypeKnots.COUNT];
        for (int round = 0; round <= ROUNDS; round++) {
            widen(sample, logAtKnots, inflation);
            boolean[] probable = probable(logAtKnots);
            for (int k = 0; k < TypeKnots.COUNT; k++) {
                if (probable[k] && prepared[k] == null) {
                    prepared[k] = KnotLikelihood.at(sample, k);
                }
                knots[k] = probable[k] ? prepared[k].widened(inflation) : null;
            }
            logAtKnots = atKnots(knots);
        }
        return knots;
    }

    /** Log posterior at the knots with independent, heavy-tailed features. */
    private Map<GravityClass, double[]> firstLook(Sample sample) {
        double temper = Math.min(1, INDEPENDENT / sample.size());
        Map<GravityClass, double[]> log = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            double centre = GravityScale.centre(gravity);
            double[] ofClass = new double[TypeKnots.COUNT];
            for (int k = 0; k < TypeKnots.COUNT; k++) {
                LogProduct tails = new LogProduct();
                LogProduct variances = new LogProduct();
                for (int f = 0; f < sample.size(); f++) {
                    double variance = variance(sample, f, k, gravity);
                    double rest = sample.value(f) - sample.locus(f).mean(k, centre);
                    tails.times(1 + rest * rest / variance / FREEDOM);
                    variances.times(variance);
                }
                double sum = -(FREEDOM + 1) / 2 * tails.value() - 0.5 * variances.value();
                ofClass[k] = temper * sum + logPriorAtKnots.get(gravity)[k];
            }
            log.put(gravity, ofClass);
        }
        return log;
    }

    /** Variance of a feature alone: scatter of objects and of gravity within the class, noise. */
    private static double variance(Sample sample, int f, int knot, GravityClass gravity) {
        double scatter = sample.locus(f).scatter(knot);
        double ofGravity = GravityScale.spread(gravity) * sample.locus(f).shift(knot);
        return scatter * scatter + ofGravity * ofGravity + sample.noise(f, f);
    }

    /** Widens the sigma of features whose residuals are large wherever the object is probable. */
    private static void widen(
            Sample sample, Map<GravityClass, double[]> logAtKnots, double[] inflation) {
        double best = best(logAtKnots);
        double[] expected = new double[inflation.length];
        double total = 0;
        for (Map.Entry<GravityClass, double[]> entry : logAtKnots.entrySet()) {
            GravityClass gravity = entry.getKey();
            double centre = GravityScale.centre(gravity);
            for (int k = 0; k < TypeKnots.COUNT; k++) {
                double weight = Math.exp(entry.getValue()[k] - best);
                if (weight < 1e-4) {
                    continue;
                }
                total += weight;
                for (int f = 0; f < expected.length; f++) {
                    double rest = sample.value(f) - sample.locus(f).mean(k, centre);
                    expected[f] += weight * rest * rest / variance(sample, f, k, gravity);
                }
            }
        }
        for (int f = 0; f < expected.length; f++) {
            double square = (expected[f] / total + FREEDOM) / (FREEDOM + 1);
            inflation[f] = Math.sqrt(Math.max(1, square));
        }
    }

    private static double best(Map<GravityClass, double[]> log) {
        return log.values().stream().flatMapToDouble(Arrays::stream).max().orElseThrow();
    }

    /** The knots that are to be followed up, with a neighbour on either side. */
    private static boolean[] probable(Map<GravityClass, double[]> log) {
        double least = best(log) - NEGLIGIBLE;
        boolean[] probable = new boolean[TypeKnots.COUNT];
        for (double[] ofClass : log.values()) {
            for (int k = 0; k < TypeKnots.COUNT; k++) {
                if (ofClass[k] >= least) {
                    probable[Math.max(0, k - 1)] = true;
                    probable[k] = true;
                    probable[Math.min(TypeKnots.COUNT - 1, k + 1)] = true;
                }
            }
        }
        return probable;
    }

    private Map<GravityClass, double[]> atKnots(KnotLikelihood[] knots) {
        Map<GravityClass, double[]> log = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            double[] ofClass = new double[TypeKnots.COUNT];
            for (int k = 0; k < TypeKnots.COUNT; k++) {
                ofClass[k] =
                        knots[k] == null
                                ? Double.NEGATIVE_INFINITY
                                : knots[k].at(0).logLikelihood(gravity)
                                        + logPriorAtKnots.get(gravity)[k];
            }
            log.put(gravity, ofClass);
        }
        return log;
    }

    /** Log posterior on the grid, by gravity class. */
    private Map<GravityClass, double[]> onGrid(KnotLikelihood[] knots) {
        Map<GravityClass, double[]> grid = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            double[] log = new double[GRID];
            Arrays.fill(log, Double.NEGATIVE_INFINITY);
            grid.put(gravity, log);
        }
        for (int i = 0; i < GRID; i++) {
            int below = Math.min(i / GRID_STEPS_A_KNOT, TypeKnots.COUNT - 2);
            if (knots[below] == null || knots[below + 1] == null) {
                continue;
            }
            double part = (double) i / GRID_STEPS_A_KNOT - below;
            KnotLikelihood.AtType before = knots[below].at(part);
            KnotLikelihood.AtType after = knots[below + 1].at(part - 1);
            for (Map.Entry<GravityClass, double[]> entry : grid.entrySet()) {
                GravityClass gravity = entry.getKey();
                entry.getValue()[i] =
                        (1 - part) * before.logLikelihood(gravity)
                                + part * after.logLikelihood(gravity)
                                + logPriorOnGrid.get(gravity)[i];
            }
        }
        return grid;
    }

    private static double logEvidence(Map<GravityClass, double[]> log) {
        double best = best(log);
        double sum =
                log.values().stream()
                        .flatMapToDouble(Arrays::stream)
                        .map(value -> Math.exp(value - best))
                        .sum();
        return best + Math.log(sum);
    }

    private TypePosterior posterior(Map<GravityClass, double[]> log, boolean withLabelError) {
        double best = best(log);
        Map<GravityClass, double[]> weights = new EnumMap<>(GravityClass.class);
        log.forEach(
                (gravity, ofClass) -> {
                    double[] density =
                            Arrays.stream(ofClass).map(value -> Math.exp(value - best)).toArray();
                    weights.put(gravity, withLabelError ? blurred(density) : density);
                });
        return TypePosterior.of(0, STEP, weights);
    }

    private double[] blurred(double[] density) {
        double[] blurred = new double[GRID];
        for (int i = 0; i < GRID; i++) {
            if (density[i] > 1e-12) {
                for (int j = 0; j < GRID; j++) {
                    blurred[j] += density[i] * labelError[Math.abs(i - j)];
                }
            }
        }
        return blurred;
    }

    private static double mean(TypePosterior found) {
        double mean = 0;
        for (int i = 0; i < found.size(); i++) {
            mean += found.probability(i) * found.typeNumber(i);
        }
        return mean;
    }

    private static List<Contribution> contributions(
            Sample sample, KnotLikelihood nearest, double[] inflation, TypePosterior found) {
        double type = mean(found);
        double lowGravity = 0;
        for (GravityClass gravity : GravityClass.values()) {
            lowGravity += found.probability(gravity) * GravityScale.centre(gravity);
        }
        double steps = type / TypeKnots.STEP;
        KnotLikelihood.Pull[] pulls = nearest.pulls(steps - Math.round(steps), lowGravity);
        List<Contribution> contributions = new ArrayList<>();
        for (int f = 0; f < sample.size(); f++) {
            Locus locus = sample.locus(f);
            double sigma = Math.hypot(locus.scatter(type), Math.sqrt(sample.noise(f, f)));
            contributions.add(
                    new Contribution(
                            locus.feature(),
                            (sample.value(f) - locus.mean(type, lowGravity)) / sigma,
                            pulls[f].subclass(),
                            pulls[f].share(),
                            inflation[f] > ASIDE));
        }
        return contributions;
    }
}
