package emberline.read;

import java.io.IOException;
import java.net.URISyntaxException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;

/** The folders of fixtures; each fixture carries its own expectation. */
final class Fixtures {

    private static final String MARK = "# expect: ";

    private Fixtures() {}

    static List<Path> in(String folder) throws IOException {
        try (Stream<Path> files = Files.list(folder(folder))) {
            return files.filter(file -> !file.toString().endsWith(".expect")).sorted().toList();
        }
    }

    static Path folder(String folder) {
        try {
            return Path.of(Fixtures.class.getResource("/emberline/read/" + folder).toURI());
        } catch (URISyntaxException e) {
            throw new IllegalStateException(e);
        }
    }

    /** The first line of a fixture, or of the file beside it, without the mark. */
    static String expectation(Path file) throws IOException {
        Path beside = file.resolveSibling(file.getFileName() + ".expect");
        Path holder = Files.exists(beside) ? beside : file;
        String first =
                Files.readString(holder, StandardCharsets.ISO_8859_1)
                        .lines()
                        .findFirst()
                        .orElse("");
        if (!first.startsWith(MARK)) {
            throw new IllegalStateException(file + " does not say what to expect");
        }
        return first.substring(MARK.length());
    }
}
