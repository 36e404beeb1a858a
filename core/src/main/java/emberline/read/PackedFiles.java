package emberline.read;

import emberline.spectrum.RecentlyUsed;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.util.Optional;

/** Keeps the packed files that were read last, as long as they do not change on disk. */
final class PackedFiles {

    private static final int CAPACITY = 16;

    private final RecentlyUsed<Key, PackedSpectra> files = new RecentlyUsed<>(CAPACITY);

    /** A file as it was at some time. */
    private record Key(Path file, long size, FileTime changed) {}

    PackedSpectra of(Path file) throws UnreadableSpectrumException {
        Key key = FileContent.reading(file, () -> key(file));
        synchronized (files) {
            Optional<PackedSpectra> known = files.get(key);
            return known.isPresent()
                    ? known.get()
                    : files.keep(key, new PackedSpectra(PackedFits.of(file)));
        }
    }

    private static Key key(Path file) throws IOException {
        return new Key(file.toAbsolutePath(), Files.size(file), Files.getLastModifiedTime(file));
    }
}
