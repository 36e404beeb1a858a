package emberline.place.kind;

import java.util.Collections;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The kind of an object as probabilities.
 *
 * @param probabilities one for each kind, adding up to 1, for the prior of {@link KindPrior}; empty
 *     where the kind is not judged
 * @param coverage the wavelength regions that it rests on, of {@code R} (0.61 to 0.79 micron),
 *     {@code Z} (0.79 to 0.98), {@code J}, {@code H}, {@code K}; {@code +}: lines are used beside
 *     the shape of the spectrum
 * @param reason why the kind is not judged; empty where it is
 */
public record KindVerdict(Map<ObjectKind, Double> probabilities, String coverage, String reason) {

    /** Copies the map. */
    public KindVerdict {
        probabilities =
                probabilities.isEmpty()
                        ? Map.of()
                        : Collections.unmodifiableMap(new EnumMap<>(probabilities));
    }

    /**
     * A verdict that could not be reached.
     *
     * @param reason why
     * @return a verdict without probabilities
     */
    public static KindVerdict notJudged(String reason) {
        return new KindVerdict(Map.of(), "", reason);
    }

    /**
     * The most probable kind.
     *
     * @return the kind, or empty where it is not judged
     */
    public Optional<ObjectKind> kind() {
        return probabilities.entrySet().stream()
                .max(Map.Entry.comparingByValue())
                .map(Map.Entry::getKey);
    }

    /**
     * The probability of a kind.
     *
     * @param kind a kind
     * @return 0 to 1, or empty where the kind is not judged
     */
    public OptionalDouble probability(ObjectKind kind) {
        Double p = probabilities.get(kind);
        return p == null ? OptionalDouble.empty() : OptionalDouble.of(p);
    }
}
