package emberline.place.calibrated;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.measure.Measurement.Measured;
import emberline.place.reference.ReferenceRow;
import emberline.place.reference.ReferenceTable;
import emberline.read.ProductTable;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.TreeMap;
import java.util.stream.IntStream;
import org.apache.commons.math3.stat.descriptive.rank.Median;

/**
 * How noisy a feature is at a signal-to-noise of one: the median, over spectra of known type, of
 * the error of the feature times the median signal-to-noise a pixel of the spectrum. By resolution
 * and by half classes of types, since deep bands have less signal than the rest of the spectrum.
 */
public final class FeatureNoise {

    private static final double BIN_SUBCLASS = 5;
    private static final int BINS = 7;
    private static final int FEWEST = 3;

    /** Resolutions that are told apart. */
    public enum Resolution {
        /** Resolving power below 250, such as a prism of R = 120. */
        LOW(0, "low"),
        /** Resolving power 250 to 1300. */
        MEDIUM(250, "medium"),
        /** Resolving power above 1300, such as a cross-dispersed spectrograph. */
        HIGH(1300, "high");

        private final double from;
        private final String word;

        Resolution(double from, String word) {
            this.from = from;
            this.word = word;
        }

        /**
         * The class of a resolving power.
         *
         * @param resolvingPower a resolving power
         * @return its class
         */
        public static Resolution of(double resolvingPower) {
            Resolution found = LOW;
            for (Resolution one : values()) {
                found = resolvingPower >= one.from ? one : found;
            }
            return found;
        }
    }

    private final Map<Resolution, Map<String, double[]>> noise;

    private FeatureNoise(Map<Resolution, Map<String, double[]>> noise) {
        this.noise = noise;
    }

    /**
     * The noise that goes with the product's calibration.
     *
     * @return the table
     */
    public static FeatureNoise standard() {
        Map<Resolution, Map<String, double[]>> noise = empty();
        for (NamedCsvRecord row :
                ProductTable.at("/emberline/place/calibrated/" + CalibrationFiles.NOISE).rows()) {
            for (Resolution resolution : Resolution.values()) {
                if (resolution.word.equals(row.getField("resolution"))) {
                    noise.get(resolution)
                            .put(
                                    row.getField("feature"),
                                    row.getFields().stream()
                                            .skip(2)
                                            .mapToDouble(
                                                    cell ->
                                                            cell.isBlank()
                                                                    ? Double.NaN
                                                                    : Double.parseDouble(cell))
                                            .toArray());
                }
            }
        }
        return new FeatureNoise(noise);
    }

    /**
     * Learns from dwarfs of known type.
     *
     * @param table what was measured on them
     * @return the noise of the features by which objects are placed; a bin without three spectra is
     *     left out
     */
    public static FeatureNoise of(ReferenceTable table) {
        List<String> features = LocusFeatures.among(table);
        Map<Resolution, Map<String, double[]>> noise = empty();
        for (Resolution resolution : Resolution.values()) {
            for (String feature : features) {
                double[] bins =
                        IntStream.range(0, BINS)
                                .mapToDouble(bin -> median(table, feature, resolution, bin))
                                .toArray();
                if (IntStream.range(0, BINS).anyMatch(bin -> !Double.isNaN(bins[bin]))) {
                    noise.get(resolution).put(feature, bins);
                }
            }
        }
        return new FeatureNoise(noise);
    }

    private static Map<Resolution, Map<String, double[]>> empty() {
        Map<Resolution, Map<String, double[]>> noise = new EnumMap<>(Resolution.class);
        for (Resolution resolution : Resolution.values()) {
            noise.put(resolution, new TreeMap<>());
        }
        return noise;
    }

    private static double median(
            ReferenceTable table, String feature, Resolution resolution, int bin) {
        List<Double> scaled = new ArrayList<>();
        for (ReferenceRow row : table.rows()) {
            boolean fits =
                    row.kind().equals("dwarf")
                            && row.typeNumber().isPresent()
                            && bin(row.typeNumber().getAsDouble()) == bin
                            && Resolution.of(row.resolvingPower()) == resolution
                            && row.signalToNoise().isPresent();
            if (fits) {
                row.feature(feature)
                        .map(Measured::oneSigma)
                        .ifPresent(sigma -> scaled.add(sigma * row.signalToNoise().getAsDouble()));
            }
        }
        return scaled.size() < FEWEST
                ? Double.NaN
                : new Median().evaluate(scaled.stream().mapToDouble(s -> s).toArray());
    }

    private static int bin(double typeNumber) {
        return (int) Math.max(0, Math.min(BINS - 1, Math.floor(typeNumber / BIN_SUBCLASS)));
    }

    /**
     * The one-sigma error of a feature at a signal-to-noise of one.
     *
     * @param feature feature id
     * @param typeNumber type (M0 = 0)
     * @param resolvingPower resolving power of the spectrum
     * @return error in the unit of the feature, to be divided by the median signal-to-noise a
     *     pixel; empty where spectra of this resolution and type do not show the feature
     */
    public OptionalDouble atUnitSignal(String feature, double typeNumber, double resolvingPower) {
        double[] bins = noise.get(Resolution.of(resolvingPower)).get(feature);
        return bins == null || Double.isNaN(bins[bin(typeNumber)])
                ? OptionalDouble.empty()
                : OptionalDouble.of(bins[bin(typeNumber)]);
    }

    /** The table as CSV, as {@link #standard} reads it. */
    String text() {
        StringBuilder text = new StringBuilder("feature,resolution");
        for (int bin = 0; bin < BINS; bin++) {
            text.append(String.format(Locale.ROOT, ",%.1f", bin * BIN_SUBCLASS));
        }
        text.append('\n');
        noise.forEach(
                (resolution, features) ->
                        features.forEach(
                                (feature, bins) -> {
                                    text.append(feature).append(',').append(resolution.word);
                                    for (double one : bins) {
                                        text.append(',');
                                        text.append(
                                                Double.isNaN(one)
                                                        ? ""
                                                        : String.format(Locale.ROOT, "%.3g", one));
                                    }
                                    text.append('\n');
                                }));
        return text.toString();
    }
}
