package emberline.place.kind;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedList;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.prepare.ExtinctionLaw;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Candidate;
import java.util.List;
import org.apache.commons.rng.simple.RandomSource;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class KindJudgeTest {

    private static final Measurer MEASURER =
            new Measurer(FeatureCatalogue.standard(), Measuring.withDefaults());
    private final KindJudge judge = new KindJudge(KindPrior.standard());

    private KindVerdict verdict(PreparedSpectrum prepared) {
        return judge.judge(MEASURER.measure(prepared));
    }

    @ParameterizedTest
    @CsvSource({
        "HD 196610, giant",
        "IRAS 21284-0747, giant",
        "HD 10307, early star",
        "HD 76221, carbon star",
        "LHS 2924, late dwarf",
        "2MASS J08251968+2115521, late dwarf",
        "2MASS J05591915-1404489, late dwarf",
        "2MASS J0019-6226, late dwarf"
    })
    void realSpectraAreOfTheirKind(String name, String kind) throws Exception {
        KindVerdict verdict = verdict(SharedList.prepared(name));
        assertEquals(kind, verdict.kind().orElseThrow().label(), verdict.toString());
        double sum =
                verdict.probabilities().values().stream().mapToDouble(Double::doubleValue).sum();
        assertEquals(1, sum, 1e-9);
        assertEquals(7, verdict.probabilities().size());
    }

    /** By models that saw neither of the two, this is held by the trials of {@code calibrate}. */
    @Test
    void nonsenseIsLikeNothingKnown() {
        List<PreparedSpectrum> nonsense = Nonsense.invented(20);
        long unlike =
                nonsense.stream()
                        .filter(n -> verdict(n).kind().orElse(null) == ObjectKind.UNLIKE_KNOWN)
                        .count();
        assertTrue(unlike >= 0.7 * nonsense.size(), unlike + " of " + nonsense.size());
    }

    @Test
    void aSpectrumWithoutSignalIsNotJudged() throws Exception {
        PreparedSpectrum noise =
                Degraded.noisy(
                        SharedList.prepared("LHS 2924"),
                        0.01,
                        RandomSource.XO_RO_SHI_RO_128_PP.create(3));
        KindVerdict verdict = verdict(noise);
        assertTrue(verdict.kind().isEmpty(), verdict.toString());
        assertTrue(verdict.reason().contains("region"), verdict.reason());
    }

    @Test
    void aStarBehindMuchDustIsReddenedBackground() throws Exception {
        PreparedSpectrum reddened =
                Degraded.reddened(
                        SharedList.prepared("HD 10307"), 8, ExtinctionLaw.fitzpatrick1999(3.1));
        assertEquals(ObjectKind.REDDENED_BACKGROUND, verdict(reddened).kind().orElseThrow());
    }

    @Test
    void aReferenceSpectrumIsItsOwnNearestKin() throws Exception {
        Measurements measurements = MEASURER.measure(SharedList.prepared("LHS 2924"));
        List<Kin> kin = judge.kin(measurements);
        assertEquals(5, kin.size());
        assertEquals("LHS 2924", kin.get(0).object());
        assertEquals(0, kin.get(0).distance(), 1e-3);
        for (int k = 1; k < kin.size(); k++) {
            assertTrue(kin.get(k).distance() >= kin.get(k - 1).distance());
            assertTrue(kin.get(k).featuresInCommon() >= KinTable.LEAST_IN_COMMON);
        }
        assertEquals(ObjectKind.LATE_DWARF, kin.get(1).kind());
        assertEquals(9, kin.get(1).typeNumber().orElseThrow(), 1.5);
    }

    @Test
    void theScaleOfTheFluxDoesNotMatter() throws Exception {
        PreparedSpectrum one = SharedList.prepared("HD 196610");
        PreparedSpectrum other =
                new PreparedSpectrum(
                        one.spectrum().withFluxScaledBy(1e-13),
                        one.resolvingPower(),
                        one.noise(),
                        one.findings());
        assertEquals(
                verdict(one).probability(ObjectKind.GIANT).orElseThrow(),
                verdict(other).probability(ObjectKind.GIANT).orElseThrow(),
                1e-9);
    }

    @Test
    void mostLateDwarfsOfTheListAreKept() throws Exception {
        int kept = 0;
        int all = 0;
        for (Candidate candidate : SharedList.candidates()) {
            boolean dwarf =
                    candidate.text("known_kind").orElse("").equals("dwarf")
                            && candidate.number("known_type_number").orElse(-1) >= 4;
            if (dwarf && candidate.name().length() % 5 == 0) {
                KindVerdict verdict = verdict(SharedList.prepared(candidate));
                if (verdict.kind().isPresent()) {
                    all++;
                    kept += verdict.probability(ObjectKind.LATE_DWARF).orElse(0) >= 0.35 ? 1 : 0;
                }
            }
        }
        assertTrue(all > 30 && kept >= 0.97 * all, kept + " of " + all);
    }
}
