package emberline.place.kind;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.simple.RandomSource;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class ForestGrowerTest {

    private final KindFeatures features = KindFeatures.standard();
    private final Coverage nearH = Coverage.parse("H");

    /** Dwarfs, giants and galaxies that differ in the first feature of H by four of its sigma. */
    private List<TrainingRow> rows(long seed) {
        UniformRandomProvider random = RandomSource.XO_RO_SHI_RO_128_PP.create(seed);
        ObjectKind[] kinds = {ObjectKind.LATE_DWARF, ObjectKind.GIANT, ObjectKind.EXTRAGALACTIC};
        int telling = nearH.columns(features)[0];
        List<TrainingRow> rows = new ArrayList<>();
        for (int k = 0; k < 150; k++) {
            double[] values = new double[features.size()];
            Arrays.setAll(values, i -> random.nextDouble());
            values[telling] = k % 3 + 0.5 * random.nextDouble();
            rows.add(
                    new TrainingRow(
                            "" + k,
                            kinds[k % 3],
                            TrainingRow.AS_OBSERVED,
                            new FeatureVector(values, new double[values.length])));
        }
        return rows;
    }

    @Test
    void aForestTellsWhatItWasTaught() {
        Forest forest = new ForestGrower(features, 20).grow(nearH, rows(2));
        for (TrainingRow row : rows(3)) {
            double[] p = forest.probabilities(row.vector().values());
            assertEquals(1, Arrays.stream(p).sum(), 1e-9);
            assertTrue(p[row.kind().position()] > 0.5, row.kind() + " " + Arrays.toString(p));
            assertEquals(0, p[ObjectKind.CARBON_STAR.position()]);
        }
    }

    @Test
    void theSameRowsGiveTheSameForest() {
        double[] probe = rows(4).get(0).vector().values();
        assertArrayEquals(
                new ForestGrower(features, 10).grow(nearH, rows(2)).probabilities(probe),
                new ForestGrower(features, 10).grow(nearH, rows(2)).probabilities(probe));
    }

    @Test
    void calibrationPrefersWhatIsTrueOfLeftOutRows() {
        Forest forest = new ForestGrower(features, 20).grow(nearH, rows(2));
        float sharp = Sharpness.fit(List.of(forest), rows(3), row -> 0);
        assertTrue(sharp > 1, "clear cases deserve sharper probabilities: " + sharp);
        // labels that mean nothing deserve flat ones
        List<TrainingRow> shuffled = new ArrayList<>();
        List<TrainingRow> rows = rows(3);
        for (int k = 0; k < rows.size(); k++) {
            TrainingRow row = rows.get(k);
            shuffled.add(
                    new TrainingRow(row.group(), rows.get(k / 3).kind(), row.how(), row.vector()));
        }
        assertTrue(Sharpness.fit(List.of(forest), shuffled, row -> 0) < 0.6);
    }
}
