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

    /** Over how many pixels neighbours share noise. */
    private static final int LAGS = 2;

    private final List<WindowFunctional> functionals;
    private final int[] first;
    private final double[][] weights;
    private final double[] coverage;
    private final int[] earliestNeighbour;

    private WindowOperator(
            List<WindowFunctional> functionals,
            int[] first,
            double[][] weights,
            double[] coverage) {
        this.functionals = functionals;
        this.first = first;
        this.weights = weights;
        this.coverage = coverage;
        this.earliestNeighbour = earliestNeighbours(first, weights);
    }

    /** For each row the first row that may share noise with it: two pixels apart at most. */
    private static int[] earliestNeighbours(int[] first, double[][] weights) {
        int size = first.length;
        int[] furthestEnd = new int[size];
        for (int row = 0; row < size; row++) {
            int end = first[row] + weights[row].length;
            furthestEnd[row] = row == 0 ? end : Math.max(furthestEnd[row - 1], end);
        }
        int[] earliest = new int[size];
        for (int row = 0; row < size; row++) {
            int column = row;
            while (column > 0 && furthestEnd[column - 1] + LAGS > first[row]) {
                column--;
            }
            earliest[row] = column;
        }
        return earliest;
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
            int power = functional.measure().power();
            if (functional.smoothedTo().isPresent()) {
                SmoothedWindow smoothed =
                        new SmoothedWindow(
                                edges,
                                window,
                                resolvingPower,
                                functional.smoothedTo().getAsDouble());
                first[row] = smoothed.first();
                boolean moment = functional.measure().isIntegral();
                overlap = moment ? smoothed.moments(0) : smoothed.integrals();
                weights[row] = power == 0 ? overlap : smoothed.moments(power);
            } else {
                first[row] = from;
                weights[row] = power == 0 ? overlap : moments(edges, functional, from, to);
            }
            scale(weights[row], functional, Arrays.stream(overlap).sum());
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

    /** The integral of a power of x over the part of each pixel that lies in the window. */
    private static double[] moments(
            PixelEdges edges, WindowFunctional functional, int from, int to) {
        Window window = functional.window();
        double half = window.widthMicron() / 2;
        int raised = functional.measure().power() + 1;
        double[] moments = new double[Math.max(0, to - from)];
        for (int k = 0; k < moments.length; k++) {
            if (edges.overlap(from + k, window.lowMicron(), window.highMicron()) > 0) {
                double a = Math.max(edges.low(from + k), window.lowMicron());
                double b = Math.min(edges.high(from + k), window.highMicron());
                double low = (a - window.centreMicron()) / half;
                double high = (b - window.centreMicron()) / half;
                moments[k] = half * (Math.pow(high, raised) - Math.pow(low, raised)) / raised;
            }
        }
        return moments;
    }

    /**
     * Scales weights in place by what is covered: a mean is taken over the covered part, and an
     * integral goes on in small gaps as on average beside them. Weights stay zero where nothing is
     * covered.
     */
    private static void scale(double[] weights, WindowFunctional functional, double covered) {
        if (!(covered > 0)) {
            return;
        }
        double full = functional.measure().isIntegral() ? functional.window().widthMicron() : 1;
        for (int k = 0; k < weights.length; k++) {
            weights[k] *= full / covered;
        }
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

    /** Least coverage of some functionals, 0 to 1. */
    double coverage(int[] rows) {
        double least = 1;
        for (int row : rows) {
            least = Math.min(least, coverage(row));
        }
        return least;
    }

    /** Least coverage of the functionals that integrate over a line; 1 if there are none. */
    double lineCoverage(int[] rows) {
        double least = 1;
        for (int row : rows) {
            if (functional(row).measure().isIntegral()) {
                least = Math.min(least, coverage(row));
            }
        }
        return least;
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
        boolean shared = noise.lag1() != 0 || noise.lag2() != 0;
        int pad = shared ? LAGS : 0;
        for (int row = 0; row < size; row++) {
            noisy[row] = timesSigma(spectrum, row);
            mixed[row] = shared ? mix(noisy[row], noise.lag1(), noise.lag2()) : noisy[row];
        }
        double[][] elements = new double[size][];
        for (int row = 0; row < size; row++) {
            int from = earliestNeighbour[row];
            double[] near = new double[row + 1 - from];
            int start = row;
            for (int column = row; column >= from; column--) {
                near[column - from] = overlapSum(row, column, noisy, mixed, pad);
                if (near[column - from] != 0) {
                    start = column;
                }
            }
            lowest[row] = start;
            elements[row] = Arrays.copyOfRange(near, start - from, row + 1 - from);
        }
        return new EnvelopeMatrix(lowest, elements);
    }

    /**
     * Vectors of which the products are the covariance of the functionals: the rows of W S C, where
     * C is a lower factor of the correlation of the pixels, so that each is independent noise.
     *
     * @param spectrum a spectrum on this grid
     * @param noise how neighbouring pixels share their noise
     * @return one a row
     */
    OrthogonalFactor.Strip[] noiseVectors(Spectrum spectrum, NoiseModel noise) {
        double[][] root = correlationRoot(spectrum.size(), noise.lag1(), noise.lag2());
        OrthogonalFactor.Strip[] vectors = new OrthogonalFactor.Strip[weights.length];
        for (int row = 0; row < vectors.length; row++) {
            double[] noisy = timesSigma(spectrum, row);
            int from = Math.max(0, first[row] - LAGS);
            double[] mixed = new double[noisy.length == 0 ? 0 : first[row] + noisy.length - from];
            for (int k = 0; k < noisy.length; k++) {
                int pixel = first[row] + k;
                for (int lag = 0; lag <= Math.min(LAGS, pixel); lag++) {
                    mixed[pixel - lag - from] += noisy[k] * root[pixel][lag];
                }
            }
            vectors[row] = new OrthogonalFactor.Strip(from, mixed);
        }
        return vectors;
    }

    /**
     * The Cholesky factor of the correlation of pixels: for each its element on the diagonal and
     * those one and two columns before it.
     */
    private static double[][] correlationRoot(int pixels, double lag1, double lag2) {
        double[][] root = new double[pixels][LAGS + 1];
        for (int i = 0; i < pixels; i++) {
            double far = i < 2 || root[i - 2][0] == 0 ? 0 : lag2 / root[i - 2][0];
            double near =
                    i < 1 || root[i - 1][0] == 0
                            ? 0
                            : (lag1 - (i < 2 ? 0 : far * root[i - 1][1])) / root[i - 1][0];
            root[i][0] = Math.sqrt(Math.max(0, 1 - near * near - far * far));
            root[i][1] = near;
            root[i][2] = far;
        }
        return root;
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
        double[] mixed = new double[row.length + 2 * LAGS];
        for (int k = 0; k < row.length; k++) {
            mixed[k + 2] += row[k];
            mixed[k + 1] += lag1 * row[k];
            mixed[k + 3] += lag1 * row[k];
            mixed[k] += lag2 * row[k];
            mixed[k + 4] += lag2 * row[k];
        }
        return mixed;
    }

    /**
     * Sum of products of two rows over the pixels that both have.
     *
     * @param pad how many elements the mixed rows are longer at either end
     */
    private double overlapSum(int a, int b, double[][] noisy, double[][] mixed, int pad) {
        double[] one = mixed[a];
        double[] two = noisy[b];
        int startOne = first[a] - pad;
        int startTwo = first[b];
        int from = Math.max(startOne, startTwo);
        int to = Math.min(startOne + one.length, startTwo + two.length);
        double sum = 0;
        for (int i = from; i < to; i++) {
            sum += one[i - startOne] * two[i - startTwo];
        }
        return sum;
    }
}
