package emberline.spark;

import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
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
import java.util.stream.Stream;
import org.apache.spark.sql.Row;
import org.apache.spark.sql.types.ArrayType;
import org.apache.spark.sql.types.NumericType;
import org.apache.spark.sql.types.StructField;
import org.apache.spark.sql.types.StructType;

/**
 * A row of a table of spectra: {@code name}, {@code wavelength_micron}, {@code flux} (per unit
 * wavelength), perhaps {@code sigma}, and whatever a candidate list may hold, such as {@code
 * medium} and {@code resolution}. A row whose arrays are all null is an object without a spectrum.
 */
final class SpectrumRow {

    private static final String NAME = "name";
    private static final String WAVELENGTH = "wavelength_micron";
    private static final String FLUX = "flux";
    private static final String SIGMA = "sigma";

    /** Columns with the arrays. */
    static final List<String> ARRAYS = List.of(WAVELENGTH, FLUX, SIGMA);

    /** By what the chain asks for the spectrum of a row. */
    private static final String ADDRESS = "row";

    private SpectrumRow() {}

    /**
     * Checks the columns of a table.
     *
     * @throws IllegalArgumentException if a column is missing or is no array of numbers
     */
    static void check(StructType schema) {
        List<String> columns = List.of(schema.fieldNames());
        for (String needed : List.of(NAME, WAVELENGTH, FLUX)) {
            if (!columns.contains(needed)) {
                throw new IllegalArgumentException(
                        "table of spectra: no column "
                                + needed
                                + " among "
                                + String.join(", ", columns)
                                + "; expected name, wavelength_micron, flux and perhaps sigma."
                                + " Rename the columns.");
            }
        }
        for (StructField field : schema.fields()) {
            boolean numbers =
                    field.dataType() instanceof ArrayType array
                            && array.elementType() instanceof NumericType;
            if (ARRAYS.contains(field.name()) && !numbers) {
                throw new IllegalArgumentException(
                        "table of spectra: column "
                                + field.name()
                                + " is "
                                + field.dataType().simpleString()
                                + "; expected an array of numbers, one a pixel.");
            }
        }
    }

    /** The columns that a candidate list would hold, in their order. */
    static List<String> listColumns(StructType schema) {
        return Stream.of(schema.fieldNames()).filter(column -> !ARRAYS.contains(column)).toList();
    }

    /** The object of a row, checked like a row of a list. */
    static ListedCandidate candidate(Row row) {
        Map<String, String> cells = new LinkedHashMap<>();
        for (String column : listColumns(row.schema())) {
            Object value = row.getAs(column);
            cells.put(column, value == null ? "" : value.toString());
        }
        Map<String, String> asListed = new LinkedHashMap<>(cells);
        boolean hasSpectrum = !isNull(row, WAVELENGTH) || !isNull(row, FLUX);
        asListed.put("spectrum", hasSpectrum ? ADDRESS : "");
        ListedCandidate listed = CandidateListReader.row(asListed);
        Candidate checked = listed.candidate();
        // A table has no order, so the name says which row is meant.
        String named = "row of " + checked.name();
        return new ListedCandidate(
                new Candidate(checked.name(), checked.row(), checked.spectra(), cells),
                listed.problem().map(text -> text.replaceFirst("^row 1\\b", named)));
    }

    /** The spectrum of a row. */
    static Observation observation(Row row) throws UnreadableSpectrumException {
        double[] wavelengths = numbers(row, WAVELENGTH);
        double[] fluxes = numbers(row, FLUX);
        Optional<double[]> sigmas =
                isNull(row, SIGMA) ? Optional.empty() : Optional.of(numbers(row, SIGMA));
        try {
            return Observation.of(
                    new Observation.Origin(
                            name(row),
                            "table row, " + wavelengths.length + " pixels",
                            sha256(wavelengths, fluxes, sigmas.orElse(new double[0]))),
                    wavelengths,
                    fluxes,
                    sigmas,
                    new Observation.Stated(Optional.empty(), Optional.empty()),
                    List.of());
        } catch (IllegalArgumentException e) {
            throw new UnreadableSpectrumException(
                    "row of " + name(row),
                    e.getMessage(),
                    "arrays of equal length with rising wavelengths",
                    "Correct the row of the table.");
        }
    }

    private static boolean isNull(Row row, String column) {
        return !List.of(row.schema().fieldNames()).contains(column) || row.getAs(column) == null;
    }

    private static String name(Row row) {
        return String.valueOf(row.<Object>getAs(NAME));
    }

    private static double[] numbers(Row row, String column) throws UnreadableSpectrumException {
        if (isNull(row, column)) {
            throw new UnreadableSpectrumException(
                    "row of " + name(row),
                    "no array in column " + column,
                    "wavelengths and fluxes, or neither for an object without a spectrum",
                    "Complete the row of the table.");
        }
        List<?> values = row.getList(row.fieldIndex(column));
        double[] numbers = new double[values.size()];
        for (int i = 0; i < numbers.length; i++) {
            numbers[i] = values.get(i) instanceof Number number ? number.doubleValue() : Double.NaN;
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
