package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.Measurement.Measured;
import emberline.place.calibrated.FeatureNoise.Resolution;
import emberline.place.reference.ReferenceRow;
import emberline.place.reference.ReferenceTable;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/** The noise of a feature of invented dwarfs, at a signal-to-noise of one. */
class FeatureNoiseTest {

    private final String feature = LocusFeatures.standard().get(0);

    private ReferenceRow row(
            String kind, OptionalDouble type, double power, OptionalDouble signal, double sigma) {
        return new ReferenceRow(
                "o",
                "o",
                type,
                "",
                kind,
                "A",
                "invented",
                power,
                signal,
                Map.of(feature, new Measured(1, sigma)));
    }

    private ReferenceRow dwarf(double type, double power, double signal, double sigma) {
        return row("dwarf", OptionalDouble.of(type), power, OptionalDouble.of(signal), sigma);
    }

    private FeatureNoise of(ReferenceRow... rows) {
        List<ReferenceRow> all = new ArrayList<>(Arrays.asList(rows));
        return FeatureNoise.of(new ReferenceTable(List.of(feature, "not/placing"), all));
    }

    @Test
    void theMedianOfErrorTimesSignalIsKept() {
        FeatureNoise noise =
                of(dwarf(10, 120, 10, 0.1), dwarf(12, 120, 20, 0.1), dwarf(14.9, 120, 10, 0.9));
        assertEquals(2, noise.atUnitSignal(feature, 11, 100).orElseThrow(), 1e-12);
        assertEquals(2, noise.atUnitSignal(feature, 10, 249).orElseThrow(), 1e-12);
        assertTrue(noise.atUnitSignal(feature, 9.9, 100).isEmpty());
        assertTrue(noise.atUnitSignal(feature, 15, 100).isEmpty());
        assertTrue(noise.atUnitSignal(feature, 11, 250).isEmpty());
        assertTrue(noise.atUnitSignal("not/placing", 11, 100).isEmpty());
    }

    @Test
    void twoSpectraAreTooFew() {
        assertTrue(
                of(dwarf(10, 120, 10, 0.1), dwarf(12, 120, 20, 0.1))
                        .atUnitSignal(feature, 11, 100)
                        .isEmpty());
    }

    @Test
    void onlyDwarfsOfKnownTypeAndSignalCount() {
        OptionalDouble type = OptionalDouble.of(11);
        OptionalDouble signal = OptionalDouble.of(10);
        ReferenceRow[] two = {dwarf(10, 120, 10, 0.1), dwarf(12, 120, 20, 0.1)};
        assertTrue(
                of(
                                two[0],
                                two[1],
                                row("giant", type, 120, signal, 0.1),
                                row("dwarf", OptionalDouble.empty(), 120, signal, 0.1),
                                row("dwarf", type, 120, OptionalDouble.empty(), 0.1),
                                row("dwarf", type, 2000, signal, 0.1),
                                row("dwarf", OptionalDouble.of(20), 120, signal, 0.1))
                        .atUnitSignal(feature, 11, 100)
                        .isEmpty());
    }

    @Test
    void typesBeyondTheTableCountAsItsEnds() {
        FeatureNoise noise =
                of(
                        dwarf(-3, 500, 10, 0.1),
                        dwarf(-1, 500, 10, 0.1),
                        dwarf(2, 500, 10, 0.1),
                        dwarf(30, 500, 10, 0.3),
                        dwarf(36, 500, 10, 0.3),
                        dwarf(40, 500, 10, 0.3));
        assertEquals(1, noise.atUnitSignal(feature, -9, 500).orElseThrow(), 1e-12);
        assertEquals(1, noise.atUnitSignal(feature, 4.9, 500).orElseThrow(), 1e-12);
        assertEquals(3, noise.atUnitSignal(feature, 50, 500).orElseThrow(), 1e-12);
    }

    @Test
    void resolutionsAreToldApart() {
        assertSame(Resolution.LOW, Resolution.of(1));
        assertSame(Resolution.LOW, Resolution.of(249.9));
        assertSame(Resolution.MEDIUM, Resolution.of(250));
        assertSame(Resolution.MEDIUM, Resolution.of(1299));
        assertSame(Resolution.HIGH, Resolution.of(1300));
    }

    @Test
    void theTextHasOneLineAFeatureAndResolution() {
        FeatureNoise noise =
                of(
                        dwarf(10, 120, 10, 0.1),
                        dwarf(12, 120, 10, 0.1),
                        dwarf(13, 120, 10, 0.1),
                        dwarf(31, 2000, 10, 0.2),
                        dwarf(31, 2000, 10, 0.2),
                        dwarf(31, 2000, 10, 0.2));
        assertEquals(
                "feature,resolution,0.0,5.0,10.0,15.0,20.0,25.0,30.0\n"
                        + feature
                        + ",low,,,1.00,,,,\n"
                        + feature
                        + ",high,,,,,,,2.00\n",
                noise.text());
    }

    /** A window holds more pixels where the resolution is higher, so its mean is less noisy. */
    @Test
    void finerSpectraOfTheSameSignalAreLessNoisy() {
        FeatureNoise noise = FeatureNoise.standard();
        long known =
                LocusFeatures.standard().stream()
                        .filter(id -> noise.atUnitSignal(id, 12, 120).isPresent())
                        .count();
        assertTrue(known > 10, known + " features at low resolution");
        for (String id : List.of("burgasser2006/ch4-h", "burgasser2006/h2o-h")) {
            double low = noise.atUnitSignal(id, 12, 120).orElseThrow();
            double medium = noise.atUnitSignal(id, 12, 750).orElseThrow();
            double high = noise.atUnitSignal(id, 12, 2000).orElseThrow();
            assertTrue(low > medium && medium > high, low + ", " + medium + ", " + high);
        }
    }
}
