package emberline.place.kind;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.read.ProductTable;
import java.util.Collections;
import java.util.EnumMap;
import java.util.Map;

/**
 * How probable each kind is before the spectrum is seen.
 *
 * @param shares one for each kind, adding up to 1
 */
public record KindPrior(Map<ObjectKind, Double> shares) {

    private static final String RESOURCE = "/emberline/place/kind/prior.csv";

    /** Copies the map and checks it. */
    public KindPrior {
        shares = Collections.unmodifiableMap(new EnumMap<>(shares));
        double sum = shares.values().stream().mapToDouble(Double::doubleValue).sum();
        if (shares.size() != ObjectKind.values().length
                || shares.values().stream().anyMatch(p -> !(p > 0))
                || Math.abs(sum - 1) > 1e-9) {
            throw new IllegalArgumentException(
                    "prior "
                            + shares
                            + ": expected a positive share of every kind, adding up to 1");
        }
    }

    /**
     * The prior that the product uses: a follow-up of late-dwarf candidates of a colour survey.
     *
     * @return the shares of the resource
     */
    public static KindPrior standard() {
        return Loaded.STANDARD;
    }

    private static KindPrior load() {
        Map<ObjectKind, Double> shares = new EnumMap<>(ObjectKind.class);
        for (NamedCsvRecord row : ProductTable.at(RESOURCE).rows()) {
            shares.put(
                    ObjectKind.labelled(row.getField("kind")).orElseThrow(),
                    Double.parseDouble(row.getField("share")));
        }
        return new KindPrior(shares);
    }

    /** Reads the shares at the first use. */
    private static final class Loaded {
        private static final KindPrior STANDARD = load();
    }
}
