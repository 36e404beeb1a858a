package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.judge.PropertyRelations.Quantity;
import emberline.place.GravityClass;
import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.Arrays;
import java.util.Map;
import java.util.Optional;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * Invented objects drawn from the mass function, the age prior and the grid, observed with noise:
 * among those judged substellar with some probability, that share is.
 */
class CalibrationTest {

    private static final int OBJECTS = 2000;
    private static final double[] EDGES = {0, 0.02, 0.1, 0.3, 0.5, 0.7, 0.9, 0.98, 1.0001};

    private final UniformRandomProvider random = RandomSource.XO_RO_SHI_RO_128_PP.create(20L);
    private final ZigguratSampler.NormalizedGaussian normal =
            ZigguratSampler.NormalizedGaussian.of(random);
    private final JudgeNumbers numbers = JudgeNumbers.standard();
    private final PropertyRelations relations = new PropertyRelations();
    private final AgeEvidence ages = new AgeEvidence(numbers);
    private final LithiumEvidence lithium = new LithiumEvidence(numbers);
    private final EvolutionGrid grid = EvolutionGrid.all().get(EvolutionGrid.Name.MERGED);
    private final NodeTable table = new NodeTable(grid, grid, AgeStatement.none(), numbers, 2);
    private final Judge judge = new Judge(Judging.withDefaults());

    private int draw(double[] weights) {
        double sum = Arrays.stream(weights).sum();
        double left = random.nextDouble() * sum;
        int i = 0;
        while (i < weights.length - 1 && left >= weights[i]) {
            left -= weights[i];
            i++;
        }
        return i;
    }

    /** The type at which a sequence has a temperature; empty beyond M6 to T8. */
    private Optional<Double> type(Sequence sequence, double teff) {
        for (int n = 20; n < 240; n++) {
            double here = value(sequence, n);
            double next = value(sequence, n + 1);
            if (teff <= here && teff > next) {
                return Optional.of(TypeAxis.type(n) + 0.1 * (here - teff) / (here - next));
            }
        }
        return Optional.empty();
    }

    private double value(Sequence sequence, int n) {
        double type = TypeAxis.type(n);
        return relations.at(Quantity.TEFF, sequence, type).orElseThrow().at(type);
    }

    private Optional<Evidence> observed(int a, int m, int k) {
        double[] shares = ages.classShares(table.ageMyr(a));
        boolean young = random.nextDouble() < AgeEvidence.youngSequence(shares);
        Sequence sequence = young ? Sequence.YOUNG : Sequence.FIELD;
        double rms =
                type(sequence, table.teff(a, m))
                        .map(t -> relations.at(Quantity.TEFF, sequence, t).orElseThrow().rms(t))
                        .orElse(young ? 182.0 : 99.0);
        Optional<Double> type = type(sequence, table.teff(a, m) + rms * normal.sample());
        if (type.isEmpty()) {
            return Optional.empty();
        }
        GravityClass gravity = GravityOrder.CLASSES.get(draw(shares));
        Evidence evidence = Evidence.ofType(type.get(), 0.1, Optional.of(gravity));
        if (k % 2 == 0) {
            double chance =
                    lithium.chance(new TypeMix(evidence), LithiumTest.unknown())
                            * lithium.youngFactor(
                                    new TypeMix(evidence).meanType(), table.ageMyr(a));
            double seen = lithium.seen(table.lithiumLeft(a, m), chance, false);
            evidence =
                    evidence.withLithium(
                            random.nextDouble() < seen
                                    ? LithiumTest.seen()
                                    : LithiumTest.notSeen(0));
        }
        return Optional.of(evidence);
    }

    @Tag("slow")
    @Test
    void theStatedProbabilityIsTheShare() {
        double[] massWeights = new double[table.masses()];
        Arrays.setAll(massWeights, table::massWeight);
        double[] ageWeights = new double[table.ages()];
        Arrays.setAll(ageWeights, table::ageWeight);
        int[] count = new int[EDGES.length - 1];
        double[] stated = new double[EDGES.length - 1];
        int[] below = new int[EDGES.length - 1];
        for (int k = 0; k < OBJECTS; ) {
            int m = draw(massWeights);
            Optional<Evidence> evidence = observed(draw(ageWeights), m, k);
            if (evidence.isEmpty()) {
                continue;
            }
            k++;
            double p = judge.judge(evidence.get()).limits().pSubstellar();
            int bin = 0;
            while (p >= EDGES[bin + 1]) {
                bin++;
            }
            count[bin]++;
            stated[bin] += p;
            below[bin] += table.mass(m) < numbers.of("hydrogen-limit") ? 1 : 0;
        }
        for (int bin = 0; bin < count.length; bin++) {
            if (count[bin] >= 20) {
                double p = stated[bin] / count[bin];
                double share = (double) below[bin] / count[bin];
                double sigma = Math.sqrt((p * (1 - p) + 1e-3) / count[bin]);
                assertEquals(p, share, 3.3 * sigma, "bin from " + EDGES[bin] + ", n " + count[bin]);
            }
        }
        assertTrue(Arrays.stream(count).filter(c -> c >= 20).count() >= 6, Arrays.toString(count));
    }

    /** A parallax on the true luminosity: the same test where the luminosity counts. */
    @Tag("slow")
    @Test
    void withAParallaxToo() {
        double[] massWeights = new double[table.masses()];
        Arrays.setAll(massWeights, table::massWeight);
        double[] ageWeights = new double[table.ages()];
        Arrays.setAll(ageWeights, table::ageWeight);
        int count = 0;
        double stated = 0;
        double variance = 0;
        int below = 0;
        for (int k = 1; count < 400; k += 2) {
            int a = draw(ageWeights);
            int m = draw(massWeights);
            Optional<Evidence> evidence = observed(a, m, k);
            if (evidence.isEmpty() || table.logL(a, m) < -5.6 || table.logL(a, m) > -3) {
                continue;
            }
            double absolute = absoluteH(table.logL(a, m) + 0.056 * normal.sample());
            Evidence seen =
                    evidence.get()
                            .withPhotometry(
                                    Map.of(MagnitudeBand.H_2MASS, new Magnitude(absolute, 0)))
                            .withAstrometry(Astrometry.ofParallax(100, 0.01));
            double p = judge.judge(seen).limits().pSubstellar();
            count++;
            stated += p;
            variance += p * (1 - p);
            below += table.mass(m) < numbers.of("hydrogen-limit") ? 1 : 0;
        }
        assertEquals(stated, below, 3.5 * Math.sqrt(variance) + 4);
    }

    /** Absolute magnitude of the field relation at a luminosity. */
    private double absoluteH(double logL) {
        double low = 9.3;
        double high = 17.9;
        for (int i = 0; i < 40; i++) {
            double middle = (low + high) / 2;
            double here =
                    relations
                            .at(
                                    Quantity.LOG_L_FROM_MAG,
                                    MagnitudeBand.H_2MASS,
                                    Sequence.FIELD,
                                    middle)
                            .orElseThrow()
                            .at(middle);
            if (here > logL) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return (low + high) / 2;
    }
}
