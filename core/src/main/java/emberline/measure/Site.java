package emberline.measure;

import emberline.catalogue.TelluricRegion.Strength;
import java.util.Locale;

/** From where an object was observed: which telluric regions can spoil its features. */
public enum Site {
    /** Above the atmosphere: none. */
    SPACE,
    /** A high, dry site: the opaque regions and the deep bands. */
    DRY,
    /** A low or humid site: water bands too. */
    WET;

    /**
     * Whether regions of a strength spoil features observed from here.
     *
     * @param strength how badly a region absorbs
     * @return true if they do
     */
    public boolean isSpoiledBy(Strength strength) {
        return switch (this) {
            case SPACE -> false;
            case DRY -> strength == Strength.OPAQUE || strength == Strength.STRONG;
            case WET -> strength != Strength.WEAK;
        };
    }

    /**
     * The word used in options and outputs.
     *
     * @return lower-case word
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}
