package emberline.place.kind;

import emberline.place.kind.KindFeatures.Block;
import emberline.place.kind.KindFeatures.KindFeature;
import java.util.ArrayList;
import java.util.List;

/**
 * The part of a spectrum of which kinds are learned.
 *
 * @param regions a mask of {@link Regions}
 * @param withLines whether lines are used beside the shape
 */
record Coverage(int regions, boolean withLines) {

    private static final List<Coverage> ALL = all();

    /** A coverage from its code: the letters of its regions, {@code +} where lines are used. */
    static Coverage parse(String code) {
        boolean lines = code.endsWith("+");
        return new Coverage(
                Regions.parse(lines ? code.substring(0, code.length() - 1) : code), lines);
    }

    private static List<Coverage> all() {
        List<Coverage> all = new ArrayList<>();
        for (String letters :
                List.of(
                        "RZJHK", "ZJHK", "RZJ", "JHK", "ZJH", "RZ", "ZJ", "JH", "HK", "Z", "J", "H",
                        "K")) {
            if (!letters.equals("H")) {
                all.add(parse(letters + "+"));
            }
            all.add(parse(letters));
        }
        return List.copyOf(all);
    }

    /** The coverages of which kinds are learned, the widest first, with lines before without. */
    static List<Coverage> forests() {
        return ALL;
    }

    /** Whether a spectrum has what is needed. */
    boolean holdsFor(FeatureVector vector, KindFeatures features) {
        int covered = Regions.covered(vector, features);
        int resolved = Regions.resolved(vector, features);
        return (regions & ~covered) == 0 && (!withLines || (regions & ~resolved) == 0);
    }

    /** Those of some coverages that hold for a spectrum, in their order. */
    static List<Coverage> of(FeatureVector vector, KindFeatures features, List<Coverage> grown) {
        int covered = Regions.covered(vector, features);
        int resolved = Regions.resolved(vector, features);
        return grown.stream()
                .filter(c -> (c.regions & ~covered) == 0)
                .filter(c -> !c.withLines || (c.regions & ~resolved) == 0)
                .toList();
    }

    /** The features that are used, as positions in {@link KindFeatures}. */
    int[] columns(KindFeatures features) {
        List<Integer> columns = new ArrayList<>();
        for (int k = 0; k < features.size(); k++) {
            KindFeature feature = features.features().get(k);
            if ((feature.regions() & ~regions) == 0
                    && (withLines || feature.block() == Block.SHAPE)) {
                columns.add(k);
            }
        }
        return columns.stream().mapToInt(Integer::intValue).toArray();
    }

    String code() {
        return Regions.letters(regions) + (withLines ? "+" : "");
    }
}
