package emberline.reports.attach;

import emberline.judge.plan.PlanQuestion;
import emberline.judge.plan.SignalPlan;
import emberline.spectrum.SpectralType;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/** A plan of a spectrum as text, table or JSON. */
public final class PlanTable {

    private static final String LIMITS =
            "Spectra are drawn from the loci of known objects with noise independent from feature to"
                    + " feature. Real spectra have telluric residuals and flux calibration errors"
                    + " besides; take the figures as a lower limit.";

    private final SignalPlan plan;
    private final OptionalDouble signalNow;

    /**
     * A table.
     *
     * @param plan the plan
     * @param signalNow median signal-to-noise a pixel that one exposure gave, to which exposure
     *     times are compared; empty where there is none
     */
    public PlanTable(SignalPlan plan, OptionalDouble signalNow) {
        this.plan = plan;
        this.signalNow = signalNow;
    }

    /**
     * What the figures cannot tell.
     *
     * @return a few sentences
     */
    public static String limits() {
        return LIMITS;
    }

    /**
     * What is planned, in words.
     *
     * @return for instance {@code L3 FLD-G at a resolving power of 120: the gravity class}
     */
    public String title() {
        PlanQuestion question = plan.question();
        return new SpectralType(question.setting().typeNumber()).code()
                + " "
                + question.setting().gravity().label()
                + " at a resolving power of "
                + Digits.fixed(question.setting().resolvingPower(), 0)
                + ": "
                + question.aim().question();
    }

    /**
     * The plan in a form.
     *
     * @param format text for a terminal, one row a signal-to-noise as CSV, or an object
     * @return the printed plan, with a line end
     */
    public String print(TableFormat format) {
        return switch (format) {
            case TEXT ->
                    title()
                            + "\n\n"
                            + table().text()
                            + "\n"
                            + plan.words()
                            + exposure()
                            + "\n"
                            + LIMITS
                            + "\n";
            case CSV -> table().csv();
            case JSON -> json();
        };
    }

    private String exposure() {
        OptionalDouble needed = plan.signalNeeded();
        if (signalNow.isEmpty() || needed.isEmpty()) {
            return "";
        }
        return " From the signal-to-noise of "
                + Digits.fixed(signalNow.getAsDouble(), 0)
                + " that is "
                + Digits.significant(times(needed.getAsDouble()), 2)
                + " times the exposure, where photons limit it.";
    }

    private double times(double signal) {
        double ratio = signal / signalNow.orElseThrow();
        return ratio * ratio;
    }

    /** One row a signal-to-noise. */
    private AlignedTable table() {
        List<String> header =
                new ArrayList<>(
                        List.of(
                                "snr",
                                "median_probability",
                                "share_sure",
                                "share_wrong",
                                "type_sigma"));
        if (signalNow.isPresent()) {
            header.add("exposure_factor");
        }
        AlignedTable table = new AlignedTable(header);
        for (SignalPlan.Step step : plan.steps()) {
            table.add(cells(step));
        }
        return table;
    }

    private List<String> cells(SignalPlan.Step step) {
        List<String> cells =
                new ArrayList<>(
                        List.of(
                                Digits.fixed(step.signalToNoise(), 0),
                                Digits.fixed(step.medianProbability(), 3),
                                Digits.fixed(step.shareSure(), 2),
                                step.shareWrong().isPresent()
                                        ? Digits.fixed(step.shareWrong().getAsDouble(), 2)
                                        : "",
                                Digits.fixed(step.typeSigma(), 2)));
        if (signalNow.isPresent()) {
            cells.add(Digits.significant(times(step.signalToNoise()), 2));
        }
        return cells;
    }

    private String json() {
        PlanQuestion question = plan.question();
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("type", new SpectralType(question.setting().typeNumber()).code());
        map.put("type_number", question.setting().typeNumber());
        map.put("gravity", question.setting().gravity().label());
        map.put("resolution", question.setting().resolvingPower());
        map.put("aim", question.aim().word());
        map.put("sure", question.sure());
        OptionalDouble needed = plan.signalNeeded();
        map.put(
                "snr_needed",
                needed.isPresent() ? new BigDecimal(Digits.fixed(needed.getAsDouble(), 1)) : null);
        map.put("words", plan.words());
        map.put("features", plan.features());
        map.put("draws", question.draws());
        map.put("seed", question.seed());
        List<String> names = new ArrayList<>(List.of("snr", "median_probability", "share_sure"));
        names.addAll(List.of("share_wrong", "type_sigma", "exposure_factor"));
        List<Map<String, Object>> steps = new ArrayList<>();
        for (SignalPlan.Step step : plan.steps()) {
            List<String> cells = cells(step);
            Map<String, Object> one = new LinkedHashMap<>();
            for (int c = 0; c < cells.size(); c++) {
                one.put(names.get(c), JsonText.number(cells.get(c)));
            }
            steps.add(one);
        }
        map.put("steps", steps);
        map.put("limits", LIMITS);
        return JsonText.of(map);
    }
}
