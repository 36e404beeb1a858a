package emberline.read;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import java.io.IOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import uk.ac.starlink.fits.FitsTableBuilder;
import uk.ac.starlink.table.RowSequence;
import uk.ac.starlink.table.StarTable;
import uk.ac.starlink.table.StoragePolicy;
import uk.ac.starlink.util.ByteArrayDataSource;

/** Reads a table of text from CSV (by commas, semicolons or tabs), ECSV, VOTable or FITS. */
final class ListTableReader {

    private static final int MOST_CELL_CHARS = 1 << 20;

    private ListTableReader() {}

    static ListTable read(FileContent content)
            throws UnreadableSpectrumException, UnreadableListException {
        ContentKind kind = ContentKind.of(content.bytes());
        return switch (kind) {
            case TEXT -> csv(content);
            case FITS -> star(content.name(), fits(content));
            case VOTABLE, ECSV -> {
                List<StarTable> tables = StarTables.open(content, kind);
                if (tables.isEmpty()) {
                    throw noTable(content.name(), kind.words() + " without a table");
                }
                yield star(content.name(), tables.get(0));
            }
            default -> throw noTable(content.name(), kind.words());
        };
    }

    private static UnreadableListException noTable(String name, String found) {
        return new UnreadableListException(
                name,
                found,
                "a candidate list as CSV, ECSV, VOTable or FITS table",
                "Save the list in one of these formats.");
    }

    private static ListTable csv(FileContent content) throws UnreadableListException {
        String text = TextCells.decode(content.bytes(), 0, content.bytes().length);
        String body = text.startsWith("\ufeff") ? text.substring(1) : text;
        List<String> columns = List.of();
        List<List<String>> rows = new ArrayList<>();
        try (CsvReader<CsvRecord> reader =
                CsvReader.builder()
                        .fieldSeparator(separator(body))
                        .commentStrategy(CommentStrategy.SKIP)
                        .allowExtraFields(true)
                        .allowMissingFields(true)
                        .trimWhitespacesAroundQuotes(true)
                        .maxBufferSize(MOST_CELL_CHARS * 16)
                        .ofCsvRecord(body)) {
            for (CsvRecord row : reader) {
                List<String> cells = row.getFields().stream().map(String::trim).toList();
                if (cells.stream().allMatch(String::isEmpty) && columns.isEmpty()) {
                    continue;
                }
                if (columns.isEmpty()) {
                    columns = cells;
                } else {
                    rows.add(cells);
                }
            }
        } catch (IOException | CsvParseException e) {
            throw new UnreadableListException(
                    content.name(),
                    "no proper CSV (" + FitsReader.reason(e) + ")",
                    "rows of cells, with each quote closed",
                    "Write the list again with a spreadsheet or a table library.");
        }
        boolean swallowed =
                rows.stream().flatMap(List::stream).anyMatch(cell -> cell.contains("\n"));
        if (swallowed && body.chars().filter(c -> c == '"').count() % 2 == 1) {
            throw new UnreadableListException(
                    content.name(),
                    "a quote that is never closed",
                    "rows of cells, with each quote closed",
                    "Close the quote; the rows after it would be lost.");
        }
        return new ListTable(columns, rows);
    }

    /** The separator that stands most often in the line of names. */
    private static char separator(String body) {
        String names =
                body.lines()
                        .filter(line -> !line.isBlank() && !line.startsWith("#"))
                        .findFirst()
                        .orElse("");
        char best = ',';
        long most = 0;
        for (char candidate : new char[] {',', ';', '\t'}) {
            long count = names.chars().filter(c -> c == candidate).count();
            if (count > most) {
                most = count;
                best = candidate;
            }
        }
        return best;
    }

    private static StarTable fits(FileContent content)
            throws UnreadableSpectrumException, UnreadableListException {
        List<FitsUnit> tables = FitsUnit.all(content).stream().filter(FitsUnit::isTable).toList();
        if (tables.isEmpty()) {
            throw noTable(content.name(), "a FITS file without a table");
        }
        for (FitsUnit table : tables) {
            FitsTableGuard.check(table);
            if (FitsTableGuard.hasVariableArrays(table)) {
                throw noTable(table.where(), "a FITS table with arrays of variable length");
            }
        }
        try {
            return new FitsTableBuilder()
                    .makeStarTable(
                            new ByteArrayDataSource("content", content.bytes()),
                            false,
                            StoragePolicy.PREFER_MEMORY);
        } catch (IOException | RuntimeException e) {
            throw unreadable(content.name(), e);
        }
    }

    private static UnreadableListException unreadable(String name, Exception e) {
        return new UnreadableListException(
                name,
                "a table that cannot be read (" + FitsReader.reason(e) + ")",
                "a table after the standard",
                "Write the list again with a table library.");
    }

    private static ListTable star(String name, StarTable table) throws UnreadableListException {
        List<String> columns = new ArrayList<>();
        for (int i = 0; i < table.getColumnCount(); i++) {
            String column = table.getColumnInfo(i).getName();
            columns.add(column == null ? "" : wellFormed(column.trim()));
        }
        List<List<String>> rows = new ArrayList<>();
        try (RowSequence sequence = table.getRowSequence()) {
            while (sequence.next()) {
                List<String> cells = new ArrayList<>();
                for (int i = 0; i < columns.size(); i++) {
                    cells.add(text(sequence.getCell(i)));
                }
                rows.add(cells);
            }
        } catch (IOException | RuntimeException e) {
            throw unreadable(name, e);
        }
        return new ListTable(columns, rows);
    }

    /** A cell as text; a number as its shortest decimal without exponent. */
    private static String text(Object cell) {
        if (cell == null) {
            return "";
        }
        if (cell instanceof Float || cell instanceof Double) {
            double value = ((Number) cell).doubleValue();
            return Double.isFinite(value)
                    ? new BigDecimal(cell.toString()).stripTrailingZeros().toPlainString()
                    : "";
        }
        return wellFormed(cell.toString().trim());
    }

    /** The text with a question mark for each half of a pair, which no output could hold. */
    private static String wellFormed(String text) {
        return new String(text.getBytes(StandardCharsets.UTF_8), StandardCharsets.UTF_8);
    }
}
