package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class AgeStatementTest {

    @ParameterizedTest
    @CsvSource({
        "120+-8Myr, 88, 152",
        "120 +/- 8 Myr, 88, 152",
        "0.12\u00b10.008Gyr, 88, 152",
        "50..150Myr, 50, 150",
        "2..8Gyr, 2000, 8000",
        "ABDMG, 73, 353",
        "twa, 10, 22"
    })
    void agesAreRead(String text, double low, double high) {
        AgeStatement age = AgeStatement.parse(text);
        assertEquals(low, age.lowMyr(), 1e-9);
        assertEquals(high, age.highMyr(), 1e-9);
        assertTrue(age.isStated());
        assertEquals(0, age.density(low - 1));
        assertTrue(age.density((low + high) / 2) > 0);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "",
                "old",
                "120",
                "120+-0Myr",
                "150..50Myr",
                "100..100Myr",
                "1..5Myr",
                "11..13Gyr",
                "5+-1"
            })
    void whatIsNoAgeIsRefused(String text) {
        IllegalArgumentException refused =
                assertThrows(IllegalArgumentException.class, () -> AgeStatement.parse(text));
        assertTrue(refused.getMessage().contains("expected"), refused.getMessage());
    }

    @Test
    void theDefaultIsEvenInTime() {
        AgeStatement none = AgeStatement.none();
        assertFalse(none.isStated());
        assertEquals(none.density(20), none.density(9000));
        assertEquals(0, none.density(9));
    }

    @Test
    void thresholdsAreRead() {
        Judging judging = Judging.withDefaults().withThresholds("0.99, 0.01");
        assertEquals(0.99, judging.substellarFrom());
        for (String bad : new String[] {"0.9", "0.4,0.1", "0.9,0.6", "a,b", "0.9,0.1,0"}) {
            assertThrows(
                    IllegalArgumentException.class,
                    () -> Judging.withDefaults().withThresholds(bad));
        }
    }

    /** Ten Myr below and thirty above: one sigma of either side is exp(-1/2), cut at four. */
    @Test
    void errorsBelowAndAboveDiffer() {
        AgeStatement age = AgeStatement.about("x", 100, 10, 30);
        assertEquals(1, age.density(100));
        assertEquals(Math.exp(-0.5), age.density(90), 1e-12);
        assertEquals(Math.exp(-0.5), age.density(130), 1e-12);
        assertEquals(Math.exp(-8), age.density(60), 1e-12);
        assertEquals(Math.exp(-8), age.density(220), 1e-12);
        assertEquals(0, age.density(59.9));
        assertEquals(0, age.density(220.1));
        AgeStatement even = AgeStatement.between("x", 50, 150);
        assertEquals(1, even.density(50));
        assertEquals(1, even.density(150));
    }

    @Test
    void refusalsSayWhatIsExpected() {
        for (double[] errors : new double[][] {{0, 5}, {5, 0}, {-1, 5}}) {
            IllegalArgumentException refused =
                    assertThrows(
                            IllegalArgumentException.class,
                            () -> AgeStatement.about("odd", 100, errors[0], errors[1]));
            assertEquals("age 'odd': expected an error above zero", refused.getMessage());
        }
        for (String off : new String[] {"1..10Myr", "10..12Gyr"}) {
            IllegalArgumentException refused =
                    assertThrows(IllegalArgumentException.class, () -> AgeStatement.parse(off));
            assertTrue(refused.getMessage().contains("overlaps 10 Myr to 10 Gyr"), off);
        }
        assertEquals(10, AgeStatement.parse("1..50Myr").lowMyr());
        assertEquals(10_000, AgeStatement.parse("5..20Gyr").highMyr());
        IllegalArgumentException none =
                assertThrows(IllegalArgumentException.class, () -> AgeStatement.parse("old"));
        assertTrue(none.getMessage().contains("TWA USCO LCC UCL BPMG"), none.getMessage());
    }

    @Test
    void settingsAreCheckedAndSaid() {
        Judging judging = Judging.withDefaults();
        assertEquals("substellar", judging.aimWords());
        assertEquals(
                "young=2.5,nearby", judging.withAims(Aim.parse("nearby,young=2.5")).aimWords());
        IllegalArgumentException none =
                assertThrows(
                        IllegalArgumentException.class, () -> judging.withAims(java.util.Map.of()));
        assertEquals("aims: expected at least one", none.getMessage());
        for (String edge : new String[] {"0.5,0.1", "1.01,0.1", "0.9,0.5", "0.9,-0.1"}) {
            IllegalArgumentException refused =
                    assertThrows(
                            IllegalArgumentException.class, () -> judging.withThresholds(edge));
            assertTrue(refused.getMessage().contains("below 0.5"), refused.getMessage());
        }
        Judging sure = judging.withThresholds("1,0").withAge(AgeStatement.parse("TWA"));
        assertEquals(1, sure.substellarFrom());
        assertEquals(0, sure.stellarTo());
        assertEquals("TWA", sure.age().orElseThrow().text());
        IllegalArgumentException words =
                assertThrows(
                        IllegalArgumentException.class, () -> judging.withThresholds("0.9;0.1"));
        assertEquals(
                "thresholds '0.9;0.1': expected two numbers such as 0.95,0.05", words.getMessage());
    }
}
