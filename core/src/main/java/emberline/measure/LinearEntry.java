package emberline.measure;

import java.util.List;

/**
 * A measurement to first order: how it answers to the window functionals of its spectra.
 *
 * @param parts answers on the spectra from which it comes
 * @param inflation factor on the error because the spectra disagree, 1 where they do not
 */
record LinearEntry(List<Part> parts, double inflation) {

    LinearEntry {
        parts = List.copyOf(parts);
    }

    /**
     * The answer on one spectrum.
     *
     * @param spectrum the spectrum
     * @param rows the functionals on which the feature depends
     * @param gradient derivative of the feature by each of them
     * @param weight share of the value
     */
    @SuppressWarnings("ArrayRecordComponent") // never leaves the package, never compared
    record Part(MeasuredSpectrum spectrum, int[] rows, double[] gradient, double weight) {}

    /** Covariance with another feature from the pixels that both use. */
    double covariance(LinearEntry other) {
        double sum = 0;
        for (Part mine : parts) {
            for (Part theirs : other.parts) {
                if (mine.spectrum == theirs.spectrum) {
                    sum +=
                            mine.weight
                                    * theirs.weight
                                    * mine.spectrum.covariance(
                                            mine.rows, mine.gradient, theirs.rows, theirs.gradient);
                }
            }
        }
        return inflation * other.inflation * sum;
    }
}
