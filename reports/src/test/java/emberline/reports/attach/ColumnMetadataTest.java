package emberline.reports.attach;

import static org.junit.jupiter.api.Assertions.assertDoesNotThrow;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.reports.attach.ResultColumn.Content;
import emberline.reports.note.UnitNames;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Whoever adds a column says what it holds, in which unit, and with which content descriptor. */
class ColumnMetadataTest {

    private static final String WORD = "[a-zA-Z]+(\\.[a-zA-Z0-9-]+)*";

    /** First atoms of the words of UCD1+. */
    private static final Set<String> ROOTS =
            Set.of(
                    "arith", "em", "instr", "meta", "obs", "phot", "phys", "pos", "spect", "src",
                    "stat", "time");

    /** Words that UCD1+ allows only as the first. */
    private static final Set<String> ONLY_FIRST =
            Set.of(
                    "meta.code",
                    "meta.code.multip",
                    "meta.code.qual",
                    "meta.code.status",
                    "meta.id",
                    "meta.note",
                    "meta.ref",
                    "stat.error",
                    "stat.fit.chi2",
                    "stat.snr");

    /** Beginnings of the words that UCD1+ allows only after the first. */
    private static final String NEVER_FIRST =
            "em\\..*|meta\\.main|pos\\.galactic|stat\\.(max|median|min)";

    /** Primary words under which a number has no unit. */
    private static final Set<String> PURE =
            Set.of(
                    "stat.probability",
                    "stat.snr",
                    "stat.value",
                    "stat.fit.chi2",
                    "spect.resolution");

    static List<ResultColumn> columns() {
        return ResultColumns.standard();
    }

    @ParameterizedTest
    @MethodSource("columns")
    void aColumnIsDescribed(ResultColumn column) {
        assertTrue(column.name().matches("[a-z][a-z0-9_]*"), column.name());
        assertTrue(column.description().length() > 5, column.name() + " lacks a description");
        assertFalse(column.description().endsWith("."), column.name());
        assertFalse(column.ucd().isEmpty(), column.name() + " lacks a UCD");
        for (String word : column.ucd().split(";", -1)) {
            assertTrue(word.matches(WORD), column.name() + ": " + word);
            assertTrue(ROOTS.contains(word.split("\\.", -1)[0]), column.name() + ": " + word);
        }
    }

    @ParameterizedTest
    @MethodSource("columns")
    void theWordsOfAUcdStandWhereTheyMay(ResultColumn column) {
        List<String> words = List.of(column.ucd().split(";", -1));
        assertFalse(words.get(0).matches(NEVER_FIRST), column.name() + ": " + column.ucd());
        for (String word : words.subList(1, words.size())) {
            assertFalse(ONLY_FIRST.contains(word), column.name() + ": " + column.ucd());
        }
    }

    @ParameterizedTest
    @MethodSource("columns")
    void aNumberHasAUnitOrNeedsNone(ResultColumn column) {
        assertDoesNotThrow(() -> UnitNames.check(column.unit()), column.name());
        if (column.content() == Content.NUMBER && column.unit().isEmpty()) {
            boolean logarithm = column.name().matches("log.*");
            assertTrue(
                    logarithm || PURE.contains(column.ucd().split(";", -1)[0]),
                    column.name() + " lacks a unit");
        }
        if (column.content() == Content.TEXT) {
            assertEquals("", column.unit(), column.name() + " is text and has a unit");
        }
    }

    @Test
    void namesAreUnique() {
        Set<String> names = columns().stream().map(ResultColumn::name).collect(Collectors.toSet());
        assertEquals(columns().size(), names.size());
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "resolution",
                "parallax_mas_err",
                "pmra_masyr_err",
                "pmdec_masyr_err",
                "rv_kms_err",
                "y_mag_err",
                "w1_mag_err",
                "w2_mag_err"
            })
    void listedNumbersOfTheProductAreDescribed(String listed) {
        ResultColumn column =
                ResultColumns.forList(List.of("name", listed)).stream()
                        .filter(c -> c.description().contains("column " + listed + " of the"))
                        .findFirst()
                        .orElseThrow();
        assertFalse(column.ucd().isEmpty(), listed);
        assertEquals(
                listed.equals("resolution"),
                column.unit().isEmpty(),
                listed + " in '" + column.unit() + "'");
    }

    @Test
    void listedColumnsThatAreKnownKeepTheirMeaning() {
        ResultColumn parallax =
                ResultColumns.forList(List.of("name", "parallax_mas", "mine")).stream()
                        .filter(c -> c.name().equals("parallax_mas"))
                        .findFirst()
                        .orElseThrow();
        assertEquals("mas", parallax.unit());
        assertEquals("pos.parallax", parallax.ucd());
    }
}
