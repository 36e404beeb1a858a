package emberline.place;

import emberline.place.calibrated.CalibratedType;
import emberline.place.metallicity.MetallicityVerdict;
import emberline.place.reddening.ReddeningFit;
import emberline.spectrum.Finding;
import java.util.List;
import java.util.Optional;

/**
 * Where an object stands: its type, gravity, metallicity and activity with what they rest on.
 *
 * @param type the adopted type; empty where none could be given
 * @param typeReason why there is no type; empty where there is one
 * @param published the first witness: the published relations
 * @param calibrated the second witness: the loci of spectra of known type
 * @param reddening type and extinction fitted together, where that was asked for
 * @param gravity the gravity class
 * @param metallicity the metallicity class
 * @param activity the activity by H alpha
 * @param findings what the observer should know about the placement
 */
public record Placement(
        Optional<TypeEstimate> type,
        String typeReason,
        PublishedType published,
        CalibratedType calibrated,
        Optional<ReddeningFit> reddening,
        GravityVerdict gravity,
        MetallicityVerdict metallicity,
        Activity activity,
        List<Finding> findings) {

    /** Copies the list. */
    public Placement {
        findings = List.copyOf(findings);
    }
}
