package emberline.demo;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;

/** A table among the resources of this module: comma-separated, {@code #} starts a comment. */
final class DemoTable {

    private final String name;
    private final List<NamedCsvRecord> rows;

    private DemoTable(String name, List<NamedCsvRecord> rows) {
        this.name = name;
        this.rows = rows;
    }

    /**
     * Reads a table that ships with this module.
     *
     * @param name file name of the resource
     * @return the table
     * @throws IllegalStateException if the module was built without it
     */
    static DemoTable named(String name) {
        InputStream stream = DemoTable.class.getResourceAsStream(name);
        if (stream == null) {
            throw new IllegalStateException(
                    "table " + name + " is missing in emberline/demo: build the module anew");
        }
        try (Reader reader = new InputStreamReader(stream, StandardCharsets.UTF_8);
                CsvReader<NamedCsvRecord> csv =
                        CsvReader.builder()
                                .commentStrategy(CommentStrategy.SKIP)
                                .ofNamedCsvRecord(reader)) {
            return new DemoTable(name, csv.stream().toList());
        } catch (IOException e) {
            throw new UncheckedIOException("table " + name + " could not be read", e);
        }
    }

    /** The rows in the order of the file. */
    List<Row> rows() {
        return rows.stream().map(row -> new Row(name, row)).toList();
    }

    /** The column names in the order of the file; empty for a table without rows. */
    List<String> columns() {
        return rows.isEmpty() ? List.of() : rows.get(0).getHeader();
    }

    /** One row; complaints name the table and the line. */
    record Row(String table, NamedCsvRecord csv) {

        /** The text of a cell, trimmed; empty where blank. */
        String text(String column) {
            return csv.getField(column).trim();
        }

        /** Whether a cell is blank. */
        boolean isBlank(String column) {
            return text(column).isEmpty();
        }

        /** The number in a cell, or another where it is blank. */
        double number(String column, double ifBlank) {
            return isBlank(column) ? ifBlank : number(column);
        }

        /** The number in a cell. */
        double number(String column) {
            try {
                return Double.parseDouble(text(column));
            } catch (NumberFormatException e) {
                throw new IllegalStateException(
                        table
                                + " line "
                                + csv.getStartingLineNumber()
                                + ", column "
                                + column
                                + ": found \""
                                + text(column)
                                + "\", expected a number",
                        e);
            }
        }
    }
}
