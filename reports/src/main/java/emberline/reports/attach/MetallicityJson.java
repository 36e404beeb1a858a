package emberline.reports.attach;

import emberline.catalogue.MetallicityClass;
import emberline.measure.Measurement.Measured;
import emberline.place.metallicity.MetallicityVerdict;
import emberline.place.metallicity.ZetaReading;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** The metallicity class as JSON: every recalibration of zeta with its error and classes. */
final class MetallicityJson {

    private MetallicityJson() {}

    /** What stands beside the class on the outer level. */
    static Map<String, Object> of(MetallicityVerdict verdict) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("metallicity_reason", verdict.reason());
        map.put("metallicity_probabilities", probabilities(verdict.probabilities()));
        List<Map<String, Object>> readings = new ArrayList<>();
        for (ZetaReading reading : verdict.readings()) {
            Map<String, Object> one = new LinkedHashMap<>();
            one.put("feature", reading.feature().id());
            one.put("source", reading.feature().source().cite());
            one.put("zeta", number(reading, true));
            one.put("sigma", number(reading, false));
            one.put(
                    "class",
                    reading.metallicityClass().map(MetallicityClass.Name::prefix).orElse(""));
            one.put("probabilities", probabilities(reading.probabilities()));
            one.put("used", reading.isUsed());
            one.put("reason", reading.reason());
            readings.add(one);
        }
        map.put("metallicity_readings", readings);
        map.put("metallicity_hint", verdict.hint());
        map.put("metallicity_range", verdict.validRange());
        return map;
    }

    private static Map<String, Object> probabilities(Map<MetallicityClass.Name, Double> shares) {
        Map<String, Object> map = new LinkedHashMap<>();
        shares.forEach(
                (name, share) ->
                        map.put(name.prefix(), JsonText.number(Digits.probability(share))));
        return map;
    }

    private static Object number(ZetaReading reading, boolean value) {
        return reading.zeta() instanceof Measured measured
                ? JsonText.number(
                        Digits.feature(
                                reading.feature(), value ? measured.value() : measured.oneSigma()))
                : null;
    }
}
