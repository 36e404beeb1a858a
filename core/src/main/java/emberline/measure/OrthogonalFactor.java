package emberline.measure;

import java.util.ArrayList;
import java.util.List;

/**
 * The lower-triangular factor L of a matrix B B^T, from B alone: B = L Q with orthonormal rows in
 * Q, by the method of Gram and Schmidt, done twice so that rounding does not spoil it (Giraud,
 * Langou and Rozloznik 2005). B B^T itself is never formed, so nearly dependent rows do no harm,
 * and nothing can become negative. It takes far longer than a Cholesky factor.
 */
final class OrthogonalFactor {

    /** What is left of a row below this share of its length is rounding. */
    private static final double DEPENDENT = 1e-8;

    private OrthogonalFactor() {}

    /**
     * Some consecutive elements of a row; all others are zero.
     *
     * @param first column of the first element
     * @param elements kept, not copied
     */
    @SuppressWarnings("ArrayRecordComponent") // handed on within the package, never compared
    record Strip(int first, double[] elements) {

        int end() {
            return first + elements.length;
        }

        double times(Strip other) {
            double sum = 0;
            int to = Math.min(end(), other.end());
            for (int k = Math.max(first, other.first); k < to; k++) {
                sum += elements[k - first] * other.elements[k - other.first];
            }
            return sum;
        }

        /** Takes a multiple of another, which reaches no further, away from this in place. */
        private void subtract(double factor, Strip other) {
            for (int k = 0; k < other.elements.length; k++) {
                elements[other.first + k - first] -= factor * other.elements[k];
            }
        }

        private Strip over(int from, int to) {
            double[] wider = new double[to - from];
            System.arraycopy(elements, 0, wider, first - from, elements.length);
            return new Strip(from, wider);
        }
    }

    /**
     * The factor.
     *
     * @param vectors the rows of B
     * @param start for each row the first row that is not orthogonal to it, at most its own number
     * @return for each row of L the elements from there to the diagonal; a row that depends on
     *     earlier ones has a zero there
     */
    static double[][] of(Strip[] vectors, int[] start) {
        double[][] factor = new double[vectors.length][];
        List<Strip> directions = new ArrayList<>(vectors.length);
        for (int j = 0; j < vectors.length; j++) {
            double[] row = new double[j + 1 - start[j]];
            Strip left = room(vectors[j], directions, start[j]);
            double length = Math.sqrt(left.times(left));
            for (int pass = 0; pass < 2; pass++) {
                for (int i = start[j]; i < j; i++) {
                    Strip direction = directions.get(i);
                    if (direction.elements.length > 0) {
                        double share = left.times(direction);
                        left.subtract(share, direction);
                        row[i - start[j]] += share;
                    }
                }
            }
            double own = Math.sqrt(left.times(left));
            boolean independent = own > DEPENDENT * length;
            row[j - start[j]] = independent ? own : 0;
            directions.add(independent ? scaled(left, 1 / own) : new Strip(0, new double[0]));
            factor[j] = row;
        }
        return factor;
    }

    /** A copy of a row with room for what may be taken from it. */
    private static Strip room(Strip vector, List<Strip> directions, int start) {
        int from = vector.first;
        int to = vector.end();
        for (Strip direction :
                directions.subList(Math.min(start, directions.size()), directions.size())) {
            if (direction.elements.length > 0) {
                from = Math.min(from, direction.first);
                to = Math.max(to, direction.end());
            }
        }
        return vector.over(from, to);
    }

    private static Strip scaled(Strip strip, double factor) {
        double[] elements = strip.elements.clone();
        for (int k = 0; k < elements.length; k++) {
            elements[k] *= factor;
        }
        return new Strip(strip.first, elements);
    }
}
