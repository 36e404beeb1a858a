package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.reports.ledger.RunLedger;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.ResultSet;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A run that is started again does only what changed. */
class ResumedRunTest {

    private static final FileTime LONG_AGO = FileTime.fromMillis(1_000_000_000_000L);

    @TempDir private Path folder;

    private Path list;
    private Path out;

    @BeforeEach
    void writeSpectra() throws IOException {
        for (String name : List.of("a", "b", "c")) {
            spectrum(name, 0.2);
        }
        list = folder.resolve("list.csv");
        out = folder.resolve("out");
        Files.writeString(list, "name,spectrum,note\nA,a.csv,one\nB,b.csv,two\nC,c.csv,three\n");
    }

    private void spectrum(String name, double depth) throws IOException {
        StringBuilder text = new StringBuilder("wavelength_um,flux,sigma\n");
        for (int i = 0; i < 300; i++) {
            double micron = 0.9 + i * 0.005;
            double flux = 1 + depth * Math.sin(8 * micron);
            text.append(String.format(Locale.ROOT, "%.3f,%.5f,0.02%n", micron, flux));
        }
        Files.writeString(folder.resolve(name + ".csv"), text);
    }

    private CommandRun sort(Object... more) throws IOException {
        List<Object> words = new ArrayList<>(List.of("sort", list, "--out", out, "--no-reports"));
        words.addAll(List.of(more));
        CommandRun run = CommandRun.of(words.toArray());
        assertEquals(ExitCode.DONE, run.code(), run.err());
        return run;
    }

    /** Sorts again and tells the objects whose JSON files were written anew. */
    private List<String> doneAnew(Object... more) throws IOException {
        for (Path file : json()) {
            Files.setLastModifiedTime(file, LONG_AGO);
        }
        sort(more);
        List<String> anew = new ArrayList<>();
        for (Path file : json()) {
            if (!Files.getLastModifiedTime(file).equals(LONG_AGO)) {
                anew.add(file.getFileName().toString().replace(".json", ""));
            }
        }
        return anew;
    }

    private List<Path> json() throws IOException {
        try (var files = Files.list(out.resolve("objects"))) {
            return files.sorted().toList();
        }
    }

    @Test
    void onlyWhatChangedIsDoneAgain() throws IOException {
        sort();
        assertEquals(List.of(), doneAnew());
        spectrum("b", 0.3);
        assertEquals(List.of("B"), doneAnew());
        Files.delete(out.resolve("objects/C.json"));
        assertEquals(List.of("C"), doneAnew());
        Files.writeString(out.resolve("objects/A.json"), "");
        assertEquals(List.of("A"), doneAnew());
        Files.writeString(list, Files.readString(list).replace("three", "3"));
        assertEquals(List.of("C"), doneAnew());
        Files.delete(out.resolve("results.csv"));
        assertEquals(List.of(), doneAnew());
        assertTrue(Files.readString(out.resolve("results.csv")).contains(",3\n"));
    }

    @Test
    void rowsThatMoveComeOrGoLeaveTheOthersAlone() throws IOException {
        sort();
        spectrum("d", 0.1);
        Files.writeString(list, "name,spectrum,note\nD,d.csv,new\nC,c.csv,three\nA,a.csv,one\n");
        assertEquals(List.of("D"), doneAnew());
        List<String> rows = Files.readAllLines(out.resolve("results.csv"));
        assertEquals(4, rows.size());
        assertTrue(rows.get(1).startsWith("D,") && rows.get(2).startsWith("C,"));
        assertTrue(rows.get(3).startsWith("A,"), rows.get(3));
    }

    @Test
    void otherOptionsMakeAllAnewAndSaySo() throws IOException {
        sort();
        CommandRun run = sort("--prior", "volume");
        assertTrue(
                run.err().contains("option prior was 'flat', is 'volume'"), "said: " + run.err());
        assertEquals(List.of("A", "B", "C"), doneAnew("--prior", "flat"));
    }

    @Test
    void aResumedRunEqualsANewOne() throws IOException {
        sort();
        spectrum("a", 0.35);
        sort();
        Path fresh = folder.resolve("fresh");
        CommandRun.of("sort", list, "--out", fresh, "--no-reports");
        assertEquals(List.of(), RunFiles.differences(fresh, out));
    }

    @Test
    void aFailedObjectIsTriedAgainWhenItsSpectrumIsThere() throws IOException {
        Files.delete(folder.resolve("b.csv"));
        CommandRun run = CommandRun.of("sort", list, "--out", out, "--no-reports");
        assertEquals(ExitCode.SOME_FAILED, run.code(), run.err());
        CommandRun status = CommandRun.of("survey-status", out);
        assertTrue(status.out().contains("1 failed"), status.out());
        assertTrue(status.out().contains("B: failed: "), status.out());
        spectrum("b", 0.2);
        assertEquals(List.of("B"), doneAnew());
    }

    @Test
    void otherToolsReadTheLedgerWithSql() throws Exception {
        sort();
        try (Connection connection =
                        DriverManager.getConnection("jdbc:sqlite:" + out.resolve(RunLedger.FILE));
                Statement statement = connection.createStatement();
                ResultSet rows =
                        statement.executeQuery(
                                "SELECT name, status, typeof(snr), list_row, length(input_sha256)"
                                        + " FROM object ORDER BY list_row")) {
            assertTrue(rows.next());
            assertEquals("A", rows.getString(1));
            assertEquals("real", rows.getString(3));
            assertEquals(1, rows.getInt(4));
            assertEquals(64, rows.getInt(5));
        }
    }

    @Test
    void aLedgerThatIsNoDatabaseIsExplained() throws IOException {
        Files.createDirectories(out);
        Files.writeString(out.resolve(RunLedger.FILE), "not a database, but long enough".repeat(9));
        CommandRun run = CommandRun.of("sort", list, "--out", out, "--no-reports");
        assertEquals(ExitCode.NOT_WRITTEN, run.code());
        assertTrue(run.err().contains("remove it"), run.err());
        assertFalse(run.err().contains("internal error"), run.err());
        CommandRun none = CommandRun.of("survey-status", folder);
        assertEquals(ExitCode.NOT_WRITTEN, none.code());
        assertTrue(none.err().contains("no such file"), none.err());
    }

    @Test
    void timingsSayWhereTimeWent() throws IOException {
        CommandRun run = sort("--timings");
        for (String word : List.of("read", "prepare", "measure", "place", "judge", "write")) {
            assertTrue(run.err().contains("\n  " + word + " "), run.err());
        }
        assertTrue(run.err().contains("3 objects through the chain"), run.err());
        assertTrue(run.err().contains("peak memory: heap "), run.err());
    }
}
