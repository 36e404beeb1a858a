package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** Every library that is shipped stands in the list of licences, and nothing else does. */
class ThirdPartyTest {

    private static final Path DIST = Path.of("src/main/dist/lib");

    private static final Set<String> COMPATIBLE =
            Set.of("Apache-2.0", "MIT", "LGPL-2.1-or-later", "LGPL-3.0", "public domain");

    /** Libraries of the tests and checks, which are not shipped. */
    private static final String TESTS_ONLY =
            "(junit-|opentest4j|apiguardian|archunit|surefire|org\\.jacoco|plexus-|maven-"
                    + "|selenium-|opentelemetry-|guava-|failureaccess-|listenablefuture-|byte-buddy-"
                    + "|error_prone_annotations-|j2objc-annotations-|jspecify-"
                    + "|annotations-\\d).*";

    private static List<String[]> listed() throws IOException {
        try (Stream<String> lines = Files.lines(DIST.resolve("THIRD-PARTY.csv"))) {
            return lines.filter(line -> !line.startsWith("#"))
                    .skip(1)
                    .map(line -> line.split(",", -1))
                    .toList();
        }
    }

    @Test
    void theListNamesWhatIsShippedAndNothingElse() throws IOException {
        List<String> shipped = new ArrayList<>();
        for (String entry : System.getProperty("java.class.path").split(File.pathSeparator, -1)) {
            String name = Path.of(entry).getFileName().toString();
            if (name.endsWith(".jar")
                    && !name.startsWith("emberline-")
                    && !name.matches(TESTS_ONLY)) {
                shipped.add(name.replaceFirst("-\\d[^-]*\\.jar$", ""));
            }
        }
        assertTrue(shipped.size() > 20, "the class path is not that of the program: " + shipped);
        assertEquals(
                shipped.stream().sorted().toList(),
                listed().stream().map(row -> row[0]).sorted().toList());
    }

    @Test
    void everyLicenceIsCompatibleAndItsTextIsThere() throws IOException {
        for (String[] row : listed()) {
            String licence = row[1].replaceFirst(" \\(.*", "");
            assertTrue(COMPATIBLE.contains(licence), row[0] + ": " + licence);
            if (row[2].endsWith(".txt")) {
                assertTrue(Files.size(DIST.resolve("licences").resolve(row[2])) > 5000, row[2]);
            }
        }
        Set<String> texts = listed().stream().map(row -> row[2]).collect(Collectors.toSet());
        assertTrue(texts.contains("LGPL-3.txt") && texts.contains("LGPL-2.1.txt"), "" + texts);
    }
}
