package emberline.survey;

import emberline.measure.Measurements;
import emberline.place.Placement;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import java.util.List;
import java.util.Optional;

/**
 * Everything that is known of one object at the end of the chain.
 *
 * @param candidate the row of the list
 * @param status how far the object came
 * @param reason why it did not come further; empty where it is measured
 * @param spectra its spectra, those that could be read, in the order of the list
 * @param best the measurements that were placed: those of the one spectrum, or of each feature the
 *     one with the smallest error; empty where nothing was read
 * @param placement type and gravity; empty where nothing was read
 * @param findings all findings, those of the spectra first
 */
public record ObjectResult(
        Candidate candidate,
        Status status,
        String reason,
        List<SpectrumResult> spectra,
        Optional<Measurements> best,
        Optional<Placement> placement,
        List<Finding> findings) {

    /** Copies the lists. */
    public ObjectResult {
        spectra = List.copyOf(spectra);
        findings = List.copyOf(findings);
    }
}
