package emberline.measure;

/**
 * Draws of window functionals from their joint normal distribution, block by block. A functional is
 * its mean plus a row of the Cholesky factor times independent normal deviates, one a functional.
 *
 * <p>Every other block mirrors the one before it about the means (antithetic variates, Hammersley
 * and Morton 1956, Proc. Camb. Phil. Soc. 52, 449): it has the same joint distribution and costs
 * neither deviates nor products. Pairs of draws are opposite, all others independent. So the mean
 * of what is nearly linear is exact and a quantile at least as well known as from as many
 * independent draws; the distance of opposite quantiles, whose errors add up, is known as from half
 * as many.
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
    private final NormalDeviates[] sequences;
    private final double[][] block;
    private boolean mirrorNext;

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
        this.sequences = new NormalDeviates[means.length];
        this.block = new double[means.length][];
        for (int row = 0; row < means.length; row++) {
            for (int k = lower.start(row); wanted[row] && k <= row; k++) {
                if (block[k] == null) {
                    block[k] = new double[BLOCK];
                    sequences[k] = new NormalDeviates(seed, k);
                }
            }
        }
    }

    /**
     * The next {@value #BLOCK} draws.
     *
     * @return for each wanted functional one number a draw, valid until the next call; numbers
     *     without meaning or null for the others
     */
    double[][] next() {
        if (mirrorNext) {
            mirror();
        } else {
            draw();
        }
        mirrorNext = !mirrorNext;
        return block;
    }

    private void draw() {
        for (int row = 0; row < block.length; row++) {
            if (block[row] != null) {
                sequences[row].fill(block[row], BLOCK);
            }
        }
        for (int row = block.length - 1; row >= 0; row--) {
            if (wanted[row]) {
                lower.multiplyRow(block, BLOCK, row, means[row]);
            }
        }
    }

    private void mirror() {
        for (int row = 0; row < block.length; row++) {
            if (wanted[row]) {
                mirror(block[row], means[row]);
            }
        }
    }

    private static void mirror(double[] draws, double mean) {
        for (int n = 0; n < BLOCK; n++) {
            draws[n] = 2 * mean - draws[n];
        }
    }
}
