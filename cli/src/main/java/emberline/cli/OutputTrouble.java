package emberline.cli;

import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.FileSystemException;
import java.nio.file.NoSuchFileException;

/** Says what is wrong with an output that cannot be written, and what to do. */
final class OutputTrouble {

    private OutputTrouble() {}

    static String message(IOException trouble) {
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
