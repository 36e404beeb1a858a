package emberline.reports;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.spectrum.Spectrum;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

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
        for (String line : Files.readAllLines(FOLDER.resolve(row.get("spectrum")))) {
            String[] cells = line.split(",", -1);
            if (line.startsWith("#") || !Character.isDigit(line.charAt(0)) || cells.length < 2) {
                continue;
            }
            double flux = Double.parseDouble(cells[1]);
            double sigma =
                    cells.length > 2 && !cells[2].isBlank()
                            ? Double.parseDouble(cells[2])
                            : Math.abs(flux) / 30;
            pixels.add(new double[] {Double.parseDouble(cells[0]), flux, sigma});
        }
        Spectrum spectrum = Spectrum.of(column(pixels, 0), column(pixels, 1), column(pixels, 2));
        String resolution = row.get("resolution");
        return Samples.object(
                row.get("name"),
                row,
                List.of(spectrum),
                resolution.isBlank() ? 100 : Double.parseDouble(resolution));
    }

    private static double[] column(List<double[]> rows, int column) {
        return rows.stream().mapToDouble(row -> row[column]).toArray();
    }
}
