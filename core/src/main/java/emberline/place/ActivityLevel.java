package emberline.place;

import emberline.catalogue.Source;
import java.util.OptionalDouble;

/**
 * The activity by one published set of chi.
 *
 * @param source the paper that gives chi
 * @param logRatio log10 of L(H alpha) / L(bol); the upper limit at 3 sigma where no emission was
 *     seen
 * @param sigmaDex one-sigma error (dex) from the width, the type and chi as far as the error of chi
 *     is known; empty for a limit
 */
public record ActivityLevel(Source source, double logRatio, OptionalDouble sigmaDex) {

    /**
     * Whether this is an upper limit.
     *
     * @return true where no emission was seen
     */
    public boolean isUpperLimit() {
        return sigmaDex.isEmpty();
    }
}
