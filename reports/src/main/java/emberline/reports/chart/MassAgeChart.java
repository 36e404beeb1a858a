package emberline.reports.chart;

import emberline.judge.Estimate;
import emberline.judge.Judgement;
import emberline.judge.MassAgePlane;
import emberline.judge.MassLimits;
import emberline.reports.chart.Axis.Tick;
import emberline.reports.chart.Layer.Block;
import emberline.reports.chart.Layer.Side;
import java.util.ArrayList;
import java.util.List;

/**
 * The plane of age and mass: the smallest regions that hold 68% and 95% of the posterior, its
 * medians with their 68% intervals, and the limits of hydrogen and deuterium burning. Both axes are
 * logarithmic.
 */
public final class MassAgeChart {

    private static final double[] MASSES = {0.002, 0.005, 0.01, 0.02, 0.05, 0.1, 0.2};
    private static final double[] AGES = {10, 100, 1000, 10000};
    private static final String[] AGE_LABELS = {"10 Myr", "100 Myr", "1 Gyr", "10 Gyr"};

    private static final double WORD_ROOM = 0.025;

    private MassAgeChart() {}

    /**
     * The chart of a judgement.
     *
     * @param judgement the judgement
     * @return a chart in log10 of the age (Myr) and log10 of the mass (solar)
     */
    public static Chart of(Judgement judgement) {
        MassAgePlane plane = judgement.plane();
        MassLimits limits = MassLimits.standard();
        double left = Math.log10(plane.ageEdgeMyr(0));
        double right = Math.log10(plane.ageEdgeMyr(plane.ages()));
        double low = Math.log10(plane.massEdgeMsun(0));
        double high = Math.log10(plane.massEdgeMsun(plane.masses()));
        List<Layer> layers = new ArrayList<>();
        layers.add(
                new Layer.Blocks(
                        List.of(
                                new Block(
                                        left,
                                        right,
                                        Math.log10(limits.hydrogenLowMsun()),
                                        Math.log10(limits.hydrogenHighMsun()))),
                        Tone.LIMIT,
                        false));
        layers.add(new Layer.Blocks(region(plane, 0.95), Tone.RESULT_95, false));
        layers.add(new Layer.Blocks(region(plane, 0.68), Tone.RESULT_68, false));
        double hydrogen = Math.log10(limits.hydrogenMsun());
        double deuterium = Math.log10(limits.deuteriumMsun());
        layers.add(new Layer.Segment(left, hydrogen, right, hydrogen, Tone.WORDS, false));
        layers.add(new Layer.Segment(left, deuterium, right, deuterium, Tone.WORDS, true));
        layers.add(point(judgement, left, right));
        boolean old = Math.log10(judgement.age().ageMyr().median()) > (left + right) / 2;
        double word = old ? left + WORD_ROOM * (right - left) : right - WORD_ROOM * (right - left);
        Side side = old ? Side.ABOVE : Side.ABOVE_LEFT;
        double above = Math.log10(limits.hydrogenHighMsun());
        layers.add(new Layer.Note(word, above, "burns hydrogen", Tone.WORDS, side));
        layers.add(new Layer.Note(word, deuterium, "burns deuterium", Tone.WORDS, side));
        return new Chart(
                "",
                new Axis("Age", "", left, right, ages(left, right)),
                new Axis("Mass", "solar", low, high, masses(low, high)),
                layers);
    }

    /** The cells of highest probability that hold a share, runs of one mass joined. */
    private static List<Block> region(MassAgePlane plane, double share) {
        List<Double> cells = new ArrayList<>();
        for (int a = 0; a < plane.ages(); a++) {
            for (int m = 0; m < plane.masses(); m++) {
                cells.add(plane.probability(a, m));
            }
        }
        cells.sort((one, two) -> Double.compare(two, one));
        double sum = 0;
        double least = 0;
        for (double cell : cells) {
            sum += cell;
            least = cell;
            if (sum >= share) {
                break;
            }
        }
        int[] shown = shownColumns(plane);
        List<Block> blocks = new ArrayList<>();
        for (int m = 0; m < plane.masses(); m++) {
            int start = 0;
            for (int a = 0; a <= plane.ages(); a++) {
                boolean inside =
                        a < plane.ages() && least > 0 && plane.probability(shown[a], m) >= least;
                if (!inside) {
                    if (a > start) {
                        blocks.add(
                                new Block(
                                        Math.log10(plane.ageEdgeMyr(start)),
                                        Math.log10(plane.ageEdgeMyr(a)),
                                        Math.log10(plane.massEdgeMsun(m)),
                                        Math.log10(plane.massEdgeMsun(m + 1))));
                    }
                    start = a + 1;
                }
            }
        }
        return blocks;
    }

    /**
     * The column that is shown at each age: itself, or, where the steps of the evidence are wider
     * than the cells, the nearest one before that holds anything, up to the last that does.
     */
    private static int[] shownColumns(MassAgePlane plane) {
        int[] shown = new int[plane.ages()];
        int last = -1;
        for (int a = 0; a < shown.length; a++) {
            last = holdsAnything(plane, a) ? a : last;
        }
        int before = -1;
        for (int a = 0; a < shown.length; a++) {
            before = holdsAnything(plane, a) ? a : before;
            shown[a] = before >= 0 && a < last ? before : a;
        }
        return shown;
    }

    private static boolean holdsAnything(MassAgePlane plane, int age) {
        for (int m = 0; m < plane.masses(); m++) {
            if (plane.probability(age, m) > 0) {
                return true;
            }
        }
        return false;
    }

    private static Layer point(Judgement judgement, double left, double right) {
        Estimate age = judgement.age().ageMyr();
        Estimate mass = judgement.massMsun();
        return new Layer.Points(
                List.of(
                        new Layer.Point(
                                Math.log10(age.median()),
                                Math.max(left, Math.log10(age.lo68())),
                                Math.min(right, Math.log10(age.hi68())),
                                Math.log10(mass.median()),
                                Math.log10(mass.lo68()),
                                Math.log10(mass.hi68()))),
                Tone.RESULT,
                true);
    }

    private static List<Tick> masses(double low, double high) {
        List<Tick> ticks = new ArrayList<>();
        for (double mass : MASSES) {
            double at = Math.log10(mass);
            if (at >= low - 1e-9 && at <= high + 1e-9) {
                ticks.add(new Tick(at, Double.toString(mass)));
            }
        }
        return ticks;
    }

    /** A label at each decade; with a narrow range of ages at its ends. */
    private static List<Tick> ages(double left, double right) {
        List<Tick> ticks = new ArrayList<>();
        int named = 0;
        for (int i = 0; i < AGES.length; i++) {
            double at = Math.log10(AGES[i]);
            if (at >= left - 1e-9 && at <= right + 1e-9) {
                ticks.add(new Tick(at, AGE_LABELS[i]));
                named++;
            }
        }
        if (named < 2) {
            return List.of(new Tick(left, age(left)), new Tick(right, age(right)));
        }
        return ticks;
    }

    private static String age(double logMyr) {
        double myr = Math.pow(10, logMyr);
        return myr < 1000 ? Math.round(myr) + " Myr" : Math.round(myr / 100) / 10.0 + " Gyr";
    }
}
