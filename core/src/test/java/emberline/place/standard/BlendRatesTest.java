package emberline.place.standard;

import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.place.Blend;
import emberline.place.Placer;
import emberline.place.pair.PairVerdict.Strength;
import emberline.place.standard.PairFit.Outcome;
import emberline.prepare.PreparedSpectrum;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

/**
 * How often blends of two real dwarfs are found, and single ones taken for blends: by the published
 * criteria of indices, and by sums of standards. Blends are made on an absolute scale and seen
 * through a prism of R = 120; the objects that a blend is made of, and all other spectra of them,
 * are not among the standards. Rates that were measured stand beside each limit.
 */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class BlendRatesTest {

    private static final Measurer MEASURER =
            new Measurer(FeatureCatalogue.standard(), Measuring.withDefaults());
    private final Placer placer = new Placer(FeatureCatalogue.standard());
    private static final int SEEDS = 2;

    private List<Standard> standards;
    private List<Standard> singles;
    private StandardComparison comparison;

    @BeforeAll
    void read() throws Exception {
        standards = SharedStandards.of("A");
        singles = SharedStandards.of("AB");
        comparison = new StandardComparison(standards);
    }

    /** Objects that were looked at, and of these what either method calls a candidate. */
    private static final class Rates {
        private int objects;
        private int byIndices;
        private int byStandards;

        double indices() {
            return byIndices / (double) objects;
        }

        double standards() {
            return byStandards / (double) objects;
        }

        @Override
        public String toString() {
            return byIndices + " by indices, " + byStandards + " by standards, of " + objects;
        }
    }

    private List<Standard> ofType(double from, double to) {
        return standards.stream()
                .filter(s -> s.typeNumber() >= from && s.typeNumber() <= to)
                .toList();
    }

    private void look(Rates rates, List<Standard> objects, double snr, long seed) {
        PreparedSpectrum seen =
                Blend.prism(
                        objects.stream().map(s -> Map.entry(s.typeNumber(), s.prepared())).toList(),
                        snr,
                        seed);
        List<String> groups = objects.stream().map(Standard::group).toList();
        StandardVerdict verdict =
                comparison.compare(List.of(seen), standard -> groups.contains(standard.group()));
        rates.objects++;
        rates.byStandards +=
                verdict.pair().filter(fit -> fit.outcome() == Outcome.CANDIDATE).isPresent()
                        ? 1
                        : 0;
        Optional<Strength> strength = placer.place(MEASURER.measure(seen), seed).pair().strength();
        rates.byIndices += strength.equals(Optional.of(Strength.CANDIDATE)) ? 1 : 0;
    }

    private Rates blends(List<Standard> first, List<Standard> second, double snr) {
        Rates rates = new Rates();
        for (int seed = 1; seed <= SEEDS; seed++) {
            for (Standard a : first) {
                for (Standard b : second) {
                    if (!a.name().equals(b.name())) {
                        look(rates, List.of(a, b), snr, seed);
                    }
                }
            }
        }
        return rates;
    }

    /** Objects that T5 stands for: T4.5 and T6. */
    private List<Standard> t5() {
        return ofType(24, 26.5);
    }

    @Test
    void halfOfTheBlendsOfLAndTAreFoundAtGoodSignal() {
        Rates good = blends(ofType(14, 16.5), t5(), 50);
        assertTrue(good.standards() >= 0.5, good.toString());
        assertTrue(good.indices() >= 0.4, good.toString());
        Rates noisy = blends(ofType(14, 16.5), t5(), 20);
        assertTrue(noisy.standards() >= 0.15, noisy.toString());
        assertTrue(noisy.indices() >= 0.35, noisy.toString());
    }

    /** The T dwarf gives 3% of the light in J: neither method sees it. */
    @Test
    void aCompanionOfTypeTBesideM8IsNotSeen() {
        Rates rates = blends(ofType(7.5, 8.5), t5(), 50);
        assertTrue(rates.standards() <= 0.05 && rates.indices() <= 0.05, rates.toString());
    }

    @Test
    void twoLikeObjectsAreSeldomAPair() {
        for (double snr : new double[] {50, 20}) {
            Rates rates = blends(ofType(15, 17.5), ofType(15, 17.5), snr);
            assertTrue(rates.standards() <= 0.15 && rates.indices() <= 0.05, rates.toString());
        }
    }

    @Test
    void singleObjectsAreSeldomAPair() {
        assertTrue(singles.size() > 90, singles.size() + " objects");
        for (double snr : new double[] {50, 20}) {
            Rates rates = new Rates();
            for (Standard single : singles) {
                look(rates, List.of(single), snr, 1);
            }
            assertTrue(rates.standards() <= 0.06 && rates.indices() <= 0.03, rates.toString());
        }
    }
}
