package emberline.cli;

import emberline.measure.Measuring;
import emberline.measure.Site;
import emberline.place.calibrated.TypePriors;
import emberline.prepare.ExtinctionLaw;
import emberline.prepare.Preparing;
import emberline.spectrum.Medium;
import emberline.survey.ReddeningMode;
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
            names = "--site",
            paramLabel = "space|dry|wet",
            defaultValue = "dry",
            description =
                    "From where was observed: which telluric regions are flagged (default"
                            + " ${DEFAULT-VALUE}).")
    private Site site;

    @Option(
            names = "--av",
            paramLabel = "MAG",
            description = "Extinction in V to take out of every spectrum (mag).")
    private Double avMag;

    @Option(
            names = "--extinction-ratio",
            paramLabel = "R_V",
            description = "Ratio of total to selective extinction, with --av (default 3.1).")
    private Double rv;

    @Option(
            names = "--fit-reddening",
            description =
                    "Fit type and extinction together for every object (0 to 15 mag in V, R_V 3.1);"
                            + " without it they are where the kind or the colours call for it.")
    private boolean fitReddening;

    @Option(
            names = "--no-reddening",
            description = "Never fit extinction, not even where the kind calls for it.")
    private boolean noReddening;

    @Option(
            names = "--velocity",
            paramLabel = "KMS",
            description =
                    "Radial velocity to take out where the list states none (km/s, positive away"
                            + " from us).")
    private Double velocityKms;

    @Option(
            names = "--to-rest",
            description =
                    "Shift each spectrum to rest by the radial velocity of its own lines, where"
                            + " the list states none.")
    private boolean toRest;

    @Option(
            names = "--prior",
            paramLabel = "flat|volume|magnitude",
            defaultValue = "flat",
            description =
                    "What is thought of types before a spectrum is looked at: every type alike,"
                            + " space densities, or a sample limited in J (default"
                            + " ${DEFAULT-VALUE}).")
    private TypePriors prior;

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
        if (velocityKms != null) {
            stated = stated.withRadialVelocityKms(velocity());
        }
        if (avMag != null) {
            stated = stated.withExtinction(extinction());
        } else if (rv != null) {
            throw new ParameterException(
                    spec.commandLine(), "--extinction-ratio: expected --av beside it");
        }
        if (fitReddening && noReddening) {
            throw new ParameterException(
                    spec.commandLine(), "--fit-reddening: expected no --no-reddening beside it");
        }
        if (fitReddening && avMag != null) {
            throw new ParameterException(
                    spec.commandLine(),
                    "--fit-reddening: expected no --av beside it, which states the extinction");
        }
        if (threads < 1) {
            throw new ParameterException(
                    spec.commandLine(), "--threads: expected at least 1 but was " + threads);
        }
        return SurveySettings.withDefaults()
                .withThreads(threads)
                .withSeed(seed)
                .withPrior(prior)
                .withReddening(reddening())
                .withMeasuredRest(toRest)
                .withPreparing(stated);
    }

    /** A stated extinction goes before a fitted one. */
    private ReddeningMode reddening() {
        return fitReddening
                ? ReddeningMode.ALWAYS
                : noReddening || avMag != null ? ReddeningMode.NEVER : ReddeningMode.CALLED_FOR;
    }

    private Preparing.Extinction extinction() {
        try {
            return new Preparing.Extinction(avMag, rv == null ? ExtinctionLaw.DIFFUSE_RV : rv);
        } catch (IllegalArgumentException e) {
            throw new ParameterException(
                    spec.commandLine(), "--av, --extinction-ratio: " + e.getMessage());
        }
    }

    private double velocity() {
        if (!(Math.abs(velocityKms) < 30_000)) {
            throw new ParameterException(
                    spec.commandLine(),
                    "--velocity: expected a number between -30000 and 30000 but was "
                            + velocityKms);
        }
        return velocityKms;
    }

    /** How features are measured. */
    Measuring measuring() {
        return Measuring.withDefaults().withSite(site);
    }
}
