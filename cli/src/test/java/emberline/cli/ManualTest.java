package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ManualTest {

    @TempDir private Path folder;

    private static String output(String... command) throws IOException, InterruptedException {
        Process process = new ProcessBuilder(command).redirectErrorStream(true).start();
        String text = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        assertTrue(process.waitFor(60, TimeUnit.SECONDS), "no end: " + List.of(command));
        assertEquals(0, process.exitValue(), text);
        return text;
    }

    private static boolean has(String program) {
        return List.of("/usr/bin/", "/bin/", "/usr/local/bin/").stream()
                .anyMatch(place -> Files.isExecutable(Path.of(place + program)));
    }

    @Test
    void everyCommandHasAPageThatNamesAllItsOptions() throws IOException {
        CommandRun run = CommandRun.of("manual", "--out", folder);
        assertEquals(ExitCode.DONE, run.code(), run.err());
        int commands =
                Emberline.commandLine(
                                new PrintWriter(new StringWriter()),
                                new PrintWriter(new StringWriter()))
                        .getSubcommands()
                        .size();
        assertTrue(commands > 9, "commands: " + commands);
        // the command that writes the pages is hidden and has none; the program has one
        assertEquals(commands, run.out().lines().count(), run.out());
        String sort = Files.readString(folder.resolve("emberline-sort.1"));
        for (String word :
                List.of(
                        ".TH \"EMBERLINE\\-SORT\"",
                        "\\-\\-resolution=R",
                        ".B LIST",
                        "default flat",
                        ".SH EXIT STATUS",
                        "emberline(1)")) {
            assertTrue(sort.contains(word), word + "\n" + sort);
        }
        assertEquals(sort, CommandRun.of("manual", "sort").out());
        assertTrue(Files.readString(folder.resolve("emberline.1")).contains(".B doctor"));
        assertTrue(CommandRun.of("manual", "srot").err().contains("did you mean sort?"));
    }

    @Test
    void thePagesAreSoundForGroff() throws IOException, InterruptedException {
        Assumptions.assumeTrue(has("groff"), "no groff on this system");
        CommandRun.of("manual", "--out", folder);
        try (var pages = Files.list(folder)) {
            for (Path page : pages.toList()) {
                String text = output("groff", "-man", "-Tascii", "-ww", "-P-cbou", page.toString());
                assertTrue(text.contains("NAME"), text);
                assertTrue(!text.contains("warning") && !text.contains("${"), text);
            }
        }
    }

    @Test
    void bashCompletesCommandsAndOptions() throws IOException, InterruptedException {
        Assumptions.assumeTrue(has("bash"), "no bash on this system");
        Path script = folder.resolve("completion");
        CommandRun run = CommandRun.of("completion");
        assertEquals(ExitCode.DONE, run.code());
        Files.writeString(script, run.out());
        assertTrue(completed(script, "so", 1).strip().endsWith("sort"), "commands");
        String options = completed(script, "sort --re", 2);
        assertTrue(options.contains("--resolution"), options);
    }

    private static String completed(Path script, String words, int word)
            throws IOException, InterruptedException {
        return output(
                "bash",
                "-c",
                "source "
                        + script
                        + "; COMP_WORDS=(emberline "
                        + words
                        + "); COMP_CWORD="
                        + word
                        + "; _complete_emberline; echo ${COMPREPLY[@]}");
    }
}
