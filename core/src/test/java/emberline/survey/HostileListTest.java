package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.read.CandidateList;
import emberline.read.CandidateListReader;
import emberline.read.UnreadableListException;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Lists that name what is no file of a spectrum, and lists that are no files themselves. */
class HostileListTest {

    private static final Duration SOON = Duration.ofSeconds(60);

    @TempDir private Path folder;

    private List<ObjectResult> run(String... rows) throws IOException {
        Path list = folder.resolve("list.csv");
        Files.writeString(list, "name,spectrum\n" + String.join("\n", rows) + "\n");
        CandidateList candidates = new CandidateListReader().read(list);
        Chain chain =
                new Chain(
                        FeatureCatalogue.standard(),
                        Measuring.withDefaults(),
                        SurveySettings.withDefaults());
        List<ObjectResult> results = new ArrayList<>();
        assertTimeoutPreemptively(
                SOON, () -> new SurveyRunner(chain, 2).run(candidates, one -> one, results::add));
        return results;
    }

    @ParameterizedTest
    @CsvSource({
        "/dev/zero, special file",
        "/dev/urandom, special file",
        "/dev/stdin, ''",
        "/proc/self/mem, ''",
        "/proc/self/fd/0, ''",
        "., folder",
        "/, folder",
        "../../../../../../etc/shadow.none, no such file",
        "http://127.0.0.1:9/x.fits, no such file",
        "file:///etc/hostname, no such file",
        "|touch made, no such file",
        "$(touch made), no such file",
        "none.fits[1], no such file",
        "'  ', no path"
    })
    void whatIsNoFileFailsItsRowOnly(String path, String words) throws IOException {
        List<ObjectResult> results = run("\"bad\",\"" + path + "\"", "other,none.csv");
        assertEquals(2, results.size());
        assertEquals(Status.FAILED, results.get(0).status(), results.get(0).reason());
        assertTrue(results.get(0).reason().contains(words), results.get(0).reason());
        assertFalse(results.get(0).reason().contains("internal error"), results.get(0).reason());
        assertTrue(results.get(1).reason().contains("none.csv: no such file"));
        assertFalse(Files.exists(folder.resolve("made")), "a command was run");
    }

    /** What looks like a blank is no name, whatever its code is, and ends no reading. */
    @ParameterizedTest
    @ValueSource(strings = {"\u2028", "\u2003", "\u3000\u2029", "\u205f", "\u00a0", "\u200b"})
    void blanksOfOtherScriptsAreNoNames(String name) throws IOException {
        List<ObjectResult> results = run(name + ",a.csv", "other,none.csv", "last," + name);
        assertEquals(3, results.size());
        for (ObjectResult result : results) {
            assertEquals(Status.FAILED, result.status());
            assertFalse(result.candidate().name().isBlank());
            assertFalse(result.reason().contains("internal error"), result.reason());
        }
    }

    @Test
    void pipesAreNotWaitedFor() throws IOException, InterruptedException {
        Path pipe = folder.resolve("pipe");
        Process make = new ProcessBuilder("mkfifo", pipe.toString()).start();
        Assumptions.assumeTrue(
                make.waitFor(20, TimeUnit.SECONDS) && make.exitValue() == 0, "no mkfifo here");
        Files.createSymbolicLink(folder.resolve("link"), pipe);
        for (String name : List.of("pipe", "link")) {
            String reason = run("a," + name).get(0).reason();
            assertTrue(reason.contains("a device, pipe or other special file"), reason);
        }
    }

    @Test
    void linksAreFollowedToFilesAndNoFurther() throws IOException {
        Path data = Files.createDirectory(folder.resolve("data"));
        Files.writeString(data.resolve("s.csv"), "wavelength_micron,flux\n1.0,1\n1.1,2\n");
        Files.createSymbolicLink(folder.resolve("good"), data.resolve("s.csv"));
        Files.createSymbolicLink(folder.resolve("gone"), data.resolve("none.csv"));
        Files.createSymbolicLink(folder.resolve("circle"), folder.resolve("circle"));
        Files.createSymbolicLink(folder.resolve("tree"), data);
        List<ObjectResult> results = run("a,good", "b,gone", "c,circle", "d,tree", "e,tree/s.csv");
        assertFalse(results.get(0).reason().contains("no such file"), results.get(0).reason());
        assertTrue(results.get(1).reason().contains("no such file"), results.get(1).reason());
        assertEquals(Status.FAILED, results.get(2).status(), results.get(2).reason());
        assertFalse(results.get(2).reason().contains("internal"), results.get(2).reason());
        assertTrue(results.get(3).reason().contains("a folder"), results.get(3).reason());
        assertFalse(results.get(4).reason().contains("no such file"), results.get(4).reason());
    }

    @ParameterizedTest
    @CsvSource({"/dev/zero", "/dev/null", "/proc/self/mem", "/proc/self/maps"})
    void aListThatIsNoFileIsRefused(String path) {
        Assumptions.assumeTrue(Files.exists(Path.of(path)), "no " + path + " on this system");
        assertTimeoutPreemptively(
                SOON,
                () -> {
                    try {
                        new CandidateListReader().read(Path.of(path));
                    } catch (UnreadableListException e) {
                        assertTrue(e.getMessage().contains("; expected "), e.getMessage());
                        return;
                    }
                    throw new AssertionError(path + " was read as a list");
                });
    }
}
