package emberline.place.calibrated;

/**
 * How far published types of one and the same spectrum stand apart: classifiers round to half
 * subclasses, optical and infrared types differ, and some labels are plainly off. The posterior is
 * about the type that would be published, so this is part of its width. Two normal distributions, a
 * core and a tail.
 *
 * @param coreSubclass one-sigma of the core (subclass), positive
 * @param tailSubclass one-sigma of the tail (subclass), positive
 * @param tailShare share of the tail, 0 to 1
 */
record LabelError(double coreSubclass, double tailSubclass, double tailShare) {

    /** Checks the ranges. */
    LabelError {
        if (!(coreSubclass > 0) || !(tailSubclass > 0) || !(tailShare >= 0 && tailShare <= 1)) {
            throw new IllegalArgumentException(
                    "label error " + coreSubclass + ", " + tailSubclass + ", " + tailShare);
        }
    }

    /**
     * Probability of a difference.
     *
     * @param differenceSubclass difference of two types (subclass)
     * @param stepSubclass width of the cell (subclass)
     * @return probability of a cell around that difference
     */
    double probability(double differenceSubclass, double stepSubclass) {
        return stepSubclass
                * ((1 - tailShare) * density(differenceSubclass / coreSubclass) / coreSubclass
                        + tailShare * density(differenceSubclass / tailSubclass) / tailSubclass);
    }

    private static double density(double u) {
        return Math.exp(-0.5 * u * u) / Math.sqrt(2 * Math.PI);
    }
}
