package emberline.measure;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureWindow;
import emberline.catalogue.Kind;
import emberline.catalogue.Role;
import emberline.catalogue.Window;
import emberline.measure.Measurement.NotMeasured;
import emberline.measure.Measurement.Why;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * Whether a definition can be applied to a spectrum at all, before anything is measured: does the
 * spectrum reach its windows and resolve them?
 *
 * <p>Rules. A feature with a calibrated range of resolving power needs at least {@value
 * #CALIBRATION_SLACK} of its lower end. A line needs its own window to be at least one resolution
 * element wide. A band index needs every window to be at least {@value #LEAST_SMOOTH} of one where
 * the absorber varies smoothly (water, methane, carbon monoxide, ammonia, hydrogen, continua), and
 * {@value #LEAST_STRUCTURED} of one where it has sharp heads or lines (oxides, hydrides, atoms):
 * spectra of one object at two resolutions disagree below that. A resolution element is never taken
 * finer than one pixel.
 */
final class Applicability {

    /** Share of the printed lower end of the resolving power that is still accepted. */
    static final double CALIBRATION_SLACK = 0.8;

    /** Least width of a window in resolution elements, absorbers that vary smoothly. */
    static final double LEAST_SMOOTH = 0.3;

    /** Least width of a window in resolution elements, absorbers with sharp heads or lines. */
    static final double LEAST_STRUCTURED = 0.6;

    private static final Set<String> SMOOTH =
            Set.of("H2O", "CH4", "CO", "NH3", "H2", "CN", "CONTINUUM");

    /** A spectrum up to this much finer than the calibration is not smoothed. */
    static final double SMOOTHING_SLACK = 1.1;

    private final Spectrum spectrum;
    private final ResolvingPower resolvingPower;

    Applicability(Spectrum spectrum, ResolvingPower resolvingPower) {
        this.spectrum = spectrum;
        this.resolvingPower = resolvingPower;
    }

    /** The resolving power to which the spectrum is smoothed for a feature, if it is. */
    OptionalDouble smoothing(Feature feature) {
        OptionalDouble to = feature.smoothToResolvingPower();
        boolean finer =
                to.isPresent() && resolvingPower.value() > SMOOTHING_SLACK * to.getAsDouble();
        return finer ? to : OptionalDouble.empty();
    }

    /** Why a feature cannot be applied; empty where it can. */
    Optional<NotMeasured> refusal(Feature feature) {
        Optional<NotMeasured> reach = beyondReach(feature);
        return reach.isPresent() ? reach : unresolved(feature);
    }

    private Optional<NotMeasured> beyondReach(Feature feature) {
        double low = spectrum.lowEdgeMicron(0);
        double high = spectrum.highEdgeMicron(spectrum.size() - 1);
        for (FeatureWindow part : feature.windows()) {
            Window window = part.window();
            if (window.highMicron() <= low || window.lowMicron() >= high) {
                return Optional.of(
                        new NotMeasured(
                                Why.NOT_COVERED,
                                String.format(
                                        Locale.ROOT,
                                        "window %.4f to %.4f micron; the spectrum covers %.4f to"
                                                + " %.4f",
                                        window.lowMicron(),
                                        window.highMicron(),
                                        low,
                                        high)));
            }
        }
        return Optional.empty();
    }

    private Optional<NotMeasured> unresolved(Feature feature) {
        OptionalDouble least = feature.minResolvingPower();
        if (least.isPresent() && resolvingPower.value() < CALIBRATION_SLACK * least.getAsDouble()) {
            return tooCoarse(
                    String.format(
                            Locale.ROOT,
                            "resolving power %.0f%s; the definition needs %.0f or more",
                            resolvingPower.value(),
                            known(),
                            least.getAsDouble()));
        }
        boolean line = feature.kind() == Kind.EQUIVALENT_WIDTH;
        for (FeatureWindow part : feature.windows()) {
            boolean core = line && part.role() == Role.LINE;
            double needed = core ? 1 : least(feature);
            double element = elementMicron(part.window().centreMicron());
            if (part.window().widthMicron() < needed * element) {
                return tooCoarse(
                        String.format(
                                Locale.ROOT,
                                "window of %.4f micron at %.4f; one resolution element there is"
                                        + " %.4f%s",
                                part.window().widthMicron(),
                                part.window().centreMicron(),
                                element,
                                known()));
            }
        }
        return Optional.empty();
    }

    private static double least(Feature feature) {
        return SMOOTH.contains(feature.species()) ? LEAST_SMOOTH : LEAST_STRUCTURED;
    }

    private double elementMicron(double micron) {
        int pixel = Math.min(spectrum.firstAtOrAbove(micron), spectrum.size() - 1);
        return Math.max(micron / resolvingPower.value(), spectrum.localSpacingMicron(pixel));
    }

    private String known() {
        return resolvingPower.basis() == ResolvingPower.Basis.SAMPLING
                ? " (estimated from the sampling)"
                : "";
    }

    private static Optional<NotMeasured> tooCoarse(String detail) {
        return Optional.of(new NotMeasured(Why.TOO_COARSE, detail));
    }
}
