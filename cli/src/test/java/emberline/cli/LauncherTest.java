package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The launcher with a Java that only says what it was asked to do. */
class LauncherTest {

    @TempDir private Path folder;

    private Path home;

    @BeforeEach
    void install() throws IOException {
        Assumptions.assumeTrue(Files.isExecutable(Path.of("/bin/sh")), "no sh on this system");
        home = Files.createDirectory(folder.resolve("home with blanks"));
        script(Files.copy(Path.of("src/main/dist/emberline"), home.resolve("emberline")));
        Files.writeString(home.resolve("emberline.jar"), "");
        Path java = folder.resolve("java");
        Files.writeString(java, "#!/bin/sh\nfor word; do printf '<%s>' \"$word\"; done\nexit 3\n");
        script(java);
    }

    private static Path script(Path file) throws IOException {
        return Files.setPosixFilePermissions(file, PosixFilePermissions.fromString("rwxr-xr-x"));
    }

    private CommandRun run(Map<String, String> more, Path directory, String... command)
            throws IOException, InterruptedException {
        ProcessBuilder builder = new ProcessBuilder(command).directory(directory.toFile());
        builder.environment().remove("JAVA_HOME");
        builder.environment().put("EMBERLINE_JAVA", folder.resolve("java").toString());
        builder.environment().putAll(more);
        Process process = builder.start();
        String out = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        String err = new String(process.getErrorStream().readAllBytes(), StandardCharsets.UTF_8);
        assertTrue(process.waitFor(60, TimeUnit.SECONDS), "the launcher does not end");
        return new CommandRun(process.exitValue(), out, err);
    }

    /** Options for a command that is soon over, then the jar. */
    private String quick() throws IOException {
        return "<-XX:TieredStopAtLevel=1><-XX:+UseSerialGC>" + jar();
    }

    private String jar() throws IOException {
        return "<-jar><" + home.toRealPath().resolve("emberline.jar") + ">";
    }

    @Test
    void wordsAndExitCodeArePassedOn() throws IOException, InterruptedException {
        CommandRun run =
                run(Map.of(), folder, home.resolve("emberline").toString(), "place", "a b.csv", "");
        assertEquals(quick() + "<place><a b.csv><>", run.out(), run.err());
        assertEquals(3, run.code());
    }

    @Test
    void linksToLinksAreFollowed() throws IOException, InterruptedException {
        Path bin = Files.createDirectory(folder.resolve("bin"));
        Files.createSymbolicLink(folder.resolve("first"), home.resolve("emberline"));
        Files.createSymbolicLink(bin.resolve("emberline"), Path.of("../first"));
        CommandRun absolute = run(Map.of(), folder, bin.resolve("emberline").toString());
        assertEquals(quick(), absolute.out(), absolute.err());
        CommandRun byPath =
                run(
                        Map.of("PATH", bin + ":" + System.getenv("PATH")),
                        home,
                        "sh",
                        "-c",
                        "emberline doctor");
        assertEquals(quick() + "<doctor>", byPath.out(), byPath.err());
    }

    @Test
    void optionsForJavaAndItsOwnRuntimeAreUsed() throws IOException, InterruptedException {
        CommandRun options =
                run(
                        Map.of("EMBERLINE_JAVA_OPTIONS", "-Xmx4g -Dx=y"),
                        folder,
                        home.resolve("emberline").toString());
        assertEquals("<-Xmx4g><-Dx=y>" + jar(), options.out(), options.err());
        Path own = Files.createDirectories(home.resolve("runtime/bin")).resolve("java");
        Files.writeString(own, "#!/bin/sh\necho own\n");
        script(own);
        assertEquals("own\n", run(Map.of(), folder, home.resolve("emberline").toString()).out());
    }

    /** A long run profits from the second compiler, and so does a long list of spectra. */
    @Test
    void longRunsAreCompiledInFull() throws IOException, InterruptedException {
        String launcher = home.resolve("emberline").toString();
        CommandRun sort = run(Map.of(), folder, launcher, "sort", "list.csv");
        assertEquals(jar() + "<sort><list.csv>", sort.out(), sort.err());
        CommandRun many =
                run(Map.of(), folder, "sh", "-c", "'" + launcher + "' place 1 2 3 4 5 6 7 8 9");
        assertTrue(many.out().startsWith(jar() + "<place><1>"), many.out());
    }

    /** Java would crash on an archive that was cut off, and cannot use two. */
    @Test
    void anArchiveOfClassesIsUsedWhereItIsWhole() throws IOException, InterruptedException {
        String launcher = home.resolve("emberline").toString();
        Path archive = Files.writeString(home.resolve("emberline.jsa"), "0123456789");
        String with =
                "<-Xlog:cds=off><-XX:SharedArchiveFile="
                        + home.toRealPath().resolve("emberline.jsa")
                        + ">";
        assertEquals(quick(), run(Map.of(), folder, launcher).out());
        Path size = Files.writeString(home.resolve("emberline.jsa.bytes"), "10\n");
        assertEquals(with + quick(), run(Map.of(), folder, launcher).out());
        assertEquals(
                with + jar() + "<sort><a.csv>",
                run(Map.of(), folder, launcher, "sort", "a.csv").out());
        Map<String, String> other =
                Map.of("EMBERLINE_JAVA_OPTIONS", "-XX:SharedArchiveFile=/other.jsa");
        assertEquals(
                "<-XX:SharedArchiveFile=/other.jsa>" + jar(), run(other, folder, launcher).out());
        Files.writeString(archive, "012345678");
        assertEquals(quick(), run(Map.of(), folder, launcher).out());
        Files.writeString(size, "");
        CommandRun noSize = run(Map.of(), folder, launcher);
        assertEquals(quick(), noSize.out());
        assertEquals("", noSize.err());
    }

    @Test
    void withoutAJarTheRuntimeHoldsTheProgram() throws IOException, InterruptedException {
        Files.delete(home.resolve("emberline.jar"));
        Path own = Files.createDirectories(home.resolve("runtime/bin")).resolve("java");
        script(Files.copy(folder.resolve("java"), own));
        CommandRun run =
                run(Map.of(), folder, home.resolve("emberline").toString(), "sort", "a b.csv");
        assertEquals("<-m><emberline/emberline.cli.Emberline><sort><a b.csv>", run.out());
    }

    @Test
    void whatIsMissingIsSaid() throws IOException, InterruptedException {
        CommandRun noJava =
                run(
                        Map.of("EMBERLINE_JAVA", folder.resolve("none").toString()),
                        folder,
                        home.resolve("emberline").toString());
        assertEquals(4, noJava.code());
        assertTrue(noJava.err().contains("expected Java 17 or newer"), noJava.err());
        Files.delete(home.resolve("emberline.jar"));
        CommandRun noJar = run(Map.of(), folder, home.resolve("emberline").toString());
        assertEquals(4, noJar.code());
        assertTrue(noJar.err().contains("expected the jar beside this script"), noJar.err());
        assertEquals(List.of(), noJar.out().lines().toList());
    }
}
