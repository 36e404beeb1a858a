package emberline.place;

import emberline.catalogue.Feature;
import java.util.List;
import java.util.Optional;

/**
 * The activity of an object by its H alpha emission: log10 of L(H alpha) / L(bol) = log10(chi
 * |EW|), where chi depends on the spectral type.
 *
 * @param line the definition of the equivalent width; empty where H alpha was not measured
 * @param levels the activity by each published set of chi that covers the type; empty where there
 *     is none
 * @param reason why there is no level; empty where there is one
 */
public record Activity(Optional<Feature> line, List<ActivityLevel> levels, String reason) {

    /** Copies the list. */
    public Activity {
        levels = List.copyOf(levels);
    }

    static Activity none(String reason) {
        return new Activity(Optional.empty(), List.of(), reason);
    }
}
