package emberline.place.calibrated;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;

/** The features that place an object on the sequence. */
final class LocusFeatures {

    private static final String RESOURCE = "/emberline/place/calibrated/locus-features.csv";

    private LocusFeatures() {}

    /**
     * The features of the product's calibration.
     *
     * @return feature ids
     */
    static List<String> standard() {
        try (InputStream stream = LocusFeatures.class.getResourceAsStream(RESOURCE);
                CsvReader<NamedCsvRecord> rows =
                        CsvReader.builder()
                                .commentStrategy(CommentStrategy.SKIP)
                                .ofNamedCsvRecord(
                                        new InputStreamReader(stream, StandardCharsets.UTF_8))) {
            return rows.stream().map(row -> row.getField("feature")).toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
