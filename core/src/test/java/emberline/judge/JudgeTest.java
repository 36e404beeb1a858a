package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.PublishedRows;
import emberline.place.GravityClass;
import emberline.spectrum.SpectralType;
import java.io.IOException;
import java.util.Arrays;
import java.util.Optional;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class JudgeTest {

    private final Judge judge = new Judge(Judging.withDefaults());
    private static final double JUPITERS_PER_SUN = 1047.57;

    static Evidence evidence(String type, double sigma, String gravity) {
        return Evidence.ofType(
                SpectralType.parse(type).orElseThrow().number(),
                sigma,
                Arrays.stream(GravityClass.values())
                        .filter(g -> g.label().equals(gravity))
                        .findFirst());
    }

    private static Evidence evidence(NamedCsvRecord row) {
        Evidence evidence =
                evidence(
                        row.getField("type"),
                        PublishedRows.number(row, "type_sigma"),
                        row.getField("gravity"));
        if (!row.getField("age").isBlank()) {
            evidence = evidence.withAge(AgeStatement.parse(row.getField("age")));
        }
        return switch (row.getField("lithium")) {
            case "yes" -> evidence.withLithium(LithiumTest.seen());
            case "no" -> evidence.withLithium(LithiumTest.notSeen(0));
            default -> evidence;
        };
    }

    /**
     * Objects of known mass or nature: at least 68% of the dynamical masses within the 68% interval
     * (with the error of the mass), none beyond 3 sigma; every decision right or open.
     */
    @Test
    void knownObjectsAreJudgedRightOrLeftOpen() throws IOException {
        int masses = 0;
        int within = 0;
        int decided = 0;
        for (NamedCsvRecord row : PublishedRows.of("judged-objects.csv")) {
            Judgement judgement = judge.judge(evidence(row));
            if (!row.getField("mass_mjup").isBlank()) {
                Estimate mass = judgement.massMsun().times(JUPITERS_PER_SUN);
                double known = PublishedRows.number(row, "mass_mjup");
                double side =
                        known > mass.median()
                                ? mass.hi68() - mass.median()
                                : mass.median() - mass.lo68();
                double off =
                        Math.abs(known - mass.median())
                                / Math.hypot(side, PublishedRows.number(row, "mass_err_mjup"));
                masses++;
                within += off <= 1 ? 1 : 0;
                assertTrue(off < 3, row.getField("object") + ": " + off + " sigma, " + mass);
            }
            String nature = row.getField("nature");
            String decision = judgement.decision().word();
            if (!decision.equals("undecided")) {
                decided++;
                assertTrue(
                        nature.isBlank() || nature.equals(decision),
                        row.getField("object") + " is " + nature + ", judged " + decision);
            }
        }
        assertTrue(masses >= 20 && within >= 0.68 * masses, within + " of " + masses);
        assertTrue(decided >= 30, decided + " decided");
    }

    @Test
    void probabilitiesAgreeWithAnIndependentCalculation() throws IOException {
        for (NamedCsvRecord row : PublishedRows.of("judged-types.csv")) {
            Judgement judgement =
                    judge.judge(
                            evidence(
                                    row.getField("type"),
                                    PublishedRows.number(row, "type_sigma"),
                                    row.getField("gravity")));
            Limits limits = judgement.limits();
            String what = row.toString();
            assertEquals(PublishedRows.number(row, "p_070"), limits.pSubstellarLow(), 0.03, what);
            assertEquals(PublishedRows.number(row, "p_072"), limits.pSubstellar(), 0.03, what);
            assertEquals(PublishedRows.number(row, "p_075"), limits.pSubstellarHigh(), 0.03, what);
            double mass = PublishedRows.number(row, "mass_msun");
            assertEquals(mass, judgement.massMsun().median(), 0.03 * mass, what);
            assertEquals(
                    PublishedRows.number(row, "p_young"), judgement.age().pYoung(), 0.01, what);
        }
    }

    @ParameterizedTest
    @CsvSource({
        "L7, VL-G, , true, SUBSTELLAR, 0.99, 1",
        "M4, FLD-G, , , STELLAR, 0, 0.01",
        "M7, , 4.5..5.5Gyr, , STELLAR, 0, 0.01",
        "T6, , , , SUBSTELLAR, 0.999, 1",
        "T6, , 9..10Gyr, , SUBSTELLAR, 0.999, 1",
        "T6, , 10..50Myr, , SUBSTELLAR, 0.999, 1",
        "L4, FLD-G, , true, SUBSTELLAR, 0.99, 1",
        "L1, FLD-G, , true, SUBSTELLAR, 0.95, 1",
        "M9, , 10..30Myr, true, SUBSTELLAR, 0.95, 1",
        "M6, , 8..10Gyr, , STELLAR, 0, 0.001"
    })
    void limitingCases(
            String type,
            String gravity,
            String age,
            Boolean lithium,
            Decision decision,
            double low,
            double high) {
        Evidence evidence = evidence(type, 0.5, gravity);
        if (age != null) {
            evidence = evidence.withAge(AgeStatement.parse(age));
        }
        if (Boolean.TRUE.equals(lithium)) {
            evidence = evidence.withLithium(LithiumTest.seen());
        }
        Judgement judgement = judge.judge(evidence);
        assertEquals(decision, judgement.decision());
        double p = judgement.limits().pSubstellar();
        assertTrue(p >= low && p <= high, "p = " + p);
    }

    /** A lithium detection at a cool type: more than 0.99. */
    @ParameterizedTest
    @CsvSource({"L2", "L3", "L5", "L6", "L8"})
    void lithiumSettlesCoolTypes(String type) {
        Evidence seen = evidence(type, 0.5, "").withLithium(LithiumTest.seen());
        assertTrue(judge.judge(seen).limits().pSubstellar() > 0.99);
    }

    @Tag("slow")
    @Test
    void laterTypeNeverLowersAndOlderAgeNeverRaises() {
        String[] ages = {"20..30Myr", "100..130Myr", "500..700Myr", "2..3Gyr", "8..10Gyr"};
        double[][] p = new double[ages.length][];
        for (int a = 0; a < ages.length; a++) {
            Judge ofAge = new Judge(Judging.withDefaults().withAge(AgeStatement.parse(ages[a])));
            p[a] = new double[24];
            for (int n = 0; n < p[a].length; n++) {
                Evidence type = Evidence.ofType(5 + n, 0.5, Optional.empty());
                p[a][n] = ofAge.judge(type).limits().pSubstellar();
            }
        }
        for (int a = 0; a < ages.length; a++) {
            for (int n = 0; n < p[a].length; n++) {
                String where = "type " + (5 + n) + " at " + ages[a];
                assertTrue(n == 0 || p[a][n] >= p[a][n - 1] - 1e-3, where + " later type");
                assertTrue(a == 0 || p[a][n] <= p[a - 1][n] + 1e-3, where + " older age");
            }
        }
    }

    /** Halving the steps of mass and age moves no probability by 0.005. */
    @Tag("slow")
    @Test
    void theGridIsFineEnough() {
        Judge fine = new Judge(Judging.withDefaults(), 2);
        for (double type = 6; type <= 29; type += 1) {
            for (GravityClass gravity : GravityClass.values()) {
                Evidence evidence = Evidence.ofType(type, 0.5, Optional.of(gravity));
                assertNear(fine.judge(evidence), judge.judge(evidence), "type " + type);
            }
            Evidence aged =
                    Evidence.ofType(type, 0.2, Optional.empty())
                            .withAge(AgeStatement.parse("120+-8Myr"))
                            .withLithium(LithiumTest.seen());
            assertNear(fine.judge(aged), judge.judge(aged), "type " + type + " at 120 Myr");
        }
    }

    private static void assertNear(Judgement fine, Judgement usual, String what) {
        Limits a = fine.limits();
        Limits b = usual.limits();
        assertEquals(a.pSubstellarLow(), b.pSubstellarLow(), 0.005, what);
        assertEquals(a.pSubstellar(), b.pSubstellar(), 0.005, what);
        assertEquals(a.pSubstellarHigh(), b.pSubstellarHigh(), 0.005, what);
        assertEquals(a.pPlanetaryMass(), b.pPlanetaryMass(), 0.005, what);
        assertEquals(fine.age().pYoung(), usual.age().pYoung(), 0.005, what);
    }

    @Test
    void whatIsNotKnownIsSaid() {
        Judgement field = judge.judge(evidence("M8", 0.5, ""));
        assertTrue(field.ageWords().startsWith("no age information"), field.ageWords());
        Judgement young = judge.judge(evidence("L0", 0.5, "VL-G"));
        assertTrue(young.age().isTold() && young.age().pYoung() > 0.8);
        assertFalse(young.ageWords().contains("no age"));
        assertTrue(
                judge.judge(evidence("M1", 0.5, "")).findings().stream()
                        .anyMatch(f -> f.code().equals("type-off-relations")));
    }

    /** The same class twice must not count twice: a posterior that already has its prior in it. */
    @Test
    void thePriorOfTheGravityClassIsDividedOut() {
        Evidence flat = Evidence.ofType(10, 0.5, Optional.of(GravityClass.INT_G));
        java.util.Map<GravityClass, Double> local =
                java.util.Map.of(
                        GravityClass.FLD_G, 0.9,
                        GravityClass.INT_G, 0.08,
                        GravityClass.VL_G, 0.02);
        double third = 1.0 / 3;
        java.util.Map<GravityClass, Double> nothing =
                java.util.Map.of(
                        GravityClass.FLD_G, third,
                        GravityClass.INT_G, third,
                        GravityClass.VL_G, third);
        Evidence uninformed = Evidence.of(NormalType.posterior(10, 0.5, local), local);
        Evidence unjudged = Evidence.of(NormalType.posterior(10, 0.5, nothing), java.util.Map.of());
        assertEquals(
                judge.judge(unjudged).limits().pSubstellar(),
                judge.judge(uninformed).limits().pSubstellar(),
                1e-9);
        assertTrue(judge.judge(flat).age().pYoung() > 3 * judge.judge(unjudged).age().pYoung());
    }
}
