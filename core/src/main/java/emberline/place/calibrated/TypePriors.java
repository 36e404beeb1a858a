package emberline.place.calibrated;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.place.GravityClass;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.NavigableMap;
import java.util.TreeMap;

/** The priors over type and gravity that the product knows. */
public enum TypePriors {
    /** Every type is as probable as every other. */
    FLAT("flat", "every type equally probable"),
    /** Types as they are in a volume of space. */
    VOLUME("volume", "space densities of the solar neighbourhood"),
    /** Types as they are in a sample limited in J. */
    MAGNITUDE("magnitude", "space densities weighted to a sample limited in J");

    private static final String FOLDER = "/emberline/place/calibrated/";

    private final String word;
    private final String description;

    TypePriors(String word, String description) {
        this.word = word;
        this.description = description;
    }

    /**
     * The word for it.
     *
     * @return one word in lower case
     */
    public String word() {
        return word;
    }

    /**
     * What it assumes.
     *
     * @return a few words
     */
    public String description() {
        return description;
    }

    /**
     * The prior with its tables read.
     *
     * @return the prior
     */
    public TypePrior load() {
        Map<GravityClass, Double> share = new EnumMap<>(GravityClass.class);
        for (NamedCsvRecord row : rows("gravity-prior.csv")) {
            for (GravityClass gravity : GravityClass.values()) {
                if (gravity.label().equals(row.getField("gravity"))) {
                    share.put(gravity, Double.parseDouble(row.getField("share")));
                }
            }
        }
        if (this == FLAT) {
            return (type, gravity) -> share.get(gravity);
        }
        NavigableMap<Double, Double> logDensity = new TreeMap<>();
        for (NamedCsvRecord row : rows("type-priors.csv")) {
            logDensity.put(
                    Double.parseDouble(row.getField("type_number")),
                    Math.log(Double.parseDouble(row.getField(word))));
        }
        return (type, gravity) -> share.get(gravity) * Math.exp(between(logDensity, type));
    }

    private static double between(NavigableMap<Double, Double> table, double at) {
        Map.Entry<Double, Double> below = table.floorEntry(at);
        Map.Entry<Double, Double> above = table.ceilingEntry(at);
        if (below == null) {
            return table.firstEntry().getValue();
        }
        if (above == null) {
            return table.lastEntry().getValue();
        }
        if (above.getKey() <= below.getKey()) {
            return below.getValue();
        }
        double part = (at - below.getKey()) / (above.getKey() - below.getKey());
        return below.getValue() * (1 - part) + above.getValue() * part;
    }

    private static List<NamedCsvRecord> rows(String file) {
        try (InputStream stream = TypePriors.class.getResourceAsStream(FOLDER + file);
                CsvReader<NamedCsvRecord> rows =
                        CsvReader.builder()
                                .commentStrategy(CommentStrategy.SKIP)
                                .ofNamedCsvRecord(
                                        new InputStreamReader(stream, StandardCharsets.UTF_8))) {
            return rows.stream().toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
