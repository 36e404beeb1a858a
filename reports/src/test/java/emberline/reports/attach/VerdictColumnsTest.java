package emberline.reports.attach;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.GravityClass;
import emberline.reports.Samples;
import emberline.survey.ObjectResult;
import emberline.survey.verdict.Verdict;
import emberline.survey.verdict.VerdictCall;
import emberline.survey.verdict.VerdictFile;
import emberline.survey.verdict.Verdicts;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class VerdictColumnsTest {

    private static String cell(ObjectResult result, String column) {
        return ResultColumns.standard().stream()
                .filter(c -> c.name().equals(column))
                .findFirst()
                .orElseThrow()
                .text(result);
    }

    private static ObjectResult said(VerdictCall call, String type, GravityClass gravity) {
        return Samples.lDwarf()
                .withVerdict(
                        Optional.of(
                                new Verdict(
                                        Optional.ofNullable(call),
                                        type,
                                        Optional.ofNullable(gravity),
                                        "")));
    }

    @Test
    void withoutAVerdictTheProgramHolds() {
        ObjectResult plain = Samples.lDwarf();
        assertEquals("program", cell(plain, "final_by"));
        assertEquals("", cell(plain, "verdict"));
        for (String what : new String[] {"kind", "type", "type_number", "gravity", "decision"}) {
            assertEquals(cell(plain, what), cell(plain, "final_" + what), what);
        }
        assertTrue(cell(plain, "final_type").startsWith("L"), cell(plain, "final_type"));
    }

    @Test
    void theObserverOverridesAndTheProgramsWordStays() {
        ObjectResult giant = said(VerdictCall.GIANT, "", null);
        assertEquals("observer", cell(giant, "final_by"));
        assertEquals("giant", cell(giant, "final_kind"));
        assertEquals("", cell(giant, "final_type"));
        assertEquals("", cell(giant, "final_type_number"));
        assertEquals(cell(Samples.lDwarf(), "type"), cell(giant, "type"));
        ObjectResult later = said(null, "sdL5.5", GravityClass.INT_G);
        assertEquals("sdL5.5", cell(later, "final_type"));
        assertEquals(15.5, Double.parseDouble(cell(later, "final_type_number")), 1e-9);
        assertEquals("INT-G", cell(later, "final_gravity"));
        assertEquals("", cell(said(null, "QSO z=2", null), "final_type_number"));
    }

    @Test
    void aNoteAloneOverridesNothing() {
        ObjectResult noted =
                Samples.lDwarf()
                        .withVerdict(
                                Optional.of(
                                        new Verdict(
                                                Optional.empty(),
                                                "",
                                                Optional.empty(),
                                                "look again")));
        assertEquals("program", cell(noted, "final_by"));
        assertEquals("look again", cell(noted, "verdict_note"));
    }

    @Test
    void verdictsThatWereWrittenAreReadAgain(@TempDir Path folder) throws IOException {
        Map<String, Verdicts.Entry> entries = new LinkedHashMap<>();
        entries.put(
                "=evil(\"x\"), <b>",
                new Verdicts.Entry(
                        new Verdict(
                                Optional.of(VerdictCall.BAD_DATA),
                                "-",
                                Optional.of(GravityClass.VL_G),
                                "=1+1\nand \"more\", </script>"),
                        ""));
        Path file = folder.resolve("verdicts.csv");
        Files.writeString(file, VerdictTable.text(new Verdicts(entries)));
        Verdicts again = VerdictFile.read(file);
        assertEquals(
                entries.values().iterator().next().verdict(),
                again.of("=evil(\"x\"), <b>").orElseThrow());
        assertTrue(Files.readString(file).contains("'=1+1"), "a spreadsheet would compute it");
    }
}
