package emberline.place;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.place.calibrated.CalibratedType;
import emberline.place.calibrated.CalibratedWitness;
import emberline.place.calibrated.Calibration;
import emberline.place.calibrated.SeveralSpectra;
import emberline.place.calibrated.TypePrior;
import emberline.place.calibrated.TypePriors;
import emberline.place.kind.KindJudge;
import emberline.place.kind.KindPrior;
import emberline.place.kind.KindVerdict;
import emberline.place.metallicity.MetallicityJudge;
import emberline.place.metallicity.MetallicityVerdict;
import emberline.place.pair.PairJudge;
import emberline.place.pair.PairVerdict;
import emberline.place.reddening.ReddeningFit;
import emberline.place.reddening.ReddeningFitter;
import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.DoubleFunction;

/**
 * Judges the kind of an object, places it on the sequence of spectral types, and judges its gravity
 * class, metallicity class, activity and whether it may be a pair.
 */
public final class Placer {

    /** Two witnesses disagree where their types stand this many of their joint sigma apart. */
    private static final double DISAGREEMENT = 2;

    /** A gravity class less probable than this is unsure. */
    private static final double SURE = 0.7;

    private final PublishedWitness published;
    private final CalibratedWitness calibrated;
    private final SeveralSpectra several;
    private final GravityJudge gravity;
    private final MetallicityJudge metallicity;
    private final ActivityJudge activity;
    private final KindJudge kinds = new KindJudge(KindPrior.standard());
    private final PairJudge pairs;

    /**
     * A placer with the product's calibration, every type equally probable beforehand.
     *
     * @param catalogue the relations and thresholds to use; the one with which was measured
     */
    public Placer(FeatureCatalogue catalogue) {
        this(catalogue, Calibration.standard(), TypePriors.FLAT.load());
    }

    /**
     * A placer.
     *
     * @param catalogue the relations and thresholds to use; the one with which was measured
     * @param calibration the loci of features
     * @param prior what is thought of type and gravity before
     */
    public Placer(FeatureCatalogue catalogue, Calibration calibration, TypePrior prior) {
        this.published = new PublishedWitness(catalogue);
        this.calibrated = new CalibratedWitness(calibration, prior);
        this.several = new SeveralSpectra(calibration, calibrated);
        this.gravity = new GravityJudge(catalogue);
        this.metallicity = new MetallicityJudge(catalogue);
        this.activity = new ActivityJudge(catalogue);
        this.pairs = new PairJudge(catalogue);
    }

    /**
     * Places an object.
     *
     * @param measurements its features
     * @param seed start of the random draws for the probabilities; the same seed gives the same
     *     placement
     * @return kind, type, gravity and the rest, or the reasons why there are none
     */
    public Placement place(Measurements measurements, long seed) {
        return place(measurements, Optional.empty(), seed);
    }

    /**
     * Joins the spectra of one object, so that it can be placed once.
     *
     * @param spectra the features of each spectrum, at least one
     * @return the features of all, the type by each alone, and where they contradict one another
     */
    public SeveralSpectra.Joined join(List<Measurements> spectra) {
        return several.join(spectra);
    }

    /**
     * Fits type and extinction together.
     *
     * @param measuredAt the features once an extinction in V (mag) is taken out
     * @param leastGain how much more probable extinction must make the measurements (natural
     *     logarithm) for the fit to be of use
     * @return the fit; empty where too little was measured, or the gain is out of reach
     */
    public Optional<ReddeningFit> fitReddening(
            DoubleFunction<Measurements> measuredAt, double leastGain) {
        return new ReddeningFitter(calibrated).fit(measuredAt, leastGain);
    }

    /**
     * Places an object whose extinction was fitted.
     *
     * @param measurements its features, with the most probable extinction taken out
     * @param reddening the fit, whose posterior goes before that of the features; empty where none
     *     was made
     * @param seed start of the random draws for the gravity probabilities
     * @return kind, type, gravity and the rest, or the reasons why there are none
     */
    public Placement place(Measurements measurements, Optional<ReddeningFit> reddening, long seed) {
        PublishedType byRelations = published.witness(measurements);
        CalibratedType alone = calibrated.witness(measurements);
        CalibratedType byLoci = reddening.map(fit -> alone.with(fit.posterior())).orElse(alone);
        Optional<TypeEstimate> asDwarf =
                byLoci.posterior().map(TypePosterior::estimate).or(byRelations::type);
        KindVerdict kind = kinds.judge(measurements);
        Optional<String> otherKind = KindGate.refusal(kind);
        Optional<TypeEstimate> type = otherKind.isPresent() ? Optional.empty() : asDwarf;
        GravityVerdict verdict =
                type.map(estimate -> gravity.judge(measurements, estimate, byLoci, seed))
                        .orElseGet(
                                () ->
                                        GravityVerdict.notJudged(
                                                "no type, and the limits depend on the type",
                                                List.of()));
        MetallicityVerdict metals =
                metallicity.judge(measurements, type.map(TypeEstimate::type), seed);
        Activity halpha =
                type.map(estimate -> activity.judge(measurements, estimate))
                        .orElseGet(() -> Activity.none("no type, and chi depends on the type"));
        PairVerdict pair =
                type.map(estimate -> pairs.judge(measurements, estimate, seed))
                        .orElseGet(() -> PairVerdict.notJudged("no type"));
        List<Finding> findings = new ArrayList<>(KindGate.findings(kind, asDwarf.isPresent()));
        findings.addAll(ofType(measurements, asDwarf, byRelations, byLoci));
        findings.addAll(pair.findings());
        findings.addAll(ofGravity(verdict, byLoci));
        findings.addAll(MetallicityJudge.findings(metals));
        findings.addAll(activity.findings(halpha));
        return new Placement(
                type,
                type.isPresent()
                        ? ""
                        : otherKind.orElse(byRelations.scheme() + "; " + byLoci.reason()),
                byRelations,
                byLoci,
                reddening,
                verdict,
                metals,
                halpha,
                kind,
                kinds.kin(measurements),
                pair,
                Optional.empty(),
                findings);
    }

    /** Findings on the type of an object. */
    static List<Finding> ofType(
            Measurements measurements,
            Optional<TypeEstimate> type,
            PublishedType byRelations,
            CalibratedType byLoci) {
        List<Finding> findings = new ArrayList<>();
        if (type.isEmpty()) {
            return findings;
        }
        findings.addAll(byRelations.findings());
        if (byLoci.posterior().isEmpty()) {
            findings.add(Finding.note("published-relations-only", byLoci.reason()));
        } else if (byRelations.type().isPresent()) {
            TypeEstimate one = byRelations.type().get();
            TypeEstimate two = type.get();
            double apart =
                    Math.abs(one.typeNumber() - two.typeNumber())
                            / Math.hypot(one.sigmaSubclass(), two.sigmaSubclass());
            if (apart > DISAGREEMENT) {
                findings.add(
                        Finding.caution(
                                "witnesses-disagree",
                                String.format(
                                        Locale.ROOT,
                                        "the published relations give %s, spectra of known type %s:"
                                                + " %.1f of their joint sigma apart",
                                        one.code(),
                                        two.code(),
                                        apart)));
            }
        }
        if (BandCheck.showsNone(measurements)) {
            findings.add(
                    Finding.warning(
                            "no-bands",
                            "no water, methane, iron hydride or potassium band is seen: any smooth"
                                    + " spectrum gets a type, and it means nothing here"));
        }
        return findings;
    }

    /** Findings on the gravity class of an object. */
    static List<Finding> ofGravity(GravityVerdict verdict, CalibratedType byLoci) {
        List<Finding> findings = new ArrayList<>();
        if (verdict.gravityClass().isEmpty()) {
            return findings;
        }
        List<GravityScore> scored =
                verdict.scores().stream().filter(score -> score.score().isPresent()).toList();
        if (scored.size() == 1 && byLoci.posterior().isEmpty()) {
            findings.add(
                    Finding.caution(
                            "gravity-by-one-feature",
                            "the gravity class rests on "
                                    + scored.get(0).feature().symbol()
                                    + " alone, which dust and metallicity move too"));
        }
        double probability = verdict.pOfClass().orElse(0);
        if (probability < SURE) {
            findings.add(
                    Finding.caution(
                            "gravity-class-unsure",
                            String.format(
                                    Locale.ROOT,
                                    "%s is given with a probability of %.2f only",
                                    verdict.gravityClass().get().label(),
                                    probability)));
        }
        if (verdict.byScores().isPresent() && !verdict.byScores().equals(verdict.gravityClass())) {
            findings.add(
                    Finding.note(
                            "gravity-scores-differ",
                            "the published scores give "
                                    + verdict.byScores().get().label()
                                    + ", the posterior "
                                    + verdict.gravityClass().get().label()));
        }
        return findings;
    }
}
