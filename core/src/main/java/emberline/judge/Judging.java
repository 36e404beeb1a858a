package emberline.judge;

import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * How objects are judged.
 *
 * @param substellarFrom least probability for the decision substellar, above 0.5
 * @param stellarTo greatest probability of substellar for the decision stellar, below 0.5
 * @param age what is stated about the age of every object for which the list says nothing
 * @param aims what the observer looks for, with weights
 */
public record Judging(
        double substellarFrom,
        double stellarTo,
        Optional<AgeStatement> age,
        Map<Aim, Double> aims) {

    /** Checks the thresholds and copies the aims. */
    public Judging {
        if (!(substellarFrom > 0.5 && substellarFrom <= 1 && stellarTo >= 0 && stellarTo < 0.5)) {
            throw new IllegalArgumentException(
                    "thresholds "
                            + substellarFrom
                            + " and "
                            + stellarTo
                            + ": expected one above and one below 0.5, such as 0.95,0.05");
        }
        if (aims.isEmpty()) {
            throw new IllegalArgumentException("aims: expected at least one");
        }
        aims = Map.copyOf(aims);
    }

    /**
     * Thresholds 0.95 and 0.05, no age stated, the aim substellar.
     *
     * @return the defaults
     */
    public static Judging withDefaults() {
        return new Judging(0.95, 0.05, Optional.empty(), Map.of(Aim.SUBSTELLAR, 1.0));
    }

    /**
     * The same with an age.
     *
     * @param stated the age
     * @return new settings
     */
    public Judging withAge(AgeStatement stated) {
        return new Judging(substellarFrom, stellarTo, Optional.of(stated), aims);
    }

    /**
     * The same with other aims.
     *
     * @param weights positive weights by aim
     * @return new settings
     */
    public Judging withAims(Map<Aim, Double> weights) {
        return new Judging(substellarFrom, stellarTo, age, weights);
    }

    /**
     * The same with other thresholds, given as {@code 0.95,0.05}.
     *
     * @param text least probability for substellar, greatest for stellar
     * @return new settings
     * @throws IllegalArgumentException if it is not two such numbers
     */
    public Judging withThresholds(String text) {
        String[] parts = text.split(",", -1);
        try {
            if (parts.length == 2) {
                return new Judging(
                        Double.parseDouble(parts[0].trim()),
                        Double.parseDouble(parts[1].trim()),
                        age,
                        aims);
            }
        } catch (NumberFormatException e) {
            throw new IllegalArgumentException(
                    "thresholds '" + text + "': expected two numbers such as 0.95,0.05", e);
        }
        throw new IllegalArgumentException(
                "thresholds '" + text + "': expected two numbers such as 0.95,0.05");
    }

    /**
     * The aims in words, in their usual order.
     *
     * @return as {@link Aim#parse} reads them
     */
    public String aimWords() {
        return new EnumMap<>(aims)
                .entrySet().stream()
                        .map(
                                e ->
                                        e.getValue() == 1
                                                ? e.getKey().word()
                                                : e.getKey().word() + "=" + e.getValue())
                        .collect(Collectors.joining(","));
    }
}
