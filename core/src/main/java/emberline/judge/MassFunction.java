package emberline.judge;

/**
 * The mass function: dN/dM ~ M^-a with one break (Kirkpatrick et al. 2024; slopes and break in
 * {@code settings.csv}), continuous at the break, not normalised.
 */
final class MassFunction {

    private final double below;
    private final double above;
    private final double breakMsun;

    MassFunction(JudgeNumbers numbers) {
        this.below = numbers.of("mass-slope-low");
        this.above = numbers.of("mass-slope");
        this.breakMsun = numbers.of("mass-slope-break");
    }

    /** Number of objects from a mass to another (solar), up to a constant. */
    double between(double low, double high) {
        return upTo(high) - upTo(low);
    }

    private double upTo(double mass) {
        double lower = Math.min(mass, breakMsun);
        double sum = breakMsun / (1 - below) * Math.pow(lower / breakMsun, 1 - below);
        if (mass > breakMsun) {
            sum += breakMsun / (1 - above) * (Math.pow(mass / breakMsun, 1 - above) - 1);
        }
        return sum;
    }
}
