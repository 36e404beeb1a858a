package emberline.place.kind;

import emberline.place.kind.KindFeatures.Block;
import emberline.place.kind.KindFeatures.KindFeature;

/**
 * Wavelength regions as a mask: R (0.61 to 0.79 micron), Z (0.79 to 0.98), J (0.98 to 1.34), H
 * (1.46 to 1.79), K (1.98 to 2.36).
 */
final class Regions {

    static final int R = 1;
    static final int Z = 2;
    static final int J = 4;
    static final int H = 8;
    static final int K = 16;
    static final int ALL = R | Z | J | H | K;

    /** A region is covered where this share of its windows was measured. */
    private static final double LEAST_SHARE = 0.6;

    private static final String LETTERS = "RZJHK";

    private Regions() {}

    static int parse(String letters) {
        int mask = 0;
        for (int i = 0; i < letters.length(); i++) {
            char letter = letters.charAt(i);
            int bit = LETTERS.indexOf(letter);
            if (bit < 0) {
                throw new IllegalArgumentException(
                        "region '" + letter + "': expected one of " + LETTERS);
            }
            mask |= 1 << bit;
        }
        return mask;
    }

    static String letters(int mask) {
        StringBuilder text = new StringBuilder();
        for (int bit = 0; bit < LETTERS.length(); bit++) {
            if ((mask & 1 << bit) != 0) {
                text.append(LETTERS.charAt(bit));
            }
        }
        return text.toString();
    }

    /** The regions of which enough windows were measured. */
    static int covered(FeatureVector vector, KindFeatures features) {
        return enough(vector, features, Block.SHAPE);
    }

    /** The regions of which enough lines were measured, and those in which none are used. */
    static int resolved(FeatureVector vector, KindFeatures features) {
        return enough(vector, features, Block.LINE) | H;
    }

    /**
     * The share of the windows of a single region that were measured.
     *
     * @param vector the features of a spectrum
     * @param features the features of the model
     * @param region mask of one region
     * @return 0 to 1
     */
    static double share(FeatureVector vector, KindFeatures features, int region) {
        return share(vector, features, Block.SHAPE, region);
    }

    private static int enough(FeatureVector vector, KindFeatures features, Block block) {
        int mask = 0;
        for (int bit = 0; bit < LETTERS.length(); bit++) {
            if (share(vector, features, block, 1 << bit) >= LEAST_SHARE) {
                mask |= 1 << bit;
            }
        }
        return mask;
    }

    private static double share(
            FeatureVector vector, KindFeatures features, Block block, int region) {
        int all = 0;
        int measured = 0;
        for (int k = 0; k < features.size(); k++) {
            KindFeature feature = features.features().get(k);
            boolean counts =
                    feature.block() == block
                            && feature.regions() == region
                            && (block == Block.LINE || feature.isWindow());
            if (counts) {
                all++;
                measured += vector.has(k) ? 1 : 0;
            }
        }
        return all == 0 ? 0 : measured / (double) all;
    }
}
