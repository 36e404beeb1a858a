package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Verdicts on the command line. */
class SortVerdictsTest {

    @TempDir private Path folder;

    private Path list;

    @BeforeEach
    void writeAList() throws IOException {
        StringBuilder spectrum = new StringBuilder("wavelength_um,flux,sigma\n");
        for (int i = 0; i < 300; i++) {
            double micron = 0.9 + i * 0.005;
            spectrum.append(micron + "," + (1 + 0.2 * Math.sin(8 * micron)) + ",0.02\n");
        }
        Files.writeString(folder.resolve("good.csv"), spectrum);
        list =
                Files.writeString(
                        folder.resolve("list.csv"), "name,spectrum\nA,good.csv\nB,good.csv\n");
    }

    private CommandRun sort(String... verdicts) throws IOException {
        List<Object> words =
                new ArrayList<>(
                        List.of("sort", list, "--out", folder.resolve("out"), "--no-reports"));
        if (verdicts.length > 0) {
            Files.writeString(folder.resolve("said.csv"), verdicts[0]);
            words.addAll(List.of("--verdicts", folder.resolve("said.csv")));
        }
        return CommandRun.of(words.toArray());
    }

    private String cell(int row, String column) throws IOException {
        try (CsvReader<NamedCsvRecord> csv =
                CsvReader.builder().ofNamedCsvRecord(folder.resolve("out/results.csv"))) {
            return csv.stream().toList().get(row).getField(column);
        }
    }

    private String json(String name) throws IOException {
        return Files.readString(folder.resolve("out/objects/" + name + ".json"));
    }

    @Test
    void verdictsReachTableAndJsonAndOutliveReruns() throws IOException {
        assertEquals(ExitCode.DONE, sort("name,verdict,verdict_note\nA,giant,strong CO\n").code());
        for (int run = 0; run < 2; run++) {
            assertEquals("giant", cell(0, "verdict"));
            assertEquals("giant", cell(0, "final_kind"));
            assertEquals("observer", cell(0, "final_by"));
            assertEquals("program", cell(1, "final_by"));
            assertTrue(json("A").contains("\"verdict\": \"giant\""), json("A"));
            assertTrue(json("A").contains("\"verdict_note\": \"strong CO\""));
            assertTrue(json("B").contains("\"verdict\": \"\""));
            assertEquals(ExitCode.DONE, sort().code());
        }
    }

    @Test
    void newerVerdictsJoinTheOldAndABlankOneTakesBack() throws IOException {
        sort("name,verdict\nA,giant\nB,stellar\n");
        sort("name,verdict\nB,\n");
        assertEquals("giant", cell(0, "verdict"));
        assertEquals("", cell(1, "verdict"));
        assertEquals(
                List.of("name,verdict,verdict_type,verdict_gravity,verdict_note", "A,giant,,,"),
                Files.readAllLines(folder.resolve("out/verdicts.csv")));
    }

    @Test
    void aResultsTableCanBeTakenForVerdicts() throws IOException {
        sort("name,verdict,verdict_type\nB,agree,L1\n");
        Path results = Files.copy(folder.resolve("out/results.csv"), folder.resolve("r.csv"));
        CommandRun run =
                CommandRun.of(
                        "sort",
                        list,
                        "--out",
                        folder.resolve("new"),
                        "--no-reports",
                        "--verdicts",
                        results);
        assertEquals(ExitCode.DONE, run.code(), run.err());
        assertTrue(Files.readString(folder.resolve("new/verdicts.csv")).contains("B,agree,L1,,"));
    }

    @Test
    void aNameThatIsNotInTheListIsToldAndKept() throws IOException {
        CommandRun run = sort("name,verdict\nA,giant\nAlpha,stellar\n");
        assertEquals(ExitCode.DONE, run.code());
        assertTrue(run.err().contains("said.csv, line 3, column name: 'Alpha'"), run.err());
        Files.writeString(list, "name,spectrum\nAlpha,good.csv\n");
        sort();
        assertEquals("stellar", cell(0, "verdict"));
    }

    @Test
    void aFaultyFileStopsTheRunBeforeItStarts() throws IOException {
        CommandRun run = sort("name,verdict\nA,gaint\n,giant\n");
        assertEquals(ExitCode.NOTHING_READ, run.code());
        assertTrue(run.err().contains("said.csv, line 2, column verdict: 'gaint'"), run.err());
        assertTrue(run.err().contains("said.csv, line 3, column name: nothing"), run.err());
        assertFalse(Files.exists(folder.resolve("out/results.csv")));
    }

    @Test
    void theRecordOfTheRunNamesTheVerdicts() throws IOException {
        sort();
        String before = Files.readString(folder.resolve("out/run.json"));
        assertTrue(before.contains("\"verdicts_sha256\": \"\""), before);
        sort("name,verdict\nA,giant\n");
        assertFalse(
                Files.readString(folder.resolve("out/run.json"))
                        .contains("\"verdicts_sha256\": \"\""));
    }
}
