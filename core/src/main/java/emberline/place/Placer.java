package emberline.place;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.List;

/** Places an object on the sequence of spectral types and judges its gravity class and activity. */
public final class Placer {

    private final PublishedWitness published;
    private final GravityScorer gravity;
    private final ActivityJudge activity;

    /**
     * A placer.
     *
     * @param catalogue the relations and thresholds to use; the one with which was measured
     */
    public Placer(FeatureCatalogue catalogue) {
        this.published = new PublishedWitness(catalogue);
        this.gravity = new GravityScorer(catalogue);
        this.activity = new ActivityJudge(catalogue);
    }

    /**
     * Places an object.
     *
     * @param measurements its features
     * @param seed start of the random draws for the gravity probabilities; the same seed gives the
     *     same placement
     * @return type, gravity and activity, or the reasons why there are none
     */
    public Placement place(Measurements measurements, long seed) {
        PublishedType type = published.witness(measurements);
        GravityVerdict verdict =
                type.type()
                        .map(estimate -> gravity.judge(measurements, estimate, seed))
                        .orElseGet(
                                () ->
                                        GravityVerdict.notJudged(
                                                "no type, and the limits depend on the type",
                                                List.of()));
        Activity halpha =
                type.type()
                        .map(estimate -> activity.judge(measurements, estimate))
                        .orElseGet(() -> Activity.none("no type, and chi depends on the type"));
        return new Placement(
                type.type(),
                type.type().isPresent() ? "" : type.scheme(),
                type,
                verdict,
                halpha,
                findings(measurements, type, verdict, activity.findings(halpha)));
    }

    private static List<Finding> findings(
            Measurements measurements,
            PublishedType type,
            GravityVerdict verdict,
            List<Finding> ofActivity) {
        List<Finding> findings = new ArrayList<>();
        if (type.type().isPresent()) {
            findings.addAll(type.findings());
            findings.add(
                    Finding.caution(
                            "kind-not-judged",
                            "the type holds only if the object is a late dwarf: giants, reddened"
                                    + " stars and galaxies are not told apart by these relations"));
        }
        List<GravityScore> scored =
                verdict.scores().stream().filter(score -> score.score().isPresent()).toList();
        if (verdict.gravityClass().isPresent() && scored.size() == 1) {
            findings.add(
                    Finding.caution(
                            "gravity-by-one-feature",
                            "the gravity class rests on "
                                    + scored.get(0).feature().symbol()
                                    + " alone, which dust and metallicity move too"));
        }
        if (verdict.gravityClass().isPresent() && !isMostProbable(verdict)) {
            findings.add(
                    Finding.caution(
                            "gravity-class-unsure",
                            "the published scores give "
                                    + verdict.gravityClass().get().label()
                                    + ", but with noise and type uncertainty another class is more"
                                    + " probable"));
        }
        if (type.type().isPresent() && BandCheck.showsNone(measurements)) {
            findings.add(
                    Finding.warning(
                            "no-bands",
                            "no water, methane, iron hydride or potassium band is seen: the"
                                    + " relations give a type to any smooth spectrum, and it means"
                                    + " nothing here"));
        }
        findings.addAll(ofActivity);
        return findings;
    }

    private static boolean isMostProbable(GravityVerdict verdict) {
        double field = verdict.pFieldGravity().orElse(0);
        double intermediate = verdict.pIntermediateGravity().orElse(0);
        double veryLow = verdict.pVeryLowGravity().orElse(0);
        double ofClass =
                switch (verdict.gravityClass().orElseThrow()) {
                    case FLD_G -> field;
                    case INT_G -> intermediate;
                    case VL_G -> veryLow;
                };
        return ofClass >= Math.max(field, Math.max(intermediate, veryLow));
    }
}
