package emberline.cli;

import emberline.prepare.Degrading;
import emberline.prepare.ObservedBand;
import java.util.LinkedHashMap;
import java.util.Map;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** Options that make all spectra of a run worse before they are prepared. */
final class DegradeOptions {

    @Spec(Spec.Target.MIXEE)
    private CommandSpec spec;

    @Option(
            names = "--degrade-snr",
            paramLabel = "N",
            description =
                    "Add noise down to a median signal-to-noise of N a pixel; never up. The same"
                            + " --seed gives the same noise.")
    private Double signalToNoise;

    @Option(
            names = "--degrade-resolution",
            paramLabel = "R",
            description = "Smooth to a resolving power of R, two pixels a resolution element.")
    private Double resolvingPower;

    @Option(
            names = "--degrade-band",
            paramLabel = "optical|J|H|K",
            description = "Keep this band alone.")
    private ObservedBand band;

    /** How the spectra are degraded. */
    Degrading degrading() {
        Degrading how = Degrading.none();
        if (signalToNoise != null) {
            how = how.toSignalToNoise(positive("--degrade-snr", signalToNoise));
        }
        if (resolvingPower != null) {
            how = how.toResolvingPower(positive("--degrade-resolution", resolvingPower));
        }
        return band == null ? how : how.toBand(band);
    }

    private double positive(String option, double number) {
        if (!(number > 0) || Double.isInfinite(number)) {
            throw new ParameterException(
                    spec.commandLine(), option + ": expected a positive number but was " + number);
        }
        return number;
    }

    /** The options that were given, for the record of a run. */
    static Map<String, String> record(Degrading how) {
        Map<String, String> options = new LinkedHashMap<>();
        options.put(
                "degrade_snr",
                how.signalToNoise().isPresent()
                        ? Double.toString(how.signalToNoise().getAsDouble())
                        : "");
        options.put(
                "degrade_resolution",
                how.resolvingPower().isPresent()
                        ? Double.toString(how.resolvingPower().getAsDouble())
                        : "");
        options.put("degrade_band", how.band().map(ObservedBand::word).orElse(""));
        return options;
    }
}
