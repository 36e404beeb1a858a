package emberline.place.calibrated;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.place.GravityClass;
import emberline.read.ProductTable;
import java.util.EnumMap;
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
        for (NamedCsvRecord row : ProductTable.at(FOLDER + "gravity-prior.csv").rows()) {
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
        for (NamedCsvRecord row : ProductTable.at(FOLDER + "type-priors.csv").rows()) {
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
}
