package emberline.cli;

import emberline.prepare.Preparing;
import emberline.spectrum.Medium;
import emberline.survey.SurveySettings;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** Options that state something about all spectra of a run. */
final class SpectrumOptions {

    @Spec(Spec.Target.MIXEE)
    private CommandSpec spec;

    @Option(
            names = "--medium",
            paramLabel = "air|vacuum",
            description =
                    "Medium of the wavelengths where the list does not say; goes before what a file"
                            + " says.")
    private Medium medium;

    @Option(
            names = "--resolution",
            paramLabel = "R",
            description =
                    "Resolving power where the list does not say; goes before what a file says.")
    private Double resolution;

    @Option(
            names = "--seed",
            paramLabel = "N",
            defaultValue = "" + SurveySettings.DEFAULT_SEED,
            description =
                    "Start of all random draws (default ${DEFAULT-VALUE}); the same seed gives the"
                            + " same results.")
    private long seed;

    /** The settings of a run on a number of threads. */
    SurveySettings settings(int threads) {
        Preparing stated = Preparing.withDefaults();
        if (medium != null) {
            stated = stated.withMedium(medium);
        }
        if (resolution != null) {
            if (!(resolution > 0) || resolution.isInfinite()) {
                throw new ParameterException(
                        spec.commandLine(),
                        "--resolution: expected a positive number but was " + resolution);
            }
            stated = stated.withResolvingPower(resolution);
        }
        if (threads < 1) {
            throw new ParameterException(
                    spec.commandLine(), "--threads: expected at least 1 but was " + threads);
        }
        return SurveySettings.withDefaults()
                .withThreads(threads)
                .withSeed(seed)
                .withPreparing(stated);
    }
}
