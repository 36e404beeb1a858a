package emberline.measure;

import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Spectrum;
import java.util.List;

/**
 * The window functionals of one spectrum with their covariance; what features are made from. Safe
 * for use by several threads.
 */
final class MeasuredSpectrum {

    /** A variance below minus this share of its terms is no matter of rounding. */
    private static final double NEGATIVE = 1e-6;

    /** Fluxes within this power of two of one are left as they are; others could overflow. */
    private static final int SAFE_EXPONENT = 100;

    private static final int MOST_EXPONENT = 1000;

    private final FormulaBook book;
    private final WindowOperator operator;
    private final Spectrum spectrum;
    private final NoiseModel noise;
    private final double[] means;
    private final EnvelopeMatrix covariance;
    private EnvelopeMatrix factor;

    MeasuredSpectrum(FormulaBook book, WindowOperator operator, PreparedSpectrum prepared) {
        this.book = book;
        this.operator = operator;
        this.spectrum = onSafeScale(prepared.spectrum());
        this.noise = prepared.noise();
        this.means = operator.apply(spectrum);
        this.covariance = operator.covariance(spectrum, noise);
    }

    /**
     * The spectrum on a scale on which squares and products of a few fluxes can be held. Every
     * feature is a ratio, so the scale does not matter; it is a power of two, so nothing is
     * rounded.
     */
    private static Spectrum onSafeScale(Spectrum spectrum) {
        double largest = 0;
        for (int i = 0; i < spectrum.size(); i++) {
            if (spectrum.isGood(i)) {
                largest = Math.max(largest, Math.abs(spectrum.flux(i)));
            }
        }
        int exponent = largest > 0 ? Math.getExponent(largest) : 0;
        if (Math.abs(exponent) <= SAFE_EXPONENT) {
            return spectrum;
        }
        int shift = Math.max(-MOST_EXPONENT, Math.min(MOST_EXPONENT, -exponent));
        return spectrum.withFluxScaledBy(Math.scalb(1.0, shift));
    }

    FormulaBook book() {
        return book;
    }

    double value(Formula formula) {
        return formula.value(means);
    }

    double sigma(Formula formula) {
        return root(formula.rows(), formula.gradient(means));
    }

    /** The root of the variance of a weighted sum of functionals. */
    private double root(int[] rows, double[] weights) {
        double variance = covariance(rows, weights, rows, weights);
        if (variance >= 0 || Double.isNaN(variance)) {
            return Math.sqrt(variance);
        }
        double independent = 0;
        for (int k = 0; k < rows.length; k++) {
            independent += weights[k] * weights[k] * covariance.get(rows[k], rows[k]);
        }
        if (variance < -NEGATIVE * independent) {
            throw new IllegalStateException(
                    "variance "
                            + variance
                            + " of a sum of window means whose own variances add up to "
                            + independent
                            + ": expected none below zero: check the correlation of the noise of"
                            + " neighbouring pixels");
        }
        return 0;
    }

    /** The derivative of a feature by each of its functionals. */
    double[] gradient(Formula formula) {
        return formula.gradient(means);
    }

    /** Covariance of two weighted sums of functionals. */
    double covariance(int[] rowsA, double[] a, int[] rowsB, double[] b) {
        double sum = 0;
        for (int i = 0; i < rowsA.length; i++) {
            for (int j = 0; j < rowsB.length; j++) {
                sum += a[i] * b[j] * covariance.get(rowsA[i], rowsB[j]);
            }
        }
        return sum;
    }

    double continuum(Formula.Continuum continuum) {
        return continuum.value(means);
    }

    double continuumSigma(Formula.Continuum continuum) {
        return root(continuum.rows(), continuum.weights());
    }

    /** The lower factor of the covariance, made when it is first needed. */
    private synchronized EnvelopeMatrix factor() {
        if (factor == null) {
            factor =
                    covariance
                            .cholesky()
                            .orElseGet(
                                    () ->
                                            covariance.factorFrom(
                                                    operator.noiseVectors(spectrum, noise)));
        }
        return factor;
    }

    /**
     * Draws of features: the window functionals are drawn from their joint normal distribution, and
     * the features computed from each draw, so that a ratio keeps its skew.
     *
     * @param formulas what to compute
     * @param count number of draws
     * @param seed start of the random sequence
     * @return for each formula one value a draw
     */
    double[][] draws(List<Formula> formulas, int count, long seed) {
        boolean[] wanted = new boolean[means.length];
        for (Formula formula : formulas) {
            for (int row : formula.rows()) {
                wanted[row] = true;
            }
        }
        FunctionalDraws draws = new FunctionalDraws(factor(), means, wanted, seed);
        double[][] values = new double[formulas.size()][count];
        double[] some = new double[FunctionalDraws.BLOCK];
        for (int from = 0; from < count; from += some.length) {
            int size = Math.min(some.length, count - from);
            double[][] drawn = draws.next();
            for (int f = 0; f < values.length; f++) {
                formulas.get(f).values(drawn, size, some);
                System.arraycopy(some, 0, values[f], from, size);
            }
        }
        return values;
    }
}
