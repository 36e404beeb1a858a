package emberline.place.standard;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedList;
import emberline.place.Blend;
import emberline.place.standard.StandardComparison.PairFit;
import emberline.place.standard.StandardComparison.Range;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Candidate;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;

class StandardComparisonTest {

    private static final List<Range> ALL = List.of(Range.J, Range.H, Range.K);
    private static final double SURE = 0.99;

    /** Field dwarfs of the shared list from M6 on, of good data and high resolution. */
    private static List<Standard> standards(List<String> without) throws Exception {
        List<Standard> standards = new ArrayList<>();
        for (Candidate candidate : SharedList.candidates()) {
            String set = candidate.text("dataset").orElse("");
            boolean wanted =
                    (set.equals("irtf_library") || set.equals("fullsed_w103"))
                            && candidate.text("known_kind").orElse("").equals("dwarf")
                            && candidate.number("known_type_number").orElse(0) >= 6;
            wanted |= candidate.name().equals("SIMP J2303+3150"); // T3
            if (wanted && !without.contains(candidate.name())) {
                standards.add(
                        new Standard(
                                candidate.name(),
                                candidate.number("known_type_number").getAsDouble(),
                                SharedList.prepared(candidate)));
            }
        }
        return standards;
    }

    private static final String M8 = "Gl 752B";
    private static final String L6 = "2MASS J15150083+4847416";
    private static final String L75 = "2MASS J08251968+2115521";
    private static final String L8 = "DENIS-P 025503.3-470049.0";
    private static final String T45 = "2MASS J05591915-1404489";

    private static PairFit fit(PreparedSpectrum object, String... parents) throws Exception {
        return new StandardComparison(standards(List.of(parents))).pair(object, ALL).orElseThrow();
    }

    /** The parents themselves are not among the standards. */
    @Test
    void blendsOfLAndTAreFoundAndSingleObjectsAreNot() throws Exception {
        PairFit blend = fit(Blend.of(L6, "L6", T45, "T4", 100, 1), L6, T45);
        assertTrue(blend.confidence() > SURE, blend.toString());
        assertTrue(blend.pair().second().typeNumber() >= 20, blend.toString());
        for (String single : List.of(M8, L6, L75, L8)) {
            PairFit fit = fit(Blend.single(single, 100, 1), single);
            assertTrue(fit.confidence() < SURE, single + " " + fit);
        }
    }

    @Test
    void twoLikeObjectsAreNoPair() throws Exception {
        PairFit fit = fit(Blend.of(L6, "L6", L75, "L6", 100, 1), L6, L75);
        assertTrue(fit.confidence() < SURE, fit.toString());
    }

    @Test
    void aLeftOutObjectIsLikeItsNeighboursInType() throws Exception {
        List<Standard> others = standards(List.of("LHS 2924", "LHS 2924 (2)"));
        List<StandardMatch> matches =
                new StandardComparison(others).singles(SharedList.prepared("LHS 2924"), ALL);
        assertEquals(others.size(), matches.size());
        assertEquals(9, matches.get(0).first().typeNumber(), 1.5);
        double[] type = StandardComparison.type(matches).orElseThrow();
        assertEquals(9, type[0], 1.5);
        assertTrue(type[1] >= 0.5 && type[1] < 3, Arrays.toString(type));
        for (Range range : Range.values()) {
            List<StandardMatch> one =
                    new StandardComparison(others)
                            .singles(SharedList.prepared("LHS 2924"), List.of(range));
            assertEquals(9, one.get(0).first().typeNumber(), 3, range.name());
        }
    }

    @Test
    void aSpectrumFitsItselfWithScaleOne() throws Exception {
        Standard self = new Standard("self", 9, SharedList.prepared("LHS 2924"));
        StandardMatch match =
                new StandardComparison(List.of(self)).singles(self.prepared(), ALL).get(0);
        assertEquals(1, match.scale(), 1e-9);
        assertEquals(0, match.chiSquare(), 1e-9);
        assertTrue(new StandardComparison(List.of(self)).pair(self.prepared(), ALL).isEmpty());
    }

    /** A straight line is its own mean at the middle of a bin, whatever the pixels. */
    @Test
    void binsKeepTheFlux() {
        double[] micron = new double[900];
        double[] flux = new double[900];
        double[] sigma = new double[900];
        for (int i = 0; i < micron.length; i++) {
            micron[i] = 1.1 + 3.1e-4 * i;
            flux[i] = 2 + 3 * micron[i];
            sigma[i] = 0.1;
        }
        PreparedSpectrum line =
                new PreparedSpectrum(
                        Spectrum.of(micron, flux, sigma),
                        new ResolvingPower(2000, ResolvingPower.Basis.GIVEN),
                        NoiseModel.INDEPENDENT,
                        List.of());
        CommonGrid grid = CommonGrid.over(List.of(new double[] {1.15, 1.30}), 100);
        CommonGrid.Binned binned = grid.of(line);
        for (int bin = 0; bin < grid.size(); bin++) {
            assertEquals(2 + 3 * grid.centreMicron(bin), binned.flux()[bin], 1e-3);
            double pixels = grid.centreMicron(bin) / 100 / 3.1e-4;
            assertEquals(0.1 / Math.sqrt(pixels), binned.sigma()[bin], 0.1 / pixels);
        }
        CommonGrid beyond = CommonGrid.over(List.of(new double[] {1.5, 1.6}), 100);
        assertTrue(Double.isNaN(beyond.of(line).flux()[0]));
    }
}
