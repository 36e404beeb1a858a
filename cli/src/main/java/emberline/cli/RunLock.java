package emberline.cli;

import java.io.Closeable;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.channels.OverlappingFileLockException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;

/**
 * Keeps the folder of a run for one process. The lock goes with the process, however it ends; the
 * file stays.
 */
final class RunLock implements Closeable {

    private static final String FILE = ".run-lock";

    private final FileChannel channel;

    private RunLock(FileChannel channel) {
        this.channel = channel;
    }

    /**
     * Takes a folder, which exists.
     *
     * @throws RunRefusedException if another process has it
     */
    static RunLock of(Path folder) throws IOException {
        Path file = folder.resolve(FILE);
        FileChannel channel =
                FileChannel.open(
                        file,
                        StandardOpenOption.CREATE,
                        StandardOpenOption.READ,
                        StandardOpenOption.WRITE);
        try {
            FileLock lock = channel.tryLock();
            if (lock == null) {
                throw taken(folder, file);
            }
            channel.truncate(0);
            channel.write(
                    ByteBuffer.wrap(
                            ("process " + ProcessHandle.current().pid())
                                    .getBytes(StandardCharsets.UTF_8)));
            return new RunLock(channel);
        } catch (OverlappingFileLockException e) {
            channel.close();
            throw taken(folder, file);
        } catch (IOException e) {
            channel.close();
            throw e;
        }
    }

    private static RunRefusedException taken(Path folder, Path file) throws IOException {
        String who = Files.readString(file).strip();
        return new RunRefusedException(
                folder
                        + ": another run"
                        + (who.isEmpty() ? "" : " (" + who + ")")
                        + " is writing here; expected a folder that no other run uses. Wait for it"
                        + " (survey-status shows how far it is), or choose another --out.");
    }

    @Override
    public void close() throws IOException {
        channel.close();
    }
}
