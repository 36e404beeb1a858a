package emberline.place.reddening;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.Activity;
import emberline.place.GravityClass;
import emberline.place.GravityVerdict;
import emberline.place.Placement;
import emberline.place.PublishedType;
import emberline.place.TypeEstimate;
import emberline.place.TypePosterior;
import emberline.place.calibrated.CalibratedType;
import emberline.place.calibrated.Contribution;
import emberline.place.kind.KindVerdict;
import emberline.place.kind.ObjectKind;
import emberline.place.metallicity.MetallicityVerdict;
import emberline.place.pair.PairVerdict;
import emberline.spectrum.Finding;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** For whom an extinction is fitted and whether it is believed, on placements by hand. */
class ReddeningReasonTest {

    private static final String H_J = "burgasser2002/h-j";
    private static final String K_J = "burgasser2006/k-j";

    private static Contribution colour(String feature, double deviation) {
        return new Contribution(feature, deviation, 0, 0.1, false);
    }

    private static GravityVerdict gravity(double intermediate, double veryLow) {
        return new GravityVerdict(
                Optional.of(GravityClass.FLD_G),
                OptionalDouble.of(1 - intermediate - veryLow),
                OptionalDouble.of(intermediate),
                OptionalDouble.of(veryLow),
                "",
                List.of(),
                Optional.empty());
    }

    private static Placement placed(
            Optional<Double> type,
            GravityVerdict gravity,
            Map<ObjectKind, Double> kinds,
            List<Contribution> contributions,
            List<Finding> findings) {
        return new Placement(
                type.map(number -> TypeEstimate.normal(number, 0.5)),
                "",
                new PublishedType(Optional.empty(), "", List.of(), List.of()),
                new CalibratedType(Optional.empty(), "", contributions, 0, 0),
                Optional.empty(),
                gravity,
                new MetallicityVerdict(Optional.empty(), "", Map.of(), List.of(), "", ""),
                new Activity(Optional.empty(), List.of(), ""),
                new KindVerdict(kinds, "JHK", ""),
                List.of(),
                PairVerdict.notJudged(""),
                Optional.empty(),
                findings);
    }

    private static Optional<String> reason(double type, double low, double... deviations) {
        return ReddeningCall.reason(
                placed(
                        Optional.of(type),
                        gravity(low / 4, 3 * low / 4),
                        Map.of(ObjectKind.LATE_DWARF, 1.0),
                        List.of(
                                colour(H_J, deviations[0]),
                                colour(K_J, deviations[1]),
                                colour("burgasser2006/h2o-j", 50)),
                        List.of()));
    }

    @Test
    void redColoursCallForAFitBlueOnesDoNot() {
        assertEquals(
                "its colours are redder than its type lets expect (by 3.0 sigma)",
                reason(8, 0, 2, 4).orElseThrow());
        assertTrue(reason(8, 0, 2, 3).isEmpty(), "2.5 sigma on the mean are not enough");
        assertTrue(reason(8, 0, -4, -4).isEmpty());
    }

    /** Young L dwarfs are red by their own dust; M dwarfs and field objects are not. */
    @Test
    void youngLDwarfsAreRedByThemselves() {
        assertTrue(reason(10, 0.5, 4, 4).isEmpty());
        assertTrue(reason(10, 0.48, 4, 4).isPresent());
        assertTrue(reason(9.9, 0.9, 4, 4).isPresent());
    }

    @Test
    void withoutATypeOrColoursNothingCallsForAFit() {
        Map<ObjectKind, Double> dwarf = Map.of(ObjectKind.LATE_DWARF, 1.0);
        assertTrue(
                ReddeningCall.reason(
                                placed(
                                        Optional.empty(),
                                        gravity(0, 0),
                                        dwarf,
                                        List.of(colour(H_J, 9)),
                                        List.of()))
                        .isEmpty());
        assertTrue(
                ReddeningCall.reason(
                                placed(
                                        Optional.of(8.0),
                                        gravity(0, 0),
                                        dwarf,
                                        List.of(),
                                        List.of()))
                        .isEmpty());
    }

    /** A twelfth for a star behind dust, an early star or nothing known, together. */
    @Test
    void aPossibleStarCallsForAFit() {
        Map<ObjectKind, Double> star =
                Map.of(
                        ObjectKind.LATE_DWARF, 0.91,
                        ObjectKind.REDDENED_BACKGROUND, 0.04,
                        ObjectKind.UNLIKE_KNOWN, 0.03,
                        ObjectKind.EARLY_STAR, 0.02);
        Optional<String> reason =
                ReddeningCall.reason(
                        placed(Optional.empty(), gravity(0, 0), star, List.of(), List.of()));
        assertTrue(reason.orElseThrow().endsWith("(p 0.09)"), reason.toString());
        Map<ObjectKind, Double> giant =
                Map.of(
                        ObjectKind.LATE_DWARF,
                        0.5,
                        ObjectKind.GIANT,
                        0.43,
                        ObjectKind.EARLY_STAR,
                        0.07);
        assertTrue(
                ReddeningCall.reason(
                                placed(
                                        Optional.of(8.0),
                                        gravity(0, 0),
                                        giant,
                                        List.of(),
                                        List.of()))
                        .isEmpty());
    }

    private static ReddeningFit fit(double lo95, double logGain) {
        double[] one = {1};
        return new ReddeningFit(
                5,
                4,
                6,
                lo95,
                7,
                logGain,
                TypePosterior.of(
                        8,
                        0.1,
                        Map.of(
                                GravityClass.FLD_G, one,
                                GravityClass.INT_G, one,
                                GravityClass.VL_G, one)));
    }

    private static Placement freed(Optional<Double> type, double pDwarf, List<Finding> findings) {
        return placed(
                type,
                gravity(0, 0),
                Map.of(ObjectKind.LATE_DWARF, pDwarf, ObjectKind.GIANT, 1 - pDwarf),
                List.of(),
                findings);
    }

    @ParameterizedTest
    @CsvSource({
        "15.1, 0.51, 0.9, true",
        "15, 0.51, 0.9, false",
        "15.1, 0.5, 0.9, false",
        "15.1, 0.51, 0.89, false"
    })
    void aFitIsBelievedWhereItGainsMuch(
            double logGain, double lo95, double pDwarf, boolean believed) {
        assertEquals(
                believed,
                ReddeningCall.isBelieved(
                        fit(lo95, logGain), freed(Optional.of(8.0), pDwarf, List.of())));
    }

    @Test
    void noFitIsBelievedThatLeavesNoTypeOrNoBands() {
        ReddeningFit good = fit(4, 100);
        assertTrue(
                !ReddeningCall.isBelieved(good, freed(Optional.empty(), 0.99, List.of())),
                "no type");
        List<Finding> bands = List.of(Finding.warning("no-bands", "none"));
        assertTrue(
                !ReddeningCall.isBelieved(good, freed(Optional.of(8.0), 0.99, bands)), "no bands");
        List<Finding> other = List.of(Finding.note("one-relation", "one"));
        assertTrue(ReddeningCall.isBelieved(good, freed(Optional.of(8.0), 0.99, other)));
    }
}
