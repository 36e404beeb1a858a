package emberline.reports.chart;

import emberline.judge.plan.SignalPlan;
import emberline.reports.chart.Axis.Tick;
import emberline.reports.chart.Layer.Point;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.function.ToDoubleFunction;

/** Charts of what spectra of growing signal-to-noise would tell. */
public final class SignalChart {

    private static final double MARGIN_DEX = 0.04;
    private static final double MOST = 1.03;

    private SignalChart() {}

    /**
     * How sure the answer becomes: the median probability of the answer, and the share of spectra
     * that make it sure, against signal-to-noise on a logarithmic scale.
     *
     * @param plan a plan of at least two steps
     * @return the chart, with the wanted probability as a guide
     */
    public static Chart certainty(SignalPlan plan) {
        Axis x = signals(plan);
        double sure = plan.question().sure();
        List<Layer> layers = new ArrayList<>();
        layers.add(
                Curve.line(
                        new double[] {x.low(), x.high()}, new double[] {sure, sure}, Tone.GUIDE));
        layers.add(curve(plan, SignalPlan.Step::shareSure, Tone.SHOWN));
        layers.add(points(plan, SignalPlan.Step::shareSure, Tone.SHOWN));
        layers.add(curve(plan, SignalPlan.Step::medianProbability, Tone.RESULT));
        layers.add(points(plan, SignalPlan.Step::medianProbability, Tone.RESULT));
        return new Chart("", x, new Axis("Probability", "", 0, MOST, Ticks.round(0, 1, 5)), layers);
    }

    /**
     * The error of the type against signal-to-noise on a logarithmic scale.
     *
     * @param plan a plan of at least two steps
     * @return the chart
     */
    public static Chart typeError(SignalPlan plan) {
        double high =
                1.15
                        * plan.steps().stream()
                                .mapToDouble(SignalPlan.Step::typeSigma)
                                .max()
                                .orElse(1);
        return new Chart(
                "",
                signals(plan),
                new Axis("Error of the type", "subclass", 0, high, Ticks.round(0, high, 4)),
                List.of(
                        curve(plan, SignalPlan.Step::typeSigma, Tone.USED),
                        points(plan, SignalPlan.Step::typeSigma, Tone.USED)));
    }

    private static Axis signals(SignalPlan plan) {
        double[] at =
                plan.steps().stream().mapToDouble(s -> Math.log10(s.signalToNoise())).toArray();
        List<Tick> ticks = new ArrayList<>();
        for (SignalPlan.Step step : plan.steps()) {
            ticks.add(
                    new Tick(
                            Math.log10(step.signalToNoise()),
                            String.format(Locale.ROOT, "%.0f", step.signalToNoise())));
        }
        return new Axis(
                "Median signal-to-noise a pixel",
                "",
                at[0] - MARGIN_DEX,
                at[at.length - 1] + MARGIN_DEX,
                ticks);
    }

    private static Layer curve(SignalPlan plan, ToDoubleFunction<SignalPlan.Step> of, Tone tone) {
        return Curve.line(
                plan.steps().stream().mapToDouble(s -> Math.log10(s.signalToNoise())).toArray(),
                plan.steps().stream().mapToDouble(of).toArray(),
                tone);
    }

    private static Layer points(SignalPlan plan, ToDoubleFunction<SignalPlan.Step> of, Tone tone) {
        List<Point> points = new ArrayList<>();
        for (SignalPlan.Step step : plan.steps()) {
            double x = Math.log10(step.signalToNoise());
            double y = of.applyAsDouble(step);
            points.add(new Point(x, x, x, y, y, y));
        }
        return new Layer.Points(points, tone, true);
    }
}
