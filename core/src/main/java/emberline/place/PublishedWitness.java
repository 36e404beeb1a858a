package emberline.place;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Quantity;
import emberline.catalogue.Relation;
import emberline.measure.Measurement;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.place.ConsensusTable.Member;
import emberline.place.RelationEstimate.Use;
import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * The first witness: every published type relation, applied as printed inside its valid range, with
 * its printed rms, and one type from those that agree.
 *
 * <p>Each relation that is used gives a type and a sigma (printed rms and index noise in
 * quadrature). Relations are double-valued outside their range, so agreement decides: on a grid of
 * types the log likelihoods are added, where a relation counts as a normal distribution with a
 * chance of {@value #OUTLIER_SHARE} of being an outlier inside its own range, as uninformative
 * outside it, and as mild evidence against its range where its index lies outside. The combined
 * type is the mean, weighted by inverse variance, of the relations that stand near the best type.
 * This combination is the product's own; the relations are not changed.
 */
final class PublishedWitness {

    /** Chance that a relation is an outlier though the object lies in its range. */
    private static final double OUTLIER_SHARE = 0.15;

    /** Density of an outlier (per subclass). */
    private static final double OUTLIER_DENSITY = 0.02;

    /** Density where the type lies outside the range of a relation (per subclass). */
    private static final double UNINFORMATIVE_DENSITY = 0.08;

    /** The same as a share of the peak of a relation with a large sigma. */
    private static final double UNINFORMATIVE_SHARE = 0.3;

    /** Factor against types well inside the range of a relation whose index is outside it. */
    private static final double OUT_OF_RANGE_FACTOR = 0.2;

    /** How far beyond its range a relation still speaks (subclass). */
    private static final double MARGIN = 1;

    /** A result may lie this far outside the range by noise (subclass). */
    private static final double EDGE = 0.5;

    private static final String NO_AGREEMENT = "no two relations agree on a type";

    /** Always combined when this close to the best type (subclass). */
    private static final double NEAR = 2;

    /** Never combined when this far from the best type (subclass). */
    private static final double FAR = 2.5;

    /** Sigma of a relation whose paper prints no rms (subclass). */
    private static final double RMS_UNKNOWN = 1;

    /** Least sigma of the combined type: types are quoted to half a subclass. */
    private static final double LEAST_SIGMA = 0.5;

    private static final double FIRST_TYPE = -1;
    private static final double LAST_TYPE = 31;
    private static final double STEP = 0.1;

    private final FeatureCatalogue catalogue;
    private final ConsensusTable consensus;

    PublishedWitness(FeatureCatalogue catalogue) {
        this.catalogue = catalogue;
        this.consensus = ConsensusTable.of(catalogue);
    }

    PublishedType witness(Measurements measurements) {
        List<RelationEstimate> estimates = new ArrayList<>();
        for (Relation relation : catalogue.relations(Quantity.SPECTRAL_TYPE)) {
            estimates.add(estimate(relation, measurements));
        }
        estimates.replaceAll(estimate -> onBranch(estimate, estimates));
        if (estimates.stream().noneMatch(e -> e.use() == Use.COMBINED)) {
            return new PublishedType(
                    Optional.empty(), reasonForNone(estimates), estimates, List.of());
        }
        double best = bestType(estimates);
        estimates.replaceAll(estimate -> near(estimate, best));
        List<RelationEstimate> combined =
                estimates.stream().filter(e -> e.use() == Use.COMBINED).toList();
        if (combined.isEmpty()) {
            estimates.replaceAll(PublishedWitness::withoutPlace);
            return new PublishedType(Optional.empty(), NO_AGREEMENT, estimates, List.of());
        }
        TypeEstimate type = combine(combined);
        return new PublishedType(
                Optional.of(type), scheme(combined), estimates, findings(combined, estimates));
    }

    private RelationEstimate estimate(Relation relation, Measurements measurements) {
        Measurement index =
                measurements
                        .of(relation.feature())
                        .orElseThrow(
                                () ->
                                        new IllegalArgumentException(
                                                "measurements without "
                                                        + relation.feature()
                                                        + ": expected those of the same catalogue"))
                        .result();
        return index.fold(
                measured -> apply(relation, measured),
                why ->
                        new RelationEstimate(
                                relation,
                                index,
                                Optional.empty(),
                                Use.NOT_MEASURED,
                                why.why().words() + ": " + why.detail()));
    }

    private RelationEstimate apply(Relation relation, Measured index) {
        double x = index.value();
        if (!relation.covers(x)) {
            return new RelationEstimate(
                    relation,
                    index,
                    Optional.empty(),
                    Use.OUTSIDE_RANGE,
                    String.format(
                            Locale.ROOT,
                            "index %.3f outside %.3f to %.3f",
                            x,
                            relation.validIndexMin().orElse(Double.NEGATIVE_INFINITY),
                            relation.validIndexMax().orElse(Double.POSITIVE_INFINITY)));
        }
        double rms = relation.rms().orElse(RMS_UNKNOWN);
        double sigma = Math.hypot(rms, relation.slope(x) * index.oneSigma());
        TypeEstimate type = TypeEstimate.normal(relation.value(x), sigma);
        Optional<Member> member = consensus.member(relation);
        if (member.isEmpty()) {
            return new RelationEstimate(
                    relation, index, Optional.of(type), Use.SHOWN, "shown for comparison");
        }
        boolean inside =
                type.typeNumber() >= member.get().fromType() - EDGE
                        && type.typeNumber() <= member.get().toType() + EDGE;
        return new RelationEstimate(
                relation,
                index,
                Optional.of(type),
                inside ? Use.COMBINED : Use.SHOWN,
                inside ? "" : "outside the part of its range that is combined");
    }

    /** Sets a relation aside whose index is double-valued, where another shows the late branch. */
    private RelationEstimate onBranch(RelationEstimate estimate, List<RelationEstimate> all) {
        Optional<Member> member = consensus.member(estimate.relation());
        if (estimate.use() != Use.COMBINED || member.isEmpty()) {
            return estimate;
        }
        for (RelationEstimate judge : all) {
            boolean late =
                    member.get().branchBy().contains(judge.relation().id())
                            && judge.type().isPresent()
                            && judge.type().get().typeNumber() >= member.get().branchFrom();
            if (late) {
                return setAside(
                        estimate,
                        Use.SHOWN,
                        "the index turns back there: "
                                + judge.relation().id()
                                + " gives "
                                + judge.type().get().type().code());
            }
        }
        return estimate;
    }

    private double bestType(List<RelationEstimate> estimates) {
        double[] sum = new double[(int) Math.round((LAST_TYPE - FIRST_TYPE) / STEP) + 1];
        for (RelationEstimate estimate : estimates) {
            Optional<Member> member = consensus.member(estimate.relation());
            for (int k = 0; member.isPresent() && k < sum.length; k++) {
                sum[k] += logLikelihood(estimate, member.get(), FIRST_TYPE + k * STEP);
            }
        }
        int best = 0;
        for (int k = 1; k < sum.length; k++) {
            best = sum[k] > sum[best] ? k : best;
        }
        return FIRST_TYPE + best * STEP;
    }

    private static double logLikelihood(RelationEstimate estimate, Member member, double type) {
        double from = member.fromType();
        double to = member.toType();
        if (estimate.use() == Use.OUTSIDE_RANGE) {
            boolean wellInside = type >= from + MARGIN && type <= to - MARGIN;
            return wellInside ? Math.log(OUT_OF_RANGE_FACTOR) : 0;
        }
        if (estimate.use() != Use.COMBINED) {
            return 0;
        }
        TypeEstimate given = estimate.type().orElseThrow();
        double peak = 1 / (given.sigmaSubclass() * Math.sqrt(2 * Math.PI));
        if (type < from - MARGIN || type > to + MARGIN) {
            // a noisy relation must not be worth more where it says nothing
            return Math.log(Math.min(UNINFORMATIVE_DENSITY, UNINFORMATIVE_SHARE * peak));
        }
        double x = (type - given.typeNumber()) / given.sigmaSubclass();
        double normal = peak * Math.exp(-0.5 * x * x);
        return Math.log((1 - OUTLIER_SHARE) * normal + OUTLIER_DENSITY);
    }

    private static RelationEstimate near(RelationEstimate estimate, double best) {
        if (estimate.use() != Use.COMBINED) {
            return estimate;
        }
        TypeEstimate given = estimate.type().orElseThrow();
        double reach = Math.max(NEAR, Math.min(3 * given.sigmaSubclass(), FAR));
        double off = given.typeNumber() - best;
        return Math.abs(off) < reach
                ? estimate
                : setAside(
                        estimate,
                        Use.DISAGREES,
                        String.format(
                                Locale.ROOT, "%.1f subclasses from where the others agree", off));
    }

    /** Where no two relations agree there is nothing that one of them could be far from. */
    private static RelationEstimate withoutPlace(RelationEstimate estimate) {
        return estimate.use() == Use.DISAGREES
                ? setAside(estimate, Use.DISAGREES, NO_AGREEMENT)
                : estimate;
    }

    private static RelationEstimate setAside(RelationEstimate estimate, Use use, String reason) {
        return new RelationEstimate(
                estimate.relation(), estimate.index(), estimate.type(), use, reason);
    }

    /**
     * The weighted mean. Its sigma is that of the weights, widened where the relations scatter more
     * than their sigmas say, with {@value #LEAST_SIGMA} added in quadrature, since relations on the
     * same bands share their errors.
     */
    private static TypeEstimate combine(List<RelationEstimate> combined) {
        double weights = 0;
        double sum = 0;
        for (RelationEstimate estimate : combined) {
            TypeEstimate given = estimate.type().orElseThrow();
            double weight = 1 / (given.sigmaSubclass() * given.sigmaSubclass());
            weights += weight;
            sum += weight * given.typeNumber();
        }
        double mean = sum / weights;
        double chiSquare = 0;
        for (RelationEstimate estimate : combined) {
            TypeEstimate given = estimate.type().orElseThrow();
            double x = (given.typeNumber() - mean) / given.sigmaSubclass();
            chiSquare += x * x;
        }
        double widening = combined.size() > 1 ? Math.max(1, chiSquare / (combined.size() - 1)) : 1;
        return TypeEstimate.normal(mean, Math.hypot(LEAST_SIGMA, Math.sqrt(widening / weights)));
    }

    private static String scheme(List<RelationEstimate> combined) {
        List<String> papers =
                combined.stream().map(e -> e.relation().source().cite()).distinct().toList();
        return combined.size()
                + (combined.size() == 1 ? " relation of " : " relations of ")
                + String.join("; ", papers)
                + ", weighted by inverse variance";
    }

    private static String reasonForNone(List<RelationEstimate> estimates) {
        long measured = estimates.stream().filter(e -> e.use() != Use.NOT_MEASURED).count();
        return measured == 0
                ? "no index of a published type relation could be measured"
                : "none of the "
                        + measured
                        + " measured indices lies in the valid range of its type relation: perhaps"
                        + " not a dwarf of M to T, or too noisy";
    }

    private static List<Finding> findings(
            List<RelationEstimate> combined, List<RelationEstimate> all) {
        List<Finding> findings = new ArrayList<>();
        if (combined.size() == 1) {
            findings.add(
                    Finding.caution(
                            "one-relation",
                            "the type rests on one relation, "
                                    + combined.get(0).relation().id()
                                    + "; nothing confirms its branch"));
        }
        long aside = all.stream().filter(e -> e.use() == Use.DISAGREES).count();
        if (aside >= combined.size()) {
            findings.add(
                    Finding.warning(
                            "relations-disagree",
                            aside
                                    + " relations disagree with the "
                                    + combined.size()
                                    + " that were combined: a blend, a peculiar object or not a"
                                    + " dwarf at all"));
        }
        return findings;
    }
}
