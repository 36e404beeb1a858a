package emberline.survey;

import emberline.prepare.Preparing;
import emberline.spectrum.Candidate;
import emberline.spectrum.Medium;
import java.util.Optional;

/** What a row of a list states about its spectra. */
final class Statements {

    private Statements() {}

    /** The cells of a row go before the defaults. */
    static Preparing of(Candidate candidate, Preparing defaults) {
        Preparing stated = defaults;
        Optional<Medium> medium = candidate.text("medium").flatMap(Medium::named);
        if (medium.isPresent()) {
            stated = stated.withMedium(medium.get());
        }
        if (candidate.number("resolution").isPresent()) {
            stated = stated.withResolvingPower(candidate.number("resolution").getAsDouble());
        }
        if (candidate.number("rv_kms").isPresent()) {
            stated = stated.withRadialVelocityKms(candidate.number("rv_kms").getAsDouble());
        }
        return stated;
    }
}
