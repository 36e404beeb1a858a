package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class CommandsTest {

    @TempDir private Path folder;

    private static Path demoSpectrum() throws IOException {
        List<String> lines = Files.readAllLines(DemoRun.survey());
        int column = List.of(lines.get(0).split(",")).indexOf("spectrum");
        return DemoRun.survey().resolveSibling(lines.get(1).split(",", -1)[column]);
    }

    @ParameterizedTest
    @ValueSource(strings = {"text", "csv", "json"})
    void measurePrintsEveryFeature(String format) throws IOException {
        CommandRun run = CommandRun.of("measure", demoSpectrum(), "--format", format);
        assertEquals(ExitCode.DONE, run.code(), run.err());
        assertTrue(run.out().contains("burgasser2006/h2o-j"), run.out());
        if (format.equals("json")) {
            assertTrue(run.out().startsWith("{"), run.out());
        }
    }

    @Test
    void placePrintsTypeAndGravity() throws IOException {
        CommandRun run = CommandRun.of("place", demoSpectrum(), "--format", "csv");
        assertEquals(ExitCode.DONE, run.code(), run.err());
        List<String> lines = run.out().lines().toList();
        assertEquals(2, lines.size());
        assertTrue(lines.get(0).startsWith("name,"), lines.get(0));
        assertTrue(lines.get(1).contains("M6"), lines.get(1));
    }

    /** A list of standards of the demo survey. */
    private Path standards() throws IOException {
        StringBuilder list = new StringBuilder("name,spectrum,medium,resolution,known_type\n");
        List<String> rows = Files.readAllLines(DemoRun.survey());
        List<String> types = List.of("M6", "M7", "M8", "M9", "L0", "L1");
        for (int k = 0; k < types.size(); k++) {
            String[] cells = rows.get(k + 1).split(",", -1);
            list.append(
                            String.join(
                                    ",",
                                    "S" + k,
                                    DemoRun.survey()
                                            .resolveSibling(cells[1])
                                            .toAbsolutePath()
                                            .toString(),
                                    cells[2],
                                    cells[3],
                                    types.get(k)))
                    .append('\n');
        }
        return Files.writeString(folder.resolve("standards.csv"), list);
    }

    @Test
    void placeShowsTheComparisonWithStandardsBesideThePosterior() throws IOException {
        Path standards = standards();
        CommandRun text = CommandRun.of("place", demoSpectrum(), "--standards", standards);
        assertEquals(ExitCode.DONE, text.code(), text.err());
        assertTrue(text.out().contains("standard_type"), text.out());
        assertTrue(text.out().contains("standards: best: S"), text.out());
        assertFalse(text.out().contains("best: S0 "), "the object itself: " + text.out());
        CommandRun json =
                CommandRun.of(
                        "place", demoSpectrum(), "--standards", standards, "--format", "json");
        assertTrue(json.out().contains("\"by_range\""), json.out());
        assertTrue(json.out().contains("\"best_standard\": \"S"), json.out());
        CommandRun without = CommandRun.of("place", demoSpectrum());
        assertFalse(without.out().contains("standard_type"), without.out());
    }

    @Test
    void reportTakesStandardsAndABadListStopsEverything() throws IOException {
        Path out = folder.resolve("with-standards");
        CommandRun run =
                CommandRun.of("report", demoSpectrum(), "--standards", standards(), "--out", out);
        assertEquals(ExitCode.DONE, run.code(), run.err());
        Path bad =
                Files.writeString(
                        folder.resolve("bad.csv"), "name,spectrum,known_type\na,gone.csv,L1\n");
        CommandRun failed = CommandRun.of("place", demoSpectrum(), "--standards", bad);
        assertEquals(ExitCode.NOTHING_READ, failed.code());
        assertTrue(failed.err().contains("bad.csv: row 1, column spectrum: "), failed.err());
    }

    @Test
    void judgePrintsTheColumnsOfTheResults() {
        CommandRun run =
                CommandRun.of("judge", "--type", "L3", "--gravity", "VL-G", "--format", "json");
        assertEquals(ExitCode.DONE, run.code(), run.err());
        for (String key : List.of("p_substellar_070", "p_substellar", "p_substellar_075")) {
            assertTrue(run.out().contains("\"" + key + "\": 0.9"), run.out());
        }
        CommandRun several =
                CommandRun.of("judge", "--type", "M7", "T6", "--age", "4..6Gyr", "--format", "csv");
        List<String> lines = several.out().lines().toList();
        assertEquals(3, lines.size(), several.err());
        assertTrue(lines.get(1).contains(",stellar,"), lines.get(1));
        assertTrue(lines.get(2).contains(",substellar,"), lines.get(2));
    }

    @ParameterizedTest
    @CsvSource({
        "--age, ancient, 50..150Myr",
        "--aim, hot, metal-poor",
        "--decide, 0.4, 'such as 0.95,0.05'",
        "--gravity, LOW, INT-G",
        "--type-sigma, 0, above 0"
    })
    void whatCannotBeJudgedIsExplained(String option, String value, String words) {
        CommandRun run = CommandRun.of("judge", "--type", "L3", option, value);
        assertEquals(ExitCode.WRONG_USAGE, run.code());
        assertTrue(run.err().contains(option) && run.err().contains(words), run.err());
        assertEquals(ExitCode.WRONG_USAGE, CommandRun.of("judge", "--type", "G2").code());
    }

    @Test
    void reportBindsAndAttaches() throws IOException {
        CommandRun run =
                CommandRun.of("report", demoSpectrum(), "--out", folder, "--bind", "--attachments");
        assertTrue(run.out().contains("bound-reports.pdf"), run.out());
        for (String file :
                List.of(
                        "bound-reports.pdf",
                        "results.ecsv",
                        "results.vot",
                        "results.mrt",
                        "table.tex",
                        "sources.bib",
                        "methods.txt",
                        "emberline-object.schema.json")) {
            assertTrue(Files.size(folder.resolve(file)) > 100, file);
        }
    }

    @Test
    void reportWritesAPdfAndPrintsItsName() throws IOException {
        CommandRun run = CommandRun.of("report", demoSpectrum(), "--out", folder);
        assertEquals(ExitCode.DONE, run.code(), run.err());
        Path pdf = Path.of(run.out().strip());
        assertEquals("%PDF", new String(Files.readAllBytes(pdf), 0, 4, StandardCharsets.US_ASCII));
    }

    @Test
    void oneBadSpectrumDoesNotStopTheOthers() throws IOException {
        Path bad = folder.resolve("bad.csv");
        Files.writeString(bad, "");
        CommandRun run = CommandRun.of("place", bad, demoSpectrum(), "--format", "csv");
        assertEquals(ExitCode.SOME_FAILED, run.code());
        assertEquals(3, run.out().lines().count());
        assertTrue(run.err().contains("bad: failed: "), run.err());
        assertEquals(ExitCode.NOTHING_READ, CommandRun.of("place", bad).code());
    }

    @Test
    void catalogueListsAndFilters() {
        CommandRun all = CommandRun.of("catalogue", "--format", "csv");
        CommandRun water =
                CommandRun.of("catalogue", "--band", "H", "--molecule", "H2O", "--format", "csv");
        assertEquals(ExitCode.DONE, all.code());
        assertTrue(all.out().lines().count() > 170);
        assertTrue(water.out().lines().count() < 30);
        assertTrue(water.out().contains("burgasser2006/h2o-h"));
        assertTrue(!water.out().contains("ch4"));
    }

    @Test
    void catalogueListsRestLines() {
        CommandRun all = CommandRun.of("catalogue", "--lines", "--format", "csv");
        assertEquals(ExitCode.DONE, all.code());
        assertEquals(FeatureCatalogue.standard().restLines().size() + 1, all.out().lines().count());
        assertTrue(all.out().startsWith("species,vacuum_micron,purpose,source,"), all.out());
        // H alpha, 6562.80 angstrom in air, 6564.61 in vacuum
        assertTrue(all.out().contains("H I,0.656461"), all.out());
        CommandRun potassium = CommandRun.of("catalogue", "--lines", "--molecule", "k");
        assertTrue(potassium.out().lines().skip(1).allMatch(line -> line.startsWith("K I ")));
        assertTrue(potassium.out().lines().count() > 4, potassium.out());
        CommandRun json = CommandRun.of("catalogue", "--lines", "--format", "json");
        assertTrue(json.out().contains("\"vacuum_micron\""), json.out());
        for (String[] wrong :
                new String[][] {
                    {"catalogue", "--lines", "--band", "J"},
                    {"catalogue", "--lines", "reid1995/tio5"},
                    {"catalogue", "--lines", "--molecule", "Xx"}
                }) {
            assertEquals(ExitCode.WRONG_USAGE, CommandRun.of((Object[]) wrong).code());
        }
    }

    @Test
    void catalogueShowsOneDefinitionWithItsSource() {
        CommandRun run = CommandRun.of("catalogue", "allers2013/ki_j");
        assertEquals(ExitCode.DONE, run.code());
        for (String word :
                List.of("Allers", "from memory", "continuum_1", "vacuum", "gravity at M6")) {
            assertTrue(run.out().contains(word), run.out());
        }
    }

    @Test
    void catalogueShowsARelationWithItsCoefficients() {
        CommandRun run = CommandRun.of("catalogue", "burgasser2007/h2o-j");
        assertEquals(ExitCode.DONE, run.code());
        for (String word : List.of("19.49", "10.0 + 1.0 times", "rms", "Burgasser")) {
            assertTrue(run.out().contains(word), run.out());
        }
        assertTrue(
                CommandRun.of("catalogue", "reid1995/tio2", "--format", "json")
                        .out()
                        .startsWith("["));
        assertEquals(
                ExitCode.WRONG_USAGE,
                CommandRun.of("catalogue", "reid1995/tio5", "--band", "H").code());
    }

    @ParameterizedTest
    @CsvSource({"h2o-x, as 'catalogue' lists them", "nowhere/tio5, perhaps reid1995/tio5"})
    void anUnknownDefinitionIsExplained(String id, String words) {
        CommandRun run = CommandRun.of("catalogue", id);
        assertEquals(ExitCode.WRONG_USAGE, run.code());
        assertTrue(run.err().contains(words), run.err());
    }

    @Test
    void aBrokenCatalogueIsExplained() throws IOException {
        Files.createDirectory(folder.resolve("features"));
        Files.writeString(folder.resolve("features/mine2026.csv"), "id,nonsense\nx,y\n");
        CommandRun run = CommandRun.of("catalogue", "--catalogue", folder);
        assertEquals(ExitCode.WRONG_USAGE, run.code());
        assertTrue(
                run.err().contains("--catalogue") && run.err().contains("mine2026.csv"), run.err());
    }

    @Test
    void versionAndHelpAreThere() {
        assertTrue(CommandRun.of("--version").out().startsWith("emberline "));
        for (String command : List.of("sort", "measure", "place", "report", "catalogue")) {
            CommandRun help = CommandRun.of(command, "--help");
            assertEquals(ExitCode.DONE, help.code());
            assertTrue(help.out().contains("Usage: emberline " + command), help.out());
        }
        assertEquals(ExitCode.WRONG_USAGE, CommandRun.of().code());
        assertEquals(ExitCode.WRONG_USAGE, CommandRun.of("place").code());
    }
}
