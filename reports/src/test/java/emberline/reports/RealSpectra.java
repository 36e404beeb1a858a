package emberline.reports;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.spectrum.Spectrum;
import emberline.survey.ObjectResult;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.zip.GZIPInputStream;

/** Real spectra from the folder beside the project, where there is one. */
public final class RealSpectra {

    private static final Path FOLDER =
            Path.of(System.getProperty("emberline.root", "."), "..", "shared", "spectra");

    private RealSpectra() {}

    /** Whether the folder is there. */
    public static boolean present() {
        return Files.exists(FOLDER.resolve("list.csv"));
    }

    /** The rows of the list by name. */
    public static Map<String, Map<String, String>> rows() throws IOException {
        Map<String, Map<String, String>> rows = new LinkedHashMap<>();
        try (CsvReader<NamedCsvRecord> csv =
                CsvReader.builder().ofNamedCsvRecord(FOLDER.resolve("list.csv"))) {
            for (NamedCsvRecord row : csv) {
                rows.put(row.getField("name"), row.getFieldsAsMap());
            }
        }
        return rows;
    }

    /** An object of the list, taken through measuring and placing. */
    public static ObjectResult object(Map<String, String> row) throws IOException {
        List<double[]> pixels = new ArrayList<>();
        for (String line : text(FOLDER.resolve(row.get("spectrum"))).lines().toList()) {
            String[] cells = line.split(",", -1);
            boolean data = !line.isEmpty() && Character.isDigit(line.charAt(0));
            if (!data || cells.length < 2) {
                continue;
            }
            double flux = Double.parseDouble(cells[1]);
            double sigma =
                    cells.length > 2 && !cells[2].isBlank()
                            ? Double.parseDouble(cells[2])
                            : Double.NaN;
            pixels.add(new double[] {Double.parseDouble(cells[0]), flux, sigma});
        }
        estimateMissingSigma(pixels);
        Spectrum spectrum = Spectrum.of(column(pixels, 0), column(pixels, 1), column(pixels, 2));
        String resolution = row.get("resolution");
        return Samples.object(
                row.get("name"),
                row,
                List.of(spectrum),
                resolution.isBlank() ? 100 : Double.parseDouble(resolution));
    }

    private static String text(Path file) throws IOException {
        byte[] bytes = Files.readAllBytes(file);
        if (bytes[0] == 0x1f && bytes[1] == (byte) 0x8b) {
            try (InputStream stream = new GZIPInputStream(new ByteArrayInputStream(bytes))) {
                bytes = stream.readAllBytes();
            }
        }
        return new String(bytes, StandardCharsets.UTF_8);
    }

    /**
     * Mean absolute difference to the mean of both neighbours over 41 pixels, roughly one sigma.
     */
    private static void estimateMissingSigma(List<double[]> pixels) {
        for (int i = 0; i < pixels.size(); i++) {
            if (!Double.isNaN(pixels.get(i)[2])) {
                continue;
            }
            double sum = 0;
            int count = 0;
            int to = Math.min(pixels.size() - 2, i + 20);
            for (int k = Math.max(1, i - 20); k <= to; k++) {
                double mean = (pixels.get(k - 1)[1] + pixels.get(k + 1)[1]) / 2;
                sum += Math.abs(pixels.get(k)[1] - mean);
                count++;
            }
            pixels.get(i)[2] = sum / count;
        }
    }

    private static double[] column(List<double[]> rows, int column) {
        return rows.stream().mapToDouble(row -> row[column]).toArray();
    }
}
