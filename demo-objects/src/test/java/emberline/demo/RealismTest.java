package emberline.demo;

import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/**
 * The model beside real dwarfs: every index is measured by the product on both, and the model must
 * lie within the distribution of real objects of its type. Real spectra are not part of this
 * project; without them the test is skipped. It writes its figures to {@code target/realism.csv}.
 */
class RealismTest {

    private static final Path REAL =
            Path.of(System.getProperty("emberline.root", ".."), "..", "shared", "spectra");

    /** Indices with windows of 10 nm and more, which every resolution from 75 on can measure. */
    private static final List<String> INDICES =
            List.of(
                    "allers2007/h2o",
                    "allers2013/h2od",
                    "allers2013/feh_z",
                    "allers2013/vo_z",
                    "allers2013/ki_j",
                    "allers2013/h-cont",
                    "burgasser2006/h2o-j",
                    "burgasser2006/ch4-j",
                    "burgasser2006/h2o-h",
                    "burgasser2006/ch4-h",
                    "burgasser2006/h2o-k",
                    "burgasser2006/ch4-k",
                    "burgasser2006/k-j",
                    "burgasser2006b/y-j",
                    "burgasser2006b/k-h",
                    "burgasser2002/h2o-c",
                    "burgasser2002/co",
                    "slesnick2004/h2o-1",
                    "slesnick2004/h2o-2",
                    "tokunaga1999/k1",
                    "tokunaga1999/k2",
                    "testi2001/sh2o_j",
                    "testi2001/sh2o_h1",
                    "testi2001/sh2o_k",
                    "geballe2002/h2o_1.5",
                    "canty2013/h2-k",
                    "delorme2008/nh3-h",
                    "warren2007/w_j",
                    "bardalez2014/j-slope",
                    "bardalez2014/h-bump");

    /** Types at which there are enough real objects, and how far around them counts (subclass). */
    private static final List<double[]> FIELD =
            List.of(
                    new double[] {6, 1},
                    new double[] {8, 1},
                    new double[] {10, 1},
                    new double[] {12, 1},
                    new double[] {14.5, 1.5});

    private static final List<double[]> VERY_LOW =
            List.of(new double[] {9, 1}, new double[] {10.5, 1}, new double[] {13, 1.5});

    private static final String NUMBER = "\\s*[+-]?[0-9.]+([eE][+-]?[0-9]+)?\\s*";

    private static final int LEAST_OBJECTS = 4;

    /**
     * Two in three of a normal distribution lie within one sigma, nineteen in twenty within two.
     */
    private static final double LEAST_SHARE_WITHIN_TWO = 0.93;

    private static final Bench BENCH = new Bench();

    /** A real dwarf and what the product measures on it. */
    private record RealDwarf(double type, String gravity, Measurements measurements) {}

    @Test
    void indicesOfTheModelLieWithinThoseOfRealDwarfs() throws IOException {
        assumeTrue(
                Files.isDirectory(REAL),
                "no real spectra at " + REAL + ": realism of the demo model not checked");
        List<RealDwarf> dwarfs = realDwarfs();
        List<String> report = new ArrayList<>();
        report.add("index,gravity,type,objects,real_median,real_sigma,model,deviation_sigma");
        List<Double> deviations = new ArrayList<>();
        FIELD.forEach(at -> compare(dwarfs, "", at, report, deviations));
        VERY_LOW.forEach(at -> compare(dwarfs, "VL-G", at, report, deviations));
        Files.write(Path.of("target", "realism.csv"), report);
        assertTrue(deviations.size() > 150, "comparisons: " + deviations.size());
        double within = deviations.stream().filter(x -> Math.abs(x) <= 2).count();
        double share = within / deviations.size();
        assertTrue(share >= LEAST_SHARE_WITHIN_TWO, "share within two sigma: " + share);
    }

    private static void compare(
            List<RealDwarf> dwarfs,
            String gravity,
            double[] at,
            List<String> report,
            List<Double> deviations) {
        Measurements model =
                BENCH.measureDwarf(at[0], gravity.isEmpty() ? "FLD-G" : gravity, "prism");
        for (String index : INDICES) {
            double[] real =
                    dwarfs.stream()
                            .filter(d -> d.gravity.equals(gravity))
                            .filter(d -> Math.abs(d.type - at[0]) <= at[1])
                            .map(d -> d.measurements.measured(index))
                            .flatMap(Optional::stream)
                            .mapToDouble(Measured::value)
                            .sorted()
                            .toArray();
            Optional<Measured> mine = model.measured(index);
            if (real.length < LEAST_OBJECTS || mine.isEmpty()) {
                continue;
            }
            double median = median(real);
            double sigma =
                    1.4826
                            * median(
                                    Arrays.stream(real)
                                            .map(v -> Math.abs(v - median))
                                            .sorted()
                                            .toArray());
            double floor = 0.01 * Math.max(1, Math.abs(median));
            double deviation = (mine.get().value() - median) / Math.max(sigma, floor);
            deviations.add(deviation);
            report.add(
                    String.format(
                            Locale.ROOT,
                            "%s,%s,%.1f,%d,%.4f,%.4f,%.4f,%.2f",
                            index,
                            gravity,
                            at[0],
                            real.length,
                            median,
                            sigma,
                            mine.get().value(),
                            deviation));
        }
    }

    private static double median(double[] sorted) {
        int half = sorted.length / 2;
        return sorted.length % 2 == 1 ? sorted[half] : (sorted[half - 1] + sorted[half]) / 2;
    }

    private static List<RealDwarf> realDwarfs() throws IOException {
        List<RealDwarf> dwarfs = new ArrayList<>();
        try (CsvReader<NamedCsvRecord> list =
                CsvReader.builder().ofNamedCsvRecord(REAL.resolve("list.csv"))) {
            for (NamedCsvRecord row : list) {
                boolean usable =
                        row.getField("known_kind").equals("dwarf")
                                && row.getField("tier").matches("[AB]")
                                && !row.getField("known_type_number").isEmpty();
                if (usable) {
                    spectrum(REAL.resolve(row.getField("spectrum")))
                            .map(rows -> measured(row, rows))
                            .ifPresent(dwarfs::add);
                }
            }
        }
        return dwarfs;
    }

    private static RealDwarf measured(NamedCsvRecord row, double[][] spectrum) {
        String stated = row.getField("resolution");
        double[] micron = spectrum[0];
        int half = micron.length / 2;
        double sampled = micron[half] / (micron[half + 1] - micron[half]) / 2;
        double resolvingPower = stated.isEmpty() ? sampled : Double.parseDouble(stated);
        String gravity = row.getField("known_gravity");
        return new RealDwarf(
                Double.parseDouble(row.getField("known_type_number")),
                gravity.equals("FLD-G") ? "" : gravity,
                BENCH.measure(micron, spectrum[1], spectrum[2], resolvingPower));
    }

    /** Wavelength, flux and a nominal sigma; empty where the near infrared is not covered. */
    private static Optional<double[][]> spectrum(Path file) throws IOException {
        Map<Integer, double[]> rows = new HashMap<>();
        double last = 0;
        for (String line : Files.readAllLines(file, StandardCharsets.ISO_8859_1)) {
            String[] cells = line.split(",", -1);
            if (cells.length >= 2 && cells[0].matches(NUMBER)) {
                double micron = Double.parseDouble(cells[0]);
                double flux = cells[1].matches(NUMBER) ? Double.parseDouble(cells[1]) : Double.NaN;
                if (micron > last) {
                    rows.put(rows.size(), new double[] {micron, flux, 0.03 * Math.abs(flux)});
                    last = micron;
                }
            }
        }
        if (rows.size() < 50 || last < 1.3) {
            return Optional.empty();
        }
        double[][] columns = new double[3][rows.size()];
        rows.forEach(
                (i, row) -> {
                    for (int k = 0; k < 3; k++) {
                        columns[k][i] = row[k];
                    }
                });
        return Optional.of(columns);
    }
}
