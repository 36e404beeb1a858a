package emberline.judge;

import java.util.HashMap;
import java.util.Map;

/** The single numbers of judging, from {@code settings.csv}. */
final class JudgeNumbers {

    private final Map<String, Double> values = new HashMap<>();

    JudgeNumbers() {
        JudgeTable.rows(
                "settings.csv",
                row -> values.put(row.getField("id"), JudgeTable.number(row, "value")));
    }

    /** The number of an id; the unit stands in the table. */
    double of(String id) {
        Double value = values.get(id);
        if (value == null) {
            throw new IllegalStateException("settings.csv: expected a row " + id);
        }
        return value;
    }
}
