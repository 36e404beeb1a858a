package emberline.place.photometric;

import emberline.place.GravityClass;
import emberline.place.LowerFactor;
import emberline.place.calibrated.TypePrior;
import emberline.place.kind.KindPrior;
import emberline.place.kind.KindVerdict;
import emberline.place.kind.ObjectKind;
import java.util.EnumMap;
import java.util.Map;

/**
 * Judges by J - H and H - Ks of 2MASS whether an object is a late dwarf, a giant, an earlier star
 * or either of these behind dust. Of quasars, galaxies, carbon stars and white dwarfs there are no
 * colours, so these kinds get no probability.
 */
final class ColourKinds {

    private static final double NEGLIGIBLE = 1e-300;

    private final ColourTemplates templates;
    private final TypePrior prior;
    private final KindPrior kinds;
    private final ColourSettings settings;

    ColourKinds(ColourTemplates templates, TypePrior prior, KindPrior kinds) {
        this.templates = templates;
        this.prior = prior;
        this.kinds = kinds;
        this.settings = ColourSettings.standard();
    }

    /**
     * The kind by the colours of J, H and Ks, and by W1 - W2 where it is listed; not judged where
     * one of the three is missing or in MKO.
     */
    KindVerdict judge(ColourVector colours) {
        if (colours.size() < 2) {
            return KindVerdict.notJudged(
                    "colours of giants and earlier stars are at hand for J, H and Ks of 2MASS only");
        }
        Map<ObjectKind, Double> weight = new EnumMap<>(ObjectKind.class);
        weight.put(
                ObjectKind.LATE_DWARF,
                kinds.shares().get(ObjectKind.LATE_DWARF) * dwarfEvidence(colours));
        addOthers(colours, weight);
        double sum = weight.values().stream().mapToDouble(Double::doubleValue).sum();
        if (!(sum > NEGLIGIBLE)) {
            return KindVerdict.notJudged(
                    String.join(", ", colours.labels()) + " are like those of no star at hand");
        }
        weight.replaceAll((kind, value) -> value / sum);
        return new KindVerdict(
                weight, colours.size() > 2 ? "JHK W1 W2 colours" : "JHK colours", "");
    }

    private double dwarfEvidence(ColourVector colours) {
        ColourFit fit = new ColourFit(templates, colours);
        double sum = 0;
        double total = 0;
        for (int point = 0; point < ColourTemplates.SIZE; point++) {
            int g = 0;
            for (GravityClass gravity : GravityClass.values()) {
                double density = prior.density(ColourTemplates.typeNumber(point), gravity);
                total += density;
                sum += density * Math.exp(fit.logLikelihood(point, g++, 0));
            }
        }
        return sum / total;
    }

    /** Giants and earlier stars, each without dust and, as another kind, behind it. */
    private void addOthers(ColourVector colours, Map<ObjectKind, Double> weight) {
        int size = colours.size();
        double[][] matrix = new double[size][size];
        for (int c = 0; c < size; c++) {
            double scatter = settings.of(c < 2 ? "scatter-other" : "w1-w2-other-scatter");
            for (int d = 0; d < size; d++) {
                matrix[c][d] = colours.noise(c, d) + (c == d ? scatter * scatter : 0);
            }
        }
        LowerFactor factor = LowerFactor.of(matrix);
        double scale = Math.exp(-0.5 * factor.logDeterminant());
        Map<ObjectKind, Integer> count = new EnumMap<>(ObjectKind.class);
        Map<ObjectKind, Double> clear = new EnumMap<>(ObjectKind.class);
        double reddened = 0;
        double step = settings.of("a-v-step");
        int steps = (int) Math.round(settings.of("a-v-greatest") / step);
        for (ColourTemplates.Other other : templates.others()) {
            count.merge(other.kind(), 1, Integer::sum);
            clear.merge(other.kind(), scale * likelihood(colours, factor, other, 0), Double::sum);
            for (int i = 1; i <= steps; i++) {
                reddened += scale * likelihood(colours, factor, other, i * step) / steps;
            }
        }
        clear.forEach(
                (kind, sum) -> weight.put(kind, kinds.shares().get(kind) * sum / count.get(kind)));
        weight.put(
                ObjectKind.REDDENED_BACKGROUND,
                kinds.shares().get(ObjectKind.REDDENED_BACKGROUND)
                        * reddened
                        / templates.others().size());
    }

    private double likelihood(
            ColourVector colours, LowerFactor factor, ColourTemplates.Other other, double avMag) {
        double[] expected = {other.jMinusH(), other.hMinusK(), settings.of("w1-w2-other")};
        double[] rest = new double[colours.size()];
        for (int c = 0; c < rest.length; c++) {
            rest[c] = colours.value(c) - expected[c] - avMag * colours.reddening(c);
        }
        return Math.exp(-0.5 * factor.chiSquare(rest));
    }
}
