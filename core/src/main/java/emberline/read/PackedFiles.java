package emberline.read;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.util.LinkedHashMap;
import java.util.Map;

/** Keeps the packed files that were read last, as long as they do not change on disk. */
final class PackedFiles {

    private static final int CAPACITY = 16;

    private final Map<Key, PackedSpectra> files =
            new LinkedHashMap<>(CAPACITY, 0.75f, true) {
                private static final long serialVersionUID = 1L;

                @Override
                protected boolean removeEldestEntry(Map.Entry<Key, PackedSpectra> eldest) {
                    return size() > CAPACITY;
                }
            };

    /** A file as it was at some time. */
    private record Key(Path file, long size, FileTime changed) {}

    PackedSpectra of(Path file) throws UnreadableSpectrumException {
        Key key = FileContent.reading(file, () -> key(file));
        synchronized (files) {
            PackedSpectra known = files.get(key);
            if (known == null) {
                known = new PackedSpectra(PackedFits.of(file));
                files.put(key, known);
            }
            return known;
        }
    }

    private static Key key(Path file) throws IOException {
        return new Key(file.toAbsolutePath(), Files.size(file), Files.getLastModifiedTime(file));
    }
}
