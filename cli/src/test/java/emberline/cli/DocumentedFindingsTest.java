package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.read.Observation;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.NavigableSet;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The table of findings holds every code of the program with its severity, and no other. */
class DocumentedFindingsTest {

    private static final Pattern MADE =
            Pattern.compile("Finding\\s*\\.(note|caution|warning)\\(\\s*(\"([a-z0-9-]+)\")?");

    private static final Pattern NOTED = Pattern.compile("[^.\\w]note\\(\\s*\"([a-z0-9-]+)\"");

    private static final Pattern ROW =
            Pattern.compile("^\\| `([a-z0-9-]+)` \\| ([a-z]+(?: or [a-z]+)?) \\| (.+) \\|$");

    /** Codes that the sources do not spell where the finding is made; found by their places. */
    private static final Map<String, List<String>> SPELT_ELSEWHERE =
            Map.of(
                    "Keywords.java", List.of(Observation.RESOLVING_POWER_FROM_HEADER),
                    "ObservationAssembly.java", List.of(),
                    "GatheredEvidence.java", List.of("lithium-unusable"));

    private static Map<String, String> documented() throws IOException {
        Map<String, String> severities = new TreeMap<>();
        for (String line : ProjectDocuments.named("reports/README.md").lines()) {
            Matcher row = ROW.matcher(line);
            if (row.matches() && row.group(2).matches("(note|caution|warning).*")) {
                assertTrue(row.group(3).length() > 10, line);
                assertTrue(severities.put(row.group(1), row.group(2)) == null, "twice: " + line);
            }
        }
        return severities;
    }

    private static List<Path> sources() throws IOException {
        List<Path> sources = new ArrayList<>();
        for (String module : List.of("core", "reports", "cli")) {
            try (Stream<Path> all =
                    Files.walk(ProjectDocuments.root().resolve(module).resolve("src/main/java"))) {
                all.filter(file -> file.toString().endsWith(".java")).forEach(sources::add);
            }
        }
        return sources;
    }

    /** The codes that the program can say, each with its severities in ascending order. */
    private static Map<String, String> made() throws IOException {
        Map<String, NavigableSet<String>> severities = new TreeMap<>();
        NavigableSet<String> elsewhere = new TreeSet<>();
        for (Path file : sources()) {
            String text = Files.readString(file);
            String name = file.getFileName().toString();
            Matcher made = MADE.matcher(text);
            while (made.find()) {
                if (made.group(3) != null) {
                    add(severities, made.group(3), made.group(1));
                } else {
                    elsewhere.add(name);
                    for (String code : SPELT_ELSEWHERE.getOrDefault(name, List.of())) {
                        add(severities, code, made.group(1));
                    }
                }
            }
            if (name.equals("ObservationAssembly.java")) {
                NOTED.matcher(text).results().forEach(m -> add(severities, m.group(1), "note"));
            }
        }
        assertEquals(
                new TreeSet<>(SPELT_ELSEWHERE.keySet()),
                elsewhere,
                "findings whose code is not spelt where they are made: tell this test their codes");
        Map<String, String> joined = new TreeMap<>();
        severities.forEach((code, words) -> joined.put(code, inOrder(words)));
        return joined;
    }

    private static void add(Map<String, NavigableSet<String>> all, String code, String severity) {
        all.computeIfAbsent(code, c -> new TreeSet<>()).add(severity);
    }

    private static String inOrder(NavigableSet<String> words) {
        return String.join(
                " or ", Stream.of("note", "caution", "warning").filter(words::contains).toList());
    }

    @Test
    void everyFindingIsExplained() throws IOException {
        Map<String, String> made = made();
        assertTrue(made.size() > 70, "findings found in the sources: " + made.size());
        assertEquals(made, documented());
    }
}
