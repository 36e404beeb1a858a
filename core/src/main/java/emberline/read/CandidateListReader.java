package emberline.read;

import emberline.spectrum.Candidate;
import emberline.spectrum.Medium;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/**
 * Reads a candidate list: a table with a row for each object, told by content (CSV separated by
 * commas, semicolons or tabs; ECSV; VOTable; FITS table; each also packed by gzip).
 *
 * <p>The columns {@code name} and {@code spectrum} must be there (in any case); {@code spectrum}
 * holds paths relative to the folder of the list, several joined by {@code ;}. It may be blank, or
 * be missing, where at least two magnitudes are listed. Known beside them are medium, resolution,
 * ra_deg, dec_deg, parallax_mas, pmra_masyr, pmdec_masyr, rv_kms, y_mag, j_mag, h_mag, k_mag,
 * w1_mag, w2_mag (most with a column of the same name and {@code _err}), known_type, known_gravity
 * and known_kind; medium, resolution and rv_kms hold one value, or one for each spectrum, joined by
 * {@code ;}. Other columns are kept as they are. Every row of the list becomes a candidate; what
 * makes one unusable is said beside it. Has no state; one reader may serve many threads.
 */
public final class CandidateListReader {

    private static final Set<String> POSITIVE_COLUMNS = Set.of("resolution");

    /** Radial velocities from here on are no star's, and mostly a wrong unit (km/s). */
    private static final double VELOCITY_LIMIT_KMS = 30_000;

    private static final Set<String> NUMBER_COLUMNS =
            Set.of(
                    "resolution",
                    "ra_deg",
                    "dec_deg",
                    "parallax_mas",
                    "parallax_mas_err",
                    "pmra_masyr",
                    "pmra_masyr_err",
                    "pmdec_masyr",
                    "pmdec_masyr_err",
                    "rv_kms",
                    "rv_kms_err",
                    "y_mag",
                    "y_mag_err",
                    "j_mag",
                    "j_mag_err",
                    "h_mag",
                    "h_mag_err",
                    "k_mag",
                    "k_mag_err",
                    "w1_mag",
                    "w1_mag_err",
                    "w2_mag",
                    "w2_mag_err");

    private static final Set<String> TEXT_COLUMNS =
            Set.of("name", "spectrum", "medium", "known_type", "known_gravity", "known_kind");

    /** Columns that later steps read, and this one only keeps. */
    private static final Set<String> LATER_COLUMNS = Set.of("mag_system", "age", "lithium");

    private static final List<String> MAGNITUDES =
            List.of("y_mag", "j_mag", "h_mag", "k_mag", "w1_mag", "w2_mag");

    /** An object without a spectrum can be typed by one colour at least. */
    private static final int FEWEST_MAGNITUDES = 2;

    /** Words that stand for "no value" in a column of numbers. */
    private static final Set<String> NO_VALUE = Set.of("nan", "null", "none", "n/a", "--", "-");

    /**
     * Reads a list.
     *
     * @param list path of the list
     * @return every row of it
     * @throws UnreadableListException if the file is missing, unreadable or no table, has no column
     *     {@code name} or {@code spectrum}, or has no rows; its message says what to do
     */
    public CandidateList read(Path list) throws UnreadableListException {
        return all(list, open(list));
    }

    /** Reads a list from what lies at a path. */
    static CandidateList read(FileContent content, Path list) throws UnreadableListException {
        try {
            return all(list, open(content.name(), ListTableReader.open(content)));
        } catch (UnreadableSpectrumException e) {
            throw new UnreadableListException(e);
        }
    }

    private static CandidateList all(Path list, CandidateRows open) throws UnreadableListException {
        List<ListedCandidate> rows = new ArrayList<>();
        try (open) {
            for (Optional<ListedCandidate> row = open.next(); row.isPresent(); row = open.next()) {
                rows.add(row.get());
            }
            return new CandidateList(list, open.columns(), rows);
        }
    }

    /**
     * Opens a list whose rows are wanted one by one. Of a list as text no more than a row is held,
     * and {@value NameRows#BYTES_A_ROW} bytes a row to know repeated names.
     *
     * @param list path of the list
     * @return its rows
     * @throws UnreadableListException as {@link #read}, where the fault shows at the beginning;
     *     what is wrong further down is said when the row is reached
     */
    public CandidateRows open(Path list) throws UnreadableListException {
        try {
            return open(FileContent.name(list), ListTableReader.open(list));
        } catch (UnreadableSpectrumException e) {
            throw new UnreadableListException(e);
        }
    }

    private static CandidateRows open(String name, TableRows table) throws UnreadableListException {
        try {
            List<String> keys = table.columns().stream().map(CandidateListReader::key).toList();
            requireColumns(name, keys, table.columns());
            Optional<List<String>> first = table.next();
            if (first.isEmpty()) {
                throw new UnreadableListException(
                        name,
                        "no rows below the names",
                        "one row for each object",
                        "Add the objects.");
            }
            return new TableCandidates(keys, table, first);
        } catch (UnreadableListException e) {
            table.close();
            throw e;
        }
    }

    /** The rows of a table as candidates. */
    private static final class TableCandidates implements CandidateRows {

        private final List<String> keys;
        private final TableRows table;
        private final NameRows names = new NameRows();
        private Optional<List<String>> next;
        private int row;

        TableCandidates(List<String> keys, TableRows table, Optional<List<String>> first) {
            this.keys = keys;
            this.table = table;
            this.next = first;
        }

        @Override
        public List<String> columns() {
            return keys;
        }

        @Override
        public Optional<ListedCandidate> next() throws UnreadableListException {
            if (next.isEmpty()) {
                return Optional.empty();
            }
            ListedCandidate listed = listed(keys, next.get(), ++row, names);
            next = table.next();
            return Optional.of(listed);
        }

        @Override
        public void close() throws UnreadableListException {
            table.close();
        }
    }

    /**
     * A row that stands in no list, such as one of a table in memory. It is checked as a row of a
     * list is, except that no other row is known.
     *
     * @param cells the cells by column; {@code spectrum} holds where its spectra are
     * @return the row as the first of a list
     */
    public static ListedCandidate row(Map<String, String> cells) {
        List<String> keys = cells.keySet().stream().map(CandidateListReader::key).toList();
        return listed(keys, List.copyOf(cells.values()), 1, new NameRows());
    }

    /** The columns that the product uses, sorted. */
    static List<String> knownColumns() {
        return Stream.of(NUMBER_COLUMNS, TEXT_COLUMNS, LATER_COLUMNS)
                .flatMap(Set::stream)
                .sorted()
                .toList();
    }

    /** The known name of a column whatever its case; other names as they are. */
    static String key(String column) {
        String lower = column.toLowerCase(Locale.ROOT).trim();
        return NUMBER_COLUMNS.contains(lower) || TEXT_COLUMNS.contains(lower) ? lower : column;
    }

    private static void requireColumns(String name, List<String> keys, List<String> columns)
            throws UnreadableListException {
        boolean hasColours =
                keys.stream().filter(MAGNITUDES::contains).count() >= FEWEST_MAGNITUDES;
        for (String needed : new String[] {"name", "spectrum"}) {
            if (!keys.contains(needed) && !(needed.equals("spectrum") && hasColours)) {
                throw new UnreadableListException(
                        name,
                        columns.isEmpty()
                                ? "no line of column names"
                                : "no column '" + needed + "' among " + shortened(columns),
                        "the columns name and spectrum",
                        ColumnSpelling.meant(needed, columns)
                                .or(() -> NearestWord.to(needed, columns))
                                .map(near -> "Did you mean '" + near + "'? Rename it.")
                                .orElse(
                                        "Name the columns in the first line, separated by"
                                                + " commas."));
            }
        }
        Set<String> seen = new HashSet<>();
        for (String key : keys) {
            if (!key.isEmpty() && !seen.add(key)) {
                throw new UnreadableListException(
                        name,
                        "the column '" + key + "' stands twice",
                        "every column once",
                        "Rename or remove one of the two.");
            }
        }
    }

    private static String shortened(List<String> columns) {
        String text = String.join(", ", columns);
        return text.length() > 200 ? text.substring(0, 200) + "..." : text;
    }

    /** A row of cells as a candidate; says what makes it unusable. */
    static ListedCandidate listed(
            List<String> keys, List<String> cells, int row, NameRows rowOfName) {
        Map<String, String> byColumn = new LinkedHashMap<>();
        for (int i = 0; i < keys.size(); i++) {
            byColumn.put(keys.get(i), i < cells.size() ? cells.get(i) : "");
        }
        String written = byColumn.get("name").strip();
        String name = written.isEmpty() ? "row " + row : written;
        List<String> spectra =
                Arrays.stream(byColumn.getOrDefault("spectrum", "").split(";", -1))
                        .map(String::strip)
                        .filter(path -> !path.isBlank())
                        .toList();
        Candidate candidate = new Candidate(name, row, spectra, byColumn);
        Optional<String> problem = problem(candidate, keys.size(), cells.size(), written);
        int first = rowOfName.firstRow(name.toLowerCase(Locale.ROOT), row);
        if (first != row && problem.isEmpty()) {
            problem =
                    Optional.of(
                            at("name", row)
                                    + "'"
                                    + name
                                    + "' stands in row "
                                    + first
                                    + " already; expected every name once. Rename it, or join its"
                                    + " spectra by ; in one row.");
        }
        return new ListedCandidate(candidate, problem);
    }

    private static Optional<String> problem(
            Candidate candidate, int columns, int cells, String writtenName) {
        int row = candidate.row();
        if (cells != columns) {
            return Optional.of(
                    "row "
                            + row
                            + ": "
                            + cells
                            + (cells == 1 ? " cell" : " cells")
                            + "; expected "
                            + columns
                            + " as there are columns. Complete the row, or put cells that hold the"
                            + " separator in quotes.");
        }
        if (writtenName.isEmpty()) {
            return Optional.of(
                    at("name", row) + "no name; expected a name. Give the object a name.");
        }
        if (candidate.spectra().isEmpty() && magnitudes(candidate) < FEWEST_MAGNITUDES) {
            return Optional.of(
                    at("spectrum", row)
                            + "no path; expected the path of a spectrum, or two magnitudes for a type"
                            + " from colours. Add it, relative to the folder of the list.");
        }
        for (int i = 0; i < Math.max(1, candidate.spectra().size()); i++) {
            Candidate stated = candidate.forSpectrum(i);
            Optional<String> medium = stated.text("medium");
            if (medium.isPresent() && Medium.named(medium.get()).isEmpty()) {
                return Optional.of(
                        at("medium", row)
                                + "'"
                                + medium.get()
                                + "'; expected air or vacuum"
                                + forEach(candidate)
                                + ". Correct the word or leave it empty.");
            }
            Optional<String> number = badNumber(stated);
            if (number.isPresent()) {
                return number;
            }
        }
        return Optional.empty();
    }

    private static long magnitudes(Candidate candidate) {
        return MAGNITUDES.stream().filter(column -> candidate.number(column).isPresent()).count();
    }

    private static String forEach(Candidate candidate) {
        int spectra = candidate.spectra().size();
        return spectra > 1 ? ", or as many of them joined by ; as there are spectra" : "";
    }

    private static Optional<String> badNumber(Candidate candidate) {
        for (String column : candidate.cells().keySet()) {
            Optional<String> text = candidate.text(column);
            if (!NUMBER_COLUMNS.contains(column)
                    || text.isEmpty()
                    || NO_VALUE.contains(text.get().toLowerCase(Locale.ROOT))) {
                continue;
            }
            boolean positive = POSITIVE_COLUMNS.contains(column);
            boolean known = candidate.number(column).isPresent();
            if (!known || (positive && !(candidate.number(column).getAsDouble() > 0))) {
                return Optional.of(
                        at(column, candidate.row())
                                + "'"
                                + text.get()
                                + "'; expected a "
                                + (positive ? "positive " : "")
                                + "number. Correct it or leave it empty.");
            }
            if (column.equals("rv_kms")
                    && !(Math.abs(candidate.number(column).getAsDouble()) < VELOCITY_LIMIT_KMS)) {
                return Optional.of(
                        at(column, candidate.row())
                                + "'"
                                + text.get()
                                + "'; expected a velocity between -30000 and 30000 km/s. Give it in"
                                + " km/s, not in m/s, or leave it empty.");
            }
        }
        return Optional.empty();
    }

    private static String at(String column, int row) {
        return "row " + row + ", column " + column + ": ";
    }
}
