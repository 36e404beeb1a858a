package emberline.reports.chart;

import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.DoubleStream;

/**
 * A spectrum with no more points than a plot can show. Points: centre, flux, lower and upper end of
 * the one-sigma band. A gap in the data is a point that is not finite.
 */
final class Reduction {

    /** A pixel further from its neighbour than this many spacings begins anew. */
    private static final double BREAK = 2.5;

    /** Signal-to-noise from which a point counts for the peak. */
    private static final double CLEAR = 5;

    private final List<double[]> points = new ArrayList<>();

    private Reduction() {}

    /**
     * The pixels; where more than two share a column of the plot, the lowest and the highest of
     * them with the mean band.
     */
    static Reduction ofPixels(Spectrum spectrum, double low, double high, int columns) {
        Reduction reduction = new Reduction();
        double width = (high - low) / columns;
        int i = 0;
        while (i < spectrum.size()) {
            if (!spectrum.isGood(i)) {
                reduction.stop(spectrum.wavelengthMicron(i));
                i++;
                continue;
            }
            int end = i + 1;
            double until =
                    low + width * (Math.floor((spectrum.wavelengthMicron(i) - low) / width) + 1);
            while (end < spectrum.size()
                    && spectrum.isGood(end)
                    && spectrum.wavelengthMicron(end) < until
                    && !isBreak(spectrum, end)) {
                end++;
            }
            if (i > 0 && isBreak(spectrum, i)) {
                reduction.stop(
                        (spectrum.wavelengthMicron(i - 1) + spectrum.wavelengthMicron(i)) / 2);
            }
            reduction.addColumn(spectrum, i, end);
            i = end;
        }
        return reduction;
    }

    /** Means of so many pixels each, weighted by inverse variance, with the sigma of the mean. */
    static Reduction ofMeans(Spectrum spectrum, int pixels) {
        return ofMeans(spectrum, pixels, Double.POSITIVE_INFINITY);
    }

    /**
     * Means of so many pixels each, or of fewer where they stand out of the noise, with the sigma
     * of the mean.
     *
     * @param enough signal-to-noise from which a mean needs no further pixels
     */
    static Reduction ofMeans(Spectrum spectrum, int pixels, double enough) {
        Reduction reduction = new Reduction();
        double weights = 0;
        double sum = 0;
        double places = 0;
        int count = 0;
        for (int i = 0; i < spectrum.size(); i++) {
            boolean broken = i > 0 && isBreak(spectrum, i);
            if (broken || count == pixels || sum > enough * Math.sqrt(weights)) {
                reduction.addMean(sum, weights, places, count);
                weights = 0;
                sum = 0;
                places = 0;
                count = 0;
            }
            if (broken) {
                reduction.stop(
                        (spectrum.wavelengthMicron(i - 1) + spectrum.wavelengthMicron(i)) / 2);
            }
            if (spectrum.isGood(i) && spectrum.fluxSigma(i) > 0) {
                double weight = 1 / (spectrum.fluxSigma(i) * spectrum.fluxSigma(i));
                weights += weight;
                sum += weight * spectrum.flux(i);
                places += spectrum.wavelengthMicron(i);
                count++;
            }
        }
        reduction.addMean(sum, weights, places, count);
        return reduction;
    }

    private static boolean isBreak(Spectrum spectrum, int pixel) {
        double step = spectrum.wavelengthMicron(pixel) - spectrum.wavelengthMicron(pixel - 1);
        return step > BREAK * spectrum.localSpacingMicron(pixel);
    }

    private void addMean(double sum, double weights, double places, int count) {
        if (count > 0 && weights > 0 && Double.isFinite(weights)) {
            double mean = sum / weights;
            double sigma = 1 / Math.sqrt(weights);
            points.add(new double[] {places / count, mean, mean - sigma, mean + sigma});
        }
    }

    private void addColumn(Spectrum spectrum, int start, int end) {
        if (end - start <= 2) {
            for (int i = start; i < end; i++) {
                double flux = spectrum.flux(i);
                double sigma = spectrum.fluxSigma(i);
                points.add(
                        new double[] {
                            spectrum.wavelengthMicron(i), flux, flux - sigma, flux + sigma
                        });
            }
            return;
        }
        int lowest = start;
        int highest = start;
        double flux = 0;
        double sigma = 0;
        for (int i = start; i < end; i++) {
            lowest = spectrum.flux(i) < spectrum.flux(lowest) ? i : lowest;
            highest = spectrum.flux(i) > spectrum.flux(highest) ? i : highest;
            flux += spectrum.flux(i) / (end - start);
            sigma += spectrum.fluxSigma(i) / (end - start);
        }
        for (int i : new int[] {Math.min(lowest, highest), Math.max(lowest, highest)}) {
            points.add(
                    new double[] {
                        spectrum.wavelengthMicron(i), spectrum.flux(i), flux - sigma, flux + sigma
                    });
        }
    }

    private void stop(double x) {
        boolean stopped = points.isEmpty() || !Double.isFinite(points.get(points.size() - 1)[1]);
        if (!stopped) {
            points.add(new double[] {x, Double.NaN, Double.NaN, Double.NaN});
        }
    }

    /** The curve with all heights multiplied by a factor. */
    Curve curve(double factor, Tone tone, boolean band) {
        double[] x = column(0, 1);
        double[] y = column(1, factor);
        return band
                ? Curve.withBand(x, y, column(2, factor), column(3, factor), tone)
                : Curve.line(x, y, tone);
    }

    /** The points whose sigma is at most, or with {@code above} more than, a limit; gaps else. */
    Reduction bySigma(double limit, boolean above) {
        Reduction part = new Reduction();
        for (double[] point : points) {
            boolean wanted = Double.isFinite(point[1]) && sigma(point) > limit == above;
            if (wanted) {
                part.points.add(point);
            } else {
                part.stop(point[0]);
            }
        }
        return part;
    }

    private static double sigma(double[] point) {
        return (point[3] - point[2]) / 2;
    }

    private double[] column(int column, double factor) {
        return points.stream().mapToDouble(point -> point[column] * factor).toArray();
    }

    private DoubleStream heights() {
        return points.stream().mapToDouble(point -> point[1]).filter(Double::isFinite);
    }

    /** A quantile of the finite heights; empty heights give zero. */
    double quantile(double share) {
        double[] heights = heights().sorted().toArray();
        if (heights.length == 0) {
            return 0;
        }
        return heights[(int) Math.round(share * (heights.length - 1))];
    }

    /**
     * The highest running median of five heights: the peak of the spectrum without spikes. Points
     * that do not stand out of their noise are left out, unless most do not.
     */
    double peak() {
        double[] clear =
                points.stream()
                        .filter(p -> p[1] > CLEAR * sigma(p))
                        .mapToDouble(p -> p[1])
                        .toArray();
        double[] heights = heights().toArray();
        if (clear.length > heights.length / 4) {
            heights = clear;
        }
        if (heights.length < 5) {
            return Arrays.stream(heights).max().orElse(1);
        }
        double peak = Double.NEGATIVE_INFINITY;
        for (int i = 2; i < heights.length - 2; i++) {
            double[] near = Arrays.copyOfRange(heights, i - 2, i + 3);
            Arrays.sort(near);
            peak = Math.max(peak, near[2]);
        }
        return peak;
    }

    int size() {
        return points.size();
    }
}
