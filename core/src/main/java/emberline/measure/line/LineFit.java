package emberline.measure.line;

import emberline.prepare.NoiseModel;
import java.util.Optional;
import org.apache.commons.math3.exception.MathIllegalArgumentException;
import org.apache.commons.math3.exception.MathIllegalStateException;
import org.apache.commons.math3.fitting.leastsquares.LeastSquaresBuilder;
import org.apache.commons.math3.fitting.leastsquares.LeastSquaresOptimizer.Optimum;
import org.apache.commons.math3.fitting.leastsquares.LevenbergMarquardtOptimizer;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.DiagonalMatrix;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.RealVector;
import org.apache.commons.math3.util.Pair;

/**
 * A Gaussian line on a straight continuum, fitted by least squares: F = a + b x - d exp(-((v - v0)
 * / s)^2 / 2), with x from -1 to 1 over the window.
 *
 * <p>Errors follow from the noise of the pixels. They are multiplied by the root of the reduced chi
 * square where that exceeds 1, because other lines in the window act as noise, and by the root of 1
 * + 2 (lag 1 + lag 2) where neighbouring pixels share noise, which holds for shapes wider than a
 * few pixels.
 *
 * @param kms centre of the line (km/s)
 * @param sigmaKms its error (km/s)
 * @param signal depth over its error; negative for emission
 * @param width its sigma in units of that of an unresolved line
 */
record LineFit(double kms, double sigmaKms, double signal, double width) {

    private static final int UNKNOWNS = 5;
    private static final int DEPTH = 2;
    private static final int CENTRE = 3;
    private static final int LOG_WIDTH = 4;
    private static final int MOST_ROUNDS = 100;
    private static final double SINGULAR = 1e-14;

    /** Fits a line; empty where the fit does not converge. */
    static Optional<LineFit> of(
            LineSegment segment, FittingLine line, double startKms, NoiseModel noise) {
        double[] weights = new double[segment.size()];
        for (int i = 0; i < weights.length; i++) {
            weights[i] = segment.weight(i);
        }
        double unit = line.instrumentSigmaKms();
        try {
            Optimum optimum =
                    new LevenbergMarquardtOptimizer()
                            .optimize(
                                    new LeastSquaresBuilder()
                                            .start(new double[] {1, 0, 0.1, startKms / unit, 0})
                                            .model(point -> model(segment, unit, point))
                                            .target(segment.fluxes())
                                            .weight(new DiagonalMatrix(weights))
                                            .maxEvaluations(MOST_ROUNDS)
                                            .maxIterations(MOST_ROUNDS)
                                            .build());
            return fit(optimum, unit, noise);
        } catch (MathIllegalStateException | MathIllegalArgumentException e) {
            return Optional.empty(); // no convergence, or a matrix that cannot be inverted
        }
    }

    private static Optional<LineFit> fit(Optimum optimum, double unit, NoiseModel noise) {
        RealVector point = optimum.getPoint();
        RealMatrix covariance = optimum.getCovariances(SINGULAR);
        double residuals = optimum.getResiduals().getNorm();
        double freedom = optimum.getResiduals().getDimension() - UNKNOWNS;
        double widened =
                Math.sqrt(
                        Math.max(1, residuals * residuals / freedom)
                                * Math.max(1, 1 + 2 * (noise.lag1() + noise.lag2())));
        double sigma = unit * widened * Math.sqrt(covariance.getEntry(CENTRE, CENTRE));
        double depthSigma = widened * Math.sqrt(covariance.getEntry(DEPTH, DEPTH));
        LineFit fit =
                new LineFit(
                        unit * point.getEntry(CENTRE),
                        sigma,
                        point.getEntry(DEPTH) / depthSigma,
                        Math.exp(point.getEntry(LOG_WIDTH)));
        boolean sound =
                Double.isFinite(fit.kms)
                        && fit.sigmaKms > 0
                        && Double.isFinite(fit.sigmaKms)
                        && Double.isFinite(fit.signal)
                        && Double.isFinite(fit.width);
        return sound ? Optional.of(fit) : Optional.empty();
    }

    private static Pair<RealVector, RealMatrix> model(
            LineSegment segment, double unit, RealVector point) {
        double depth = point.getEntry(DEPTH);
        double width = Math.exp(point.getEntry(LOG_WIDTH));
        double[] values = new double[segment.size()];
        double[][] slopes = new double[segment.size()][UNKNOWNS];
        for (int i = 0; i < values.length; i++) {
            double z = (segment.kms(i) / unit - point.getEntry(CENTRE)) / width;
            double profile = Math.exp(-z * z / 2);
            double x = segment.place(i);
            values[i] = point.getEntry(0) + point.getEntry(1) * x - depth * profile;
            slopes[i][0] = 1;
            slopes[i][1] = x;
            slopes[i][DEPTH] = -profile;
            slopes[i][CENTRE] = -depth * profile * z / width;
            slopes[i][LOG_WIDTH] = -depth * profile * z * z;
        }
        return new Pair<>(
                new ArrayRealVector(values, false), new Array2DRowRealMatrix(slopes, false));
    }
}
