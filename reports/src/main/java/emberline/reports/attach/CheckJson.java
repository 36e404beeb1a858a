package emberline.reports.attach;

import emberline.survey.score.CheckScore;
import emberline.survey.score.CheckScore.CoveragePoint;
import emberline.survey.score.Confusion;
import emberline.survey.score.Division;
import emberline.survey.score.KindScore;
import emberline.survey.score.ScoredObject;
import emberline.survey.score.TypeScore;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** The score of the product on known objects as JSON: the numbers of {@link CheckTables}. */
public final class CheckJson {

    private final String version;
    private final String list;
    private final Map<String, String> options;
    private final long seed;

    /**
     * A writer of scores.
     *
     * @param version version of the program
     * @param list name of the list
     * @param options options that bear on the results
     * @param seed start of all random draws
     */
    public CheckJson(String version, String list, Map<String, String> options, long seed) {
        this.version = version;
        this.list = list;
        this.options = new TreeMap<>(options);
        this.seed = seed;
    }

    /**
     * A score as JSON.
     *
     * @param score the score of a list
     * @return one JSON object over several lines, with a line end
     */
    public String text(CheckScore score) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("program", "emberline");
        map.put("version", version);
        map.put("list", list);
        map.put("options", options);
        map.put("seed", seed);
        map.put("objects", score.objects().size());
        map.put("failed", score.failed());
        map.put("types", types(score.types()));
        Map<String, Object> divisions = new LinkedHashMap<>();
        for (Division division : score.divisions()) {
            divisions.put(division.title(), types(division.scores()));
        }
        map.put("types_by", divisions);
        map.put("coverage", score.coverage().stream().map(CheckJson::coverage).toList());
        map.put("gravity", confusion(score.gravity()));
        map.put("kind", kind(score.kind()));
        map.put("metallicity", confusion(score.metallicity()));
        map.put("outliers", score.outliers().stream().map(CheckJson::outlier).toList());
        return JsonText.of(map);
    }

    private static Map<String, Object> coverage(CoveragePoint point) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("nominal", JsonText.number(Digits.fixed(point.nominal(), 2)));
        map.put("actual", JsonText.number(Digits.fixed(point.actual(), 3)));
        return map;
    }

    private static List<Map<String, Object>> types(List<TypeScore> scores) {
        List<String> columns = CheckTables.typeColumns();
        List<Map<String, Object>> rows = new ArrayList<>();
        for (TypeScore score : scores) {
            List<String> cells = CheckTables.typeCells(score);
            Map<String, Object> row = new LinkedHashMap<>();
            row.put("label", cells.get(0));
            for (int c = 0; c < columns.size(); c++) {
                row.put(columns.get(c), JsonText.number(cells.get(c + 1)));
            }
            rows.add(row);
        }
        return rows;
    }

    private static Map<String, Object> confusion(Confusion confusion) {
        Map<String, Object> map = new LinkedHashMap<>();
        confusion
                .rows()
                .forEach(
                        (known, counts) -> {
                            Map<String, Object> row = new LinkedHashMap<>();
                            for (int c = 0; c < counts.size(); c++) {
                                row.put(confusion.found().get(c), counts.get(c));
                            }
                            map.put(known, row);
                        });
        return map;
    }

    private static Map<String, Object> kind(KindScore kind) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("table", confusion(kind.table()));
        map.put("late_dwarfs", kind.lateDwarfs());
        map.put("late_dwarfs_kept", kind.lateDwarfsKept());
        map.put("contaminants", kind.contaminants());
        map.put("contaminants_let_in", kind.contaminantsLetIn());
        map.put("all_late_dwarfs", kind.allLateDwarfs());
        map.put("late_dwarfs_typed", kind.lateDwarfsTyped());
        map.put("all_contaminants", kind.allContaminants());
        map.put("contaminants_typed", kind.contaminantsTyped());
        return map;
    }

    private static Map<String, Object> outlier(ScoredObject object) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("name", object.name());
        map.put(
                "known_type_number",
                JsonText.number(Digits.type(object.known().typeNumber().orElseThrow())));
        map.put(
                "type_number",
                JsonText.number(Digits.type(object.found().type().orElseThrow().typeNumber())));
        map.put(
                "type_sigma",
                JsonText.number(Digits.type(object.found().type().orElseThrow().sigmaSubclass())));
        map.put("dataset", object.dataset());
        map.put("findings", object.findings());
        return map;
    }
}
