package emberline.place;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.GravityThreshold;
import emberline.catalogue.GravityThreshold.LowGravityIf;
import emberline.measure.Measurement;
import emberline.measure.Measurements;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.NavigableMap;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.TreeMap;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * Gravity classes by the low-resolution scores of Allers and Liu (2013): each feature scores 0, 1
 * or 2 against two limits that depend on the type (linear between whole subclasses), and the median
 * of the scores gives the class: up to 0.5 FLD-G, from 1.5 VL-G, between them INT-G.
 *
 * <p>The published scheme takes the type as known. Beside it the probability of each class is
 * given, with the noise of the features and the uncertainty of the type carried through by draws.
 * The scheme is printed for M6 to L5; H-cont alone goes on to L7.
 */
final class GravityScorer {

    private static final int DRAWS = 2000;

    /** A type this close to the printed range is scored at its end (subclass). */
    private static final double EDGE = 0.5;

    private final List<Feature> features = new ArrayList<>();

    /** The printed limits by type number, by the id of the feature. */
    private final Map<String, NavigableMap<Double, GravityThreshold>> thresholds = new HashMap<>();

    GravityScorer(FeatureCatalogue catalogue) {
        for (GravityThreshold threshold : catalogue.gravityThresholds()) {
            Feature feature = catalogue.feature(threshold.feature()).orElseThrow();
            if (!thresholds.containsKey(feature.id())) {
                features.add(feature);
                thresholds.put(feature.id(), new TreeMap<>());
            }
            thresholds.get(feature.id()).put(threshold.typeNumber(), threshold);
        }
    }

    /** The limits of one feature at one type. */
    private record Limits(double intermediate, double veryLow, boolean lowIfBelow) {

        int score(double index) {
            if (lowIfBelow) {
                return index <= veryLow ? 2 : index <= intermediate ? 1 : 0;
            }
            return index >= veryLow ? 2 : index >= intermediate ? 1 : 0;
        }
    }

    /**
     * Scores an object.
     *
     * @param measurements its features
     * @param type its type
     * @param seed start of the draws
     * @param withProbabilities whether to draw probabilities; without them the class has none
     * @return the verdict of the scores
     */
    GravityVerdict judge(
            Measurements measurements, TypeEstimate type, long seed, boolean withProbabilities) {
        List<GravityScore> scores = new ArrayList<>();
        for (Feature feature : features) {
            scores.add(score(feature, measurements, type.typeNumber()));
        }
        List<GravityScore> scored = scores.stream().filter(s -> s.score().isPresent()).toList();
        long possible = scores.stream().filter(s -> s.intermediateThreshold().isPresent()).count();
        if (possible == 0) {
            return GravityVerdict.notJudged(
                    "type "
                            + type.code()
                            + " lies outside M6 to L7, for which the scores are printed",
                    scores);
        }
        if (scored.isEmpty() || (scored.size() == 1 && possible > 1)) {
            return GravityVerdict.notJudged(
                    String.format(
                            Locale.ROOT,
                            "only %d of %d scored features could be measured; two are needed",
                            scored.size(),
                            possible),
                    scores);
        }
        GravityClass byMedian =
                classOf(scored.stream().mapToInt(s -> s.score().getAsInt()).toArray());
        Map<GravityClass, Double> shares =
                withProbabilities ? probabilities(measurements, scored, type, seed) : Map.of();
        return new GravityVerdict(
                Optional.of(byMedian),
                share(shares, GravityClass.FLD_G),
                share(shares, GravityClass.INT_G),
                share(shares, GravityClass.VL_G),
                "",
                scores,
                Optional.of(byMedian));
    }

    private static OptionalDouble share(Map<GravityClass, Double> shares, GravityClass gravity) {
        return shares.containsKey(gravity)
                ? OptionalDouble.of(shares.get(gravity))
                : OptionalDouble.empty();
    }

    private GravityScore score(Feature feature, Measurements measurements, double typeNumber) {
        Optional<Limits> limits = limits(feature, typeNumber);
        boolean lowIfBelow =
                thresholds.get(feature.id()).firstEntry().getValue().lowGravityIf()
                        == LowGravityIf.BELOW;
        Measurement index = measurements.of(feature.id()).orElseThrow().result();
        OptionalInt score =
                limits.isEmpty()
                        ? OptionalInt.empty()
                        : index.fold(
                                value -> OptionalInt.of(limits.get().score(value.value())),
                                why -> OptionalInt.empty());
        String reason =
                score.isPresent()
                        ? ""
                        : limits.isEmpty()
                                ? "not scored at this type"
                                : index.fold(
                                        value -> "",
                                        why -> why.why().words() + ": " + why.detail());
        return new GravityScore(
                feature,
                index,
                score,
                limits.map(l -> OptionalDouble.of(l.intermediate())).orElse(OptionalDouble.empty()),
                limits.map(l -> OptionalDouble.of(l.veryLow())).orElse(OptionalDouble.empty()),
                lowIfBelow,
                reason);
    }

    private Optional<Limits> limits(Feature feature, double typeNumber) {
        NavigableMap<Double, GravityThreshold> table = thresholds.get(feature.id());
        double inside = Math.min(Math.max(typeNumber, table.firstKey()), table.lastKey());
        if (Math.abs(inside - typeNumber) > EDGE) {
            return Optional.empty();
        }
        GravityThreshold below = table.floorEntry(inside).getValue();
        GravityThreshold above = table.ceilingEntry(inside).getValue();
        double step = above.typeNumber() - below.typeNumber();
        double share = step == 0 ? 0 : (inside - below.typeNumber()) / step;
        return Optional.of(
                new Limits(
                        below.intermediate()
                                + share * (above.intermediate() - below.intermediate()),
                        below.veryLow() + share * (above.veryLow() - below.veryLow()),
                        below.lowGravityIf() == LowGravityIf.BELOW));
    }

    private static GravityClass classOf(int[] scores) {
        Arrays.sort(scores);
        int n = scores.length;
        double median = (scores[(n - 1) / 2] + scores[n / 2]) / 2.0;
        if (median <= 0.5) {
            return GravityClass.FLD_G;
        }
        return median >= 1.5 ? GravityClass.VL_G : GravityClass.INT_G;
    }

    /** Shares of the classes over draws of features and type. */
    private Map<GravityClass, Double> probabilities(
            Measurements measurements, List<GravityScore> scored, TypeEstimate type, long seed) {
        List<String> ids = scored.stream().map(s -> s.feature().id()).toList();
        double[][] features = measurements.draws(ids, DRAWS, seed);
        UniformRandomProvider random = RandomSource.XO_RO_SHI_RO_128_PP.create(~seed);
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        Map<GravityClass, Integer> counts = new EnumMap<>(GravityClass.class);
        int judged = 0;
        for (int draw = 0; draw < DRAWS; draw++) {
            double drawnType = type.typeNumber() + type.sigmaSubclass() * normal.sample();
            int[] scores = new int[ids.size()];
            int count = 0;
            for (int f = 0; f < ids.size(); f++) {
                Optional<Limits> limits = limits(scored.get(f).feature(), drawnType);
                // a feature without a value in a draw is not measured in it
                if (limits.isPresent() && !Double.isNaN(features[f][draw])) {
                    scores[count++] = limits.get().score(features[f][draw]);
                }
            }
            if (count > 0) {
                counts.merge(classOf(Arrays.copyOf(scores, count)), 1, Integer::sum);
                judged++;
            }
        }
        Map<GravityClass, Double> shares = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            shares.put(gravity, counts.getOrDefault(gravity, 0) / (double) Math.max(1, judged));
        }
        return shares;
    }
}
