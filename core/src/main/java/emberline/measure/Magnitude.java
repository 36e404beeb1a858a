package emberline.measure;

import java.util.ArrayList;
import java.util.List;

/** A ratio as a magnitude: -2.5 times its decimal logarithm. */
final class Magnitude implements Formula {

    private static final double POGSON = -2.5 / Math.log(10);

    private final Continuum above;
    private final LinearRatio ratio;

    Magnitude(Continuum above, Continuum below) {
        this.above = above;
        this.ratio = new LinearRatio(above, below);
    }

    @Override
    public int[] rows() {
        return ratio.rows();
    }

    @Override
    public double value(double[] y) {
        return POGSON * Math.log(ratio.value(y));
    }

    @Override
    public double[] gradient(double[] y) {
        double factor = POGSON / ratio.value(y);
        double[] gradient = ratio.gradient(y);
        for (int k = 0; k < gradient.length; k++) {
            gradient[k] *= factor;
        }
        return gradient;
    }

    @Override
    public void values(double[][] draws, int count, double[] out) {
        ratio.values(draws, count, out);
        for (int n = 0; n < count; n++) {
            out[n] = POGSON * Math.log(out[n]);
        }
    }

    @Override
    public List<Continuum> continua() {
        List<Continuum> continua = new ArrayList<>(ratio.continua());
        continua.add(above);
        return continua;
    }
}
