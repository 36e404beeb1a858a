package emberline.place.calibrated;

import emberline.place.GravityClass;

/**
 * Where the gravity classes stand on the scale of the loci, 0 for field gravity and 1 for very low
 * gravity. The objects of a class differ among themselves, so each class has a centre and a spread.
 * The spreads were chosen by cross-validation: without them the probabilities of the classes would
 * be far too sure (sum of the log probabilities of 155 published classes -158, with them -58).
 */
final class GravityScale {

    private GravityScale() {}

    /**
     * The centre of a class.
     *
     * @param gravity the class
     * @return 0 field, 0.5 intermediate, 1 very low
     */
    static double centre(GravityClass gravity) {
        return switch (gravity) {
            case FLD_G -> 0;
            case INT_G -> 0.5;
            case VL_G -> 1;
        };
    }

    /**
     * How far the objects of a class stand apart.
     *
     * @param gravity the class
     * @return one-sigma spread about the centre, positive
     */
    static double spread(GravityClass gravity) {
        return switch (gravity) {
            case FLD_G -> 0.1;
            case INT_G, VL_G -> 0.2;
        };
    }
}
