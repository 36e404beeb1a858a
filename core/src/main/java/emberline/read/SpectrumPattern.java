package emberline.read;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.FileSystems;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.nio.file.PathMatcher;
import java.util.List;
import java.util.stream.Stream;

/**
 * Files named by a pattern: {@code *} stands for any letters of a name, {@code ?} for one, {@code
 * **} for folders too. A path that stands on disk as it is written is no pattern.
 */
final class SpectrumPattern {

    private static final int MOST_LEVELS = 32;

    private SpectrumPattern() {}

    /** Whether a text is a pattern, and not the path of something. */
    static boolean isPattern(Path folder, String text) {
        if (text.indexOf('*') < 0 && text.indexOf('?') < 0) {
            return false;
        }
        try {
            return !Files.exists(folder.resolve(text));
        } catch (InvalidPathException e) {
            return true; // where the system allows neither sign in a name
        }
    }

    /** The deepest folder that a pattern names without its signs. */
    static Path root(Path folder, String pattern) {
        int cut = prefix(pattern);
        return cut == 0 ? folder : folder.resolve(pattern.substring(0, cut));
    }

    /**
     * The files that a pattern names, in the order of their paths.
     *
     * @param folder what the pattern is relative to
     * @param pattern the pattern
     * @return paths, relative to the folder where the pattern is
     */
    static List<String> files(Path folder, String pattern) throws UnreadableSpectrumException {
        Path root;
        try {
            root = root(folder, pattern);
        } catch (InvalidPathException e) {
            throw new UnreadableSpectrumException(
                    pattern,
                    "no name of a folder (" + e.getReason() + ")",
                    "a path with * or ? in it",
                    "Correct the path.");
        }
        String head = pattern.substring(0, prefix(pattern));
        String rest = pattern.substring(prefix(pattern));
        String escaped = rest.replaceAll("([\\[\\]{}\\\\])", "\\\\$1");
        PathMatcher matcher = FileSystems.getDefault().getPathMatcher("glob:" + escaped);
        int levels =
                rest.contains("**")
                        ? MOST_LEVELS
                        : (int) rest.chars().filter(c -> c == '/').count() + 1;
        if (!Files.isDirectory(root)) {
            return List.of();
        }
        try (Stream<Path> found = Files.walk(root, levels)) {
            return found.filter(Files::isRegularFile)
                    .map(root::relativize)
                    .filter(matcher::matches)
                    .map(path -> head + path.toString().replace('\\', '/'))
                    .sorted()
                    .toList();
        } catch (IOException | UncheckedIOException e) {
            throw new UnreadableSpectrumException(
                    pattern,
                    "a folder that cannot be listed (" + e.getMessage() + ")",
                    "folders that can be read",
                    "Check their permissions.");
        }
    }

    /** How much of a pattern names a folder without signs, the last slash included. */
    private static int prefix(String pattern) {
        int sign = 0;
        while (sign < pattern.length() && "*?".indexOf(pattern.charAt(sign)) < 0) {
            sign++;
        }
        return pattern.lastIndexOf('/', sign) + 1;
    }
}
