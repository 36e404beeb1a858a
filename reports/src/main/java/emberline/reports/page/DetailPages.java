package emberline.reports.page;

import emberline.catalogue.Band;
import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.HowKnown;
import emberline.catalogue.Purpose;
import emberline.catalogue.Source;
import emberline.measure.FeatureMeasurement;
import emberline.measure.Measurement;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurement.NotMeasured;
import emberline.place.GravityScore;
import emberline.place.Placement;
import emberline.place.RelationEstimate;
import emberline.place.RelationEstimate.Use;
import emberline.place.TypeEstimate;
import emberline.place.calibrated.Calibration;
import emberline.reports.attach.Digits;
import emberline.reports.attach.TypeText;
import emberline.reports.chart.Chart;
import emberline.reports.chart.LineInset;
import emberline.reports.page.Flow.Cell;
import emberline.survey.ObjectResult;
import emberline.survey.SpectrumResult;
import java.io.IOException;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.Collectors;

/** The pages after the first: every measurement, every relation, findings, provenance, sources. */
final class DetailPages {

    /** Share of a window in telluric bands from which a feature is marked. */
    private static final double MOSTLY_TELLURIC = 0.5;

    private final ReportDocument document;
    private final FeatureCatalogue catalogue;
    private final Calibration calibration;
    private final ReportSettings settings;
    private final Styles styles;

    DetailPages(
            ReportDocument document,
            FeatureCatalogue catalogue,
            Calibration calibration,
            ReportSettings settings) {
        this.document = document;
        this.catalogue = catalogue;
        this.calibration = calibration;
        this.settings = settings;
        this.styles = document.styles();
    }

    /** The head of a page. */
    static void head(ReportDocument document, Sheet sheet, Paper paper, int number)
            throws IOException {
        float baseline = FirstPage.TOP + 6;
        sheet.text(
                document.styles().finding().with(emberline.reports.paint.Face.SERIF_BOLD),
                FirstPage.MARGIN,
                baseline,
                number == 1
                        ? "Measurements and provenance"
                        : "Measurements and provenance, continued");
        sheet.rule(
                FirstPage.MARGIN,
                paper.widthPoint() - FirstPage.MARGIN,
                baseline + 6,
                document.theme().ink(),
                0.7f);
    }

    /**
     * Writes the pages; returns where their sections begin.
     *
     * @param result the result of an object
     * @param withGravity whether the gravity charts found no room on the first page
     */
    List<Flow.Bookmark> write(ObjectResult result, boolean withGravity) throws IOException {
        Placement placement = result.placement().orElseThrow();
        List<FeatureMeasurement> all =
                result.best().orElseThrow().all().stream()
                        .filter(m -> m.feature().purpose() != Purpose.KIND)
                        .toList();
        List<FeatureMeasurement> measured =
                all.stream().filter(m -> m.result() instanceof Measured).toList();
        SourceList sources = sources(measured, placement);
        Flow flow = new Flow(document, settings.paper());
        band(flow, result, withGravity);
        features(flow, measured, placement, sources);
        notMeasured(flow, all);
        relations(flow, placement, sources);
        new SideSections(document).write(flow, result);
        provenance(flow, result);
        flow.heading("Sources");
        flow.paragraph(
                styles.table(),
                sources.sources().stream()
                        .map(source -> sources.mark(source) + " " + source.cite())
                        .collect(Collectors.joining("; ", "", ".")),
                0);
        return flow.draw();
    }

    /** Charts above the columns: gravity where it is wanted, lines where they are resolved. */
    private void band(Flow flow, ObjectResult result, boolean withGravity) {
        float width = settings.paper().widthPoint() - 2 * FirstPage.MARGIN;
        List<Chart> lines = LineInset.of(result, catalogue, LinePanel.MOST);
        float gravityTall = withGravity ? GravityPanel.tall(result) : 0;
        flow.band(
                gravityTall + LinePanel.tall(lines),
                (sheet, top) -> {
                    if (withGravity) {
                        new GravityPanel(document, catalogue, calibration, width)
                                .write(sheet, result, top);
                    }
                    if (!lines.isEmpty()) {
                        new LinePanel(document, width).write(sheet, lines, top + gravityTall);
                    }
                });
    }

    private SourceList sources(List<FeatureMeasurement> measured, Placement placement) {
        List<Source> used = new ArrayList<>();
        measured.forEach(m -> used.add(m.feature().source()));
        placement.published().estimates().stream()
                .filter(e -> e.type().isPresent() || e.use() == Use.OUTSIDE_RANGE)
                .forEach(e -> used.add(e.relation().source()));
        placement.gravity().scores().stream()
                .flatMap(
                        score ->
                                catalogue.gravityThresholds().stream()
                                        .filter(t -> t.feature().equals(score.feature().id())))
                .forEach(t -> used.add(t.source()));
        return new SourceList(used);
    }

    private void features(
            Flow flow, List<FeatureMeasurement> measured, Placement placement, SourceList sources) {
        flow.heading("Measured features");
        flow.paragraph(
                styles.note(),
                "Value ± one sigma from the pixel noise; Å: equivalent width in angstrom. Right:"
                        + " the type by a published relation, bold where it was combined, or the"
                        + " gravity score (g). A dash: measured only. *: definition quoted from"
                        + " memory, not yet checked in the paper. †: more than half of a window lies"
                        + " in a telluric band. ‡: set aside by the posterior as an outlier.",
                0);
        Map<Band, List<FeatureMeasurement>> byBand = new LinkedHashMap<>();
        for (Band band : Band.values()) {
            measured.stream()
                    .filter(m -> m.feature().band() == band)
                    .forEach(m -> byBand.computeIfAbsent(band, b -> new ArrayList<>()).add(m));
        }
        for (Map.Entry<Band, List<FeatureMeasurement>> group : byBand.entrySet()) {
            flow.subheading(bandWords(group.getKey()));
            for (FeatureMeasurement measurement : group.getValue()) {
                feature(flow, measurement, placement, sources);
            }
        }
    }

    private static String bandWords(Band band) {
        String words = band.name().replace('_', ' ');
        return switch (band) {
            case OPTICAL -> "Optical";
            case Y, J, H, K, L, M -> words + " band";
            default -> words.replace(" ", " with ") + " band";
        };
    }

    private void feature(
            Flow flow, FeatureMeasurement measurement, Placement placement, SourceList sources) {
        Feature feature = measurement.feature();
        Measured value = (Measured) measurement.result();
        String unit = feature.kind() == emberline.catalogue.Kind.BAND_INDEX ? "" : " Å";
        String known =
                (feature.howKnown() == HowKnown.FROM_MEMORY ? "*" : "")
                        + (measurement.telluricShare() > MOSTLY_TELLURIC ? "†" : "")
                        + (isSetAside(feature, placement) ? "‡" : "");
        String number =
                Digits.feature(feature, value.value()).replace('-', '\u2212')
                        + " ± "
                        + Digits.feature(feature, value.oneSigma())
                        + unit;
        float end = flow.columnWidth();
        Cell says = says(feature, placement, end);
        flow.row(
                List.of(
                        new Cell(styles.table(), feature.symbol() + known, 0, 48, false),
                        new Cell(
                                styles.table().in(document.theme().quiet()),
                                sources.mark(feature.source()),
                                64,
                                16,
                                true),
                        new Cell(styles.table(), number, end - 29, 66, true),
                        says));
    }

    private static boolean isSetAside(Feature feature, Placement placement) {
        return placement.calibrated().contributions().stream()
                .anyMatch(c -> c.setAside() && c.feature().equals(feature.id()));
    }

    /** What a feature says: its type by a relation, its gravity score, or nothing. */
    private Cell says(Feature feature, Placement placement, float end) {
        Optional<RelationEstimate> estimate =
                placement.published().estimates().stream()
                        .filter(e -> e.relation().feature().equals(feature.id()))
                        .filter(e -> e.type().isPresent())
                        .min(Comparator.comparing(RelationEstimate::use));
        if (estimate.isPresent()) {
            boolean combined = estimate.get().use() == Use.COMBINED;
            return new Cell(
                    combined ? styles.tableStrong() : styles.table(),
                    TypeText.code(estimate.get().type().orElseThrow()),
                    end,
                    27,
                    true);
        }
        Optional<GravityScore> score =
                placement.gravity().scores().stream()
                        .filter(s -> s.feature().id().equals(feature.id()))
                        .filter(s -> s.score().isPresent())
                        .findFirst();
        String text = score.map(s -> "g " + s.score().getAsInt()).orElse("\u2013");
        Style style =
                score.isPresent()
                        ? styles.tableStrong()
                        : styles.table().in(document.theme().quiet());
        return new Cell(style, text, end, 27, true);
    }

    private void notMeasured(Flow flow, List<FeatureMeasurement> all) {
        Map<Measurement.Why, List<Feature>> byReason = new LinkedHashMap<>();
        for (FeatureMeasurement measurement : all) {
            if (measurement.result() instanceof NotMeasured reason) {
                byReason.computeIfAbsent(reason.why(), why -> new ArrayList<>())
                        .add(measurement.feature());
            }
        }
        if (byReason.isEmpty()) {
            return;
        }
        Set<Band> seen = EnumSet.noneOf(Band.class);
        all.stream()
                .filter(m -> m.result() instanceof Measured)
                .forEach(m -> seen.add(m.feature().band()));
        flow.heading("Not measured");
        byReason.forEach(
                (why, features) -> {
                    String words = why.words();
                    String title =
                            words.substring(0, 1).toUpperCase(Locale.ROOT) + words.substring(1);
                    flow.paragraph(
                            styles.table(),
                            title + " (" + features.size() + "): " + symbols(features, seen) + ".",
                            8);
                });
    }

    /** Symbols of features; a band of which nothing was measured is named as a whole. */
    private static String symbols(List<Feature> features, Set<Band> seen) {
        Map<Band, Long> whole = new EnumMap<>(Band.class);
        List<String> parts = new ArrayList<>();
        features.stream()
                .filter(f -> !seen.contains(f.band()))
                .forEach(f -> whole.merge(f.band(), 1L, Long::sum));
        whole.forEach((band, count) -> parts.add("all " + count + " of " + bandWords(band)));
        features.stream()
                .filter(f -> seen.contains(f.band()))
                .map(Feature::symbol)
                .distinct()
                .forEach(parts::add);
        return String.join(", ", parts);
    }

    private void relations(Flow flow, Placement placement, SourceList sources) {
        flow.heading("Type relations");
        List<RelationEstimate> estimates = placement.published().estimates();
        if (placement.published().type().isPresent()) {
            TypeEstimate type = placement.published().type().get();
            flow.paragraph(
                    styles.table(),
                    "Combined: "
                            + FindingSentence.withError(type)
                            + "; "
                            + placement.published().scheme()
                            + ".",
                    8);
        }
        relationGroup(flow, "Combined", Use.COMBINED, estimates, sources);
        relationGroup(flow, "In disagreement, not combined", Use.DISAGREES, estimates, sources);
        relationGroup(flow, "Shown, not combined", Use.SHOWN, estimates, sources);
        List<String> outside =
                estimates.stream()
                        .filter(e -> e.use() == Use.OUTSIDE_RANGE)
                        .map(
                                e ->
                                        symbol(e)
                                                + sources.mark(e.relation().source())
                                                + " "
                                                + outside(e))
                        .toList();
        if (!outside.isEmpty()) {
            flow.paragraph(
                    styles.table(),
                    "Index outside the valid range: " + String.join("; ", outside) + ".",
                    8);
        }
        List<String> missing =
                estimates.stream()
                        .filter(e -> e.use() == Use.NOT_MEASURED)
                        .map(e -> symbol(e))
                        .distinct()
                        .toList();
        if (!missing.isEmpty()) {
            flow.paragraph(
                    styles.table(), "Index not measured: " + String.join(", ", missing) + ".", 8);
        }
    }

    private void relationGroup(
            Flow flow,
            String title,
            Use use,
            List<RelationEstimate> estimates,
            SourceList sources) {
        List<RelationEstimate> group = estimates.stream().filter(e -> e.use() == use).toList();
        if (group.isEmpty()) {
            return;
        }
        flow.subheading(title);
        float end = flow.columnWidth();
        for (RelationEstimate estimate : group) {
            Cell symbol = new Cell(styles.table(), symbol(estimate), 0, 50, false);
            Cell mark =
                    new Cell(
                            styles.table().in(document.theme().quiet()),
                            sources.mark(estimate.relation().source()),
                            66,
                            16,
                            true);
            Style style = use == Use.COMBINED ? styles.tableStrong() : styles.table();
            String type = estimate.type().map(FindingSentence::withError).orElse("");
            flow.row(List.of(symbol, mark, new Cell(style, type, end, 80, true)));
            boolean said = estimate.reason().isBlank() || estimate.reason().startsWith("shown");
            if (!said) {
                flow.indented(styles.note(), estimate.reason(), 8);
            }
        }
    }

    /** The index and the range in which its relation holds. */
    private static String outside(RelationEstimate estimate) {
        String index =
                estimate.index()
                        .fold(v -> Digits.fixed(v.value(), 3), n -> "")
                        .replace('-', '\u2212');
        OptionalDouble low = estimate.relation().validIndexMin();
        OptionalDouble high = estimate.relation().validIndexMax();
        String from = low.isPresent() ? Digits.fixed(low.getAsDouble(), 3) : "";
        String to = high.isPresent() ? "to " + Digits.fixed(high.getAsDouble(), 3) : "and above";
        String range = from + " " + to;
        return index + " (" + range.strip().replace('-', '\u2212') + ")";
    }

    private String symbol(RelationEstimate estimate) {
        return catalogue
                .feature(estimate.relation().feature())
                .map(Feature::symbol)
                .orElse(estimate.relation().feature());
    }

    private void provenance(Flow flow, ObjectResult result) {
        flow.heading("Spectra and provenance");
        for (SpectrumResult spectrum : result.spectra()) {
            flow.paragraph(styles.table(), ProvenanceText.of(spectrum), 8);
        }
        flow.paragraph(
                styles.table(),
                "Emberline "
                        + settings.programVersion()
                        + ", seed "
                        + settings.seed()
                        + ". Wavelengths in vacuum. M0 = 0, L0 = 10, T0 = 20, Y0 = 30.",
                8);
    }
}
