package emberline.reports.ledger;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.reports.Samples;
import emberline.reports.attach.RunJson;
import emberline.reports.attach.SafeFileNames;
import emberline.reports.note.MethodsUsed;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.sqlite.SQLiteErrorCode;

class RunLedgerTest {

    @TempDir private Path folder;

    private static RunIdentity identity(String part, String... options) {
        Map<String, String> all =
                options.length == 0
                        ? Map.of("prior", "flat")
                        : Map.of("prior", options[0], "site", "dry");
        return new RunIdentity(
                "0.1.0", all, Map.of(), 7, "list.csv", "ab12", List.of("name", "spectrum"), part);
    }

    private static RunLedger.Rows names(List<String> names) {
        return taker -> {
            for (int i = 0; i < names.size(); i++) {
                taker.take(i + 1, names.get(i), true);
            }
        };
    }

    private static ObjectEntry entry(RunIdentity identity, String stem, ObjectResult result)
            throws IOException {
        MethodsUsed methods = new MethodsUsed(Samples.CATALOGUE);
        methods.add(result);
        return new ObjectEntry(
                stem,
                "sum of " + stem,
                identity.columns().stream().map(column -> column.text(result)).toList(),
                "[\"" + stem + "\"]",
                methods.text(),
                RunJson.inputs(result),
                10,
                -1,
                0.5);
    }

    private static List<String> stems(RunLedger ledger, int rows) throws IOException {
        List<String> stems = new ArrayList<>();
        for (int row = 1; row <= rows; row++) {
            stems.add(ledger.planned(row).orElseThrow().stem());
        }
        return stems;
    }

    @Test
    void stemsAreThoseOfAllNamesAtOnce() throws IOException {
        List<String> names =
                List.of(
                        "A",
                        "a",
                        "b/c",
                        "b_c",
                        "x",
                        "x",
                        "x",
                        "con",
                        "",
                        "Z 1",
                        "z_1",
                        ".hid",
                        "n".repeat(300),
                        "n".repeat(300) + "m",
                        "plain");
        try (RunLedger ledger = RunLedger.open(folder, identity(""))) {
            ledger.takeList(names(names));
            SafeFileNames expected = SafeFileNames.of(names);
            List<String> found = stems(ledger, names.size());
            for (int i = 0; i < names.size(); i++) {
                assertEquals(expected.stem(i), found.get(i), names.get(i));
            }
            assertEquals(names.size(), new HashSet<>(found).size());
            assertTrue(ledger.knowsStem("plain"));
            assertFalse(ledger.knowsStem("nothing"));
        }
    }

    @Test
    void whatIsRecordedComesBackInTheOrderOfTheList() throws IOException {
        RunIdentity identity = identity("");
        try (RunLedger ledger = RunLedger.open(folder, identity)) {
            ledger.takeList(names(List.of("one", "two", "three")));
            ledger.record(entry(identity, "three", Samples.failed("three", "gone")));
            ledger.record(entry(identity, "one", Samples.lDwarf()));
            ledger.commit();
            List<RunLedger.Recorded> all = new ArrayList<>();
            ledger.forEachDone(all::add);
            assertEquals(List.of("measured", "failed"), all.stream().map(r -> r.status()).toList());
            assertEquals("[\"one\"]", all.get(0).pageLine());
            assertEquals(RunJson.inputs(Samples.lDwarf()), all.get(0).inputs());
            assertEquals(List.of(), all.get(1).inputs());
            RunProgress progress = ledger.progress();
            assertEquals(3, progress.objects());
            assertEquals(2, progress.done());
            assertEquals("three", progress.failures().get(0).name());
            assertEquals("gone", progress.failures().get(0).reason());
            assertEquals("running", progress.state());
            ledger.end(false);
        }
        assertEquals("stopped", RunLedger.progress(folder).state());
        try (RunLedger ledger = RunLedger.open(folder, identity)) {
            assertEquals("", ledger.whyAnew());
            ledger.takeList(names(List.of("four", "one")));
            PlannedEntry.Done done = ledger.planned(2).orElseThrow().done().orElseThrow();
            assertEquals("sum of one", done.inputSha256());
            assertEquals(10, done.jsonBytes());
            assertEquals("measured", done.status());
            assertTrue(ledger.planned(1).orElseThrow().done().isEmpty());
            assertTrue(ledger.planned(3).isEmpty());
        }
    }

    @Test
    void whatIsNotCommittedIsGivenUp() throws IOException {
        RunIdentity identity = identity("");
        try (RunLedger ledger = RunLedger.open(folder, identity)) {
            ledger.takeList(names(List.of("one")));
            ledger.record(entry(identity, "one", Samples.lDwarf()));
        }
        assertEquals(0, RunLedger.progress(folder).done());
    }

    @Test
    void otherSettingsBeginAnew() throws IOException {
        try (RunLedger ledger = RunLedger.open(folder, identity(""))) {
            ledger.takeList(names(List.of("one")));
        }
        try (RunLedger ledger = RunLedger.open(folder, identity("", "volume"))) {
            assertTrue(ledger.whyAnew().contains("option prior was 'flat', is 'volume'"));
            assertTrue(ledger.planned(1).isEmpty());
        }
        LedgerException other =
                assertThrows(
                        LedgerException.class,
                        () -> RunLedger.open(folder, identity("2/3", "volume")).close());
        assertTrue(other.getMessage().contains("part 2/3"), other.getMessage());
    }

    private Path part(int number, int of, boolean complete, String... options) throws IOException {
        Path out = Files.createDirectories(folder.resolve("p" + number + "of" + of));
        RunIdentity identity = identity(number + "/" + of, options);
        try (RunLedger ledger = RunLedger.open(out, identity)) {
            ledger.takeList(
                    taker -> {
                        for (int row = 1; row <= 4; row++) {
                            taker.take(row, "n" + row, row % of + 1 == number);
                        }
                    });
            for (int row = 1; row <= 4; row++) {
                if (row % of + 1 == number) {
                    ledger.record(entry(identity, "n" + row, Samples.failed("n" + row, "gone")));
                }
            }
            ledger.end(complete);
        }
        return out;
    }

    @Test
    void partsAreJoinedInTheOrderOfTheList() throws IOException {
        List<Path> parts = List.of(part(2, 2, true), part(1, 2, true));
        RunIdentity whole = LedgerMerge.checked(parts);
        assertEquals("", whole.part());
        Path out = Files.createDirectories(folder.resolve("whole"));
        try (RunLedger ledger = RunLedger.open(out, whole)) {
            LedgerMerge.copy(ledger, parts);
            List<String> names = new ArrayList<>();
            ledger.forEachDone(recorded -> names.add(recorded.cells().get(0)));
            assertEquals(List.of("n1", "n2", "n3", "n4"), names);
        }
    }

    private static String refusal(List<Path> parts) {
        return assertThrows(LedgerException.class, () -> LedgerMerge.checked(parts)).getMessage();
    }

    @Test
    void whatDoesNotBelongTogetherIsNotJoined() throws IOException {
        Path one = part(1, 2, true);
        assertTrue(refusal(List.of(one, part(2, 2, false))).contains("stopped"));
        assertTrue(refusal(List.of(one, part(2, 2, true, "volume"))).contains("option site"));
        assertTrue(refusal(List.of(one, part(1, 3, true))).contains("part 2/2 missing"));
        assertTrue(refusal(List.of(one, folder.resolve("gone"))).contains("no such file"));
    }

    @Test
    void failuresOfTheDatabaseAreExplained() throws IOException {
        Path file = folder.resolve("x");
        LedgerException full =
                LedgerException.of(
                        file, new SQLException("full", "", SQLiteErrorCode.SQLITE_FULL.code));
        assertTrue(full.isDiskFull());
        assertTrue(full.getMessage().contains("Make space"), full.getMessage());
        LedgerException other =
                LedgerException.of(
                        file, new SQLException("locked", "", SQLiteErrorCode.SQLITE_BUSY.code));
        assertFalse(other.isDiskFull());
        assertNotEquals(full.getMessage(), other.getMessage());
        Files.createFile(folder.resolve(RunLedger.FILE));
        LedgerException empty =
                assertThrows(LedgerException.class, () -> RunLedger.progress(folder));
        assertTrue(empty.getMessage().contains("without the tables"), empty.getMessage());
    }

    @Test
    void methodsAddedAsTextAreThoseOfTheResults() {
        List<ObjectResult> results =
                List.of(Samples.lDwarf(), Samples.tDwarf(), Samples.failed("x", "gone"));
        MethodsUsed direct = new MethodsUsed(Samples.CATALOGUE);
        MethodsUsed byText = new MethodsUsed(Samples.CATALOGUE);
        for (ObjectResult result : results) {
            direct.add(result);
            MethodsUsed alone = new MethodsUsed(Samples.CATALOGUE);
            alone.add(result);
            byText.add(result.status().word(), alone.text());
        }
        assertEquals(direct.bibtex(), byText.bibtex());
        assertEquals(direct.text(), byText.text());
        assertFalse(direct.papers().isEmpty());
        IllegalArgumentException unknown =
                assertThrows(
                        IllegalArgumentException.class,
                        () -> byText.add("measured", "GRAVITY=nobody1999"));
        assertTrue(unknown.getMessage().contains("--catalogue"), unknown.getMessage());
    }
}
