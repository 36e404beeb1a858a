package emberline.judge;

import java.util.HashMap;
import java.util.Map;

/** The single numbers of judging, from {@code settings.csv}. */
final class JudgeNumbers {

    private final Map<String, Double> values = new HashMap<>();

    private JudgeNumbers() {
        JudgeTable.rows(
                "settings.csv",
                row -> values.put(row.getField("id"), JudgeTable.number(row, "value")));
    }

    /** The numbers of the product. */
    static JudgeNumbers standard() {
        return Loaded.STANDARD;
    }

    /** Read once, when first asked for. */
    private static final class Loaded {
        private static final JudgeNumbers STANDARD = new JudgeNumbers();
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
