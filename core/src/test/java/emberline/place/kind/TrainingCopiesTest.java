package emberline.place.kind;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.prepare.PreparedSpectrum;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

/** Copies of a smooth spectrum with hardly any noise. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class TrainingCopiesTest {

    private final KindFeatures features = KindFeatures.standard();
    private final Measurer measurer =
            new Measurer(FeatureCatalogue.standard(), Measuring.withDefaults());
    private final TrainingCopies copies = new TrainingCopies(measurer, features);
    private final PreparedSpectrum onlyH = InventedSpectra.of(1.4, 1.85, 120, w -> w, 1e-4);
    private final PreparedSpectrum coarse =
            InventedSpectra.of(0.6, 2.45, 120, w -> 1 + 0.5 * Math.sin(9 * w), 1e-4);

    private List<TrainingRow> copies(String name, ObjectKind kind, double type) {
        return copies.of(name, "group", kind, OptionalDouble.of(type), coarse);
    }

    private static List<TrainingRow> reddened(List<TrainingRow> rows) {
        return rows.stream().filter(row -> row.how().equals("reddened")).toList();
    }

    private static List<TrainingRow> plain(List<TrainingRow> rows) {
        return rows.stream().filter(row -> row.how().startsWith(TrainingRow.NOISY)).toList();
    }

    /** Rare kinds are copied more often. */
    @Test
    void everyKindHasItsNumberOfCopies() {
        Object[][] expected = {
            {ObjectKind.LATE_DWARF, 3, 0},
            {ObjectKind.GIANT, 4, 2},
            {ObjectKind.EARLY_STAR, 8, 6},
            {ObjectKind.REDDENED_BACKGROUND, 16, 0},
            {ObjectKind.CARBON_STAR, 40, 0},
            {ObjectKind.EXTRAGALACTIC, 40, 0},
            {ObjectKind.UNLIKE_KNOWN, 0, 0}
        };
        for (Object[] one : expected) {
            ObjectKind kind = (ObjectKind) one[0];
            List<TrainingRow> rows = copies.of("a", "group", kind, OptionalDouble.of(5), onlyH);
            assertEquals(one[1], plain(rows).size(), kind.label());
            assertEquals(one[2], reddened(rows).size(), kind.label());
            plain(rows).forEach(row -> assertEquals(kind, row.kind()));
            reddened(rows).forEach(row -> assertEquals(ObjectKind.REDDENED_BACKGROUND, row.kind()));
            rows.forEach(row -> assertEquals("group", row.group()));
        }
    }

    @Test
    void theSameNameGivesTheSameCopies() {
        double[] one = values("a");
        assertArrayEquals(one, values("a"));
        assertFalse(Arrays.equals(one, values("b")));
    }

    private double[] values(String name) {
        return copies.of(name, "g", ObjectKind.GIANT, OptionalDouble.empty(), onlyH)
                .get(1)
                .vector()
                .values();
    }

    private int column(String id) {
        return features.ids().indexOf("emberline2026/shape_" + id);
    }

    /** Signal-to-noise 5 to 80, evenly in its logarithm; errors of windows go with it. */
    @Test
    void noiseIsWhatTheRowSays() {
        List<Double> logs = new ArrayList<>();
        List<Double> products = new ArrayList<>();
        int window = column("1.595");
        for (TrainingRow row : copies("a", ObjectKind.REDDENED_BACKGROUND, 0)) {
            double signal =
                    Double.parseDouble(row.how().substring((TrainingRow.NOISY + " to ").length()));
            assertTrue(signal >= 5 && signal <= 80, row.how());
            logs.add(Math.log(signal / 5) / Math.log(16));
            products.add(signal * row.vector().sigmas()[window]);
        }
        assertEquals(0.5, mean(logs), 0.25);
        double mean = mean(products);
        products.forEach(one -> assertEquals(mean, one, 0.35 * mean));
    }

    private static double mean(List<Double> values) {
        return values.stream().mapToDouble(v -> v).average().orElseThrow();
    }

    /** K over H in magnitudes or as a ratio: how far copies lie redward of the spectrum. */
    private double[] colours(List<TrainingRow> rows) {
        int column = column("k_h");
        double own = features.of(measurer.measure(coarse)).values()[column];
        return rows.stream().mapToDouble(row -> row.vector().values()[column] - own).toArray();
    }

    @Test
    void reddeningShowsInColours() {
        double[] behind = colours(reddened(copies("a", ObjectKind.EARLY_STAR, -5)));
        double dusty = Arrays.stream(behind).map(Math::abs).min().orElseThrow();
        double sign = Math.signum(behind[0]);
        for (double one : behind) {
            assertEquals(sign, Math.signum(one), "all are redder");
        }
        double[] carbon = colours(copies("a", ObjectKind.CARBON_STAR, 0));
        double meanOfCarbon = sign * Arrays.stream(carbon).average().orElseThrow();
        double[] background = colours(copies("a", ObjectKind.REDDENED_BACKGROUND, 0));
        double meanOfOthers = sign * Arrays.stream(background).average().orElseThrow();
        double most = sign * Arrays.stream(behind).average().orElseThrow();
        assertTrue(most > 2 * meanOfCarbon, most + " and " + meanOfCarbon);
        assertTrue(meanOfCarbon > 2 * Math.abs(meanOfOthers), meanOfCarbon + ", " + meanOfOthers);
        assertTrue(dusty > 0);
    }

    /** The first copy of an M or L dwarf lies behind up to 3 mag of dust, that of a T never. */
    @Test
    void onlyTheFirstCopyOfADwarfBeforeTheTTypeIsReddened() {
        double mOrL = 0;
        double first = 0;
        double atT = 0;
        for (int k = 0; k < 20; k++) {
            double[] early = colours(copies("dwarf " + k, ObjectKind.LATE_DWARF, 19));
            mOrL += early[0] / 20;
            first += early[1] / 20;
            atT += colours(copies("dwarf " + k, ObjectKind.LATE_DWARF, 20))[0] / 20;
        }
        assertTrue(Math.abs(mOrL) > 2.5 * Math.abs(first), mOrL + " and " + first);
        assertTrue(Math.abs(mOrL) > 2.5 * Math.abs(atT), mOrL + " and " + atT);
    }

    /** Galaxies are moved by redshifts of up to three, so that their lines stand elsewhere. */
    @Test
    void galaxiesAreRedshifted() {
        PreparedSpectrum blue = InventedSpectra.of(0.6, 1.85, 60, w -> 1, 0);
        List<TrainingRow> rows =
                copies.of("a", "g", ObjectKind.EXTRAGALACTIC, OptionalDouble.empty(), blue);
        long without = rows.stream().filter(row -> !row.vector().has(column("0.655"))).count();
        long far = rows.stream().filter(row -> !row.vector().has(column("1.595"))).count();
        assertTrue(without > 20 && without <= 40, without + " have lost 0.655 micron");
        assertTrue(far > 3 && far < 20, far + " have lost 1.595 micron");
        copies.of("a", "g", ObjectKind.EARLY_STAR, OptionalDouble.empty(), blue)
                .forEach(row -> assertTrue(row.vector().has(column("0.655"))));
    }

    /** Fine spectra are known coarse as well: every second copy. */
    @Test
    void everySecondCopyOfAFineSpectrumIsCoarse() {
        PreparedSpectrum fine = InventedSpectra.of(1.4, 2.45, 251, w -> 1, 0);
        List<TrainingRow> rows =
                copies.of("a", "g", ObjectKind.EARLY_STAR, OptionalDouble.empty(), fine);
        for (int k = 0; k < 8; k++) {
            assertEquals(k % 2 == 0, rows.get(k).how().endsWith(", made coarse"), "copy " + k);
        }
        PreparedSpectrum bound = InventedSpectra.of(1.4, 2.45, 250, w -> 1, 0);
        copies.of("a", "g", ObjectKind.EARLY_STAR, OptionalDouble.empty(), bound)
                .forEach(row -> assertFalse(row.how().contains("coarse")));
    }
}
