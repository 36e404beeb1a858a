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
            strings = {"", "old", "120", "120+-0Myr", "150..50Myr", "1..5Myr", "11..13Gyr", "5+-1"})
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
}
