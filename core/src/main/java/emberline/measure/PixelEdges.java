package emberline.measure;

import emberline.spectrum.Spectrum;

/** The intervals that the pixels of a grid cover; bad pixels cover nothing. */
final class PixelEdges {

    private final double[] low;
    private final double[] high;
    private final boolean[] good;

    private PixelEdges(double[] low, double[] high, boolean[] good) {
        this.low = low;
        this.high = high;
        this.good = good;
    }

    static PixelEdges of(Spectrum spectrum) {
        int size = spectrum.size();
        double[] low = new double[size];
        double[] high = new double[size];
        boolean[] good = new boolean[size];
        for (int i = 0; i < size; i++) {
            low[i] = spectrum.lowEdgeMicron(i);
            high[i] = spectrum.highEdgeMicron(i);
            good[i] = spectrum.isGood(i);
        }
        return new PixelEdges(low, high, good);
    }

    /** The first pixel that ends above a wavelength; the number of pixels if none does. */
    int firstEndingAbove(double micron) {
        int from = 0;
        int to = high.length;
        while (from < to) {
            int middle = (from + to) >>> 1;
            if (high[middle] > micron) {
                to = middle;
            } else {
                from = middle + 1;
            }
        }
        return from;
    }

    /** The first pixel that starts at or above a wavelength; the number of pixels if none does. */
    int firstStartingAtOrAbove(double micron) {
        int from = 0;
        int to = low.length;
        while (from < to) {
            int middle = (from + to) >>> 1;
            if (low[middle] >= micron) {
                to = middle;
            } else {
                from = middle + 1;
            }
        }
        return from;
    }

    /** Width of a pixel that lies between two wavelengths (micron); 0 for a bad pixel. */
    double overlap(int pixel, double lowMicron, double highMicron) {
        if (!good[pixel]) {
            return 0;
        }
        return Math.max(0, Math.min(high[pixel], highMicron) - Math.max(low[pixel], lowMicron));
    }

    /** Where a pixel begins (micron). */
    double low(int pixel) {
        return low[pixel];
    }

    /** Where a pixel ends (micron). */
    double high(int pixel) {
        return high[pixel];
    }
}
