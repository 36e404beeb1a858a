package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Quantity;
import emberline.catalogue.Relation;
import emberline.place.calibrated.TrainingSet.Point;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class RelationAnchorsTest {

    /** Each anchor is the index at which a published relation gives its type. */
    @Test
    void anchorsLieOnTheirRelations() {
        FeatureCatalogue catalogue = FeatureCatalogue.standard();
        Map<String, List<Point>> anchors = RelationAnchors.of(catalogue);
        assertTrue(anchors.containsKey("burgasser2006/ch4-h"), anchors.keySet().toString());
        anchors.forEach(
                (feature, points) -> {
                    for (Point point : points) {
                        double nearest =
                                catalogue.relations(Quantity.SPECTRAL_TYPE).stream()
                                        .filter(relation -> relation.feature().equals(feature))
                                        .mapToDouble(relation -> difference(relation, point))
                                        .min()
                                        .orElseThrow();
                        assertEquals(0, nearest, 1e-3, feature + " at " + point.typeNumber());
                        assertTrue(point.typeNumber() >= 19 && point.ownScatter() > 0, feature);
                    }
                });
    }

    private static double difference(Relation relation, Point point) {
        return Math.abs(relation.value(point.value()) - point.typeNumber());
    }
}
