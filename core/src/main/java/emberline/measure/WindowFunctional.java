package emberline.measure;

import emberline.catalogue.Window;
import java.util.OptionalDouble;

/**
 * A linear functional of the pixels: the mean of the flux over a window, or a moment of it.
 *
 * @param window where it is taken (micron, vacuum)
 * @param smoothedTo resolving power to which the spectrum is smoothed first; empty for none
 * @param measure what is taken over the window
 */
record WindowFunctional(Window window, OptionalDouble smoothedTo, Over measure) {

    /** What a functional takes over its window. */
    enum Over {
        /** The mean of the flux. */
        MEAN(0),
        /** The median of the flux; its noise is that of the mean, times the root of pi over 2. */
        MEDIAN(0),
        /** The integral of the flux (flux unit times micron). */
        INTEGRAL(0),
        /** The integral of flux times x, where x runs from -1 to 1 over the window. */
        FIRST_MOMENT(1),
        /** The integral of flux times x squared. */
        SECOND_MOMENT(2),
        /** The integral of flux times x cubed. */
        THIRD_MOMENT(3),
        /** The integral of flux times the fourth power of x. */
        FOURTH_MOMENT(4);

        private final int power;

        Over(int power) {
            this.power = power;
        }

        int power() {
            return power;
        }

        boolean isIntegral() {
            return this != MEAN && this != MEDIAN;
        }
    }
}
