package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The checker of the documents can fail, and mends what is out of date. */
class DocumentRunTest {

    @TempDir private Path folder;

    private DocumentRun run(String... lines) throws IOException, InterruptedException {
        return DocumentRun.of(
                new MarkdownDocument("invented.md", List.of(lines)),
                ConsoleSession.in(folder.toRealPath()));
    }

    private static String[] says(String... output) {
        String[] head = {"# Invented", "", "```console", "$ emberline catalogue --lines | head -2"};
        return Stream.of(head, output, new String[] {"```", "The end."})
                .flatMap(Stream::of)
                .toArray(String[]::new);
    }

    private static List<String> printed() {
        return CommandRun.of("catalogue", "--lines")
                .out()
                .lines()
                .limit(2)
                .map(String::stripTrailing)
                .toList();
    }

    @Test
    void aRightOutputPasses() throws Exception {
        DocumentRun run = run(says(printed().toArray(String[]::new)));
        assertEquals(List.of(), run.troubles());
        assertEquals(1, run.steps());
    }

    @Test
    void aWrongOutputIsFoundAndMended() throws Exception {
        DocumentRun run = run(says("nothing of the kind"));
        assertEquals(1, run.troubles().size());
        assertTrue(run.troubles().get(0).contains("invented.md, line 4"), "" + run.troubles());
        assertEquals(List.of(says(printed().toArray(String[]::new))), run.renewed().lines());
    }

    @Test
    void aLineTooManyAndALineTooFewAreFound() throws Exception {
        assertEquals(1, run(says(printed().get(0))).troubles().size());
    }

    @ParameterizedTest
    @ValueSource(strings = {"emberline place nothing.csv", "emberline sort", "false"})
    void aCommandThatFailsIsFound(String command) throws Exception {
        DocumentRun run = run("```console", "$ " + command, "...", "```");
        assertEquals(1, run.troubles().size(), "" + run.troubles());
        assertTrue(run.troubles().get(0).contains("exit code"), "" + run.troubles());
        DocumentRun told = run2("```console", "$ false", "$ echo $?", "1", "```");
        assertEquals(List.of(), told.troubles());
    }

    private DocumentRun run2(String... lines) throws IOException, InterruptedException {
        return DocumentRun.of(
                new MarkdownDocument("invented.md", List.of(lines)),
                ConsoleSession.in(folder.resolve("again")));
    }

    @Test
    void filesLastThroughASession() throws Exception {
        DocumentRun run =
                run(
                        "```console",
                        "$ cat > my-list.csv << 'END'",
                        "name,spectrum",
                        "END",
                        "$ wc -l < my-list.csv",
                        "1",
                        "```");
        assertEquals(List.of(), run.troubles());
    }

    @Test
    void leftOutLinesAndTimesMayDiffer() {
        List<String> printed = List.of("first", "b", "c", "20 objects in 3.4 s");
        assertTrue(
                new PrintedLines(List.of("first", "...", "20 objects in 9.9 s"))
                        .agreesWith(printed));
        assertTrue(new PrintedLines(List.of("...", "c", "...")).agreesWith(printed));
        for (List<String> wrong :
                List.of(
                        List.of("first", "...", "21 objects in 3.4 s"),
                        List.of("first"),
                        List.of("...", "d", "..."),
                        List.<String>of())) {
            assertEquals(false, new PrintedLines(wrong).agreesWith(printed), "" + wrong);
        }
    }

    @Test
    void bringingUpToDateKeepsWhatIsLeftOut() {
        List<String> printed = List.of("head x", "b", "mid 2", "d", "tail 1");
        assertEquals(
                List.of("head x", "...", "mid 2", "...", "tail 1"),
                new PrintedLines(List.of("head", "...", "mid 1", "...", "tail"))
                        .broughtUpToDate(printed));
        assertThrows(
                IllegalArgumentException.class,
                () ->
                        new PrintedLines(List.of("a", "...", "gone", "...", "z"))
                                .broughtUpToDate(printed));
    }

    @Test
    void brokenDocumentsAreRefused() {
        MarkdownDocument open = new MarkdownDocument("x.md", List.of("```console", "$ true"));
        assertTrue(
                assertThrows(IllegalArgumentException.class, open::blocks)
                        .getMessage()
                        .contains("not closed"));
        FencedBlock silent = new FencedBlock("console", 0, List.of("no prompt"));
        assertThrows(IllegalArgumentException.class, () -> ConsoleStep.of(silent));
    }
}
