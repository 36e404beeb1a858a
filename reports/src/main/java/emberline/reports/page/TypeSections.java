package emberline.reports.page;

import emberline.catalogue.Band;
import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Purpose;
import emberline.measure.FeatureMeasurement;
import emberline.measure.Measurement;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurement.NotMeasured;
import emberline.place.GravityScore;
import emberline.place.GravityVerdict;
import emberline.place.Placement;
import emberline.place.RelationEstimate;
import emberline.place.RelationEstimate.Use;
import emberline.place.TypeEstimate;
import emberline.place.reddening.ReddeningFit;
import emberline.reports.attach.Digits;
import emberline.survey.ObjectResult;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.Collectors;

/** How features became a type and a gravity class: relations, scores, and what was not measured. */
final class TypeSections {

    private final FeatureCatalogue catalogue;
    private final SourceList sources;
    private final Fullness fullness;

    TypeSections(FeatureCatalogue catalogue, SourceList sources, Fullness fullness) {
        this.catalogue = catalogue;
        this.sources = sources;
        this.fullness = fullness;
    }

    /**
     * The published relations: those combined, those set aside and why, those that do not apply.
     */
    void relations(Passage passage, Placement placement) {
        passage.heading("Type relations");
        List<RelationEstimate> estimates = placement.published().estimates();
        if (placement.published().type().isPresent()) {
            TypeEstimate type = placement.published().type().get();
            passage.whole(
                    "Combined: "
                            + FindingSentence.withError(type)
                            + "; "
                            + placement.published().scheme()
                            + ": "
                            + typed(of(estimates, Use.COMBINED))
                            + ".");
        } else {
            passage.item("Combined: none; " + placement.published().scheme() + ".");
        }
        placement.reddening().ifPresent(fit -> passage.item(reddening(fit)));
        reasons(passage, "In disagreement, not combined", of(estimates, Use.DISAGREES));
        List<RelationEstimate> shown = of(estimates, Use.SHOWN);
        List<RelationEstimate> outside = of(estimates, Use.OUTSIDE_RANGE);
        if (fullness.names()) {
            reasons(passage, "Shown, not combined", shown);
            outside(passage, outside);
            notMeasured(passage, of(estimates, Use.NOT_MEASURED));
        } else {
            passage.item(
                    "Told in the JSON: "
                            + shown.size()
                            + " not combined, "
                            + outside.size()
                            + " outside the valid range.");
        }
    }

    private void outside(Passage passage, List<RelationEstimate> outside) {
        if (!outside.isEmpty()) {
            passage.item(
                    "Index outside the valid range ("
                            + outside.size()
                            + "): "
                            + outside.stream()
                                    .map(e -> fullness.ranges() ? named(e) + outside(e) : symbol(e))
                                    .distinct()
                                    .collect(Collectors.joining(fullness.ranges() ? "; " : ", "))
                            + ".");
        }
    }

    private void notMeasured(Passage passage, List<RelationEstimate> missing) {
        if (!missing.isEmpty()) {
            passage.item(
                    "Index not measured: "
                            + missing.stream()
                                    .map(this::symbol)
                                    .distinct()
                                    .collect(Collectors.joining(", "))
                            + ".");
        }
    }

    private static List<RelationEstimate> of(List<RelationEstimate> estimates, Use use) {
        return estimates.stream().filter(e -> e.use() == use).toList();
    }

    private String typed(List<RelationEstimate> estimates) {
        return estimates.stream()
                .map(e -> named(e) + " " + e.type().map(FindingSentence::withError).orElse(""))
                .collect(Collectors.joining("; "));
    }

    /** The estimates that were not combined, those with the same reason together. */
    private void reasons(Passage passage, String title, List<RelationEstimate> estimates) {
        Map<String, List<RelationEstimate>> byReason = new LinkedHashMap<>();
        for (RelationEstimate estimate : estimates) {
            byReason.computeIfAbsent(estimate.reason(), r -> new ArrayList<>()).add(estimate);
        }
        byReason.forEach(
                (reason, group) -> {
                    boolean plain = reason.isBlank() || reason.startsWith("shown");
                    passage.item(
                            title
                                    + (plain ? "" : " (" + PrintedText.signs(reason) + ")")
                                    + ": "
                                    + typed(group)
                                    + ".");
                });
    }

    private static String reddening(ReddeningFit fit) {
        return String.format(
                Locale.ROOT,
                "Extinction fitted with the type: A(V) %.1f mag (68%%: %.1f to %.1f; 95%%: %.1f to"
                        + " %.1f); natural log of the likelihood gained over none: %.1f.",
                fit.avMag(),
                fit.lo68Mag(),
                fit.hi68Mag(),
                fit.lo95Mag(),
                fit.hi95Mag(),
                fit.logGain());
    }

    /** The index and the range in which its relation holds. */
    private static String outside(RelationEstimate estimate) {
        String index = estimate.index().fold(v -> Digits.fixed(v.value(), 3), n -> "");
        OptionalDouble low = estimate.relation().validIndexMin();
        OptionalDouble high = estimate.relation().validIndexMax();
        String from = low.isPresent() ? Digits.fixed(low.getAsDouble(), 3) : "";
        String to = high.isPresent() ? "to " + Digits.fixed(high.getAsDouble(), 3) : "and above";
        String range = from + " " + to;
        return (" " + index + " (" + range.strip() + ")").replace('-', '\u2212');
    }

    private String named(RelationEstimate estimate) {
        return symbol(estimate) + sources.mark(estimate.relation().source());
    }

    private String symbol(RelationEstimate estimate) {
        return catalogue
                .feature(estimate.relation().feature())
                .map(Feature::symbol)
                .orElse(estimate.relation().feature());
    }

    /** The gravity class, its probabilities and the scores with their limits. */
    void gravity(Passage passage, GravityVerdict verdict) {
        if (verdict.gravityClass().isEmpty() && verdict.scores().isEmpty()) {
            return;
        }
        passage.heading("Gravity");
        if (verdict.gravityClass().isPresent()) {
            passage.whole(
                    "Class "
                            + verdict.gravityClass().get().label()
                            + ": P(FLD-G) "
                            + share(verdict.pFieldGravity())
                            + ", P(INT-G) "
                            + share(verdict.pIntermediateGravity())
                            + ", P(VL-G) "
                            + share(verdict.pVeryLowGravity())
                            + verdict.byScores()
                                    .map(g -> "; by the scores as published " + g.label())
                                    .orElse("; no class by the published scores")
                            + ".");
        } else {
            passage.whole("Not judged: " + verdict.reason() + ".");
        }
        for (GravityScore score : verdict.scores()) {
            if (score.index() instanceof Measured value) {
                passage.whole(score(score, value));
            }
        }
    }

    private static String score(GravityScore score, Measured value) {
        String side = score.lowGravityIfBelow() ? " ≤ " : " ≥ ";
        StringBuilder text =
                new StringBuilder(score.feature().symbol())
                        .append(' ')
                        .append(Digits.feature(score.feature(), value.value()))
                        .append(
                                score.score().isPresent()
                                        ? ": score " + score.score().getAsInt()
                                        : ": " + score.reason());
        if (score.score().isPresent()) {
            List<String> limits = new ArrayList<>();
            score.intermediateThreshold()
                    .ifPresent(t -> limits.add("INT-G" + side + Digits.fixed(t, 3)));
            score.veryLowThreshold().ifPresent(t -> limits.add("VL-G" + side + Digits.fixed(t, 3)));
            text.append(limits.isEmpty() ? "" : " (" + String.join(", ", limits) + ")");
        }
        return text.append('.').toString();
    }

    private static String share(OptionalDouble share) {
        return share.isPresent() ? Digits.fixed(share.getAsDouble(), 2) : "\u2013";
    }

    /** The features that were not measured, by reason. */
    void notMeasured(Passage passage, ObjectResult result) {
        List<FeatureMeasurement> all =
                result.best().orElseThrow().all().stream()
                        .filter(m -> m.feature().purpose() != Purpose.KIND)
                        .toList();
        Map<Measurement.Why, List<Feature>> byReason = new LinkedHashMap<>();
        Set<Band> seen = EnumSet.noneOf(Band.class);
        for (FeatureMeasurement measurement : all) {
            if (measurement.result() instanceof NotMeasured reason) {
                byReason.computeIfAbsent(reason.why(), why -> new ArrayList<>())
                        .add(measurement.feature());
            } else {
                seen.add(measurement.feature().band());
            }
        }
        if (byReason.isEmpty()) {
            return;
        }
        passage.heading("Not measured");
        byReason.forEach(
                (why, features) -> {
                    String words = why.words();
                    String title =
                            words.substring(0, 1).toUpperCase(Locale.ROOT) + words.substring(1);
                    String names = fullness.names() ? ": " + symbols(features, seen) : "";
                    passage.item(title + " (" + features.size() + ")" + names + ".");
                });
    }

    /** Symbols of features; a band of which nothing was measured is named as a whole. */
    private static String symbols(List<Feature> features, Set<Band> seen) {
        Map<Band, Long> whole = new EnumMap<>(Band.class);
        List<String> parts = new ArrayList<>();
        features.stream()
                .filter(f -> !seen.contains(f.band()))
                .forEach(f -> whole.merge(f.band(), 1L, Long::sum));
        whole.forEach(
                (band, count) -> parts.add("all " + count + " of " + FeatureTable.words(band)));
        features.stream()
                .filter(f -> seen.contains(f.band()))
                .map(Feature::symbol)
                .distinct()
                .forEach(parts::add);
        return String.join(", ", parts);
    }
}
