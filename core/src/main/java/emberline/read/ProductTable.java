package emberline.read;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;

/**
 * A small table that ships with the product beside the class that uses it: CSV in UTF-8 with a
 * header; lines that start with {@code #} are comments. Tables of the catalogue have a loader of
 * their own, which says what is wrong with a user's row.
 */
public final class ProductTable {

    private final String resource;

    private ProductTable(String resource) {
        this.resource = resource;
    }

    /**
     * A table of the product.
     *
     * @param resource its place on the class path, with a slash in front
     * @return the table, not yet read
     */
    public static ProductTable at(String resource) {
        return new ProductTable(resource);
    }

    /**
     * The rows of the table.
     *
     * @return rows with their cells by column name, in the order of the table
     * @throws IllegalStateException if the product was built without the table
     */
    public List<NamedCsvRecord> rows() {
        try (CsvReader<NamedCsvRecord> rows =
                CsvReader.builder()
                        .commentStrategy(CommentStrategy.SKIP)
                        .ofNamedCsvRecord(text())) {
            return rows.stream().toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private String text() throws IOException {
        try (InputStream stream = ProductTable.class.getResourceAsStream(resource)) {
            if (stream == null) {
                throw new IllegalStateException(
                        resource
                                + ": not in the product: expected a table of the build. Build it"
                                + " anew.");
            }
            return new String(stream.readAllBytes(), StandardCharsets.UTF_8);
        }
    }

    /**
     * A fault in a row, which is a fault of the product.
     *
     * @param row the row
     * @param what what is wrong with it
     * @return an exception that names table and line
     */
    public IllegalStateException fault(NamedCsvRecord row, String what) {
        return new IllegalStateException(
                resource + ", line " + row.getStartingLineNumber() + ": " + what);
    }
}
