package emberline.spark;

import emberline.read.Observation;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.Candidate;
import java.nio.ByteBuffer;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.apache.spark.sql.Row;

/**
 * A row of a table of spectra: {@code name}, {@code wavelength_micron}, {@code flux} (per unit
 * wavelength), perhaps {@code sigma}, and whatever a candidate list may hold, such as {@code medium}
 * and {@code resolution}.
 */
final class SpectrumRow {

    /** Columns with the arrays. */
    static final List<String> ARRAYS = List.of("wavelength_micron", "flux", "sigma");

    private SpectrumRow() {}

    /** The object of a row. */
    static Candidate candidate(Row row) {
        Map<String, String> cells = new LinkedHashMap<>();
        for (String column : row.schema().fieldNames()) {
            if (!ARRAYS.contains(column)) {
                Object value = row.getAs(column);
                cells.put(column, value == null ? "" : value.toString());
            }
        }
        String name = cells.getOrDefault("name", "").isBlank() ? "no name" : cells.get("name");
        return new Candidate(name, 1, List.of("row"), cells);
    }

    /** The spectrum of a row. */
    static Observation observation(Row row) throws UnreadableSpectrumException {
        double[] wavelengths = numbers(row, "wavelength_micron");
        double[] fluxes = numbers(row, "flux");
        Optional<double[]> sigmas =
                List.of(row.schema().fieldNames()).contains("sigma")
                                && row.getAs("sigma") != null
                        ? Optional.of(numbers(row, "sigma"))
                        : Optional.empty();
        try {
            return Observation.of(
                    new Observation.Origin(
                            row.getAs("name"),
                            "Parquet row, " + wavelengths.length + " pixels",
                            sha256(wavelengths, fluxes, sigmas.orElse(new double[0]))),
                    wavelengths,
                    fluxes,
                    sigmas,
                    new Observation.Stated(Optional.empty(), Optional.empty()),
                    List.of());
        } catch (IllegalArgumentException e) {
            throw new UnreadableSpectrumException(
                    "row of " + row.getAs("name"),
                    e.getMessage(),
                    "arrays of equal length with rising wavelengths",
                    "Correct the row of the table.");
        }
    }

    private static double[] numbers(Row row, String column) throws UnreadableSpectrumException {
        List<String> columns = List.of(row.schema().fieldNames());
        if (!columns.contains(column) || row.getAs(column) == null) {
            throw new UnreadableSpectrumException(
                    "row of " + row.getAs("name"),
                    "no array " + column + " among " + String.join(", ", columns),
                    "the columns name, wavelength_micron, flux and perhaps sigma",
                    "Rename the columns.");
        }
        List<?> values = row.getList(row.fieldIndex(column));
        double[] numbers = new double[values.size()];
        for (int i = 0; i < numbers.length; i++) {
            numbers[i] =
                    values.get(i) instanceof Number number ? number.doubleValue() : Double.NaN;
        }
        return numbers;
    }

    private static String sha256(double[]... arrays) {
        try {
            MessageDigest digest = MessageDigest.getInstance("SHA-256");
            for (double[] array : arrays) {
                ByteBuffer bytes = ByteBuffer.allocate(8 * array.length);
                bytes.asDoubleBuffer().put(array);
                digest.update(bytes);
            }
            return HexFormat.of().formatHex(digest.digest());
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has SHA-256", e);
        }
    }
}
