package emberline.measure;

import java.util.List;

/**
 * How a feature follows from window functionals, and how it answers to a change of each of them.
 * Formulas see the functionals as numbers by the row of their {@link WindowOperator}.
 */
sealed interface Formula permits LinearRatio, PowerProduct, Magnitude, EquivalentWidth, Composite {

    /** The rows on which the value depends; a row may stand more than once. */
    int[] rows();

    /**
     * The value of the feature.
     *
     * @param y all functionals by row
     * @return the value; not finite where the definition has no meaning for these numbers
     */
    double value(double[] y);

    /**
     * The derivative of the value by each of {@link #rows()}.
     *
     * @param y all functionals by row
     * @return as many numbers as rows
     */
    double[] gradient(double[] y);

    /**
     * The value for many draws of the functionals at once.
     *
     * @param draws for each row one number a draw; rows not in {@link #rows()} may be null
     * @param count how many draws
     * @param out as many values; overwritten
     */
    void values(double[][] draws, int count, double[] out);

    /**
     * The continua of the feature: sums of functionals that must stand clear of zero for the
     * feature to have a meaning.
     *
     * @return each as rows with weights
     */
    List<Continuum> continua();

    /**
     * What the feature divides by beside its continua, as formulas of their own: it must stand
     * clear of zero as well, on either side.
     *
     * @return none for formulas of functionals alone
     */
    default List<Formula> divisors() {
        return List.of();
    }

    /**
     * A weighted sum of functionals by which a formula divides.
     *
     * @param rows rows of the sum
     * @param weights a weight for each
     */
    @SuppressWarnings("ArrayRecordComponent") // never leaves the package, never compared
    record Continuum(int[] rows, double[] weights) {

        double value(double[] y) {
            double sum = 0;
            for (int k = 0; k < rows.length; k++) {
                sum += weights[k] * y[rows[k]];
            }
            return sum;
        }

        /** The sum for many draws of the functionals at once, as a formula has its values. */
        void values(double[][] draws, int count, double[] out) {
            double[] drawn = draws[rows[0]];
            double weight = weights[0];
            for (int n = 0; n < count; n++) {
                out[n] = weight * drawn[n];
            }
            for (int k = 1; k < rows.length; k++) {
                drawn = draws[rows[k]];
                weight = weights[k];
                for (int n = 0; n < count; n++) {
                    out[n] += weight * drawn[n];
                }
            }
        }
    }
}
