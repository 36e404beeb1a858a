package emberline.judge;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Makes ledgers from the sums of a posterior; with a stated age from those of two. */
final class LedgerMaker {

    private static final double LEAST = 1e-12;

    private final NodePosterior open;
    private final NodePosterior last;
    private final EvidenceCurves curves;

    /**
     * A maker.
     *
     * @param open the posterior with the default age prior
     * @param last the posterior with the stated age; the same one where none is stated
     * @param curves the evidence
     */
    LedgerMaker(NodePosterior open, NodePosterior last, EvidenceCurves curves) {
        this.open = open;
        this.last = last;
        this.curves = curves;
    }

    /** The ledger of a claim that holds for cells whose kind has a bit. */
    Ledger of(String claim, int bit) {
        List<LedgerEntry> entries = new ArrayList<>();
        double prior = logOdds(open.after(0), bit);
        double now = prior;
        double end = logOdds(last.after(Piece.COUNT), bit);
        for (Piece piece : Piece.values()) {
            if (!curves.counts(piece)) {
                continue;
            }
            NodePosterior from = piece.compareTo(Piece.AGE) < 0 ? open : last;
            double then = logOdds(from.after(piece.order() + 1), bit);
            double without =
                    piece == Piece.AGE
                            ? logOdds(open.after(Piece.COUNT), bit)
                            : logOdds(last.without(piece), bit);
            LedgerEntry plain =
                    new LedgerEntry(piece, piece.label(), then - now, end - without, "");
            entries.add(
                    new LedgerEntry(
                            piece,
                            piece.label(),
                            plain.log10Factor(),
                            plain.log10FactorLast(),
                            note(piece, plain)));
            now = then;
        }
        return new Ledger(claim, prior, entries, end, notCounted());
    }

    private static double logOdds(double[] byKind, int bit) {
        double yes = 0;
        double no = 0;
        for (int kind = 0; kind < byKind.length; kind++) {
            if ((kind & bit) != 0) {
                yes += byKind[kind];
            } else {
                no += byKind[kind];
            }
        }
        double all = yes + no;
        return Math.log10(Math.max(yes / all, LEAST)) - Math.log10(Math.max(no / all, LEAST));
    }

    private String note(Piece piece, LedgerEntry entry) {
        String rests =
                switch (piece) {
                    case TYPE ->
                            "effective temperature by type, field and young sequences mixed by age";
                    case LUMINOSITY -> "parallax and magnitude; an unresolved pair is allowed for";
                    case AGE -> "age " + curves.evidence().age().map(AgeStatement::text).orElse("");
                    case GRAVITY ->
                            "how often members of groups of known age get each class; the prior"
                                    + " of the class is divided out";
                    case LITHIUM ->
                            curves.evidence().lithium().outcome() == LithiumTest.Outcome.SEEN
                                    ? "Li I 6708 seen: lithium is left"
                                    : lithiumNote();
                    case HALPHA -> "share of active objects by age";
                    case VELOCITY ->
                            String.format(
                                    Locale.ROOT,
                                    "%.0f km/s against young and field objects",
                                    curves.kinematics().orElseThrow().vtanKms());
                };
        return entry.dependsOnOrder()
                ? rests
                        + String.format(
                                Locale.ROOT,
                                "; depends on the order, added last it would be %+.2f",
                                entry.log10FactorLast())
                : rests;
    }

    private String lithiumNote() {
        return String.format(
                Locale.ROOT,
                "Li I 6708 not seen, where a full line would be seen in %.0f%% of such objects",
                100 * curves.lithiumChance());
    }

    private List<String> notCounted() {
        List<String> out = new ArrayList<>();
        boolean stated = curves.evidence().age().isPresent();
        for (Piece piece : Piece.values()) {
            boolean there =
                    switch (piece) {
                        case GRAVITY -> !curves.evidence().gravityPrior().isEmpty();
                        case HALPHA -> curves.evidence().halpha() != Halpha.UNKNOWN;
                        case VELOCITY -> curves.kinematics().isPresent();
                        default -> false;
                    };
            if (there && !curves.counts(piece)) {
                out.add(
                        piece.label()
                                + (stated
                                        ? ": tells the age alone, and an age is stated, which may"
                                                + " rest on it"
                                        : ": says nothing about the age at this type"));
            }
        }
        return out;
    }
}
