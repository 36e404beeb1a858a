package emberline.reports.attach;

import emberline.measure.line.LineMeasurement;
import emberline.measure.line.LineReport;
import emberline.measure.line.LineSetAside;
import emberline.measure.line.LineVelocity;
import emberline.measure.line.RadialVelocity;
import emberline.place.Activity;
import emberline.place.ActivityLevel;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/** Lines, radial velocity and activity as parts of the JSON of an object. */
final class LineJson {

    private static final int KMS_DECIMALS = 1;
    private static final int WAVELENGTH_DECIMALS = 6;
    private static final int DEX_DECIMALS = 2;

    private LineJson() {}

    /**
     * Whether each line was seen; widths stand among the features, positive in absorption. Lines
     * that could not be measured are left out.
     */
    static List<Map<String, Object>> lines(LineReport report) {
        return report.lines().stream()
                .filter(line -> line.detection() != LineMeasurement.Detection.NOT_MEASURED)
                .map(LineJson::line)
                .toList();
    }

    private static Map<String, Object> line(LineMeasurement line) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("feature", line.feature().id());
        map.put("detection", ObjectJson.word(line.detection()));
        OptionalDouble limit = line.limit3SigmaAngstrom();
        map.put(
                "limit_3sigma",
                limit.isPresent()
                        ? JsonText.number(Digits.feature(line.feature(), limit.getAsDouble()))
                        : null);
        return map;
    }

    /** The radial velocity with the lines it rests on. */
    static Map<String, Object> velocity(RadialVelocity velocity) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("kms", velocity.kms().fold(v -> kms(v.value()), why -> null));
        map.put("sigma_kms", velocity.kms().fold(v -> kms(v.oneSigma()), why -> null));
        map.put("scale_sigma_kms", kms(velocity.scaleSigmaKms()));
        map.put(
                "reason",
                velocity.kms().fold(v -> "", why -> why.why().words() + ": " + why.detail()));
        map.put("lines", velocity.used().stream().map(LineJson::used).toList());
        map.put("set_aside", velocity.setAside().stream().map(LineJson::setAside).toList());
        return map;
    }

    private static Map<String, Object> used(LineVelocity line) {
        Map<String, Object> map = named(line.species(), line.restMicron());
        map.put("kms", kms(line.kms()));
        map.put("sigma_kms", kms(line.sigmaKms()));
        map.put("signal", JsonText.number(Digits.signal(line.signal())));
        return map;
    }

    private static Map<String, Object> setAside(LineSetAside line) {
        Map<String, Object> map = named(line.species(), line.restMicron());
        map.put("reason", line.reason());
        return map;
    }

    private static Map<String, Object> named(String species, double restMicron) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("species", species);
        map.put("rest_micron", JsonText.number(Digits.fixed(restMicron, WAVELENGTH_DECIMALS)));
        return map;
    }

    private static Object kms(double kms) {
        return JsonText.number(Digits.fixed(kms, KMS_DECIMALS));
    }

    /** The activity by H alpha. */
    static Map<String, Object> activity(Activity activity) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("feature", activity.line().map(line -> line.id()).orElse(""));
        map.put("reason", activity.reason());
        map.put("levels", activity.levels().stream().map(LineJson::level).toList());
        return map;
    }

    private static Map<String, Object> level(ActivityLevel level) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("source", level.source().cite());
        map.put("log_lhalpha_lbol", JsonText.number(Digits.fixed(level.logRatio(), DEX_DECIMALS)));
        OptionalDouble sigma = level.sigmaDex();
        map.put(
                "sigma_dex",
                sigma.isPresent()
                        ? JsonText.number(Digits.fixed(sigma.getAsDouble(), DEX_DECIMALS))
                        : null);
        map.put("upper_limit", level.isUpperLimit());
        return map;
    }
}
