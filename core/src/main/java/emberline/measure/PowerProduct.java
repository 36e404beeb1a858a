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
    public void values(double[][] draws, int count, double[] out) {
        Arrays.fill(out, 0, count, 1);
        for (int k = 0; k < rows.length; k++) {
            multiply(out, count, draws[rows[k]], exponents[k]);
        }
    }

    /** Multiplies by a power of other numbers; one loop a kind of power, which is faster. */
    private static void multiply(double[] product, int count, double[] bases, double exponent) {
        if (exponent == 1) {
            for (int n = 0; n < count; n++) {
                product[n] *= bases[n];
            }
        } else if (exponent == -1) {
            for (int n = 0; n < count; n++) {
                product[n] /= bases[n];
            }
        } else {
            for (int n = 0; n < count; n++) {
                product[n] *= Math.pow(bases[n], exponent);
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
