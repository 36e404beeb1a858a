package emberline.read;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.charset.StandardCharsets;
import java.util.Locale;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class DecimalTextTest {

    private static double parse(String text) {
        byte[] bytes = ("<" + text + ">").getBytes(StandardCharsets.ISO_8859_1);
        return DecimalText.parse(bytes, 1, bytes.length - 1);
    }

    private static DecimalText.Cell kind(String text) {
        byte[] bytes = text.getBytes(StandardCharsets.ISO_8859_1);
        return DecimalText.kind(bytes, 0, bytes.length);
    }

    /** Against the platform's own parser, bit by bit. */
    @Test
    void equalsThePlatformForAllWaysToWriteANumber() {
        SplittableRandom random = new SplittableRandom(3);
        String[] forms = {"%.3f", "%.7f", "%.17f", "%.5e", "%.18e", "%e", "%.0f", "%+.4f"};
        for (int i = 0; i < 40_000; i++) {
            double value = random.nextDouble(-1, 1) * Math.pow(10, random.nextInt(-40, 40));
            String text = String.format(Locale.ROOT, forms[i % forms.length], value);
            assertEquals(Double.parseDouble(text), parse(text), text);
            assertEquals(value, parse(Double.toString(value)));
        }
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "0",
                "-0",
                "7",
                ".5",
                "5.",
                "+3",
                "9007199254740993",
                "1e22",
                "1e23",
                "1E-22",
                "123456789012345678901234567890",
                "4.9e-324",
                "1.8e308",
                "000000000000000000001.5",
                "0.000000000000000000000001",
                "1e+05"
            })
    void equalsThePlatformAtTheEdges(String text) {
        assertEquals(Double.parseDouble(text), parse(text));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "", "-", "+", ".", "e5", "1e", "1e+", "1.2.3", "12a", "0x10", "1_000", "1,5", "NaN",
                "--1", "1e5e5", "1f", "1.0-5"
            })
    void whatIsNoNumberIsNaN(String text) {
        assertTrue(Double.isNaN(parse(text)), text);
    }

    @Test
    void exponentsMayBeWrittenWithD() {
        assertEquals(1.5e-17, parse("1.5D-17"));
        assertEquals(
                Double.parseDouble("1.234567890123456789e-17"), parse("1.234567890123456789d-17"));
    }

    @Test
    void wordsForNoValueAreTold() {
        assertEquals(DecimalText.Cell.NO_VALUE, kind(""));
        assertEquals(DecimalText.Cell.NO_VALUE, kind("NaN"));
        assertEquals(DecimalText.Cell.NO_VALUE, kind("--"));
        assertEquals(DecimalText.Cell.OTHER, kind("saturated"));
        assertEquals(DecimalText.Cell.NUMBER, kind("-1.5"));
    }
}
