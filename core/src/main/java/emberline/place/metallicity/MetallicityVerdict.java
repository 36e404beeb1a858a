package emberline.place.metallicity;

import emberline.catalogue.MetallicityClass;
import java.util.Collections;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The metallicity class of an object, if it is a dwarf.
 *
 * @param adopted the class; empty where it is not judged
 * @param reason why it is not judged; blank where it is
 * @param probabilities probability of each class, the mean over the recalibrations that are used;
 *     it carries the pixel noise and the difference of the recalibrations, no more; empty where the
 *     class is not judged
 * @param readings what each recalibration says, used or not
 * @param hint what the near-infrared hints at, worded as a hint; blank where it is not covered
 * @param validRange for which objects the class holds, in words
 */
public record MetallicityVerdict(
        Optional<MetallicityClass.Name> adopted,
        String reason,
        Map<MetallicityClass.Name, Double> probabilities,
        List<ZetaReading> readings,
        String hint,
        String validRange) {

    /** Copies the collections. */
    public MetallicityVerdict {
        Map<MetallicityClass.Name, Double> copy = new EnumMap<>(MetallicityClass.Name.class);
        copy.putAll(probabilities);
        probabilities = Collections.unmodifiableMap(copy);
        readings = List.copyOf(readings);
    }

    /**
     * The probability that the object is a subdwarf of any class.
     *
     * @return 0 to 1; empty where the class is not judged
     */
    public OptionalDouble pSubdwarf() {
        return probabilities.isEmpty()
                ? OptionalDouble.empty()
                : OptionalDouble.of(
                        1 - probabilities.getOrDefault(MetallicityClass.Name.DWARF, 0.0));
    }
}
