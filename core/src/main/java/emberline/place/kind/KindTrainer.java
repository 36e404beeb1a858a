package emberline.place.kind;

import emberline.measure.Measurer;
import emberline.place.kind.KindFeatures.Block;
import emberline.place.reference.ReferenceRow;
import emberline.prepare.PreparedSpectrum;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.NavigableSet;
import java.util.Optional;
import java.util.TreeSet;
import java.util.function.Consumer;

/**
 * Learns kinds from reference spectra. Fed spectrum by spectrum; the same spectra in the same order
 * give the same model.
 *
 * <p>Forests and regressions learn from the spectra and from copies of them made worse ({@code
 * TrainingCopies}). Their probabilities are calibrated on objects that they did not learn from: all
 * spectra and copies of one object are on the same side.
 */
public final class KindTrainer {

    private static final int TREES = 50;
    private static final int FOLDS = 5;

    /** Fewer rows of a late dwarf or of others than this teach nothing. */
    private static final int LEAST_ROWS = 20;

    private final KindFeatures features = KindFeatures.standard();
    private final Measurer measurer;
    private final TrainingCopies copies;
    private final List<ReferenceKin> kin = new ArrayList<>();
    private final List<TrainingRow> rows = new ArrayList<>();
    private final List<FeatureVector> nonsense = new ArrayList<>();

    /**
     * A trainer.
     *
     * @param measurer what the spectra are measured with
     */
    public KindTrainer(Measurer measurer) {
        this.measurer = measurer;
        this.copies = new TrainingCopies(measurer, features);
    }

    /**
     * Adds a reference spectrum; one whose kind is not among those learned adds nothing.
     *
     * @param reference what it is
     * @param prepared the spectrum
     */
    public void add(ReferenceRow reference, PreparedSpectrum prepared) {
        Optional<ObjectKind> kind =
                ObjectKind.ofReference(reference.kind(), reference.typeNumber());
        FeatureVector vector = features.of(measurer.measure(prepared));
        if (kind.isEmpty() || Regions.covered(vector, features) == 0) {
            return;
        }
        String group = group(reference);
        kin.add(
                new ReferenceKin(
                        reference.object(),
                        group,
                        reference.typeNumber(),
                        reference.gravity(),
                        kind.get(),
                        reference.source(),
                        vector));
        rows.add(new TrainingRow(group, kind.get(), TrainingRow.AS_OBSERVED, vector));
        rows.addAll(
                copies.of(reference.object(), group, kind.get(), reference.typeNumber(), prepared));
        if (kin.size() % 4 == 0) {
            nonsense.add(features.of(measurer.measure(Nonsense.reversed(prepared))));
            double factor = kin.size() % 8 == 0 ? 0.8 : 1.2;
            nonsense.add(features.of(measurer.measure(Degraded.stretched(prepared, factor))));
        }
    }

    /** Averages of a library share a name, but are other objects. */
    private static String group(ReferenceRow reference) {
        return reference.group().contains("average") ? reference.object() : reference.group();
    }

    /**
     * Whether there is enough to learn from.
     *
     * @return true if there are late dwarfs and other objects for every fold, and some coverage has
     *     spectra of both enough
     */
    public boolean isEnough() {
        return objects(true) >= FOLDS
                && objects(false) >= FOLDS
                && Coverage.forests().stream().anyMatch(c -> isEnough(fitting(c)));
    }

    /** How many objects, whatever the number of their spectra, are late dwarfs or are none. */
    private long objects(boolean lateDwarfs) {
        return rows.stream()
                .filter(row -> (row.kind() == ObjectKind.LATE_DWARF) == lateDwarfs)
                .map(TrainingRow::group)
                .distinct()
                .count();
    }

    private List<TrainingRow> fitting(Coverage coverage) {
        return rows.stream().filter(r -> coverage.holdsFor(r.vector(), features)).toList();
    }

    /** What was learned, and how well it does on objects that were left out. */
    public record Trained(KindModel model, List<KindTrial> trials) {}

    /**
     * Learns.
     *
     * @param progress told what is being done
     * @return the model, and its trials on left-out objects
     * @throws IllegalStateException if there are too few spectra for any coverage
     */
    public Trained train(Consumer<String> progress) {
        for (PreparedSpectrum invented : Nonsense.invented(60)) {
            nonsense.add(features.of(measurer.measure(invented)));
        }
        KinTable table = new KinTable(features, kin, scatter());
        RemotenessLimits limits = RemotenessLimits.of(rows, table, features);
        Map<String, Integer> folds = folds();
        Map<Coverage, Blend> blends = new LinkedHashMap<>();
        List<Map<Coverage, Blend>> ofFold = new ArrayList<>();
        for (int fold = 0; fold < FOLDS; fold++) {
            ofFold.add(new LinkedHashMap<>());
        }
        BlendTrainer trainer = new BlendTrainer(features, TREES, FOLDS);
        for (Coverage coverage : Coverage.forests()) {
            List<TrainingRow> fit = fitting(coverage);
            if (isEnough(fit)) {
                progress.accept("kind: " + coverage.code() + ", " + fit.size() + " spectra");
                BlendTrainer.Learned learned =
                        trainer.learn(coverage, fit, r -> folds.get(r.group()));
                blends.put(coverage, learned.ofAll());
                for (int fold = 0; fold < FOLDS; fold++) {
                    ofFold.get(fold).put(coverage, learned.leftOut().get(fold));
                }
            }
        }
        if (blends.isEmpty()) {
            throw new IllegalStateException(
                    kin.size()
                            + " spectra of known kind: too few to learn kinds from; expected some"
                            + " tens of late dwarfs and of other objects");
        }
        List<KindModel> plain =
                ofFold.stream().map(f -> new KindModel(features, table, limits, f, 1)).toList();
        double power = Sharpness.ofModels(plain, rows, r -> folds.get(r.group()));
        List<KindModel> left = plain.stream().map(m -> m.withSharpness(power)).toList();
        List<KindTrial> trials =
                KindTrial.of(left, r -> folds.get(r.group()), rows, nonsense, features);
        return new Trained(new KindModel(features, table, limits, blends, power), trials);
    }

    private static boolean isEnough(List<TrainingRow> fit) {
        long dwarfs = fit.stream().filter(r -> r.kind() == ObjectKind.LATE_DWARF).count();
        return dwarfs >= LEAST_ROWS && fit.size() - dwarfs >= LEAST_ROWS;
    }

    /** Every kind is spread evenly over the folds. */
    private Map<String, Integer> folds() {
        Map<String, Integer> folds = new HashMap<>();
        int next = 0;
        for (ObjectKind kind : ObjectKind.values()) {
            NavigableSet<String> groups = new TreeSet<>();
            kin.stream().filter(k -> k.kind() == kind).forEach(k -> groups.add(k.group()));
            for (String group : groups) {
                if (!folds.containsKey(group)) {
                    folds.put(group, next++ % FOLDS);
                }
            }
        }
        return folds;
    }

    /**
     * Scatter of each broad feature between an object and its nearest kin: 1.48 times the median
     * difference beyond the noise, found twice, since the kin depend on it.
     */
    private float[] scatter() {
        float[] scatter = new float[features.size()];
        Arrays.fill(scatter, FIRST_SCATTER);
        for (int round = 0; round < 2; round++) {
            KinTable table = new KinTable(features, kin, scatter);
            float[] better = new float[scatter.length];
            List<List<Double>> differences = new ArrayList<>();
            for (int k = 0; k < scatter.length; k++) {
                differences.add(new ArrayList<>());
            }
            for (ReferenceKin row : kin) {
                table.neighbours(row.vector(), 1, row.group()).stream()
                        .findFirst()
                        .ifPresent(near -> differ(row, near.kin(), differences));
            }
            for (int k = 0; k < scatter.length; k++) {
                boolean broad = features.features().get(k).block() == Block.SHAPE;
                better[k] = broad ? (float) median(differences.get(k)) : FIRST_SCATTER;
            }
            scatter = better;
        }
        return scatter;
    }

    private static final float FIRST_SCATTER = 0.08f;
    private static final double LEAST_SCATTER = 0.02;
    private static final double SIGMA_OF_MEDIAN = 1.4826;

    private static void differ(
            ReferenceKin one, ReferenceKin other, List<List<Double>> differences) {
        for (int k = 0; k < differences.size(); k++) {
            double difference = one.vector().values()[k] - other.vector().values()[k];
            if (!Double.isNaN(difference)) {
                differences.get(k).add(Math.abs(difference));
            }
        }
    }

    private static double median(List<Double> values) {
        double[] sorted = values.stream().mapToDouble(Double::doubleValue).sorted().toArray();
        double median = sorted.length == 0 ? FIRST_SCATTER : sorted[sorted.length / 2];
        return Math.max(LEAST_SCATTER, SIGMA_OF_MEDIAN * median);
    }
}
