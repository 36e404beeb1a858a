package emberline.place.kind;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToIntFunction;
import java.util.stream.IntStream;

/** Learns the blend of one coverage, and others that leave out one fold of the objects each. */
final class BlendTrainer {

    private final int folds;
    private final ForestGrower grower;
    private final RegressionFitter fitter;

    BlendTrainer(KindFeatures features, int trees, int folds) {
        this.folds = folds;
        this.grower = new ForestGrower(features, trees);
        this.fitter = new RegressionFitter(features);
    }

    /**
     * What was learned of one coverage.
     *
     * @param ofAll from all rows
     * @param leftOut by fold, from the rows of the other folds; the exponents of all of them are
     *     those that suit these on the rows that they left out
     */
    record Learned(Blend ofAll, List<Blend> leftOut) {}

    /** Learns from rows that all have the coverage. */
    Learned learn(Coverage coverage, List<TrainingRow> rows, ToIntFunction<TrainingRow> fold) {
        List<List<TrainingRow>> parts = new ArrayList<>();
        for (int k = 0; k < folds; k++) {
            int out = k;
            parts.add(rows.stream().filter(r -> fold.applyAsInt(r) != out).toList());
        }
        parts.add(rows);
        List<Forest> forests = parts.stream().map(part -> grower.grow(coverage, part)).toList();
        List<Regression> regressions =
                IntStream.range(0, parts.size())
                        .parallel()
                        .mapToObj(k -> fitter.fit(coverage, parts.get(k)))
                        .toList();
        float ofForest = Sharpness.fit(forests.subList(0, folds), rows, fold);
        float ofRegression = Sharpness.fit(regressions.subList(0, folds), rows, fold);
        List<Blend> plain =
                IntStream.range(0, parts.size())
                        .mapToObj(
                                k ->
                                        new Blend(
                                                forests.get(k).withSharpness(ofForest),
                                                regressions.get(k).withSharpness(ofRegression),
                                                1))
                        .toList();
        float ofBlend = Sharpness.fit(plain.subList(0, folds), rows, fold);
        List<Blend> blends = plain.stream().map(b -> b.withSharpness(ofBlend)).toList();
        return new Learned(blends.get(folds), blends.subList(0, folds));
    }
}
