package emberline.measure;

import java.util.Arrays;
import java.util.List;

/** A weighted sum of functionals over another. */
final class LinearRatio implements Formula {

    private final Continuum above;
    private final Continuum below;
    private final int[] rows;

    /** The ratio {@code above / below}. */
    LinearRatio(Continuum above, Continuum below) {
        this.above = above;
        this.below = below;
        this.rows = new int[above.rows().length + below.rows().length];
        System.arraycopy(above.rows(), 0, rows, 0, above.rows().length);
        System.arraycopy(below.rows(), 0, rows, above.rows().length, below.rows().length);
    }

    @Override
    public int[] rows() {
        return rows;
    }

    @Override
    public double value(double[] y) {
        return above.value(y) / below.value(y);
    }

    @Override
    public double[] gradient(double[] y) {
        double bottom = below.value(y);
        double ratio = above.value(y) / bottom;
        double[] gradient = new double[rows.length];
        int n = above.rows().length;
        for (int k = 0; k < n; k++) {
            gradient[k] = above.weights()[k] / bottom;
        }
        for (int k = n; k < rows.length; k++) {
            gradient[k] = -ratio * below.weights()[k - n] / bottom;
        }
        return gradient;
    }

    @Override
    public void values(double[][] draws, double[] out) {
        double[] bottom = new double[out.length];
        sum(above, draws, out);
        sum(below, draws, bottom);
        for (int n = 0; n < out.length; n++) {
            out[n] /= bottom[n];
        }
    }

    private static void sum(Continuum terms, double[][] draws, double[] out) {
        Arrays.fill(out, 0);
        for (int k = 0; k < terms.rows().length; k++) {
            double weight = terms.weights()[k];
            double[] drawn = draws[terms.rows()[k]];
            for (int n = 0; n < out.length; n++) {
                out[n] += weight * drawn[n];
            }
        }
    }

    @Override
    public List<Continuum> continua() {
        return List.of(below);
    }
}
