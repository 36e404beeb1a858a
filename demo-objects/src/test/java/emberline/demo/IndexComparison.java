package emberline.demo;

import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** How far indices of the model lie from those of real objects, in units of their scatter. */
final class IndexComparison {

    /** Scatter is not believed to be less than a hundredth of an index. */
    private static final double LEAST_SIGMA = 0.01;

    private final List<String> report = new ArrayList<>();
    private final List<Double> deviations = new ArrayList<>();

    IndexComparison() {
        report.add("index,group,objects,real_median,real_sigma,model,deviation_sigma");
    }

    /**
     * Compares with the median of real objects; their scatter is 1.4826 median absolute deviations.
     *
     * @param group what is compared, for the report
     * @param indices feature ids
     * @param model what is measured on the model
     * @param real what is measured on the real objects
     * @param leastObjects an index measured on fewer is left out
     */
    void withObjects(
            String group,
            List<String> indices,
            Measurements model,
            List<Measurements> real,
            int leastObjects) {
        for (String index : indices) {
            double[] values =
                    real.stream()
                            .map(measurements -> measurements.measured(index))
                            .flatMap(Optional::stream)
                            .mapToDouble(Measured::value)
                            .sorted()
                            .toArray();
            if (values.length >= leastObjects) {
                double median = median(values);
                double[] apart =
                        Arrays.stream(values).map(v -> Math.abs(v - median)).sorted().toArray();
                add(index, group, values.length, median, 1.4826 * median(apart), model);
            }
        }
    }

    /** Compares with a mean and a scatter. */
    void withMean(String index, String group, double mean, double scatter, Measurements model) {
        add(index, group, 0, mean, scatter, model);
    }

    private void add(
            String index,
            String group,
            int objects,
            double median,
            double scatter,
            Measurements model) {
        Optional<Measured> mine = model.measured(index);
        if (mine.isEmpty()) {
            return;
        }
        double sigma = Math.max(scatter, LEAST_SIGMA * Math.max(1, Math.abs(median)));
        double deviation = (mine.get().value() - median) / sigma;
        deviations.add(deviation);
        report.add(
                String.format(
                        Locale.ROOT,
                        "%s,%s,%d,%.4f,%.4f,%.4f,%.2f",
                        index,
                        group,
                        objects,
                        median,
                        sigma,
                        mine.get().value(),
                        deviation));
    }

    private static double median(double[] sorted) {
        int half = sorted.length / 2;
        return sorted.length % 2 == 1 ? sorted[half] : (sorted[half - 1] + sorted[half]) / 2;
    }

    int size() {
        return deviations.size();
    }

    /** Share of the comparisons that lie within so many sigma. */
    double shareWithin(double sigmas) {
        return deviations.stream().filter(x -> Math.abs(x) <= sigmas).count()
                / (double) deviations.size();
    }

    /** Writes all comparisons; the last line holds the shares. */
    void write(String file) throws IOException {
        List<String> lines = new ArrayList<>(report);
        lines.add(
                String.format(
                        Locale.ROOT,
                        "# %d values, within one sigma %.3f, within two %.3f, within three %.3f",
                        size(),
                        shareWithin(1),
                        shareWithin(2),
                        shareWithin(3)));
        Files.createDirectories(Path.of("target"));
        Files.write(Path.of("target", file), lines);
    }
}
