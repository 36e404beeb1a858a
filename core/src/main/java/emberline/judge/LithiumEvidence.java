package emberline.judge;

import java.util.List;

/** How probable a test for lithium comes out as it did, by the part of the lithium left. */
final class LithiumEvidence {

    private static final double L0 = 10;
    private static final double WEAK_BELOW_MYR = 100;

    private record Row(double type, double width, double seen) {}

    private final List<Row> rows;
    private final double half;
    private final double youngFactor;
    private final double feigned;
    private final double feignedMeasured;

    LithiumEvidence(JudgeNumbers numbers) {
        this.half = numbers.of("lithium-left");
        this.youngFactor = numbers.of("lithium-young-weak");
        this.feigned = numbers.of("lithium-false");
        this.feignedMeasured = numbers.of("lithium-false-measured");
        this.rows =
                JudgeTable.rows(
                        "lithium.csv",
                        row ->
                                new Row(
                                        JudgeTable.number(row, "type_number"),
                                        JudgeTable.number(row, "width_angstrom"),
                                        JudgeTable.number(row, "p_seen")));
    }

    private double between(double type, java.util.function.ToDoubleFunction<Row> part) {
        if (type <= rows.get(0).type()) {
            return part.applyAsDouble(rows.get(0));
        }
        for (int i = 1; i < rows.size(); i++) {
            Row low = rows.get(i - 1);
            Row high = rows.get(i);
            if (type <= high.type()) {
                double t = (type - low.type()) / (high.type() - low.type());
                return part.applyAsDouble(low) * (1 - t) + part.applyAsDouble(high) * t;
            }
        }
        return part.applyAsDouble(rows.get(rows.size() - 1));
    }

    /** Usual equivalent width (angstrom) of a type that kept its lithium. */
    double width(double type) {
        return between(type, Row::width);
    }

    /** Chance to see the line of an object with all its lithium, to a limit (angstrom). */
    double chance(double type, double limitAngstrom) {
        double excess = limitAngstrom / width(type);
        double deepEnough = 1 / (1 + Math.pow(1.25 * excess, 4));
        return between(type, Row::seen) * deepEnough;
    }

    /** The same averaged over types, for a test as it was made. */
    double chance(TypeMix mix, LithiumTest test) {
        double limit = test.outcome() == LithiumTest.Outcome.NOT_SEEN ? test.limitAngstrom() : 0;
        double sum = 0;
        double weight = 0;
        for (int n = 0; n < TypeAxis.SIZE; n++) {
            double p = mix.type(n);
            if (p > 0) {
                sum += p * chance(TypeAxis.type(n), limit);
                weight += p;
            }
        }
        return sum / weight;
    }

    /** Factor on the chance for young L dwarfs. */
    double youngFactor(double type, double ageMyr) {
        return type >= L0 && ageMyr < WEAK_BELOW_MYR ? youngFactor : 1;
    }

    /** Probability that the line is seen, by the part of lithium left. */
    double seen(double left, double chance, boolean measured) {
        double ratio = half / Math.max(left, 1e-9);
        double visible = chance / (1 + ratio * ratio);
        return visible + (1 - visible) * (measured ? feignedMeasured : feigned);
    }
}
