package emberline.read;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * A table of numbers in a text file: comments, at most one line of names and one of units, then
 * rows of equally many cells. Cells without a value are NaN.
 */
final class TextTable {

    private static final int MOST_COMMENTS = 1000;
    private static final int MOST_COLUMNS = 2000;

    private final String name;
    private final byte[] bytes;
    private final List<String> comments = new ArrayList<>();
    private final TextCells cells = new TextCells();
    private List<String> names = List.of();
    private List<String> units = List.of();
    private char separator;
    private double[][] columns = new double[0][];
    private int[] lines = new int[0];
    private int rows;

    private TextTable(FileContent content) {
        this.name = content.name();
        this.bytes = content.bytes();
    }

    /** Reads a text file; refuses rows of unequal length and cells that are no numbers. */
    static TextTable read(FileContent content) throws UnreadableSpectrumException {
        TextTable table = new TextTable(content);
        table.readLines();
        return table;
    }

    /** Comment lines before and among the rows, without their mark. */
    List<String> comments() {
        return comments;
    }

    /** Names of the columns as written in a line of their own; empty where there is none. */
    List<String> names() {
        return names;
    }

    /** Units as written in a line below the names; empty where there is none. */
    List<String> units() {
        return units;
    }

    /** The separator between cells. */
    char separator() {
        return separator;
    }

    int columnCount() {
        return columns.length;
    }

    int rowCount() {
        return rows;
    }

    /** The numbers of a column, as many as rows. */
    double[] column(int column) {
        return Arrays.copyOf(columns[column], rows);
    }

    /** The line of a row, counted from 1. */
    int line(int row) {
        return lines[row];
    }

    private void readLines() throws UnreadableSpectrumException {
        int at = startsWithByteOrderMark() ? 3 : 0;
        int line = 0;
        while (at < bytes.length) {
            int end = endOfLine(at);
            line++;
            readLine(at, end, line);
            at = end + 1;
            if (end + 1 < bytes.length && bytes[end] == '\r' && bytes[end + 1] == '\n') {
                at++;
            }
        }
        if (rows == 0) {
            throw new UnreadableSpectrumException(
                    name,
                    "no row of numbers",
                    "rows of wavelength, flux and, if known, sigma",
                    "Check that this is the spectrum and not a note about it.");
        }
    }

    private boolean startsWithByteOrderMark() {
        return bytes.length > 2
                && (bytes[0] & 0xff) == 0xef
                && (bytes[1] & 0xff) == 0xbb
                && (bytes[2] & 0xff) == 0xbf;
    }

    private int endOfLine(int from) {
        int i = from;
        while (i < bytes.length && bytes[i] != '\n' && bytes[i] != '\r') {
            i++;
        }
        return i;
    }

    private void readLine(int start, int end, int line) throws UnreadableSpectrumException {
        int from = start;
        while (from < end && bytes[from] <= ' ' && bytes[from] >= 0) {
            from++;
        }
        if (from == end) {
            return;
        }
        int mark = commentMark(from, end);
        if (mark > 0) {
            if (comments.size() < MOST_COMMENTS) {
                comments.add(TextCells.decode(bytes, from + mark, end).trim());
            }
            return;
        }
        if (rows == 0) {
            separator = separatorOf(from, end);
        }
        cut(start, from, end);
        if (rows == 0 && !beginsWithNumber()) {
            readHeading(line);
            return;
        }
        addRow(line);
    }

    /**
     * Cuts a line into cells. Tabs and blanks may change places from row to row, as long as one of
     * the two gives the number of cells that the rows before had.
     */
    private void cut(int start, int from, int end) {
        cells.cut(bytes, separator == '\t' ? start : from, end, separator);
        boolean blank = separator == '\t' || separator == TextCells.BLANKS;
        if (rows > 0 && blank && cells.count() != columns.length) {
            char other = separator == '\t' ? TextCells.BLANKS : '\t';
            cells.cut(bytes, other == '\t' ? start : from, end, other);
            if (cells.count() != columns.length) {
                cells.cut(bytes, separator == '\t' ? start : from, end, separator);
            }
        }
    }

    /** How many characters the mark of a comment has; 0 where the line is none. */
    private int commentMark(int from, int end) {
        char c = (char) bytes[from];
        if (c == '#' || c == ';' || c == '!' || c == '%') {
            return 1;
        }
        return c == '/' && from + 1 < end && bytes[from + 1] == '/' ? 2 : 0;
    }

    private char separatorOf(int from, int end) {
        if (TextCells.indexOf(bytes, from, end, ',') >= 0) {
            return ',';
        }
        if (TextCells.indexOf(bytes, from, end, ';') >= 0) {
            return ';';
        }
        return TextCells.indexOf(bytes, from, end, '\t') >= 0 && !isAlignedWithTabs(from, end)
                ? '\t'
                : TextCells.BLANKS;
    }

    /** Whether a line with tabs has its cells between blanks of any kind, none of them empty. */
    private boolean isAlignedWithTabs(int from, int end) {
        cells.cut(bytes, from, end, TextCells.BLANKS);
        int byBlanks = cells.count();
        boolean numbers = beginsWithNumber();
        cells.cut(bytes, from, end, '\t');
        return byBlanks == cells.count()
                || cells.count() == 1
                || (numbers && byBlanks > cells.count());
    }

    private boolean beginsWithNumber() {
        DecimalText.Cell first = cells.kind(0);
        return first == DecimalText.Cell.NUMBER
                || (first == DecimalText.Cell.NO_VALUE
                        && cells.count() > 1
                        && cells.kind(1) == DecimalText.Cell.NUMBER);
    }

    private void readHeading(int line) throws UnreadableSpectrumException {
        if (names.isEmpty()) {
            names = separator == TextCells.BLANKS ? unitsJoined(cells.texts()) : cells.texts();
        } else if (units.isEmpty() && cells.count() == names.size() && !hasNumber()) {
            units = cells.texts();
        } else {
            throw notANumber(line, 0);
        }
    }

    /** Joins a unit in brackets, which blanks cut off, to the name before it. */
    private static List<String> unitsJoined(List<String> words) {
        List<String> joined = new ArrayList<>();
        boolean open = false;
        for (String word : words) {
            boolean opens = word.startsWith("(") || word.startsWith("[");
            if (!joined.isEmpty() && (open || opens)) {
                joined.set(joined.size() - 1, joined.get(joined.size() - 1) + " " + word);
                open = !(word.endsWith(")") || word.endsWith("]"));
            } else {
                joined.add(word);
            }
        }
        return joined;
    }

    private boolean hasNumber() {
        for (int i = 0; i < cells.count(); i++) {
            if (cells.kind(i) == DecimalText.Cell.NUMBER) {
                return true;
            }
        }
        return false;
    }

    private void addRow(int line) throws UnreadableSpectrumException {
        if (columns.length == 0) {
            start(line);
        }
        if (cells.count() != columns.length) {
            throw new UnreadableSpectrumException(
                    name + ", line " + line,
                    cells.count() + (cells.count() == 1 ? " cell" : " cells"),
                    columns.length + " as in line " + lines[0] + (rows == 0 ? " (names)" : ""),
                    "Complete the row or remove it.");
        }
        if (rows == lines.length) {
            grow(rows * 2);
        }
        for (int i = 0; i < columns.length; i++) {
            double value = cells.number(i);
            if (Double.isNaN(value) && cells.kind(i) == DecimalText.Cell.OTHER) {
                throw notANumber(line, i);
            }
            columns[i][rows] = value;
        }
        lines[rows++] = line;
    }

    private void start(int line) throws UnreadableSpectrumException {
        int count = cells.count();
        if (count < 2 || count > MOST_COLUMNS) {
            throw new UnreadableSpectrumException(
                    name + ", line " + line,
                    count + (count == 1 ? " column" : " columns"),
                    "at least two columns: wavelength and flux",
                    "Give the wavelengths in a column of their own; separate cells by blanks, tabs"
                            + " or commas.");
        }
        columns = new double[count][];
        grow(1024);
        lines[0] = line;
        if (!names.isEmpty() && names.size() != count) {
            throw new UnreadableSpectrumException(
                    name + ", line " + line,
                    count + " cells below " + names.size() + " column names",
                    "as many cells as names",
                    "Complete the row or the line of names.");
        }
    }

    private void grow(int size) {
        for (int i = 0; i < columns.length; i++) {
            columns[i] = columns[i] == null ? new double[size] : Arrays.copyOf(columns[i], size);
        }
        lines = Arrays.copyOf(lines, size);
    }

    private UnreadableSpectrumException notANumber(int line, int cell) {
        String text = cells.text(cell);
        return new UnreadableSpectrumException(
                name + ", line " + line,
                "'"
                        + (text.length() > 40 ? text.substring(0, 40) + "..." : text)
                        + "' in column "
                        + (cell + 1),
                "a number",
                "Correct the cell, leave it empty, or mark the line as a comment with #.");
    }
}
