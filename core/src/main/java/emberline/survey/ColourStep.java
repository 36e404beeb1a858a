package emberline.survey;

import emberline.place.Placement;
import emberline.place.calibrated.TypePrior;
import emberline.place.photometric.PhotometricType;
import emberline.place.photometric.PhotometricWitness;
import emberline.place.reddening.ReddeningFit;
import emberline.read.CandidatePhotometry;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What the listed magnitudes say of an object, with a spectrum and without. */
final class ColourStep {

    private final PhotometricWitness colours;

    ColourStep(TypePrior prior) {
        this.colours = new PhotometricWitness(prior);
    }

    /** An object without a spectrum, not yet judged; failed where its colours say nothing. */
    ObjectResult byColours(Candidate candidate) {
        PhotometricType type = colours.witness(CandidatePhotometry.of(candidate));
        if (type.posterior().isEmpty()) {
            return Chain.failed(candidate, "no spectrum is listed, and " + type.reason());
        }
        List<Finding> findings = new ArrayList<>();
        findings.add(
                Finding.note(
                        "photometric-type",
                        "there is no spectrum; type and kind rest on the colours "
                                + String.join(", ", type.colours())
                                + " alone, and the intervals are those of colours"));
        findings.addAll(type.findings());
        return new ObjectResult(
                candidate,
                Status.PHOTOMETRIC,
                type.reason().isEmpty()
                        ? "no spectrum: type from colours"
                        : "no spectrum, and no type from colours: " + type.reason(),
                List.of(),
                Optional.empty(),
                Optional.of(Placement.byColours(type)),
                findings);
    }

    /** The placement with what the colours say, where two magnitudes are listed at least. */
    Placement withColours(Candidate candidate, Placement placement) {
        PhotometricType byColours = colours.witness(CandidatePhotometry.of(candidate));
        return byColours.posterior().isPresent() ? placement.with(byColours) : placement;
    }

    /** The finding that the colours are not those of the type, where they are not. */
    List<Finding> unlikeColours(Candidate candidate, Placement placement) {
        if (placement.type().isEmpty() || placement.photometric().isEmpty()) {
            return List.of();
        }
        return colours.disagreement(
                        CandidatePhotometry.of(candidate),
                        placement.type().get(),
                        placement.reddening().map(ReddeningFit::avMag).orElse(0.0))
                .map(List::of)
                .orElse(List.of());
    }
}
