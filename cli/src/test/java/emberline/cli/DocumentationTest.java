package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Runs every command of the documents that stands in a block {@code console}, and compares what it
 * prints with what the document says. With {@code -Demberline.docs=write} the outputs and the parts
 * that are made from the program are written anew into the documents instead.
 */
class DocumentationTest {

    private static final int LEAST_STEPS = 25;

    private static boolean isToBeWritten() {
        return System.getProperty("emberline.docs", "").equals("write");
    }

    @Test
    void everyCommandPrintsWhatTheDocumentsSay(@TempDir Path temporary)
            throws IOException, InterruptedException {
        ConsoleSession session = ConsoleSession.in(temporary.toRealPath());
        List<String> troubles = new ArrayList<>();
        int steps = 0;
        for (MarkdownDocument document : ProjectDocuments.all()) {
            DocumentRun run = DocumentRun.of(document, session);
            steps += run.steps();
            troubles.addAll(run.troubles());
            if (isToBeWritten()) {
                write(run.renewed());
            }
        }
        assertTrue(steps >= LEAST_STEPS, "commands that were run: " + steps);
        if (isToBeWritten()) {
            troubles.removeIf(trouble -> !trouble.contains("exit code"));
        }
        assertEquals("", String.join("\n\n", troubles));
    }

    @Test
    void tablesThatAreMadeFromTheProgramAreUpToDate() throws IOException {
        for (GeneratedPart part : List.of(CommandTable.part(), ColumnTable.part())) {
            MarkdownDocument document = ProjectDocuments.named(part.document());
            MarkdownDocument renewed = part.in(document);
            if (isToBeWritten()) {
                write(renewed);
            } else {
                assertEquals(
                        renewed.text(),
                        document.text(),
                        document.name() + ": bring it up to date by -Demberline.docs=write");
            }
        }
    }

    private static void write(MarkdownDocument document) throws IOException {
        Path file = ProjectDocuments.root().resolve(document.name());
        if (!Files.readString(file).equals(document.text())) {
            Files.writeString(file, document.text());
        }
    }
}
