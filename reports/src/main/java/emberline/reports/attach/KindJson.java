package emberline.reports.attach;

import emberline.place.Placement;
import emberline.place.kind.Kin;
import emberline.place.pair.PairCriterion;
import emberline.spectrum.SpectralType;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Kind, kin and pair of an object as JSON. */
final class KindJson {

    private KindJson() {}

    /** The probability of each kind. */
    static Map<String, Object> kinds(Placement placement) {
        Map<String, Object> map = new LinkedHashMap<>();
        placement
                .kind()
                .probabilities()
                .forEach(
                        (kind, p) -> map.put(kind.label(), JsonText.number(Digits.probability(p))));
        if (!map.isEmpty()) {
            map.put("regions", placement.kind().coverage());
        }
        return map;
    }

    /** The type of a reference object, from M0 on. */
    static Optional<String> type(Kin kin) {
        return kin.typeNumber().isPresent() && kin.typeNumber().getAsDouble() >= 0
                ? Optional.of(new SpectralType(kin.typeNumber().getAsDouble()).code())
                : Optional.empty();
    }

    /** The nearest reference objects. */
    static List<Map<String, Object>> kin(Placement placement) {
        List<Map<String, Object>> list = new ArrayList<>();
        for (Kin kin : placement.kin()) {
            Map<String, Object> map = new LinkedHashMap<>();
            map.put("object", kin.object());
            map.put("type", type(kin).orElse(""));
            map.put("gravity", kin.gravity());
            map.put("kind", kin.kind().label());
            map.put("data_set", kin.source());
            map.put("distance", JsonText.number(Digits.fixed(kin.distance(), 2)));
            map.put("features_in_common", kin.featuresInCommon());
            list.add(map);
        }
        return list;
    }

    /** The spectral-blend criteria. */
    static List<Map<String, Object>> criteria(Placement placement) {
        List<Map<String, Object>> list = new ArrayList<>();
        for (PairCriterion criterion : placement.pair().criteria()) {
            Map<String, Object> map = new LinkedHashMap<>();
            map.put("source", criterion.plane().source().cite());
            map.put("number", criterion.plane().number());
            map.put("x", criterion.plane().xFeature().orElse("type"));
            map.put("y", criterion.plane().yFeature());
            map.put("met", criterion.met().orElse(null));
            map.put("reason", criterion.reason());
            list.add(map);
        }
        return list;
    }
}
