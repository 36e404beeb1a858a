package emberline.place.kind;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToIntFunction;

/**
 * The verdict on a spectrum by a model that did not learn from its object.
 *
 * @param group name of the object; {@code nonsense} for spectra that show none
 * @param truth what it is
 * @param how {@code as observed}, or what was done to it; {@code in part} where not all was shown
 * @param regions the wavelength regions that were shown, of R, Z, J, H, K
 * @param verdict the verdict
 */
public record KindTrial(
        String group, ObjectKind truth, String how, String regions, KindVerdict verdict) {

    /** Trials of all rows and of nonsense, whole and in parts. */
    static List<KindTrial> of(
            List<KindModel> leftOut,
            ToIntFunction<TrainingRow> fold,
            List<TrainingRow> rows,
            List<FeatureVector> nonsense,
            KindFeatures features) {
        List<KindTrial> trials = new ArrayList<>();
        for (TrainingRow row : rows) {
            trials.addAll(of(leftOut.get(fold.applyAsInt(row)), row, features));
        }
        for (FeatureVector vector : nonsense) {
            TrainingRow row =
                    new TrainingRow("nonsense", ObjectKind.UNLIKE_KNOWN, "nonsense", vector);
            trials.addAll(of(leftOut.get(0), row, features));
        }
        return trials;
    }

    /** The spectrum whole, then the parts that others might have observed. */
    private static List<KindTrial> of(KindModel model, TrainingRow row, KindFeatures features) {
        KindJudge judge = new KindJudge(KindPrior.standard());
        int covered = Regions.covered(row.vector(), features);
        List<KindTrial> trials = new ArrayList<>();
        if (covered != 0) {
            trials.add(
                    new KindTrial(
                            row.group(),
                            row.kind(),
                            row.how(),
                            Regions.letters(covered),
                            judge.judge(model, row.vector(), row.group())));
        }
        for (int regions : RemotenessLimits.PARTS) {
            if ((regions & ~covered) == 0 && regions != covered) {
                FeatureVector part = row.vector().within(regions, features);
                trials.add(
                        new KindTrial(
                                row.group(),
                                row.kind(),
                                row.how() + ", in part",
                                Regions.letters(regions),
                                judge.judge(model, part, row.group())));
            }
        }
        return trials;
    }
}
