package emberline.reports.ledger;

import java.io.IOException;
import java.nio.file.Path;
import java.sql.SQLException;
import org.sqlite.SQLiteErrorCode;

/** Says what is wrong with the ledger of a run and what to do. */
public final class LedgerException extends IOException {

    private static final long serialVersionUID = 1L;

    private final boolean diskFull;

    /**
     * Makes the exception; its message reads "file: found; expected X. Advice."
     *
     * @param file the ledger
     * @param found what was found
     * @param expected what was expected
     * @param advice what to do, a full sentence
     */
    public LedgerException(Path file, String found, String expected, String advice) {
        super(file + ": " + found + "; expected " + expected + ". " + advice);
        this.diskFull = false;
    }

    private LedgerException(String message, boolean diskFull, SQLException cause) {
        super(message, cause);
        this.diskFull = diskFull;
    }

    /** What a failure of the database means. */
    static LedgerException of(Path file, SQLException cause) {
        int code = cause.getErrorCode() & 0xff;
        if (code == SQLiteErrorCode.SQLITE_FULL.code) {
            return new LedgerException(
                    file
                            + ": the disk is full; expected room for the records. Make space, then"
                            + " run the same command again.",
                    true,
                    cause);
        }
        String advice =
                code == SQLiteErrorCode.SQLITE_NOTADB.code
                                || code == SQLiteErrorCode.SQLITE_CORRUPT.code
                        ? "The file is damaged or no ledger: remove it; the objects are done anew."
                        : "Check space and permissions, then run the same command again.";
        return new LedgerException(
                file
                        + ": the ledger cannot be read or written ("
                        + String.valueOf(cause.getMessage()).lines().findFirst().orElse("")
                        + "); expected a database that can. "
                        + advice,
                false,
                cause);
    }

    /**
     * Whether the disk has no room.
     *
     * @return true where space must be made first
     */
    public boolean isDiskFull() {
        return diskFull;
    }
}
