package emberline.place;

import emberline.catalogue.Relation;
import emberline.measure.Measurement;
import java.util.Optional;

/**
 * What one published relation says of one object.
 *
 * @param relation the relation
 * @param index the measurement of its index
 * @param type the type it gives with the index noise and the printed rms in its sigma; empty where
 *     the index was not measured or lies outside the valid range
 * @param use whether it entered the combined type, and if not, why
 * @param reason words for the use, with figures; empty where it entered
 */
public record RelationEstimate(
        Relation relation, Measurement index, Optional<TypeEstimate> type, Use use, String reason) {

    /** What became of an estimate. */
    public enum Use {
        /** It entered the combined type. */
        COMBINED,
        /** It is valid, but not among those that are combined; shown for comparison. */
        SHOWN,
        /** It is among those that are combined, but lies far from where the others agree. */
        DISAGREES,
        /** It lies outside its valid range. */
        OUTSIDE_RANGE,
        /** Its index was not measured. */
        NOT_MEASURED
    }
}
