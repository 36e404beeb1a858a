package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CalibrateCommandTest {

    @TempDir private Path folder;

    @Test
    void aListBecomesAReferenceTableWithoutPixels() throws Exception {
        CommandRun run =
                CommandRun.of(
                        "calibrate",
                        DemoRun.survey(),
                        "--out",
                        folder,
                        "--velocity",
                        10,
                        "--av",
                        0.1,
                        "--to-rest",
                        "--site",
                        "wet");
        assertEquals(ExitCode.DONE, run.code(), run.err());
        List<String> lines = Files.readAllLines(folder.resolve("reference.csv"));
        List<String> rows = lines.stream().filter(line -> !line.startsWith("#")).toList();
        assertEquals(Files.readAllLines(DemoRun.survey()).size(), rows.size());
        assertTrue(rows.get(0).startsWith("object,group,type_number,gravity,kind,tier,source"));
        assertTrue(rows.get(0).contains("burgasser2006/h2o-j,burgasser2006/h2o-j sigma"));
    }

    @Test
    void aListThatIsNotThereIsRefused() {
        CommandRun run = CommandRun.of("calibrate", folder.resolve("no.csv"), "--out", folder);
        assertEquals(ExitCode.NOTHING_READ, run.code());
        assertTrue(run.err().contains("no.csv"), run.err());
    }
}
