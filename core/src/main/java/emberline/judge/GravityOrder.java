package emberline.judge;

import emberline.place.GravityClass;
import java.util.List;

/** The order of the gravity classes in the arrays of this package. */
final class GravityOrder {

    /** The classes in their order. */
    static final List<GravityClass> CLASSES =
            List.of(GravityClass.FLD_G, GravityClass.INT_G, GravityClass.VL_G);

    /** Number of classes. */
    static final int COUNT = CLASSES.size();

    private GravityOrder() {}

    /** Place of a class, from 0. */
    static int of(GravityClass gravity) {
        return switch (gravity) {
            case FLD_G -> 0;
            case INT_G -> 1;
            case VL_G -> 2;
        };
    }
}
