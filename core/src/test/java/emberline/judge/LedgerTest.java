package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.GravityClass;
import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class LedgerTest {

    private static final Judge JUDGE = new Judge(Judging.withDefaults());

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
        Judgement judgement = JUDGE.judge(full());
        assertAddsUp(judgement.substellarLedger(), judgement.limits().pSubstellar());
        assertAddsUp(judgement.youngLedger(), judgement.age().pYoung());
        assertEquals(5, judgement.substellarLedger().entries().size());
        Judgement aged = JUDGE.judge(full().withAge(AgeStatement.parse("120+-8Myr")));
        assertAddsUp(aged.substellarLedger(), aged.limits().pSubstellar());
        assertAddsUp(aged.youngLedger(), aged.age().pYoung());
    }

    /** A stated age takes the place of what tells the age alone. */
    @Test
    void noFactCountsTwice() {
        Evidence stated = full().withAge(AgeStatement.parse("120+-8Myr"));
        Judgement judgement = JUDGE.judge(stated);
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
                JUDGE.judge(field).limits().pSubstellar(), judgement.limits().pSubstellar(), 1e-9);
    }

    /** What is left out takes its factor with it: the last factor is that of adding it last. */
    @Test
    void theLastFactorIsThatOfLeavingItOut() {
        Evidence with =
                Evidence.ofType(12, 0.5, Optional.of(GravityClass.FLD_G))
                        .withLithium(LithiumTest.notSeen(0));
        Evidence without = Evidence.ofType(12, 0.5, Optional.of(GravityClass.FLD_G));
        Ledger all = JUDGE.judge(with).substellarLedger();
        Ledger less = JUDGE.judge(without).substellarLedger();
        LedgerEntry lithium = all.entries().get(all.entries().size() - 1);
        assertEquals(Piece.LITHIUM, lithium.piece());
        assertEquals(all.finalLog10Odds() - less.finalLog10Odds(), lithium.log10FactorLast(), 1e-9);
        assertTrue(lithium.log10Factor() < 0, "no lithium speaks against substellar");
        assertTrue(
                all.entries().stream()
                        .filter(LedgerEntry::dependsOnOrder)
                        .allMatch(e -> e.note().contains("depends on the order")));
    }
}
