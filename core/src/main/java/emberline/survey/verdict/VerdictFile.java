package emberline.survey.verdict;

import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import emberline.place.GravityClass;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * Reads a file of verdicts: CSV in UTF-8, separated by commas, semicolons or tabs, with a line of
 * names. The column {@code name} must be there and at least one of {@code verdict, verdict_type,
 * verdict_gravity, verdict_note}; other columns are passed over, so that a results table may be
 * given too. A row with nothing but a name takes an earlier verdict back. An apostrophe that keeps
 * a spreadsheet from taking a cell for a formula is removed.
 */
public final class VerdictFile {

    /** The columns in their order. */
    public static final List<String> COLUMNS =
            List.of("name", "verdict", "verdict_type", "verdict_gravity", "verdict_note");

    private static final int MOST_FAULTS = 20;
    private static final int MOST_BYTES = 200 << 20;
    private static final String GUARDED = "'[=+\\-@\\t\\r\\n\uff1d\uff0b\uff0d\uff20][\\s\\S]*";

    private final String file;
    private final List<String> faults = new ArrayList<>();
    private final Map<String, Integer> columns = new LinkedHashMap<>();
    private final Map<String, Verdicts.Entry> entries = new LinkedHashMap<>();

    private int width;

    private VerdictFile(String file) {
        this.file = file;
    }

    /**
     * Reads a file.
     *
     * @param path where it is
     * @return its verdicts
     * @throws UnreadableVerdictsException if it is missing, no CSV in UTF-8, or a cell is none of
     *     what its column allows; the message holds one line a fault with file, line and column
     */
    public static Verdicts read(Path path) throws UnreadableVerdictsException {
        String file = String.valueOf(path.getFileName());
        return new VerdictFile(file).parse(text(path, file));
    }

    private static String text(Path path, String file) throws UnreadableVerdictsException {
        try {
            if (Files.size(path) > MOST_BYTES) {
                throw fault(file + ": over 200 MB; expected a file of verdicts. Check the path.");
            }
            String text =
                    StandardCharsets.UTF_8
                            .newDecoder()
                            .decode(ByteBuffer.wrap(Files.readAllBytes(path)))
                            .toString();
            return text.startsWith("\ufeff") ? text.substring(1) : text;
        } catch (CharacterCodingException e) {
            throw fault(file + ": not UTF-8; expected CSV in UTF-8. Save the file as such.");
        } catch (NoSuchFileException e) {
            throw fault(path + ": no such file; expected a file of verdicts. Check the path.");
        } catch (UnreadableVerdictsException e) {
            throw e;
        } catch (IOException e) {
            throw fault(path + ": cannot be read (" + e + "); expected a file. Check the path.");
        }
    }

    private static UnreadableVerdictsException fault(String sentence) {
        return new UnreadableVerdictsException(List.of(sentence));
    }

    private Verdicts parse(String text) throws UnreadableVerdictsException {
        try (CsvReader<CsvRecord> reader =
                CsvReader.builder()
                        .fieldSeparator(separator(text))
                        .allowExtraFields(true)
                        .allowMissingFields(true)
                        .ofCsvRecord(text)) {
            for (CsvRecord row : reader) {
                if (row.getFields().stream().allMatch(String::isBlank)) {
                    continue;
                }
                if (columns.isEmpty()) {
                    names(row);
                } else {
                    row(row);
                }
            }
        } catch (IOException | CsvParseException e) {
            throw fault(
                    file
                            + ": no proper CSV ("
                            + e.getMessage()
                            + "); expected rows of cells with each quote closed. Export it again.");
        }
        if (columns.isEmpty()) {
            throw fault(
                    file
                            + ": empty; expected a line of names ("
                            + String.join(", ", COLUMNS)
                            + ")."
                            + " Export it again.");
        }
        if (!faults.isEmpty()) {
            throw new UnreadableVerdictsException(
                    faults.size() <= MOST_FAULTS
                            ? faults
                            : withRest(faults.subList(0, MOST_FAULTS), faults.size()));
        }
        return new Verdicts(entries);
    }

    private List<String> withRest(List<String> first, int all) {
        List<String> told = new ArrayList<>(first);
        told.add(file + ": and " + (all - first.size()) + " faults more");
        return told;
    }

    /** The separator that stands most often in the line of names. */
    private static char separator(String text) {
        String names = text.lines().filter(line -> !line.isBlank()).findFirst().orElse("");
        char best = ',';
        for (char candidate : new char[] {';', '\t'}) {
            if (count(names, candidate) > count(names, best)) {
                best = candidate;
            }
        }
        return best;
    }

    private static long count(String text, char sign) {
        return text.chars().filter(c -> c == sign).count();
    }

    private void names(CsvRecord row) throws UnreadableVerdictsException {
        List<String> cells = row.getFields();
        width = cells.size();
        for (int i = 0; i < cells.size(); i++) {
            columns.putIfAbsent(cells.get(i).strip().toLowerCase(Locale.ROOT), i);
        }
        boolean some = COLUMNS.stream().skip(1).anyMatch(columns::containsKey);
        if (!columns.containsKey("name") || !some) {
            throw fault(
                    file
                            + ", line "
                            + row.getStartingLineNumber()
                            + ": the columns "
                            + String.join(", ", columns.keySet())
                            + "; expected name and at least one of "
                            + String.join(", ", COLUMNS.subList(1, COLUMNS.size()))
                            + ". Correct the line of names.");
        }
    }

    private void row(CsvRecord row) {
        int before = faults.size();
        if (row.getFieldCount() > width) {
            fault(
                    row,
                    "row",
                    row.getFieldCount() + " cells",
                    width + " as in the line of names",
                    "Put a cell that holds a separator in quotes.");
        }
        String name = cell(row, "name");
        if (name.isEmpty()) {
            fault(row, "name", "nothing", "the name of an object as listed", "Name the object.");
        }
        Optional<VerdictCall> call = call(row);
        Optional<GravityClass> gravity = gravity(row);
        String type = cell(row, "verdict_type");
        if (type.length() > Verdict.LONGEST_TYPE || type.lines().count() > 1) {
            fault(
                    row,
                    "verdict_type",
                    "'" + shortened(type) + "'",
                    "a type on one line of at most " + Verdict.LONGEST_TYPE + " characters",
                    "Put the rest into verdict_note.");
        }
        String note = cell(row, "verdict_note");
        if (note.length() > Verdict.LONGEST_NOTE) {
            fault(
                    row,
                    "verdict_note",
                    note.length() + " characters",
                    "at most " + Verdict.LONGEST_NOTE,
                    "Shorten the note.");
        }
        if (faults.size() == before) {
            add(row, name, new Verdict(call, type, gravity, note));
        }
    }

    private void add(CsvRecord row, String name, Verdict verdict) {
        Verdicts.Entry former = entries.get(name);
        if (former != null && !former.verdict().equals(verdict)) {
            fault(
                    row,
                    "name",
                    "another verdict on '" + shortened(name) + "' than in " + former.where(),
                    "one verdict an object",
                    "Remove one of the two rows.");
            return;
        }
        entries.putIfAbsent(
                name, new Verdicts.Entry(verdict, file + ", line " + row.getStartingLineNumber()));
    }

    private Optional<VerdictCall> call(CsvRecord row) {
        String word = cell(row, "verdict");
        Optional<VerdictCall> call = VerdictCall.of(word);
        if (!word.isEmpty() && call.isEmpty()) {
            fault(
                    row,
                    "verdict",
                    "'" + shortened(word) + "'",
                    "one of " + VerdictCall.words() + ", or nothing",
                    "Choose one; put other words into verdict_note.");
        }
        return call;
    }

    private Optional<GravityClass> gravity(CsvRecord row) {
        String word = cell(row, "verdict_gravity");
        Optional<GravityClass> gravity = GravityClass.ofLabel(word);
        if (!word.isEmpty() && gravity.isEmpty()) {
            fault(
                    row,
                    "verdict_gravity",
                    "'" + shortened(word) + "'",
                    GravityClass.labels() + ", or nothing",
                    "Choose one; put other words into verdict_note.");
        }
        return gravity;
    }

    private String cell(CsvRecord row, String column) {
        Integer place = columns.get(column);
        if (place == null || place >= row.getFieldCount()) {
            return "";
        }
        String cell = row.getField(place);
        return (cell.matches(GUARDED) ? cell.substring(1) : cell).strip();
    }

    private static String shortened(String text) {
        String line = text.replaceAll("\\s+", " ");
        return line.length() > 60 ? line.substring(0, 60) + "..." : line;
    }

    private void fault(CsvRecord row, String column, String found, String expected, String advice) {
        faults.add(
                file
                        + ", line "
                        + row.getStartingLineNumber()
                        + ", column "
                        + column
                        + ": "
                        + found
                        + "; expected "
                        + expected
                        + ". "
                        + advice);
    }
}
