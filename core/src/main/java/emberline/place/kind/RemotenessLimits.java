package emberline.place.kind;

import emberline.place.kind.KinTable.Remoteness;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * How remote from its nearest kin a spectrum must be to be like nothing known, for each set of
 * regions. Remoteness is ln(d / sqrt(i)): d is the distance to the nearest reference object, i the
 * distance of that one to its own nearest kin, so that sparsely known objects are not all remote.
 * One that lies nearer to its kin than the scatter between like objects, 1, counts as that far: it
 * is not sparse.
 *
 * @param limits by regions: the remoteness that 0.5% of the late dwarfs exceed, their own object
 *     left out
 */
record RemotenessLimits(Map<Integer, Double> limits) {

    /** The parts in which spectra are tried. */
    static final List<Integer> PARTS =
            List.of(
                    Regions.R | Regions.Z,
                    Regions.J,
                    Regions.H,
                    Regions.K,
                    Regions.J | Regions.H | Regions.K);

    /** Share of late dwarfs beyond the limit. */
    private static final double BEYOND = 0.005;

    /** How fast the odds grow with remoteness. */
    private static final double STEEPNESS = 8;

    private static final double LEAST_ISOLATION = 1;
    private static final int LEAST_ROWS = 20;

    RemotenessLimits {
        limits = Map.copyOf(limits);
    }

    /**
     * Probability of something unknown, for the standard prior: a half at the limit.
     *
     * @param regions the regions that are covered; those without a limit take the widest one
     */
    double unlike(Remoteness found, int regions) {
        double limit =
                Optional.ofNullable(limits.get(regions))
                        .orElseGet(() -> limits.values().stream().max(Double::compare).orElse(1e9));
        return 1 / (1 + Math.exp(-STEEPNESS * (remoteness(found) - limit)));
    }

    private static double remoteness(Remoteness found) {
        return Math.log(
                (found.distance() + 1e-6)
                        / Math.sqrt(Math.max(LEAST_ISOLATION, found.isolation())));
    }

    /** Limits from the late dwarfs among the rows. */
    static RemotenessLimits of(List<TrainingRow> rows, KinTable table, KindFeatures features) {
        Map<Integer, List<Double>> found = new HashMap<>();
        for (TrainingRow row : rows) {
            if (row.kind() == ObjectKind.LATE_DWARF) {
                collect(row, table, features, found);
            }
        }
        Map<Integer, Double> limits = new HashMap<>();
        found.forEach(
                (regions, values) -> {
                    if (values.size() >= LEAST_ROWS) {
                        values.sort(null);
                        limits.put(regions, values.get((int) (values.size() * (1 - BEYOND))));
                    }
                });
        return new RemotenessLimits(limits);
    }

    private static void collect(
            TrainingRow row,
            KinTable table,
            KindFeatures features,
            Map<Integer, List<Double>> found) {
        int covered = Regions.covered(row.vector(), features);
        for (Coverage coverage : Coverage.forests()) {
            int regions = coverage.regions();
            if (!coverage.withLines() && (regions & ~covered) == 0) {
                table.remoteness(row.vector().within(regions, features), row.group())
                        .ifPresent(
                                remote ->
                                        found.computeIfAbsent(regions, r -> new ArrayList<>())
                                                .add(remoteness(remote)));
            }
        }
    }
}
