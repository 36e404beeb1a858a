package emberline.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;

/** The program in a process of its own, which can be killed. */
final class ChildRun {

    private static final long PATIENCE_SECONDS = 300;

    private final Process process;
    private final Path said;

    private ChildRun(Process process, Path said) {
        this.process = process;
        this.said = said;
    }

    /** The words that start the program with the classes of this test. */
    static List<String> command(Object... arguments) {
        List<String> words = new ArrayList<>();
        words.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
        words.add("-Xmx512m");
        words.add("-XX:TieredStopAtLevel=1");
        words.add("-cp");
        words.add(System.getProperty("java.class.path"));
        words.add(Emberline.class.getName());
        for (Object argument : arguments) {
            words.add(argument.toString());
        }
        return words;
    }

    static ChildRun start(Path said, Object... arguments) throws IOException {
        return new ChildRun(
                new ProcessBuilder(command(arguments))
                        .redirectErrorStream(true)
                        .redirectOutput(said.toFile())
                        .start(),
                said);
    }

    /** Waits for the end and tells the exit code. */
    int end() throws InterruptedException {
        if (!process.waitFor(PATIENCE_SECONDS, TimeUnit.SECONDS)) {
            process.destroyForcibly();
            throw new IllegalStateException("no end after " + PATIENCE_SECONDS + " s");
        }
        return process.exitValue();
    }

    String said() throws IOException {
        return Files.readString(said);
    }

    long pid() {
        return process.pid();
    }

    boolean runs() {
        return process.isAlive();
    }

    /** SIGKILL: the process cannot do anything about it. */
    void kill() throws InterruptedException {
        process.destroyForcibly().waitFor();
    }

    /** Sends a signal by its name. */
    void signal(String name) throws IOException, InterruptedException {
        new ProcessBuilder("kill", "-" + name, Long.toString(pid())).start().waitFor();
    }

    /** Waits until a file is there, or the process is at its end. */
    void awaitFile(Path file) throws InterruptedException {
        while (runs() && !Files.exists(file)) {
            Thread.sleep(5);
        }
    }
}
