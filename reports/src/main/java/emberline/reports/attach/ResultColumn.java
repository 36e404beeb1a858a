package emberline.reports.attach;

import emberline.survey.ObjectResult;
import java.util.function.Function;

/**
 * A column of the results table: what it is called, what it holds and how it is taken from the
 * result of an object. Every format of the table, and its descriptions, are made from this.
 *
 * @param name name of the column and key in JSON, lower case with underscores
 * @param unit unit of its numbers; empty for text and for numbers without unit
 * @param ucd unified content descriptor of the Virtual Observatory (UCD1+); empty only for columns
 *     of a candidate list of which nothing is known
 * @param description one sentence on what it holds
 * @param content whether the cells are text or numbers
 * @param take the cell as text: digits with a decimal point for a number; empty where there is
 *     nothing to say
 */
public record ResultColumn(
        String name,
        String unit,
        String ucd,
        String description,
        Content content,
        Function<ObjectResult, String> take) {

    /**
     * A column without a content descriptor.
     *
     * @param name name of the column
     * @param unit unit of its numbers
     * @param description one sentence on what it holds
     * @param content whether the cells are text or numbers
     * @param take the cell as text
     */
    public ResultColumn(
            String name,
            String unit,
            String description,
            Content content,
            Function<ObjectResult, String> take) {
        this(name, unit, "", description, content, take);
    }

    /**
     * The same column with a content descriptor.
     *
     * @param descriptor words of UCD1+, joined by {@code ;}, the primary one first
     * @return a new column
     */
    public ResultColumn withUcd(String descriptor) {
        return new ResultColumn(name, unit, descriptor, description, content, take);
    }

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
