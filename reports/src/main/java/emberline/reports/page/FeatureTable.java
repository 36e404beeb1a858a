package emberline.reports.page;

import emberline.catalogue.Band;
import emberline.catalogue.Feature;
import emberline.catalogue.HowKnown;
import emberline.catalogue.Purpose;
import emberline.catalogue.Source;
import emberline.measure.FeatureMeasurement;
import emberline.measure.Measurement.Measured;
import emberline.place.GravityScore;
import emberline.place.Placement;
import emberline.place.RelationEstimate;
import emberline.place.RelationEstimate.Use;
import emberline.place.calibrated.Contribution;
import emberline.reports.attach.Digits;
import emberline.reports.attach.TypeText;
import emberline.reports.page.Line.Cell;
import emberline.survey.ObjectResult;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * The measured features as rows: those that carried type or gravity, with what each said and did,
 * apart from those that were measured only.
 */
final class FeatureTable {

    /** Share of a window in telluric bands from which a feature is marked. */
    private static final double MOSTLY_TELLURIC = 0.5;

    private static final float SYMBOL_WIDTH = 49;
    private static final float MARK_END = 57;
    private static final float MARK_WIDTH = 9;
    private static final float PULL_WIDTH = 20;
    private static final float SAYS_WIDTH = 22;

    private final ReportDocument document;
    private final Styles styles;
    private final List<FeatureMeasurement> measured;
    private final Map<String, Contribution> contributions = new HashMap<>();
    private final Map<String, RelationEstimate> estimates = new HashMap<>();
    private final Map<String, GravityScore> scores = new HashMap<>();

    FeatureTable(ReportDocument document, ObjectResult result) {
        this.document = document;
        this.styles = document.styles();
        Placement placement = result.placement().orElseThrow();
        this.measured =
                result.best().orElseThrow().all().stream()
                        .filter(m -> m.feature().purpose() != Purpose.KIND)
                        .filter(m -> m.result() instanceof Measured)
                        .sorted(Comparator.comparing(m -> m.feature().band()))
                        .toList();
        placement.calibrated().contributions().forEach(c -> contributions.put(c.feature(), c));
        placement.published().estimates().stream()
                .filter(e -> e.type().isPresent())
                .forEach(
                        e ->
                                estimates.merge(
                                        e.relation().feature(),
                                        e,
                                        (a, b) -> a.use().compareTo(b.use()) <= 0 ? a : b));
        placement.gravity().scores().stream()
                .filter(s -> s.score().isPresent())
                .forEach(s -> scores.put(s.feature().id(), s));
    }

    /** The features that carried type or gravity, by band. */
    List<FeatureMeasurement> leading(Fullness fullness) {
        return measured.stream().filter(m -> leads(m, fullness)).toList();
    }

    /** All others: those of which a relation says something first, then those of papers cited. */
    List<FeatureMeasurement> others(Fullness fullness) {
        Set<Source> cited = new HashSet<>();
        leading(fullness).forEach(m -> cited.add(m.feature().source()));
        return measured.stream()
                .filter(m -> !leads(m, fullness))
                .sorted(Comparator.comparingInt(m -> rank(m, cited)))
                .toList();
    }

    private int rank(FeatureMeasurement measurement, Set<Source> cited) {
        String id = measurement.feature().id();
        if (contributions.containsKey(id)) {
            return 0;
        }
        if (estimates.containsKey(id)) {
            return 1;
        }
        return cited.contains(measurement.feature().source()) ? 2 : 3;
    }

    private boolean leads(FeatureMeasurement measurement, Fullness fullness) {
        String id = measurement.feature().id();
        RelationEstimate estimate = estimates.get(id);
        if (scores.containsKey(id)
                || (estimate != null
                        && (estimate.use() == Use.COMBINED || estimate.use() == Use.DISAGREES))) {
            return true;
        }
        Contribution pull = contributions.get(id);
        double least = fullness.leastPullSubclass();
        return pull != null
                && (Math.abs(pull.pullSubclass()) >= least || pull.share() >= 2 * least);
    }

    /** The symbols of those of these that entered the type. */
    List<String> entered(List<FeatureMeasurement> features) {
        return features.stream()
                .map(FeatureMeasurement::feature)
                .filter(feature -> contributions.containsKey(feature.id()))
                .map(Feature::symbol)
                .toList();
    }

    /** The titles of the columns. */
    void titles(Passage passage) {
        Style style = styles.note();
        float end = passage.width();
        List<Cell> cells =
                List.of(
                        new Cell(style, "Feature, paper", 0, 57, false),
                        new Cell(style, "value ± 1σ", valueEnd(end), 50, true),
                        new Cell(style, "says", end - PULL_WIDTH - 1, SAYS_WIDTH, true),
                        new Cell(style, "pull", end, PULL_WIDTH, true));
        passage.row(cells);
    }

    private static float valueEnd(float end) {
        return end - PULL_WIDTH - SAYS_WIDTH - 2;
    }

    /** A row for each feature, in their order by band. */
    void rows(
            Passage passage, List<FeatureMeasurement> features, SourceList sources, boolean bands) {
        List<FeatureMeasurement> byBand = new ArrayList<>(features);
        byBand.sort(Comparator.comparing(m -> m.feature().band()));
        Band band = null;
        for (FeatureMeasurement measurement : byBand) {
            if (bands && measurement.feature().band() != band) {
                band = measurement.feature().band();
                passage.subheading(words(band));
            }
            row(passage, measurement, sources);
        }
    }

    /** A band in words. */
    static String words(Band band) {
        String words = band.name().replace('_', ' ');
        return switch (band) {
            case OPTICAL -> "Optical";
            case Y, J, H, K, L, M -> words + " band";
            default -> words.replace(" ", " with ") + " band";
        };
    }

    private void row(Passage passage, FeatureMeasurement measurement, SourceList sources) {
        Feature feature = measurement.feature();
        Measured value = (Measured) measurement.result();
        Contribution pull = contributions.get(feature.id());
        String marks =
                (feature.howKnown() == HowKnown.FROM_MEMORY ? "*" : "")
                        + (measurement.telluricShare() > MOSTLY_TELLURIC ? "†" : "")
                        + (pull != null && pull.setAside() ? "‡" : "");
        String number =
                Digits.feature(feature, value.value()).replace('-', '\u2212')
                        + " ± "
                        + Digits.feature(feature, value.oneSigma());
        float end = passage.width();
        Style quiet = styles.table().in(document.theme().quiet());
        List<Cell> cells = new ArrayList<>();
        cells.add(new Cell(styles.table(), feature.symbol() + marks, 0, SYMBOL_WIDTH, false));
        cells.add(new Cell(quiet, sources.number(feature.source()), MARK_END, MARK_WIDTH, true));
        Optional<Cell> says = says(feature, end - PULL_WIDTH - 1);
        float room = valueEnd(end) - MARK_END - 2;
        boolean wide = says.isEmpty() && document.lines().width(styles.table(), number) > room;
        float right = wide ? end - PULL_WIDTH - 2 : valueEnd(end);
        cells.add(new Cell(styles.table(), number, right, right - MARK_END - 2, true));
        says.ifPresent(cells::add);
        if (pull != null) {
            cells.add(new Cell(quiet, signed(pull.pullSubclass()), end, PULL_WIDTH, true));
        }
        passage.row(cells);
    }

    private static String signed(double pull) {
        String digits = Digits.fixed(pull, 2).replace('-', '\u2212');
        boolean none = digits.equals("0.00");
        return pull > 0 && !none ? "+" + digits : digits;
    }

    /** What a feature says: its type by a relation, or its gravity score. */
    private Optional<Cell> says(Feature feature, float end) {
        RelationEstimate estimate = estimates.get(feature.id());
        if (estimate != null) {
            Style style = estimate.use() == Use.COMBINED ? styles.tableStrong() : styles.table();
            String code =
                    TypeText.code(estimate.type().orElseThrow())
                            .replace("before ", "< ")
                            .replace("after ", "> ");
            return Optional.of(new Cell(style, code, end, SAYS_WIDTH, true));
        }
        return Optional.ofNullable(scores.get(feature.id()))
                .map(
                        score ->
                                new Cell(
                                        styles.tableStrong(),
                                        "g " + score.score().orElseThrow(),
                                        end,
                                        SAYS_WIDTH,
                                        true));
    }
}
