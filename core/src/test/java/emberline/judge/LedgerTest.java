package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.GravityClass;
import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class LedgerTest {

    private final Judge judge = new Judge(Judging.withDefaults());

    private static Evidence full() {
        OptionalDouble no = OptionalDouble.empty();
        return Evidence.ofType(10, 0.5, Optional.of(GravityClass.VL_G))
                .withLithium(LithiumTest.notSeen(0.1))
                .withPhotometry(Map.of(MagnitudeBand.H_2MASS, new Magnitude(13, 0.03)))
                .withAstrometry(
                        new Astrometry(
                                no,
                                no,
                                OptionalDouble.of(30),
                                OptionalDouble.of(0.5),
                                OptionalDouble.of(150),
                                OptionalDouble.of(-60),
                                no));
    }

    private static void assertAddsUp(Ledger ledger, double p) {
        double sum = ledger.priorLog10Odds();
        for (LedgerEntry entry : ledger.entries()) {
            sum += entry.log10Factor();
        }
        assertEquals(ledger.finalLog10Odds(), sum, 1e-9);
        assertEquals(p, ledger.probability(), 1e-6);
    }

    @Test
    void factorsMultiplyToTheFinalOdds() {
        Judgement judgement = judge.judge(full());
        assertAddsUp(judgement.substellarLedger(), judgement.limits().pSubstellar());
        assertAddsUp(judgement.youngLedger(), judgement.age().pYoung());
        assertEquals(5, judgement.substellarLedger().entries().size());
        Judgement aged = judge.judge(full().withAge(AgeStatement.parse("120+-8Myr")));
        assertAddsUp(aged.substellarLedger(), aged.limits().pSubstellar());
        assertAddsUp(aged.youngLedger(), aged.age().pYoung());
    }

    /** A stated age takes the place of what tells the age alone. */
    @Test
    void noFactCountsTwice() {
        Evidence stated = full().withAge(AgeStatement.parse("120+-8Myr"));
        Judgement judgement = judge.judge(stated);
        Ledger ledger = judgement.substellarLedger();
        assertTrue(ledger.entries().stream().noneMatch(e -> e.piece() == Piece.GRAVITY));
        assertTrue(ledger.entries().stream().noneMatch(e -> e.piece() == Piece.VELOCITY));
        assertEquals(2, ledger.notCounted().size(), ledger.notCounted().toString());
        Evidence field =
                Evidence.ofType(10, 0.5, Optional.of(GravityClass.FLD_G))
                        .withLithium(stated.lithium())
                        .withPhotometry(stated.photometry())
                        .withAstrometry(stated.astrometry())
                        .withAge(AgeStatement.parse("120+-8Myr"));
        assertEquals(
                judge.judge(field).limits().pSubstellar(), judgement.limits().pSubstellar(), 1e-9);
    }

    /** What is left out takes its factor with it: the last factor is that of adding it last. */
    @Test
    void theLastFactorIsThatOfLeavingItOut() {
        Evidence with =
                Evidence.ofType(12, 0.5, Optional.of(GravityClass.FLD_G))
                        .withLithium(LithiumTest.notSeen(0));
        Evidence without = Evidence.ofType(12, 0.5, Optional.of(GravityClass.FLD_G));
        Ledger all = judge.judge(with).substellarLedger();
        Ledger less = judge.judge(without).substellarLedger();
        LedgerEntry lithium = all.entries().get(all.entries().size() - 1);
        assertEquals(Piece.LITHIUM, lithium.piece());
        assertEquals(all.finalLog10Odds() - less.finalLog10Odds(), lithium.log10FactorLast(), 1e-9);
        assertTrue(lithium.log10Factor() < 0, "no lithium speaks against substellar");
        assertTrue(
                all.entries().stream()
                        .filter(LedgerEntry::dependsOnOrder)
                        .allMatch(e -> e.note().contains("depends on the order")));
    }

    private static String note(Ledger ledger, Piece piece) {
        return ledger.entries().stream()
                .filter(e -> e.piece() == piece)
                .map(LedgerEntry::note)
                .findFirst()
                .orElseThrow();
    }

    /** Each entry says what it rests on, by the figures of this object. */
    @Test
    void notesSayWhatAnEntryRestsOn() {
        Ledger ledger = judge.judge(full()).substellarLedger();
        assertEquals("mass below 0.072 solar masses", ledger.claim());
        assertTrue(note(ledger, Piece.TYPE).startsWith("effective temperature by type"));
        assertTrue(note(ledger, Piece.GRAVITY).contains("prior of the class is divided out"));
        // a limit of 0.1 angstrom is deep against the 2 angstrom of L0: 90% show the line
        assertTrue(
                note(ledger, Piece.LITHIUM).contains("would be seen in 90% of such objects"),
                note(ledger, Piece.LITHIUM));
        // 162 mas/yr at 33 pc
        assertTrue(
                note(ledger, Piece.VELOCITY).startsWith("26 km/s against"),
                note(ledger, Piece.VELOCITY));
        Judgement aged =
                judge.judge(
                        Evidence.ofType(10, 0.5, Optional.empty())
                                .withLithium(LithiumTest.seen())
                                .withAge(AgeStatement.parse("120+-8Myr")));
        Ledger young = aged.youngLedger();
        assertEquals("age below 150 Myr", young.claim());
        assertTrue(note(young, Piece.AGE).startsWith("age 120+-8Myr"), note(young, Piece.AGE));
        assertTrue(note(young, Piece.LITHIUM).startsWith("Li I 6708 seen: lithium is left"));
    }

    /** At T5 neither a class nor H alpha tells the age: both are named as left out. */
    @Test
    void whatSaysNothingAtTheTypeIsNamed() {
        Evidence late = Evidence.ofType(25, 0.5, Optional.of(GravityClass.FLD_G));
        Evidence quiet =
                new Evidence(
                        late.type(),
                        late.gravityPrior(),
                        late.lithium(),
                        Halpha.NO_EMISSION,
                        Map.of(),
                        Astrometry.none(),
                        Optional.empty(),
                        OptionalDouble.empty(),
                        OptionalDouble.empty());
        assertEquals(
                List.of(
                        "gravity class: says nothing about the age at this type",
                        "H alpha: says nothing about the age at this type"),
                judge.judge(quiet).substellarLedger().notCounted());
        assertEquals(
                List.of(),
                judge.judge(Evidence.ofType(25, 0.5, Optional.empty())).youngLedger().notCounted());
    }

    /** H alpha of an active M6 speaks for youth, by the shares of active objects. */
    @Test
    void activitySpeaksForYouth() {
        Evidence m6 = Evidence.ofType(6, 0.3, Optional.empty());
        Evidence active =
                new Evidence(
                        m6.type(),
                        m6.gravityPrior(),
                        m6.lithium(),
                        Halpha.EMISSION,
                        Map.of(),
                        Astrometry.none(),
                        Optional.empty(),
                        OptionalDouble.empty(),
                        OptionalDouble.empty());
        Judgement judgement = judge.judge(active);
        LedgerEntry entry = judgement.youngLedger().entries().get(1);
        assertEquals(Piece.HALPHA, entry.piece());
        assertTrue(entry.log10Factor() > 0, "factor " + entry.log10Factor());
        assertTrue(entry.note().startsWith("share of active objects"), entry.note());
        assertAddsUp(judgement.youngLedger(), judgement.age().pYoung());
    }

    /** Odds of ten to one are a probability of 10/11; the order matters beyond 0.1 dex. */
    @Test
    void oddsAndOrder() {
        assertEquals(10.0 / 11, new Ledger("x", 0, List.of(), 1, List.of()).probability(), 1e-12);
        assertTrue(new LedgerEntry(Piece.TYPE, "", 0.3, 0.1, "").dependsOnOrder());
        assertTrue(new LedgerEntry(Piece.TYPE, "", -0.3, -0.1, "").dependsOnOrder());
        assertFalse(new LedgerEntry(Piece.TYPE, "", 0.3, 0.25, "").dependsOnOrder());
    }

    /** What stands before the age is weighed without it; the age last is what the age adds. */
    @Test
    void aStatedAgeChangesNothingBeforeIt() {
        Evidence type = Evidence.ofType(10, 0.5, Optional.empty());
        Ledger open = judge.judge(type).substellarLedger();
        Ledger aged = judge.judge(type.withAge(AgeStatement.parse("120+-8Myr"))).substellarLedger();
        assertEquals(open.priorLog10Odds(), aged.priorLog10Odds(), 1e-12);
        assertEquals(
                open.entries().get(0).log10Factor(), aged.entries().get(0).log10Factor(), 1e-12);
        LedgerEntry age = aged.entries().get(1);
        assertEquals(Piece.AGE, age.piece());
        assertEquals(aged.finalLog10Odds() - open.finalLog10Odds(), age.log10FactorLast(), 1e-9);
        assertTrue(age.log10Factor() > 0.5, "young L0 dwarfs are substellar");
    }
}
