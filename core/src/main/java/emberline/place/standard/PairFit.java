package emberline.place.standard;

import java.util.Locale;
import java.util.OptionalDouble;
import org.apache.commons.statistics.distribution.FDistribution;

/**
 * The best sum of two standards against the best single one.
 *
 * @param single the best single standard, or two neighbours in type that stand for one between
 * @param pair the best sum of two standards of different types
 * @param pFalseAlarm share of single objects that the sum would improve as much: of the standards
 *     themselves, each compared with the others; empty where they are too few to tell
 */
public record PairFit(StandardMatch single, StandardMatch pair, OptionalDouble pFalseAlarm) {

    /** Confidence by the F test from which a sum may be a pair. */
    private static final double CONFIDENT = 0.9;

    /** Greatest share of false alarms of a candidate. */
    private static final double RARE = 0.05;

    /**
     * The same fit with what is known of false alarms.
     *
     * @param share as {@link #pFalseAlarm}
     * @return a new fit
     */
    PairFit withFalseAlarms(OptionalDouble share) {
        return new PairFit(single, pair, share);
    }

    /** What the comparison with sums says. */
    public enum Outcome {
        /** The sum fits better, and single objects seldom look so. */
        CANDIDATE,
        /** The sum fits better by the F test, but that happens with single objects too often. */
        UNSURE,
        /** The sum fits no better. */
        NONE;

        /**
         * The outcome in a word.
         *
         * @return {@code candidate}, {@code unsure} or {@code none}
         */
        public String word() {
            return name().toLowerCase(Locale.ROOT);
        }
    }

    /**
     * The ratio of the reduced chi-squares of the single fit and of the sum, each at least 1, since
     * a fit within the noise and the scatter between like objects cannot be improved.
     *
     * @return 1 where the sum is no better; greater where it is
     */
    public double ratio() {
        return ratio(single, pair);
    }

    static double ratio(StandardMatch single, StandardMatch pair) {
        return Math.max(1, single.reducedChiSquare()) / Math.max(1, pair.reducedChiSquare());
    }

    /**
     * Confidence that the sum is better, by the F test of {@link #ratio}; two bins count as one
     * degree of freedom, since differences between objects run over several bins. It takes no
     * account of how many sums were tried: {@link #pFalseAlarm} does.
     *
     * @return 0 to 1
     */
    public double confidence() {
        return FDistribution.of(
                        Math.max(1, single.degreesOfFreedom() / StandardType.BINS_PER_DEGREE),
                        Math.max(1, pair.degreesOfFreedom() / StandardType.BINS_PER_DEGREE))
                .cumulativeProbability(ratio());
    }

    /**
     * What is made of it.
     *
     * @return a candidate where the F test is confident and false alarms are known to be rare
     */
    public Outcome outcome() {
        if (confidence() < CONFIDENT) {
            return Outcome.NONE;
        }
        return pFalseAlarm.isPresent() && pFalseAlarm.getAsDouble() <= RARE
                ? Outcome.CANDIDATE
                : Outcome.UNSURE;
    }
}
