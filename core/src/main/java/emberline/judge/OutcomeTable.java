package emberline.judge;

import java.util.function.Function;

/**
 * Joint probabilities of what an object is (kinds) and what an observation shows (outcomes), from
 * which the expected information follows.
 */
final class OutcomeTable {

    private static final double LOG_2 = Math.log(2);

    private final double[][] joint;
    private final int outcomes;

    /**
     * A table.
     *
     * @param joint by kind, then outcome; need not add up to one
     */
    OutcomeTable(double[][] joint) {
        this.joint = joint;
        this.outcomes = joint[0].length;
    }

    private double[] kinds(int outcome) {
        double[] column = new double[joint.length];
        for (int k = 0; k < column.length; k++) {
            column[k] = joint[k][outcome];
        }
        return column;
    }

    private static double sum(double[] values, boolean[] yes, boolean wanted) {
        double sum = 0;
        for (int k = 0; k < values.length; k++) {
            sum += yes[k] == wanted ? values[k] : 0;
        }
        return sum;
    }

    /** Mutual information (bit) of the outcome and of whether the kind is one of some. */
    double information(boolean[] yes) {
        double allYes = 0;
        double allNo = 0;
        double after = 0;
        for (int o = 0; o < outcomes; o++) {
            double[] column = kinds(o);
            double a = sum(column, yes, true);
            double b = sum(column, yes, false);
            allYes += a;
            allNo += b;
            after += (a + b) * entropy(a / (a + b));
        }
        double all = allYes + allNo;
        return all > 0 ? Math.max(0, entropy(allYes / all) - after / all) : 0;
    }

    private static double entropy(double p) {
        return p > 0 && p < 1 ? -(p * Math.log(p) + (1 - p) * Math.log(1 - p)) / LOG_2 : 0;
    }

    /** Probability that a verdict by the probabilities of the kinds changes. */
    double change(Function<double[], Decision> verdict) {
        double[] before = new double[joint.length];
        for (int k = 0; k < before.length; k++) {
            for (double one : joint[k]) {
                before[k] += one;
            }
        }
        Decision now = verdict.apply(normalised(before));
        double all = 0;
        double other = 0;
        for (int o = 0; o < outcomes; o++) {
            double[] column = kinds(o);
            double weight = 0;
            for (double one : column) {
                weight += one;
            }
            all += weight;
            if (weight > 0 && verdict.apply(normalised(column)) != now) {
                other += weight;
            }
        }
        return all > 0 ? other / all : 0;
    }

    private static double[] normalised(double[] values) {
        double sum = 0;
        for (double one : values) {
            sum += one;
        }
        double[] shares = new double[values.length];
        for (int k = 0; k < shares.length; k++) {
            shares[k] = values[k] / sum;
        }
        return shares;
    }
}
