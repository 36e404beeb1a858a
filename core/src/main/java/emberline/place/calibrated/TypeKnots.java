package emberline.place.calibrated;

/** The types at which loci are tabulated, and how to read between them. */
final class TypeKnots {

    /** Distance of knots (subclass). */
    static final double STEP = 0.5;

    /** Number of knots: M0 to Y1. */
    static final int COUNT = 63;

    private TypeKnots() {}

    /**
     * Type of a knot.
     *
     * @param knot index from 0
     * @return type number (M0 = 0)
     */
    static double typeNumber(int knot) {
        return knot * STEP;
    }

    /**
     * The knot below a type.
     *
     * @param typeNumber any type number; outside the table the nearest interval is taken
     * @return index from 0 to the last but one
     */
    static int below(double typeNumber) {
        return Math.max(0, Math.min(COUNT - 2, (int) Math.floor(typeNumber / STEP)));
    }

    /**
     * How far a type lies between two knots.
     *
     * @param typeNumber type number
     * @param knot the knot below
     * @return 0 at that knot, 1 at the next
     */
    static double part(double typeNumber, int knot) {
        return Math.max(0, Math.min(1, typeNumber / STEP - knot));
    }

    /**
     * Reads a table between its knots.
     *
     * @param table one value a knot
     * @param typeNumber type number
     * @return the value, linear between knots and constant beyond the ends
     */
    static double read(double[] table, double typeNumber) {
        int knot = below(typeNumber);
        double part = part(typeNumber, knot);
        return table[knot] * (1 - part) + table[knot + 1] * part;
    }

    /**
     * How steep a table runs at a type.
     *
     * @param table one value a knot
     * @param typeNumber type number; near the ends the last interval is taken
     * @return change of the value a subclass, between half a subclass before and after the type
     */
    static double slope(double[] table, double typeNumber) {
        double last = typeNumber(COUNT - 1);
        double from = Math.max(0, Math.min(last - STEP, typeNumber - STEP));
        double to = Math.min(last, Math.max(STEP, typeNumber + STEP));
        return (read(table, to) - read(table, from)) / (to - from);
    }
}
