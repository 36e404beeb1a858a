package emberline.reports.chart;

import emberline.place.kind.KindVerdict;
import emberline.place.kind.ObjectKind;
import emberline.reports.chart.Axis.Tick;
import emberline.reports.chart.Layer.Block;
import emberline.reports.chart.Layer.Side;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/** The kinds of object with their probabilities, the most probable on top. */
public final class KindChart {

    private static final double HALF = 0.33;

    /** Room between a bar and its number. */
    private static final double BESIDE = 0.02;

    private KindChart() {}

    /**
     * The chart of a verdict.
     *
     * @param verdict a verdict with probabilities
     * @return a row for each kind at whole heights from 1
     */
    public static Chart of(KindVerdict verdict) {
        List<Map.Entry<ObjectKind, Double>> kinds =
                new ArrayList<>(verdict.probabilities().entrySet());
        kinds.sort((one, two) -> Double.compare(two.getValue(), one.getValue()));
        List<Block> first = new ArrayList<>();
        List<Block> others = new ArrayList<>();
        List<Layer> words = new ArrayList<>();
        List<Tick> rows = new ArrayList<>();
        int row = kinds.size();
        for (Map.Entry<ObjectKind, Double> kind : kinds) {
            double share = kind.getValue();
            (first.isEmpty() ? first : others).add(new Block(0, share, row - HALF, row + HALF));
            rows.add(new Tick(row, kind.getKey().label()));
            words.add(
                    new Layer.Note(
                            share + BESIDE,
                            row,
                            String.format(Locale.ROOT, "%.2f", share),
                            Tone.WORDS,
                            Side.RIGHT));
            row--;
        }
        List<Layer> layers = new ArrayList<>();
        layers.add(new Layer.Blocks(first, Tone.RESULT, true));
        layers.add(new Layer.Blocks(others, Tone.SHOWN, true));
        layers.addAll(words);
        Axis x = new Axis("Probability", "", 0, 1.22, Ticks.round(0, 1, 4));
        return new Chart("", x, new Axis("", "", 0.3, kinds.size() + 0.7, rows), layers);
    }
}
