package emberline.demo;

import static org.junit.jupiter.api.Assumptions.assumeTrue;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.measure.Measurements;
import emberline.read.Observation;
import emberline.read.SpectrumReader;
import emberline.read.UnreadableSpectrumException;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;

/** Real objects, which are not part of this project, and what the product measures on them. */
final class RealObjects {

    private static final Path FOLDER =
            Path.of(System.getProperty("emberline.root", ".."), "..", "shared", "spectra");

    /** Noise taken for all of them: the indices are to be compared, not their errors. */
    private static final double NOMINAL_NOISE = 0.03;

    private RealObjects() {}

    /**
     * A real object.
     *
     * @param name its name
     * @param type its published type (M0 = 0); NaN where it has none on this scale
     * @param gravity {@code VL-G}, {@code INT-G} or empty
     * @param tier how far its spectrum and type are trusted, A to C or another word
     * @param measurements what is measured on it
     */
    record RealObject(
            String name, double type, String gravity, String tier, Measurements measurements) {}

    /** Skips the calling test where there are no real spectra. */
    static void assumePresent() {
        assumeTrue(
                Files.isDirectory(FOLDER),
                "no real spectra at " + FOLDER + ": realism of the demo model not checked");
    }

    /** The objects of the list that are wanted and whose spectra reach the near infrared. */
    static List<RealObject> read(Bench bench, Predicate<NamedCsvRecord> wanted) throws IOException {
        List<RealObject> objects = new ArrayList<>();
        try (CsvReader<NamedCsvRecord> list =
                CsvReader.builder().ofNamedCsvRecord(FOLDER.resolve("list.csv"))) {
            for (NamedCsvRecord row : list) {
                if (wanted.test(row)) {
                    object(bench, row).ifPresent(objects::add);
                }
            }
        }
        return objects;
    }

    private static Optional<RealObject> object(Bench bench, NamedCsvRecord row) {
        Observation seen;
        try {
            seen = new SpectrumReader().read(FOLDER, row.getField("spectrum"));
        } catch (UnreadableSpectrumException e) {
            return Optional.empty();
        }
        double[] micron = seen.wavelengthsMicron();
        double[] flux = seen.fluxes();
        if (micron.length < 50 || micron[micron.length - 1] < 1.3) {
            return Optional.empty();
        }
        double[] sigma = new double[flux.length];
        for (int i = 0; i < sigma.length; i++) {
            sigma[i] = NOMINAL_NOISE * Math.abs(flux[i]);
        }
        String stated = row.getField("resolution");
        int half = micron.length / 2;
        double sampled = micron[half] / (micron[half + 1] - micron[half]) / 2;
        String type = row.getField("known_type_number");
        String gravity = row.getField("known_gravity");
        return Optional.of(
                new RealObject(
                        row.getField("name"),
                        type.isEmpty() ? Double.NaN : Double.parseDouble(type),
                        gravity.equals("FLD-G") ? "" : gravity,
                        row.getField("tier"),
                        bench.measure(
                                micron,
                                flux,
                                sigma,
                                stated.isEmpty() ? sampled : Double.parseDouble(stated))));
    }
}
