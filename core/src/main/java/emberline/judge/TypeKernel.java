package emberline.judge;

import emberline.judge.PropertyRelations.Quantity;

/**
 * How probable a type is for an effective temperature: normal about the relation of each sequence,
 * with its scatter; multiplied by the slope of the relation against that of the field, so that the
 * probabilities of all types add up alike in both sequences.
 */
final class TypeKernel {

    /** Sequences, by first index of the tables. */
    static final Sequence[] SEQUENCES = {Sequence.FIELD, Sequence.YOUNG};

    private static final double TAIL = 5;
    private static final double SLOPE_LIMIT = 2;
    private static final double ROOT = Math.sqrt(2 * Math.PI);

    private final double[][][] weight = new double[SEQUENCES.length][TypeAxis.SIZE][];
    private final int[][] first = new int[SEQUENCES.length][TypeAxis.SIZE];

    TypeKernel(PropertyRelations relations) {
        for (int s = 0; s < SEQUENCES.length; s++) {
            for (int n = 0; n < TypeAxis.SIZE; n++) {
                double type = TypeAxis.type(n);
                TypeRelation relation =
                        relations.at(Quantity.TEFF, SEQUENCES[s], type).orElseThrow();
                double ratio =
                        slope(relations, SEQUENCES[s], type)
                                / slope(relations, Sequence.FIELD, type);
                double scale = Math.min(SLOPE_LIMIT, Math.max(1 / SLOPE_LIMIT, ratio));
                fill(s, n, relation.at(type), relation.rms(type), scale);
            }
        }
    }

    private static double slope(PropertyRelations relations, Sequence sequence, double type) {
        double low = Math.max(TypeAxis.FIRST, type - 0.5);
        double high = Math.min(TypeAxis.LAST, type + 0.5);
        double rise =
                relations.at(Quantity.TEFF, sequence, high).orElseThrow().at(high)
                        - relations.at(Quantity.TEFF, sequence, low).orElseThrow().at(low);
        return Math.max(1, Math.abs(rise) / (high - low));
    }

    private void fill(int s, int n, double mean, double sigma, double scale) {
        int low =
                (int)
                        Math.floor(
                                (mean - TAIL * sigma - NodeTable.FIRST_TEFF) / NodeTable.TEFF_STEP);
        int high =
                (int) Math.ceil((mean + TAIL * sigma - NodeTable.FIRST_TEFF) / NodeTable.TEFF_STEP);
        low = Math.max(0, low);
        high = Math.min(NodeTable.TEFF_SIZE - 1, high);
        first[s][n] = low;
        weight[s][n] = new double[Math.max(0, high - low + 1)];
        for (int i = low; i <= high; i++) {
            double off = (NodeTable.FIRST_TEFF + i * NodeTable.TEFF_STEP - mean) / sigma;
            weight[s][n][i - low] = scale * Math.exp(-off * off / 2) / (sigma * ROOT);
        }
    }

    /** Adds a share of the curve of a type to a curve over the axis of temperatures. */
    void add(int sequence, int point, double share, double[] curve) {
        double[] kernel = weight[sequence][point];
        int start = first[sequence][point];
        for (int i = 0; i < kernel.length; i++) {
            curve[start + i] += share * kernel[i];
        }
    }

    /** The sum of a curve over the axis of temperatures, weighted by the kernel of a type. */
    double sum(int sequence, int point, double[] curve) {
        double[] kernel = weight[sequence][point];
        int start = first[sequence][point];
        double sum = 0;
        for (int i = 0; i < kernel.length; i++) {
            sum += kernel[i] * curve[start + i];
        }
        return sum;
    }
}
