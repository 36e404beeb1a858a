package emberline.judge;

import emberline.place.GravityClass;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * What tells the age of an object: how often each gravity class is given at an age, the tangential
 * velocity, and H alpha. All from tables beside the class; between their ages linear in log age.
 */
final class AgeEvidence {

    private static final double OLD_SHARE_ACTIVE = 0.1;
    private static final double YOUNG_SHARE_ACTIVE = 0.95;
    private static final double ROOT = Math.sqrt(2 * Math.PI);

    private static final class ClassRow {
        private final double logAge;
        private final double[] share;

        ClassRow(double logAge, double[] share) {
            this.logAge = logAge;
            this.share = share;
        }
    }

    private record VelocityRow(
            String population, double lowType, double highType, double logMedian, double sigma) {}

    private record Lifetime(double type, double myr) {}

    private final List<ClassRow> classes = new ArrayList<>();
    private final List<VelocityRow> velocities;
    private final List<Lifetime> lifetimes;
    private final JudgeNumbers numbers;

    AgeEvidence(JudgeNumbers numbers) {
        this.numbers = numbers;
        classes.addAll(
                JudgeTable.rows(
                        "gravity-by-age.csv",
                        row -> {
                            double[] share = new double[GravityOrder.COUNT];
                            for (GravityClass gravity : GravityClass.values()) {
                                share[GravityOrder.of(gravity)] =
                                        JudgeTable.number(
                                                row,
                                                "p_"
                                                        + gravity.label()
                                                                .replace("-", "")
                                                                .toLowerCase(Locale.ROOT));
                            }
                            return new ClassRow(
                                    Math.log10(JudgeTable.number(row, "age_myr")), share);
                        }));
        velocities =
                JudgeTable.rows(
                        "velocities.csv",
                        row ->
                                new VelocityRow(
                                        row.getField("population"),
                                        JudgeTable.number(row, "low_type"),
                                        JudgeTable.number(row, "high_type"),
                                        Math.log(JudgeTable.number(row, "median_kms")),
                                        Math.log(
                                                        JudgeTable.number(row, "p84_kms")
                                                                / JudgeTable.number(row, "p16_kms"))
                                                / 2));
        lifetimes =
                JudgeTable.rows(
                        "activity.csv",
                        row ->
                                new Lifetime(
                                        JudgeTable.number(row, "type_number"),
                                        JudgeTable.number(row, "lifetime_myr")));
    }

    /** How often each class is given to objects of an age (Myr), by ordinal of the class. */
    double[] classShares(double ageMyr) {
        double at = Math.log10(ageMyr);
        int last = classes.size() - 1;
        if (at <= classes.get(0).logAge) {
            return classes.get(0).share.clone();
        }
        if (at >= classes.get(last).logAge) {
            return classes.get(last).share.clone();
        }
        int i = 0;
        while (classes.get(i + 1).logAge < at) {
            i++;
        }
        ClassRow low = classes.get(i);
        ClassRow high = classes.get(i + 1);
        double part = (at - low.logAge) / (high.logAge - low.logAge);
        double[] share = new double[low.share.length];
        for (int g = 0; g < share.length; g++) {
            share[g] = low.share[g] + part * (high.share[g] - low.share[g]);
        }
        return share;
    }

    /** Part of the objects of an age that lie on the sequence of young objects. */
    static double youngSequence(double[] classShares) {
        return classShares[GravityOrder.of(GravityClass.VL_G)]
                + classShares[GravityOrder.of(GravityClass.INT_G)];
    }

    private VelocityRow row(String population, double type) {
        VelocityRow found = null;
        for (VelocityRow row : velocities) {
            if (row.population().equals(population) && (found == null || type >= row.lowType())) {
                found = row;
            }
        }
        return Optional.ofNullable(found).orElseThrow();
    }

    /** Density of the log of a tangential velocity in a population. */
    private double density(String population, double type, double logVelocity, double error) {
        VelocityRow row = row(population, type);
        double sigma = Math.hypot(row.sigma(), error);
        double off = (logVelocity - row.logMedian()) / sigma;
        return Math.exp(-off * off / 2) / (sigma * ROOT);
    }

    /**
     * How probable a tangential velocity is at an age, up to a constant.
     *
     * @param kms velocity (km/s) with its relative error
     * @param relativeError one sigma by value
     */
    double velocity(double kms, double relativeError, double type, double ageMyr) {
        double field = density("FIELD", type, Math.log(kms), relativeError);
        double outliers = numbers.of("velocity-outliers");
        double young =
                (1 - outliers) * density("YOUNG", type, Math.log(kms), relativeError)
                        + outliers * field;
        double part =
                Math.log(ageMyr / numbers.of("young-age"))
                        / Math.log(numbers.of("velocity-old-age") / numbers.of("young-age"));
        double old = Math.min(1, Math.max(0, part));
        return (1 - old) * young + old * field;
    }

    /** Odds by which a tangential velocity speaks for a metal-poor object. */
    double metalPoorFactor(double kms, double relativeError, double type) {
        double field = density("FIELD", type, Math.log(kms), relativeError);
        double poor = density("METAL_POOR", type, Math.log(kms), relativeError);
        return poor / Math.max(field, 1e-4 * poor);
    }

    /** Whether H alpha says anything at a type. */
    boolean halphaCounts(Halpha seen, double type) {
        return switch (seen) {
            case UNKNOWN -> false;
            case ABOVE_SATURATION -> true;
            case EMISSION, NO_EMISSION -> lifetime(type) > 0;
        };
    }

    /** How probable what H alpha shows is at an age. */
    double halpha(Halpha seen, double type, double ageMyr) {
        double strong =
                ageMyr <= numbers.of("halpha-strong-age")
                        ? numbers.of("halpha-strong-young")
                        : numbers.of("halpha-strong-old");
        if (seen == Halpha.ABOVE_SATURATION) {
            return strong;
        }
        double fade = 1 / (1 + Math.pow(ageMyr / lifetime(type), 4));
        double active = OLD_SHARE_ACTIVE + (YOUNG_SHARE_ACTIVE - OLD_SHARE_ACTIVE) * fade;
        return seen == Halpha.EMISSION ? active : 1 - active;
    }

    /** Age up to which a type is active (Myr); 0 where it is not known. */
    private double lifetime(double type) {
        Lifetime nearest = null;
        for (Lifetime one : lifetimes) {
            if (Math.abs(one.type() - type) <= 0.75
                    && (nearest == null
                            || Math.abs(one.type() - type) < Math.abs(nearest.type() - type))) {
                nearest = one;
            }
        }
        return nearest == null ? 0 : nearest.myr();
    }
}
