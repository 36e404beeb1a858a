package emberline.measure;

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
    public void values(double[][] draws, int count, double[] out) {
        if (above.rows().length == 1 && below.rows().length == 1) {
            ofTwoMeans(draws, count, out);
            return;
        }
        double[] bottom = new double[count];
        above.values(draws, count, out);
        below.values(draws, count, bottom);
        for (int n = 0; n < count; n++) {
            out[n] /= bottom[n];
        }
    }

    /** Most features are a mean over another: one loop less for each. */
    private void ofTwoMeans(double[][] draws, int count, double[] out) {
        double weight = above.weights()[0] / below.weights()[0];
        double[] top = draws[above.rows()[0]];
        double[] bottom = draws[below.rows()[0]];
        for (int n = 0; n < count; n++) {
            out[n] = weight * top[n] / bottom[n];
        }
    }

    @Override
    public List<Continuum> continua() {
        return List.of(below);
    }
}
