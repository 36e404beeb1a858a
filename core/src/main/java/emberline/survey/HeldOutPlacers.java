package emberline.survey;

import emberline.catalogue.FeatureCatalogue;
import emberline.place.Placer;
import emberline.place.calibrated.Calibration;
import emberline.place.calibrated.Calibrator;
import emberline.place.calibrated.TypePrior;
import emberline.place.reference.ReferenceTable;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.Map;

/**
 * Placers for a list of known objects that serves both to learn from and to test on: the
 * calibration is learned from the list in folds, and every object is placed by the one that has
 * seen no spectrum of it.
 */
public final class HeldOutPlacers {

    private HeldOutPlacers() {}

    /**
     * Learns the placers.
     *
     * @param table what was measured on the objects of the list
     * @param catalogue the catalogue with which was measured
     * @param prior what is thought of types before a spectrum is looked at
     * @return for each object the placer that has not learned from it; for objects from which
     *     nothing can be learned, such as giants, the one that has learned from all others
     */
    public static PlacerChoice learned(
            ReferenceTable table, FeatureCatalogue catalogue, TypePrior prior) {
        Calibrator.Outcome outcome = new Calibrator(table, catalogue).calibrate();
        IdentityHashMap<Calibration, Placer> placers = new IdentityHashMap<>();
        Map<String, Placer> byGroup = new HashMap<>();
        outcome.withoutGroup()
                .forEach(
                        (group, calibration) ->
                                byGroup.put(
                                        group,
                                        placers.computeIfAbsent(
                                                calibration,
                                                one -> new Placer(catalogue, one, prior))));
        Placer fromAll = new Placer(catalogue, outcome.calibration(), prior);
        return PlacerChoice.byGroup(group -> byGroup.getOrDefault(group, fromAll));
    }
}
