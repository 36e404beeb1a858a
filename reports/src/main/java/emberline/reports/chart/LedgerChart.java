package emberline.reports.chart;

import emberline.judge.Ledger;
import emberline.judge.LedgerEntry;
import emberline.judge.Piece;
import emberline.reports.chart.Axis.Tick;
import emberline.reports.chart.Layer.Block;
import emberline.reports.chart.Layer.Side;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * How the evidence made the odds of a claim: a row for the prior, one for each piece of evidence
 * with a bar from the odds before it to those after it, and one for the result. Odds run on a
 * logarithmic axis; what favours the claim steps to the right.
 */
public final class LedgerChart {

    private static final double HALF = 0.33;

    /** Least and greatest end of the axis (log10 of the odds). */
    private static final double LEAST_REACH = 1.3;

    private static final double MOST_REACH = 4;

    /** Share of the axis that a word beside a bar takes up. */
    private static final double WORD_SHARE = 0.22;

    private LedgerChart() {}

    /**
     * The chart of a ledger.
     *
     * @param ledger the ledger
     * @return rows from top to bottom at whole heights, the result at 0
     */
    public static Chart of(Ledger ledger) {
        double reach = reach(ledger);
        List<Layer> layers = new ArrayList<>();
        List<Block> towards = new ArrayList<>();
        List<Block> against = new ArrayList<>();
        List<Layer> over = new ArrayList<>();
        List<Tick> rows = new ArrayList<>();
        int row = ledger.entries().size() + 1;
        layers.add(new Layer.Segment(0, -0.7, 0, row + 0.7, Tone.GUIDE, false));
        double odds = ledger.priorLog10Odds();
        rows.add(new Tick(row, "prior"));
        over.add(new Layer.Segment(odds, row - HALF, odds, row + HALF, Tone.RESULT, false));
        over.add(note(odds, odds, row, odds(odds)));
        for (LedgerEntry entry : ledger.entries()) {
            over.add(new Layer.Segment(odds, row - HALF, odds, row - 1 + HALF, Tone.SHOWN, true));
            row--;
            double then = odds + entry.log10Factor();
            (then >= odds ? towards : against)
                    .add(
                            new Block(
                                    Math.min(odds, then),
                                    Math.max(odds, then),
                                    row - HALF,
                                    row + HALF));
            rows.add(new Tick(row, label(entry.piece()) + (entry.dependsOnOrder() ? "*" : "")));
            over.add(note(odds, then, row, "× " + factor(entry.log10Factor())));
            odds = then;
        }
        over.add(new Layer.Segment(odds, row - HALF, odds, 0, Tone.SHOWN, true));
        rows.add(new Tick(0, "all together"));
        layers.add(new Layer.Blocks(towards, Tone.TOWARDS, true));
        layers.add(new Layer.Blocks(against, Tone.AGAINST, true));
        layers.addAll(over);
        double end = ledger.finalLog10Odds();
        layers.add(
                new Layer.Points(
                        List.of(new Layer.Point(end, end, end, 0, 0, 0)), Tone.RESULT, true));
        double seen = Math.max(-reach, Math.min(reach, end));
        String word = "P " + share(ledger.probability());
        layers.add(note(seen, seen, 0, seen > 0 ? word + "\u2003" : "\u2003" + word));
        Axis x = new Axis("Odds of " + ledger.claim(), "", -reach, reach, ticks(reach));
        Axis y = new Axis("", "", -0.7, ledger.entries().size() + 1.7, rows);
        return new Chart("", x, y, layers);
    }

    private static double reach(Ledger ledger) {
        double odds = ledger.priorLog10Odds();
        double reach = Math.max(LEAST_REACH, Math.abs(odds));
        for (LedgerEntry entry : ledger.entries()) {
            odds += entry.log10Factor();
            reach = Math.max(reach, Math.abs(odds));
            reach = Math.max(reach, roomForWord(odds - entry.log10Factor(), odds));
        }
        return Math.min(MOST_REACH, Math.max(reach, Math.abs(ledger.finalLog10Odds()))) + 0.25;
    }

    /** The reach with which the word beside a bar finds room. */
    private static double roomForWord(double from, double to) {
        double left = Math.min(from, to);
        double right = Math.max(from, to);
        return (left + right > 0 ? -left : right) / (1 - 2 * WORD_SHARE);
    }

    /** A word on the side of a bar where there is more room. */
    private static Layer note(double from, double to, double row, String text) {
        double left = Math.min(from, to);
        double right = Math.max(from, to);
        return left + right > 0
                ? new Layer.Note(left, row, text, Tone.WORDS, Side.LEFT)
                : new Layer.Note(right, row, text, Tone.WORDS, Side.RIGHT);
    }

    private static String label(Piece piece) {
        return switch (piece) {
            case HALPHA -> "H\u03b1";
            case VELOCITY -> "velocity";
            default -> piece.label();
        };
    }

    private static String factor(double log10Factor) {
        double factor = Math.pow(10, log10Factor);
        return factor >= 1e4 || factor < 1e-3
                ? "10" + superscript((int) Math.round(log10Factor))
                : String.format(
                        Locale.ROOT,
                        factor >= 10 ? "%.0f" : factor >= 0.1 ? "%.2f" : "%.3f",
                        factor);
    }

    private static String odds(double log10Odds) {
        return log10Odds >= 0 ? factor(log10Odds) + " : 1" : "1 : " + factor(-log10Odds);
    }

    private static String share(double share) {
        return share >= 0.995
                ? "> 0.99"
                : share < 0.005 ? "< 0.01" : String.format(Locale.ROOT, "= %.2f", share);
    }

    private static String superscript(int number) {
        String digits = "\u2070\u00b9\u00b2\u00b3\u2074\u2075\u2076\u2077\u2078\u2079";
        StringBuilder text = new StringBuilder(number < 0 ? "\u207b" : "");
        for (char digit : Integer.toString(Math.abs(number)).toCharArray()) {
            text.append(digits.charAt(digit - '0'));
        }
        return text.toString();
    }

    private static List<Tick> ticks(double reach) {
        List<Tick> ticks = new ArrayList<>();
        int step = reach > 2.5 ? 2 : 1;
        for (int decade = (int) -reach; decade <= reach; decade++) {
            boolean named = decade % step == 0;
            String high = Math.abs(decade) > 2 ? "10" + superscript(Math.abs(decade)) : "";
            String plain =
                    high.isEmpty() ? Integer.toString((int) Math.pow(10, Math.abs(decade))) : high;
            String label = decade >= 0 ? plain + ":1" : "1:" + plain;
            ticks.add(new Tick(decade, named ? label : ""));
        }
        return ticks;
    }
}
