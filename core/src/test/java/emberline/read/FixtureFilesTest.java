package emberline.read;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import java.io.IOException;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class FixtureFilesTest {

    static List<Path> bad() throws IOException {
        return Fixtures.in("bad");
    }

    static List<Path> good() throws IOException {
        return Fixtures.in("good");
    }

    @ParameterizedTest
    @MethodSource("bad")
    void badFileRaisesItsOwnComplaint(Path file) throws IOException {
        String expected = Fixtures.expectation(file);
        String message =
                assertThrows(
                                UnreadableSpectrumException.class,
                                () -> new SpectrumReader().read(file))
                        .getMessage();
        assertTrue(message.contains(expected), message);
        assertTrue(message.contains("; expected "), message);
        assertTrue(message.endsWith("."), message);
    }

    @ParameterizedTest
    @MethodSource("good")
    void goodFileHoldsWhatItSays(Path file) throws IOException {
        Observation read = new SpectrumReader().read(file);
        for (String pair : Fixtures.expectation(file).split(" \\| ", -1)) {
            String key = pair.substring(0, pair.indexOf('='));
            String value = pair.substring(pair.indexOf('=') + 1);
            check(read, key, value);
        }
    }

    private static void check(Observation read, String key, String value) {
        switch (key) {
            case "format" -> assertEquals(value, read.format());
            case "micron" -> assertNumbers(value, read.wavelengthsMicron());
            case "flux" -> assertNumbers(value, read.fluxes());
            case "sigma" -> {
                if (value.equals("none")) {
                    assertTrue(read.fluxSigmas().isEmpty(), "sigma");
                } else {
                    assertNumbers(value, read.fluxSigmas().orElseThrow());
                }
            }
            case "medium" ->
                    assertEquals(value, read.medium().map(Medium::word).orElse("none"), "medium");
            case "power" ->
                    assertEquals(
                            value,
                            read.resolvingPower()
                                    .map(power -> String.valueOf(Math.round(power.value())))
                                    .orElse("none"));
            case "findings" ->
                    assertEquals(
                            value,
                            read.findings().stream()
                                    .map(Finding::code)
                                    .collect(Collectors.joining(",")));
            default -> throw new IllegalStateException("fixture with unknown key " + key);
        }
    }

    private static void assertNumbers(String expected, double[] found) {
        double[] numbers =
                Arrays.stream(expected.split(",", -1)).mapToDouble(Double::parseDouble).toArray();
        assertEquals(numbers.length, found.length, () -> Arrays.toString(found));
        for (int i = 0; i < numbers.length; i++) {
            // A few roundings (unit factor, power of ten, square root) are allowed.
            double tolerance = Double.isNaN(numbers[i]) ? 0 : 1e-14 * Math.abs(numbers[i]) + 1e-300;
            assertEquals(numbers[i], found[i], tolerance, "number " + i);
        }
    }
}
