package emberline.judge;

/**
 * What one piece of evidence did to the odds.
 *
 * @param piece the piece
 * @param label the piece in words
 * @param log10Factor log10 of the factor on the odds, added in the order of the ledger
 * @param log10FactorLast log10 of the factor it would have if it were added last
 * @param note what it rests on; and where order matters, that it does
 */
public record LedgerEntry(
        Piece piece, String label, double log10Factor, double log10FactorLast, String note) {

    /** Difference of the two factors (dex) above which the order is said to matter. */
    static final double ORDER_MATTERS_DEX = 0.1;

    /**
     * Whether the factor depends on the order, because other pieces tell part of the same.
     *
     * @return true where the two factors differ by more than 0.1 dex
     */
    public boolean dependsOnOrder() {
        return Math.abs(log10Factor - log10FactorLast) > ORDER_MATTERS_DEX;
    }
}
