package emberline.judge;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;

/** Reads the tables of this package: comments with {@code #}, then a header, then rows. */
final class JudgeTable {

    private static final String FOLDER = "/emberline/judge/";

    private JudgeTable() {}

    /** Every row of a table, turned into a value; the message of a failure says where. */
    static <T> List<T> rows(String name, Function<NamedCsvRecord, T> make) {
        String resource = FOLDER + name;
        List<T> values = new ArrayList<>();
        try (InputStream stream = JudgeTable.class.getResourceAsStream(resource);
                CsvReader<NamedCsvRecord> rows =
                        CsvReader.builder()
                                .commentStrategy(CommentStrategy.SKIP)
                                .ofNamedCsvRecord(
                                        new InputStreamReader(stream, StandardCharsets.UTF_8))) {
            for (NamedCsvRecord row : rows) {
                try {
                    values.add(make.apply(row));
                } catch (IllegalArgumentException e) {
                    throw new IllegalStateException(
                            resource
                                    + ", line "
                                    + row.getStartingLineNumber()
                                    + ": "
                                    + e.getMessage(),
                            e);
                }
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return values;
    }

    /** A cell as a number. */
    static double number(NamedCsvRecord row, String column) {
        return Double.parseDouble(row.getField(column));
    }

    /** A cell as a number, or another number where it is blank. */
    static double number(NamedCsvRecord row, String column, double blank) {
        String cell = row.getField(column);
        return cell.isBlank() ? blank : Double.parseDouble(cell);
    }
}
