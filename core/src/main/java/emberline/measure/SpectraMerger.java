package emberline.measure;

import emberline.measure.Measurement.Measured;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.function.Function;

/**
 * Makes one set of measurements from those of several spectra of one object.
 *
 * <p>A feature that one spectrum has is taken from it. One that several have becomes their mean,
 * each weighted by the inverse of its variance: the noise of the spectrum and the calibration error
 * of the feature, which does not fall with the noise (flux calibration, resolution, tellurics).
 * This is generalised least squares feature by feature, as the noise of spectra is independent. The
 * error of the mean is that of the noise alone, with its exact covariance to all other features,
 * since the same scatter of objects about a locus, calibration errors in it, holds for the mean as
 * for each spectrum: it is counted once. Where spectra disagree by more than {@value #FAR} sigma
 * the error is widened by the root of the reduced chi-square.
 */
public final class SpectraMerger {

    /** From here on spectra disagree on a feature (sigma). */
    private static final double FAR = 3.3;

    private final Function<String, OptionalDouble> calibrationSigma;

    /**
     * A merger.
     *
     * @param calibrationSigma for the id of a feature the one-sigma calibration error of one
     *     spectrum, in the unit of the feature; empty where it is not known: of such a feature the
     *     measurement with the smallest error is taken
     */
    public SpectraMerger(Function<String, OptionalDouble> calibrationSigma) {
        this.calibrationSigma = calibrationSigma;
    }

    /**
     * Merges spectra.
     *
     * @param several measurements with one catalogue, at least one
     * @return one measurement a feature; the only one as it is
     */
    public Measurements merge(List<Measurements> several) {
        if (several.size() == 1) {
            return several.get(0);
        }
        Map<String, MeasuredEntry> merged = new LinkedHashMap<>();
        for (String id : several.get(0).entries().keySet()) {
            List<MeasuredEntry> all = several.stream().map(one -> one.entries().get(id)).toList();
            List<MeasuredEntry> valued =
                    all.stream().filter(entry -> entry.measured().isPresent()).toList();
            OptionalDouble calibration = calibrationSigma.apply(id);
            if (valued.size() > 1 && calibration.isPresent()) {
                merged.put(id, mean(valued, calibration.getAsDouble()));
            } else {
                merged.put(id, best(all));
            }
        }
        return new Measurements(merged);
    }

    /** The entry with the smallest error; the first where none has one. */
    private static MeasuredEntry best(List<MeasuredEntry> all) {
        MeasuredEntry best = all.get(0);
        for (MeasuredEntry entry : all) {
            best = entry.sigmaOrInfinite() < best.sigmaOrInfinite() ? entry : best;
        }
        return best;
    }

    private static MeasuredEntry mean(List<MeasuredEntry> valued, double calibration) {
        double[] weight = new double[valued.size()];
        double sum = 0;
        for (int i = 0; i < weight.length; i++) {
            weight[i] = 1 / variance(valued.get(i), calibration);
            sum += weight[i];
        }
        double value = 0;
        double ofNoise = 0;
        double signal = 0;
        int heaviest = 0;
        List<MeasuredEntry.Part> parts = new ArrayList<>();
        for (int i = 0; i < weight.length; i++) {
            MeasuredEntry entry = valued.get(i);
            Measured one = entry.measured().orElseThrow();
            heaviest = weight[i] > weight[heaviest] ? i : heaviest;
            double share = weight[i] / sum;
            value += share * one.value();
            ofNoise += share * share * one.oneSigma() * one.oneSigma();
            signal = Math.max(signal, entry.measurement().continuumSignal());
            for (MeasuredEntry.Part part : entry.parts()) {
                parts.add(
                        new MeasuredEntry.Part(
                                part.spectrum(), part.formula(), share * part.weight()));
            }
        }
        double chiSquare = 0;
        for (int i = 0; i < weight.length; i++) {
            double off = valued.get(i).measured().orElseThrow().value() - value;
            chiSquare += weight[i] * off * off;
        }
        double reduced = chiSquare / (weight.length - 1);
        double inflation = reduced > FAR * FAR ? Math.sqrt(reduced) : 1;
        FeatureMeasurement of = valued.get(heaviest).measurement();
        return new MeasuredEntry(
                new FeatureMeasurement(
                        of.feature(),
                        new Measured(value, inflation * Math.sqrt(ofNoise)),
                        of.coverage(),
                        signal,
                        of.telluricShare(),
                        of.smoothedToResolvingPower()),
                parts,
                inflation);
    }

    private static double variance(MeasuredEntry entry, double calibration) {
        double noise = entry.sigmaOrInfinite();
        return Math.max(noise * noise + calibration * calibration, Double.MIN_NORMAL);
    }
}
