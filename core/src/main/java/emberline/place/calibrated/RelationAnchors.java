package emberline.place.calibrated;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Quantity;
import emberline.catalogue.Relation;
import emberline.place.calibrated.TrainingSet.Point;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * Published relations as a second leg of the loci where spectra of known type are scarce: of the T
 * dwarfs. Each relation that the trial confirmed is turned round, and gives the value of its
 * feature at a row of types, with its rms as the scatter.
 */
final class RelationAnchors {

    /** Earliest type of an anchor: L9. */
    private static final double FROM_TYPE = 19;

    /** Distance of anchors (subclass). */
    private static final double STEP = 0.5;

    /** Weight of an anchor, one spectrum of the best tier having weight 1. */
    private static final double WEIGHT = 1;

    /** Number of cells in which a relation is searched for a type. */
    private static final int CELLS = 2000;

    private RelationAnchors() {}

    /**
     * The anchors that a catalogue gives.
     *
     * @param catalogue the relations
     * @return anchors by feature
     */
    static Map<String, List<Point>> of(FeatureCatalogue catalogue) {
        Map<String, List<Point>> anchors = new LinkedHashMap<>();
        for (Relation relation : catalogue.relations(Quantity.SPECTRAL_TYPE)) {
            if (relation.verdict() == Relation.Verdict.CONFIRMED
                    && relation.rms().isPresent()
                    && relation.validTypeMax().orElse(0) > FROM_TYPE
                    && relation.validIndexMin().isPresent()
                    && relation.validIndexMax().isPresent()) {
                anchors.computeIfAbsent(relation.feature(), feature -> new ArrayList<>())
                        .addAll(of(relation));
            }
        }
        return anchors;
    }

    private static List<Point> of(Relation relation) {
        List<Point> points = new ArrayList<>();
        double from = Math.max(FROM_TYPE, relation.validTypeMin().orElse(FROM_TYPE));
        for (double type = from; type <= relation.validTypeMax().getAsDouble(); type += STEP) {
            OptionalDouble index = index(relation, type);
            if (index.isPresent()) {
                double slope = relation.slope(index.getAsDouble());
                points.add(
                        new Point(
                                type,
                                0,
                                WEIGHT,
                                index.getAsDouble(),
                                0,
                                Math.abs(relation.rms().getAsDouble() / slope)));
            }
        }
        return points;
    }

    /** The index at which a relation gives a type; empty where there is none or several. */
    private static OptionalDouble index(Relation relation, double type) {
        double low = relation.validIndexMin().orElseThrow();
        double step = (relation.validIndexMax().orElseThrow() - low) / CELLS;
        OptionalDouble found = OptionalDouble.empty();
        for (int i = 0; i < CELLS; i++) {
            double here = relation.value(low + i * step) - type;
            double next = relation.value(low + (i + 1) * step) - type;
            if (here == 0 || here * next < 0) {
                if (found.isPresent()) {
                    return OptionalDouble.empty();
                }
                found = OptionalDouble.of(low + (i + here / (here - next)) * step);
            }
        }
        return found;
    }
}
