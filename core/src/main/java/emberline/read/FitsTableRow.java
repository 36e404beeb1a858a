package emberline.read;

import java.io.ByteArrayOutputStream;
import java.math.BigDecimal;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * One row of a FITS binary table that lies in a large file: its single values as text, and the
 * arrays of variable length that it points to (FITS standard 4.0, section 7.3).
 */
final class FitsTableRow {

    private static final Pattern FORM = Pattern.compile("(\\d{0,9})([LXBIJKAEDCMPQ])(.?).*");
    private static final int MOST_FIELDS = 999;

    private FitsTableRow() {}

    /**
     * A column.
     *
     * @param field its number, from 1
     * @param name name as written; empty where it has none
     * @param offset where its cell begins in a row (bytes)
     * @param count numbers or letters in a cell
     * @param kind letter of its kind
     * @param element letter of the elements that a pointer leads to
     */
    record Column(int field, String name, long offset, long count, char kind, char element) {

        boolean isPointer() {
            return kind == 'P' || kind == 'Q';
        }

        boolean isSingle() {
            return kind == 'A' || (count == 1 && "LBIJKED".indexOf(kind) >= 0);
        }

        long bytes() {
            return count * width(kind);
        }
    }

    /**
     * The columns of a table in their order; none where the forms are no forms, or need more room
     * than a row has.
     */
    static List<Column> columns(FitsCards header) {
        List<Column> columns = new ArrayList<>();
        long offset = 0;
        for (int field = 1; field <= Math.min(header.number("TFIELDS", 0), MOST_FIELDS); field++) {
            Matcher form = FORM.matcher(header.text("TFORM" + field).orElse(""));
            if (!form.matches()) {
                return List.of();
            }
            long count = form.group(1).isEmpty() ? 1 : Long.parseLong(form.group(1));
            char kind = form.group(2).charAt(0);
            long stored = kind == 'X' ? (count + 7) / 8 : count;
            char element = form.group(3).isEmpty() ? ' ' : form.group(3).charAt(0);
            Column column =
                    new Column(
                            field,
                            header.text("TTYPE" + field).orElse(""),
                            offset,
                            stored,
                            kind,
                            element);
            columns.add(column);
            offset += column.bytes();
        }
        return offset <= header.number("NAXIS1", 0) ? columns : List.of();
    }

    private static long width(char kind) {
        return switch (kind) {
            case 'I' -> 2;
            case 'J', 'E' -> 4;
            case 'K', 'D', 'C', 'P' -> 8;
            case 'M', 'Q' -> 16;
            default -> 1;
        };
    }

    /** What is known of each column, to find wavelength and flux among them. */
    static List<ColumnLabel> labels(FitsCards header) {
        List<ColumnLabel> labels = new ArrayList<>();
        for (Column column : columns(header)) {
            labels.add(
                    ColumnLabel.of(
                            column.name().isEmpty() ? "column" + column.field() : column.name(),
                            header.text("TUNIT" + column.field()),
                            header.text("TUCD" + column.field()).orElse(""),
                            header.text("TUTYP" + column.field()).orElse("")));
        }
        return labels;
    }

    /** Whether each row of a table holds a spectrum in its arrays. */
    static boolean holdsSpectra(FitsCards header, BooleanSupplier sharedWavelengths) {
        List<ColumnLabel> labels = labels(header);
        Optional<ColumnRoles> roles = ColumnRoles.find(labels);
        if (roles.isEmpty() && sharedWavelengths.getAsBoolean()) {
            labels.add(ColumnLabel.of("wavelength"));
            roles = ColumnRoles.find(labels);
        }
        if (roles.isEmpty()) {
            return false;
        }
        Column flux = columns(header).get(roles.get().flux());
        return flux.isPointer() || flux.count() > 1;
    }

    /**
     * Gathers the arrays of variable length of a row.
     *
     * @param fits the file
     * @param hdu the table
     * @param start where its heap begins in its data
     * @param pointers its columns that lead there
     * @param cells the row, in which the pointers are changed to lead into the new heap
     * @return the new heap
     */
    static byte[] heap(PackedFits fits, int hdu, long start, List<Column> pointers, byte[] cells)
            throws UnreadableSpectrumException {
        ByteBuffer row = ByteBuffer.wrap(cells);
        ByteArrayOutputStream heap = new ByteArrayOutputStream();
        for (Column column : pointers) {
            if (column.offset() + column.bytes() > cells.length) {
                continue;
            }
            int at = (int) column.offset();
            boolean wide = column.kind() == 'Q';
            long length = wide ? row.getLong(at) : row.getInt(at);
            long from = wide ? row.getLong(at + 8) : row.getInt(at + 4);
            byte[] array = fits.data(hdu, start + from, length * width(column.element()));
            if (wide) {
                row.putLong(at + 8, heap.size());
            } else {
                row.putInt(at + 4, heap.size());
            }
            heap.writeBytes(array);
        }
        return heap.toByteArray();
    }

    /** A single value of a row as text; empty where there is none. */
    static String text(FitsCards header, Column column, byte[] cells) {
        int at = (int) column.offset();
        if (column.kind() == 'A') {
            String text = new String(cells, at, (int) column.count(), StandardCharsets.ISO_8859_1);
            int end = text.indexOf('\0');
            return (end < 0 ? text : text.substring(0, end)).trim();
        }
        if (column.kind() == 'L') {
            return cells[at] == 'T' ? "true" : cells[at] == 'F' ? "false" : "";
        }
        return number(header, column, ByteBuffer.wrap(cells), at);
    }

    private static String number(FitsCards header, Column column, ByteBuffer row, int at) {
        String suffix = Integer.toString(column.field());
        double scale = header.text("TSCAL" + suffix).flatMap(Keywords::number).orElse(1.0);
        double zero = header.text("TZERO" + suffix).flatMap(Keywords::number).orElse(0.0);
        Object stored =
                switch (column.kind()) {
                    case 'B' -> (long) (row.get(at) & 0xff);
                    case 'I' -> (long) row.getShort(at);
                    case 'J' -> (long) row.getInt(at);
                    case 'K' -> row.getLong(at);
                    case 'E' -> row.getFloat(at);
                    default -> row.getDouble(at);
                };
        if (stored instanceof Long whole) {
            Optional<String> none = header.text("TNULL" + suffix);
            if (none.isPresent() && none.get().equals(whole.toString())) {
                return "";
            }
            if (scale == 1 && zero == Math.rint(zero)) {
                return Long.toString(whole + (long) zero);
            }
        }
        double value = ((Number) stored).doubleValue();
        if (!Double.isFinite(value)) {
            return "";
        }
        return scale == 1 && zero == 0
                ? new BigDecimal(stored.toString()).stripTrailingZeros().toPlainString()
                : BigDecimal.valueOf(zero + scale * value).stripTrailingZeros().toPlainString();
    }
}
