package emberline.reports.attach;

import emberline.place.TypeEstimate;
import emberline.place.standard.PairFit;
import emberline.place.standard.Range;
import emberline.place.standard.StandardMatch;
import emberline.place.standard.StandardVerdict;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** The comparison with standards as JSON. */
final class StandardsJson {

    private StandardsJson() {}

    static Map<String, Object> map(StandardVerdict verdict) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("reason", verdict.reason());
        verdict.type().ifPresent(type -> putType(map, type));
        map.put("ranges", verdict.ranges().stream().map(Range::label).toList());
        map.put("compared", verdict.compared());
        map.put("best", matches(verdict.best()));
        Map<String, Object> byRange = new LinkedHashMap<>();
        verdict.byRange()
                .forEach(
                        (range, result) -> {
                            Map<String, Object> one = new LinkedHashMap<>();
                            putType(one, result.type());
                            one.put("compared", result.compared());
                            one.put("best", matches(result.best()));
                            byRange.put(range.label(), one);
                        });
        map.put("by_range", byRange);
        map.put("pair", verdict.pair().map(fit -> (Object) pair(fit)).orElse(null));
        return map;
    }

    private static void putType(Map<String, Object> map, TypeEstimate type) {
        map.put("type", TypeText.code(type));
        map.put("type_number", number(Digits.type(type.typeNumber())));
        map.put("type_sigma", number(Digits.type(type.sigmaSubclass())));
        map.put("type_lo68", number(Digits.type(type.lo68())));
        map.put("type_hi68", number(Digits.type(type.hi68())));
        map.put("type_lo95", number(Digits.type(type.lo95())));
        map.put("type_hi95", number(Digits.type(type.hi95())));
    }

    private static List<Map<String, Object>> matches(List<StandardMatch> matches) {
        return matches.stream().map(StandardsJson::match).toList();
    }

    private static Map<String, Object> match(StandardMatch match) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("standard", match.first().name());
        map.put("type_number", number(Digits.type(match.first().typeNumber())));
        match.second()
                .ifPresent(
                        second -> {
                            map.put("second_standard", second.name());
                            map.put("second_type_number", number(Digits.type(second.typeNumber())));
                        });
        map.put("reduced_chi_square", number(StandardsText.chiSquare(match)));
        map.put("degrees_of_freedom", match.degreesOfFreedom());
        map.put("scale", number(Digits.significant(match.scale())));
        if (match.second().isPresent()) {
            map.put("second_scale", number(Digits.significant(match.secondScale())));
        }
        return map;
    }

    private static Map<String, Object> pair(PairFit fit) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("outcome", fit.outcome().word());
        map.put("sum", match(fit.pair()));
        map.put("single", match(fit.single()));
        map.put("f_test_confidence", number(Digits.probability(fit.confidence())));
        map.put(
                "p_false_alarm",
                fit.pFalseAlarm().isPresent()
                        ? number(Digits.probability(fit.pFalseAlarm().getAsDouble()))
                        : null);
        return map;
    }

    private static Object number(String digits) {
        return JsonText.number(digits);
    }
}
