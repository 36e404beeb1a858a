package emberline.reports.attach;

import de.siegmar.fastcsv.writer.CsvWriter;
import de.siegmar.fastcsv.writer.LineDelimiter;
import emberline.survey.ObjectResult;
import java.io.Closeable;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;

/**
 * The results table as a CSV file, written row by row in the order of the calls. The rows go to a
 * temporary file in the same folder, which takes the place of the table at once when it is closed;
 * a table that was not closed, or of which a row could not be written, leaves the former file as it
 * was.
 *
 * <p>UTF-8, comma, line feed. Text that a spreadsheet would take for a formula (it begins with
 * {@code =}, {@code +}, {@code -} or {@code @} and is not a number) gets an apostrophe before it.
 * Not for use by several threads at once.
 */
public final class ResultTable implements Closeable {

    private final AtomicFile file;
    private final CsvWriter csv;
    private final List<ResultColumn> columns;
    private boolean failed;

    private ResultTable(AtomicFile file, CsvWriter csv, List<ResultColumn> columns) {
        this.file = file;
        this.csv = csv;
        this.columns = columns;
    }

    /**
     * Opens a table and writes its header.
     *
     * @param target the file that will be the table; its folder exists
     * @param columns the columns in their order
     * @return a table to which rows can be written
     * @throws IOException if the folder cannot be written to
     */
    public static ResultTable open(Path target, List<ResultColumn> columns) throws IOException {
        AtomicFile file = AtomicFile.beside(target);
        CsvWriter csv = writer(file);
        ResultTable table = new ResultTable(file, csv, List.copyOf(columns));
        table.writeCells(columns.stream().map(ResultColumn::name).toList());
        return table;
    }

    private static CsvWriter writer(AtomicFile file) throws IOException {
        return CsvWriter.builder()
                .lineDelimiter(LineDelimiter.LF)
                .build(file.temporary(), StandardCharsets.UTF_8);
    }

    /**
     * Writes the row of an object.
     *
     * @param result the result of an object
     * @throws IOException if it cannot be written, for instance because the disk is full
     */
    public void write(ObjectResult result) throws IOException {
        writeCells(columns.stream().map(column -> column.text(result)).toList());
    }

    /**
     * Writes a row whose cells are known.
     *
     * @param cells the texts of all columns in their order
     * @throws IOException if it cannot be written
     * @throws IllegalArgumentException if there are not as many cells as columns
     */
    public void writeRow(List<String> cells) throws IOException {
        if (cells.size() != columns.size()) {
            throw new IllegalArgumentException(
                    cells.size() + " cells: expected " + columns.size() + ", one a column");
        }
        writeCells(cells);
    }

    /**
     * Gives the table up: what was written is deleted when it is closed and the former file stays.
     */
    public void abandon() {
        failed = true;
    }

    /**
     * Ends the table and puts it in its place.
     *
     * @throws IOException if it cannot be written or moved
     */
    @Override
    public void close() throws IOException {
        try {
            csv.close();
        } catch (IOException e) {
            failed = true;
            throw e;
        } finally {
            if (failed) {
                file.discard();
            }
        }
        if (!failed) {
            file.commit();
        }
    }

    private void writeCells(List<String> cells) throws IOException {
        try {
            csv.writeRecord(cells.stream().map(SafeCell::of).toList());
        } catch (java.io.UncheckedIOException e) {
            failed = true;
            throw e.getCause();
        }
    }
}
