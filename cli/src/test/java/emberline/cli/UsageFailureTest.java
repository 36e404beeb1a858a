package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class UsageFailureTest {

    @TempDir private Path folder;

    @ParameterizedTest
    @CsvSource({
        "srot list.csv --out x, sort, emberline",
        "plaec a.csv, place, emberline",
        "catalog, catalogue, emberline",
        "doctr, doctor, emberline",
        "--versoin, --version, emberline",
        "sort list.csv --otu x, --out, emberline sort",
        "sort list.csv --out x --resoluton 100, --resolution, emberline sort",
        "sort list.csv --out x --resoluton=100, --resolution, emberline sort",
        "measure a.csv --formt csv, --format, emberline measure",
        "judge --tpye L3, --type, emberline judge",
        "check known.csv --leaveout, --leave-out, emberline check"
    })
    void theMisspeltWordIsAskedAboutAndTheHelpIsNamed(String line, String meant, String command) {
        CommandRun run = CommandRun.of((Object[]) line.split(" ", -1));
        assertEquals(ExitCode.WRONG_USAGE, run.code());
        assertTrue(run.err().contains("Did you mean " + meant + "?"), run.err());
        assertTrue(run.err().contains("'" + command + " --help'"), run.err());
        assertEquals(3, run.err().lines().count(), run.err());
    }

    @ParameterizedTest
    @CsvSource({
        "sort list.csv, --out",
        "sort, LIST",
        "sort list.csv --out x --seed many, many",
        "place a.csv --site moon, --site",
        "judge, --type",
        "sort list.csv --out x --verbose, --verbose"
    })
    void otherMistakesAreSaidWithoutTheWholeHelp(String line, String word) {
        CommandRun run = CommandRun.of((Object[]) line.split(" ", -1));
        assertEquals(ExitCode.WRONG_USAGE, run.code());
        assertTrue(run.err().contains(word), run.err());
        assertFalse(run.err().contains("Did you mean"), run.err());
        assertFalse(run.err().contains("Usage:"), run.err());
        assertEquals(2, run.err().lines().count(), run.err());
    }

    @Test
    void aMisspeltColumnOfTheListIsAskedAbout() throws IOException {
        Path list = folder.resolve("list.csv");
        Files.writeString(list, "name,spectrum,paralax_mas\na,none.csv,12\n");
        CommandRun run =
                CommandRun.of("sort", list, "--out", folder.resolve("out"), "--no-reports");
        assertTrue(
                run.err()
                        .contains(
                                "list.csv: column 'paralax_mas' is not used, only carried along;"
                                        + " did you mean parallax_mas?"),
                run.err());
    }
}
