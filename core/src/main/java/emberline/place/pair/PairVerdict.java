package emberline.place.pair;

import emberline.spectrum.Finding;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Whether an object may be an unresolved pair of dwarfs. A candidate wants a comparison with sums
 * of standards; subdwarfs and unusually blue dwarfs meet the same criteria.
 *
 * @param strength how strong the case is; empty where it is not judged
 * @param criteriaMet number of criteria that are met
 * @param criteriaJudged number of criteria that could be judged
 * @param pPair probability that enough criteria for a candidate are met once the noise of the
 *     features and the error of the type are drawn, 0 to 1; it is not the probability that the
 *     object is a pair; empty where it is not judged
 * @param reason why it is not judged; empty where it is
 * @param criteria the criteria one by one
 */
public record PairVerdict(
        Optional<Strength> strength,
        int criteriaMet,
        int criteriaJudged,
        OptionalDouble pPair,
        String reason,
        List<PairCriterion> criteria) {

    /** How strong the case for a pair is. */
    public enum Strength {
        /** Enough criteria are met. */
        CANDIDATE,
        /** One less than enough. */
        WEAK,
        /** Too few. */
        NONE;

        /**
         * The strength in a word.
         *
         * @return {@code candidate}, {@code weak} or {@code none}
         */
        public String word() {
            return name().toLowerCase(Locale.ROOT);
        }
    }

    /** Copies the list. */
    public PairVerdict {
        criteria = List.copyOf(criteria);
    }

    /**
     * A verdict that could not be reached.
     *
     * @param reason why
     * @return a verdict without strength
     */
    public static PairVerdict notJudged(String reason) {
        return new PairVerdict(
                Optional.empty(), 0, 0, OptionalDouble.empty(), "not judged: " + reason, List.of());
    }

    /**
     * What the observer should know.
     *
     * @return a caution for a candidate, a note for a weak one
     */
    public List<Finding> findings() {
        if (strength.isEmpty() || strength.get() == Strength.NONE) {
            return List.of();
        }
        String text =
                String.format(
                        Locale.ROOT,
                        "%d of %d spectral-blend criteria are met: perhaps an unresolved pair, and"
                                + " its type a blend; subdwarfs and unusually blue dwarfs meet"
                                + " them too",
                        criteriaMet,
                        criteriaJudged);
        return List.of(
                strength.get() == Strength.CANDIDATE
                        ? Finding.caution("pair-candidate", text)
                        : Finding.note("pair-weak", text));
    }
}
