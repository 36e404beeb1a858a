package emberline.catalogue;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.io.InputStream;
import java.util.ArrayList;
import java.util.List;

/** Reads a table of expected values from the test resources. */
public final class TestTable {

    private TestTable() {}

    /**
     * All rows of a table with comment lines and a header.
     *
     * @param owner class beside which the resource lies
     * @param resource name of the resource
     * @return rows in order
     * @throws IOException if it cannot be read
     */
    public static List<NamedCsvRecord> rows(Class<?> owner, String resource) throws IOException {
        List<NamedCsvRecord> rows = new ArrayList<>();
        try (InputStream stream = owner.getResourceAsStream(resource);
                CsvReader<NamedCsvRecord> reader =
                        CsvReader.builder()
                                .commentStrategy(CommentStrategy.SKIP)
                                .ofNamedCsvRecord(stream)) {
            reader.forEach(rows::add);
        }
        return rows;
    }

    /**
     * A cell as a number.
     *
     * @param row a row
     * @param column name of the column
     * @return the number
     */
    public static double number(NamedCsvRecord row, String column) {
        return Double.parseDouble(row.getField(column));
    }
}
