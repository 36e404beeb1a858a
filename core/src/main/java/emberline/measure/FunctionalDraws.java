package emberline.measure;

/**
 * Draws of window functionals from their joint normal distribution, block by block. A functional is
 * its mean plus a row of the Cholesky factor times independent normal deviates, one a functional.
 *
 * <p>Making deviates is most of the cost, so every deviate is used twice: for one functional in one
 * draw, and for the functional half the list away in the draw {@value #BLOCK} later or earlier.
 * Within a draw no deviate stands twice, so each draw has the full joint distribution. The draws of
 * a feature whose functionals lie close together are independent of each other; for what depends on
 * functionals half the list apart, such as a colour, they have the same distribution, and some
 * pairs of draws are correlated.
 *
 * <p>Which deviates a functional gets depends on the seed and its row alone, not on what else is
 * wanted or how many draws are taken. Not safe for use by several threads.
 */
final class FunctionalDraws {

    /** How many draws are made at once: few enough to stay in a near cache. */
    static final int BLOCK = 250;

    private final EnvelopeMatrix lower;
    private final double[] means;
    private final boolean[] wanted;
    private final int half;
    private final NormalDeviates[] sequences;
    private double[][] now;
    private double[][] later;
    private boolean laterIsReady;

    /**
     * Draws.
     *
     * @param lower Cholesky factor of the covariance of the functionals
     * @param means the mean of each functional
     * @param wanted which functionals are wanted
     * @param seed start of the random sequence
     */
    FunctionalDraws(EnvelopeMatrix lower, double[] means, boolean[] wanted, long seed) {
        this.lower = lower;
        this.means = means;
        this.wanted = wanted;
        this.half = (means.length + 1) / 2;
        this.sequences = new NormalDeviates[half];
        this.now = new double[means.length][];
        this.later = new double[means.length][];
        for (int row = 0; row < means.length; row++) {
            for (int k = lower.start(row); wanted[row] && k <= row; k++) {
                if (now[k] == null) {
                    now[k] = new double[BLOCK];
                    later[k] = new double[BLOCK];
                }
            }
        }
        for (int pair = 0; pair < half; pair++) {
            sequences[pair] = new NormalDeviates(seed, pair);
        }
    }

    /**
     * The next {@value #BLOCK} draws.
     *
     * @return for each wanted functional one number a draw, valid until the next call; numbers
     *     without meaning or null for the others
     */
    double[][] next() {
        if (laterIsReady) {
            double[][] before = now;
            now = later;
            later = before;
        } else {
            for (int pair = 0; pair < half; pair++) {
                fill(pair, pair + half);
            }
        }
        laterIsReady = !laterIsReady;
        for (int row = means.length - 1; row >= 0; row--) {
            if (wanted[row]) {
                lower.multiplyRow(now, BLOCK, row, means[row]);
            }
        }
        return now;
    }

    /** Two lots of deviates: one row takes them as they come, the other in turned order. */
    private void fill(int row, int far) {
        boolean both = far < now.length && now[far] != null;
        if (now[row] != null) {
            sequences[row].fill(now[row], BLOCK);
            sequences[row].fill(later[row], BLOCK);
            if (both) {
                System.arraycopy(later[row], 0, now[far], 0, BLOCK);
                System.arraycopy(now[row], 0, later[far], 0, BLOCK);
            }
        } else if (both) {
            sequences[row].fill(later[far], BLOCK);
            sequences[row].fill(now[far], BLOCK);
        }
    }
}
