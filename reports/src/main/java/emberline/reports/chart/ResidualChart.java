package emberline.reports.chart;

import emberline.reports.chart.Layer.Point;
import emberline.reports.chart.Layer.Vertex;
import emberline.survey.score.CheckScore;
import emberline.survey.score.CheckScore.CoveragePoint;
import emberline.survey.score.ScoredObject;
import emberline.survey.score.TypeScore.Figures;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Charts of how well known types are recovered. */
public final class ResidualChart {

    private static final double LEAST_HEIGHT = 2.5;
    private static final double MOST_HEIGHT = 6;
    private static final double CLASS_WIDTH = 2;

    /** Fewest objects of a class of which a middle is shown. */
    private static final int FEWEST = 3;

    private static final double FARTHEST_PULL = 5;
    private static final double PULL_STEP = 0.5;
    private static final double LOW_END = 0.16;

    private ResidualChart() {}

    /**
     * Found minus known type against the known type, each with its one-sigma error: objects listed
     * with low gravity or as young apart from the others, and in steps of two subclasses the median
     * with the range of the middle 68%.
     *
     * @param score the score of a list, with at least one dwarf that was given a type
     * @return the chart; differences beyond its height stand at its edge
     */
    public static Chart differences(CheckScore score) {
        List<ScoredObject> typed = score.typedDwarfs();
        double first = Math.floor(least(typed)) - 0.75;
        double last = Math.ceil(-least(typed, -1)) + 0.75;
        double height =
                typed.stream()
                        .mapToDouble(o -> Math.abs(o.difference().orElseThrow()) + 0.5)
                        .max()
                        .orElse(LEAST_HEIGHT);
        height = Math.min(MOST_HEIGHT, Math.max(LEAST_HEIGHT, height));
        List<Layer> layers = new ArrayList<>();
        for (int level = -1; level <= 1; level++) {
            layers.add(straight(first, level, last, level));
        }
        layers.add(new Layer.Points(points(typed, false), Tone.SHOWN, true));
        layers.add(new Layer.Points(points(typed, true), Tone.USED, true));
        layers.add(new Layer.Points(middles(typed, first, last), Tone.RESULT, true));
        return new Chart(
                "",
                new Axis("Known type", "", first, last, Ticks.types(first, last, 10)),
                new Axis(
                        "Found minus known",
                        "subclass",
                        -height,
                        height,
                        Ticks.round(-height, height, 6)),
                layers);
    }

    private static double least(List<ScoredObject> typed) {
        return least(typed, 1);
    }

    private static double least(List<ScoredObject> typed, int sign) {
        return typed.stream()
                .mapToDouble(o -> sign * o.known().typeNumber().orElseThrow())
                .min()
                .orElseThrow();
    }

    private static Curve straight(double x1, double y1, double x2, double y2) {
        return Curve.line(new double[] {x1, x2}, new double[] {y1, y2}, Tone.GUIDE);
    }

    private static List<Point> points(List<ScoredObject> typed, boolean lowGravity) {
        List<Point> points = new ArrayList<>();
        for (ScoredObject object : typed) {
            String gravity = object.known().gravity();
            if (lowGravity == (!gravity.isBlank() && !gravity.equals("FLD-G"))) {
                double x = object.known().typeNumber().orElseThrow();
                double y = object.difference().orElseThrow();
                double sigma = object.found().type().orElseThrow().sigmaSubclass();
                points.add(new Point(x, x, x, y, y - sigma, y + sigma));
            }
        }
        return points;
    }

    private static List<Point> middles(List<ScoredObject> typed, double first, double last) {
        List<Point> middles = new ArrayList<>();
        double from = CLASS_WIDTH * Math.floor(first / CLASS_WIDTH);
        for (double low = from; low < last; low += CLASS_WIDTH) {
            double start = low;
            double[] off =
                    typed.stream()
                            .filter(o -> o.known().typeNumber().orElseThrow() >= start)
                            .filter(o -> o.known().typeNumber().orElseThrow() < start + CLASS_WIDTH)
                            .mapToDouble(o -> o.difference().orElseThrow())
                            .sorted()
                            .toArray();
            if (off.length >= FEWEST) {
                double x = low + CLASS_WIDTH / 2 - 0.25;
                middles.add(
                        new Point(
                                x,
                                x,
                                x,
                                quantile(off, 0.5),
                                quantile(off, LOW_END),
                                quantile(off, 1 - LOW_END)));
            }
        }
        return middles;
    }

    private static double quantile(double[] sorted, double share) {
        double place = share * (sorted.length - 1);
        int below = (int) place;
        int above = Math.min(below + 1, sorted.length - 1);
        return sorted[below] + (place - below) * (sorted[above] - sorted[below]);
    }

    /**
     * How many dwarfs are off by so many sigma, with the curve of normal errors of the stated size.
     *
     * @param score the score of a list, with at least one dwarf that was given a type
     * @return the chart; what is farther off than five sigma stands in the last steps
     */
    public static Chart pulls(CheckScore score) {
        double[] pulls =
                score.typedDwarfs().stream().mapToDouble(o -> o.pull().orElseThrow()).toArray();
        int steps = (int) (2 * FARTHEST_PULL / PULL_STEP);
        int[] counts = new int[steps];
        for (double pull : pulls) {
            int step = (int) Math.floor((pull + FARTHEST_PULL) / PULL_STEP);
            counts[Math.max(0, Math.min(steps - 1, step))]++;
        }
        List<Vertex> stairs = new ArrayList<>();
        for (int step = 0; step < steps; step++) {
            stairs.add(new Vertex(-FARTHEST_PULL + step * PULL_STEP, counts[step]));
            stairs.add(new Vertex(-FARTHEST_PULL + (step + 1) * PULL_STEP, counts[step]));
        }
        List<Vertex> ground = List.of(new Vertex(-FARTHEST_PULL, 0), new Vertex(FARTHEST_PULL, 0));
        double[] x = new double[101];
        double[] normal = new double[x.length];
        for (int i = 0; i < x.length; i++) {
            x[i] = FARTHEST_PULL * (i / 50.0 - 1);
            normal[i] =
                    pulls.length * PULL_STEP * Math.exp(-x[i] * x[i] / 2) / Math.sqrt(2 * Math.PI);
        }
        double height = Math.max(Arrays.stream(counts).max().orElse(1), normal[50]) * 1.12;
        return new Chart(
                "",
                new Axis(
                        "Found minus known over sigma",
                        "",
                        -FARTHEST_PULL,
                        FARTHEST_PULL,
                        Ticks.round(-FARTHEST_PULL, FARTHEST_PULL, 10)),
                new Axis("Objects", "", 0, height, Ticks.round(0, height, 4)),
                List.of(
                        new Layer.Area(ground, stairs, Tone.INTERMEDIATE, ""),
                        Curve.line(x, normal, Tone.RESULT)));
    }

    /**
     * The share of known types inside an interval against the share that the interval claims.
     *
     * @param score the score of a list, with at least one dwarf that was given a type
     * @return the chart: a curve for normal errors of the stated size, and the stated 68% and 95%
     *     intervals as points
     */
    public static Chart coverage(CheckScore score) {
        List<CoveragePoint> points = score.coverage();
        List<Layer> layers = new ArrayList<>();
        layers.add(straight(0, 0, 100, 100));
        layers.add(
                Curve.line(
                        points.stream().mapToDouble(p -> 100 * p.nominal()).toArray(),
                        points.stream().mapToDouble(p -> 100 * p.actual()).toArray(),
                        Tone.USED));
        Optional<Figures> figures = score.types().get(0).figures();
        figures.ifPresent(
                f ->
                        layers.add(
                                new Layer.Points(
                                        List.of(
                                                at(68, 100 * f.inside68()),
                                                at(95, 100 * f.inside95())),
                                        Tone.RESULT,
                                        true)));
        Axis x = new Axis("Stated", "%", 0, 100, Ticks.round(0, 100, 5));
        Axis y = new Axis("Inside", "%", 0, 100, Ticks.round(0, 100, 5));
        return new Chart("", x, y, layers);
    }

    private static Point at(double x, double y) {
        return new Point(x, x, x, y, y, y);
    }
}
