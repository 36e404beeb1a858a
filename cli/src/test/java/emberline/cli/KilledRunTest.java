package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import emberline.reports.ledger.RunLedger;
import emberline.reports.ledger.RunProgress;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Runs in processes of their own that are killed, stopped or run out of disk. The number of kills
 * is set by {@code -Demberline.kills=20}.
 */
class KilledRunTest {

    @TempDir private Path folder;

    private Path list;
    private Path undisturbed;
    private int objects;

    @BeforeEach
    void runUndisturbed() throws IOException {
        list = RunFiles.repeatedDemo(folder.resolve("list.csv"), 1);
        objects = Files.readAllLines(list).size() - 1;
        undisturbed = folder.resolve("undisturbed");
        CommandRun run = CommandRun.of("sort", list, "--out", undisturbed, "--no-reports");
        assertEquals(ExitCode.DONE, run.code(), run.err());
    }

    private ChildRun start(Path out) throws IOException {
        return ChildRun.start(
                folder.resolve("said"), "sort", list, "--out", out, "--no-reports", "--threads", 2);
    }

    private void assertEqualToUndisturbed(Path out) throws IOException {
        assertEquals(List.of(), RunFiles.differences(undisturbed, out));
        List<String> rows = Files.readAllLines(out.resolve("results.csv"));
        assertEquals(objects + 1, rows.size());
        assertEquals(objects + 1, new HashSet<>(rows).size());
    }

    @Test
    void aRunKilledAtAnyMomentGoesOn() throws Exception {
        int kills = Integer.getInteger("emberline.kills", 4);
        Random moments = new Random(8);
        Path out = folder.resolve("killed");
        int working = 0;
        for (int kill = 0; kill < kills; kill++) {
            ChildRun run = start(out);
            run.awaitFile(out.resolve(RunLedger.FILE));
            Thread.sleep(moments.nextInt(2500));
            working += run.runs() ? 1 : 0;
            run.kill();
        }
        assertTrue(working > 0, "no run was still at work when it was killed");
        ChildRun last = start(out);
        assertEquals(ExitCode.DONE, last.end(), last.said());
        assertEqualToUndisturbed(out);
    }

    @ParameterizedTest
    @CsvSource({"INT, 130", "TERM, 143"})
    void aRunThatIsAskedToEndWritesWhatItHas(String signal, int code) throws Exception {
        Path out = folder.resolve("stopped");
        ChildRun run = start(out);
        run.awaitFile(out.resolve("objects/Tamarisk-0140+0522-0.json"));
        assumeTrue(hears(run, signal), "this process ignores SIG" + signal);
        run.signal(signal);
        assertEquals(code, run.end(), run.said());
        assertTrue(run.said().contains("run the same command again"), run.said());
        RunProgress progress = RunLedger.progress(out);
        assertEquals("stopped", progress.state());
        assertTrue(progress.done() > 0 && progress.done() < objects, progress.toString());
        assertEquals(progress.done() + 1, Files.readAllLines(out.resolve("results.csv")).size());
        ChildRun again = start(out);
        assertEquals(ExitCode.DONE, again.end(), again.said());
        assertTrue(again.said().contains("of them unchanged"), again.said());
        assertEqualToUndisturbed(out);
    }

    /** Whether a process has a handler for a signal; one started in the background may not. */
    private static boolean hears(ChildRun run, String signal) throws IOException {
        Path status = Path.of("/proc/" + run.pid() + "/status");
        if (!Files.exists(status)) {
            return true;
        }
        int bit = signal.equals("INT") ? 1 : 14;
        for (String line : Files.readAllLines(status)) {
            if (line.startsWith("SigCgt:")) {
                long mask = Long.parseUnsignedLong(line.substring(7).strip(), 16);
                return (mask >>> bit & 1) == 1;
            }
        }
        return true;
    }

    @Test
    void aSecondRunInTheSameFolderIsRefused() throws Exception {
        Path out = folder.resolve("busy");
        ChildRun first = start(out);
        first.awaitFile(out.resolve("objects/Tamarisk-0124+0318-0.json"));
        ChildRun second = ChildRun.start(folder.resolve("second"), "sort", list, "--out", out);
        assertEquals(ExitCode.NOT_WRITTEN, second.end(), second.said());
        assertTrue(second.said().contains("another run (process " + first.pid() + ")"));
        CommandRun status = CommandRun.of("survey-status", out);
        assertEquals(ExitCode.DONE, status.code(), status.err());
        assertTrue(status.out().contains("of " + objects + " objects done"), status.out());
        assertEquals(ExitCode.DONE, first.end(), first.said());
        assertTrue(CommandRun.of("survey-status", out).out().contains("list.csv: complete"));
        assertEqualToUndisturbed(out);
    }

    /** In a small file system of its own; skipped where none can be made. */
    @Test
    void aFullDiskStopsTheRunWhichGoesOnWhenThereIsRoom() throws Exception {
        Path small = Files.createDirectory(folder.resolve("small"));
        Path copy = folder.resolve("copy");
        String sort =
                String.join(
                        " ",
                        ChildRun.command(
                                        "sort", list, "--out", small.resolve("out"), "--no-reports")
                                .stream()
                                .map(word -> "'" + word + "'")
                                .toList());
        String script =
                "mount -t tmpfs -o size=2m none '"
                        + small
                        + "' || exit 99; "
                        + sort
                        + "; echo first $?; "
                        + "mount -o remount,size=100m '"
                        + small
                        + "'; "
                        + sort
                        + "; echo second $?; cp -r '"
                        + small
                        + "/out' '"
                        + copy
                        + "'";
        Path said = folder.resolve("said-small");
        int code =
                new ProcessBuilder("unshare", "-rm", "sh", "-c", script)
                        .redirectErrorStream(true)
                        .redirectOutput(said.toFile())
                        .start()
                        .waitFor();
        String text = Files.readString(said);
        assumeTrue(code == 0, "no file system can be mounted here: " + text);
        assertTrue(text.contains("the disk is full"), text);
        assertTrue(text.contains("Make space, then run the same command again"), text);
        assertTrue(text.contains("first 4") && text.contains("second 0"), text);
        assertFalse(text.contains("internal error"), text);
        assertEqualToUndisturbed(copy);
    }
}
