package emberline.reports.note;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import de.siegmar.fastcsv.writer.CsvWriter;
import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumn.Content;
import java.io.Closeable;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Pattern;

/**
 * The rows of a table, kept in a temporary file until all are known, with what the formats need to
 * know of each column. Memory does not grow with the rows.
 */
final class TableRows implements Closeable {

    private static final Pattern NUMBER =
            Pattern.compile("[+-]?(\\d+\\.?\\d*|\\.\\d+)([eE][+-]?\\d{1,3})?");
    private static final Pattern WHOLE = Pattern.compile("[+-]?\\d+");

    private final List<ResultColumn> columns;
    private final Path file;
    private final CsvWriter writer;
    private final Facts[] facts;
    private long count;
    private boolean ended;

    TableRows(List<ResultColumn> columns, Path file) throws IOException {
        this.columns = List.copyOf(columns);
        this.file = file;
        Files.deleteIfExists(file); // perhaps a link to something outside the folder
        this.writer =
                CsvWriter.builder()
                        .build(
                                file,
                                StandardCharsets.UTF_8,
                                StandardOpenOption.CREATE_NEW,
                                StandardOpenOption.WRITE);
        this.facts = new Facts[columns.size()];
        for (int c = 0; c < facts.length; c++) {
            facts[c] = new Facts();
        }
    }

    /** What the cells of a column have in common. */
    static final class Facts {
        private int widest = 1;
        private int decimals;
        private boolean empty;
        private boolean numeric = true;
        private boolean exponent;
        private boolean whole = true;
        private boolean ascii = true;

        private void add(String cell) {
            empty |= cell.isEmpty();
            widest = Math.max(widest, PlainAscii.of(cell).length());
            ascii &= cell.chars().allMatch(sign -> sign < 128);
            if (cell.isEmpty()) {
                return;
            }
            numeric &= NUMBER.matcher(cell).matches();
            whole &= WHOLE.matcher(cell).matches();
            int power = Math.max(cell.indexOf('e'), cell.indexOf('E'));
            exponent |= power >= 0;
            int point = cell.indexOf('.');
            int end = power < 0 ? cell.length() : power;
            decimals = Math.max(decimals, point < 0 ? 0 : end - point - 1);
        }

        /** The widest cell in ASCII, at least 1. */
        int widest() {
            return widest;
        }

        /** The most decimals. */
        int decimals() {
            return decimals;
        }

        /** Whether a cell is empty. */
        boolean hasEmpty() {
            return empty;
        }

        /** Whether all are whole numbers. */
        boolean isWhole() {
            return whole;
        }

        /** Whether a number has an exponent. */
        boolean hasExponent() {
            return exponent;
        }

        /** Whether all text is ASCII. */
        boolean isAscii() {
            return ascii;
        }
    }

    List<ResultColumn> columns() {
        return columns;
    }

    Facts facts(int column) {
        return facts[column];
    }

    long count() {
        return count;
    }

    /** Whether a column holds numbers: by its nature, or with a unit and nothing but numbers. */
    boolean isNumber(int column) {
        ResultColumn of = columns.get(column);
        return of.content() == Content.NUMBER || (!of.unit().isEmpty() && facts[column].numeric);
    }

    /** Adds a row. */
    void add(List<String> cells) throws IOException {
        for (int c = 0; c < facts.length; c++) {
            facts[c].add(cells.get(c));
        }
        count++;
        try {
            writer.writeRecord(cells);
        } catch (UncheckedIOException e) {
            throw e.getCause();
        }
    }

    /** Ends the writing. */
    void end() throws IOException {
        if (!ended) {
            ended = true;
            writer.close();
        }
    }

    /** Does something with a row. */
    @FunctionalInterface
    interface RowUse {
        void use(List<String> cells) throws IOException;
    }

    /** Hands out all rows in their order. */
    void forEach(RowUse use) throws IOException {
        try (CsvReader<CsvRecord> csv = CsvReader.builder().ofCsvRecord(file)) {
            for (CsvRecord row : csv) {
                use.use(new ArrayList<>(row.getFields()));
            }
        }
    }

    @Override
    public void close() throws IOException {
        try {
            end();
        } finally {
            Files.deleteIfExists(file);
        }
    }
}
