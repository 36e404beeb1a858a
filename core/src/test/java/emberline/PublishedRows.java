package emberline;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.util.List;

/** Rows of the tables of published and independently computed values beside the tests. */
public final class PublishedRows {

    private PublishedRows() {}

    /** The rows of a table under {@code emberline/published/}. */
    public static List<NamedCsvRecord> of(String table) throws IOException {
        String resource = "/emberline/published/" + table;
        try (CsvReader<NamedCsvRecord> rows =
                CsvReader.builder()
                        .commentStrategy(CommentStrategy.SKIP)
                        .ofNamedCsvRecord(
                                new InputStreamReader(
                                        PublishedRows.class.getResourceAsStream(resource),
                                        StandardCharsets.UTF_8))) {
            return rows.stream().toList();
        }
    }

    /** A cell as a number. */
    public static double number(NamedCsvRecord row, String column) {
        return Double.parseDouble(row.getField(column));
    }
}
