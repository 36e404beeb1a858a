package emberline.read;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class PixelOrderTest {

    private final List<Finding> findings = new ArrayList<>();

    private int[] order(double... waves) throws UnreadableSpectrumException {
        findings.clear();
        double[] flux = IntStream.range(0, waves.length).mapToDouble(i -> i + 1).toArray();
        return new PixelOrder("p", waves, flux, i -> "pixel " + (i + 1), findings).rising();
    }

    private String refusal(double... waves) {
        return assertThrows(UnreadableSpectrumException.class, () -> order(waves)).getMessage();
    }

    private static double[] grid(double start, double step, int size) {
        return IntStream.range(0, size).mapToDouble(i -> start + step * i).toArray();
    }

    private static double[] join(double[]... parts) {
        return Arrays.stream(parts).flatMapToDouble(Arrays::stream).toArray();
    }

    private static void assertRising(double[] waves, int[] order) {
        for (int i = 1; i < order.length; i++) {
            assertTrue(waves[order[i]] > waves[order[i - 1]], "at " + i);
        }
    }

    @Test
    void risingStaysAndFallingIsTurned() throws UnreadableSpectrumException {
        assertArrayEquals(new int[] {0, 1, 2}, order(1, 2, 3));
        assertEquals(List.of(), findings);
        assertArrayEquals(new int[] {2, 1, 0}, order(3, 2, 1));
        assertEquals("wavelengths-reversed", findings.get(0).code());
    }

    @Test
    void ordersThatOverlapALittleAreJoined() throws UnreadableSpectrumException {
        double[] waves = join(grid(1, 0.001, 200), grid(1.1903, 0.0013, 200));
        int[] order = order(waves);
        assertEquals(400, order.length);
        assertRising(waves, order);
        assertEquals("orders-joined", findings.get(0).code());
        assertTrue(findings.get(0).text().contains("at 1 place,"), findings.get(0).text());
    }

    @Test
    void anOrderThatBeginsWhereTheLastEndsIsJoined() throws UnreadableSpectrumException {
        double[] first = grid(1, 0.001, 100);
        double[] waves = join(first, grid(first[99], 0.0012, 100));
        assertEquals(199, order(waves).length);
        assertEquals("orders-joined", findings.get(0).code());
    }

    @Test
    void sameWavelengthWithinAnEvenGridIsRefused() {
        double[] inserted = join(grid(1, 0.001, 150), grid(1.149, 0.001, 150));
        inserted[150] = inserted[149];
        assertTrue(
                refusal(inserted).contains("p, pixel 151: wavelength 1.149 micron stands twice"));
        double[] replaced = grid(1, 0.001, 300);
        replaced[150] = replaced[149];
        assertTrue(refusal(replaced).contains("stands twice"));
    }

    @Test
    void swappedAndShuffledPixelsAreRefused() {
        double[] swapped = grid(1, 0.001, 300);
        double held = swapped[150];
        swapped[150] = swapped[151];
        swapped[151] = held;
        assertTrue(refusal(swapped).contains("p, pixel 152: wavelength 1.15 micron follows 1.151"));
        double[] shuffled = grid(1, 0.001, 300);
        for (int i = 0; i < 300; i++) {
            shuffled[i] = 1 + 0.001 * (i * 77 % 300);
        }
        assertTrue(refusal(shuffled).contains("expected wavelengths that rise (or fall)"));
    }

    @Test
    void twoSpectraInOneFileAreRefused() {
        assertTrue(
                refusal(join(grid(1, 0.001, 200), grid(1, 0.001, 200)))
                        .contains("split the file if it holds several spectra"));
    }

    @Test
    void shortSpectraMayHaveNoJoint() {
        assertTrue(refusal(join(grid(1, 0.01, 40), grid(1.38, 0.012, 40))).contains("follows"));
    }

    @Test
    void tiesInTheSortedOverlapOfTwoOrdersAreThinned() throws UnreadableSpectrumException {
        double[] waves = join(grid(1, 0.0004, 300), grid(1.1, 0.0005, 300));
        double[] rounded =
                Arrays.stream(waves).map(w -> Math.rint(w * 1e5) / 1e5).sorted().toArray();
        int[] order = order(rounded);
        assertTrue(order.length < 600, "the two grids meet at some wavelengths");
        assertRising(rounded, order);
    }

    @Test
    void aLastWavelengthRepeatedOftenIsPadding() throws UnreadableSpectrumException {
        double[] waves = join(grid(1, 0.01, 115), new double[] {2.14, 2.14, 2.14});
        assertEquals(115, order(waves).length);
        assertEquals("padding-cut", findings.get(0).code());
    }

    @Test
    void pixelsWithoutWavelengthAreLeftOut() throws UnreadableSpectrumException {
        assertArrayEquals(new int[] {1, 3}, order(0, 1, Double.NaN, 2, 0, Double.NaN));
        assertEquals("pixels-without-wavelength", findings.get(0).code());
        assertTrue(refusal(1, 0, 2).contains("p, pixel 2: wavelength 0.0; expected a positive"));
        assertTrue(refusal(1, Double.POSITIVE_INFINITY, 2).contains("wavelength Infinity"));
        assertTrue(refusal(Double.NaN, Double.NaN).contains("no pixel with a wavelength"));
    }
}
