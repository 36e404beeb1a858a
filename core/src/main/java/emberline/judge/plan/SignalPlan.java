package emberline.judge.plan;

import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;

/**
 * What spectra of growing signal-to-noise would tell.
 *
 * @param question what was asked
 * @param features how many calibrated features such a spectrum shows
 * @param steps one for each signal-to-noise, in ascending order
 * @param otherStep in words, the further observation that tells most once the spectrum is as good
 *     as it can be; blank for gravity, and where none would change the decision
 */
public record SignalPlan(PlanQuestion question, int features, List<Step> steps, String otherStep) {

    /**
     * One signal-to-noise.
     *
     * @param signalToNoise median signal-to-noise a pixel in the band that is covered best
     * @param medianProbability median over the drawn spectra of the probability of the answer: of
     *     the true gravity class, else of the side that is more probable
     * @param shareSure share of the spectra that give an answer with the wanted probability
     * @param shareWrong share of the spectra that give a wrong gravity class with that probability;
     *     empty for other aims, whose truth the type does not tell
     * @param typeSigma median half width of the 68% interval of the type (subclass)
     */
    public record Step(
            double signalToNoise,
            double medianProbability,
            double shareSure,
            OptionalDouble shareWrong,
            double typeSigma) {}

    /** Copies the list. */
    public SignalPlan {
        steps = List.copyOf(steps);
    }

    /**
     * The signal-to-noise from which half of all spectra give a sure answer, and do so at every
     * greater one.
     *
     * @return interpolated between the steps; the first step where that is enough already; empty
     *     where no step is enough
     */
    public OptionalDouble signalNeeded() {
        int first = steps.size();
        while (first > 0 && steps.get(first - 1).medianProbability() >= question.sure()) {
            first--;
        }
        if (first == steps.size()) {
            return OptionalDouble.empty();
        }
        Step enough = steps.get(first);
        if (first == 0) {
            return OptionalDouble.of(enough.signalToNoise());
        }
        Step before = steps.get(first - 1);
        double part =
                (question.sure() - before.medianProbability())
                        / (enough.medianProbability() - before.medianProbability());
        return OptionalDouble.of(
                before.signalToNoise()
                        * Math.pow(enough.signalToNoise() / before.signalToNoise(), part));
    }

    /**
     * The answer.
     *
     * @return one or two sentences
     */
    public String words() {
        Step last = steps.get(steps.size() - 1);
        OptionalDouble needed = signalNeeded();
        if (needed.isEmpty()) {
            String limited =
                    String.format(
                            Locale.ROOT,
                            "No signal-to-noise up to %.0f makes the answer %.0f%% sure: the median"
                                    + " probability stays at %.2f, since objects of one type differ"
                                    + " by more than the noise.",
                            last.signalToNoise(),
                            100 * question.sure(),
                            last.medianProbability());
            return otherStep.isBlank() ? limited : limited + " What tells more: " + otherStep + ".";
        }
        boolean atOnce = needed.getAsDouble() <= steps.get(0).signalToNoise();
        return String.format(
                Locale.ROOT,
                "At a median signal-to-noise of %.0f a pixel%s half of such spectra make the answer"
                        + " %.0f%% sure; at %.0f it is %.0f of 100.",
                Math.ceil(needed.getAsDouble()),
                atOnce ? " or less" : "",
                100 * question.sure(),
                last.signalToNoise(),
                100 * last.shareSure());
    }
}
