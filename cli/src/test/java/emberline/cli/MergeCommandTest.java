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

class MergeCommandTest {

    private static final int PARTS = 10;

    @TempDir private Path folder;

    private Path list;

    private Path part(int number, int of, Object... more) throws IOException {
        Path out = folder.resolve("part-" + number);
        List<Object> words =
                new ArrayList<>(List.of("sort", list, "--out", out, "--part", number + "/" + of));
        words.addAll(List.of(more));
        CommandRun run = CommandRun.of(words.toArray());
        assertEquals(ExitCode.DONE, run.code(), run.err());
        return out;
    }

    private CommandRun merge(List<Path> parts) {
        List<Object> words = new ArrayList<>(List.of("merge"));
        words.addAll(parts);
        words.addAll(List.of("--out", folder.resolve("merged")));
        return CommandRun.of(words.toArray());
    }

    private void assertRefused(List<Path> parts, String... words) {
        CommandRun run = merge(parts);
        assertEquals(ExitCode.NOT_WRITTEN, run.code(), run.err());
        for (String word : words) {
            assertTrue(run.err().contains(word), run.err());
        }
    }

    @Test
    void tenPartsMergedEqualTheSingleRun() throws IOException {
        list = DemoRun.survey();
        int listed = Files.readAllLines(list).size() - 1;
        List<Path> parts = new ArrayList<>();
        int rows = 0;
        for (int number = 1; number <= PARTS; number++) {
            parts.add(0, part(number, PARTS));
            rows += Files.readAllLines(parts.get(0).resolve("results.csv")).size() - 1;
        }
        assertEquals(listed, rows);
        CommandRun run = merge(parts);
        assertEquals(ExitCode.DONE, run.code(), run.err());
        Path single = folder.resolve("single");
        CommandRun.of("sort", list, "--out", single);
        assertEquals(List.of(), RunFiles.differences(single, folder.resolve("merged")));
        assertTrue(RunFiles.of(single).size() > 2 * listed, "JSON files, reports, tables");
        CommandRun again = CommandRun.of("sort", list, "--out", folder.resolve("merged"));
        assertTrue(again.err().contains(listed + " of them unchanged"), again.err());
    }

    @Test
    void whatDoesNotBelongTogetherIsRefused() throws IOException {
        StringBuilder text = new StringBuilder("name,spectrum\n");
        for (int i = 0; i < 12; i++) {
            text.append("n" + i + ",s.csv\n");
        }
        StringBuilder spectrum = new StringBuilder("wavelength_um,flux,sigma\n");
        for (int i = 0; i < 300; i++) {
            spectrum.append(0.9 + i * 0.005 + "," + (1 + 0.1 * Math.sin(i * 0.05)) + ",0.02\n");
        }
        Files.writeString(folder.resolve("s.csv"), spectrum);
        list = Files.writeString(folder.resolve("list.csv"), text);
        Path one = part(1, 2, "--no-reports");
        Path two = part(2, 2, "--no-reports", "--prior", "volume");
        assertRefused(List.of(one), "part 2/2 missing", "all 2 parts");
        assertRefused(List.of(one, one), "holds too");
        assertRefused(List.of(one, two), "option prior was 'flat', is 'volume'", "same version");
        assertRefused(List.of(one, folder), "no such file");
        Files.writeString(list, text + "n12,s.csv\n");
        Path other = part(2, 2, "--no-reports");
        assertRefused(List.of(one, other), "another list");
        CommandRun otherPart =
                CommandRun.of("sort", list, "--out", one, "--part", "2/2", "--no-reports");
        assertEquals(ExitCode.NOT_WRITTEN, otherPart.code());
        assertTrue(otherPart.err().contains("part 1/2"), otherPart.err());
        CommandRun onto = CommandRun.of("merge", one, other, "--out", one);
        assertEquals(ExitCode.WRONG_USAGE, onto.code());
        CommandRun wrong = CommandRun.of("sort", list, "--out", one, "--part", "3/2");
        assertEquals(ExitCode.WRONG_USAGE, wrong.code());
        assertTrue(wrong.err().contains("expected i/n"), wrong.err());
    }
}
