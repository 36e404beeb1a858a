package emberline.measure;

import emberline.catalogue.Window;
import emberline.prepare.NoiseModel;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import java.util.List;

/**
 * All window functionals of one wavelength grid as one sparse matrix W, so that the window means
 * are y = W f and their covariance is W S W^T, where S is the covariance of the pixels. It depends
 * on the grid and its good pixels alone, so that spectra on one grid share it.
 */
final class WindowOperator {

    /** Root of pi over 2: the noise of a median in units of that of the mean, normal noise. */
    private static final double MEDIAN_NOISE = Math.sqrt(Math.PI / 2);

    private final List<WindowFunctional> functionals;
    private final int[] first;
    private final double[][] weights;
    private final double[] coverage;

    private WindowOperator(
            List<WindowFunctional> functionals,
            int[] first,
            double[][] weights,
            double[] coverage) {
        this.functionals = functionals;
        this.first = first;
        this.weights = weights;
        this.coverage = coverage;
    }

    /**
     * The operator of a grid.
     *
     * @param spectrum a spectrum on the grid; only its grid and its good pixels count
     * @param resolvingPower its resolving power, for smoothing
     * @param functionals what is measured, best sorted by wavelength
     * @return the operator
     */
    static WindowOperator of(
            Spectrum spectrum, double resolvingPower, List<WindowFunctional> functionals) {
        int size = functionals.size();
        PixelEdges edges = PixelEdges.of(spectrum);
        int[] first = new int[size];
        double[][] weights = new double[size][];
        double[] coverage = new double[size];
        for (int row = 0; row < size; row++) {
            WindowFunctional functional = functionals.get(row);
            Window window = functional.window();
            int from = edges.firstEndingAbove(window.lowMicron());
            int to = edges.firstStartingAtOrAbove(window.highMicron());
            double[] overlap = overlaps(edges, window, from, to);
            coverage[row] = Math.min(1, Arrays.stream(overlap).sum() / window.widthMicron());
            first[row] = from;
            if (functional.smoothedTo().isPresent()) {
                SmoothedWindow smoothed =
                        new SmoothedWindow(
                                spectrum,
                                window,
                                resolvingPower,
                                functional.smoothedTo().getAsDouble());
                first[row] = smoothed.first();
                overlap = overlaps(edges, smoothed);
            }
            weights[row] = overlap;
            weigh(spectrum, functional, first[row], overlap);
        }
        return new WindowOperator(List.copyOf(functionals), first, weights, coverage);
    }

    private static double[] overlaps(PixelEdges edges, Window window, int from, int to) {
        double[] overlap = new double[Math.max(0, to - from)];
        for (int k = 0; k < overlap.length; k++) {
            overlap[k] = edges.overlap(from + k, window.lowMicron(), window.highMicron());
        }
        return overlap;
    }

    private static double[] overlaps(PixelEdges edges, SmoothedWindow smoothed) {
        int first = smoothed.first();
        double[] overlap = new double[Math.max(0, smoothed.end() - first)];
        for (int k = 0; k < overlap.length; k++) {
            double width = edges.width(first + k);
            overlap[k] = width > 0 ? width * smoothed.share(first + k) : 0;
        }
        return overlap;
    }

    /** Turns overlaps into weights, in place; they stay zero where nothing is covered. */
    private static void weigh(
            Spectrum spectrum, WindowFunctional functional, int from, double[] overlap) {
        double covered = Arrays.stream(overlap).sum();
        if (!(covered > 0)) {
            return;
        }
        Window window = functional.window();
        double norm =
                functional.measure().isIntegral() ? window.widthMicron() / covered : 1 / covered;
        double half = window.widthMicron() / 2;
        for (int k = 0; k < overlap.length; k++) {
            double x = (spectrum.wavelengthMicron(from + k) - window.centreMicron()) / half;
            overlap[k] *= norm * Math.pow(x, functional.measure().power());
        }
    }

    int size() {
        return weights.length;
    }

    WindowFunctional functional(int row) {
        return functionals.get(row);
    }

    /** Share of the window of a row that good pixels cover, 0 to 1. */
    double coverage(int row) {
        return coverage[row];
    }

    /**
     * The functionals of a spectrum on this grid.
     *
     * @param spectrum a spectrum with the grid and the good pixels of this operator
     * @return one number a row; 0 where nothing is covered
     */
    double[] apply(Spectrum spectrum) {
        double[] values = new double[weights.length];
        for (int row = 0; row < values.length; row++) {
            if (functionals.get(row).measure() == WindowFunctional.Over.MEDIAN) {
                values[row] = weightedMedian(spectrum, row);
                continue;
            }
            double sum = 0;
            for (int k = 0; k < weights[row].length; k++) {
                double weight = weights[row][k];
                if (weight != 0) {
                    sum += weight * spectrum.flux(first[row] + k);
                }
            }
            values[row] = sum;
        }
        return values;
    }

    private double weightedMedian(Spectrum spectrum, int row) {
        double[] weight = weights[row];
        Integer[] order = new Integer[weight.length];
        Arrays.setAll(order, k -> k);
        int offset = first[row];
        Arrays.sort(
                order,
                (a, b) -> Double.compare(spectrum.flux(offset + a), spectrum.flux(offset + b)));
        double half = Arrays.stream(weight).sum() / 2;
        double sum = 0;
        double beforeFlux = Double.NaN;
        double beforeMiddle = 0;
        for (int k : order) {
            if (weight[k] == 0) {
                continue;
            }
            double middle = sum + weight[k] / 2;
            double flux = spectrum.flux(offset + k);
            if (middle >= half) {
                return Double.isNaN(beforeFlux)
                        ? flux
                        : beforeFlux
                                + (flux - beforeFlux)
                                        * (half - beforeMiddle)
                                        / (middle - beforeMiddle);
            }
            sum += weight[k];
            beforeFlux = flux;
            beforeMiddle = middle;
        }
        return Double.isNaN(beforeFlux) ? 0 : beforeFlux;
    }

    /**
     * The covariance of the functionals from the noise of the pixels.
     *
     * @param spectrum a spectrum on this grid
     * @param noise how neighbouring pixels share their noise
     * @return the covariance matrix, in the square of the flux unit
     */
    EnvelopeMatrix covariance(Spectrum spectrum, NoiseModel noise) {
        int size = weights.length;
        double[][] noisy = new double[size][];
        double[][] mixed = new double[size][];
        int[] lowest = new int[size];
        for (int row = 0; row < size; row++) {
            noisy[row] = timesSigma(spectrum, row);
            mixed[row] = mix(noisy[row], noise.lag1(), noise.lag2());
        }
        double[][] elements = new double[size][];
        for (int row = 0; row < size; row++) {
            double[] full = new double[row + 1];
            int start = row;
            for (int column = row; column >= 0; column--) {
                full[column] = overlapSum(row, column, noisy, mixed);
                if (full[column] != 0) {
                    start = column;
                }
            }
            lowest[row] = start;
            elements[row] = Arrays.copyOfRange(full, start, row + 1);
        }
        return new EnvelopeMatrix(lowest, elements);
    }

    private double[] timesSigma(Spectrum spectrum, int row) {
        boolean median = functionals.get(row).measure() == WindowFunctional.Over.MEDIAN;
        double[] product = new double[weights[row].length];
        for (int k = 0; k < product.length; k++) {
            if (weights[row][k] != 0) {
                double sigma = spectrum.fluxSigma(first[row] + k);
                product[k] = weights[row][k] * sigma * (median ? MEDIAN_NOISE : 1);
            }
        }
        return product;
    }

    /** A row times the correlation of the pixels; two elements longer at either end. */
    private static double[] mix(double[] row, double lag1, double lag2) {
        double[] mixed = new double[row.length + 4];
        for (int k = 0; k < row.length; k++) {
            mixed[k + 2] += row[k];
            mixed[k + 1] += lag1 * row[k];
            mixed[k + 3] += lag1 * row[k];
            mixed[k] += lag2 * row[k];
            mixed[k + 4] += lag2 * row[k];
        }
        return mixed;
    }

    private double overlapSum(int a, int b, double[][] noisy, double[][] mixed) {
        int startMixed = first[a] - 2;
        int from = Math.max(startMixed, first[b]);
        int to = Math.min(startMixed + mixed[a].length, first[b] + noisy[b].length);
        double sum = 0;
        for (int i = from; i < to; i++) {
            sum += mixed[a][i - startMixed] * noisy[b][i - first[b]];
        }
        return sum;
    }
}
