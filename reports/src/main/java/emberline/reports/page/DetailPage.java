package emberline.reports.page;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.GravityThreshold;
import emberline.catalogue.Source;
import emberline.measure.FeatureMeasurement;
import emberline.place.Placement;
import emberline.place.RelationEstimate;
import emberline.place.calibrated.Calibration;
import emberline.reports.chart.Chart;
import emberline.reports.chart.LineInset;
import emberline.reports.paint.Face;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * The second page, by which the first can be checked. Whatever an object brings, it is one page:
 * what carries the answer stands there in any case, other measured features as room allows.
 */
final class DetailPage {

    private final ReportDocument document;
    private final FeatureCatalogue catalogue;
    private final Calibration calibration;
    private final ReportSettings settings;
    private final ObjectResult result;
    private final Placement placement;
    private final FeatureTable table;
    private final Map<Fullness, List<Line>> apart = new EnumMap<>(Fullness.class);

    DetailPage(
            ReportDocument document,
            FeatureCatalogue catalogue,
            Calibration calibration,
            ReportSettings settings,
            ObjectResult result) {
        this.document = document;
        this.catalogue = catalogue;
        this.calibration = calibration;
        this.settings = settings;
        this.result = result;
        this.placement = result.placement().orElseThrow();
        this.table = new FeatureTable(document, result);
    }

    /** Lines and how close they are set. */
    private record Setting(List<Line> lines, float tightness) {}

    /**
     * Writes the page; returns where its sections begin.
     *
     * @param withGravity whether the gravity charts found no room on the first page
     */
    List<Columns.Bookmark> write(boolean withGravity) throws IOException {
        float width = settings.paper().widthPoint() - 2 * FirstPage.MARGIN;
        List<Chart> charts = LineInset.of(result, catalogue, LinePanel.MOST);
        float gravityTall = withGravity ? GravityPanel.tall(result) : 0;
        float top = FirstPage.TOP + 20;
        Columns columns = columns(top + gravityTall + LinePanel.tall(charts));
        Optional<Setting> found = setting(columns);
        if (found.isEmpty()) {
            charts = List.of();
            columns = columns(top + gravityTall);
            found = setting(columns);
        }
        Setting setting = found.isPresent() ? found.get() : cut(columns);
        try (Sheet sheet = new Sheet(document, settings.paper())) {
            head(sheet);
            if (withGravity) {
                new GravityPanel(document, catalogue, calibration, width).write(sheet, result, top);
            }
            if (!charts.isEmpty()) {
                new LinePanel(document, width).write(sheet, charts, top + gravityTall);
            }
            return columns.draw(sheet, setting.lines(), setting.tightness());
        }
    }

    private Columns columns(float top) {
        return new Columns(document, settings.paper(), top);
    }

    private void head(Sheet sheet) throws IOException {
        float baseline = FirstPage.TOP + 6;
        sheet.text(
                document.styles().finding().with(Face.SERIF_BOLD),
                FirstPage.MARGIN,
                baseline,
                "Measurements and provenance");
        sheet.rule(
                FirstPage.MARGIN,
                settings.paper().widthPoint() - FirstPage.MARGIN,
                baseline + 6,
                document.theme().ink(),
                0.7f);
    }

    /** The most that finds room; empty where not even the least does. */
    private Optional<Setting> setting(Columns columns) {
        List<Float> tightness = Columns.TIGHTNESS;
        float tightest = tightness.get(tightness.size() - 1);
        for (Fullness fullness : Fullness.values()) {
            List<FeatureMeasurement> others = table.others(fullness);
            SourceList sources = sources(fullness, others);
            List<Line> lines = lines(columns, fullness, others, sources);
            for (float tried : tightness) {
                if (columns.hold(lines, tried)) {
                    return Optional.of(new Setting(lines, tried));
                }
            }
            if (!fullness.everyFeature()
                    && columns.hold(lines(columns, fullness, List.of(), sources), tightest)) {
                return Optional.of(
                        new Setting(fitted(columns, fullness, others, tightest), tightest));
            }
        }
        return Optional.empty();
    }

    /** The lines with as many of the other features as find room beside the papers they need. */
    private List<Line> fitted(
            Columns columns, Fullness fullness, List<FeatureMeasurement> others, float tightness) {
        int few = 0;
        int many = others.size();
        List<Line> best = lines(columns, fullness, List.of(), sources(fullness, List.of()));
        while (many - few > 1) {
            int tried = (few + many) / 2;
            List<FeatureMeasurement> shown = others.subList(0, tried);
            List<Line> lines = lines(columns, fullness, shown, sources(fullness, shown));
            if (columns.hold(lines, tightness)) {
                best = lines;
                few = tried;
            } else {
                many = tried;
            }
        }
        return best;
    }

    /** The beginning of the least that should be said, with a word on the rest. */
    private Setting cut(Columns columns) {
        float tightness = Columns.TIGHTNESS.get(Columns.TIGHTNESS.size() - 1);
        Fullness least = Fullness.SPARE;
        List<Line> lines = lines(columns, least, List.of(), sources(least, List.of()));
        Passage end = new Passage(document, columns.columnWidth(), 3);
        end.item("No room for more: the JSON of the object holds the rest.");
        int kept = columns.held(lines, tightness);
        List<Line> all = new ArrayList<>();
        do {
            kept--;
            all.clear();
            all.addAll(lines.subList(0, kept));
            all.addAll(end.lines());
        } while (kept > 1 && !columns.hold(all, tightness));
        return new Setting(all, tightness);
    }

    /** Whether the page names the paper of a relation. */
    private static boolean cited(RelationEstimate estimate, Fullness fullness) {
        return switch (estimate.use()) {
            case COMBINED, DISAGREES -> true;
            case SHOWN -> fullness.names();
            case OUTSIDE_RANGE -> fullness.ranges();
            case NOT_MEASURED -> false;
        };
    }

    private SourceList sources(Fullness fullness, List<FeatureMeasurement> others) {
        List<Source> used = new ArrayList<>();
        table.leading(fullness).forEach(m -> used.add(m.feature().source()));
        others.forEach(m -> used.add(m.feature().source()));
        placement.published().estimates().stream()
                .filter(e -> cited(e, fullness))
                .forEach(e -> used.add(e.relation().source()));
        Set<String> scored =
                placement.gravity().scores().stream()
                        .map(score -> score.feature().id())
                        .collect(Collectors.toSet());
        catalogue.gravityThresholds().stream()
                .filter(t -> scored.contains(t.feature()))
                .map(GravityThreshold::source)
                .forEach(used::add);
        return new SourceList(used);
    }

    private List<Line> lines(
            Columns columns,
            Fullness fullness,
            List<FeatureMeasurement> others,
            SourceList sources) {
        Passage passage = new Passage(document, columns.columnWidth(), fullness.paragraphLines());
        features(passage, fullness, others, sources);
        TypeSections types = new TypeSections(catalogue, sources, fullness);
        types.relations(passage, placement);
        List<Line> lines = new ArrayList<>(passage.lines());
        lines.addAll(apart.computeIfAbsent(fullness, f -> apart(types, f, columns.columnWidth())));
        Passage end = new Passage(document, columns.columnWidth(), fullness.paragraphLines());
        end.heading("Sources");
        end.paragraph(
                sources.sources().stream()
                        .map(source -> sources.mark(source) + " " + source.cite())
                        .collect(Collectors.joining("; ", "", ".")));
        lines.addAll(end.lines());
        return lines;
    }

    /** The sections that do not depend on which other features are shown. */
    private List<Line> apart(TypeSections types, Fullness fullness, float width) {
        Passage passage = new Passage(document, width, fullness.paragraphLines());
        types.gravity(passage, placement.gravity());
        SideSections side = new SideSections(document, fullness);
        result.judgement().ifPresent(judgement -> side.judgement(passage, judgement));
        result.standards().ifPresent(verdict -> side.standards(passage, verdict));
        side.kin(passage, placement.kin());
        side.metallicity(passage, placement.metallicity());
        side.pair(passage, placement.pair());
        side.findings(passage, result);
        side.given(passage, result, settings);
        types.notMeasured(passage, result);
        return passage.lines();
    }

    private void features(
            Passage passage,
            Fullness fullness,
            List<FeatureMeasurement> others,
            SourceList sources) {
        List<FeatureMeasurement> leading = table.leading(fullness);
        passage.heading("Features behind type and gravity");
        passage.note(
                "Says: the type by a published relation, bold where it was combined, or the gravity"
                        + " score (g). Pull: how far it moved the type (subclass, + later). EW_:"
                        + " equivalent width (Å). *: definition quoted from memory, not yet checked"
                        + " in the paper. †: more than half of a window lies in a telluric band."
                        + " ‡: set aside as an outlier.");
        if (leading.isEmpty()) {
            passage.paragraph("None.");
        } else {
            table.titles(passage);
            table.rows(passage, leading, sources, true);
        }
        List<FeatureMeasurement> all = table.others(fullness);
        if (all.isEmpty()) {
            return;
        }
        passage.heading("Other measured features");
        table.rows(passage, others, sources, fullness.everyFeature());
        List<FeatureMeasurement> rest = all.subList(others.size(), all.size());
        if (!rest.isEmpty()) {
            List<String> faint = table.entered(rest);
            passage.note(
                    rest.size()
                            + (others.isEmpty() ? " were measured" : " more were measured")
                            + (faint.isEmpty()
                                    ? " and entered neither type nor gravity"
                                    : "; "
                                            + faint.size()
                                            + " of them pulled the type by less than "
                                            + fullness.leastPullSubclass()
                                            + " each: "
                                            + String.join(", ", faint))
                            + ". The JSON of the object has them under features, and emberline"
                            + " measure prints them.");
        }
    }
}
