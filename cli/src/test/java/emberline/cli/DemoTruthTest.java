package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.api.io.TempDir;

/**
 * The demo survey, sorted, beside what the simulator put in. What is found wrong is held too, so
 * that {@code demo-objects/README.md} stays true: a change for the better must change it there.
 */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class DemoTruthTest {

    private final Map<String, NamedCsvRecord> truth = new LinkedHashMap<>();
    private final Map<String, NamedCsvRecord> found = new LinkedHashMap<>();
    private Path out;

    @BeforeAll
    void sortTheSurvey(@TempDir Path folder) throws IOException {
        out = folder.resolve("out");
        CommandRun run = CommandRun.of("sort", DemoRun.survey(), "--out", out, "--no-reports");
        assertEquals(ExitCode.DONE, run.code(), run.err());
        read(DemoRun.survey().resolveSibling("truth.csv"), truth);
        read(out.resolve("results.csv"), found);
    }

    private static void read(Path table, Map<String, NamedCsvRecord> rows) throws IOException {
        try (CsvReader<NamedCsvRecord> csv = CsvReader.builder().ofNamedCsvRecord(table)) {
            csv.forEach(row -> rows.put(row.getField("name"), row));
        }
    }

    private NamedCsvRecord found(String name) {
        return found.get("Tamarisk-" + name);
    }

    /** Names of the objects of which the truth has certain words in certain columns. */
    private List<String> where(String... columnsAndWords) {
        return found.keySet().stream()
                .filter(
                        name -> {
                            boolean all = true;
                            for (int k = 0; k < columnsAndWords.length; k += 2) {
                                String cell = truth.get(name).getField(columnsAndWords[k]);
                                all &= cell.equals(columnsAndWords[k + 1]);
                            }
                            return all;
                        })
                .toList();
    }

    /** Single dwarfs of solar metallicity that have a spectrum. */
    private List<String> plainDwarfs() {
        return where("kind", "late dwarf", "metallicity", "d", "pair_type_number", "").stream()
                .filter(name -> !truth.get(name).getField("spectra").equals("0"))
                .toList();
    }

    private double typeError(String name) {
        return Double.parseDouble(found.get(name).getField("type_number"))
                - Double.parseDouble(truth.get(name).getField("type_number"));
    }

    private List<String> notAs(List<String> names, String column, String expected) {
        return names.stream()
                .filter(name -> !found.get(name).getField(column).equals(expected))
                .map(name -> name.substring("Tamarisk-".length()))
                .toList();
    }

    /** Where the published relations agree nowhere, none is said to be far from the others. */
    @Test
    void relationsAreFarFromTheOthersOnlyWhereOthersAgree() throws IOException {
        int agreeNowhere = 0;
        for (NamedCsvRecord row : found.values()) {
            if (row.getField("published_type").isEmpty()) {
                String json =
                        Files.readString(out.resolve("objects/" + row.getField("name") + ".json"));
                assertFalse(json.contains("where the others agree"), row.getField("name"));
                agreeNowhere += json.contains("no two relations agree on a type") ? 1 : 0;
            }
        }
        assertTrue(agreeNowhere >= 1, "the metal-poor M6 is one");
    }

    @Test
    void typesOfSingleDwarfsAreFoundWithinASubclass() {
        List<String> dwarfs = plainDwarfs();
        assertEquals(30, dwarfs.size());
        List<String> off = dwarfs.stream().filter(name -> Math.abs(typeError(name)) > 1.0).toList();
        assertEquals(List.of("Tamarisk-0316-0102"), off, "the grism of R = 40");
        double square = dwarfs.stream().mapToDouble(name -> Math.pow(typeError(name), 2)).sum();
        assertTrue(Math.sqrt(square / dwarfs.size()) < 0.45);
        for (String name : dwarfs) {
            NamedCsvRecord row = found.get(name);
            double type = Double.parseDouble(truth.get(name).getField("type_number"));
            assertTrue(Double.parseDouble(row.getField("type_lo95")) <= type, name);
            assertTrue(Double.parseDouble(row.getField("type_hi95")) >= type, name);
        }
    }

    @Test
    void kindsAreFoundButForFour() {
        assertEquals(List.of(), notAs(where("kind", "late dwarf"), "kind", "late dwarf"));
        assertEquals(List.of(), notAs(where("kind", "early star"), "kind", "early star"));
        assertEquals(List.of(), notAs(where("kind", "carbon star"), "kind", "carbon star"));
        assertEquals(
                List.of(),
                notAs(where("kind", "reddened background"), "kind", "reddened background"));
        assertEquals(
                List.of("0714-0352", "0722+0105"), notAs(where("kind", "giant"), "kind", "giant"));
        assertEquals(
                List.of("0431+0221", "0801-0417"),
                notAs(where("kind", "extragalactic"), "kind", "extragalactic"));
        assertEquals("late dwarf", found("0714-0352").getField("kind"), "a very late giant");
        assertEquals("late dwarf", found("0722+0105").getField("kind"), "a noisy giant");
        for (String code : List.of("kind-unsure", "no-bands", "colours-unlike-type")) {
            assertTrue(found("0722+0105").getField("findings").contains(code), code);
        }
        assertEquals("unlike known", found("0431+0221").getField("kind"), "a quasar");
        assertEquals("late dwarf", found("0801-0417").getField("kind"), "a quasar by colours");
    }

    @Test
    void gravityClassesAreFound() {
        assertEquals(
                List.of("0459+0346"),
                notAs(where("kind", "late dwarf", "gravity", "VL-G"), "gravity", "VL-G"));
        assertEquals("INT-G", found("0459+0346").getField("gravity"));
        assertTrue(
                found("0459+0346").getField("findings").contains("gravity-class-unsure"),
                "an optical spectrum alone");
        assertEquals(
                List.of(),
                notAs(where("kind", "late dwarf", "gravity", "INT-G"), "gravity", "INT-G"));
        for (String name : plainDwarfs()) {
            String gravity = found.get(name).getField("gravity");
            assertTrue(
                    !truth.get(name).getField("gravity").equals("FLD-G")
                            || gravity.matches("|FLD-G"),
                    name + ": " + gravity);
        }
    }

    @Test
    void twoOfThreePairsAreFoundAndNoSingleObjectIsCalledOne() {
        TreeSet<String> candidates = new TreeSet<>();
        for (NamedCsvRecord row : found.values()) {
            if (row.getField("pair").equals("candidate")) {
                candidates.add(row.getField("name"));
            }
        }
        assertEquals(
                new TreeSet<>(List.of("Tamarisk-0650+0419", "Tamarisk-0658-0056")), candidates);
        assertEquals("8.0", truth.get("Tamarisk-0706+0244").getField("type_number"));
    }

    @Test
    void metallicityIsToldInOneOfThreeSubdwarfsAndNeverWrongly() {
        assertEquals("sd", found("0627-0229").getField("metallicity"));
        assertEquals("", found("0634+0310").getField("metallicity"), "taken for an L dwarf");
        assertEquals("", found("0642-0147").getField("metallicity"), "infrared alone");
        for (String name : plainDwarfs()) {
            assertTrue(found.get(name).getField("metallicity").matches("|d"), name);
        }
        assertTrue(typeError("Tamarisk-0634+0310") > 4, "taken for an L dwarf");
    }

    @Test
    void lithiumVelocityAndSpoiltFilesAreTold() throws IOException {
        String lithium = Files.readString(out.resolve("objects/Tamarisk-0459+0346.json"));
        assertTrue(lithium.contains("Li I 6708 seen"), "lithium");
        assertTrue(found("0627-0229").getField("findings").contains("velocity-left-in"));
        for (String name : List.of("0809+0206", "0817-0321")) {
            assertEquals("partial", found(name).getField("status"));
            assertTrue(found(name).getField("findings").contains("spectrum-unreadable"));
        }
        assertTrue(found("0809+0206").getField("reason").contains("cut off"));
        assertTrue(found("0817-0321").getField("reason").contains("in micron"));
        for (String name : where("spectra", "0")) {
            assertEquals("photometric", found.get(name).getField("status"));
        }
    }

    @Test
    void spoiltObjectsAreRowsWithTheirReason(@TempDir Path folder) throws IOException {
        Path spoilt = DemoRun.survey().resolveSibling("spoilt.csv");
        CommandRun run = CommandRun.of("sort", spoilt, "--out", folder, "--no-reports");
        assertEquals(ExitCode.SOME_FAILED, run.code(), run.err());
        Map<String, NamedCsvRecord> rows = new LinkedHashMap<>();
        read(folder.resolve("results.csv"), rows);
        List<String> reasons = List.of("no such file", "cut off", "in micron", "flux unit 'K'");
        List<NamedCsvRecord> list = List.copyOf(rows.values());
        assertEquals(5, list.size());
        for (int k = 0; k < reasons.size(); k++) {
            assertEquals("failed", list.get(k).getField("status"));
            assertTrue(list.get(k).getField("reason").contains(reasons.get(k)), reasons.get(k));
        }
        NamedCsvRecord misstated = list.get(4);
        assertEquals("measured", misstated.getField("status"));
        assertTrue(misstated.getField("findings").contains("reddening-not-believed"));
        assertTrue(misstated.getField("findings").contains("kind-unsure"));
    }
}
