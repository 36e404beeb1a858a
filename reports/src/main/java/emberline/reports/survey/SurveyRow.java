package emberline.reports.survey;

import com.fasterxml.jackson.jr.ob.JSON;
import emberline.place.Placement;
import emberline.place.kind.Kin;
import emberline.place.kind.ObjectKind;
import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumns;
import emberline.reports.page.FindingSentence;
import emberline.spectrum.Finding;
import emberline.spectrum.SpectralType;
import emberline.survey.ObjectResult;
import emberline.survey.map.SurveyAxes;
import java.io.IOException;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;

/**
 * What the survey page holds of one object: a line of JSON, and its place on the map. The line is
 * all that needs to be kept of an object to put it on a page later.
 */
public final class SurveyRow {

    /**
     * Columns of the results table that go into the page under their own names, where they exist.
     */
    private static final List<String> TAKEN =
            List.of(
                    "name",
                    "status",
                    "reason",
                    "kind",
                    "type",
                    "type_number",
                    "type_sigma",
                    "type_lo95",
                    "type_hi95",
                    "gravity",
                    "snr",
                    "quality",
                    "resolution",
                    "findings",
                    "decision",
                    "p_substellar",
                    "next_step",
                    "score",
                    "priority",
                    "verdict",
                    "verdict_type",
                    "verdict_gravity",
                    "verdict_note");

    private static final List<ResultColumn> COLUMNS =
            ResultColumns.standard().stream().filter(c -> TAKEN.contains(c.name())).toList();

    private static final List<String> MORE =
            List.of(
                    "p_gravity",
                    "p_kind",
                    "p_unlike",
                    "kin",
                    "kin_distance",
                    "listed",
                    "sentence",
                    "values",
                    "map",
                    "file",
                    "report",
                    "sparks",
                    "cautions");

    /** All cells but the last, without the closing bracket. */
    private final String head;

    private final List<String> cautions;
    private final double[] place;
    private final OptionalInt rank;

    private SurveyRow(String head, List<String> cautions, double[] place, OptionalInt rank) {
        this.head = head;
        this.cautions = cautions;
        this.place = place;
        this.rank = rank;
    }

    /** The keys of the cells on the page in their order. */
    static List<String> pageKeys() {
        List<String> keys = new ArrayList<>(keys());
        keys.add(ResultColumns.RANK);
        return keys;
    }

    /** The keys of the cells in their order, as far as they are known with the object alone. */
    static List<String> keys() {
        List<String> keys = new ArrayList<>(COLUMNS.stream().map(ResultColumn::name).toList());
        keys.addAll(MORE);
        return keys;
    }

    /**
     * The row of an object.
     *
     * @param result its result
     * @param stem name of its files without folder and ending
     * @param hasReport whether there is a PDF
     * @return its row
     */
    public static SurveyRow of(ObjectResult result, String stem, boolean hasReport) {
        List<Object> cells = new ArrayList<>();
        for (ResultColumn column : COLUMNS) {
            String text = column.text(result);
            boolean number = column.content() == ResultColumn.Content.NUMBER;
            cells.add(!number ? text : text.isEmpty() ? null : new BigDecimal(text));
        }
        Optional<Placement> placement = result.placement();
        cells.add(placement.map(p -> share(p.gravity().pOfClass())).orElse(null));
        cells.add(
                placement
                        .flatMap(p -> p.kind().kind().map(k -> share(p.kind().probability(k))))
                        .orElse(null));
        cells.add(
                placement
                        .map(p -> share(p.kind().probability(ObjectKind.UNLIKE_KNOWN)))
                        .orElse(null));
        Optional<Kin> kin = placement.flatMap(p -> p.kin().stream().findFirst());
        cells.add(kin.map(SurveyRow::words).orElse(""));
        cells.add(kin.map(k -> rounded(k.distance())).orElse(null));
        cells.add(
                (result.candidate().text("known_type").orElse("")
                                + " "
                                + result.candidate().text("known_gravity").orElse(""))
                        .strip());
        cells.add(FindingSentence.of(result));
        cells.add(Quantities.of(result));
        double[] place =
                result.best()
                        .flatMap(best -> SurveyAxes.standard().flatMap(axes -> axes.scores(best)))
                        .orElse(new double[0]);
        cells.add(place.length == 0 ? null : rounded(place));
        cells.add(stem);
        cells.add(hasReport);
        cells.add(
                result.spectra().stream().map(s -> Sparkline.of(s.prepared().spectrum())).toList());
        List<String> cautions =
                result.findings().stream()
                        .filter(f -> f.severity() != Finding.Severity.NOTE)
                        .map(f -> (f.severity() == Finding.Severity.WARNING ? "!" : "") + f.text())
                        .distinct()
                        .toList();
        String text = PageJson.of(cells);
        return new SurveyRow(
                text.substring(0, text.length() - 1), cautions, place, OptionalInt.empty());
    }

    /**
     * The row with the place of its object.
     *
     * @param among place when the survey is ordered by score, from 1
     * @return a new row
     */
    public SurveyRow ranked(int among) {
        return new SurveyRow(head, cautions, place, OptionalInt.of(among));
    }

    /**
     * A row from its line.
     *
     * @param text what {@link #text} gave in a run of the same version
     * @return the row
     * @throws IOException if it is no such line
     */
    public static SurveyRow parse(String text) throws IOException {
        List<Object> cells = JSON.std.listFrom(text);
        int map = keys().indexOf("map");
        if (cells.size() != keys().size()) {
            throw new IOException(
                    "a row of the survey page with "
                            + cells.size()
                            + " cells; expected "
                            + keys().size()
                            + ". It is of another version: run the list anew.");
        }
        double[] place =
                cells.get(map) instanceof List<?> scores
                        ? scores.stream().mapToDouble(s -> ((Number) s).doubleValue()).toArray()
                        : new double[0];
        List<String> cautions =
                ((List<?>) cells.get(cells.size() - 1)).stream().map(Object::toString).toList();
        int end = text.length() - PageJson.of(cautions).length() - 2;
        return new SurveyRow(text.substring(0, end), cautions, place, OptionalInt.empty());
    }

    /**
     * The row as text, without its rank.
     *
     * @return a JSON array on one line that may stand in a script element
     */
    public String text() {
        return head + "," + PageJson.of(cautions) + "]";
    }

    /** The row for the page, with its cautions by their numbers. */
    String text(List<Integer> numbers) {
        String place = rank.isPresent() ? Integer.toString(rank.getAsInt()) : "null";
        return head + "," + PageJson.of(numbers) + "," + place + "]";
    }

    /** What the observer should beware of, each a sentence; a warning begins with {@code !}. */
    List<String> cautions() {
        return cautions;
    }

    /** Its place along the axes of the map; empty where it has none. */
    Optional<double[]> place() {
        return place.length == 0 ? Optional.empty() : Optional.of(place.clone());
    }

    private static String words(Kin kin) {
        String type = (code(kin.typeNumber()) + " " + kin.gravity()).strip();
        return kin.object() + ", " + (type.isEmpty() ? "" : type + ", ") + kin.kind().label();
    }

    /** A type as it is quoted; empty where there is none, or it is earlier than K. */
    static String code(OptionalDouble typeNumber) {
        double number = typeNumber.orElse(Double.NaN);
        return number >= -9 && number < 40 ? new SpectralType(number).code() : "";
    }

    private static Object share(OptionalDouble share) {
        return share.isPresent() ? rounded(share.getAsDouble()) : null;
    }

    static List<Object> rounded(double[] values) {
        List<Object> cells = new ArrayList<>();
        for (double value : values) {
            cells.add(rounded(value));
        }
        return cells;
    }

    /** To two decimals. */
    private static Object rounded(double value) {
        return Math.round(100 * value) / 100.0;
    }
}
