package emberline.place.pair;

import emberline.catalogue.PairPlane;
import java.util.Optional;

/**
 * One spectral-blend criterion applied to an object.
 *
 * @param plane the criterion
 * @param met whether the object lies on the side of pairs; empty where it cannot be told
 * @param reason why it cannot be told; empty where it can
 */
public record PairCriterion(PairPlane plane, Optional<Boolean> met, String reason) {}
