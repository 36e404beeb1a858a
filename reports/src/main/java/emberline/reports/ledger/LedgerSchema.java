package emberline.reports.ledger;

import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumns;
import java.util.List;
import java.util.stream.Collectors;

/**
 * The tables of a ledger. Other tools may read them while a run goes on; only the program writes.
 *
 * <p>Table {@code run}, one row a fact: {@code key}, {@code value} (texts). Keys: {@code schema}
 * (of this format, {@value #VERSION}), {@code version}, {@code options} (JSON), {@code recorded}
 * (JSON), {@code seed}, {@code list}, {@code list_sha256}, {@code list_columns} (JSON), {@code
 * part}, {@code settings} (JSON), {@code state} ({@code running}, {@code complete}, {@code
 * stopped}), {@code host}, {@code pid}, {@code started_ms}, {@code updated_ms} (milliseconds since
 * 1970, UTC) and {@code done_this_time}.
 *
 * <p>Table {@code object}, one row an object of the run, done or not:
 *
 * <ul>
 *   <li>{@code file_stem}: name of its files without folder and ending (primary key)
 *   <li>{@code list_row}: its row in the list, from 1 without the header
 *   <li>{@code name}: as listed
 *   <li>{@code input_sha256}: checksum of its row and its spectra; NULL until it is done
 *   <li>{@code done_ms}, {@code seconds}: when it was done, and how long it took on its thread
 *   <li>every standard column of the results table under its own name: numbers as REAL, texts as
 *       TEXT, NULL where there is none; {@code rank} is NULL too, since it follows from the scores
 *       of all objects once they are done
 *   <li>{@code result_cells}: the row of the results table, a JSON array of texts with the digits
 *       as printed and the columns of the list at the end
 *   <li>{@code page_line}, {@code methods}, {@code inputs}, {@code json_bytes}, {@code pdf_bytes}:
 *       what the other files of the run are made of, and the sizes of the object's own
 * </ul>
 *
 * <p>Example: {@code SELECT name, type, p_substellar FROM object WHERE status = 'measured' ORDER BY
 * type_number}.
 */
final class LedgerSchema {

    /** Number of this format; a ledger of another is made anew. */
    static final String VERSION = "1";

    private LedgerSchema() {}

    /** The columns of the results table that stand in the ledger under their own names. */
    static List<ResultColumn> resultColumns() {
        return ResultColumns.standard().stream().filter(c -> !c.name().equals("name")).toList();
    }

    /** A name within a statement. */
    static String quoted(String name) {
        return '"' + name.replace("\"", "\"\"") + '"';
    }

    /** The statements that make the tables. */
    static List<String> tables() {
        String results =
                resultColumns().stream()
                        .map(
                                column ->
                                        quoted(column.name())
                                                + (column.content() == ResultColumn.Content.NUMBER
                                                        ? " REAL"
                                                        : " TEXT"))
                        .collect(Collectors.joining(", "));
        return List.of(
                "CREATE TABLE run (key TEXT PRIMARY KEY, value TEXT NOT NULL) WITHOUT ROWID",
                "CREATE TABLE object (file_stem TEXT PRIMARY KEY, list_row INTEGER NOT NULL,"
                        + " name TEXT NOT NULL, input_sha256 TEXT, done_ms INTEGER, seconds REAL, "
                        + results
                        + ", result_cells TEXT, page_line TEXT, methods TEXT, inputs TEXT,"
                        + " json_bytes INTEGER, pdf_bytes INTEGER)",
                "CREATE INDEX object_list_row ON object (list_row)",
                "CREATE INDEX object_status ON object (status)");
    }

    /** The statement that removes the tables. */
    static List<String> removal() {
        return List.of("DROP TABLE IF EXISTS object", "DROP TABLE IF EXISTS run");
    }

    /** The statement that records an object: its parameters are as {@link RunLedger} sets them. */
    static String recording() {
        String results =
                resultColumns().stream()
                        .map(column -> quoted(column.name()) + " = ?")
                        .collect(Collectors.joining(", "));
        return "UPDATE object SET input_sha256 = ?, done_ms = ?, seconds = ?, result_cells = ?,"
                + " page_line = ?, methods = ?, inputs = ?, json_bytes = ?, pdf_bytes = ?, "
                + results
                + " WHERE file_stem = ?";
    }
}
