package emberline.place.kind;

import java.util.List;
import java.util.function.Function;
import java.util.function.ToIntFunction;

/**
 * Calibrates the probabilities of a learner on objects that it did not learn from: the exponent for
 * which the mean log probability of the true kind is greatest, every kind of equal weight.
 */
final class Sharpness {

    private static final double LEAST = 0.4;
    private static final double MOST = 3;
    private static final double STEP = 0.1;

    private Sharpness() {}

    static <T extends KindLearner<T>> float fit(
            List<T> leftOut, List<TrainingRow> rows, ToIntFunction<TrainingRow> fold) {
        float best = 1;
        double highest = Double.NEGATIVE_INFINITY;
        for (double exponent = LEAST; exponent <= MOST + 1e-9; exponent += STEP) {
            double score = score(leftOut, rows, fold, (float) exponent);
            if (score > highest) {
                highest = score;
                best = (float) exponent;
            }
        }
        return best;
    }

    /** The power of the mean over coverages, from the same rows. */
    static double ofModels(
            List<KindModel> leftOut, List<TrainingRow> rows, ToIntFunction<TrainingRow> fold) {
        double best = 1;
        double highest = Double.NEGATIVE_INFINITY;
        for (double power = LEAST; power <= MOST + 1e-9; power += 2 * STEP) {
            double tried = power;
            List<KindModel> models = leftOut.stream().map(m -> m.withSharpness(tried)).toList();
            double score =
                    score(
                            rows,
                            row -> {
                                KindModel model = models.get(fold.applyAsInt(row));
                                List<Coverage> coverages = model.coverages(row.vector());
                                return coverages.isEmpty()
                                        ? new double[Forest.KINDS]
                                        : model.known(coverages, row.vector());
                            });
            if (score > highest) {
                highest = score;
                best = power;
            }
        }
        return best;
    }

    private static <T extends KindLearner<T>> double score(
            List<T> leftOut,
            List<TrainingRow> rows,
            ToIntFunction<TrainingRow> fold,
            float exponent) {
        List<T> learners = leftOut.stream().map(f -> f.withSharpness(exponent)).toList();
        return score(
                rows,
                row -> learners.get(fold.applyAsInt(row)).probabilities(row.vector().values()));
    }

    private static double score(
            List<TrainingRow> rows, Function<TrainingRow, double[]> probabilities) {
        double[] sum = new double[Forest.KINDS];
        int[] count = new int[Forest.KINDS];
        for (TrainingRow row : rows) {
            int kind = row.kind().position();
            double p = probabilities.apply(row)[kind];
            if (p > 0) { // a fold may lack the one object of a kind
                sum[kind] += Math.log(p);
                count[kind]++;
            }
        }
        double mean = 0;
        for (int kind = 0; kind < sum.length; kind++) {
            mean += count[kind] == 0 ? 0 : sum[kind] / count[kind];
        }
        return mean;
    }
}
