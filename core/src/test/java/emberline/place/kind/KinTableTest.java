package emberline.place.kind;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.kind.KinTable.Neighbour;
import emberline.place.kind.KinTable.Remoteness;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

/** Distances that can be told by hand. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class KinTableTest {

    private final KindFeatures features = KindFeatures.standard();

    private FeatureVector all(double value, double sigma) {
        double[] values = new double[features.size()];
        double[] sigmas = new double[features.size()];
        Arrays.fill(values, value);
        Arrays.fill(sigmas, sigma);
        return new FeatureVector(values, sigmas);
    }

    private ReferenceKin kin(String name, String group, FeatureVector vector) {
        return new ReferenceKin(
                name, group, OptionalDouble.of(9), "", ObjectKind.LATE_DWARF, "", vector);
    }

    private KinTable table(ReferenceKin... rows) {
        float[] scatter = new float[features.size()];
        Arrays.fill(scatter, 0.3f);
        return new KinTable(features, List.of(rows), scatter);
    }

    /** All differ by 0.5; the variance is 0.3^2 + 0.4^2 = 0.25, so the distance is 1. */
    @Test
    void twinsUnderNoiseAreOneApart() {
        KinTable table = table(kin("A", "a", all(1.5, 0)));
        Neighbour found = table.neighbours(all(1, 0.4), 5, "").get(0);
        assertEquals(1, found.distance(), 1e-6);
        assertEquals(table.columns().length, found.inCommon());
        Neighbour byOther = table(kin("A", "a", all(1.5, 0.4))).neighbours(all(1, 0), 5, "").get(0);
        assertEquals(1, byOther.distance(), 1e-6);
    }

    @Test
    void noDifferenceCountsMoreThanFour() {
        KinTable table = table(kin("A", "a", all(100, 0)));
        assertEquals(4, table.neighbours(all(1, 0), 5, "").get(0).distance(), 1e-6);
    }

    @Test
    void theNearestComeFirstAndOwnGroupIsLeftOut() {
        KinTable table =
                table(
                        kin("far", "a", all(1.6, 0)),
                        kin("near", "b", all(1.1, 0)),
                        kin("own", "c", all(1, 0)),
                        kin("middle", "d", all(0.7, 0)),
                        kin("between", "e", all(1.2, 0)));
        List<String> names =
                table.neighbours(all(1, 0), 3, "c").stream().map(n -> n.kin().object()).toList();
        assertEquals(List.of("near", "between", "middle"), names);
        assertEquals(
                List.of("own", "near", "between", "middle", "far"),
                table.neighbours(all(1, 0), 9, "").stream().map(n -> n.kin().object()).toList());
    }

    /** Seven tenths of the features must be in common, and eight at least. */
    @Test
    void tooLittleInCommonIsNoNeighbour() {
        KinTable plain = table();
        int[] columns = plain.columns();
        int least = Math.max(8, (int) Math.ceil(0.7 * columns.length));
        for (int common : new int[] {least - 1, least}) {
            double[] values = new double[features.size()];
            Arrays.fill(values, Double.NaN);
            for (int k = 0; k < common; k++) {
                values[columns[k]] = 1;
            }
            KinTable table = table(kin("A", "a", new FeatureVector(values, all(0, 0).sigmas())));
            assertEquals(
                    common >= least ? 1 : 0,
                    table.neighbours(all(1, 0), 5, "").size(),
                    "" + common);
        }
    }

    /** 0.6 / 0.3 from the nearest, which is 0.3 / 0.3 from the next one of another group. */
    @Test
    void remotenessIsDistanceAndHowAloneTheNearestIs() {
        KinTable table =
                table(
                        kin("A", "a", all(1.6, 0)),
                        kin("A too", "a", all(1.61, 0)),
                        kin("B", "b", all(1.9, 0)),
                        kin("own", "own", all(1, 0)));
        Remoteness found = table.remoteness(all(1, 0), "own").orElseThrow();
        assertEquals(2, found.distance(), 1e-5);
        assertEquals(1, found.isolation(), 1e-5);
        Remoteness alone =
                table(kin("A", "a", all(1.6, 0))).remoteness(all(1, 0), "").orElseThrow();
        assertEquals(alone.distance(), alone.isolation());
        assertTrue(table(kin("own", "own", all(1, 0))).remoteness(all(1, 0), "own").isEmpty());
    }

    /** At the limit the odds are even; they grow with the eighth power of the distance. */
    @Test
    void theOddsOfBeingUnlikeGrowWithRemoteness() {
        RemotenessLimits limits =
                new RemotenessLimits(Map.of(Regions.J, Math.log(2), Regions.H, Math.log(4)));
        assertEquals(0.5, limits.unlike(new Remoteness(2, 1), Regions.J), 1e-4);
        double twice = limits.unlike(new Remoteness(4, 1), Regions.J);
        assertEquals(256 / 257.0, twice, 1e-4);
        assertEquals(0.5, limits.unlike(new Remoteness(4, 1), Regions.H), 1e-4);
        assertEquals(
                0.5, limits.unlike(new Remoteness(4, 1), Regions.K), 1e-4, "the widest elsewhere");
        assertEquals(0.5, limits.unlike(new Remoteness(4, 4), Regions.J), 1e-4, "alone as it is");
        assertEquals(
                limits.unlike(new Remoteness(2, 1), Regions.J),
                limits.unlike(new Remoteness(2, 0.01), Regions.J),
                1e-12,
                "nearer to its kin than like objects are is not sparse");
        assertEquals(0, new RemotenessLimits(Map.of()).unlike(new Remoteness(9, 1), Regions.J));
    }

    @Test
    void aCoverageKeepsItsCodeAndItsFeatures() {
        for (Coverage coverage : Coverage.forests()) {
            assertEquals(coverage, Coverage.parse(coverage.code()));
            int[] columns = coverage.columns(features);
            assertTrue(columns.length > 0, coverage.code());
            for (int k : columns) {
                KindFeatures.KindFeature feature = features.features().get(k);
                assertEquals(0, feature.regions() & ~coverage.regions(), coverage.code());
                assertTrue(
                        coverage.withLines() || feature.block() == KindFeatures.Block.SHAPE,
                        coverage.code());
            }
            assertTrue(coverage.holdsFor(all(1, 0), features), coverage.code());
        }
        FeatureVector onlyH = all(1, 0).within(Regions.H, features);
        assertTrue(Coverage.parse("H").holdsFor(onlyH, features));
        assertTrue(!Coverage.parse("J").holdsFor(onlyH, features));
        assertTrue(!Coverage.parse("JH").holdsFor(onlyH, features));
    }
}
