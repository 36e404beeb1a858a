package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.NoSuchFileException;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class FailureHandlerTest {

    private static CommandRun handle(Exception failure) {
        StringWriter err = new StringWriter();
        int code =
                new FailureHandler()
                        .handleExecutionException(
                                failure,
                                Emberline.commandLine(
                                        new PrintWriter(new StringWriter()),
                                        new PrintWriter(err, true)),
                                null);
        return new CommandRun(code, "", err.toString());
    }

    @Test
    void whatCannotBeWrittenIsNamedWithWhatToDo() {
        Map<IOException, List<String>> troubles =
                Map.of(
                        new AccessDeniedException("out/x"), List.of("out/x", "no permission"),
                        new FileAlreadyExistsException("out/y"), List.of("out/y", "Remove it"),
                        new NoSuchFileException("out/z"), List.of("out/z", "run again"),
                        new IOException("disk full"), List.of("disk full", "Check space"));
        troubles.forEach(
                (trouble, words) -> {
                    CommandRun run = handle(trouble);
                    assertEquals(ExitCode.NOT_WRITTEN, run.code());
                    words.forEach(word -> assertTrue(run.err().contains(word), run.err()));
                });
    }

    @Test
    void aFaultOfTheProductIsAskedToBeReported() {
        CommandRun run = handle(new IllegalStateException("a fault"));
        assertEquals(ExitCode.NOT_WRITTEN, run.code());
        assertTrue(run.err().contains("a fault; please report it"), run.err());
        assertEquals(1, run.err().lines().count());
    }
}
