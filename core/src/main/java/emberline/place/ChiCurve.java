package emberline.place;

import emberline.catalogue.ActivityFactor;
import emberline.catalogue.ActivityFactor.Quantity;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Source;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.NavigableMap;
import java.util.TreeMap;

/** The chi of one paper against type, linear in log10(chi) between its types. */
final class ChiCurve {

    private static final double DEX = 1 / Math.log(10);

    private final Source source;
    private final NavigableMap<Double, ActivityFactor> byType = new TreeMap<>();

    private ChiCurve(Source source) {
        this.source = source;
    }

    /** The curves of a catalogue in the order of its tables. */
    static List<ChiCurve> all(FeatureCatalogue catalogue) {
        Map<String, ChiCurve> curves = new LinkedHashMap<>();
        for (ActivityFactor factor : catalogue.activityFactors()) {
            if (factor.quantity() == Quantity.CHI) {
                curves.computeIfAbsent(factor.source().key(), key -> new ChiCurve(factor.source()))
                        .byType
                        .put(factor.typeNumber().orElseThrow(), factor);
            }
        }
        return new ArrayList<>(curves.values());
    }

    Source source() {
        return source;
    }

    boolean covers(double typeNumber) {
        return byType.firstKey() <= typeNumber && typeNumber <= byType.lastKey();
    }

    /** The log10 of chi at a type, that of the nearer end outside. */
    double logChi(double typeNumber) {
        double inside = inside(typeNumber);
        ActivityFactor below = byType.floorEntry(inside).getValue();
        ActivityFactor above = byType.ceilingEntry(inside).getValue();
        double logBelow = Math.log10(below.value());
        return logBelow + share(inside) * (Math.log10(above.value()) - logBelow);
    }

    /** Error of log10(chi) as printed (dex); 0 where none is printed. */
    double sigmaDex(double typeNumber) {
        double inside = inside(typeNumber);
        ActivityFactor below = byType.floorEntry(inside).getValue();
        ActivityFactor above = byType.ceilingEntry(inside).getValue();
        double share = share(inside);
        return (1 - share) * sigmaDex(below) + share * sigmaDex(above);
    }

    private static double sigmaDex(ActivityFactor factor) {
        return DEX * factor.error().orElse(0) / factor.value();
    }

    private double inside(double typeNumber) {
        return Math.min(Math.max(typeNumber, byType.firstKey()), byType.lastKey());
    }

    private double share(double inside) {
        double below = byType.floorKey(inside);
        double above = byType.ceilingKey(inside);
        return above == below ? 0 : (inside - below) / (above - below);
    }
}
