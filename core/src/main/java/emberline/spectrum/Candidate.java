package emberline.spectrum;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * One row of a candidate list: an object, where its spectra are, and what is already known of it.
 *
 * @param name the name as listed; not empty
 * @param row the number of its row in the list, from 1 without the header
 * @param spectra paths of its spectra as listed, relative to the list; empty where there are none
 * @param cells every cell of the row by column name, as listed, in the order of the list; keeps
 *     columns that the product does not know
 */
public record Candidate(String name, int row, List<String> spectra, Map<String, String> cells) {

    /** Columns that may hold a value for each spectrum, joined by {@code ;}. */
    public static final List<String> PER_SPECTRUM = List.of("medium", "resolution", "rv_kms");

    /** Copies the collections. */
    public Candidate {
        if (name.isBlank()) {
            throw new IllegalArgumentException("candidate in row " + row + ": expected a name");
        }
        spectra = List.copyOf(spectra);
        cells = Collections.unmodifiableMap(new LinkedHashMap<>(cells));
    }

    /**
     * A cell as text.
     *
     * @param column name of a column
     * @return the trimmed text, or empty where the column is absent or the cell blank
     */
    public Optional<String> text(String column) {
        String cell = cells.get(column);
        return cell == null || cell.isBlank() ? Optional.empty() : Optional.of(cell.trim());
    }

    /**
     * A cell as a number.
     *
     * @param column name of a column, e.g. {@code parallax_mas} or {@code j_mag}
     * @return the number in the unit that the column name says, or empty where the column is
     *     absent, the cell blank or not a finite number
     */
    public OptionalDouble number(String column) {
        Optional<String> text = text(column);
        if (text.isEmpty()) {
            return OptionalDouble.empty();
        }
        try {
            double value = Double.parseDouble(text.get());
            return Double.isFinite(value) ? OptionalDouble.of(value) : OptionalDouble.empty();
        } catch (NumberFormatException e) {
            return OptionalDouble.empty();
        }
    }

    /**
     * The candidate with what the list states about one of its spectra: cells of some columns hold
     * one value for all spectra, or one for each, joined by {@code ;}.
     *
     * @param place the place of the spectrum, from 0
     * @return the same candidate where it states nothing apart
     */
    public Candidate forSpectrum(int place) {
        Map<String, String> own = new LinkedHashMap<>(cells);
        for (String column : PER_SPECTRUM) {
            String[] parts = cells.getOrDefault(column, "").split(";", -1);
            if (parts.length > 1 && parts.length == spectra.size()) {
                own.put(column, parts[place].trim());
            }
        }
        return new Candidate(name, row, spectra, own);
    }
}
