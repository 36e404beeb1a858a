package emberline.place.standard;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.TypeEstimate;
import emberline.spectrum.Finding;
import java.util.Arrays;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.apache.commons.math3.distribution.FDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Fits of standards with fluxes chosen by hand, and what a comparison says. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class StandardVerdictTest {

    private static StandardMatch match(double type, double chiSquare, int freedom) {
        return new StandardMatch(
                new Standard("S" + type, type, "g" + type, "", null),
                Optional.empty(),
                1,
                0,
                chiSquare,
                freedom);
    }

    private static PairFit pair(double single, double sum, OptionalDouble falseAlarms) {
        StandardMatch both =
                new StandardMatch(
                        new Standard("A", 15, "a", "", null),
                        Optional.of(new Standard("B", 24, "b", "", null)),
                        1,
                        1,
                        100 * sum,
                        100);
        return new PairFit(match(18, 100 * single, 100), both, falseAlarms);
    }

    /** A fit within the noise cannot be improved: both chi-squares count as 1 at least. */
    @ParameterizedTest
    @CsvSource({"3, 1.5, 2", "3, 0.5, 3", "0.8, 0.4, 1", "0.5, 2, 0.5"})
    void theRatioIsOfChiSquaresOfOneAtLeast(double single, double sum, double ratio) {
        assertEquals(ratio, pair(single, sum, OptionalDouble.empty()).ratio(), 1e-12);
    }

    /** Two bins are one degree of freedom; the F distribution here is that of Commons Math. */
    @Test
    void confidenceIsThatOfTheFTest() {
        PairFit fit = pair(3, 1.5, OptionalDouble.empty());
        assertEquals(new FDistribution(50, 50).cumulativeProbability(2), fit.confidence(), 1e-9);
    }

    @Test
    void aCandidateIsConfidentAndRare() {
        assertEquals(PairFit.Outcome.CANDIDATE, pair(3, 1.5, OptionalDouble.of(0.05)).outcome());
        assertEquals(PairFit.Outcome.UNSURE, pair(3, 1.5, OptionalDouble.of(0.06)).outcome());
        assertEquals(PairFit.Outcome.UNSURE, pair(3, 1.5, OptionalDouble.empty()).outcome());
        assertEquals(PairFit.Outcome.NONE, pair(1.6, 1.5, OptionalDouble.of(0)).outcome());
        assertEquals("unsure", PairFit.Outcome.UNSURE.word());
    }

    /**
     * Of one type the best counts; a fit three times worse at 50 degrees counts next to nothing.
     */
    @Test
    void theTypeIsThatOfTheBestFits() {
        assertTrue(StandardType.of(List.of()).isEmpty());
        TypeEstimate even =
                StandardType.of(List.of(match(12, 100, 100), match(14, 100, 100))).orElseThrow();
        assertEquals(13, even.typeNumber(), 1e-12);
        assertEquals(Math.hypot(0.5, 1), even.sigmaSubclass(), 1e-12);
        TypeEstimate same =
                StandardType.of(
                                List.of(
                                        match(12, 100, 100),
                                        match(14, 100, 100),
                                        match(14.1, 100, 100)))
                        .orElseThrow();
        assertEquals(13, same.typeNumber(), 1e-12, "two of one type count once");
        double weight = 2 * (1 - new FDistribution(50, 50).cumulativeProbability(1.5));
        TypeEstimate worse =
                StandardType.of(List.of(match(12, 100, 100), match(14, 150, 100))).orElseThrow();
        assertEquals((12 + 14 * weight) / (1 + weight), worse.typeNumber(), 1e-6);
    }

    private static StandardVerdict verdict(double chiSquare, Optional<PairFit> pair) {
        return new StandardVerdict(
                Optional.of(TypeEstimate.normal(14, 0.6)),
                "",
                List.of(Range.J, Range.H),
                0,
                20,
                List.of(match(14, 100 * chiSquare, 100)),
                Map.of(),
                pair);
    }

    private static List<String> codes(StandardVerdict verdict, double adopted) {
        return verdict.findings(Optional.of(TypeEstimate.normal(adopted, 0.8))).stream()
                .map(Finding::code)
                .toList();
    }

    /** Errors 0.6 and 0.8 are 1 together: two subclasses agree, 2.1 do not. */
    @Test
    void aVerdictSaysWhatTheObserverShouldKnow() {
        StandardVerdict good = verdict(5, Optional.empty());
        assertEquals(List.of(), codes(good, 16));
        assertEquals(List.of("standards-disagree"), codes(good, 16.1));
        assertEquals(List.of("standards-disagree"), codes(good, 11.9));
        assertEquals(List.of("standards-fit-badly"), codes(verdict(5.1, Optional.empty()), 14));
        assertEquals(
                List.of("pair-by-standards"),
                codes(verdict(3, Optional.of(pair(3, 1.5, OptionalDouble.of(0.01)))), 14));
        assertEquals(
                List.of(),
                codes(verdict(3, Optional.of(pair(3, 1.5, OptionalDouble.of(0.1)))), 14));
        assertEquals(List.of(), good.findings(Optional.empty()));
        Finding none = StandardVerdict.none("no overlap").findings(Optional.empty()).get(0);
        assertEquals("not compared with the standards: no overlap", none.text());
    }

    private final CommonGrid grid = new CommonGrid(100);

    private Binned binned(double[] flux, double sigma) {
        double[] sigmas = new double[flux.length];
        Arrays.fill(sigmas, sigma);
        return new Binned(grid, flux, sigmas);
    }

    /** Fluxes by bin: a slope, times a factor within J. */
    private double[] slope(double per, double inJ) {
        double[] flux = new double[grid.size()];
        for (int k = 0; k < flux.length; k++) {
            boolean j = k >= grid.from(Range.J) && k < grid.to(Range.J);
            flux[k] = (1 + per * grid.centreMicron(k)) * (j ? inJ : 1);
        }
        return flux;
    }

    /** ln(1.34 / 1.10) times 100 is 19.7, ln(1.80 / 1.45) 21.6: one bin a resolution element. */
    @Test
    void aGridHasOneBinAResolutionElement() {
        assertEquals(19, grid.to(Range.J) - grid.from(Range.J));
        assertEquals(21, grid.to(Range.H) - grid.from(Range.H));
        assertEquals(grid.to(Range.Y), grid.from(Range.J));
        assertEquals(grid.size(), grid.to(Range.K));
        double step = Math.log(1.34 / 1.10) / 19;
        assertEquals(1.10 * (1 + Math.exp(step)) / 2, grid.centreMicron(grid.from(Range.J)), 1e-12);
        assertEquals(1, new CommonGrid(2).to(Range.OPTICAL));
    }

    @Test
    void coverageIsCountedInBins() {
        double[] flux = slope(0, 1);
        for (int k = 0; k < 4; k++) {
            flux[grid.from(Range.J) + k] = Double.NaN;
        }
        Binned holed = binned(flux, 0.1);
        assertEquals(15, holed.good(List.of(Range.J)));
        assertEquals(36, holed.good(List.of(Range.J, Range.H)));
        // 15 of 19 are 79%
        assertEquals(EnumSet.complementOf(EnumSet.of(Range.J)), holed.covered());
        flux[grid.from(Range.J)] = 3;
        Binned better = binned(flux, 0.1);
        assertTrue(better.covered().contains(Range.J), "16 of 19 are 84%");
        assertEquals((15 + 3) / 16.0, better.mean(Range.J), 1e-12);
    }

    @Test
    void aMultipleOfAStandardIsFoundWithItsScale() {
        ScaleFit.Target target =
                new ScaleFit.Target(binned(slope(0.5, 1), 0.01), Set.of(Range.J, Range.H));
        double[] third = Arrays.stream(slope(0.5, 1)).map(f -> f / 3).toArray();
        ScaleFit fit = ScaleFit.one(target, target.of(binned(third, 0))).orElseThrow();
        assertEquals(3, fit.a(), 1e-6);
        assertEquals(0, fit.b());
        assertEquals(0, fit.chiSquare(), 1e-6);
        assertEquals(40, fit.bins());
        double[] negative = Arrays.stream(third).map(f -> -f).toArray();
        assertTrue(ScaleFit.one(target, target.of(binned(negative, 0))).isEmpty());
    }

    @Test
    void aSumOfTwoIsTakenApart() {
        double[] first = slope(1, 1);
        double[] second = slope(-0.3, 1);
        double[] sum = new double[first.length];
        for (int k = 0; k < sum.length; k++) {
            sum[k] = 2 * first[k] + 5 * second[k];
        }
        ScaleFit.Target target =
                new ScaleFit.Target(binned(sum, 0.01), List.of(Range.J, Range.H, Range.K));
        double[] one = target.of(binned(first, 0));
        double[] two = target.of(binned(second, 0));
        for (ScaleFit fit :
                List.of(
                        ScaleFit.two(target, one, two).orElseThrow(),
                        ScaleFit.rough(target, one, two).orElseThrow())) {
            assertEquals(2, fit.a(), 1e-6);
            assertEquals(5, fit.b(), 1e-6);
            assertEquals(0, fit.chiSquare(), 1e-5);
        }
        double[] less = new double[first.length];
        for (int k = 0; k < less.length; k++) {
            less[k] = 2 * first[k] - 0.5 * second[k];
        }
        ScaleFit.Target negative =
                new ScaleFit.Target(binned(less, 0.01), List.of(Range.J, Range.H, Range.K));
        assertTrue(ScaleFit.two(negative, one, two).isEmpty(), "a scale below zero");
    }

    /**
     * J a tenth too bright on the flux of H: the factor of J takes most of it, for one sigma of
     * chi-square; without factors the same misfit is far more.
     */
    @Test
    void eachRangeHasAFactorOfItsOwn() {
        double[] flat = slope(0, 1);
        ScaleFit.Target target =
                new ScaleFit.Target(binned(slope(0, 1.1), 0), List.of(Range.J, Range.H, Range.K));
        ScaleFit fit = ScaleFit.one(target, target.of(binned(flat, 0))).orElseThrow();
        assertTrue(fit.chiSquare() > 0.1 && fit.chiSquare() < 1.5, "chi " + fit.chiSquare());
        // floors of 2% and 1%: weight 1 / (0.0005 y^2); noise of 3% adds to it
        ScaleFit.Target noisy = new ScaleFit.Target(binned(slope(0, 1), 0.03), List.of(Range.H));
        double[] off = slope(0, 1);
        off[grid.from(Range.H)] = 1.1;
        ScaleFit one = ScaleFit.one(noisy, noisy.of(binned(off, 0))).orElseThrow();
        double expected = 0.01 / (0.0009 + 0.0005) * 20 / 21.21;
        assertEquals(expected, one.chiSquare(), 0.06 * expected);
    }
}
