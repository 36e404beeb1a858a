package emberline.measure;

import emberline.measure.Measurement.Measured;
import java.util.ArrayList;
import java.util.Arrays;
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

    private final Map<String, Entry> entries;

    private Measurements(Map<String, Entry> entries) {
        this.entries = entries;
    }

    /** A measurement with what is needed to relate it to others. */
    private record Entry(
            FeatureMeasurement measurement, MeasuredSpectrum spectrum, Optional<Formula> formula) {

        /** Whether this is to be preferred to another measurement of the same feature. */
        boolean beats(Entry other) {
            double mine = sigmaOrInfinite();
            return mine < other.sigmaOrInfinite();
        }

        private double sigmaOrInfinite() {
            return measurement.result().fold(Measured::oneSigma, why -> Double.POSITIVE_INFINITY);
        }
    }

    /** Collects the measurements of one spectrum in the order of the catalogue. */
    static Measurements of(MeasuredSpectrum spectrum, List<FeatureMeasurement> measurements) {
        Map<String, Entry> entries = new LinkedHashMap<>();
        for (FeatureMeasurement measurement : measurements) {
            String id = measurement.feature().id();
            entries.put(id, new Entry(measurement, spectrum, spectrum.book().formula(id)));
        }
        return new Measurements(entries);
    }

    /**
     * Of several spectra of one object the best measurement of each feature: the one with the
     * smallest error.
     *
     * @param several measurements with one catalogue, at least one
     * @return one measurement a feature
     */
    public static Measurements best(List<Measurements> several) {
        Map<String, Entry> best = new LinkedHashMap<>(several.get(0).entries);
        for (Measurements other : several.subList(1, several.size())) {
            other.entries.forEach(
                    (id, entry) -> best.merge(id, entry, (a, b) -> b.beats(a) ? b : a));
        }
        return new Measurements(best);
    }

    /**
     * All measurements in the order of the catalogue.
     *
     * @return one entry a feature
     */
    public List<FeatureMeasurement> all() {
        return entries.values().stream().map(Entry::measurement).toList();
    }

    /**
     * The measurement of a feature.
     *
     * @param id the feature, e.g. {@code reid1995/tio5}
     * @return the measurement, or empty where the catalogue has no such feature
     */
    public Optional<FeatureMeasurement> of(String id) {
        return Optional.ofNullable(entries.get(id)).map(Entry::measurement);
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
     * @return covariance in the units of both; 0 for features of different spectra
     * @throws IllegalArgumentException if one of them was not measured
     */
    public double covariance(String one, String two) {
        Entry a = measuredEntry(one);
        Entry b = measuredEntry(two);
        if (a.spectrum != b.spectrum) {
            return 0;
        }
        return a.spectrum.covariance(a.formula.orElseThrow(), b.formula.orElseThrow());
    }

    /**
     * The covariance of several measured features, from the pixels that they share, to first order.
     *
     * @param ids measured features
     * @return symmetric matrix in the order of the features, in the units of both
     * @throws IllegalArgumentException if one of them was not measured
     */
    public double[][] covariance(List<String> ids) {
        double[][] matrix = new double[ids.size()][ids.size()];
        for (int a = 0; a < matrix.length; a++) {
            for (int b = 0; b <= a; b++) {
                matrix[a][b] = covariance(ids.get(a), ids.get(b));
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
        Map<MeasuredSpectrum, List<Integer>> bySpectrum = new LinkedHashMap<>();
        for (int k = 0; k < ids.size(); k++) {
            bySpectrum
                    .computeIfAbsent(
                            measuredEntry(ids.get(k)).spectrum, spectrum -> new ArrayList<>())
                    .add(k);
        }
        double[][] draws = new double[ids.size()][];
        long stream = seed;
        for (Map.Entry<MeasuredSpectrum, List<Integer>> group : bySpectrum.entrySet()) {
            List<Formula> formulas =
                    group.getValue().stream()
                            .map(k -> measuredEntry(ids.get(k)).formula.orElseThrow())
                            .toList();
            double[][] drawn = group.getKey().draws(formulas, count, stream++);
            for (int f = 0; f < drawn.length; f++) {
                draws[group.getValue().get(f)] = drawn[f];
            }
        }
        return draws;
    }

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
                        .filter(id -> measuredEntry(id).measurement.continuumSignal() < LINEAR)
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

    private Entry measuredEntry(String id) {
        Entry entry = entries.get(id);
        if (entry == null || !(entry.measurement.result() instanceof Measured)) {
            throw new IllegalArgumentException(
                    "feature " + id + " was not measured: expected one of " + measuredIds());
        }
        return entry;
    }

    private List<String> measuredIds() {
        return entries.keySet().stream().filter(id -> measured(id).isPresent()).toList();
    }
}
