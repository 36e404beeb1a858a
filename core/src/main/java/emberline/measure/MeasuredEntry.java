package emberline.measure;

import emberline.measure.Measurement.Measured;
import java.util.List;
import java.util.Optional;

/**
 * A measurement with what is needed to relate it to others: the spectra that it comes from, mostly
 * one, and their weights.
 *
 * @param measurement the measurement
 * @param parts spectra, formulas and weights that add up to 1; empty where nothing was measured
 * @param inflation factor on the error because the spectra disagree, 1 where they do not
 */
record MeasuredEntry(FeatureMeasurement measurement, List<Part> parts, double inflation) {

    MeasuredEntry {
        parts = List.copyOf(parts);
    }

    /**
     * What one spectrum gives.
     *
     * @param spectrum the spectrum
     * @param formula the feature as a function of its window functionals
     * @param weight share of the value
     */
    record Part(MeasuredSpectrum spectrum, Formula formula, double weight) {

        private LinearEntry.Part linear() {
            return new LinearEntry.Part(
                    spectrum, formula.rows(), spectrum.gradient(formula), weight);
        }
    }

    /** What was measured on one spectrum. */
    static MeasuredEntry of(
            FeatureMeasurement measurement, MeasuredSpectrum spectrum, Optional<Formula> formula) {
        return new MeasuredEntry(
                measurement,
                formula.map(f -> List.of(new Part(spectrum, f, 1))).orElse(List.of()),
                1);
    }

    /** The value; empty where the feature was not measured. */
    Optional<Measured> measured() {
        return measurement.result().fold(Optional::of, why -> Optional.empty());
    }

    /** One-sigma error, infinite where the feature was not measured. */
    double sigmaOrInfinite() {
        return measured().map(Measured::oneSigma).orElse(Double.POSITIVE_INFINITY);
    }

    /** The measurement to first order. */
    LinearEntry linear() {
        return new LinearEntry(parts.stream().map(Part::linear).toList(), inflation);
    }

    /** Widens draws about the value by the inflation, in place. */
    void widen(double[] draws) {
        if (inflation > 1) {
            double value = measured().orElseThrow().value();
            for (int i = 0; i < draws.length; i++) {
                draws[i] = value + inflation * (draws[i] - value);
            }
        }
    }
}
