package emberline.place.photometric;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.read.ProductTable;
import java.util.HashMap;
import java.util.Map;

/** The single numbers of typing by colours, from {@code settings.csv}. */
final class ColourSettings {

    private static final String TABLE = "/emberline/place/photometric/settings.csv";

    private final Map<String, Double> values = new HashMap<>();

    private ColourSettings() {
        for (NamedCsvRecord row : ProductTable.at(TABLE).rows()) {
            values.put(row.getField("id"), Double.parseDouble(row.getField("value")));
        }
    }

    /** The numbers of the product. */
    static ColourSettings standard() {
        return Loaded.STANDARD;
    }

    /** Read once, when first asked for. */
    private static final class Loaded {
        private static final ColourSettings STANDARD = new ColourSettings();
    }

    /** The number of an id; the unit stands in the table. */
    double of(String id) {
        Double value = values.get(id);
        if (value == null) {
            throw new IllegalStateException(TABLE + ": expected a row " + id);
        }
        return value;
    }
}
