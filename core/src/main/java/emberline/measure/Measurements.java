package emberline.measure;

import emberline.measure.Measurement.Measured;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.apache.commons.math3.util.KthSelector;

/**
 * What came of all features of a catalogue on one spectrum, or on the spectra of one object, with
 * the covariance of the values.
 */
public final class Measurements {

    /** Signal-to-noise of the continuum from which errors are taken as symmetric. */
    static final double LINEAR = 15;

    private static final int INTERVAL_DRAWS = 1000;

    /** Largest share of draws without a value of which an interval is still given. */
    private static final double MOST_LOST = 0.05;

    /** How many pivots of the first selection the second may use. */
    private static final int PIVOTS = 511;

    /** Share of a normal distribution below minus one sigma. */
    private static final double LOW_TAIL = 0.158655253931457;

    private final Map<String, MeasuredEntry> entries;

    /** Measurements by feature in the order of the catalogue. */
    Measurements(Map<String, MeasuredEntry> entries) {
        this.entries = entries;
    }

    /** Collects the measurements of one spectrum in the order of the catalogue. */
    static Measurements of(MeasuredSpectrum spectrum, List<FeatureMeasurement> measurements) {
        Map<String, MeasuredEntry> entries = new LinkedHashMap<>();
        for (FeatureMeasurement measurement : measurements) {
            String id = measurement.feature().id();
            entries.put(id, MeasuredEntry.of(measurement, spectrum, spectrum.book().formula(id)));
        }
        return new Measurements(entries);
    }

    /** The entries by feature in the order of the catalogue. */
    Map<String, MeasuredEntry> entries() {
        return Collections.unmodifiableMap(entries);
    }

    /**
     * All measurements in the order of the catalogue.
     *
     * @return one entry a feature
     */
    public List<FeatureMeasurement> all() {
        return entries.values().stream().map(MeasuredEntry::measurement).toList();
    }

    /**
     * The measurement of a feature.
     *
     * @param id the feature, e.g. {@code reid1995/tio5}
     * @return the measurement, or empty where the catalogue has no such feature
     */
    public Optional<FeatureMeasurement> of(String id) {
        return Optional.ofNullable(entries.get(id)).map(MeasuredEntry::measurement);
    }

    /**
     * The value of a feature with its error.
     *
     * @param id the feature
     * @return the value, or empty where it was not measured
     */
    public Optional<Measured> measured(String id) {
        return of(id).flatMap(m -> m.result().fold(Optional::of, why -> Optional.empty()));
    }

    /**
     * The covariance of two measured features, from the pixels that they share, to first order.
     *
     * @param one a measured feature
     * @param two a measured feature
     * @return covariance in the units of both; 0 for features that share no spectrum
     * @throws IllegalArgumentException if one of them was not measured
     */
    public double covariance(String one, String two) {
        return measuredEntry(one).linear().covariance(measuredEntry(two).linear());
    }

    /**
     * The covariance of several measured features, from the pixels that they share, to first order.
     *
     * @param ids measured features
     * @return symmetric matrix in the order of the features, in the units of both
     * @throws IllegalArgumentException if one of them was not measured
     */
    public double[][] covariance(List<String> ids) {
        List<LinearEntry> linear = ids.stream().map(id -> measuredEntry(id).linear()).toList();
        double[][] matrix = new double[ids.size()][ids.size()];
        for (int a = 0; a < matrix.length; a++) {
            for (int b = 0; b <= a; b++) {
                matrix[a][b] = linear.get(a).covariance(linear.get(b));
                matrix[b][a] = matrix[a][b];
            }
        }
        return matrix;
    }

    /**
     * Draws of measured features from their joint distribution under the pixel noise.
     *
     * @param ids measured features
     * @param count number of draws, at least 1
     * @param seed start of the random sequence; the same seed gives the same draws
     * @return for each feature one value a draw; NaN in draws for which the definition has no
     *     value, as the logarithm of a negative ratio
     * @throws IllegalArgumentException if one of them was not measured
     */
    public double[][] draws(List<String> ids, int count, long seed) {
        Map<MeasuredSpectrum, List<Drawn>> bySpectrum = new LinkedHashMap<>();
        for (int k = 0; k < ids.size(); k++) {
            for (MeasuredEntry.Part part : measuredEntry(ids.get(k)).parts()) {
                bySpectrum
                        .computeIfAbsent(part.spectrum(), spectrum -> new ArrayList<>())
                        .add(new Drawn(k, part));
            }
        }
        double[][] draws = new double[ids.size()][];
        long stream = seed;
        for (Map.Entry<MeasuredSpectrum, List<Drawn>> group : bySpectrum.entrySet()) {
            List<Formula> formulas =
                    group.getValue().stream().map(one -> one.part.formula()).toList();
            double[][] drawn = group.getKey().draws(formulas, count, stream++);
            for (int f = 0; f < drawn.length; f++) {
                int place = group.getValue().get(f).place;
                double weight = group.getValue().get(f).part.weight();
                draws[place] = sum(draws[place], weight, drawn[f]);
            }
        }
        for (int k = 0; k < draws.length; k++) {
            if (draws[k] == null) {
                draws[k] = new double[count];
            }
            measuredEntry(ids.get(k)).widen(draws[k]);
        }
        return draws;
    }

    /** What there is, or null, plus weighted draws, of which the array is taken over. */
    private static double[] sum(double[] before, double weight, double[] drawn) {
        if (before == null && weight == 1) {
            return drawn;
        }
        for (int i = 0; i < drawn.length; i++) {
            drawn[i] = weight * drawn[i] + (before == null ? 0 : before[i]);
        }
        return drawn;
    }

    /** A part of a feature that is to be drawn, and the place of the feature among the others. */
    private record Drawn(int place, MeasuredEntry.Part part) {}

    /**
     * The 68% interval of a measured feature. Where the continuum is well measured it is the value
     * plus and minus one sigma; below a signal-to-noise of {@value #LINEAR} it is taken from draws,
     * since a ratio is skewed there. Draws for which the definition has no value are left out.
     *
     * @param id a measured feature
     * @param seed start of the random sequence
     * @return the 68% interval in the unit of the feature; empty where more than 5% of the draws
     *     have no value, so that what is left is a choice
     * @throws IllegalArgumentException if it was not measured
     */
    public Optional<Interval68> interval68(String id, long seed) {
        return Optional.ofNullable(intervals68(List.of(id), seed).get(id));
    }

    /**
     * The 68% intervals of all measured features, as {@link #interval68} gives them, from one set
     * of draws.
     *
     * @param seed start of the random sequence
     * @return intervals by the id of the feature, in the order of the catalogue; those that have
     *     none are left out
     */
    public Map<String, Interval68> intervals68(long seed) {
        return intervals68(measuredIds(), seed);
    }

    private Map<String, Interval68> intervals68(List<String> ids, long seed) {
        List<String> skewed =
                ids.stream()
                        .filter(id -> measuredEntry(id).measurement().continuumSignal() < LINEAR)
                        .toList();
        double[][] draws = draws(skewed, INTERVAL_DRAWS, seed);
        Map<String, Interval68> intervals = new LinkedHashMap<>();
        for (String id : ids) {
            int drawn = skewed.indexOf(id);
            if (drawn >= 0) {
                ofDraws(draws[drawn]).ifPresent(interval -> intervals.put(id, interval));
            } else {
                Measured value = measured(id).orElseThrow();
                intervals.put(
                        id,
                        new Interval68(
                                value.value() - value.oneSigma(),
                                value.value() + value.oneSigma()));
            }
        }
        return intervals;
    }

    private static Optional<Interval68> ofDraws(double[] draws) {
        double[] valued = new double[draws.length];
        int size = 0;
        for (double draw : draws) {
            if (!Double.isNaN(draw)) {
                valued[size++] = draw;
            }
        }
        if (size < (1 - MOST_LOST) * draws.length) {
            return Optional.empty();
        }
        // two numbers are wanted by rank: sorting all would cost several times the drawing
        double[] work = Arrays.copyOf(valued, size);
        int[] pivots = new int[PIVOTS];
        Arrays.fill(pivots, -1);
        KthSelector selector = new KthSelector();
        return Optional.of(
                new Interval68(
                        selector.select(work, pivots, (int) (size * LOW_TAIL)),
                        selector.select(work, pivots, (int) (size * (1 - LOW_TAIL)))));
    }

    /**
     * A 68% interval.
     *
     * @param low lower end, in the unit of the feature
     * @param high upper end
     */
    public record Interval68(double low, double high) {}

    private MeasuredEntry measuredEntry(String id) {
        MeasuredEntry entry = entries.get(id);
        if (entry == null || !(entry.measurement().result() instanceof Measured)) {
            throw new IllegalArgumentException(
                    "feature " + id + " was not measured: expected one of " + measuredIds());
        }
        return entry;
    }

    private List<String> measuredIds() {
        return entries.keySet().stream().filter(id -> measured(id).isPresent()).toList();
    }
}
