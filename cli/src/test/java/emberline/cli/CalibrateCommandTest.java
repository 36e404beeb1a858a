package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CalibrateCommandTest {

    @TempDir private Path folder;

    @Test
    void aListBecomesAReferenceTableWithoutPixels() throws Exception {
        CommandRun run =
                CommandRun.of(
                        "calibrate",
                        DemoRun.survey(),
                        "--out",
                        folder,
                        "--velocity",
                        10,
                        "--av",
                        0.1,
                        "--to-rest",
                        "--site",
                        "wet");
        assertEquals(ExitCode.DONE, run.code(), run.err());
        List<String> lines = Files.readAllLines(folder.resolve("reference.csv"));
        List<String> rows = lines.stream().filter(line -> !line.startsWith("#")).toList();
        long listed = Files.readAllLines(DemoRun.survey()).size();
        assertEquals(listed - DemoRun.withoutSpectrum(), rows.size());
        assertTrue(rows.get(0).startsWith("object,group,type_number,gravity,kind,tier,source"));
        assertTrue(rows.get(0).contains("burgasser2006/h2o-j,burgasser2006/h2o-j sigma"));
    }

    @Test
    void aListThatIsNotThereIsRefused() {
        CommandRun run = CommandRun.of("calibrate", folder.resolve("no.csv"), "--out", folder);
        assertEquals(ExitCode.NOTHING_READ, run.code());
        assertTrue(run.err().contains("no.csv"), run.err());
    }

    @Test
    void anObjectThatFailsIsNamedAndNotSilentlyLeftOut() throws Exception {
        Path list = folder.resolve("known.csv");
        Path spectra = DemoRun.survey().toAbsolutePath().resolveSibling("spectra");
        try (var files = Files.list(spectra)) {
            Path good = files.filter(f -> f.toString().endsWith(".csv")).findFirst().orElseThrow();
            Files.writeString(list, "name,spectrum\nA," + good + "\nB,gone.csv\n");
        }
        CommandRun run = CommandRun.of("calibrate", list, "--out", folder);
        assertEquals(ExitCode.SOME_FAILED, run.code(), run.err());
        assertTrue(run.err().contains("B: failed: ") && run.err().contains("gone.csv"), run.err());
    }

    /** The late dwarfs of the demo survey and two other objects, with what they are. */
    private Path knownKinds() throws IOException {
        List<String> truth = Files.readAllLines(DemoRun.survey().resolveSibling("truth.csv"));
        List<String> lines = Files.readAllLines(DemoRun.survey());
        StringBuilder known = new StringBuilder("name,spectrum,known_kind\n");
        int others = 0;
        for (String line : lines.subList(1, lines.size())) {
            String[] cells = line.split(",", -1);
            String kind =
                    truth.stream()
                            .filter(row -> row.startsWith(cells[0] + ","))
                            .map(row -> row.split(",", -1)[1])
                            .map(word -> word.equals("late dwarf") ? "dwarf" : word)
                            .findFirst()
                            .orElseThrow();
            Path spectrum = DemoRun.survey().toAbsolutePath().resolveSibling(cells[1]);
            others += kind.equals("dwarf") ? 0 : 1;
            if (Files.isRegularFile(spectrum) && (kind.equals("dwarf") || others <= 2)) {
                known.append(cells[0] + "," + spectrum + "," + kind + "\n");
            }
        }
        return Files.writeString(folder.resolve("kinds.csv"), known);
    }

    @Test
    void tooFewObjectsOfOtherKindsMakeNoModelOfKinds() throws IOException {
        CommandRun run = CommandRun.of("calibrate", knownKinds(), "--out", folder);
        assertEquals(ExitCode.DONE, run.code(), run.err());
        assertTrue(run.err().contains("no model of kinds"), run.err());
        assertTrue(run.out().contains("0 of   0 placed\n"), run.out());
    }
}
