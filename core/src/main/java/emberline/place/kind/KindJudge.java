package emberline.place.kind;

import emberline.measure.Measurements;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/** Judges the kind of an object and finds its nearest kin. */
public final class KindJudge {

    /**
     * Where a spectrum covers one band only, this share of the windows of that band must have been
     * measured: the model fills what is missing with a middling value, and that looks like a dwarf.
     */
    private static final double LEAST_SHARE_ALONE = 0.85;

    private static final int KIN = 5;
    private static final String NOBODY = "\0";

    private static final double STANDARD_ODDS = standardOdds();

    private final KindPrior prior;

    /**
     * A judge.
     *
     * @param prior how probable each kind is before the spectrum is seen
     */
    public KindJudge(KindPrior prior) {
        this.prior = prior;
    }

    private static double standardOdds() {
        double share = KindPrior.standard().shares().get(ObjectKind.UNLIKE_KNOWN);
        return share / (1 - share);
    }

    /**
     * The kind of an object.
     *
     * @param measurements its features
     * @return probabilities of all kinds, or why there are none
     */
    public KindVerdict judge(Measurements measurements) {
        return KindModel.standard()
                .map(model -> judge(model, model.features().of(measurements), NOBODY))
                .orElseGet(
                        () ->
                                KindVerdict.notJudged(
                                        "the model of kinds is missing or was made for other"
                                                + " features; make it again with `calibrate`"));
    }

    KindVerdict judge(KindModel model, FeatureVector vector, String withoutGroup) {
        List<Coverage> coverages = model.coverages(vector);
        if (coverages.isEmpty()) {
            return KindVerdict.notJudged(
                    "no wavelength region is covered well enough above the noise: 0.79 to 0.98"
                            + " micron, J, H or K");
        }
        int widest = coverages.get(0).regions();
        if (Integer.bitCount(widest) == 1
                && Regions.share(vector, model.features(), widest) < LEAST_SHARE_ALONE) {
            return KindVerdict.notJudged(
                    "of one band alone ("
                            + Regions.letters(widest)
                            + ") only a part is covered, which does not tell kinds apart");
        }
        OptionalDouble unlike = model.unlike(vector, withoutGroup);
        if (unlike.isEmpty()) {
            return KindVerdict.notJudged("no reference object has enough features in common");
        }
        return verdict(model.known(coverages, vector), unlike.getAsDouble(), coverages.get(0));
    }

    private KindVerdict verdict(double[] known, double unlike, Coverage coverage) {
        double prior = this.prior.shares().get(ObjectKind.UNLIKE_KNOWN);
        double odds = unlike / Math.max(1e-12, 1 - unlike) * (prior / (1 - prior)) / STANDARD_ODDS;
        double pUnlike = odds / (1 + odds);
        double[] weights = new double[Forest.KINDS];
        double sum = 0;
        for (int k = 0; k < Forest.KINDS; k++) {
            weights[k] = known[k] * this.prior.shares().get(ObjectKind.at(k));
            sum += weights[k];
        }
        Map<ObjectKind, Double> probabilities = new EnumMap<>(ObjectKind.class);
        for (int k = 0; k < Forest.KINDS; k++) {
            probabilities.put(ObjectKind.at(k), (1 - pUnlike) * weights[k] / sum);
        }
        probabilities.put(ObjectKind.UNLIKE_KNOWN, pUnlike);
        return new KindVerdict(probabilities, coverage.code(), "");
    }

    /**
     * The reference objects nearest to an object.
     *
     * @param measurements its features
     * @return up to five, the nearest first; empty where none has enough features in common
     */
    public List<Kin> kin(Measurements measurements) {
        return KindModel.standard().map(model -> kin(model, measurements)).orElse(List.of());
    }

    private static List<Kin> kin(KindModel model, Measurements measurements) {
        return model.kin().neighbours(model.features().of(measurements), KIN, NOBODY).stream()
                .map(
                        near ->
                                new Kin(
                                        near.kin().object(),
                                        near.kin().typeNumber(),
                                        near.kin().gravity(),
                                        near.kin().kind(),
                                        near.kin().source(),
                                        near.distance(),
                                        near.inCommon()))
                .toList();
    }
}
