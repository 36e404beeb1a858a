package emberline.cli;

import emberline.measure.Measuring;
import emberline.survey.SurveySettings;
import java.util.LinkedHashMap;
import java.util.Map;

/** The options of a run that bear on its results, for its record. */
final class RunOptions {

    private RunOptions() {}

    static Map<String, String> of(SurveySettings settings, Measuring measuring, boolean reports) {
        Map<String, String> options = new LinkedHashMap<>();
        options.put(
                "medium", settings.preparing().medium().map(medium -> medium.word()).orElse(""));
        options.put(
                "resolution",
                settings.preparing().resolvingPower().isPresent()
                        ? Double.toString(settings.preparing().resolvingPower().getAsDouble())
                        : "");
        options.put(
                "velocity_kms",
                settings.preparing().radialVelocityKms().isPresent()
                        ? Double.toString(settings.preparing().radialVelocityKms().getAsDouble())
                        : "");
        options.put("site", measuring.site().word());
        options.put(
                "av_mag",
                settings.preparing()
                        .extinction()
                        .map(extinction -> Double.toString(extinction.avMag()))
                        .orElse(""));
        options.put(
                "r_v",
                settings.preparing()
                        .extinction()
                        .map(extinction -> Double.toString(extinction.rv()))
                        .orElse(""));
        options.put("prior", settings.prior().word());
        options.put("fit_reddening", settings.reddening().word());
        options.put("to_rest", Boolean.toString(settings.toMeasuredRest()));
        options.put("age", settings.judging().age().map(age -> age.text()).orElse(""));
        options.put("aim", settings.judging().aimWords());
        options.put(
                "decide",
                settings.judging().substellarFrom() + "," + settings.judging().stellarTo());
        options.put("reports", reports ? "pdf" : "none");
        return options;
    }
}
