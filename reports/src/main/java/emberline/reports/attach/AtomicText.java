package emberline.reports.attach;

import java.io.Closeable;
import java.io.IOException;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * A long text that is written piece by piece, in UTF-8, and takes the place of its target at once
 * when it is closed. One that was abandoned, or of which a piece could not be written, leaves the
 * former file as it was. Not for use by several threads at once.
 */
public final class AtomicText implements Closeable {

    private final AtomicFile file;
    private final Writer writer;
    private boolean failed;

    private AtomicText(AtomicFile file, Writer writer) {
        this.file = file;
        this.writer = writer;
    }

    /**
     * Opens a text.
     *
     * @param target the file that it will be; its folder exists
     * @return an empty text
     * @throws IOException if the folder cannot be written to
     */
    public static AtomicText open(Path target) throws IOException {
        AtomicFile file = AtomicFile.beside(target);
        return new AtomicText(
                file, Files.newBufferedWriter(file.temporary(), StandardCharsets.UTF_8));
    }

    /**
     * Adds a piece.
     *
     * @param text the piece
     * @throws IOException if it cannot be written, for instance because the disk is full
     */
    public void append(String text) throws IOException {
        try {
            writer.write(text);
        } catch (IOException e) {
            failed = true;
            throw e;
        }
    }

    /** Gives the text up: when it is closed, the former file stays. */
    public void abandon() {
        failed = true;
    }

    /**
     * Whether the text was given up or could not be written.
     *
     * @return true if the former file will stay
     */
    public boolean isGivenUp() {
        return failed;
    }

    @Override
    public void close() throws IOException {
        try (writer) {
            writer.flush();
        } catch (IOException e) {
            failed = true;
            throw e;
        } finally {
            if (failed) {
                file.discard();
            }
        }
        if (!failed) {
            file.commit();
        }
    }
}
