package emberline.place.standard;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.IntPredicate;

/**
 * Looks for the sum of two standards that fits best, and for the single object that fits best.
 *
 * <p>The scales of a sum are free but positive; standards need not be on one flux scale, so their
 * ratio is free too, except that the {@link FluxRatio absolute magnitudes} of both types must allow
 * it. Two standards that stand at most {@value #NEIGHBOURS} subclasses apart, in any ratio, pass as
 * a single object between them: a list has gaps, and what lies in one is no pair. So pairs of more
 * alike components are not found.
 */
final class PairSearch {

    /** Standards no further apart than this stand for a single object between them (subclass). */
    static final double NEIGHBOURS = 3;

    /** Fewest bins of a fit. */
    private static final int LEAST_BINS = 15;

    /** So many sums of either sort are fitted in full after a first look. */
    private static final int FOLLOWED = 300;

    private final StandardLibrary.Level level;
    private final Collection<Range> ranges;

    PairSearch(StandardLibrary.Level level, Collection<Range> ranges) {
        this.level = level;
        this.ranges = ranges;
    }

    /** A sum after a first look; the first standard is the earlier one. */
    private record Sum(int first, int second, double chiSquare) {}

    /** The best single object and the best sum, of the standards that are allowed. */
    Optional<PairFit> fit(Binned object, IntPredicate allowed) {
        ScaleFit.Target target = new ScaleFit.Target(object, ranges);
        int[] usable = level.covering(ranges, allowed);
        double[][] fluxes = new double[level.size()][];
        Optional<StandardMatch> single = Optional.empty();
        for (int k : usable) {
            fluxes[k] = target.of(level.binned(k));
            single = better(level.single(target, k), single);
        }
        List<Sum> between = new ArrayList<>();
        List<Sum> pairs = new ArrayList<>();
        for (int i = 0; i < usable.length; i++) {
            for (int k = i + 1; k < usable.length; k++) {
                lookAt(target, fluxes, usable[i], usable[k], between, pairs);
            }
        }
        for (Sum sum : best(between)) {
            single = better(match(target, fluxes, sum, false), single);
        }
        Optional<StandardMatch> pair = Optional.empty();
        for (Sum sum : best(pairs)) {
            pair = better(match(target, fluxes, sum, true), pair);
        }
        return single.isEmpty() || pair.isEmpty()
                ? Optional.empty()
                : Optional.of(new PairFit(single.get(), pair.get(), OptionalDouble.empty()));
    }

    private static Optional<StandardMatch> better(
            Optional<StandardMatch> one, Optional<StandardMatch> best) {
        boolean isBetter =
                one.isPresent()
                        && (best.isEmpty()
                                || one.get().reducedChiSquare() < best.get().reducedChiSquare());
        return isBetter ? one : best;
    }

    private void lookAt(
            ScaleFit.Target target,
            double[][] fluxes,
            int one,
            int other,
            List<Sum> between,
            List<Sum> pairs) {
        double apart = level.standard(other).typeNumber() - level.standard(one).typeNumber();
        int first = apart >= 0 ? one : other;
        int second = apart >= 0 ? other : one;
        ScaleFit.rough(target, fluxes[first], fluxes[second])
                .filter(fit -> fit.bins() >= LEAST_BINS)
                .ifPresent(
                        fit ->
                                (Math.abs(apart) <= NEIGHBOURS ? between : pairs)
                                        .add(new Sum(first, second, fit.chiSquare())));
    }

    private static List<Sum> best(List<Sum> sums) {
        return sums.stream()
                .sorted(Comparator.comparingDouble(Sum::chiSquare))
                .limit(FOLLOWED)
                .toList();
    }

    private Optional<StandardMatch> match(
            ScaleFit.Target target, double[][] fluxes, Sum sum, boolean isPair) {
        return ScaleFit.two(target, fluxes[sum.first()], fluxes[sum.second()])
                .filter(
                        fit ->
                                !isPair
                                        || FluxRatio.allows(
                                                level, ranges, sum.first(), sum.second(), fit))
                .map(
                        fit ->
                                new StandardMatch(
                                        level.standard(sum.first()),
                                        Optional.of(level.standard(sum.second())),
                                        fit.a(),
                                        fit.b(),
                                        fit.chiSquare(),
                                        fit.bins() - 2));
    }
}
