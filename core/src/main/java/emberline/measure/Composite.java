package emberline.measure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;

/** A feature made of other features. */
final class Composite implements Formula {

    private final List<Formula> parts;
    private final Rule rule;
    private final int[] rows;

    /** How the parts are put together. */
    interface Rule {
        /** The value from the values of the parts. */
        double value(double[] parts);

        /** The value for many draws at once, for each part one number a draw. */
        default void values(double[][] parts, int count, double[] out) {
            double[] one = new double[parts.length];
            for (int n = 0; n < count; n++) {
                for (int p = 0; p < one.length; p++) {
                    one[p] = parts[p][n];
                }
                out[n] = value(one);
            }
        }

        /** The derivative by each part. */
        double[] gradient(double[] parts);

        /** What the rule divides by, from the same parts; empty where it does not divide. */
        default Optional<Rule> divisor() {
            return Optional.empty();
        }
    }

    /** A function of the second part, with its derivative. */
    private record OfSecond(DoubleUnaryOperator of, DoubleUnaryOperator slope) implements Rule {

        @Override
        public double value(double[] parts) {
            return of.applyAsDouble(parts[1]);
        }

        @Override
        public double[] gradient(double[] parts) {
            return new double[] {0, slope.applyAsDouble(parts[1])};
        }
    }

    Composite(List<Formula> parts, Rule rule) {
        this.parts = List.copyOf(parts);
        this.rule = rule;
        this.rows = parts.stream().flatMapToInt(part -> Arrays.stream(part.rows())).toArray();
    }

    /**
     * The sum of all parts, each times its coefficient.
     *
     * @param coefficients one a part
     */
    static Rule sum(double[] coefficients) {
        return new Rule() {
            @Override
            public double value(double[] parts) {
                double sum = 0;
                for (int p = 0; p < parts.length; p++) {
                    sum += coefficients[p] * parts[p];
                }
                return sum;
            }

            @Override
            public void values(double[][] parts, int count, double[] out) {
                Arrays.fill(out, 0, count, 0);
                for (int p = 0; p < parts.length; p++) {
                    double coefficient = coefficients[p];
                    double[] part = parts[p];
                    for (int n = 0; n < count; n++) {
                        out[n] += coefficient * part[n];
                    }
                }
            }

            @Override
            public double[] gradient(double[] parts) {
                return coefficients.clone();
            }
        };
    }

    /** The first part over the second. */
    static Rule ratio() {
        return new Rule() {
            @Override
            public double value(double[] parts) {
                return parts[0] / parts[1];
            }

            @Override
            public double[] gradient(double[] parts) {
                return new double[] {1 / parts[1], -parts[0] / (parts[1] * parts[1])};
            }

            @Override
            public Optional<Rule> divisor() {
                return Optional.of(new OfSecond(second -> second, second -> 1));
            }
        };
    }

    /**
     * The shortfall (1 - a) / (1 - p(b)) of the first part against a polynomial in the second.
     *
     * @param coefficients of the polynomial, ascending
     */
    static Rule shortfall(List<Double> coefficients) {
        return new Rule() {
            @Override
            public double value(double[] parts) {
                return (1 - parts[0]) / (1 - polynomial(parts[1])[0]);
            }

            @Override
            public double[] gradient(double[] parts) {
                double[] solar = polynomial(parts[1]);
                double below = 1 - solar[0];
                return new double[] {-1 / below, (1 - parts[0]) * solar[1] / (below * below)};
            }

            @Override
            public Optional<Rule> divisor() {
                return Optional.of(new OfSecond(x -> 1 - polynomial(x)[0], x -> -polynomial(x)[1]));
            }

            private double[] polynomial(double x) {
                double value = 0;
                double slope = 0;
                for (int k = coefficients.size() - 1; k >= 0; k--) {
                    slope = slope * x + value;
                    value = value * x + coefficients.get(k);
                }
                return new double[] {value, slope};
            }
        };
    }

    @Override
    public int[] rows() {
        return rows;
    }

    @Override
    public double value(double[] y) {
        return rule.value(partValues(y));
    }

    private double[] partValues(double[] y) {
        return parts.stream().mapToDouble(part -> part.value(y)).toArray();
    }

    @Override
    public double[] gradient(double[] y) {
        double[] outer = rule.gradient(partValues(y));
        double[] gradient = new double[rows.length];
        int at = 0;
        for (int p = 0; p < outer.length; p++) {
            for (double inner : parts.get(p).gradient(y)) {
                gradient[at++] = outer[p] * inner;
            }
        }
        return gradient;
    }

    @Override
    public void values(double[][] draws, int count, double[] out) {
        double[][] drawn = new double[parts.size()][count];
        for (int p = 0; p < drawn.length; p++) {
            parts.get(p).values(draws, count, drawn[p]);
        }
        rule.values(drawn, count, out);
    }

    @Override
    public List<Continuum> continua() {
        List<Continuum> continua = new ArrayList<>();
        parts.forEach(part -> continua.addAll(part.continua()));
        return continua;
    }

    @Override
    public List<Formula> divisors() {
        List<Formula> divisors = new ArrayList<>();
        parts.forEach(part -> divisors.addAll(part.divisors()));
        rule.divisor().ifPresent(own -> divisors.add(new Composite(parts, own)));
        return divisors;
    }
}
