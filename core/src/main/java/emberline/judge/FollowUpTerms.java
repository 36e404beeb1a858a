package emberline.judge;

import java.util.EnumMap;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * What a further observation takes.
 *
 * @param label the observation in words
 * @param resolvingPower least resolving power; empty where it is no spectrum
 * @param snr least signal-to-noise; empty where it depends on the object or does not apply
 * @param accuracy share of right outcomes, or the relative error; 0 where not used
 * @param cost what it costs, in words
 */
record FollowUpTerms(
        String label,
        OptionalDouble resolvingPower,
        OptionalDouble snr,
        double accuracy,
        String cost) {

    /** The terms of every observation, from {@code follow-up.csv}. */
    static Map<FollowUp, FollowUpTerms> all() {
        Map<FollowUp, FollowUpTerms> all = new EnumMap<>(FollowUp.class);
        JudgeTable.rows(
                "follow-up.csv",
                row ->
                        all.put(
                                FollowUp.valueOf(row.getField("id")),
                                new FollowUpTerms(
                                        row.getField("label"),
                                        optional(row.getField("min_resolving_power")),
                                        optional(row.getField("min_snr")),
                                        JudgeTable.number(row, "accuracy", 0),
                                        row.getField("cost"))));
        return all;
    }

    private static OptionalDouble optional(String cell) {
        return cell.isBlank()
                ? OptionalDouble.empty()
                : OptionalDouble.of(Double.parseDouble(cell));
    }
}
