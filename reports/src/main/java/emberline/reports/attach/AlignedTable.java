package emberline.reports.attach;

import de.siegmar.fastcsv.writer.CsvWriter;
import de.siegmar.fastcsv.writer.LineDelimiter;
import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Pattern;

/** Rows of text under a header, as aligned columns, CSV or JSON. Columns of numbers align right. */
final class AlignedTable {

    private static final String GAP = "  ";
    private static final Pattern NUMBER = Pattern.compile("[+-]?\\d+(\\.\\d+)?|");
    private static final Pattern CONTROL = Pattern.compile("\\p{Cntrl}");

    private final List<String> header;
    private final List<List<String>> rows = new ArrayList<>();

    AlignedTable(List<String> header) {
        this.header = List.copyOf(header);
    }

    void add(List<String> cells) {
        rows.add(List.copyOf(cells));
    }

    boolean isEmpty() {
        return rows.isEmpty();
    }

    /** The table in a form; as JSON an array of objects whose values are all text. */
    String print(TableFormat format) {
        return switch (format) {
            case JSON -> json();
            case CSV -> csv();
            case TEXT -> text();
        };
    }

    private String json() {
        List<Map<String, Object>> objects = new ArrayList<>();
        for (List<String> row : rows) {
            Map<String, Object> object = new LinkedHashMap<>();
            for (int c = 0; c < header.size(); c++) {
                object.put(header.get(c), row.get(c));
            }
            objects.add(object);
        }
        return JsonText.of(objects) + "\n";
    }

    String csv() {
        StringWriter text = new StringWriter();
        try (CsvWriter csv = CsvWriter.builder().lineDelimiter(LineDelimiter.LF).build(text)) {
            csv.writeRecord(header);
            for (List<String> row : rows) {
                csv.writeRecord(row.stream().map(SafeCell::of).toList());
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return text.toString();
    }

    /** Aligned columns; control characters, which could drive a terminal, become blanks. */
    String text() {
        List<List<String>> all = new ArrayList<>();
        all.add(header);
        rows.forEach(row -> all.add(row.stream().map(AlignedTable::printable).toList()));
        int[] widths = new int[header.size()];
        for (List<String> row : all) {
            for (int c = 0; c < widths.length; c++) {
                widths[c] = Math.max(widths[c], length(row.get(c)));
            }
        }
        boolean[] right = new boolean[widths.length];
        for (int c = 0; c < widths.length; c++) {
            int column = c;
            right[c] = rows.stream().allMatch(row -> NUMBER.matcher(row.get(column)).matches());
        }
        StringBuilder text = new StringBuilder();
        for (List<String> row : all) {
            StringBuilder line = new StringBuilder();
            for (int c = 0; c < widths.length; c++) {
                String pad = " ".repeat(widths[c] - length(row.get(c)));
                line.append(c == 0 ? "" : GAP)
                        .append(right[c] ? pad + row.get(c) : row.get(c) + pad);
            }
            text.append(line.toString().stripTrailing()).append('\n');
        }
        return text.toString();
    }

    /** The text on one line, without characters that could drive a terminal. */
    static String printable(String cell) {
        return CONTROL.matcher(cell).replaceAll(" ");
    }

    private static int length(String cell) {
        return cell.codePointCount(0, cell.length());
    }
}
