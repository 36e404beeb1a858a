package emberline.judge;

import java.util.Arrays;

/**
 * A cubic through points that never overshoots: slopes at the points are harmonic means of those of
 * the neighbouring steps, zero at turning points (Fritsch and Butland 1984, SIAM J. Sci. Stat.
 * Comput. 5, 300). Beyond the ends it goes on along the outermost steps.
 */
final class MonotoneCurve {

    private final double[] x;
    private final double[] y;
    private final double[] slope;

    /**
     * A curve.
     *
     * @param x strictly increasing, at least two
     * @param y as many values
     */
    MonotoneCurve(double[] x, double[] y) {
        this.x = x;
        this.y = y;
        int n = x.length;
        double[] step = new double[n - 1];
        for (int i = 0; i < n - 1; i++) {
            step[i] = (y[i + 1] - y[i]) / (x[i + 1] - x[i]);
        }
        slope = new double[n];
        slope[0] = step[0];
        slope[n - 1] = step[n - 2];
        for (int i = 1; i < n - 1; i++) {
            if (step[i - 1] * step[i] > 0) {
                double before = x[i] - x[i - 1];
                double after = x[i + 1] - x[i];
                double a = 2 * after + before;
                double b = after + 2 * before;
                slope[i] = (a + b) / (a / step[i - 1] + b / step[i]);
            }
        }
    }

    /** The value at a point. */
    double at(double point) {
        int n = x.length;
        if (point <= x[0]) {
            return y[0] + (point - x[0]) * slope[0];
        }
        if (point >= x[n - 1]) {
            return y[n - 1] + (point - x[n - 1]) * slope[n - 1];
        }
        int found = Arrays.binarySearch(x, point);
        int i = found >= 0 ? found : -found - 2;
        double width = x[i + 1] - x[i];
        double t = (point - x[i]) / width;
        double u = 1 - t;
        return y[i] * u * u * (1 + 2 * t)
                + y[i + 1] * t * t * (3 - 2 * t)
                + slope[i] * width * t * u * u
                - slope[i + 1] * width * t * t * u;
    }
}
