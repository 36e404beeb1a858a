package emberline.reports.attach;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;

/**
 * A file that appears whole or not at all: it is written under a temporary name in the folder of
 * its target and moved to the target at the end.
 */
public final class AtomicFile {

    private final Path target;
    private final Path temporary;

    private AtomicFile(Path target, Path temporary) {
        this.target = target;
        this.temporary = temporary;
    }

    /**
     * A file for a target. The temporary name is that of the target with a dot before it and {@code
     * .part} after it; what an earlier run left there is written over.
     *
     * @param target where the file will stand
     * @return the file, not yet made
     */
    public static AtomicFile beside(Path target) {
        return new AtomicFile(target, target.resolveSibling("." + target.getFileName() + ".part"));
    }

    /**
     * Writes a text to a file at once.
     *
     * @param target where the file will stand; its folder exists
     * @param text its content, written in UTF-8
     * @throws IOException if it cannot be written
     */
    public static void write(Path target, String text) throws IOException {
        write(target, text.getBytes(StandardCharsets.UTF_8));
    }

    /**
     * Writes bytes to a file at once.
     *
     * @param target where the file will stand; its folder exists
     * @param bytes its content
     * @throws IOException if it cannot be written
     */
    public static void write(Path target, byte[] bytes) throws IOException {
        AtomicFile file = beside(target);
        try {
            Files.write(
                    file.temporary(),
                    bytes,
                    StandardOpenOption.CREATE_NEW,
                    StandardOpenOption.WRITE);
            file.commit();
        } finally {
            file.discard();
        }
    }

    /**
     * Where to write. What stands there is deleted first: it is left from an earlier run, or a link
     * by which something outside the folder would be written over.
     *
     * @return the temporary file, which does not exist
     * @throws IOException if something stands there that cannot be deleted
     */
    public Path temporary() throws IOException {
        Files.deleteIfExists(temporary);
        return temporary;
    }

    /**
     * Moves the temporary file to the target.
     *
     * @throws IOException if it cannot be moved
     */
    public void commit() throws IOException {
        try {
            Files.move(
                    temporary,
                    target,
                    StandardCopyOption.ATOMIC_MOVE,
                    StandardCopyOption.REPLACE_EXISTING);
        } catch (AtomicMoveNotSupportedException e) {
            Files.move(temporary, target, StandardCopyOption.REPLACE_EXISTING);
        }
    }

    /**
     * Deletes the temporary file, if there is one.
     *
     * @throws IOException if it cannot be deleted
     */
    public void discard() throws IOException {
        Files.deleteIfExists(temporary);
    }
}
