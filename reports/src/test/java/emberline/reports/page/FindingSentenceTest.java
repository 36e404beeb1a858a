package emberline.reports.page;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.reports.Samples;
import emberline.reports.Samples.Bands;
import org.junit.jupiter.api.Test;

class FindingSentenceTest {

    @Test
    void typeGravityAndSignalAreSaid() {
        String sentence = FindingSentence.of(Samples.lDwarf());
        assertTrue(
                sentence.matches(
                        "Spectral type L\\d(\\.5)? ± \\d\\.\\d by \\d+ features against spectra of"
                                + " known type \\(\\d+ published relations?: L\\d(\\.5)?"
                                + " ± \\d\\.\\d\\); gravity (FLD|INT|VL)-G \\(P [=<>]"
                                + " \\d\\.\\d\\d\\); (FLD|INT|VL)-G by \\d published"
                                + " scores?; S/N about \\d+ per pixel in [JHKY]\\."),
                sentence);
    }

    @Test
    void whatIsMissingIsSaidWithItsReason() {
        String dwarf = FindingSentence.of(Samples.tDwarf());
        assertTrue(dwarf.startsWith("No spectral type: kind: unlike known (p 0."), dwarf);
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
    void drawsDoNotClaimCertainty() {
        assertEquals("> 0.99", FindingSentence.probability(1));
        assertEquals("= 0.93", FindingSentence.probability(0.934));
        assertEquals("< 0.01", FindingSentence.probability(0));
    }
}
