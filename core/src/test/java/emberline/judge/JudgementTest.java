package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.GravityClass;
import emberline.place.TypeEstimate;
import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The words of a judgement, and the papers and properties behind it. */
class JudgementTest {

    private final Judge judge = new Judge(Judging.withDefaults());
    private static final Evidence L2 = Evidence.ofType(12, 0.5, Optional.empty());
    private final Judgement plain = judge.judge(L2);

    private Judgement with(Decision decision, AgeResult age, NextStep... steps) {
        return new Judgement(
                new Limits(0.5, 0.5, 0.5, 0, decision),
                plain.massMsun(),
                age,
                plain.properties(),
                plain.substellarLedger(),
                plain.youngLedger(),
                plain.grids(),
                Arrays.asList(steps),
                plain.priority(),
                plain.plane(),
                List.of());
    }

    private static NextStep step(double gain, OptionalDouble resolvingPower, OptionalDouble snr) {
        return new NextStep(
                FollowUp.LITHIUM,
                "a spectrum",
                Aim.SUBSTELLAR,
                gain,
                0.25,
                resolvingPower,
                snr,
                "an hour");
    }

    @Test
    void theNextStepSaysWhatItTakes() {
        OptionalDouble no = OptionalDouble.empty();
        String rest =
                ": 0.30 bit expected on substellar, changes the decision with p = 0.25; an hour";
        assertEquals("a spectrum" + rest, words(step(0.3, no, no)));
        assertEquals(
                "a spectrum (R >= 2000)" + rest, words(step(0.3, OptionalDouble.of(2000), no)));
        assertEquals("a spectrum (S/N >= 20)" + rest, words(step(0.3, no, OptionalDouble.of(20))));
        assertEquals(
                "a spectrum (R >= 2000, S/N >= 20)" + rest,
                words(step(0.3, OptionalDouble.of(2000), OptionalDouble.of(20))));
    }

    private String words(NextStep... steps) {
        return with(Decision.UNDECIDED, plain.age(), steps).nextStepWords();
    }

    @Test
    void whereNothingHelpsThatIsSaid() {
        NextStep weak = step(0.01, OptionalDouble.empty(), OptionalDouble.empty());
        String none = "none of the further observations weighed here could change the decision";
        assertEquals(none, words());
        assertEquals(none, with(Decision.STELLAR, plain.age(), weak).nextStepWords());
        assertEquals(
                "no single further observation is likely to change the decision; most would come"
                        + " from: a spectrum (0.01 bit on substellar)",
                words(weak));
    }

    private String age(double lo68, double hi68, AgeStatement prior, double bits) {
        Estimate myr = new Estimate((lo68 + hi68) / 2, lo68, hi68, lo68, hi68);
        return with(Decision.UNDECIDED, new AgeResult(myr, 0.5, prior, bits)).ageWords();
    }

    @Test
    void theAgeSaysWhereItComesFrom() {
        AgeStatement none = AgeStatement.none();
        assertEquals("50 to 999 Myr", age(50, 999, none, 0.1));
        assertEquals("0.50 to 1.00 Gyr", age(500, 1000, none, 3));
        assertEquals("no age information (prior 1.60 to 8.40 Gyr)", age(1600, 8400, none, 0.09));
        assertEquals(
                "112 to 128 Myr (as stated)", age(112, 128, AgeStatement.parse("120+-8Myr"), 0.05));
    }

    private static List<String> papers(Judgement judgement, double type) {
        return Judge.sources(judgement, Optional.of(TypeEstimate.normal(type, 0.5))).stream()
                .map(source -> source.key())
                .toList();
    }

    private static List<String> papers(Judgement judgement) {
        return Judge.sources(judgement, Optional.empty()).stream().map(s -> s.key()).toList();
    }

    private static List<String> with(List<String> papers, String... more) {
        return Stream.concat(papers.stream(), Arrays.stream(more)).sorted().distinct().toList();
    }

    /** By the source columns of the tables: grids, limits and mass function always. */
    @Test
    void papersAreThoseOfWhatCounted() {
        List<String> always =
                List.of(
                        "baraffe2003",
                        "baraffe2015",
                        "chabrier2000",
                        "chabrier2023",
                        "kirkpatrick2024",
                        "spiegel2011");
        assertEquals(always, papers(plain));
        assertEquals(with(always, "best2024", "sanghi2023"), papers(plain, 12));
        assertEquals(with(always, "pecaut2013"), papers(plain, 4.9));
        assertEquals(with(always, "best2024", "pecaut2013", "sanghi2023"), papers(plain, 29.5));
        assertEquals(
                with(always, "kirkpatrick2008"),
                papers(judge.judge(L2.withLithium(LithiumTest.notSeen(0)))));
        assertEquals(
                with(always, "bardalez2019", "best2024"),
                papers(judge.judge(Evidence.ofType(12, 0.5, Optional.of(GravityClass.FLD_G)))));
        OptionalDouble no = OptionalDouble.empty();
        Evidence moving =
                L2.withAstrometry(
                                new Astrometry(
                                        no,
                                        no,
                                        OptionalDouble.of(50),
                                        OptionalDouble.of(0.5),
                                        OptionalDouble.of(100),
                                        OptionalDouble.of(0),
                                        no))
                        .withPhotometry(Map.of(MagnitudeBand.H_2MASS, new Magnitude(13, 0.03)));
        assertEquals(with(always, "best2024", "sanghi2023"), papers(judge.judge(moving)));
        Evidence active =
                new Evidence(
                        Evidence.ofType(6, 0.3, Optional.empty()).type(),
                        Map.of(),
                        LithiumTest.unknown(),
                        Halpha.EMISSION,
                        Map.of(),
                        Astrometry.none(),
                        Optional.empty(),
                        no,
                        no);
        assertEquals(with(always, "barrado2003", "west2008"), papers(judge.judge(active)));
    }

    /** m - M = 5 log10(d / 10): at 20 pc 1.505 mag, and the error of the parallax in both. */
    @Test
    void aParallaxGivesAbsoluteMagnitudes() {
        Judgement judgement =
                judge.judge(
                        L2.withPhotometry(
                                        Map.of(
                                                MagnitudeBand.H_2MASS, new Magnitude(13, 0.03),
                                                MagnitudeBand.W2, new Magnitude(12, 0.04)))
                                .withAstrometry(Astrometry.ofParallax(50, 0.5)));
        Estimate h = judgement.properties().absoluteMagnitudes().get(MagnitudeBand.H_2MASS);
        assertEquals(13 - 5 * Math.log10(2), h.median(), 0.003);
        assertEquals(Math.hypot(0.03, 5 / Math.log(10) * 0.01), h.sigma(), 2e-4);
        assertEquals("parallax and H 2MASS", judgement.properties().logLMethod());
        Estimate byType = plain.properties().absoluteMagnitudes().get(MagnitudeBand.H_2MASS);
        assertTrue(byType.sigma() > 0.2, "by type the scatter of the relation counts");
    }

    /** The same evidence on the other two grids, with a stated age or not. */
    @Test
    void otherGridsShowHowFarModelsDiffer() {
        for (Evidence evidence : List.of(L2, L2.withAge(AgeStatement.parse("1..3Gyr")))) {
            Judgement judgement = judge.judge(evidence);
            assertEquals(
                    List.of(EvolutionGrid.Name.COND03, EvolutionGrid.Name.DUSTY00),
                    judgement.grids().stream().map(GridComparison::grid).toList());
            for (GridComparison other : judgement.grids()) {
                assertEquals(
                        judgement.massMsun().median(), other.massMedianMsun(), 0.01, "solar mass");
                assertEquals(judgement.limits().pSubstellar(), other.pSubstellar(), 0.35, "share");
            }
        }
    }

    /** An age of the list goes before that of the settings, which goes before none. */
    @Test
    void theAgeOfTheListGoesFirst() {
        Judge stating = new Judge(Judging.withDefaults().withAge(AgeStatement.parse("20..30Myr")));
        assertTrue(stating.judge(L2).age().ageMyr().median() < 30);
        Judgement listed = stating.judge(L2.withAge(AgeStatement.parse("2..3Gyr")));
        assertEquals("2..3Gyr", listed.age().prior().text());
        assertTrue(listed.age().ageMyr().median() > 2000);
        assertTrue(!plain.age().prior().isStated());
    }

    private List<String> codes(Evidence evidence) {
        return judge.judge(evidence).findings().stream().map(f -> f.code()).toList();
    }

    @Test
    void endsOfTheGridsAndTestsThatTellNothingAreSaid() {
        assertTrue(
                codes(Evidence.ofType(4.6, 0.3, Optional.empty())).contains("mass-at-grid-edge"));
        assertTrue(codes(Evidence.ofType(31, 0.3, Optional.empty())).contains("few-y-dwarfs"));
        assertTrue(
                codes(L2.withLithium(LithiumTest.notSeen(20))).contains("lithium-limit-useless"));
        assertTrue(
                !codes(L2.withLithium(LithiumTest.notSeen(1))).contains("lithium-limit-useless"));
    }
}
