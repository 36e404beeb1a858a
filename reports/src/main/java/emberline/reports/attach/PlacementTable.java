package emberline.reports.attach;

import emberline.place.Placement;
import emberline.place.pair.PairVerdict;
import emberline.survey.ObjectResult;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;

/** Types and gravity classes of one or several objects as a table: one row an object. */
public final class PlacementTable {

    /** The columns that fit a terminal. */
    private static final List<String> ON_TERMINAL =
            List.of(
                    "name",
                    "status",
                    "kind",
                    "p_late_dwarf",
                    "type",
                    "type_number",
                    "type_sigma",
                    "type_lo95",
                    "type_hi95",
                    "standard_type",
                    "standard_type_sigma",
                    "a_v",
                    "gravity",
                    "p_fldg",
                    "p_intg",
                    "p_vlg",
                    "metallicity",
                    "snr",
                    "resolution");

    /** Those of them that are left out where no object has a value. */
    private static final List<String> WHERE_THERE_IS_ANY =
            List.of("standard_type", "standard_type_sigma", "a_v");

    private PlacementTable() {}

    /**
     * The table.
     *
     * @param results the results of objects in the order of the table
     * @param format how it is printed: as text the main columns, with a line for every object that
     *     has no type or no gravity class, and a block of lines for every judgement; as CSV all
     *     columns of the results table; as JSON everything but the features
     * @return the printed table, with a line end
     */
    public static String print(List<ObjectResult> results, TableFormat format) {
        return switch (format) {
            case TEXT -> text(results);
            case CSV -> table(results, ResultColumns.standard()).csv();
            case JSON -> json(results);
        };
    }

    private static AlignedTable table(List<ObjectResult> results, List<ResultColumn> columns) {
        AlignedTable table = new AlignedTable(columns.stream().map(ResultColumn::name).toList());
        for (ObjectResult result : results) {
            table.add(columns.stream().map(column -> column.text(result)).toList());
        }
        return table;
    }

    private static String text(List<ObjectResult> results) {
        List<ResultColumn> columns =
                ResultColumns.standard().stream()
                        .filter(column -> ON_TERMINAL.contains(column.name()))
                        .filter(
                                column ->
                                        !WHERE_THERE_IS_ANY.contains(column.name())
                                                || results.stream()
                                                        .anyMatch(r -> !column.text(r).isEmpty()))
                        .toList();
        StringBuilder text = new StringBuilder(table(results, columns).text());
        for (ObjectResult result : results) {
            remark(text, result, "", result.reason());
            result.placement()
                    .ifPresent(
                            placement -> {
                                remark(text, result, "no type: ", placement.typeReason());
                                remark(
                                        text,
                                        result,
                                        "no gravity class: ",
                                        placement.gravity().reason());
                                remark(
                                        text,
                                        result,
                                        "no metallicity class: ",
                                        placement.metallicity().reason());
                                remark(text, result, "pair: ", pair(placement));
                                remark(text, result, "nearest kin: ", kin(placement));
                            });
            result.standards()
                    .ifPresent(
                            verdict ->
                                    StandardsText.lines(verdict)
                                            .forEach(
                                                    line ->
                                                            remark(
                                                                    text,
                                                                    result,
                                                                    "standards: ",
                                                                    line)));
        }
        return text.append(JudgementText.print(results)).toString();
    }

    private static String pair(Placement placement) {
        PairVerdict pair = placement.pair();
        return pair.strength()
                .map(
                        strength ->
                                strength.word()
                                        + ", "
                                        + pair.criteriaMet()
                                        + " of "
                                        + pair.criteriaJudged()
                                        + " criteria met")
                .orElse(pair.reason());
    }

    private static String kin(Placement placement) {
        return placement.kin().stream()
                .map(
                        kin ->
                                kin.object()
                                        + " ("
                                        + KindJson.type(kin).orElse(kin.kind().label())
                                        + ", "
                                        + Digits.fixed(kin.distance(), 2)
                                        + ")")
                .collect(Collectors.joining(", "));
    }

    private static void remark(
            StringBuilder text, ObjectResult result, String what, String reason) {
        if (!reason.isBlank()) {
            String line = result.candidate().name() + ": " + what + reason;
            text.append(AlignedTable.printable(line)).append('\n');
        }
    }

    private static String json(List<ObjectResult> results) {
        List<Map<String, Object>> objects = new ArrayList<>();
        for (ObjectResult result : results) {
            Map<String, Object> map = new LinkedHashMap<>(ObjectJson.map(result));
            map.remove("features");
            objects.add(map);
        }
        return JsonText.of(objects.size() == 1 ? objects.get(0) : objects);
    }
}
