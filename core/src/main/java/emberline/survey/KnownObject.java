package emberline.survey;

import emberline.judge.Judging;
import emberline.place.GravityClass;
import emberline.place.GravityVerdict;
import emberline.place.Placement;
import emberline.place.TypeEstimate;
import emberline.place.calibrated.TypePriors;
import emberline.spectrum.Candidate;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Judges objects whose type is known from elsewhere, without a spectrum. */
public final class KnownObject {

    private static final String NO_SPECTRUM = "no spectrum: type and gravity class are as stated";

    private final JudgingStep judging;

    /**
     * A step for objects of known type.
     *
     * @param judging thresholds, age and aims
     */
    public KnownObject(Judging judging) {
        this.judging = new JudgingStep(judging, TypePriors.FLAT.load());
    }

    /**
     * Judges an object.
     *
     * @param candidate name and whatever the columns of a list can hold
     * @param type its type
     * @param gravity its gravity class, taken as sure; empty where it is not known
     * @return a result without spectra
     */
    public ObjectResult judged(
            Candidate candidate, TypeEstimate type, Optional<GravityClass> gravity) {
        GravityVerdict verdict =
                gravity.map(KnownObject::sure)
                        .orElseGet(() -> GravityVerdict.notJudged("not stated", List.of()));
        Placement placement = Placement.known(type, verdict, NO_SPECTRUM);
        return judging.judged(
                new ObjectResult(
                        candidate,
                        Status.PARTIAL,
                        NO_SPECTRUM,
                        List.of(),
                        Optional.empty(),
                        Optional.of(placement),
                        List.of()));
    }

    private static GravityVerdict sure(GravityClass gravity) {
        return new GravityVerdict(
                Optional.of(gravity),
                share(gravity, GravityClass.FLD_G),
                share(gravity, GravityClass.INT_G),
                share(gravity, GravityClass.VL_G),
                "",
                List.of(),
                Optional.empty());
    }

    private static OptionalDouble share(GravityClass stated, GravityClass one) {
        return OptionalDouble.of(stated == one ? 1 : 0);
    }
}
