package emberline.reports.ledger;

import emberline.reports.attach.SafeFileNames;
import java.io.Closeable;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.List;

/**
 * Takes the names of a list into a ledger, row by row, and gives each object the stem of its files,
 * as {@link SafeFileNames} would give it for all names at once. Stems are made for the whole list,
 * so that they are the same in every part of it.
 */
final class ListedObjects implements Closeable {

    private static final int BATCH = 1000;

    private final Database database;
    private final PreparedStatement insert;
    private long rows;

    ListedObjects(Database database) throws LedgerException {
        this.database = database;
        database.run(
                List.of(
                        "DROP TABLE IF EXISTS temp.listed",
                        "CREATE TEMP TABLE listed (row INTEGER PRIMARY KEY, name TEXT NOT NULL,"
                                + " mine INTEGER NOT NULL, before INTEGER NOT NULL DEFAULT 0,"
                                + " stem TEXT NOT NULL, folded TEXT NOT NULL)"));
        this.insert =
                database.prepare(
                        "INSERT INTO listed (row, name, mine, stem, folded) VALUES (?, ?, ?, ?,"
                                + " lower(?))");
    }

    /** Takes the next row. */
    void add(int row, String name, boolean mine) throws LedgerException {
        String stem = SafeFileNames.stemInRound(name, 0, 0);
        try {
            insert.setInt(1, row);
            insert.setString(2, name);
            insert.setInt(3, mine ? 1 : 0);
            insert.setString(4, stem);
            insert.setString(5, stem);
            insert.addBatch();
            if (++rows % BATCH == 0) {
                insert.executeBatch();
            }
        } catch (SQLException e) {
            throw database.trouble(e);
        }
    }

    /** Puts the list in place of the one that the ledger held; objects of both are kept. */
    void complete() throws LedgerException {
        try {
            insert.executeBatch();
        } catch (SQLException e) {
            throw database.trouble(e);
        }
        database.run(
                List.of(
                        "CREATE INDEX temp.listed_name ON listed (name)",
                        "CREATE INDEX temp.listed_folded ON listed (folded)"));
        repeatedNames();
        for (int round = 1; round < SafeFileNames.ROUNDS; round++) {
            if (!separate(round)) {
                break;
            }
        }
        database.run(
                List.of(
                        "CREATE UNIQUE INDEX temp.listed_stem ON listed (stem)",
                        "DELETE FROM object WHERE NOT EXISTS (SELECT 1 FROM listed"
                                + " WHERE stem = file_stem AND mine = 1"
                                + " AND listed.name = object.name)",
                        "UPDATE object SET list_row ="
                                + " (SELECT row FROM listed WHERE stem = file_stem)"
                                + " WHERE list_row <>"
                                + " (SELECT row FROM listed WHERE stem = file_stem)",
                        "INSERT INTO object (file_stem, list_row, name)"
                                + " SELECT stem, row, name FROM listed WHERE mine = 1"
                                + " AND NOT EXISTS"
                                + " (SELECT 1 FROM object WHERE file_stem = stem)",
                        "DROP TABLE temp.listed"));
    }

    /** A row whose stem must change. */
    private record Row(int row, String name, int before) {}

    private void repeatedNames() throws LedgerException {
        List<Row> repeated =
                rows(
                        "SELECT row, name, ROW_NUMBER() OVER (PARTITION BY name ORDER BY row) - 1"
                                + " FROM listed WHERE name IN"
                                + " (SELECT name FROM listed GROUP BY name HAVING COUNT(*) > 1)");
        rename(repeated.stream().filter(row -> row.before() > 0).toList(), 0);
    }

    /** Makes shared stems longer; tells whether there were any. */
    private boolean separate(int round) throws LedgerException {
        List<Row> shared =
                rows(
                        "SELECT row, name, before FROM listed WHERE folded IN"
                                + " (SELECT folded FROM listed GROUP BY folded"
                                + " HAVING COUNT(*) > 1)");
        rename(shared, round);
        return !shared.isEmpty();
    }

    private List<Row> rows(String sql) throws LedgerException {
        List<Row> found = new ArrayList<>();
        try (PreparedStatement statement = database.prepare(sql);
                ResultSet rows = statement.executeQuery()) {
            while (rows.next()) {
                found.add(new Row(rows.getInt(1), rows.getString(2), rows.getInt(3)));
            }
        } catch (SQLException e) {
            throw database.trouble(e);
        }
        return found;
    }

    private void rename(List<Row> rows, int round) throws LedgerException {
        for (Row row : rows) {
            String stem = SafeFileNames.stemInRound(row.name(), row.before(), round);
            database.run(
                    "UPDATE listed SET stem = ?, folded = lower(?), before = ? WHERE row = ?",
                    stem,
                    stem,
                    row.before(),
                    row.row());
        }
    }

    @Override
    public void close() throws LedgerException {
        try {
            insert.close();
        } catch (SQLException e) {
            throw database.trouble(e);
        }
    }
}
