package emberline.catalogue;

import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** What ties features and relations together. */
final class CatalogueLinks {

    private CatalogueLinks() {}

    /** The solar TiO5 curve of a metallicity shortfall: same paper, same argument. */
    static Optional<Relation> solarCurve(Feature shortfall, List<Relation> relations) {
        if (shortfall.form() != Form.METALLICITY_SHORTFALL) {
            return Optional.empty();
        }
        String argument = shortfall.parts(PartRole.ARGUMENT).get(0).feature();
        return relations.stream()
                .filter(relation -> relation.quantity() == Quantity.SOLAR_TIO5)
                .filter(relation -> relation.feature().equals(argument))
                .filter(relation -> relation.source().key().equals(shortfall.source().key()))
                .findFirst();
    }

    /** Checks that no feature is a part of itself and that every shortfall has its curve. */
    static void check(String label, List<Feature> features, List<Relation> relations)
            throws InvalidCatalogueException {
        Map<String, Feature> byId = new HashMap<>();
        features.forEach(feature -> byId.put(feature.id(), feature));
        for (Feature feature : features) {
            if (reaches(feature, feature.id(), byId, new HashSet<>())) {
                throw new InvalidCatalogueException(
                        label + ", parts/",
                        "feature '" + feature.id() + "' is a part of itself",
                        "parts that lead to features with windows",
                        "Break the circle.");
            }
            if (feature.form() == Form.METALLICITY_SHORTFALL
                    && solarCurve(feature, relations).isEmpty()) {
                throw new InvalidCatalogueException(
                        label + ", relations/",
                        "feature '" + feature.id() + "' has no solar curve",
                        "a relation of quantity SOLAR_TIO5 of source "
                                + feature.source().key()
                                + " in its ARGUMENT",
                        "Add the relation.");
            }
        }
    }

    private static boolean reaches(
            Feature from, String id, Map<String, Feature> byId, Set<String> visited) {
        for (Part part : from.parts()) {
            if (part.feature().equals(id)) {
                return true;
            }
            Feature next = byId.get(part.feature());
            if (next != null && visited.add(next.id()) && reaches(next, id, byId, visited)) {
                return true;
            }
        }
        return false;
    }
}
