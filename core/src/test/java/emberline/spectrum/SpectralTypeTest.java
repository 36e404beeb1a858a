package emberline.spectrum;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class SpectralTypeTest {

    @ParameterizedTest
    @CsvSource({
        "M0, 0",
        "M6.5, 6.5",
        "L0, 10",
        "L3.5 gamma, 13.5",
        "T8, 28",
        "Y0, 30",
        "K5, -2",
        "K7, -1",
        "sdM6, 6",
        "esdM5.5, 5.5",
        "d/sdL7, 17",
        "T2:, 22",
        "M9 V, 9"
    })
    void codesAreRead(String code, double number) {
        assertEquals(Optional.of(new SpectralType(number)), SpectralType.parse(code));
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "G2", "C-N4.5", "M", "dwarf"})
    void otherCodesAreNot(String code) {
        assertEquals(Optional.empty(), SpectralType.parse(code));
    }

    @ParameterizedTest
    @CsvSource({
        "0, M0",
        "-0.2, M0",
        "-0.25, M0",
        "0.24, M0",
        "0.3, M0.5",
        "9.8, L0",
        "13.4, L3.5",
        "20.1, T0",
        "30.2, Y0",
        "-1, K7",
        "-2, K5",
        "-1.5, K6"
    })
    void codesAreWrittenToHalfASubclass(double number, String code) {
        assertEquals(code, new SpectralType(number).code());
    }

    @Test
    void fineCodesAreWrittenToATenth() {
        assertEquals("L3.4", new SpectralType(13.44).fineCode());
        assertEquals("M0", new SpectralType(-0.03).fineCode());
    }

    @Test
    void codesComeBack() {
        for (int half = 0; half < 62; half++) {
            SpectralType type = new SpectralType(half / 2.0);
            assertEquals(Optional.of(type), SpectralType.parse(type.code()), type.code());
        }
    }

    @Test
    void typesAreOrdered() {
        assertTrue(new SpectralType(3).compareTo(new SpectralType(12)) < 0);
    }

    @ParameterizedTest
    @ValueSource(doubles = {-10, 40, Double.NaN})
    void numbersOffTheScaleAreRefused(double number) {
        assertThrows(IllegalArgumentException.class, () -> new SpectralType(number));
    }
}
