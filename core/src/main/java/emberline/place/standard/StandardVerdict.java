package emberline.place.standard;

import emberline.place.TypeEstimate;
import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.Collections;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * What the comparison of an object with standard spectra says.
 *
 * @param type the type by the standards that fit best over all ranges together; empty where none
 *     could be compared
 * @param reason why there is no type; empty where there is one
 * @param ranges the ranges that were compared together, under one scale
 * @param spectrum index of the spectrum of the object that was compared over these ranges; the
 *     scales of the matches are to this one
 * @param compared number of standards that cover these ranges
 * @param best the standards that fit best there, the best first, each object once
 * @param byRange the same for each range alone
 * @param pair the best sum of two standards against the best single one; empty where no sum fits
 */
public record StandardVerdict(
        Optional<TypeEstimate> type,
        String reason,
        List<Range> ranges,
        int spectrum,
        int compared,
        List<StandardMatch> best,
        Map<Range, RangeResult> byRange,
        Optional<PairFit> pair) {

    /** From this reduced chi-square on no standard is like the object. */
    private static final double BAD_FIT = 5;

    /** The comparison and the adopted type disagree from so many of their joint sigma on. */
    private static final double DISAGREEMENT = 2;

    /**
     * What one range alone says.
     *
     * @param type the type by the standards that fit best
     * @param compared number of standards that cover the range
     * @param best the standards that fit best, the best first
     */
    public record RangeResult(TypeEstimate type, int compared, List<StandardMatch> best) {
        /** Copies the list. */
        public RangeResult {
            best = List.copyOf(best);
        }
    }

    /** Copies the collections. */
    public StandardVerdict {
        ranges = List.copyOf(ranges);
        best = List.copyOf(best);
        Map<Range, RangeResult> copy = new EnumMap<>(Range.class);
        copy.putAll(byRange);
        byRange = Collections.unmodifiableMap(copy);
    }

    /**
     * A comparison that could not be made.
     *
     * @param reason why
     * @return a verdict without type
     */
    static StandardVerdict none(String reason) {
        return new StandardVerdict(
                Optional.empty(), reason, List.of(), 0, 0, List.of(), Map.of(), Optional.empty());
    }

    /**
     * What the observer should know.
     *
     * @param adopted the type by the posterior; empty where there is none
     * @return findings {@code standards-disagree}, {@code standards-fit-badly}, {@code
     *     standards-not-compared} and {@code pair-by-standards}, where they hold
     */
    public List<Finding> findings(Optional<TypeEstimate> adopted) {
        if (type.isEmpty()) {
            return List.of(
                    Finding.note(
                            "standards-not-compared",
                            "not compared with the standards: " + reason));
        }
        List<Finding> findings = new ArrayList<>();
        adopted.ifPresent(posterior -> disagreement(posterior).ifPresent(findings::add));
        if (best.get(0).reducedChiSquare() > BAD_FIT) {
            findings.add(
                    Finding.caution(
                            "standards-fit-badly",
                            String.format(
                                    Locale.ROOT,
                                    "no standard is like the object: the best, %s, leaves a reduced"
                                            + " chi-square of %.1f; the list may lack its type, or"
                                            + " the object is peculiar, reddened or a blend",
                                    best.get(0).first().name(),
                                    best.get(0).reducedChiSquare())));
        }
        pair.filter(fit -> fit.outcome() == PairFit.Outcome.CANDIDATE)
                .ifPresent(fit -> findings.add(candidate(fit)));
        return findings;
    }

    private Optional<Finding> disagreement(TypeEstimate posterior) {
        TypeEstimate mine = type.orElseThrow();
        double apart =
                Math.abs(mine.typeNumber() - posterior.typeNumber())
                        / Math.hypot(mine.sigmaSubclass(), posterior.sigmaSubclass());
        return apart <= DISAGREEMENT
                ? Optional.empty()
                : Optional.of(
                        Finding.caution(
                                "standards-disagree",
                                String.format(
                                        Locale.ROOT,
                                        "the standards give %s ± %.1f, the adopted type is %s ±"
                                                + " %.1f: %.1f of their joint sigma apart; look at"
                                                + " the overlay, and at the types of the standards",
                                        mine.code(),
                                        mine.sigmaSubclass(),
                                        posterior.code(),
                                        posterior.sigmaSubclass(),
                                        apart)));
    }

    private static Finding candidate(PairFit fit) {
        return Finding.caution(
                "pair-by-standards",
                String.format(
                        Locale.ROOT,
                        "the sum of %s and %s fits better than any single standard (chi-square %.2f"
                                + " against %.2f, F test %.4f; %.0f%% of single standards look so"
                                + " too): perhaps an unresolved pair, and its type a blend",
                        fit.pair().first().name(),
                        fit.pair().second().orElseThrow().name(),
                        fit.pair().reducedChiSquare(),
                        fit.single().reducedChiSquare(),
                        fit.confidence(),
                        100 * fit.pFalseAlarm().orElse(1)));
    }
}
