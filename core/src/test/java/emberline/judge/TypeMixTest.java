package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.GravityClass;
import emberline.place.TypePosterior;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The axis of types, evidence on it, and relations over it. */
class TypeMixTest {

    private static final Map<GravityClass, Double> PRIOR =
            Map.of(GravityClass.FLD_G, 0.8, GravityClass.INT_G, 0.15, GravityClass.VL_G, 0.05);

    /** One type with some share of each class. */
    private static TypePosterior at(double type, double field, double mid, double low) {
        Map<GravityClass, double[]> weights = new EnumMap<>(GravityClass.class);
        weights.put(GravityClass.FLD_G, new double[] {field});
        weights.put(GravityClass.INT_G, new double[] {mid});
        weights.put(GravityClass.VL_G, new double[] {low});
        return TypePosterior.of(type, 0.1, weights);
    }

    /** L2.03 lies 0.3 of a step behind the point L2.0. */
    @Test
    void aTypeIsSharedByThePointsBesideIt() {
        double[] share = TypeAxis.spread(at(12.03, 1, 0, 0), GravityClass.FLD_G);
        assertEquals(0.7, share[80], 1e-9);
        assertEquals(0.3, share[81], 1e-9);
        assertEquals(1, Arrays.stream(share).sum(), 1e-12);
        assertEquals(12, TypeAxis.type(80), 1e-12);
    }

    @ParameterizedTest
    @CsvSource({"2, 0, 1", "4, 0, 0", "34, 300, 0", "36, 300, 1", "3, 0, 0", "35, 300, 0"})
    void typesBeyondTheAxisCountAtItsEnds(double type, int point, double outside) {
        TypePosterior posterior = at(type, 1, 0, 0);
        assertEquals(1, TypeAxis.spread(posterior, GravityClass.FLD_G)[point], 1e-9);
        assertEquals(outside, TypeAxis.outside(posterior), 1e-12);
    }

    /** Probability by prior: 0.4 by 0.8, 0.45 by 0.15, 0.15 by 0.05. */
    @Test
    void thePriorOfAClassIsDividedOut() {
        TypeMix mix = new TypeMix(Evidence.of(at(12, 0.4, 0.45, 0.15), PRIOR));
        assertTrue(mix.gravityCounts());
        assertEquals(0.5, mix.evidence(80, 0), 1e-9);
        assertEquals(3, mix.evidence(80, 1), 1e-9);
        assertEquals(3, mix.evidence(2), 1e-9);
        assertEquals(0, mix.withoutClass(80));
        assertEquals(0.45, mix.type(80, GravityClass.INT_G), 1e-9);
    }

    /** A class that was not judged is no evidence: the object counts as one of the field. */
    @Test
    void withoutAClassTheTypeAloneCounts() {
        TypeMix mix = new TypeMix(Evidence.of(at(12, 0.4, 0.45, 0.15), Map.of()));
        assertFalse(mix.gravityCounts());
        assertEquals(0, mix.evidence(80, 0));
        assertEquals(1, mix.withoutClass(80), 1e-9);
        assertEquals(1, mix.type(80, GravityClass.FLD_G), 1e-9);
        assertEquals(0, mix.type(80, GravityClass.VL_G));
        assertEquals(1, mix.type(80), 1e-9);
        assertEquals(0, mix.type(90));
    }

    @ParameterizedTest
    @CsvSource({"5.4, false", "5.5, true", "20, true", "20.1, false"})
    void classesTellTheAgeFromM5ToT0(double type, boolean allowed) {
        assertEquals(allowed, new TypeMix(Evidence.of(at(type, 1, 1, 1), PRIOR)).gravityCounts());
    }

    @Test
    void meanAndSpreadAreThoseOfTheType() {
        TypeMix mix = new TypeMix(Evidence.ofType(13.2, 0.8, Optional.empty()));
        assertEquals(13.2, mix.meanType(), 1e-9);
        // cut at four sigma, and shared by points a tenth apart
        assertEquals(0.8, mix.sigmaType(), 0.005);
    }

    /** 2 + 3 (x - 5) + (x - 5)^2 up to 8; 4 beyond. */
    @Test
    void aRelationIsItsPiece() {
        TypeRelation relation = new TypeRelation();
        relation.add(new TypeRelation.Piece(5, 8, 5, new double[] {2, 3, 1}, 0.1));
        relation.add(new TypeRelation.Piece(8, 12, 0, new double[] {4}, 0.2));
        assertEquals(2, relation.at(5));
        assertEquals(12, relation.at(7), 1e-12);
        assertEquals(20, relation.at(8), 1e-12);
        assertEquals(0.1, relation.rms(8));
        assertEquals(4, relation.at(8.1));
        assertEquals(0.2, relation.rms(12));
        assertTrue(relation.covers(5) && relation.covers(12));
        assertFalse(relation.covers(4.9) || relation.covers(12.1));
        IllegalArgumentException beyond =
                assertThrows(IllegalArgumentException.class, () -> relation.at(13));
        assertEquals("no piece of the relation covers 13.0", beyond.getMessage());
    }

    @Test
    void aTypeNeedsAnErrorAndAPriorEveryClass() {
        IllegalArgumentException error =
                assertThrows(
                        IllegalArgumentException.class,
                        () -> Evidence.ofType(12, 0, Optional.empty()));
        assertTrue(error.getMessage().contains("positive number"), error.getMessage());
        IllegalArgumentException prior =
                assertThrows(
                        IllegalArgumentException.class,
                        () ->
                                Evidence.of(
                                        at(12, 1, 0, 0),
                                        Map.of(GravityClass.FLD_G, 1.0, GravityClass.VL_G, 0.0)));
        assertEquals("prior of INT-G: expected a positive probability", prior.getMessage());
    }
}
