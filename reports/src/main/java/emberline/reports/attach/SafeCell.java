package emberline.reports.attach;

import java.util.regex.Pattern;

/**
 * A cell that no spreadsheet takes for a formula: text that begins with {@code =}, {@code +},
 * {@code -}, {@code @}, their full-width forms, a tab or a line end gets an apostrophe before it.
 * Numbers and angles in degrees, minutes and seconds, such as {@code -1.5} and {@code -12:30:05.2},
 * are left as they are.
 */
final class SafeCell {

    /** By what a formula may begin, in some spreadsheets in full width too. */
    private static final String STARTS = "=+-@\t\r\n\uff1d\uff0b\uff0d\uff20";

    private static final Pattern NUMBER =
            Pattern.compile(
                    "[+-](\\d+\\.?\\d*|\\.\\d+)([eE][+-]?\\d{1,3})?|[+-]\\d{1,3}([: ]\\d{1,2}){1,2}(\\.\\d*)?");

    private SafeCell() {}

    static String of(String cell) {
        if (cell.isEmpty() || STARTS.indexOf(cell.charAt(0)) < 0) {
            return cell;
        }
        return NUMBER.matcher(cell).matches() ? cell : "'" + cell;
    }
}
