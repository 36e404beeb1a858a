package emberline.catalogue;

import java.util.Arrays;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.function.Supplier;
import java.util.stream.Collectors;

/** A row of a table: its cells by column, and where it stands. A missing column counts as blank. */
record CatalogueRow(String file, long line, Map<String, String> cells) {

    /** Copies the cells. */
    CatalogueRow {
        cells = Map.copyOf(cells);
    }

    /** File and line. */
    String where() {
        return file + ", line " + line;
    }

    /** A fault of one cell. */
    InvalidCatalogueException fault(String column, String found, String expected, String advice) {
        return new InvalidCatalogueException(
                where() + ", column " + column, found, expected, advice);
    }

    /** A cell as text; blank where it is. */
    String textOrBlank(String column) {
        return cells.getOrDefault(column, "");
    }

    /** A cell that must not be blank. */
    String text(String column) throws InvalidCatalogueException {
        String text = textOrBlank(column);
        if (text.isEmpty()) {
            throw fault(column, "is blank", "a value", "Fill it in, or leave the row out.");
        }
        return text;
    }

    /** A finite number. */
    double number(String column) throws InvalidCatalogueException {
        String text = text(column);
        double value;
        try {
            value = Double.parseDouble(text);
        } catch (NumberFormatException e) {
            value = Double.NaN;
        }
        if (!Double.isFinite(value)) {
            throw fault(
                    column,
                    "'" + text + "' is no number",
                    "a finite number such as 1.25",
                    "Put remarks in the column note.");
        }
        return value;
    }

    /** A finite number, or empty where the cell is blank. */
    OptionalDouble optionalNumber(String column) throws InvalidCatalogueException {
        return textOrBlank(column).isEmpty()
                ? OptionalDouble.empty()
                : OptionalDouble.of(number(column));
    }

    /** A finite number, or another where the cell is blank. */
    double numberOr(String column, double other) throws InvalidCatalogueException {
        return textOrBlank(column).isEmpty() ? other : number(column);
    }

    /** A positive number, or empty where the cell is blank. */
    OptionalDouble optionalPositive(String column) throws InvalidCatalogueException {
        OptionalDouble value = optionalNumber(column);
        if (value.isPresent() && !(value.getAsDouble() > 0)) {
            throw fault(
                    column,
                    "is " + textOrBlank(column),
                    "a positive number",
                    "Leave the cell blank where it is not known.");
        }
        return value;
    }

    /** A whole number within limits. */
    int wholeNumber(String column, int least, int most) throws InvalidCatalogueException {
        double value = number(column);
        if (value != Math.rint(value) || value < least || value > most) {
            throw fault(
                    column,
                    "is " + text(column),
                    "a whole number from " + least + " to " + most,
                    "Correct it.");
        }
        return (int) value;
    }

    /** How sure a number is, 0 to 100. */
    int confidencePercent() throws InvalidCatalogueException {
        return wholeNumber("confidence_percent", 0, 100);
    }

    /** How a number is known. */
    HowKnown howKnown() throws InvalidCatalogueException {
        return word("how_known", HowKnown.class);
    }

    /** A word of a closed list. */
    <E extends Enum<E>> E word(String column, Class<E> list) throws InvalidCatalogueException {
        String text = text(column);
        for (E word : list.getEnumConstants()) {
            if (word.name().equals(text)) {
                return word;
            }
        }
        throw fault(
                column,
                "unknown word '" + text + "'",
                Arrays.stream(list.getEnumConstants())
                        .map(Enum::name)
                        .collect(Collectors.joining(", ", "one of ", "")),
                "Use a word of the list, in capitals.");
    }

    /** A word of a closed list, or another where the cell is blank. */
    <E extends Enum<E>> E wordOr(String column, Class<E> list, E other)
            throws InvalidCatalogueException {
        return textOrBlank(column).isEmpty() ? other : word(column, list);
    }

    /** Makes a value of the row; what the value refuses is a fault of the row. */
    <T> T made(Supplier<T> value) throws InvalidCatalogueException {
        try {
            return value.get();
        } catch (IllegalArgumentException e) {
            throw new InvalidCatalogueException(where(), e.getMessage(), "Correct the row.");
        }
    }
}
