package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class DoctorCommandTest {

    @TempDir private Path folder;

    @Test
    void aSoundInstallationPassesAndNothingStaysBehind() throws IOException {
        CommandRun run = CommandRun.of("doctor", "--out", folder.resolve("new"));
        List<String> lines = run.out().lines().toList();
        for (String word :
                List.of("Java", "memory", "encoding", "folder", "whole chain", "fonts", "tio5")) {
            assertTrue(run.out().contains(word), run.out());
        }
        List<String> failed =
                lines.stream()
                        .filter(line -> line.startsWith("FAIL"))
                        .filter(line -> !line.contains("locale and encoding"))
                        .toList();
        assertEquals(List.of(), failed, run.out());
        assertEquals(
                lines.get(lines.size() - 1).startsWith("all ") ? 0 : ExitCode.SOME_FAILED,
                run.code());
        try (var left = Files.list(folder)) {
            assertEquals(List.of(), left.toList());
        }
    }

    @Test
    void aFolderThatCannotBeWrittenFails() throws IOException {
        Path file = Files.writeString(folder.resolve("file"), "x");
        CommandRun run = CommandRun.of("doctor", "--out", file.resolve("below"));
        assertEquals(ExitCode.SOME_FAILED, run.code());
        assertTrue(run.out().contains("FAIL  folder " + file), run.out());
        assertTrue(run.out().contains("Choose a folder that you may write to"), run.out());
        assertFalse(run.out().contains("all "), run.out());
        assertEquals("x", Files.readString(file));
    }
}
