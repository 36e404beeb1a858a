package emberline.survey;

import emberline.judge.Judging;
import emberline.place.calibrated.TypePriors;
import emberline.place.standard.StandardComparison;
import emberline.prepare.Degrading;
import emberline.prepare.Preparing;
import java.util.Optional;

/**
 * Settings of a run over many objects.
 *
 * @param preparing what the observer states about every spectrum for which the list says nothing
 * @param threads number of threads, at least 1
 * @param seed start of all random draws
 * @param prior what is thought of types and gravities before a spectrum is looked at
 * @param reddening whether type and extinction are fitted together
 * @param toMeasuredRest whether the velocity that lines show is taken out where none is stated
 * @param degrading how spectra are made worse before they are prepared
 * @param judging how objects are judged
 * @param standards spectra of known type with which each object is compared; empty for none
 */
public record SurveySettings(
        Preparing preparing,
        int threads,
        long seed,
        TypePriors prior,
        ReddeningMode reddening,
        boolean toMeasuredRest,
        Degrading degrading,
        Judging judging,
        Optional<StandardComparison> standards) {

    /** The seed where none is given. */
    public static final long DEFAULT_SEED = 20_260_101L;

    /** Checks the number of threads. */
    public SurveySettings {
        if (threads < 1) {
            throw new IllegalArgumentException(threads + " threads: expected at least 1");
        }
    }

    /**
     * One thread a processor, the default seed, nothing stated about the spectra.
     *
     * @return the settings
     */
    public static SurveySettings withDefaults() {
        return new SurveySettings(
                Preparing.withDefaults(),
                Runtime.getRuntime().availableProcessors(),
                DEFAULT_SEED,
                TypePriors.FLAT,
                ReddeningMode.NEVER,
                false,
                Degrading.none(),
                Judging.withDefaults(),
                Optional.empty());
    }

    /**
     * These settings with another number of threads.
     *
     * @param number at least 1
     * @return new settings
     */
    public SurveySettings withThreads(int number) {
        return new SurveySettings(
                preparing,
                number,
                seed,
                prior,
                reddening,
                toMeasuredRest,
                degrading,
                judging,
                standards);
    }

    /**
     * These settings with another seed.
     *
     * @param start start of all random draws
     * @return new settings
     */
    public SurveySettings withSeed(long start) {
        return new SurveySettings(
                preparing,
                threads,
                start,
                prior,
                reddening,
                toMeasuredRest,
                degrading,
                judging,
                standards);
    }

    /**
     * These settings with other statements about the spectra.
     *
     * @param stated what holds where the list says nothing
     * @return new settings
     */
    public SurveySettings withPreparing(Preparing stated) {
        return new SurveySettings(
                stated,
                threads,
                seed,
                prior,
                reddening,
                toMeasuredRest,
                degrading,
                judging,
                standards);
    }

    /**
     * These settings with spectra shifted to rest by the velocity of their lines, or not.
     *
     * @param shift true to shift where no velocity is stated and the lines show one
     * @return new settings
     */
    public SurveySettings withMeasuredRest(boolean shift) {
        return new SurveySettings(
                preparing, threads, seed, prior, reddening, shift, degrading, judging, standards);
    }

    /**
     * These settings with another prior.
     *
     * @param before what is thought of types before a spectrum is looked at
     * @return new settings
     */
    public SurveySettings withPrior(TypePriors before) {
        return new SurveySettings(
                preparing,
                threads,
                seed,
                before,
                reddening,
                toMeasuredRest,
                degrading,
                judging,
                standards);
    }

    /**
     * These settings with spectra that are made worse first.
     *
     * @param how by how much
     * @return new settings
     */
    public SurveySettings withDegrading(Degrading how) {
        return new SurveySettings(
                preparing,
                threads,
                seed,
                prior,
                reddening,
                toMeasuredRest,
                how,
                judging,
                standards);
    }

    /**
     * These settings with type and extinction fitted together, or not.
     *
     * @param when for which objects
     * @return new settings
     */
    public SurveySettings withReddening(ReddeningMode when) {
        return new SurveySettings(
                preparing,
                threads,
                seed,
                prior,
                when,
                toMeasuredRest,
                degrading,
                judging,
                standards);
    }

    /**
     * These settings with objects judged otherwise.
     *
     * @param how thresholds, age and aims
     * @return new settings
     */
    public SurveySettings withJudging(Judging how) {
        return new SurveySettings(
                preparing,
                threads,
                seed,
                prior,
                reddening,
                toMeasuredRest,
                degrading,
                how,
                standards);
    }

    /**
     * These settings with standards to compare with.
     *
     * @param prepared the standards, prepared once for the run
     * @return new settings
     */
    public SurveySettings withStandards(StandardComparison prepared) {
        return new SurveySettings(
                preparing,
                threads,
                seed,
                prior,
                reddening,
                toMeasuredRest,
                degrading,
                judging,
                Optional.of(prepared));
    }
}
