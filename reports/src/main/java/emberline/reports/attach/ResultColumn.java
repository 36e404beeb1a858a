package emberline.reports.attach;

import emberline.survey.ObjectResult;
import java.util.function.Function;

/**
 * A column of the results table: what it is called, what it holds and how it is taken from the
 * result of an object.
 *
 * @param name name of the column and key in JSON, lower case with underscores
 * @param unit unit of its numbers; empty for text and for numbers without unit
 * @param description one sentence on what it holds
 * @param content whether the cells are text or numbers
 * @param take the cell as text: digits with a decimal point for a number; empty where there is
 *     nothing to say
 */
public record ResultColumn(
        String name,
        String unit,
        String description,
        Content content,
        Function<ObjectResult, String> take) {

    /** What the cells of a column hold. */
    public enum Content {
        /** Words. */
        TEXT,
        /** A number, or nothing. */
        NUMBER
    }

    /**
     * The cell of an object.
     *
     * @param result the result of an object
     * @return the text; empty where there is nothing to say, never null
     */
    public String text(ObjectResult result) {
        return take.apply(result);
    }
}
