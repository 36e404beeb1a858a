package emberline.broken.spectrum;

import emberline.broken.place.LaterStep;

/** Breaks every rule of the house at once: see ArrowsTest. */
@SuppressWarnings({"SystemOut", "NonFinalStaticField"})
public final class EverythingHelper {

    static int counter;

    private EverythingHelper() {}

    /** Uses a later step, changes a static and prints. */
    public static void print() {
        counter++;
        System.out.println(new LaterStep(counter));
    }
}
