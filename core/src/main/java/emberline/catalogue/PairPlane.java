package emberline.catalogue;

import java.util.List;
import java.util.Optional;

/**
 * A spectral-blend criterion: a line in the plane of two quantities, on one side of which lie
 * unresolved pairs of dwarfs.
 *
 * @param source the paper
 * @param number number of the criterion in the paper
 * @param xFeature id of the feature on the abscissa; empty: the spectral type (subclass)
 * @param yFeature id of the feature on the ordinate
 * @param limit vertices of the limit line, x increasing, at least two; outside their range of x the
 *     criterion says nothing
 * @param pairSide on which side of the limit pairs lie
 * @param sideHowKnown how the side is known
 * @param howKnown how the vertices reached this catalogue
 * @param confidencePercent how sure it is that they are exactly as printed, 0 to 100
 * @param note a remark; may be blank
 */
public record PairPlane(
        Source source,
        int number,
        Optional<String> xFeature,
        String yFeature,
        List<Vertex> limit,
        Side pairSide,
        HowKnown sideHowKnown,
        HowKnown howKnown,
        int confidencePercent,
        String note) {

    /** A side of a limit line. */
    public enum Side {
        /** Greater y. */
        ABOVE,
        /** Smaller y. */
        BELOW
    }

    /**
     * A point of a limit line.
     *
     * @param x abscissa
     * @param y ordinate
     */
    public record Vertex(double x, double y) {}

    /** Copies the vertices and checks that they go to the right. */
    public PairPlane {
        limit = List.copyOf(limit);
        if (limit.size() < 2) {
            throw new IllegalArgumentException("plane " + number + ": expected two points or more");
        }
        for (int i = 1; i < limit.size(); i++) {
            if (!(limit.get(i).x() > limit.get(i - 1).x())) {
                throw new IllegalArgumentException("plane " + number + ": expected increasing x");
            }
        }
    }
}
