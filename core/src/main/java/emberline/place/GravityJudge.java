package emberline.place;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.place.calibrated.CalibratedType;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The gravity class from two sides: the posterior of the calibrated witness and the published
 * scores. The posterior goes first where what was measured can tell field from very low gravity at
 * the type found; elsewhere the scores stand alone.
 */
final class GravityJudge {

    /**
     * Least distance between field and very low gravity, in sigma of scatter and noise, at which
     * the posterior says more than its prior.
     */
    private static final double LEAST_SEPARATION = 2;

    private final GravityScorer scorer;

    GravityJudge(FeatureCatalogue catalogue) {
        this.scorer = new GravityScorer(catalogue);
    }

    /**
     * Judges the gravity.
     *
     * @param measurements features of the object
     * @param type its adopted type
     * @param calibrated what the calibrated witness says
     * @param seed start of the draws
     * @return class and probabilities, or why there are none
     */
    GravityVerdict judge(
            Measurements measurements, TypeEstimate type, CalibratedType calibrated, long seed) {
        boolean inRange = GravityRange.contains(type.typeNumber());
        boolean telling = calibrated.gravitySeparationSigma() >= LEAST_SEPARATION;
        Optional<TypePosterior> posterior = calibrated.posterior();
        if (posterior.isPresent() && inRange && telling) {
            GravityVerdict scores = scorer.judge(measurements, type, seed, false);
            return of(posterior.get(), scores);
        }
        if (!inRange) {
            return GravityVerdict.notJudged(
                    "type "
                            + type.code()
                            + " lies outside "
                            + GravityRange.words()
                            + ", for which gravity is calibrated",
                    List.of());
        }
        GravityVerdict byScores = scorer.judge(measurements, type, seed, true);
        if (byScores.gravityClass().isEmpty() && posterior.isPresent()) {
            return GravityVerdict.notJudged(
                    byScores.reason()
                            + String.format(
                                    Locale.ROOT,
                                    "; all measured features together tell field from very low"
                                            + " gravity by %.1f sigma only",
                                    calibrated.gravitySeparationSigma()),
                    byScores.scores());
        }
        return byScores;
    }

    private static GravityVerdict of(TypePosterior posterior, GravityVerdict scores) {
        GravityClass best = GravityClass.FLD_G;
        for (GravityClass gravity : GravityClass.values()) {
            if (posterior.probability(gravity) > posterior.probability(best)) {
                best = gravity;
            }
        }
        return new GravityVerdict(
                Optional.of(best),
                OptionalDouble.of(posterior.probability(GravityClass.FLD_G)),
                OptionalDouble.of(posterior.probability(GravityClass.INT_G)),
                OptionalDouble.of(posterior.probability(GravityClass.VL_G)),
                "",
                scores.scores(),
                scores.byScores());
    }
}
