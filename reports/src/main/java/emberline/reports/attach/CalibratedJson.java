package emberline.reports.attach;

import emberline.place.GravityClass;
import emberline.place.TypePosterior;
import emberline.place.calibrated.CalibratedType;
import emberline.place.calibrated.Contribution;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** The posterior over type and gravity class, and what each feature did to it, for JSON. */
final class CalibratedJson {

    private CalibratedJson() {}

    /** Posterior and contributions, or the reason why there are none. */
    static Map<String, Object> map(CalibratedType calibrated) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("reason", calibrated.reason());
        map.put("posterior", calibrated.posterior().map(CalibratedJson::posterior).orElse(null));
        map.put(
                "contributions",
                calibrated.contributions().stream().map(CalibratedJson::contribution).toList());
        return map;
    }

    /** Probabilities of the cells of the grid, to five decimals, for each gravity class. */
    private static Map<String, Object> posterior(TypePosterior posterior) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("first_type_number", posterior.typeNumber(0));
        map.put("step_subclass", posterior.stepSubclass());
        for (GravityClass gravity : GravityClass.values()) {
            List<Object> cells = new ArrayList<>();
            for (int i = 0; i < posterior.size(); i++) {
                cells.add(JsonText.number(fine(posterior.probability(i, gravity))));
            }
            map.put(gravity.label(), cells);
        }
        return map;
    }

    private static String fine(double probability) {
        return probability < 5e-6 ? "0" : Digits.fixed(probability, 5);
    }

    private static Map<String, Object> contribution(Contribution one) {
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("feature", one.feature());
        map.put("deviation_sigma", JsonText.number(Digits.fixed(one.deviationSigma(), 2)));
        map.put("pull_subclass", JsonText.number(Digits.fixed(one.pullSubclass(), 3)));
        map.put("share", JsonText.number(Digits.fixed(one.share(), 3)));
        map.put("set_aside", one.setAside());
        return map;
    }
}
