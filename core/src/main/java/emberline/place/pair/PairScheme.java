package emberline.place.pair;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;

/**
 * How a paper counts its criteria.
 *
 * @param source key of the paper
 * @param leastTypeNumber earliest composite type for which the criteria are printed
 * @param greatestTypeNumber latest one
 * @param candidateFrom number of criteria that make a candidate
 * @param weakFrom number of criteria that make a weak candidate
 */
record PairScheme(
        String source,
        double leastTypeNumber,
        double greatestTypeNumber,
        int candidateFrom,
        int weakFrom) {

    private static final String RESOURCE = "/emberline/place/pair/schemes.csv";

    /** The schemes of the resource. */
    static List<PairScheme> standard() {
        try (InputStream stream = PairScheme.class.getResourceAsStream(RESOURCE);
                CsvReader<NamedCsvRecord> rows =
                        CsvReader.builder()
                                .commentStrategy(CommentStrategy.SKIP)
                                .ofNamedCsvRecord(
                                        new InputStreamReader(stream, StandardCharsets.UTF_8))) {
            return rows.stream()
                    .map(
                            row ->
                                    new PairScheme(
                                            row.getField("source"),
                                            Double.parseDouble(row.getField("least_type_number")),
                                            Double.parseDouble(
                                                    row.getField("greatest_type_number")),
                                            Integer.parseInt(row.getField("candidate_from")),
                                            Integer.parseInt(row.getField("weak_from"))))
                    .toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
