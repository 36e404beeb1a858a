package emberline.reports.ledger;

import java.io.Closeable;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import org.sqlite.SQLiteConfig;

/** The database file of a ledger. Not for use by several threads at once. */
final class Database implements Closeable {

    private static final int BUSY_MILLIS = 20_000;

    private final Path file;
    private final Connection connection;

    private Database(Path file, Connection connection) {
        this.file = file;
        this.connection = connection;
    }

    /**
     * Opens a database to write; it is made if it is not there. Readers see what was committed,
     * while this one writes (write-ahead log); a process that is killed loses nothing committed.
     */
    static Database toWrite(Path file) throws LedgerException {
        SQLiteConfig config = new SQLiteConfig();
        config.setJournalMode(SQLiteConfig.JournalMode.WAL);
        config.setSynchronous(SQLiteConfig.SynchronousMode.NORMAL);
        config.setTempStore(SQLiteConfig.TempStore.FILE);
        config.setBusyTimeout(BUSY_MILLIS);
        try {
            Connection connection = config.createConnection("jdbc:sqlite:" + file);
            connection.setAutoCommit(false);
            return new Database(file, connection);
        } catch (SQLException e) {
            throw LedgerException.of(file, e);
        }
    }

    /** Opens a database to read. */
    static Database toRead(Path file) throws LedgerException {
        SQLiteConfig config = new SQLiteConfig();
        config.setBusyTimeout(BUSY_MILLIS);
        Path folder = file.toAbsolutePath().getParent();
        boolean still = folder == null || !Files.isWritable(folder);
        config.setReadOnly(true);
        config.setOpenMode(org.sqlite.SQLiteOpenMode.OPEN_URI);
        try {
            String uri = file.toAbsolutePath().toUri() + "?mode=ro" + (still ? "&immutable=1" : "");
            return new Database(file, config.createConnection("jdbc:sqlite:" + uri));
        } catch (SQLException e) {
            throw LedgerException.of(file, e);
        }
    }

    Path file() {
        return file;
    }

    /** A failure of this database in words. */
    LedgerException trouble(SQLException cause) {
        return LedgerException.of(file, cause);
    }

    PreparedStatement prepare(String sql) throws LedgerException {
        try {
            return connection.prepareStatement(sql);
        } catch (SQLException e) {
            throw trouble(e);
        }
    }

    /** Runs statements one after the other. */
    void run(Iterable<String> statements) throws LedgerException {
        try (Statement statement = connection.createStatement()) {
            for (String sql : statements) {
                statement.executeUpdate(sql);
            }
        } catch (SQLException e) {
            throw trouble(e);
        }
    }

    /** Runs a statement with texts or numbers as parameters and tells how many rows it changed. */
    int run(String sql, Object... parameters) throws LedgerException {
        try (PreparedStatement statement = connection.prepareStatement(sql)) {
            for (int i = 0; i < parameters.length; i++) {
                statement.setObject(i + 1, parameters[i]);
            }
            return statement.executeUpdate();
        } catch (SQLException e) {
            throw trouble(e);
        }
    }

    /** A single number. */
    long number(String sql) throws LedgerException {
        try (Statement statement = connection.createStatement();
                ResultSet rows = statement.executeQuery(sql)) {
            return rows.next() ? rows.getLong(1) : 0;
        } catch (SQLException e) {
            throw trouble(e);
        }
    }

    /** Numbers by words. */
    Map<String, Long> counts(String sql) throws LedgerException {
        Map<String, Long> counts = new LinkedHashMap<>();
        try (Statement statement = connection.createStatement();
                ResultSet rows = statement.executeQuery(sql)) {
            while (rows.next()) {
                counts.put(rows.getString(1), rows.getLong(2));
            }
        } catch (SQLException e) {
            throw trouble(e);
        }
        return counts;
    }

    /** Whether there is a table of a name. */
    boolean hasTable(String name) throws LedgerException {
        return number(
                        "SELECT COUNT(*) FROM sqlite_master WHERE type = 'table' AND name = '"
                                + name
                                + "'")
                > 0;
    }

    /** A fact of the table {@code run}. */
    Optional<String> fact(String key) throws LedgerException {
        try (PreparedStatement statement =
                connection.prepareStatement("SELECT value FROM run WHERE key = ?")) {
            statement.setString(1, key);
            try (ResultSet rows = statement.executeQuery()) {
                return rows.next() ? Optional.of(rows.getString(1)) : Optional.empty();
            }
        } catch (SQLException e) {
            throw trouble(e);
        }
    }

    /** Sets a fact of the table {@code run}. */
    void setFact(String key, String value) throws LedgerException {
        run("INSERT OR REPLACE INTO run (key, value) VALUES (?, ?)", key, value);
    }

    void commit() throws LedgerException {
        try {
            connection.commit();
        } catch (SQLException e) {
            throw trouble(e);
        }
    }

    /** Attaches another database under a name; between transactions only. */
    void attach(Path other, String name) throws LedgerException {
        try (Statement statement = connection.createStatement()) {
            connection.setAutoCommit(true);
            statement.executeUpdate(
                    "ATTACH DATABASE '" + other.toString().replace("'", "''") + "' AS " + name);
            connection.setAutoCommit(false);
        } catch (SQLException e) {
            throw LedgerException.of(other, e);
        }
    }

    /** Lets go of an attached database; what was not committed is given up. */
    void detach(String name) throws LedgerException {
        try (Statement statement = connection.createStatement()) {
            connection.setAutoCommit(true);
            statement.executeUpdate("DETACH DATABASE " + name);
            connection.setAutoCommit(false);
        } catch (SQLException e) {
            throw trouble(e);
        }
    }

    /** Closes the database; what was not committed is given up. */
    @Override
    public void close() throws LedgerException {
        try {
            if (!connection.getAutoCommit()) {
                connection.rollback();
            }
        } catch (SQLException e) {
            throw trouble(e);
        } finally {
            closeConnection();
        }
    }

    private void closeConnection() throws LedgerException {
        try {
            connection.close();
        } catch (SQLException e) {
            throw trouble(e);
        }
    }
}
