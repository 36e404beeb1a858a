package emberline.cli;

import emberline.reports.ledger.LedgerException;
import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.FileSystemException;
import java.nio.file.NoSuchFileException;
import java.util.Locale;

/** Says what is wrong with an output that cannot be written, and what to do. */
final class OutputTrouble {

    private OutputTrouble() {}

    /** Whether an output could not be written for want of room. */
    static boolean isDiskFull(IOException trouble) {
        if (trouble instanceof LedgerException ledger) {
            return ledger.isDiskFull();
        }
        String message = String.valueOf(trouble.getMessage()).toLowerCase(Locale.ROOT);
        return message.contains("no space left")
                || message.contains("disk quota exceeded")
                || message.contains("not enough space");
    }

    static String message(IOException trouble) {
        if (trouble instanceof LedgerException || trouble instanceof RunRefusedException) {
            return trouble.getMessage();
        }
        String where =
                trouble instanceof FileSystemException file && file.getFile() != null
                        ? file.getFile()
                        : "output";
        if (trouble instanceof AccessDeniedException) {
            return where
                    + ": no permission to write; expected a folder that can be written. Choose"
                    + " another --out.";
        }
        if (trouble instanceof FileAlreadyExistsException) {
            return where
                    + ": a file stands where a folder is needed. Remove it or choose another"
                    + " --out.";
        }
        if (trouble instanceof NoSuchFileException) {
            return where
                    + ": cannot be made there, or vanished while it was written. Choose another --out,"
                    + " or run again.";
        }
        return where
                + ": cannot be written: "
                + trouble.getMessage()
                + ". Check space and permissions, then run again.";
    }
}
