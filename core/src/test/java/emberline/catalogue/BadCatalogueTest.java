package emberline.catalogue;

import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.net.URISyntaxException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Every folder under bad/ lists in expect.txt what its complaint must say. Add a folder, get a
 * test.
 */
class BadCatalogueTest {

    private static final FeatureCatalogue STANDARD = FeatureCatalogue.standard();

    @ParameterizedTest
    @MethodSource("bad")
    void badFolderRaisesItsOwnComplaint(Path folder) throws IOException {
        String message = complaint(folder);
        for (String expected : Files.readAllLines(folder.resolve("expect.txt"))) {
            assertTrue(message.contains(expected), () -> message + "\nlacks: " + expected);
        }
    }

    static Stream<Path> bad() throws IOException, URISyntaxException {
        Path root = Path.of(BadCatalogueTest.class.getResource("bad").toURI());
        try (Stream<Path> folders = Files.list(root)) {
            return folders.sorted().toList().stream();
        }
    }

    @Test
    void folderThatDoesNotExist(@TempDir Path temp) {
        assertSays(complaint(temp.resolve("none")), "none: does not exist; expected a folder");
    }

    @Test
    void fileInsteadOfAFolder(@TempDir Path temp) throws IOException {
        Path file = Files.writeString(temp.resolve("table.csv"), "id\n");
        assertSays(complaint(file), "table.csv: is a file; expected a folder");
    }

    @Test
    void folderWithoutTables(@TempDir Path temp) throws IOException {
        Files.writeString(temp.resolve("README.md"), "nothing else\n");
        assertSays(complaint(temp), "holds no table; expected at least one of sources.csv");
    }

    @Test
    void textThatIsNotUtf8(@TempDir Path temp) throws IOException {
        Files.write(temp.resolve("sources.csv"), new byte[] {'k', 'e', 'y', (byte) 0xE9, '\n'});
        assertSays(complaint(temp), "sources.csv: cannot be read");
    }

    /** A complaint has four parts: where, what was found, what was expected, what to do. */
    @Test
    void complaintHasFourParts() throws URISyntaxException {
        Path folder = Path.of(BadCatalogueTest.class.getResource("bad/low-above-high").toURI());
        assertSays(
                complaint(folder),
                "example2026.csv, line 2, column high: 1.1 after 1.2; expected low below high."
                        + " Exchange the two, or correct them.");
    }

    private static String complaint(Path folder) {
        return assertThrows(InvalidCatalogueException.class, () -> STANDARD.with(folder))
                .getMessage();
    }

    private static void assertSays(String message, String... fragments) {
        for (String fragment : List.of(fragments)) {
            assertTrue(message.contains(fragment), message);
        }
    }
}
