package emberline.reports.ledger;

import com.fasterxml.jackson.jr.ob.JSON;
import emberline.reports.attach.ResultColumn;
import emberline.reports.ledger.RunProgress.Failure;
import java.io.Closeable;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The ledger of a run that is being written: which objects there are, and a record of each that is
 * done. What is recorded is kept when the process is killed, but for the last second; when the run
 * is started again it goes on from there, and does again only what changed. Not for use by several
 * threads at once, and by one process at a time; others may read (see {@link LedgerSchema}).
 */
public final class RunLedger implements Closeable {

    /** Name of the file in the folder of a run. */
    public static final String FILE = "ledger.sqlite";

    private static final long COMMIT_NANOS = 1_000_000_000L;
    private static final int FAILURES_SHOWN = 5;

    private final Database database;
    private final RunIdentity identity;
    private final List<ResultColumn> named = LedgerSchema.resultColumns();
    private final Map<String, Integer> placeOfColumn = new HashMap<>();
    private final PreparedStatement planned;
    private final PreparedStatement record;
    private final String whyAnew;
    private long doneThisTime;
    private long committed = System.nanoTime();

    private RunLedger(Database database, RunIdentity identity, String whyAnew)
            throws LedgerException {
        this.database = database;
        this.identity = identity;
        this.whyAnew = whyAnew;
        List<ResultColumn> columns = identity.columns();
        for (int i = 0; i < columns.size(); i++) {
            placeOfColumn.put(columns.get(i).name(), i);
        }
        this.planned =
                database.prepare(
                        "SELECT file_stem, input_sha256, json_bytes, pdf_bytes, status"
                                + " FROM object WHERE list_row = ?");
        this.record = database.prepare(LedgerSchema.recording());
    }

    /**
     * Opens the ledger of a folder; it is made where there is none. Records of a run of other
     * settings (version, options, seed, columns) are removed, for they no longer hold.
     *
     * @param folder the folder of the run, which exists
     * @param identity what the run is
     * @return the ledger
     * @throws LedgerException if it cannot be opened, or holds another part of a list
     */
    public static RunLedger open(Path folder, RunIdentity identity) throws LedgerException {
        Database database = Database.toWrite(folder.resolve(FILE));
        try {
            String whyAnew = prepared(database, identity);
            RunLedger ledger = new RunLedger(database, identity, whyAnew);
            ledger.begin();
            return ledger;
        } catch (LedgerException e) {
            database.close();
            throw e;
        }
    }

    /** Makes the tables where they must be made; says why what was there does not hold. */
    private static String prepared(Database database, RunIdentity identity) throws LedgerException {
        String why = "";
        if (database.hasTable("run") && database.hasTable("object")) {
            String part = database.fact("part").orElse("");
            if (!part.equals(identity.part())) {
                throw new LedgerException(
                        database.file(),
                        part.isEmpty() ? "a run of the whole list" : "part " + part + " of a list",
                        identity.part().isEmpty()
                                ? "a run of the whole list"
                                : "part " + identity.part(),
                        "Give each part a folder of its own with --out.");
            }
            Map<String, String> former = LedgerFacts.settings(database);
            Map<String, String> settings = new HashMap<>(identity.settings());
            settings.put("format of the ledger", LedgerSchema.VERSION);
            if (former.equals(settings)) {
                return "";
            }
            why = LedgerFacts.difference(former, settings);
        }
        database.run(LedgerSchema.removal());
        database.run(LedgerSchema.tables());
        LedgerFacts.put(database, identity);
        return why;
    }

    private void begin() throws LedgerException {
        database.setFact("list", identity.listName());
        database.setFact("list_sha256", identity.listSha256());
        database.setFact("recorded", LedgerFacts.json(identity.recorded()));
        database.setFact("host", LedgerFacts.host());
        database.setFact("pid", Long.toString(ProcessHandle.current().pid()));
        database.setFact("started_ms", Long.toString(System.currentTimeMillis()));
        state("running");
    }

    private void state(String word) throws LedgerException {
        database.setFact("state", word);
        database.setFact("updated_ms", Long.toString(System.currentTimeMillis()));
        database.setFact("done_this_time", Long.toString(doneThisTime));
        database.commit();
        committed = System.nanoTime();
    }

    /**
     * Why records of an earlier run were removed.
     *
     * @return what differs, in words; empty where nothing was removed
     */
    public String whyAnew() {
        return whyAnew;
    }

    /** Gives the rows of a list, from the first to the last. */
    @FunctionalInterface
    public interface Rows {

        /**
         * Gives the rows.
         *
         * @param taker takes them
         * @throws IOException if the list cannot be read
         */
        void giveTo(RowTaker taker) throws IOException;
    }

    /** Takes the rows of a list. */
    @FunctionalInterface
    public interface RowTaker {

        /**
         * Takes a row.
         *
         * @param row its number, from 1
         * @param name name of its object
         * @param mine whether it is in the part that is run
         * @throws IOException if it cannot be written down
         */
        void take(int row, String name, boolean mine) throws IOException;
    }

    /**
     * Takes the rows of the list. Objects that the ledger knows keep their records, others come in
     * as not done, and those that are no longer listed go.
     *
     * @param rows the rows
     * @throws IOException if the list cannot be read or the ledger not be written
     */
    public void takeList(Rows rows) throws IOException {
        try (ListedObjects listed = new ListedObjects(database)) {
            rows.giveTo(listed::add);
            listed.complete();
        }
        database.commit();
    }

    /**
     * What is known of the object of a row.
     *
     * @param row its number in the list, from 1
     * @return what is known; empty where the row is not in this part
     * @throws LedgerException if the ledger cannot be read
     */
    public Optional<PlannedEntry> planned(int row) throws LedgerException {
        try {
            planned.setInt(1, row);
            try (ResultSet found = planned.executeQuery()) {
                if (!found.next()) {
                    return Optional.empty();
                }
                String input = found.getString(2);
                return Optional.of(
                        new PlannedEntry(
                                found.getString(1),
                                input == null
                                        ? Optional.empty()
                                        : Optional.of(
                                                new PlannedEntry.Done(
                                                        input,
                                                        found.getLong(3),
                                                        found.getLong(4),
                                                        found.getString(5)))));
            }
        } catch (SQLException e) {
            throw database.trouble(e);
        }
    }

    /**
     * Records that an object is done.
     *
     * @param entry what is kept of it
     * @throws LedgerException if it cannot be written
     */
    public void record(ObjectEntry entry) throws LedgerException {
        try {
            record.setString(1, entry.inputSha256());
            record.setLong(2, System.currentTimeMillis());
            record.setDouble(3, entry.seconds());
            record.setString(4, LedgerFacts.json(entry.cells()));
            record.setString(5, entry.pageLine());
            record.setString(6, entry.methods());
            record.setString(7, String.join("\n", entry.inputs()));
            record.setLong(8, entry.jsonBytes());
            record.setLong(9, entry.pdfBytes());
            int parameter = 10;
            for (ResultColumn column : named) {
                String text = entry.cells().get(placeOfColumn.get(column.name()));
                record.setObject(parameter++, value(column, text));
            }
            record.setString(parameter, entry.stem());
            record.executeUpdate();
        } catch (SQLException e) {
            throw database.trouble(e);
        }
        doneThisTime++;
        if (System.nanoTime() - committed > COMMIT_NANOS) {
            state("running");
        }
    }

    private static Object value(ResultColumn column, String text) {
        if (text.isEmpty()) {
            return null;
        }
        return column.content() == ResultColumn.Content.NUMBER ? Double.valueOf(text) : text;
    }

    /**
     * Keeps everything that was recorded.
     *
     * @throws LedgerException if it cannot be written
     */
    public void commit() throws LedgerException {
        state("running");
    }

    /**
     * Ends the run.
     *
     * @param complete whether every object is done
     * @throws LedgerException if it cannot be written
     */
    public void end(boolean complete) throws LedgerException {
        state(complete ? "complete" : "stopped");
    }

    /**
     * Whether a stem belongs to an object of this run.
     *
     * @param stem file name without folder and ending
     * @return whether it does
     * @throws LedgerException if the ledger cannot be read
     */
    public boolean knowsStem(String stem) throws LedgerException {
        try (PreparedStatement one = database.prepare("SELECT 1 FROM object WHERE file_stem = ?")) {
            one.setString(1, stem);
            try (ResultSet found = one.executeQuery()) {
                return found.next();
            }
        } catch (SQLException e) {
            throw database.trouble(e);
        }
    }

    /**
     * How far the run is.
     *
     * @return numbers of this moment
     * @throws LedgerException if the ledger cannot be read
     */
    public RunProgress progress() throws LedgerException {
        return progress(database);
    }

    /**
     * How far the run in a folder is, whether it goes on or not.
     *
     * @param folder the folder of the run
     * @return numbers of this moment
     * @throws LedgerException if there is no ledger or it cannot be read
     */
    public static RunProgress progress(Path folder) throws LedgerException {
        Path file = folder.resolve(FILE);
        if (!Files.exists(file)) {
            throw new LedgerException(
                    file,
                    "no such file",
                    "the ledger of a run",
                    "Name the folder that was given to sort with --out.");
        }
        try (Database database = Database.toRead(file)) {
            if (!database.hasTable("run") || !database.hasTable("object")) {
                throw new LedgerException(
                        file,
                        "a database without the tables run and object",
                        "the ledger of a run",
                        "Wait until the run has begun, or name another folder.");
            }
            return progress(database);
        }
    }

    private static RunProgress progress(Database database) throws LedgerException {
        long started = Long.parseLong(database.fact("started_ms").orElse("0"));
        long updated = Long.parseLong(database.fact("updated_ms").orElse("0"));
        return new RunProgress(
                database.fact("version").orElse(""),
                database.fact("list").orElse(""),
                database.fact("part").orElse(""),
                LedgerFacts.state(database),
                database.number("SELECT COUNT(*) FROM object"),
                database.counts(
                        "SELECT status, COUNT(*) FROM object WHERE input_sha256 IS NOT NULL"
                                + " GROUP BY status"),
                Long.parseLong(database.fact("done_this_time").orElse("0")),
                Math.max(0, updated - started) / 1000.0,
                failures(database));
    }

    private static List<Failure> failures(Database database) throws LedgerException {
        List<Failure> failures = new ArrayList<>();
        try (PreparedStatement statement =
                        database.prepare(
                                "SELECT name, reason FROM object WHERE status = 'failed'"
                                        + " ORDER BY done_ms DESC, list_row LIMIT "
                                        + FAILURES_SHOWN);
                ResultSet rows = statement.executeQuery()) {
            while (rows.next()) {
                failures.add(new Failure(rows.getString(1), rows.getString(2)));
            }
        } catch (SQLException e) {
            throw database.trouble(e);
        }
        return failures;
    }

    /**
     * What was recorded of an object, to write the files of the run from.
     *
     * @param status the word of its status
     * @param cells the texts of all columns of the results table
     * @param pageLine its line of the survey page
     * @param methods the methods its results rest on
     * @param inputs one JSON object a spectrum that was read
     */
    public record Recorded(
            String status,
            List<String> cells,
            String pageLine,
            String methods,
            List<String> inputs) {

        /** Copies the lists. */
        public Recorded {
            cells = List.copyOf(cells);
            inputs = List.copyOf(inputs);
        }
    }

    /** Takes what was recorded of objects. */
    @FunctionalInterface
    public interface Taker {

        /**
         * Takes the record of an object.
         *
         * @param recorded the record
         * @throws IOException if it cannot be written on
         */
        void take(Recorded recorded) throws IOException;
    }

    /**
     * Hands on the records of all objects that are done, one by one, in the order of the list.
     *
     * @param taker what takes them
     * @throws IOException if the ledger cannot be read or the taker fails
     */
    public void forEachDone(Taker taker) throws IOException {
        try (PreparedStatement statement =
                        database.prepare(
                                "SELECT status, result_cells, page_line, methods, inputs"
                                        + " FROM object WHERE input_sha256 IS NOT NULL"
                                        + " ORDER BY list_row");
                ResultSet rows = statement.executeQuery()) {
            while (rows.next()) {
                String inputs = rows.getString(5);
                taker.take(
                        new Recorded(
                                rows.getString(1),
                                JSON.std.listOfFrom(String.class, rows.getString(2)),
                                rows.getString(3),
                                rows.getString(4),
                                inputs.isEmpty() ? List.of() : List.of(inputs.split("\n", -1))));
            }
        } catch (SQLException e) {
            throw database.trouble(e);
        }
    }

    /**
     * The scores of all objects that are done, by which the survey is ordered.
     *
     * @return one an object in the order of the list; empty where it could not be judged
     * @throws LedgerException if the ledger cannot be read
     */
    public List<OptionalDouble> scores() throws LedgerException {
        List<OptionalDouble> scores = new ArrayList<>();
        try (PreparedStatement statement =
                        database.prepare(
                                "SELECT score FROM object WHERE input_sha256 IS NOT NULL"
                                        + " ORDER BY list_row");
                ResultSet rows = statement.executeQuery()) {
            while (rows.next()) {
                double score = rows.getDouble(1);
                scores.add(rows.wasNull() ? OptionalDouble.empty() : OptionalDouble.of(score));
            }
            return scores;
        } catch (SQLException e) {
            throw database.trouble(e);
        }
    }

    /** The database, for merging. */
    Database database() {
        return database;
    }

    /** Closes the ledger; what was recorded since the last commit is given up. */
    @Override
    public void close() throws LedgerException {
        try (database) {
            planned.close();
            record.close();
        } catch (SQLException e) {
            throw database.trouble(e);
        }
    }
}
