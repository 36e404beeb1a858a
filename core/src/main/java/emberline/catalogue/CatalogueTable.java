package emberline.catalogue;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvParseException;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/** Reads a table: comment lines that start with {@code #}, a header line, rows of as many cells. */
final class CatalogueTable {

    private CatalogueTable() {}

    /** All rows of all tables of a kind. */
    static List<CatalogueRow> read(CatalogueTables tables, TableKind kind)
            throws InvalidCatalogueException {
        List<CatalogueRow> rows = new ArrayList<>();
        for (String file : tables.files()) {
            if (kind.holds(file)) {
                rows.addAll(read(tables, file, kind.required(), kind.optional()));
            }
        }
        return rows;
    }

    /** All rows of one table. */
    static List<CatalogueRow> read(
            CatalogueTables tables, String file, List<String> required, List<String> optional)
            throws InvalidCatalogueException {
        String label = tables.label(file);
        List<CsvRecord> records = records(tables, file);
        if (records.isEmpty()) {
            throw new InvalidCatalogueException(
                    label,
                    "has no header line",
                    "the columns " + String.join(", ", required),
                    "Write the header, or take the file away.");
        }
        List<String> header = records.get(0).getFields().stream().map(String::trim).toList();
        checkHeader(label, records.get(0), header, required, optional);
        List<CatalogueRow> rows = new ArrayList<>();
        for (CsvRecord record : records.subList(1, records.size())) {
            rows.add(row(label, header, record));
        }
        return rows;
    }

    private static List<CsvRecord> records(CatalogueTables tables, String file)
            throws InvalidCatalogueException {
        List<CsvRecord> records = new ArrayList<>();
        try (CsvReader<CsvRecord> reader =
                CsvReader.builder()
                        .commentStrategy(CommentStrategy.SKIP)
                        .skipEmptyLines(true)
                        .detectBomHeader(false)
                        .allowExtraFields(true)
                        .allowMissingFields(true)
                        .ofCsvRecord(tables.text(file))) {
            reader.forEach(records::add);
        } catch (CsvParseException | UncheckedIOException | IOException e) {
            throw new InvalidCatalogueException(
                    tables.label(file),
                    "cannot be read: " + cause(e),
                    "comma-separated UTF-8 text",
                    "Check the quotes and the encoding.");
        }
        return records;
    }

    private static String cause(Exception e) {
        return e.getCause() == null ? e.getMessage() : e.getCause().toString();
    }

    private static void checkHeader(
            String label,
            CsvRecord record,
            List<String> header,
            List<String> required,
            List<String> optional)
            throws InvalidCatalogueException {
        String where = label + ", line " + record.getStartingLineNumber();
        Set<String> seen = new HashSet<>();
        for (String column : header) {
            if (!required.contains(column) && !optional.contains(column)) {
                throw new InvalidCatalogueException(
                        where,
                        "unknown column '" + column + "'",
                        "only " + String.join(", ", required) + ", " + String.join(", ", optional),
                        "Correct the name, or move remarks to the column note.");
            }
            if (!seen.add(column)) {
                throw new InvalidCatalogueException(
                        where,
                        "column '" + column + "' twice",
                        "each column once",
                        "Take one of them away.");
            }
        }
        for (String column : required) {
            if (!seen.contains(column)) {
                throw new InvalidCatalogueException(
                        where,
                        "no column '" + column + "'",
                        "at least " + String.join(", ", required),
                        "Add the column.");
            }
        }
    }

    private static CatalogueRow row(String label, List<String> header, CsvRecord record)
            throws InvalidCatalogueException {
        if (record.getFieldCount() != header.size()) {
            throw new InvalidCatalogueException(
                    label + ", line " + record.getStartingLineNumber(),
                    record.getFieldCount() + " cells",
                    header.size() + " cells as in the header line",
                    "Add or remove commas; put a text that holds a comma in quotes.");
        }
        Map<String, String> cells = new HashMap<>();
        for (int i = 0; i < header.size(); i++) {
            cells.put(header.get(i), record.getField(i).trim());
        }
        return new CatalogueRow(label, record.getStartingLineNumber(), cells);
    }
}
