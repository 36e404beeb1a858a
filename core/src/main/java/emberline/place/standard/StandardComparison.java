package emberline.place.standard;

import emberline.place.standard.CommonGrid.Binned;
import emberline.prepare.PreparedSpectrum;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.apache.commons.statistics.distribution.FDistribution;

/**
 * Compares an object with standards by weighted chi-square with free scales.
 *
 * <p>The weight of a bin is one over the squares of the noise of the object, of the noise of the
 * scaled standards, and of {@value #FLOOR} of the flux: no two dwarfs of one type are alike to
 * better than that, and calibrations are not.
 */
public final class StandardComparison {

    /** Share of the flux by which like objects differ. */
    static final double FLOOR = 0.05;

    private static final double COARSEST = 60;
    private static final double FINEST = 120;
    private static final int LEAST_BINS = 5;

    /** A wavelength range in which a comparison is made. */
    public enum Range {
        /** 0.98 to 1.10 micron. */
        Y(0.98, 1.10),
        /** 1.10 to 1.34 micron. */
        J(1.10, 1.34),
        /** 1.45 to 1.80 micron. */
        H(1.45, 1.80),
        /** 1.98 to 2.38 micron. */
        K(1.98, 2.38);

        private final double lowMicron;
        private final double highMicron;

        Range(double lowMicron, double highMicron) {
            this.lowMicron = lowMicron;
            this.highMicron = highMicron;
        }

        private double[] edges() {
            return new double[] {lowMicron, highMicron};
        }
    }

    private final List<Standard> standards;

    /**
     * A comparison.
     *
     * @param standards what to compare with
     */
    public StandardComparison(List<Standard> standards) {
        this.standards = List.copyOf(standards);
    }

    /**
     * The single standards that fit best over some ranges.
     *
     * @param prepared the object
     * @param ranges where to compare, each range scaled together with the others
     * @return matches, the best first; standards that share too few bins are left out
     */
    public List<StandardMatch> singles(PreparedSpectrum prepared, List<Range> ranges) {
        Grid grid = grid(prepared, ranges);
        List<StandardMatch> matches = new ArrayList<>();
        for (int k = 0; k < standards.size(); k++) {
            single(grid, k).ifPresent(matches::add);
        }
        matches.sort(Comparator.comparingDouble(StandardMatch::reducedChiSquare));
        return matches;
    }

    /**
     * The type by the standards that fit best: the mean of the types weighted by exp(-chi-square /
     * 2 / best reduced chi-square), and its spread.
     *
     * @param matches matches, the best first
     * @return type number and one-sigma spread with at least half a subclass; empty where nothing
     *     matches
     */
    public static Optional<double[]> type(List<StandardMatch> matches) {
        if (matches.isEmpty()) {
            return Optional.empty();
        }
        double unit = Math.max(1, matches.get(0).reducedChiSquare());
        double least = matches.get(0).reducedChiSquare() * matches.get(0).degreesOfFreedom();
        double weights = 0;
        double sum = 0;
        double squares = 0;
        for (StandardMatch match : matches) {
            double chi = match.reducedChiSquare() * matches.get(0).degreesOfFreedom();
            double weight = Math.exp(-(chi - least) / (2 * unit * BINS_PER_DEGREE));
            double type = match.first().typeNumber();
            weights += weight;
            sum += weight * type;
            squares += weight * type * type;
        }
        double mean = sum / weights;
        double spread = Math.sqrt(Math.max(0, squares / weights - mean * mean));
        return Optional.of(new double[] {mean, Math.max(0.5, spread)});
    }

    /** Differences between objects are shared by neighbouring bins; so many count as one. */
    private static final double BINS_PER_DEGREE = 5;

    /**
     * The best sum of two against the best single standard.
     *
     * @param single the best single standard
     * @param pair the best sum of two standards of different types
     * @param confidence confidence that the sum is better, 0 to 1, by the F test of the ratio of
     *     the reduced chi-squares, each at least 1, since a fit within the noise and the scatter
     *     between like objects cannot be improved; differences between objects run over several
     *     bins, so that five bins count as one degree of freedom
     */
    public record PairFit(StandardMatch single, StandardMatch pair, double confidence) {}

    /**
     * Fits sums of two standards of different types. The scales are free but not negative.
     * Standards need not be on one flux scale: a pair is kept only if both parts matter.
     *
     * @param prepared the object
     * @param ranges where to compare
     * @return the fit; empty with fewer than two standards that share enough bins
     */
    public Optional<PairFit> pair(PreparedSpectrum prepared, List<Range> ranges) {
        Grid grid = grid(prepared, ranges);
        StandardMatch bestSingle = null;
        StandardMatch bestPair = null;
        for (int a = 0; a < standards.size(); a++) {
            Optional<StandardMatch> single = single(grid, a);
            if (single.isPresent() && isBetter(single.get(), bestSingle)) {
                bestSingle = single.get();
            }
            for (int b = 0; b < standards.size(); b++) {
                if (standards.get(b).typeNumber() > standards.get(a).typeNumber()) {
                    Optional<StandardMatch> sum = sum(grid, a, b);
                    if (sum.isPresent() && isBetter(sum.get(), bestPair)) {
                        bestPair = sum.get();
                    }
                }
            }
        }
        if (bestSingle == null || bestPair == null) {
            return Optional.empty();
        }
        return Optional.of(new PairFit(bestSingle, bestPair, confidence(bestSingle, bestPair)));
    }

    private static boolean isBetter(StandardMatch one, StandardMatch other) {
        return other == null || one.reducedChiSquare() < other.reducedChiSquare();
    }

    private static double confidence(StandardMatch single, StandardMatch pair) {
        double ratio =
                Math.max(1, single.reducedChiSquare()) / Math.max(1, pair.reducedChiSquare());
        return FDistribution.of(
                        Math.max(1, single.degreesOfFreedom() / BINS_PER_DEGREE),
                        Math.max(1, pair.degreesOfFreedom() / BINS_PER_DEGREE))
                .cumulativeProbability(ratio);
    }

    /** The object and the standards on one grid. */
    private record Grid(Binned object, List<Binned> standards) {}

    private Grid grid(PreparedSpectrum prepared, List<Range> ranges) {
        double coarsest = Math.min(FINEST, prepared.resolvingPower().value());
        for (Standard standard : standards) {
            coarsest = Math.min(coarsest, standard.prepared().resolvingPower().value());
        }
        CommonGrid grid =
                CommonGrid.over(
                        ranges.stream().map(Range::edges).toList(), Math.max(COARSEST, coarsest));
        return new Grid(
                grid.of(prepared), standards.stream().map(s -> grid.of(s.prepared())).toList());
    }

    private Optional<StandardMatch> single(Grid grid, int k) {
        return ScaleFit.one(grid.object(), grid.standards().get(k))
                .filter(fit -> fit.bins() >= LEAST_BINS)
                .map(
                        fit ->
                                new StandardMatch(
                                        standards.get(k),
                                        standards.get(k),
                                        false,
                                        fit.a(),
                                        0,
                                        fit.chiSquare(),
                                        fit.bins() - 1));
    }

    private Optional<StandardMatch> sum(Grid grid, int a, int b) {
        return ScaleFit.two(grid.object(), grid.standards().get(a), grid.standards().get(b))
                .filter(fit -> fit.bins() >= LEAST_BINS)
                .map(
                        fit ->
                                new StandardMatch(
                                        standards.get(a),
                                        standards.get(b),
                                        true,
                                        fit.a(),
                                        fit.b(),
                                        fit.chiSquare(),
                                        fit.bins() - 2));
    }
}
