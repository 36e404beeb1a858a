package emberline.measure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** A product of powers of functionals. */
final class PowerProduct implements Formula {

    private final int[] rows;
    private final double[] exponents;

    PowerProduct(int[] rows, double[] exponents) {
        this.rows = rows;
        this.exponents = exponents;
    }

    @Override
    public int[] rows() {
        return rows;
    }

    @Override
    public double value(double[] y) {
        double product = 1;
        for (int k = 0; k < rows.length; k++) {
            product *= power(y[rows[k]], exponents[k]);
        }
        return product;
    }

    @Override
    public double[] gradient(double[] y) {
        double[] gradient = new double[rows.length];
        for (int k = 0; k < rows.length; k++) {
            double product = exponents[k] * power(y[rows[k]], exponents[k] - 1);
            for (int other = 0; other < rows.length; other++) {
                if (other != k) {
                    product *= power(y[rows[other]], exponents[other]);
                }
            }
            gradient[k] = product;
        }
        return gradient;
    }

    @Override
    public void values(double[][] draws, double[] out) {
        Arrays.fill(out, 1);
        for (int k = 0; k < rows.length; k++) {
            double[] drawn = draws[rows[k]];
            for (int n = 0; n < out.length; n++) {
                out[n] *= power(drawn[n], exponents[k]);
            }
        }
    }

    private static double power(double base, double exponent) {
        if (exponent == 1) {
            return base;
        }
        return exponent == -1 ? 1 / base : Math.pow(base, exponent);
    }

    @Override
    public List<Continuum> continua() {
        List<Continuum> continua = new ArrayList<>();
        for (int k = 0; k < rows.length; k++) {
            if (exponents[k] != 1) {
                continua.add(new Continuum(new int[] {rows[k]}, new double[] {1}));
            }
        }
        return continua;
    }
}
