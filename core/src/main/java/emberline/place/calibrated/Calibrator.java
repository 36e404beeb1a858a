package emberline.place.calibrated;

import emberline.catalogue.FeatureCatalogue;
import emberline.place.TypePosterior;
import emberline.place.reference.ReferenceRow;
import emberline.place.reference.ReferenceTable;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * Learns the calibration from a reference table, and tests it by cross-validation: the objects are
 * dealt into folds, and each is placed by a calibration that has not seen it. All spectra of one
 * object stand in the same fold.
 */
public final class Calibrator {

    /** Number of folds of the cross-validation. */
    public static final int FOLDS = 10;

    /** The label error before it is known; wide enough not to shape the fit. */
    private static final LabelError UNKNOWN = new LabelError(0.5, 1.5, 0.1);

    /** A locus needs at least this many spectra. */
    private static final int FEWEST_SPECTRA = 12;

    private final TrainingSet training;
    private final List<String> features;
    private final TypePrior prior;

    /**
     * A calibrator.
     *
     * @param table what was measured on objects of known type
     * @param catalogue published relations, which anchor the loci where objects are scarce
     */
    public Calibrator(ReferenceTable table, FeatureCatalogue catalogue) {
        this.training = TrainingSet.of(table, RelationAnchors.of(catalogue));
        this.features = LocusFeatures.among(table);
        this.prior = TypePriors.FLAT.load();
    }

    /**
     * An object placed by a calibration that has not seen it.
     *
     * @param row the object
     * @param placed what the calibrated witness says; empty posterior where too little was measured
     */
    public record Unseen(ReferenceRow row, CalibratedType placed) {}

    /**
     * What was learned, and how well it does.
     *
     * @param calibration from all objects
     * @param unseen all dwarfs of known type, each placed without having been learned from
     * @param withoutGroup by the name of a group the calibration that has not seen its spectra;
     *     groups from which nothing was learned are absent
     */
    public record Outcome(
            Calibration calibration, List<Unseen> unseen, Map<String, Calibration> withoutGroup) {

        /** Copies the collections. */
        public Outcome {
            unseen = List.copyOf(unseen);
            withoutGroup = Map.copyOf(withoutGroup);
        }
    }

    /**
     * Learns and cross-validates.
     *
     * @return the calibration and the objects placed unseen
     */
    public Outcome calibrate() {
        Map<String, Integer> fold = folds();
        Map<Integer, Calibration> withoutFold = new LinkedHashMap<>();
        List<LabelFit.Labelled> labelled = new ArrayList<>();
        for (int f = 0; f < FOLDS; f++) {
            Calibration learned = learn(training.without(groups(fold, f)));
            withoutFold.put(f, learned);
            CalibratedWitness witness = new CalibratedWitness(learned, prior);
            for (TrainingSet.Dwarf dwarf : training.dwarfs()) {
                if (fold.get(dwarf.row().group()) == f) {
                    Optional<TypePosterior> posterior =
                            witness.withoutLabelError(Sample.of(learned, dwarf.row().features()));
                    posterior.ifPresent(
                            found ->
                                    labelled.add(
                                            new LabelFit.Labelled(
                                                    found, dwarf.typeNumber(), dwarf.row())));
                }
            }
        }
        LabelError error = LabelFit.fit(labelled);
        List<Unseen> unseen = new ArrayList<>();
        for (TrainingSet.Dwarf dwarf : training.dwarfs()) {
            Calibration learned = withoutFold.get(fold.get(dwarf.row().group())).with(error);
            unseen.add(
                    new Unseen(
                            dwarf.row(),
                            new CalibratedWitness(learned, prior)
                                    .witness(Sample.of(learned, dwarf.row().features()))));
        }
        withoutFold.replaceAll((number, learned) -> learned.with(error));
        Map<String, Calibration> withoutGroup = new LinkedHashMap<>();
        fold.forEach((group, number) -> withoutGroup.put(group, withoutFold.get(number)));
        return new Outcome(learn(training).with(error), unseen, withoutGroup);
    }

    private Calibration learn(TrainingSet from) {
        List<Locus> loci = new ArrayList<>();
        for (String feature : features) {
            List<TrainingSet.Point> points = from.points(feature);
            if (points.size() >= FEWEST_SPECTRA) {
                loci.add(LocusFit.fit(feature, points));
            }
        }
        return new Calibration(loci, ResidualCorrelation.of(loci, from.dwarfs()), UNKNOWN);
    }

    /** Deals the objects into folds, along the sequence, so that every fold spans it. */
    private Map<String, Integer> folds() {
        Map<String, Integer> fold = new LinkedHashMap<>();
        List<TrainingSet.Dwarf> alongSequence = new ArrayList<>(training.dwarfs());
        alongSequence.sort(
                Comparator.comparingDouble(TrainingSet.Dwarf::typeNumber)
                        .thenComparing(dwarf -> dwarf.row().group()));
        for (TrainingSet.Dwarf dwarf : alongSequence) {
            fold.putIfAbsent(dwarf.row().group(), fold.size() % FOLDS);
        }
        return fold;
    }

    private static Set<String> groups(Map<String, Integer> fold, int number) {
        return fold.entrySet().stream()
                .filter(entry -> entry.getValue() == number)
                .map(Map.Entry::getKey)
                .collect(Collectors.toSet());
    }
}
