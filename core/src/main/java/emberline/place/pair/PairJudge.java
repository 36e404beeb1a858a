package emberline.place.pair;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.PairPlane;
import emberline.catalogue.PairPlane.Side;
import emberline.catalogue.PairPlane.Vertex;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.place.TypeEstimate;
import emberline.place.pair.PairVerdict.Strength;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.NavigableSet;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeSet;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * Applies the spectral-blend criteria of Burgasser et al. (2010): six planes of indices and type;
 * three met make a candidate, two a weak one.
 */
public final class PairJudge {

    private static final String SOURCE = "burgasser2010";
    private static final int DRAWS = 1000;

    private final PairScheme scheme;
    private final List<PairPlane> planes;

    /**
     * A judge.
     *
     * @param catalogue the criteria
     */
    public PairJudge(FeatureCatalogue catalogue) {
        this.scheme =
                PairScheme.standard().stream()
                        .filter(s -> s.source().equals(SOURCE))
                        .findFirst()
                        .orElseThrow();
        this.planes =
                catalogue.pairPlanes().stream()
                        .filter(plane -> plane.source().key().equals(SOURCE))
                        .toList();
    }

    /**
     * Judges an object.
     *
     * @param measurements its features
     * @param type its type
     * @param seed start of the random draws; the same seed gives the same verdict
     * @return the verdict, or why there is none
     */
    public PairVerdict judge(Measurements measurements, TypeEstimate type, long seed) {
        if (type.typeNumber() < scheme.leastTypeNumber()
                || type.typeNumber() > scheme.greatestTypeNumber()) {
            return PairVerdict.notJudged(
                    "type " + type.code() + " lies outside L7 to T4, for which the criteria hold");
        }
        List<PairCriterion> criteria = new ArrayList<>();
        for (PairPlane plane : planes) {
            criteria.add(criterion(plane, measurements, type.typeNumber()));
        }
        List<PairPlane> judged =
                criteria.stream().filter(c -> c.met().isPresent()).map(c -> c.plane()).toList();
        if (judged.size() < scheme.candidateFrom()) {
            return PairVerdict.notJudged(
                    String.format(
                            Locale.ROOT,
                            "only %d of %d criteria could be judged; %d are needed",
                            judged.size(),
                            planes.size(),
                            scheme.candidateFrom()));
        }
        int met = (int) criteria.stream().filter(c -> c.met().orElse(false)).count();
        return new PairVerdict(
                Optional.of(strength(met)),
                met,
                judged.size(),
                OptionalDouble.of(shareOfCandidates(judged, measurements, type, seed)),
                "",
                criteria);
    }

    private Strength strength(int met) {
        return met >= scheme.candidateFrom()
                ? Strength.CANDIDATE
                : met >= scheme.weakFrom() ? Strength.WEAK : Strength.NONE;
    }

    private static PairCriterion criterion(
            PairPlane plane, Measurements measurements, double typeNumber) {
        Optional<Double> y = measurements.measured(plane.yFeature()).map(Measured::value);
        Optional<Double> x =
                plane.xFeature().isEmpty()
                        ? Optional.of(typeNumber)
                        : measurements.measured(plane.xFeature().get()).map(Measured::value);
        if (x.isEmpty() || y.isEmpty()) {
            String missing = y.isEmpty() ? plane.yFeature() : plane.xFeature().orElse("");
            return new PairCriterion(plane, Optional.empty(), missing + " was not measured");
        }
        return new PairCriterion(plane, Optional.of(isMet(plane, x.get(), y.get())), "");
    }

    /** Outside the range of its limit line a criterion is not met. */
    private static boolean isMet(PairPlane plane, double x, double y) {
        List<Vertex> limit = plane.limit();
        for (int k = 1; k < limit.size(); k++) {
            Vertex a = limit.get(k - 1);
            Vertex b = limit.get(k);
            if (x >= a.x() && x <= b.x()) {
                double line = a.y() + (x - a.x()) / (b.x() - a.x()) * (b.y() - a.y());
                return plane.pairSide() == Side.ABOVE ? y > line : y < line;
            }
        }
        return false;
    }

    private double shareOfCandidates(
            List<PairPlane> judged, Measurements measurements, TypeEstimate type, long seed) {
        NavigableSet<String> needed = new TreeSet<>();
        for (PairPlane plane : judged) {
            needed.add(plane.yFeature());
            plane.xFeature().ifPresent(needed::add);
        }
        List<String> ids = List.copyOf(needed);
        double[][] draws = measurements.draws(ids, DRAWS, seed);
        UniformRandomProvider random = RandomSource.XO_RO_SHI_RO_128_PP.create(~seed);
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        int candidates = 0;
        for (int draw = 0; draw < DRAWS; draw++) {
            double drawnType = type.typeNumber() + type.sigmaSubclass() * normal.sample();
            int met = 0;
            for (PairPlane plane : judged) {
                double y = draws[ids.indexOf(plane.yFeature())][draw];
                double x =
                        plane.xFeature().isEmpty()
                                ? drawnType
                                : draws[ids.indexOf(plane.xFeature().get())][draw];
                met += isMet(plane, x, y) ? 1 : 0; // a draw without a value meets nothing
            }
            candidates += met >= scheme.candidateFrom() ? 1 : 0;
        }
        return candidates / (double) DRAWS;
    }
}
