package emberline.judge;

/**
 * The masses at which burning begins, as {@code settings.csv} has them with their sources.
 *
 * @param hydrogenLowMsun lowest published limit of hydrogen burning (solar)
 * @param hydrogenMsun the limit by which the probability of a substellar mass is stated (solar)
 * @param hydrogenHighMsun highest published limit (solar)
 * @param deuteriumMsun limit of deuterium burning (solar)
 */
public record MassLimits(
        double hydrogenLowMsun,
        double hydrogenMsun,
        double hydrogenHighMsun,
        double deuteriumMsun) {

    /**
     * The limits that judging uses.
     *
     * @return the limits
     */
    public static MassLimits standard() {
        JudgeNumbers numbers = JudgeNumbers.standard();
        return new MassLimits(
                numbers.of("hydrogen-limit-low"),
                numbers.of("hydrogen-limit"),
                numbers.of("hydrogen-limit-high"),
                numbers.of("deuterium-limit"));
    }
}
