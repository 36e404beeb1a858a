package emberline.catalogue;

import java.util.OptionalDouble;

/**
 * The range of an index that a metallicity class takes up: above &lt; index &lt;= upTo.
 *
 * @param name the class
 * @param feature id of the feature
 * @param above lower limit, itself outside; empty: open
 * @param upTo upper limit, itself inside; empty: open
 * @param source the paper
 * @param howKnown how the range reached this catalogue
 * @param confidencePercent how sure it is that the range is exactly as printed, 0 to 100
 * @param note a remark; may be blank
 */
public record MetallicityClass(
        Name name,
        String feature,
        OptionalDouble above,
        OptionalDouble upTo,
        Source source,
        HowKnown howKnown,
        int confidencePercent,
        String note) {

    /** The classes, richest first, with the prefix of the type. */
    public enum Name {
        /** Near-solar metallicity: dM. */
        DWARF("d"),
        /** Subdwarf: sdM. */
        SUBDWARF("sd"),
        /** Extreme subdwarf: esdM. */
        EXTREME_SUBDWARF("esd"),
        /** Ultra subdwarf: usdM. */
        ULTRA_SUBDWARF("usd");

        private final String prefix;

        Name(String prefix) {
            this.prefix = prefix;
        }

        /**
         * The prefix of the type.
         *
         * @return d, sd, esd or usd
         */
        public String prefix() {
            return prefix;
        }
    }

    /** Checks the order of the limits. */
    public MetallicityClass {
        boolean open = above.isEmpty() || upTo.isEmpty();
        if (!open && !(above.getAsDouble() < upTo.getAsDouble())) {
            throw new IllegalArgumentException(
                    feature + ", class " + name + ": expected above below up_to");
        }
    }

    /**
     * Whether an index lies in the class.
     *
     * @param index value of the feature
     * @return true if it does; false for NaN
     */
    public boolean contains(double index) {
        return index > above.orElse(Double.NEGATIVE_INFINITY)
                && index <= upTo.orElse(Double.POSITIVE_INFINITY);
    }
}
