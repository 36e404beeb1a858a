package emberline.judge;

import java.util.List;

/**
 * From the prior odds of a claim to its final odds, piece by piece. The factors in their order
 * multiply to the final odds exactly.
 *
 * @param claim what is claimed, in words
 * @param priorLog10Odds log10 of the odds before anything is known
 * @param entries the pieces that count, in their order
 * @param finalLog10Odds log10 of the odds with all of them
 * @param notCounted pieces that were there and were left out, with the reason
 */
public record Ledger(
        String claim,
        double priorLog10Odds,
        List<LedgerEntry> entries,
        double finalLog10Odds,
        List<String> notCounted) {

    /** Copies the lists. */
    public Ledger {
        entries = List.copyOf(entries);
        notCounted = List.copyOf(notCounted);
    }

    /**
     * The probability of the claim.
     *
     * @return 0 to 1
     */
    public double probability() {
        return 1 / (1 + Math.pow(10, -finalLog10Odds));
    }
}
