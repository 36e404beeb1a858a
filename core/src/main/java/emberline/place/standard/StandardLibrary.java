package emberline.place.standard;

import java.util.Arrays;
import java.util.Collection;
import java.util.Comparator;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.NavigableMap;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeMap;
import java.util.concurrent.ConcurrentHashMap;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;

/**
 * The standards of a run, put into bins once for each resolving power at which objects are
 * compared. Safe for use by several threads.
 */
final class StandardLibrary {

    /** The resolving powers at which is compared; features of cool dwarfs are broader than 1/60. */
    private static final List<Integer> POWERS = List.of(60, 80, 100, 120);

    /** Fewest bins of a fit. */
    private static final int LEAST_BINS = 5;

    /** Fewest single objects by which false alarms are judged. */
    private static final int FEWEST_SINGLES = 19;

    /** Of more standards so many, evenly over the types, are compared with the others for that. */
    private static final int MOST_SINGLES = 120;

    private final List<Standard> standards;
    private final double coarsest;
    private final Map<Integer, Level> levels = new ConcurrentHashMap<>();

    StandardLibrary(List<Standard> standards) {
        this.standards = List.copyOf(standards);
        this.coarsest =
                standards.stream()
                        .mapToDouble(s -> s.prepared().resolvingPower().value())
                        .min()
                        .orElse(POWERS.get(0));
    }

    /** The standards in bins for an object of a resolving power. */
    Level level(double resolvingPower) {
        double finest = Math.min(coarsest, resolvingPower);
        int power = POWERS.get(0);
        for (int candidate : POWERS) {
            power = candidate <= finest ? candidate : power;
        }
        return levels.computeIfAbsent(power, p -> new Level(standards, new CommonGrid(p)));
    }

    /** The standards on one grid. */
    static final class Level {
        private final CommonGrid grid;
        private final List<Standard> standards;
        private final List<Binned> binned;
        private final List<Set<Range>> covered;
        private final Map<Set<Range>, double[]> ratios = new ConcurrentHashMap<>();

        Level(List<Standard> standards, CommonGrid grid) {
            this.grid = grid;
            this.standards = standards;
            this.binned = standards.stream().map(s -> grid.of(s.prepared())).toList();
            this.covered = binned.stream().map(Binned::covered).toList();
        }

        CommonGrid grid() {
            return grid;
        }

        int size() {
            return standards.size();
        }

        Standard standard(int k) {
            return standards.get(k);
        }

        Binned binned(int k) {
            return binned.get(k);
        }

        /** The fit of one standard; empty where it shares too few bins. */
        Optional<StandardMatch> single(ScaleFit.Target target, int k) {
            return ScaleFit.one(target, target.of(binned.get(k)))
                    .filter(fit -> fit.bins() >= LEAST_BINS)
                    .map(
                            fit ->
                                    new StandardMatch(
                                            standards.get(k),
                                            Optional.empty(),
                                            fit.a(),
                                            0,
                                            fit.chiSquare(),
                                            fit.bins() - 1));
        }

        /**
         * The share of single objects that a sum improves at least as much as by a ratio, one added
         * on both sides; empty where the standards are too few to tell.
         */
        OptionalDouble pFalseAlarm(Collection<Range> ranges, double ratio) {
            double[] all = ratios.computeIfAbsent(EnumSet.copyOf(ranges), set -> leftOut(set));
            if (all.length < FEWEST_SINGLES) {
                return OptionalDouble.empty();
            }
            long asGood = Arrays.stream(all).filter(one -> one >= ratio).count();
            return OptionalDouble.of((asGood + 1.0) / (all.length + 1.0));
        }

        /** The ratio of standards, each compared with those of other objects. */
        private double[] leftOut(Set<Range> ranges) {
            PairSearch search = new PairSearch(this, ranges);
            int[] covering =
                    Arrays.stream(covering(ranges, k -> true))
                            .boxed()
                            .sorted(Comparator.comparingDouble(k -> standards.get(k).typeNumber()))
                            .mapToInt(Integer::intValue)
                            .toArray();
            int taken = Math.min(MOST_SINGLES, covering.length);
            return IntStream.range(0, taken)
                    .map(i -> covering[(int) ((long) i * covering.length / taken)])
                    .mapToObj(k -> search.fit(binned.get(k), others(k)))
                    .mapToDouble(fit -> fit.map(PairFit::ratio).orElse(1.0))
                    .toArray();
        }

        private IntPredicate others(int k) {
            String group = standards.get(k).group();
            return other -> !standards.get(other).group().equals(group);
        }

        /** The standards that cover some ranges, of those that are allowed. */
        int[] covering(Collection<Range> ranges, IntPredicate allowed) {
            return IntStream.range(0, size())
                    .filter(allowed)
                    .filter(k -> covered.get(k).containsAll(ranges))
                    .toArray();
        }
    }

    /** The ranges that an object and most standards share: most bins times standards. */
    static List<Range> common(Level level, Binned object, IntPredicate allowed) {
        List<Range> covered = List.copyOf(object.covered());
        NavigableMap<Long, List<Range>> byWorth = new TreeMap<>();
        for (int mask = 1; mask < 1 << covered.size(); mask++) {
            int chosen = mask;
            List<Range> ranges =
                    IntStream.range(0, covered.size())
                            .filter(k -> (chosen >> k & 1) == 1)
                            .mapToObj(covered::get)
                            .toList();
            long count = level.covering(ranges, allowed).length;
            if (count > 0) {
                byWorth.put(count * object.good(ranges), ranges);
            }
        }
        return byWorth.isEmpty() ? List.of() : byWorth.lastEntry().getValue();
    }
}
