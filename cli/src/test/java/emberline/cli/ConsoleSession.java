package emberline.cli;

import java.io.IOException;
import java.io.OutputStream;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;

/**
 * A session at a console in a folder of its own that holds the demo survey. The program runs within
 * this process with its paths taken from that folder; what follows it in a line (a pipe, a
 * redirection) and all other commands go to {@code sh}.
 */
final class ConsoleSession {

    private static final long PATIENCE_SECONDS = 60;

    private final Path folder;
    private int lastCode;

    private ConsoleSession(Path folder) {
        this.folder = folder;
    }

    /** A session in an empty folder, which gets a copy of the demo survey. */
    static ConsoleSession in(Path folder) throws IOException {
        Path survey = DemoRun.survey().toAbsolutePath().normalize().getParent();
        Path copy = folder.resolve("demo-objects/survey");
        try (Stream<Path> files = Files.walk(survey)) {
            for (Path file : files.toList()) {
                Path target = copy.resolve(survey.relativize(file).toString());
                if (Files.isDirectory(file)) {
                    Files.createDirectories(target);
                } else {
                    Files.copy(file, target);
                }
            }
        }
        return new ConsoleSession(folder);
    }

    /** The exit code of the last command. */
    int lastCode() {
        return lastCode;
    }

    /** Runs a command; what it prints as result and beside, with paths as seen from the folder. */
    List<String> run(String command) throws IOException, InterruptedException {
        if (command.equals("echo $?")) {
            String asked = Integer.toString(lastCode);
            lastCode = ExitCode.DONE;
            return List.of(asked);
        }
        Optional<ShellWords> call = ShellWords.ofLine(command);
        String printed = call.isPresent() ? program(call.get()) : shell(command, "");
        return printed.replace(folder + "/", "").lines().map(String::stripTrailing).toList();
    }

    private String program(ShellWords call) throws IOException, InterruptedException {
        StringWriter beside = new StringWriter();
        boolean piped = !call.rest().isEmpty();
        StringWriter result = piped ? new StringWriter() : beside;
        int code =
                Emberline.commandLine(new PrintWriter(result), new PrintWriter(beside))
                        .registerConverter(Path.class, folder::resolve)
                        .execute(call.words().toArray(String[]::new));
        String passedOn = piped ? shell("cat " + call.rest(), result.toString()) : "";
        lastCode = code;
        return beside + passedOn;
    }

    private String shell(String command, String input) throws IOException, InterruptedException {
        ProcessBuilder builder =
                new ProcessBuilder("sh", "-c", command)
                        .directory(folder.toFile())
                        .redirectErrorStream(true);
        builder.environment().put("LC_ALL", "C.UTF-8");
        Process process = builder.start();
        try (OutputStream in = process.getOutputStream()) {
            in.write(input.getBytes(StandardCharsets.UTF_8));
        } catch (IOException e) {
            // the command ended before it read all, as head does
        }
        String printed =
                new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        if (!process.waitFor(PATIENCE_SECONDS, TimeUnit.SECONDS)) {
            process.destroyForcibly();
            throw new IllegalStateException("no end after " + PATIENCE_SECONDS + " s: " + command);
        }
        lastCode = process.exitValue();
        return printed;
    }
}
