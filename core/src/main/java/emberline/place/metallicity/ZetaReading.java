package emberline.place.metallicity;

import emberline.catalogue.Feature;
import emberline.catalogue.MetallicityClass;
import emberline.measure.Measurement;
import java.util.Collections;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;

/**
 * What one recalibration of zeta says.
 *
 * @param feature zeta by one paper
 * @param zeta its value with the error from the pixel noise, or why there is none
 * @param metallicityClass the class in whose limits the value lies; empty where there is no value
 *     or the paper has no limits
 * @param probabilities probability of each class under the pixel noise, 0 to 1; empty where the
 *     reading is not used
 * @param reason why it is not used for the class; blank where it is
 */
public record ZetaReading(
        Feature feature,
        Measurement zeta,
        Optional<MetallicityClass.Name> metallicityClass,
        Map<MetallicityClass.Name, Double> probabilities,
        String reason) {

    /** Copies the map. */
    public ZetaReading {
        Map<MetallicityClass.Name, Double> copy = new EnumMap<>(MetallicityClass.Name.class);
        copy.putAll(probabilities);
        probabilities = Collections.unmodifiableMap(copy);
    }

    /**
     * Whether the reading enters the class.
     *
     * @return true if it does
     */
    public boolean isUsed() {
        return reason.isBlank();
    }
}
