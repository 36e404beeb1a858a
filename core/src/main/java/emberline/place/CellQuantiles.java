package emberline.place;

/** Quantiles of weights in cells of one width, each weight spread evenly over its cell. */
public final class CellQuantiles {

    private final double[] centres;
    private final double[] weights;
    private final double width;
    private final double total;

    /**
     * Weights in cells.
     *
     * @param centres centres of the cells, increasing, at least one
     * @param weights one for each, not negative, with a positive sum
     * @param width width of every cell, positive
     */
    public CellQuantiles(double[] centres, double[] weights, double width) {
        this.centres = centres.clone();
        this.weights = weights.clone();
        this.width = width;
        double sum = 0;
        for (double weight : weights) {
            sum += weight;
        }
        this.total = sum;
    }

    /**
     * The value below which a share of the weight lies.
     *
     * @param share 0 to 1
     * @return a value in a cell of positive weight; the end of the last cell where rounding leaves
     *     none
     */
    public double at(double share) {
        double below = 0;
        for (int i = 0; i < weights.length; i++) {
            if (weights[i] > 0 && below + weights[i] >= share * total) {
                return centres[i] + ((share * total - below) / weights[i] - 0.5) * width;
            }
            below += weights[i];
        }
        return centres[centres.length - 1] + 0.5 * width;
    }
}
