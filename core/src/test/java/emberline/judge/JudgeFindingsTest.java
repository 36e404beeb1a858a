package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.spectrum.Finding;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class JudgeFindingsTest {

    private static List<Finding> after(Consumer<JudgeFindings> said) {
        JudgeFindings findings = new JudgeFindings(Judging.withDefaults());
        said.accept(findings);
        return findings.list();
    }

    private static void assertSilent(Consumer<JudgeFindings> said) {
        assertEquals(List.of(), after(said));
    }

    private static void assertSays(String code, String words, Consumer<JudgeFindings> said) {
        List<Finding> found = after(said);
        assertEquals(1, found.size(), found.toString());
        assertEquals(code, found.get(0).code());
        assertTrue(found.get(0).text().contains(words), found.get(0).text());
    }

    @Test
    void typesBeyondTheRelationsAreSaidFromFivePercentOn() {
        assertSilent(f -> f.offRelations(0.05));
        assertSays("type-off-relations", "37% of the type", f -> f.offRelations(0.37));
    }

    @Test
    void theEndsOfTheGridsAreSaid() {
        assertSays("mass-at-grid-edge", "about M4", f -> f.lateOrEarly(5.4));
        assertSilent(f -> f.lateOrEarly(5.5));
        assertSilent(f -> f.lateOrEarly(29));
        assertSays("few-y-dwarfs", "beyond T9", f -> f.lateOrEarly(29.1));
    }

    /** Only the opposite decision disagrees: an open one on either side does not. */
    @ParameterizedTest
    @CsvSource({
        "SUBSTELLAR, 0.02, 1",
        "STELLAR, 0.97, 1",
        "SUBSTELLAR, 0.5, 0",
        "SUBSTELLAR, 0.97, 0",
        "UNDECIDED, 0.02, 0"
    })
    void onlyTheOppositeDecisionIsADisagreement(Decision decision, double there, int said) {
        Limits limits = new Limits(0.5, 0.5, 0.5, 0, decision);
        List<Finding> found =
                after(
                        f ->
                                f.grids(
                                        limits,
                                        List.of(
                                                new GridComparison(
                                                        EvolutionGrid.Name.DUSTY00, there, 0.07))));
        assertEquals(said, found.size());
        if (said > 0) {
            assertEquals(
                    "the grid DUSTY00 alone would say " + (there < 0.5 ? "stellar" : "substellar"),
                    found.get(0).text());
        }
    }

    @Test
    void solarGridsAreSaidForMetalPoorObjects() {
        assertSilent(f -> f.metalPoor(0.5));
        assertSays("grids-are-solar", "metal-poor with p = 0.51", f -> f.metalPoor(0.51));
    }

    /** Errors 0.3 and 0.4 dex are 0.5 together: 3 sigma are 1.5 dex. */
    @Test
    void aLuminosityThreeSigmaOffIsSaidWithItsSense() {
        Estimate type = Estimate.normal(-4, 0.4);
        assertSilent(f -> f.luminosity(Estimate.normal(-2.51, 0.3), type));
        assertSilent(f -> f.luminosity(Estimate.normal(-5.49, 0.3), type));
        assertSays(
                "luminosity-unlike-type",
                "log L -2.40 from the parallax is 3.2 sigma brighter than field objects of the type:"
                        + " young, or an unresolved pair",
                f -> f.luminosity(Estimate.normal(-2.4, 0.3), type));
        assertSays(
                "luminosity-unlike-type",
                "3.2 sigma fainter than field objects of the type: check type",
                f -> f.luminosity(Estimate.normal(-5.6, 0.3), type));
    }

    @Test
    void aTestThatCouldNotSeeLithiumIsNoTest() {
        assertSays(
                "lithium-limit-useless",
                "neither would",
                f -> f.lithium(LithiumTest.notSeen(9), 0.29));
        assertSilent(f -> f.lithium(LithiumTest.notSeen(9), 0.3));
        assertSilent(f -> f.lithium(LithiumTest.seen(), 0.1));
    }

    @Test
    void aParallaxThatWasNotUsedIsSaid() {
        Evidence weak =
                Evidence.ofType(12, 0.5, Optional.empty())
                        .withAstrometry(Astrometry.ofParallax(10, 5));
        assertSays("parallax-weak", "below 5 times", f -> f.parallax(weak, false));
        assertSilent(f -> f.parallax(weak, true));
        assertSilent(f -> f.parallax(Evidence.ofType(12, 0.5, Optional.empty()), false));
    }
}
