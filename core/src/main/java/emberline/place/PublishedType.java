package emberline.place;

import emberline.spectrum.Finding;
import java.util.List;
import java.util.Optional;

/**
 * The first witness: what the published relations say, one by one and combined.
 *
 * @param type the combined type; empty where no relation applies
 * @param scheme the combination that was used, in words; where there is no type, the reason
 * @param estimates every relation of the catalogue with what it says, in the order of the catalogue
 * @param findings what the observer should know about the combination
 */
public record PublishedType(
        Optional<TypeEstimate> type,
        String scheme,
        List<RelationEstimate> estimates,
        List<Finding> findings) {

    /** Copies the list. */
    public PublishedType {
        estimates = List.copyOf(estimates);
        findings = List.copyOf(findings);
    }
}
