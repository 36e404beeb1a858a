package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.GravityClass;
import java.util.Arrays;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The cells of mass and age, their prior, and the posterior on them. */
class NodePosteriorTest {

    private static final JudgeNumbers NUMBERS = JudgeNumbers.standard();
    private static final EvolutionGrid GRID = EvolutionGrid.all().get(EvolutionGrid.Name.MERGED);

    private final NodeTable table = table(AgeStatement.none(), 1);

    private static NodeTable table(AgeStatement age, double fineness) {
        return new NodeTable(GRID, GRID, age, NUMBERS, fineness);
    }

    private NodePosterior posterior(Evidence evidence) {
        LithiumEvidence lithium = new LithiumEvidence(NUMBERS);
        EvidenceCurves curves =
                new EvidenceCurves(
                        evidence,
                        new TypeMix(evidence),
                        new TypeKernel(new PropertyRelations()),
                        new AgeEvidence(NUMBERS),
                        lithium,
                        Optional.empty(),
                        Optional.empty(),
                        Optional.empty());
        return new NodePosterior(table, curves, NUMBERS);
    }

    /** No cell is cut by a limit, so each limit is an edge; ages have one at 150 Myr. */
    @Test
    void edgesLieOnTheLimits() {
        double[] mass = table.massEdges();
        for (double limit : new double[] {0.002, 0.01241, 0.05, 0.070, 0.072, 0.075, 0.1, 0.2}) {
            assertTrue(Arrays.stream(mass).anyMatch(e -> e == limit), "no edge at " + limit);
        }
        assertEquals(238, table.masses());
        assertEquals(72, table.ages());
        assertTrue(Arrays.stream(table.ageEdgesMyr()).anyMatch(e -> Math.abs(e - 150) < 1e-9));
        for (int i = 1; i < mass.length; i++) {
            assertTrue(mass[i] > mass[i - 1], "edge " + i);
        }
        assertEquals(
                Math.sqrt(mass[7] * mass[8]), table.mass(7), 1e-15, "centres lie between edges");
        assertEquals(476, table(AgeStatement.none(), 2).masses());
    }

    /** Narrow ages have 24 cells at least, of even steps where 150 Myr lies outside. */
    @ParameterizedTest
    @CsvSource({"20..30Myr, 24", "150..200Myr, 24", "100..150Myr, 24", "100..10000Myr, 48"})
    void statedAgesHaveTheirOwnCells(String text, int cells) {
        AgeStatement age = AgeStatement.parse(text);
        double[] edges = table(age, 1).ageEdgesMyr();
        assertEquals(cells, edges.length - 1);
        assertEquals(age.lowMyr(), edges[0], 1e-9);
        assertEquals(age.highMyr(), edges[cells], 1e-9);
        for (int i = 1; i < edges.length; i++) {
            assertTrue(edges[i] > edges[i - 1], "edge " + i);
        }
        if (age.lowMyr() >= 150 || age.highMyr() <= 150) {
            assertEquals(edges[1] / edges[0], edges[cells] / edges[cells - 1], 1e-9);
        }
    }

    /** dN/dM ~ M^-0.6 below 0.05 and M^-0.25 above, continuous: summed numerically. */
    @ParameterizedTest
    @CsvSource({"0.01, 0.03", "0.02, 0.08", "0.05, 0.2", "0.06, 0.07"})
    void theMassFunctionIsItsPowerLaws(double low, double high) {
        double sum = 0;
        int steps = 20_000;
        for (int i = 0; i < steps; i++) {
            double mass = low + (high - low) * (i + 0.5) / steps;
            sum += Math.pow(mass / 0.05, mass < 0.05 ? -0.6 : -0.25) * (high - low) / steps;
        }
        assertEquals(sum, new MassFunction(NUMBERS).between(low, high), 1e-7 * sum + 1e-9);
    }

    /** The prior is even in time: a weight by the width of the cell. */
    @Test
    void weightsOfAgesAreTheirWidths() {
        double[] edges = table.ageEdgesMyr();
        assertEquals(edges[10] - edges[9], table.ageWeight(9), 1e-9);
        double all = 0;
        for (int a = 0; a < table.ages(); a++) {
            all += table.ageWeight(a);
        }
        assertEquals(9990, all, 1e-6);
    }

    /** log g 4.438 is that of the Sun: radius by g = G M / R^2 in solar units. */
    @Test
    void radiusAndPlacesFollowFromTheGrid() {
        int m = 150;
        int a = 40;
        assertEquals(
                table.mass(m) / Math.pow(10, table.logG(a, m) - 4.438),
                Math.pow(table.radius(a, m), 2),
                1e-12);
        assertEquals(150 + 10 * table.teffPlace(a, m), table.teff(a, m), 1e-9);
        assertEquals(-9 + 0.02 * table.logLPlace(a, m), table.logL(a, m), 1e-9);
        // the coldest and faintest count at the first point
        assertEquals(0, table.teffPlace(71, 0));
        assertTrue(table.teff(71, 0) < 150);
        assertEquals(0.1 * 8 + 0.9 * 2, NodeTable.along(new double[] {5, 8, 2}, 1.9), 1e-12);
    }

    @Test
    void theSumsOfAPosteriorAgree() {
        NodePosterior posterior = posterior(Evidence.ofType(14, 0.5, Optional.empty()));
        assertEquals(1, Arrays.stream(posterior.byAge()).sum(), 1e-9);
        assertEquals(1, Arrays.stream(posterior.byMass()).sum(), 1e-9);
        assertEquals(1, posterior.below(1), 1e-9);
        assertEquals(0, posterior.below(0.002));
        assertEquals(1, posterior.cooler(5000), 1e-9);
        assertEquals(0, posterior.cooler(500), 1e-9);
        double below = posterior.below(0.072);
        double[] mass = table.massEdges();
        double sum = 0;
        for (int m = 0; mass[m + 1] <= 0.072; m++) {
            sum += posterior.byMass()[m];
        }
        assertEquals(sum, below, 1e-12);
        double[] kinds = posterior.after(Piece.COUNT);
        assertEquals(below, (kinds[1] + kinds[3]) / Arrays.stream(kinds).sum(), 1e-12);
        // L4 has about 1700 K, 68% of it between the ends of the estimate
        Estimate teff = posterior.estimate(NodeTable::teff, 150, 3750, 360);
        assertEquals(0.5, posterior.cooler(teff.median()), 0.05);
        assertEquals(0.16, posterior.cooler(teff.lo68()), 0.05);
    }

    /** A young object lies on the young sequence, one of the field not. */
    @Test
    void theYoungSequenceIsThatOfLowGravity() {
        double young =
                posterior(Evidence.ofType(12, 0.5, Optional.of(GravityClass.VL_G)))
                        .onYoungSequence();
        double field =
                posterior(Evidence.ofType(12, 0.5, Optional.of(GravityClass.FLD_G)))
                        .onYoungSequence();
        assertTrue(young > 0.8 && young <= 1, "young " + young);
        assertTrue(field < 0.1 && field >= 0, "field " + field);
    }

    /** The plane adds the cells up: all of them to 1, and its edges run over the whole table. */
    @Test
    void thePlaneHoldsThePosterior() {
        NodePosterior posterior = posterior(Evidence.ofType(14, 0.5, Optional.empty()));
        MassAgePlane plane = new MassAgePlane(posterior);
        double all = 0;
        double light = 0;
        for (int a = 0; a < plane.ages(); a++) {
            for (int m = 0; m < plane.masses(); m++) {
                all += plane.probability(a, m);
                light += plane.massEdgeMsun(m + 1) < 0.04 ? plane.probability(a, m) : 0;
            }
        }
        assertEquals(1, all, 1e-9);
        assertEquals(posterior.below(0.04), light, 0.03);
        assertEquals(0.002, plane.massEdgeMsun(0), 1e-12);
        assertEquals(0.02, plane.massEdgeMsun(24), 1e-12);
        assertEquals(0.2, plane.massEdgeMsun(48), 1e-12);
        assertEquals(10, plane.ageEdgeMyr(0), 1e-9);
        assertEquals(Math.pow(10, 2.5), plane.ageEdgeMyr(18), 1e-6);
        assertEquals(10_000, plane.ageEdgeMyr(36), 1e-6);
    }

    /** The information of a posterior that is the prior is none; of an even half, one bit. */
    @Test
    void ageIsToldByWhatMovesItFromThePrior() {
        NodePosterior posterior =
                posterior(Evidence.ofType(12, 0.5, Optional.of(GravityClass.VL_G)));
        AgeResult young = AgeResult.of(posterior, AgeStatement.none(), 150);
        double bits = 0;
        double[] edges = table.ageEdgesMyr();
        double[] after = posterior.byAge();
        double below = 0;
        for (int a = 0; a < after.length; a++) {
            bits +=
                    after[a] == 0
                            ? 0
                            : after[a]
                                    * Math.log(after[a] / ((edges[a + 1] - edges[a]) / 9990))
                                    / Math.log(2);
            below += edges[a + 1] <= 150.001 ? after[a] : 0;
        }
        assertEquals(bits, young.informationBits(), 1e-9);
        assertTrue(bits > 2 && young.isTold(), bits + " bit");
        assertEquals(below, young.pYoung(), 1e-9);
        assertEquals(0, AgeResult.of(posterior, AgeStatement.none(), 5).pYoung());
        // a cell that the age cuts counts by its part
        double cut = edges[30] + 0.25 * (edges[31] - edges[30]);
        double upTo = Arrays.stream(after, 0, 30).sum() + 0.25 * after[30];
        assertEquals(upTo, AgeResult.of(posterior, AgeStatement.none(), cut).pYoung(), 1e-9);
        Map<GravityClass, Double> none = Map.of();
        Evidence field = Evidence.of(Evidence.ofType(12, 0.5, Optional.empty()).type(), none);
        assertTrue(
                !AgeResult.of(posterior(field), AgeStatement.none(), 150).isTold(),
                "a type alone tells no age");
    }

    /** Mass in four ranges, 4 more for the young, 8 more for the cool: every cell of the table. */
    @Test
    void kindsFollowMassAgeAndTemperature() {
        Kinds kinds = new Kinds(NUMBERS);
        int[] counted = new int[Kinds.COUNT];
        for (int a = 0; a < table.ages(); a++) {
            for (int m = 0; m < table.masses(); m++) {
                int kind = kinds.of(table, a, m);
                double mass = table.mass(m);
                long limits =
                        Arrays.stream(new double[] {0.070, 0.072, 0.075})
                                .filter(limit -> mass > limit)
                                .count();
                assertEquals(limits, kind % 4, "mass " + mass);
                assertEquals(table.ageMyr(a) < 150, (kind & 4) != 0, "age " + table.ageMyr(a));
                assertEquals(table.teff(a, m) < 1300, (kind & 8) != 0, "K " + table.teff(a, m));
                counted[kind]++;
            }
        }
        assertTrue(counted[0] > 0 && counted[3] > 0 && counted[4] > 0 && counted[8] > 0, "kinds");
    }
}
