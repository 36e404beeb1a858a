package emberline.place;

import emberline.catalogue.ActivityFactor;
import emberline.catalogue.ActivityFactor.Quantity;
import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Kind;
import emberline.catalogue.Purpose;
import emberline.catalogue.RestLine;
import emberline.catalogue.Role;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.measure.line.LineMeasurement;
import emberline.measure.line.LineMeasurement.Detection;
import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Judges activity by H alpha: of the definitions of its equivalent width that were measured, the
 * one with the widest line window is taken, which loses least light at low resolution.
 */
final class ActivityJudge {

    private static final double DEX = 1 / Math.log(10);

    private final List<Feature> widths;
    private final List<ChiCurve> curves;
    private final List<ActivityFactor> saturation;

    ActivityJudge(FeatureCatalogue catalogue) {
        List<Double> hydrogen =
                catalogue.restLines().stream()
                        .filter(line -> line.species().equals("H I"))
                        .map(RestLine::vacuumMicron)
                        .toList();
        this.widths =
                catalogue.features().stream()
                        .filter(f -> f.kind() == Kind.EQUIVALENT_WIDTH)
                        .filter(f -> f.purpose() == Purpose.ACTIVITY && f.species().equals("H"))
                        .filter(f -> f.windows(Role.LINE).size() == 1)
                        .filter(f -> hydrogen.stream().anyMatch(micron -> holds(f, micron)))
                        .sorted(Comparator.comparingDouble(f -> -f.window(Role.LINE).widthMicron()))
                        .toList();
        this.curves = ChiCurve.all(catalogue);
        this.saturation =
                catalogue.activityFactors().stream()
                        .filter(factor -> factor.quantity() == Quantity.SATURATION)
                        .toList();
    }

    private static boolean holds(Feature feature, double micron) {
        return feature.window(Role.LINE).lowMicron() < micron
                && micron < feature.window(Role.LINE).highMicron();
    }

    /** The activity of an object of a type. */
    Activity judge(Measurements measurements, TypeEstimate type) {
        Optional<Feature> line =
                widths.stream().filter(f -> measurements.measured(f.id()).isPresent()).findFirst();
        if (line.isEmpty()) {
            return Activity.none("H alpha was not measured");
        }
        Measured width = measurements.measured(line.get().id()).orElseThrow();
        LineMeasurement seen = LineMeasurement.of(line.get(), width);
        if (seen.detection() == Detection.ABSORPTION) {
            return new Activity(
                    line,
                    List.of(),
                    String.format(
                            Locale.ROOT,
                            "H alpha is seen in absorption, %.2f +- %.2f angstrom: no emission to"
                                    + " give a level or a limit of",
                            width.value(),
                            width.oneSigma()));
        }
        List<ActivityLevel> levels = new ArrayList<>();
        for (ChiCurve curve : curves) {
            if (curve.covers(type.typeNumber())) {
                levels.add(
                        seen.detection() == Detection.EMISSION
                                ? emission(curve, width, type)
                                : limit(curve, seen, type));
            }
        }
        String reason = levels.isEmpty() ? "no published chi covers the type " + type.code() : "";
        return new Activity(line, levels, reason);
    }

    private static ActivityLevel limit(ChiCurve curve, LineMeasurement line, TypeEstimate type) {
        return new ActivityLevel(
                curve.source(),
                curve.logChi(type.typeNumber())
                        + Math.log10(line.limit3SigmaAngstrom().orElseThrow()),
                OptionalDouble.empty());
    }

    private static ActivityLevel emission(ChiCurve curve, Measured width, TypeEstimate type) {
        double emission = -width.value();
        double logChi = curve.logChi(type.typeNumber());
        double byWidth = DEX * width.oneSigma() / emission;
        double byType =
                (curve.logChi(type.typeNumber() + type.sigmaSubclass())
                                - curve.logChi(type.typeNumber() - type.sigmaSubclass()))
                        / 2;
        double byChi = curve.sigmaDex(type.typeNumber());
        return new ActivityLevel(
                curve.source(),
                logChi + Math.log10(emission),
                OptionalDouble.of(Math.sqrt(byWidth * byWidth + byType * byType + byChi * byChi)));
    }

    /** What the observer should know: emission above the saturation of chromospheres. */
    List<Finding> findings(Activity activity) {
        List<Finding> findings = new ArrayList<>();
        for (ActivityFactor limit : saturation) {
            activity.levels().stream()
                    .filter(level -> !level.isUpperLimit() && level.logRatio() >= limit.value())
                    .findFirst()
                    .ifPresent(
                            level ->
                                    findings.add(
                                            Finding.note(
                                                    "halpha-above-saturation",
                                                    String.format(
                                                            Locale.ROOT,
                                                            "log L(H alpha) / L(bol) is %.2f (chi of"
                                                                    + " %s), at or above %.1f where"
                                                                    + " chromospheres saturate (%s):"
                                                                    + " accretion or a flare is"
                                                                    + " possible",
                                                            level.logRatio(),
                                                            level.source().shortCite(),
                                                            limit.value(),
                                                            limit.source().shortCite()))));
        }
        return findings;
    }
}
