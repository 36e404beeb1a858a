package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CheckCommandTest {

    @TempDir private Path folder;

    private Path list;

    /** Four objects of the demo survey with the types of its truth table, one with a wrong path. */
    @BeforeEach
    void writeList() throws IOException {
        Path spectra = DemoRun.survey().toAbsolutePath().resolveSibling("spectra");
        StringBuilder rows =
                new StringBuilder("name,spectrum,resolution,known_type,known_kind,known_gravity\n");
        List<String> survey = Files.readAllLines(DemoRun.survey());
        List<String> truth = Files.readAllLines(DemoRun.survey().resolveSibling("truth.csv"));
        int written = 0;
        for (int k = 1; k < truth.size() && written < 4; k++) {
            String[] known = truth.get(k).split(",", -1);
            String[] listed = survey.get(k).split(",", -1);
            if (known[1].equals("late dwarf") && known[7].equals("prism")) {
                double type = Double.parseDouble(known[2]);
                Path file = spectra.resolveSibling(listed[1]);
                rows.append(known[0] + "," + file + "," + listed[3] + "," + code(type));
                rows.append(",dwarf," + known[3] + "\n");
                written++;
            }
        }
        rows.append("Gone,gone.csv,120,L3,dwarf,\n");
        list = folder.resolve("known.csv");
        Files.writeString(list, rows);
    }

    private static String code(double type) {
        return "MLTY".charAt((int) (type / 10)) + String.valueOf(type % 10);
    }

    @Test
    void aListIsScoredAndTheFailedObjectIsNamed() throws IOException {
        Path out = folder.resolve("out");
        CommandRun run = CommandRun.of("check", list, "--out", out);
        assertEquals(ExitCode.SOME_FAILED, run.code(), run.err());
        assertTrue(run.err().contains("Gone: failed: "), run.err());
        assertTrue(run.out().startsWith("5 objects, 1 of them failed."), run.out());
        assertTrue(run.out().contains("Types of dwarfs"), run.out());
        assertEquals(6, Files.readAllLines(out.resolve("residuals.csv")).size());
        assertTrue(Files.readString(out.resolve("check.json")).contains("\"degrade_snr\": \"\""));
        assertTrue(Files.size(out.resolve("check.pdf")) > 5000);
    }

    @Test
    void degradedSpectraAreScoredTheSameEachTime() {
        Object[] words = {
            "check",
            list,
            "--format",
            "json",
            "--degrade-snr",
            15,
            "--degrade-resolution",
            60,
            "--degrade-band",
            "h"
        };
        CommandRun one = CommandRun.of(words);
        assertTrue(one.out().contains("\"degrade_band\": \"H\""), one.out());
        assertTrue(one.out().contains("\"degrade_resolution\": \"60.0\""), one.out());
        assertEquals(one.out(), CommandRun.of(words).out());
        CommandRun plain = CommandRun.of("check", list, "--format", "json");
        String figures = plain.out().substring(plain.out().indexOf("\"types\""));
        assertFalse(one.out().contains(figures));
    }

    @Test
    void wrongNumbersAreRefused() {
        for (Object[] words :
                List.of(
                        new Object[] {"check", list, "--degrade-snr", 0},
                        new Object[] {"check", list, "--degrade-resolution", -5},
                        new Object[] {"check", list, "--degrade-band", "L"},
                        new Object[] {"check", list, "--threads", 0})) {
            CommandRun run = CommandRun.of(words);
            assertEquals(ExitCode.WRONG_USAGE, run.code(), run.err());
            assertTrue(run.err().contains(words[2].toString()), run.err());
        }
    }
}
