package emberline.place.kind;

import emberline.place.kind.KindFeatures.Block;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;

/**
 * The reference objects with distances in the space of features.
 *
 * <p>The distance is the root mean square difference over the broad features that both have, each
 * in units of the scatter between like objects and of the noise of both. A difference counts no
 * more than {@value #MOST} units, so that one bad window decides nothing.
 */
final class KinTable {

    /** A difference counts no more than this. */
    static final double MOST = 4;

    /** Least number of features in common. */
    static final int LEAST_IN_COMMON = 8;

    /** Least share of the features of an object that a reference must have. */
    static final double LEAST_SHARE = 0.7;

    private final List<ReferenceKin> rows;
    private final float[] scatter;
    private final int[] columns;

    /**
     * A table.
     *
     * @param features the features
     * @param rows the reference objects
     * @param scatter scatter of each feature between like objects
     */
    KinTable(KindFeatures features, List<ReferenceKin> rows, float[] scatter) {
        this.rows = List.copyOf(rows);
        this.scatter = scatter;
        this.columns = columns(features);
    }

    /** Positions of the features that are compared: those that hold at any resolution. */
    static int[] columns(KindFeatures features) {
        List<Integer> broad = new ArrayList<>();
        for (int k = 0; k < features.size(); k++) {
            if (features.features().get(k).block() == Block.SHAPE) {
                broad.add(k);
            }
        }
        return broad.stream().mapToInt(Integer::intValue).toArray();
    }

    int[] columns() {
        return columns;
    }

    List<ReferenceKin> rows() {
        return rows;
    }

    float[] scatter() {
        return scatter;
    }

    /** A reference object with its distance. */
    record Neighbour(ReferenceKin kin, double distance, int inCommon) {}

    /**
     * How far an object is from its nearest kin, and that kin from its own.
     *
     * @param distance distance to the nearest reference object
     * @param isolation distance of that reference object to its own nearest kin, over the features
     *     that the object has
     */
    record Remoteness(double distance, double isolation) {}

    /** The nearest reference objects of other groups with enough in common, nearest first. */
    List<Neighbour> neighbours(FeatureVector vector, int most, String withoutGroup) {
        return nearest(vector, vector, most, row -> !row.group().equals(withoutGroup));
    }

    /** How remote an object is; empty where no reference has enough in common with it. */
    Optional<Remoteness> remoteness(FeatureVector vector, String withoutGroup) {
        List<Neighbour> near = neighbours(vector, 1, withoutGroup);
        if (near.isEmpty()) {
            return Optional.empty();
        }
        Neighbour nearest = near.get(0);
        ReferenceKin kin = nearest.kin();
        double isolation =
                nearest(
                                kin.vector(),
                                vector,
                                1,
                                row ->
                                        !row.group().equals(kin.group())
                                                && !row.group().equals(withoutGroup))
                        .stream()
                        .mapToDouble(Neighbour::distance)
                        .findFirst()
                        .orElse(nearest.distance());
        return Optional.of(new Remoteness(nearest.distance(), isolation));
    }

    /**
     * The nearest reference objects over the features that a mask has.
     *
     * <p>A comparison ends as soon as it cannot be among the nearest.
     */
    private List<Neighbour> nearest(
            FeatureVector one, FeatureVector mask, int most, Predicate<ReferenceKin> allowed) {
        Wanted wanted = wanted(one, mask);
        List<Neighbour> near = new ArrayList<>();
        for (ReferenceKin row : rows) {
            double worst =
                    near.size() < most ? Double.POSITIVE_INFINITY : near.get(most - 1).distance();
            if (allowed.test(row)) {
                Optional<Neighbour> compared =
                        compare(wanted, row, worst * worst * wanted.columns.length);
                if (compared.isPresent() && compared.get().distance() < worst) {
                    Neighbour found = compared.get();
                    int place = near.size();
                    while (place > 0 && near.get(place - 1).distance() > found.distance()) {
                        place--;
                    }
                    near.add(place, found);
                    if (near.size() > most) {
                        near.remove(most);
                    }
                }
            }
        }
        return near;
    }

    /** The features of an object to compare, and how many of them a reference must have. */
    @SuppressWarnings("ArrayRecordComponent") // never compared
    private record Wanted(int[] columns, double[] values, double[] variances, int least) {}

    private Wanted wanted(FeatureVector one, FeatureVector mask) {
        int[] own = Arrays.stream(columns).filter(k -> one.has(k) && mask.has(k)).toArray();
        double[] values = new double[own.length];
        double[] variances = new double[own.length];
        for (int i = 0; i < own.length; i++) {
            int k = own[i];
            values[i] = one.values()[k];
            variances[i] = scatter[k] * scatter[k] + one.sigmas()[k] * one.sigmas()[k];
        }
        int least = (int) Math.max(LEAST_IN_COMMON, Math.ceil(LEAST_SHARE * own.length));
        return new Wanted(own, values, variances, least);
    }

    /** The comparison; empty if too little is in common or the sum goes beyond the greatest. */
    private static Optional<Neighbour> compare(Wanted one, ReferenceKin other, double greatest) {
        double[] others = other.vector().values();
        double[] otherSigmas = other.vector().sigmas();
        double sum = 0;
        int count = 0;
        for (int i = 0; i < one.columns.length; i++) {
            int k = one.columns[i];
            double difference = one.values[i] - others[k];
            if (!Double.isNaN(difference)) { // NaN where the other has none
                double variance = one.variances[i] + otherSigmas[k] * otherSigmas[k];
                sum += Math.min(MOST * MOST, difference * difference / variance);
                count++;
                if (sum > greatest) {
                    return Optional.empty();
                }
            }
        }
        return count < one.least
                ? Optional.empty()
                : Optional.of(new Neighbour(other, Math.sqrt(sum / count), count));
    }
}
