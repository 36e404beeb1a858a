package emberline.read;

import java.io.IOException;
import java.io.InputStream;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import uk.ac.starlink.fits.FitsTableBuilder;
import uk.ac.starlink.table.RowSequence;
import uk.ac.starlink.table.StarTable;
import uk.ac.starlink.table.StoragePolicy;
import uk.ac.starlink.util.ByteArrayDataSource;

/** Opens a table of text: CSV (by commas, semicolons or tabs), ECSV, VOTable or FITS. */
final class ListTableReader {

    private static final int HEAD_BYTES = 8192;

    private ListTableReader() {}

    /**
     * Opens a table: text is read row by row, whatever its length; every other kind is read at
     * once.
     */
    static TableRows open(Path file) throws UnreadableSpectrumException, UnreadableListException {
        ContentKind kind = kind(file);
        if (kind == ContentKind.TEXT) {
            return CsvRows.open(file);
        }
        return open(FileContent.load(file));
    }

    /** Opens a table that is held already. */
    static TableRows open(FileContent content)
            throws UnreadableSpectrumException, UnreadableListException {
        ContentKind kind = ContentKind.of(content.bytes());
        return switch (kind) {
            case TEXT -> CsvRows.open(content);
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

    private static ContentKind kind(Path file) throws UnreadableSpectrumException {
        return FileContent.reading(
                file,
                () -> {
                    try (InputStream in = CsvRows.unpacked(file)) {
                        byte[] head = in.readNBytes(HEAD_BYTES);
                        if (head.length == 0) {
                            FileContent.of(Files.readAllBytes(file), FileContent.name(file));
                        }
                        return ContentKind.of(head);
                    }
                });
    }

    private static UnreadableListException noTable(String name, String found) {
        return new UnreadableListException(
                name,
                found,
                "a candidate list as CSV, ECSV, VOTable or FITS table",
                "Save the list in one of these formats.");
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

    private static TableRows star(String name, StarTable table) throws UnreadableListException {
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
        return TableRows.of(columns, rows);
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
