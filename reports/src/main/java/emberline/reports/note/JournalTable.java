package emberline.reports.note;

import emberline.reports.attach.ResultColumn;
import java.io.IOException;
import java.io.Writer;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * The table in the machine-readable form of journals: a description byte by byte, then columns of
 * fixed width in ASCII. Empty cells are blank. Numbers keep their printed digits, so that the
 * decimals of a column may be fewer than its format states.
 */
final class JournalTable {

    private static final int WIDTH = 80;
    private static final String DOUBLE_RULE = "=".repeat(WIDTH) + "\n";
    private static final String RULE = "-".repeat(WIDTH) + "\n";

    private JournalTable() {}

    static void write(TableRows rows, String title, String file, Writer out) throws IOException {
        out.write("Title: " + PlainAscii.of(title) + "\n");
        out.write("Authors: (fill in)\n");
        out.write("Table: Results for each object (? for signs without a like in ASCII)\n");
        out.write(DOUBLE_RULE);
        out.write("Byte-by-byte Description of file: " + PlainAscii.of(file) + "\n");
        out.write(RULE);
        int label = 5;
        int units = 5;
        for (ResultColumn column : rows.columns()) {
            label = Math.max(label, PlainAscii.of(column.name()).length());
            units = Math.max(units, TableUnit.of(column.unit()).journal().length());
        }
        String form = "%11s %-6s %-" + units + "s %-" + label + "s %s";
        out.write(line(form, "Bytes  ", "Format", "Units", "Label", "Explanations"));
        out.write(RULE);
        int start = 1;
        for (int c = 0; c < rows.columns().size(); c++) {
            ResultColumn column = rows.columns().get(c);
            int end = start + rows.facts(c).widest() - 1;
            String bytes =
                    start == end
                            ? String.format(Locale.ROOT, "%11d", start)
                            : String.format(Locale.ROOT, "%5d-%5d", start, end);
            String blank = rows.facts(c).hasEmpty() ? "? " : "";
            String unit = rows.isNumber(c) ? TableUnit.of(column.unit()).journal() : "---";
            List<String> words =
                    wrapped(
                            blank + PlainAscii.of(column.description()),
                            Math.max(24, WIDTH - 21 - units - label));
            out.write(
                    line(
                            form,
                            bytes,
                            format(rows, c),
                            unit,
                            PlainAscii.of(column.name()).replace(' ', '_'),
                            words.get(0)));
            for (String more : words.subList(1, words.size())) {
                out.write(line(form, "", "", "", "", more));
            }
            start = end + 2;
        }
        out.write(RULE);
        rows.forEach(cells -> out.write(row(rows, cells)));
    }

    private static String line(String form, Object... parts) {
        return String.format(Locale.ROOT, form, parts).stripTrailing() + "\n";
    }

    private static String format(TableRows rows, int c) {
        TableRows.Facts facts = rows.facts(c);
        if (!rows.isNumber(c)) {
            return "A" + facts.widest();
        }
        if (facts.hasExponent()) {
            return "E" + facts.widest() + "." + facts.decimals();
        }
        return facts.isWhole()
                ? "I" + facts.widest()
                : "F" + facts.widest() + "." + facts.decimals();
    }

    private static String row(TableRows rows, List<String> cells) {
        StringBuilder line = new StringBuilder();
        for (int c = 0; c < cells.size(); c++) {
            String cell = PlainAscii.of(cells.get(c));
            String pad = " ".repeat(rows.facts(c).widest() - cell.length());
            line.append(c == 0 ? "" : " ").append(rows.isNumber(c) ? pad + cell : cell + pad);
        }
        return line.append('\n').toString();
    }

    private static List<String> wrapped(String text, int width) {
        List<String> lines = new ArrayList<>();
        StringBuilder line = new StringBuilder();
        for (String word : text.split(" ", -1)) {
            if (!line.isEmpty() && line.length() + 1 + word.length() > width) {
                lines.add(line.toString());
                line.setLength(0);
            }
            line.append(line.isEmpty() ? "" : " ").append(word);
        }
        lines.add(line.toString());
        return lines;
    }
}
