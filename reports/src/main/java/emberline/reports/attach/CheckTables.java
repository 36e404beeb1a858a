package emberline.reports.attach;

import emberline.place.TypeEstimate;
import emberline.spectrum.SpectralType;
import emberline.survey.score.CheckScore;
import emberline.survey.score.Confusion;
import emberline.survey.score.Division;
import emberline.survey.score.KindScore;
import emberline.survey.score.ScoredObject;
import emberline.survey.score.TypeScore;
import emberline.survey.score.TypeScore.Figures;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.ToDoubleFunction;
import java.util.stream.Collectors;

/** The score of the product on known objects, as tables of text and as a row for each object. */
public final class CheckTables {

    private static final List<String> TYPE_COLUMNS =
            List.of(
                    "objects",
                    "typed",
                    "bias",
                    "rms",
                    "median_off",
                    "scatter",
                    "sigma",
                    "in_68",
                    "in_95");

    private CheckTables() {}

    /**
     * The tables for a terminal.
     *
     * @param score the score of a list
     * @param remark what is to be said of the run, in sentences; may be blank
     * @return text with a line end
     */
    public static String text(CheckScore score, String remark) {
        StringBuilder text = new StringBuilder();
        text.append(score.objects().size())
                .append(" objects, ")
                .append(score.failed())
                .append(" of them failed.")
                .append(remark.isBlank() ? "" : " " + remark)
                .append('\n');
        heading(text, "Types of dwarfs, found minus known (subclasses)");
        text.append(
                "median_off: of the absolute difference; scatter: 1.48 times the median deviation"
                        + " from the median;\nsigma: median stated error; in_68, in_95: share of"
                        + " known types inside the stated interval.\n");
        text.append(types("", score.types()));
        for (Division division : score.divisions()) {
            text.append('\n').append(types(division.title(), division.scores()));
        }
        heading(text, "Gravity classes of dwarfs of M6 to L7, known against found");
        text.append(confusion(score.gravity()));
        score.gravity().rows().keySet().stream()
                .map(known -> calledLow(score.gravity(), known))
                .forEach(text::append);
        heading(text, "Kinds, known against found");
        text.append(confusion(score.kind().table())).append(kinds(score.kind()));
        heading(text, "Metallicity classes, known against found");
        text.append(confusion(score.metallicity()));
        heading(text, "Dwarfs that are off by more than 2 subclasses or 3 sigma");
        text.append(outliers(score.outliers()));
        return text.toString();
    }

    private static void heading(StringBuilder text, String words) {
        text.append('\n').append(words).append('\n').append("-".repeat(words.length()));
        text.append('\n');
    }

    private static String types(String title, List<TypeScore> scores) {
        List<String> header = new ArrayList<>(List.of(title));
        header.addAll(TYPE_COLUMNS);
        AlignedTable table = new AlignedTable(header);
        for (TypeScore score : scores) {
            table.add(typeCells(score));
        }
        return table.text();
    }

    /** The cells of a type score: its label, then as many as there are columns. */
    static List<String> typeCells(TypeScore score) {
        List<String> cells = new ArrayList<>();
        cells.add(score.label());
        cells.add(Integer.toString(score.objects()));
        cells.add(Integer.toString(score.typed()));
        cells.add(type(score.figures(), Figures::bias));
        cells.add(type(score.figures(), Figures::rms));
        cells.add(type(score.figures(), Figures::medianAbsolute));
        cells.add(type(score.figures(), Figures::robustScatter));
        cells.add(type(score.figures(), Figures::medianSigma));
        cells.add(score.figures().map(f -> Digits.fixed(f.inside68(), 2)).orElse(""));
        cells.add(score.figures().map(f -> Digits.fixed(f.inside95(), 2)).orElse(""));
        return cells;
    }

    /** The names of the columns of a type score after its label. */
    static List<String> typeColumns() {
        return TYPE_COLUMNS;
    }

    private static String type(Optional<Figures> figures, ToDoubleFunction<Figures> part) {
        return figures.map(f -> Digits.type(part.applyAsDouble(f))).orElse("");
    }

    private static String confusion(Confusion confusion) {
        List<String> header = new ArrayList<>(List.of("known"));
        header.addAll(confusion.found());
        AlignedTable table = new AlignedTable(header);
        for (Map.Entry<String, List<Integer>> row : confusion.rows().entrySet()) {
            List<String> cells = new ArrayList<>(List.of(row.getKey()));
            row.getValue().forEach(count -> cells.add(count.toString()));
            table.add(cells);
        }
        return table.isEmpty() ? "none is known\n" : table.text();
    }

    private static String calledLow(Confusion gravity, String known) {
        int judged = gravity.judged(known);
        return known
                + ": called low (INT-G or VL-G) "
                + of(judged - gravity.count(known, "FLD-G"), judged)
                + " judged\n";
    }

    private static String kinds(KindScore kind) {
        String judged =
                kind.lateDwarfs() + kind.contaminants() == 0
                        ? "The kind is not judged.\n"
                        : "late dwarfs kept: "
                                + of(kind.lateDwarfsKept(), kind.lateDwarfs())
                                + "; contaminants let in: "
                                + of(kind.contaminantsLetIn(), kind.contaminants())
                                + "\n";
        return judged
                + "given a type, whatever their kind: late dwarfs "
                + of(kind.lateDwarfsTyped(), kind.allLateDwarfs())
                + "; contaminants "
                + of(kind.contaminantsTyped(), kind.allContaminants())
                + "\n";
    }

    private static String of(int part, int whole) {
        return part + " of " + whole;
    }

    private static String outliers(List<ScoredObject> outliers) {
        AlignedTable table =
                new AlignedTable(
                        List.of(
                                "name",
                                "known",
                                "found",
                                "sigma",
                                "off",
                                "pull",
                                "dataset",
                                "findings"));
        for (ScoredObject object : outliers) {
            TypeEstimate found = object.found().type().orElseThrow();
            table.add(
                    List.of(
                            object.name(),
                            new SpectralType(object.known().typeNumber().orElseThrow()).code(),
                            TypeText.code(found),
                            Digits.type(found.sigmaSubclass()),
                            Digits.type(object.difference().orElseThrow()),
                            Digits.fixed(object.pull().orElseThrow(), 1),
                            object.dataset(),
                            String.join(" ", object.findings())));
        }
        return table.isEmpty() ? "none\n" : table.text();
    }

    /**
     * One row for each object of the list: what is known, what was found, how far it is off.
     *
     * @param score the score of a list
     * @return CSV with a header and a line end
     */
    public static String residuals(CheckScore score) {
        AlignedTable table =
                new AlignedTable(
                        List.of(
                                "name",
                                "group",
                                "dataset",
                                "tier",
                                "status",
                                "reason",
                                "known_kind",
                                "kind",
                                "known_type_number",
                                "type_number",
                                "type_sigma",
                                "type_lo68",
                                "type_hi68",
                                "type_lo95",
                                "type_hi95",
                                "difference",
                                "pull",
                                "known_gravity",
                                "gravity",
                                "known_metallicity",
                                "metallicity",
                                "resolution",
                                "snr",
                                "counts_for_types",
                                "findings"));
        for (ScoredObject object : score.objects()) {
            table.add(residual(object));
        }
        return table.csv();
    }

    private static List<String> residual(ScoredObject object) {
        Optional<TypeEstimate> type = object.found().type();
        List<String> cells = new ArrayList<>();
        cells.addAll(List.of(object.name(), object.group(), object.dataset(), object.tier()));
        cells.addAll(List.of(object.status().word(), object.reason()));
        cells.addAll(List.of(object.known().kind(), object.found().kind()));
        cells.add(number(object.known().typeNumber(), 2));
        cells.add(part(type, TypeEstimate::typeNumber));
        cells.add(part(type, TypeEstimate::sigmaSubclass));
        cells.add(part(type, TypeEstimate::lo68));
        cells.add(part(type, TypeEstimate::hi68));
        cells.add(part(type, TypeEstimate::lo95));
        cells.add(part(type, TypeEstimate::hi95));
        cells.add(number(object.difference(), 2));
        cells.add(number(object.pull(), 2));
        cells.add(object.known().gravity());
        cells.add(object.found().gravity().map(g -> g.label()).orElse(""));
        cells.add(object.known().metallicity().map(m -> m.prefix()).orElse(""));
        cells.add(object.found().metallicity().map(m -> m.prefix()).orElse(""));
        cells.add(
                object.resolvingPower().isPresent()
                        ? Digits.significant(object.resolvingPower().getAsDouble())
                        : "");
        cells.add(number(object.signalToNoise(), 1));
        cells.add(Boolean.toString(object.countsForTypes()));
        cells.add(object.findings().stream().collect(Collectors.joining(" ")));
        return cells;
    }

    private static String part(Optional<TypeEstimate> type, ToDoubleFunction<TypeEstimate> part) {
        return type.map(t -> Digits.type(part.applyAsDouble(t))).orElse("");
    }

    private static String number(OptionalDouble number, int decimals) {
        return number.isPresent() ? Digits.fixed(number.getAsDouble(), decimals) : "";
    }
}
