package emberline.place.kind;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.DataInputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.simple.RandomSource;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class RegressionFitterTest {

    private static final int DWARF = ObjectKind.LATE_DWARF.position();
    private static final int GIANT = ObjectKind.GIANT.position();

    private final KindFeatures features = KindFeatures.standard();
    private final Coverage nearH = Coverage.parse("H");
    private final int one = nearH.columns(features)[0];
    private final int other = nearH.columns(features)[1];

    private double[] nothing() {
        double[] values = new double[features.size()];
        Arrays.fill(values, Double.NaN);
        return values;
    }

    private double[] of(double first, double second) {
        double[] values = nothing();
        values[one] = first;
        values[other] = second;
        return values;
    }

    private static TrainingRow row(ObjectKind kind, double[] values) {
        return new TrainingRow(
                "object",
                kind,
                TrainingRow.AS_OBSERVED,
                new FeatureVector(values, new double[values.length]));
    }

    /** Two features alike in both kinds; only their difference tells dwarfs (above) from giants. */
    private List<TrainingRow> rows(int dwarfs, int giants) {
        UniformRandomProvider random = RandomSource.XO_RO_SHI_RO_128_PP.create(8);
        List<TrainingRow> rows = new ArrayList<>();
        for (int k = 0; k < dwarfs + giants; k++) {
            double level = random.nextDouble();
            double step = k < dwarfs ? 0.1 : -0.1;
            ObjectKind kind = k < dwarfs ? ObjectKind.LATE_DWARF : ObjectKind.GIANT;
            rows.add(row(kind, of(level + step, level)));
        }
        return rows;
    }

    @Test
    void aDifferenceOfTwoFeaturesTellsKinds() {
        Regression regression = new RegressionFitter(features).fit(nearH, rows(100, 100));
        for (double level = 0.2; level < 0.85; level += 0.1) {
            double[] dwarf = regression.probabilities(of(level + 0.1, level));
            assertTrue(dwarf[DWARF] > 0.8, level + " " + Arrays.toString(dwarf));
            double[] giant = regression.probabilities(of(level - 0.1, level));
            assertTrue(giant[GIANT] > 0.8, level + " " + Arrays.toString(giant));
            assertEquals(1, Arrays.stream(giant).sum(), 1e-12);
            assertEquals(0, giant[ObjectKind.CARBON_STAR.position()]);
        }
    }

    /** Kinds weigh the same however many rows they have. */
    @Test
    void whatWasNotMeasuredTellsNothing() {
        List<TrainingRow> rows = new ArrayList<>();
        for (int k = 0; k < 90; k++) {
            rows.add(row(k < 60 ? ObjectKind.LATE_DWARF : ObjectKind.GIANT, nothing()));
        }
        double[] p = new RegressionFitter(features).fit(nearH, rows).probabilities(nothing());
        assertEquals(0.5, p[DWARF], 1e-3);
        assertEquals(0.5, p[GIANT], 1e-3);
        double[] learned =
                new RegressionFitter(features).fit(nearH, rows(100, 100)).probabilities(nothing());
        assertEquals(0.5, learned[DWARF], 0.1, "the medians lie between the kinds");
    }

    /**
     * Two kinds that one feature tells apart have opposite weights; these and the constant are
     * found here by descent.
     */
    @Test
    void theMaximumIsThatOfTheFormula() {
        List<TrainingRow> rows = new ArrayList<>();
        for (int k = 0; k < 100; k++) {
            double[] values = nothing();
            values[one] = k % 2 == 0 ? 1 : -1;
            rows.add(row(k % 2 == 0 ? ObjectKind.LATE_DWARF : ObjectKind.GIANT, values));
        }
        double[] above = nothing();
        above[one] = 1;
        double[] below = nothing();
        below[one] = -1;
        Regression regression = new RegressionFitter(features).fit(nearH, rows);
        // the median of the sorted values is -1, half the range 1: the unit is 0.3
        double far = Regression.squeezed(1, -1, 0.3f);
        assertEquals(Math.log(2 / 0.3 + Math.hypot(1, 2 / 0.3)), far, 1e-6);
        assertEquals(0, Regression.squeezed(-1, -1, 0.3f));
        // 50 dwarfs at far, 50 giants at 0
        double[] expected = oddsOfTwo(far);
        double[] high = regression.probabilities(above);
        double[] low = regression.probabilities(below);
        assertEquals(expected[0], high[DWARF], 2e-3);
        assertEquals(expected[1], low[DWARF], 2e-3);
    }

    /** Slope 2w and constant 2c of the log odds: penalties w^2 and 0.001 c^2. */
    private static double[] oddsOfTwo(double far) {
        double w = 0;
        double c = 0;
        for (int step = 0; step < 200_000; step++) {
            double high = 1 / (1 + Math.exp(-2 * (w * far + c)));
            double low = 1 / (1 + Math.exp(-2 * c));
            w -= 1e-3 * (-100 * (1 - high) * far + 2 * w);
            c -= 1e-3 * (-100 * (1 - high) + 100 * low + 0.002 * c);
        }
        double least = 1e-3;
        double high = 1 / (1 + Math.exp(-2 * (w * far + c)));
        double low = 1 / (1 + Math.exp(-2 * c));
        return new double[] {(high + least) / (1 + 2 * least), (low + least) / (1 + 2 * least)};
    }

    @Test
    void aRegressionComesBackFromItsBytes() throws IOException {
        Regression regression =
                new RegressionFitter(features).fit(nearH, rows(50, 50)).withSharpness(1.3f);
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        regression.write(new DataOutputStream(bytes));
        Regression read =
                Regression.read(new DataInputStream(new ByteArrayInputStream(bytes.toByteArray())));
        assertArrayEquals(
                regression.probabilities(of(0.5, 0.48)), read.probabilities(of(0.5, 0.48)));
    }

    /** An exponent of two squares the odds. */
    @Test
    void sharpnessIsThePowerOfTheOdds() {
        Regression plain = new RegressionFitter(features).fit(nearH, rows(50, 50));
        double[] p = plain.probabilities(of(0.5, 0.48));
        double[] sharp = plain.withSharpness(2).probabilities(of(0.5, 0.48));
        assertEquals(Math.pow(p[DWARF] / p[GIANT], 2), sharp[DWARF] / sharp[GIANT], 1e-9);
    }

    /** The mean of both parts is geometric, and an exponent of two squares its odds. */
    @Test
    void aBlendIsTheGeometricMean() {
        List<TrainingRow> rows = rows(60, 60);
        Forest forest = new ForestGrower(features, 10).grow(nearH, rows);
        Regression regression = new RegressionFitter(features).fit(nearH, rows);
        double[] values = of(0.5, 0.46);
        double[] a = forest.probabilities(values);
        double[] b = regression.probabilities(values);
        double[] mean = new Blend(forest, regression, 1).probabilities(values);
        assertEquals(1, Arrays.stream(mean).sum(), 1e-12);
        double odds = a[DWARF] / a[GIANT] * (b[DWARF] / b[GIANT]);
        assertEquals(Math.sqrt(odds), mean[DWARF] / mean[GIANT], 1e-9 * Math.sqrt(odds));
        double[] sharp = new Blend(forest, regression, 1).withSharpness(2).probabilities(values);
        assertEquals(odds, sharp[DWARF] / sharp[GIANT], 1e-9 * odds);
    }

    @Test
    void frequentKindsAreDrawnFromAndRareOnesKept() {
        List<TrainingRow> sample = TrainingSample.of(rows(1500, 30));
        assertEquals(1200, sample.stream().filter(r -> r.kind().position() == DWARF).count());
        assertEquals(30, sample.stream().filter(r -> r.kind().position() == GIANT).count());
        List<TrainingRow> rows = rows(1500, 30);
        assertEquals(TrainingSample.of(rows), TrainingSample.of(rows), "drawn always alike");
    }
}
