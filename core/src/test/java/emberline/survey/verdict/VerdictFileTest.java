package emberline.survey.verdict;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.GravityClass;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class VerdictFileTest {

    @TempDir private Path folder;

    private Verdicts read(String text) throws IOException {
        return VerdictFile.read(Files.writeString(folder.resolve("v.csv"), text));
    }

    private String fault(String text) {
        return assertThrows(UnreadableVerdictsException.class, () -> read(text)).getMessage();
    }

    @Test
    void everyColumnIsRead() throws IOException {
        Verdicts verdicts =
                read(
                        """
                        name,verdict,verdict_type,verdict_gravity,verdict_note
                        A,Giant,M7 III,,"strong CO, see ""night 3""
                        and night 4"
                        B,,L3.5,vl-g,
                        """);
        Verdict a = verdicts.of("A").orElseThrow();
        assertEquals(Optional.of(VerdictCall.GIANT), a.call());
        assertEquals("M7 III", a.type());
        assertEquals("strong CO, see \"night 3\"\nand night 4", a.note());
        Verdict b = verdicts.of("B").orElseThrow();
        assertEquals(Optional.of(GravityClass.VL_G), b.gravity());
        assertEquals("v.csv, line 4", verdicts.entries().get("B").where());
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "name;verdict;verdict_note~A;giant;x, y|x, y",
                "\ufeffname,verdict,verdict_note~A,giant,x|x",
                "NAME,other,Verdict,verdict_note~A,7,giant,x|x",
                "name,verdict,verdict_note~~A,giant,'=1+1|=1+1",
                "name,verdict,verdict_note~A,giant,'\uff1d1\uff0b1|\uff1d1\uff0b1",
                "name,verdict,verdict_note,mine,mine~A,giant,x,1,2|x",
                "name,verdict,verdict_note~A,giant,'tis bright|'tis bright"
            })
    void otherFormsAreRead(String file, String note) throws IOException {
        Verdict verdict = read(file.replace('~', '\n') + "\n").of("A").orElseThrow();
        assertEquals(Optional.of(VerdictCall.GIANT), verdict.call());
        assertEquals(note, verdict.note());
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "name,verdict~A,giant~B,gaint | v.csv, line 3, column verdict: 'gaint'; expected one of agree, substellar",
                "name,verdict_gravity~A,high | v.csv, line 2, column verdict_gravity: 'high'; expected FLD-G, INT-G, VL-G",
                "name,verdict~,giant | v.csv, line 2, column name: nothing; expected",
                "name,verdict~A,giant~A,stellar | v.csv, line 3, column name: another verdict on 'A' than in v.csv, line 2",
                "name,verdict~A,giant,x | v.csv, line 2, column row: 3 cells; expected 2",
                "name,kind~A,giant | v.csv, line 1: the columns name, kind; expected name and at least one of verdict",
                "object,verdict~A,giant | expected name and",
                "~~ | v.csv: empty; expected a line of names",
                "name,verdict_type~A,a type that is written out far too long for this | column verdict_type"
            })
    void aFaultSaysFileLineAndColumn(String file, String message) {
        String told = fault(file.replace('~', '\n') + "\n");
        assertTrue(told.contains(message), told);
    }

    @Test
    void allFaultsAreToldAtOnceButNotWithoutEnd() {
        StringBuilder text = new StringBuilder("name,verdict\n");
        for (int i = 0; i < 30; i++) {
            text.append("star").append(i).append(",wrong\n");
        }
        List<String> lines = fault(text.toString()).lines().toList();
        assertEquals(21, lines.size());
        assertTrue(lines.get(19).contains("line 21"), lines.get(19));
        assertTrue(lines.get(20).contains("10 faults more"), lines.get(20));
    }

    @Test
    void whatIsNoTextIsRefused() throws IOException {
        Path file = folder.resolve("v.csv");
        Files.write(file, "name,verdict_note\nA,caf\u00e9\n".getBytes(StandardCharsets.ISO_8859_1));
        assertTrue(
                assertThrows(UnreadableVerdictsException.class, () -> VerdictFile.read(file))
                        .getMessage()
                        .contains("not UTF-8"));
        Path missing = folder.resolve("none.csv");
        assertTrue(
                assertThrows(UnreadableVerdictsException.class, () -> VerdictFile.read(missing))
                        .getMessage()
                        .contains("no such file"));
    }

    @Test
    void newerVerdictsWinAndABlankOneTakesBack() throws IOException {
        Verdicts former = read("name,verdict\nA,giant\nB,stellar\nC,agree\n");
        Verdicts all = former.with(read("name,verdict\nB,substellar\nC,\n"));
        assertEquals(Optional.of(VerdictCall.GIANT), all.of("A").orElseThrow().call());
        assertEquals(Optional.of(VerdictCall.SUBSTELLAR), all.of("B").orElseThrow().call());
        assertEquals(Optional.empty(), all.of("C"));
        assertEquals(2, all.entries().size());
    }

    @Test
    void aNameThatIsNotListedIsTold() throws IOException {
        List<String> told = read("name,verdict\nA,giant\nAa,giant\n").strangers(List.of("A", "B"));
        assertEquals(1, told.size());
        assertTrue(told.get(0).startsWith("v.csv, line 3, column name: 'Aa'"), told.get(0));
    }

    @ParameterizedTest
    @CsvSource(
            nullValues = "-",
            value = {
                // call, type, gravity: what holds of L4, FLD-G, late dwarf, undecided
                "agree, '', -, L4, FLD-G, late dwarf, undecided",
                "substellar, '', -, L4, FLD-G, late dwarf, substellar",
                "stellar, '', -, L4, FLD-G, late dwarf, stellar",
                "giant, '', -, '', '', giant, ''",
                "giant, M7 III, -, M7 III, '', giant, ''",
                "bad data, '', -, '', '', '', ''",
                "'', L5, VL_G, L5, VL-G, late dwarf, undecided",
                "unlike known, '', -, '', '', unlike known, ''"
            })
    void theObserverOverridesTheProgram(
            String call,
            String type,
            GravityClass gravity,
            String heldType,
            String heldGravity,
            String heldKind,
            String heldDecision) {
        Verdict verdict = new Verdict(VerdictCall.of(call), type, Optional.ofNullable(gravity), "");
        assertEquals(heldType, verdict.type("L4"));
        assertEquals(heldGravity, verdict.gravity("FLD-G"));
        assertEquals(heldKind, verdict.kind("late dwarf"));
        assertEquals(heldDecision, verdict.decision("undecided"));
    }

    @Test
    void wordsHoldWhatIsSaid() {
        Verdict verdict =
                new Verdict(Optional.of(VerdictCall.GIANT), "M7 III", Optional.empty(), "see CO");
        assertEquals("giant, M7 III: see CO", verdict.words());
        assertTrue(new Verdict(Optional.empty(), " ", Optional.empty(), "\n").isBlank());
        assertThrows(
                IllegalArgumentException.class,
                () -> new Verdict(Optional.empty(), "x".repeat(41), Optional.empty(), ""));
    }
}
