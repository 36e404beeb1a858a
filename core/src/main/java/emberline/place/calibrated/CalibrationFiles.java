package emberline.place.calibrated;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.read.ProductTable;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.StringJoiner;

/**
 * The calibration as text: {@code loci.csv} with three rows a feature and one column a knot, {@code
 * residual-correlations.csv} with one row a pair, {@code label-error.csv}.
 */
public final class CalibrationFiles {

    /** Name of the table of loci. */
    public static final String LOCI = "loci.csv";

    /** Name of the table of correlations. */
    public static final String CORRELATIONS = "residual-correlations.csv";

    /** Name of the table of the label error. */
    public static final String LABEL_ERROR = "label-error.csv";

    /** Name of the table of the noise of features at a signal-to-noise of one. */
    public static final String NOISE = "feature-noise.csv";

    private static final String FOLDER = "/emberline/place/calibrated/";
    private static final String MEAN = "mean";
    private static final String SHIFT = "low-gravity shift";
    private static final String SCATTER = "scatter";

    /** Correlations smaller than this are not written. */
    private static final double LEAST_CORRELATION = 5e-5;

    private CalibrationFiles() {}

    /** Reads the product's own calibration. */
    static Calibration standard() {
        Map<String, Map<String, double[]>> loci = new LinkedHashMap<>();
        for (NamedCsvRecord row : rows(LOCI)) {
            double[] values =
                    row.getFields().stream().skip(2).mapToDouble(Double::parseDouble).toArray();
            loci.computeIfAbsent(row.getField("feature"), feature -> new LinkedHashMap<>())
                    .put(row.getField("quantity"), values);
        }
        List<Locus> list = new ArrayList<>();
        loci.forEach(
                (feature, of) ->
                        list.add(new Locus(feature, of.get(MEAN), of.get(SHIFT), of.get(SCATTER))));
        Map<String, Double> label = new LinkedHashMap<>();
        rows(LABEL_ERROR)
                .forEach(
                        row ->
                                label.put(
                                        row.getField("name"),
                                        Double.parseDouble(row.getField("value"))));
        return new Calibration(
                list,
                correlations(List.copyOf(loci.keySet())),
                new LabelError(
                        label.get("core_subclass"),
                        label.get("tail_subclass"),
                        label.get("tail_share")));
    }

    private static double[][] correlations(List<String> features) {
        double[][] matrix = new double[features.size()][features.size()];
        for (int i = 0; i < matrix.length; i++) {
            matrix[i][i] = 1;
        }
        Map<String, Integer> place = new HashMap<>();
        for (String feature : features) {
            place.put(feature, place.size());
        }
        for (NamedCsvRecord row : rows(CORRELATIONS)) {
            int one = place.get(row.getField("feature"));
            int two = place.get(row.getField("other"));
            matrix[one][two] = Double.parseDouble(row.getField("correlation"));
            matrix[two][one] = matrix[one][two];
        }
        return matrix;
    }

    private static List<NamedCsvRecord> rows(String file) {
        return ProductTable.at(FOLDER + file).rows();
    }

    /**
     * A calibration as files.
     *
     * @param calibration what to write
     * @param noise how noisy its features are
     * @param remarks lines that go before the header of each, without mark
     * @return text by file name
     */
    public static Map<String, String> text(
            Calibration calibration, FeatureNoise noise, List<String> remarks) {
        Map<String, String> files = new LinkedHashMap<>();
        String head = remarks.isEmpty() ? "" : "# " + String.join("\n# ", remarks) + "\n";
        files.put(LOCI, head + loci(calibration));
        files.put(CORRELATIONS, head + correlations(calibration));
        files.put(NOISE, head + noise.text());
        LabelError label = calibration.labelError();
        files.put(
                LABEL_ERROR,
                head
                        + String.format(
                                Locale.ROOT,
                                "name,value\ncore_subclass,%.3f\ntail_subclass,%.3f\ntail_share,%.3f\n",
                                label.coreSubclass(),
                                label.tailSubclass(),
                                label.tailShare()));
        return files;
    }

    private static String loci(Calibration calibration) {
        StringBuilder text = new StringBuilder("feature,quantity");
        for (int k = 0; k < TypeKnots.COUNT; k++) {
            text.append(String.format(Locale.ROOT, ",%.1f", TypeKnots.typeNumber(k)));
        }
        text.append('\n');
        for (Locus locus : calibration.loci()) {
            double[] mean = new double[TypeKnots.COUNT];
            double[] shift = new double[TypeKnots.COUNT];
            double[] scatter = new double[TypeKnots.COUNT];
            for (int k = 0; k < TypeKnots.COUNT; k++) {
                mean[k] = locus.mean(k, 0);
                shift[k] = locus.mean(k, 1) - mean[k];
                scatter[k] = locus.scatter(k);
            }
            text.append(line(locus.feature(), MEAN, mean));
            text.append(line(locus.feature(), SHIFT, shift));
            text.append(line(locus.feature(), SCATTER, scatter));
        }
        return text.toString();
    }

    private static String line(String feature, String quantity, double[] values) {
        StringJoiner cells = new StringJoiner(",", "", "\n");
        cells.add(feature).add(quantity);
        Arrays.stream(values)
                .forEach(value -> cells.add(String.format(Locale.ROOT, "%.4g", value)));
        return cells.toString();
    }

    private static String correlations(Calibration calibration) {
        StringBuilder text = new StringBuilder("feature,other,correlation\n");
        List<Locus> loci = calibration.loci();
        for (int a = 0; a < loci.size(); a++) {
            for (int b = 0; b < a; b++) {
                if (Math.abs(calibration.correlation(a, b)) >= LEAST_CORRELATION) {
                    text.append(
                            String.format(
                                    Locale.ROOT,
                                    "%s,%s,%.4f\n",
                                    loci.get(a).feature(),
                                    loci.get(b).feature(),
                                    calibration.correlation(a, b)));
                }
            }
        }
        return text.toString();
    }
}
