package emberline.reports.page;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.MetallicityClass.Name;
import emberline.judge.Decision;
import emberline.judge.Limits;
import emberline.place.metallicity.MetallicityVerdict;
import emberline.place.pair.PairVerdict;
import emberline.place.pair.PairVerdict.Strength;
import emberline.reports.Samples;
import emberline.reports.Samples.Bands;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class FindingSentenceTest {

    @Test
    void typeGravityAndSignalAreSaid() {
        String sentence = FindingSentence.of(Samples.demoLDwarf());
        assertTrue(
                sentence.matches(
                        "Spectral type L\\d(\\.5)? ± \\d\\.\\d by \\d+ features against spectra of"
                                + " known type \\(\\d+ published relations?: L\\d(\\.5)?"
                                + " ± \\d\\.\\d\\); gravity (FLD|INT|VL)-G \\(P [=<>]"
                                + " \\d\\.\\d\\d\\); (FLD|INT|VL)-G by \\d published"
                                + " scores?; .*S/N about \\d+ per pixel in [JHKY]\\."),
                sentence);
    }

    @Test
    void whatIsMissingIsSaidWithItsReason() {
        String dwarf = FindingSentence.of(Samples.tDwarf());
        assertTrue(dwarf.startsWith("Most probable kind: unlike known (P = 0."), dwarf);
        String none =
                FindingSentence.of(
                        Samples.object(
                                "x", Samples.spectrum(2.0, 2.1, 40, Bands.L_DWARF, 60, 9), 120));
        assertTrue(none.startsWith("No spectral type: "), none);
        assertEquals(
                "Nothing was measured: no such file.",
                FindingSentence.of(Samples.failed("x", "no such file")));
    }

    @Test
    void anOpenDecisionSaysHowFarItHangsOnTheLimit() {
        assertEquals(
                "undecided whether substellar (P(substellar) = 0.99; 0.57 to 1.00 by the limit)",
                FindingSentence.decision(new Limits(0.567, 0.991, 1, 0.001, Decision.UNDECIDED)));
        assertEquals(
                "substellar (P(substellar) = 0.98)",
                FindingSentence.decision(new Limits(0.96, 0.98, 0.99, 0.001, Decision.SUBSTELLAR)));
    }

    @Test
    void pairsAndMetalPoorObjectsAreSaid() {
        assertEquals(
                Optional.of("perhaps an unresolved pair (4 of 6 criteria)"),
                FindingSentence.pair(pair(Strength.CANDIDATE, 4)));
        assertEquals(
                Optional.of("weak hint of an unresolved pair (2 of 6 criteria)"),
                FindingSentence.pair(pair(Strength.WEAK, 2)));
        assertEquals(Optional.empty(), FindingSentence.pair(pair(Strength.NONE, 0)));
        assertEquals(Optional.empty(), FindingSentence.pair(PairVerdict.notJudged("too early")));
        assertEquals(
                Optional.of("metal-poor, class esd"),
                FindingSentence.metallicity(metallicity(Optional.of(Name.EXTREME_SUBDWARF))));
        assertEquals(
                Optional.empty(),
                FindingSentence.metallicity(metallicity(Optional.of(Name.DWARF))));
        assertEquals(Optional.empty(), FindingSentence.metallicity(metallicity(Optional.empty())));
    }

    private static PairVerdict pair(Strength strength, int met) {
        return new PairVerdict(
                Optional.of(strength), met, 6, OptionalDouble.of(0.5), "", List.of());
    }

    private static MetallicityVerdict metallicity(Optional<Name> adopted) {
        return new MetallicityVerdict(adopted, "", Map.of(), List.of(), "", "");
    }

    @Test
    void drawsDoNotClaimCertainty() {
        assertEquals("> 0.99", FindingSentence.probability(1));
        assertEquals("= 0.93", FindingSentence.probability(0.934));
        assertEquals("< 0.01", FindingSentence.probability(0));
    }
}
