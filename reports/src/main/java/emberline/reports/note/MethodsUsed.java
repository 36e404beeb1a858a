package emberline.reports.note;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Source;
import emberline.judge.Judge;
import emberline.measure.Measurement.Measured;
import emberline.place.Placement;
import emberline.place.RelationEstimate;
import emberline.place.RelationEstimate.Use;
import emberline.survey.ObjectResult;
import emberline.survey.Status;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.NavigableSet;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * The methods that the results of some objects rest on, with their papers: what entered a type, a
 * gravity class, a metallicity, an activity, a verdict on pairs or a judgement of at least one
 * object. What was measured and used for nothing is not among them.
 */
public final class MethodsUsed {

    private final FeatureCatalogue catalogue;
    private final Map<Part, NavigableSet<Source>> sources = new EnumMap<>(Part.class);
    private final Set<Part> done = EnumSet.noneOf(Part.class);
    private final Map<Status, Integer> statuses = new EnumMap<>(Status.class);

    /** A part of the work. */
    enum Part {
        INDICES,
        POSTERIOR,
        RELATIONS,
        GRAVITY,
        METALLICITY,
        ACTIVITY,
        PAIR,
        REDDENING,
        JUDGEMENT
    }

    /**
     * Nothing yet.
     *
     * @param catalogue the definitions with which the objects were measured
     */
    public MethodsUsed(FeatureCatalogue catalogue) {
        this.catalogue = catalogue;
    }

    /**
     * Adds an object.
     *
     * @param result its result
     */
    public void add(ObjectResult result) {
        statuses.merge(result.status(), 1, Integer::sum);
        result.placement().ifPresent(this::add);
        result.judgement()
                .ifPresent(
                        judgement ->
                                note(
                                        Part.JUDGEMENT,
                                        Judge.sources(
                                                judgement,
                                                result.placement().flatMap(Placement::type))
                                                .stream()));
    }

    /**
     * What was added so far as a short text, to be added again later: each part with the keys of
     * its papers, such as {@code GRAVITY=allers2013;PAIR=}.
     *
     * @return one line
     */
    public String text() {
        return Stream.of(Part.values())
                .filter(part -> sources.containsKey(part) || wasDone(part))
                .map(
                        part ->
                                part
                                        + (wasDone(part) ? "=" : "~")
                                        + papers(part).stream()
                                                .map(Source::key)
                                                .collect(Collectors.joining(",")))
                .collect(Collectors.joining(";"));
    }

    /**
     * Adds an object of which only the text is known.
     *
     * @param status the word of its status
     * @param text what {@link #text} gave for it alone
     * @throws IllegalArgumentException if the text was made with other definitions
     */
    public void add(String status, String text) {
        Stream.of(Status.values())
                .filter(one -> one.word().equals(status))
                .forEach(one -> statuses.merge(one, 1, Integer::sum));
        for (String part : text.split(";", -1)) {
            int mark = Math.max(part.indexOf('='), part.indexOf('~'));
            if (mark < 0) {
                continue;
            }
            Part name = Part.valueOf(part.substring(0, mark));
            if (part.charAt(mark) == '=') {
                done.add(name);
            }
            for (String key : part.substring(mark + 1).split(",", -1)) {
                if (!key.isEmpty()) {
                    of(name).add(paper(key));
                }
            }
        }
    }

    private Source paper(String key) {
        return Stream.concat(catalogue.source(key).stream(), Judge.sources().stream())
                .filter(source -> source.key().equals(key))
                .findFirst()
                .orElseThrow(
                        () ->
                                new IllegalArgumentException(
                                        "paper '"
                                                + key
                                                + "': expected a paper of the definitions; give"
                                                + " the same --catalogue as before"));
    }

    private void add(Placement placement) {
        if (placement.calibrated().posterior().isPresent()) {
            note(Part.POSTERIOR, Stream.of());
            placement.calibrated().contributions().forEach(c -> index(c.feature()));
        }
        List<RelationEstimate> combined =
                placement.published().estimates().stream()
                        .filter(e -> e.use() == Use.COMBINED)
                        .toList();
        if (!combined.isEmpty()) {
            combined.forEach(e -> index(e.relation().feature()));
            note(Part.RELATIONS, combined.stream().map(e -> e.relation().source()));
        }
        placement.gravity().scores().stream()
                .filter(s -> s.score().isPresent())
                .forEach(
                        s -> {
                            index(s.feature().id());
                            note(
                                    Part.GRAVITY,
                                    catalogue.gravityThresholds().stream()
                                            .filter(t -> t.feature().equals(s.feature().id()))
                                            .map(t -> t.source()));
                        });
        placement.metallicity().readings().stream()
                .filter(r -> r.isUsed() && r.zeta() instanceof Measured)
                .forEach(r -> note(Part.METALLICITY, Stream.of(r.feature().source())));
        if (!placement.activity().levels().isEmpty()) {
            note(Part.ACTIVITY, placement.activity().levels().stream().map(l -> l.source()));
            placement.activity().line().ifPresent(line -> index(line.id()));
        }
        if (placement.pair().strength().isPresent()) {
            note(
                    Part.PAIR,
                    placement.pair().criteria().stream()
                            .filter(c -> c.met().isPresent())
                            .map(c -> c.plane().source()));
        }
        if (placement.reddening().isPresent()) {
            note(Part.REDDENING, Stream.of());
        }
    }

    private void index(String feature) {
        Optional<Source> source = catalogue.feature(feature).map(Feature::source);
        source.ifPresent(s -> of(Part.INDICES).add(s));
    }

    private void note(Part part, Stream<Source> papers) {
        done.add(part);
        papers.forEach(of(part)::add);
    }

    private NavigableSet<Source> of(Part part) {
        return sources.computeIfAbsent(part, p -> new TreeSet<>(Comparator.comparing(Source::key)));
    }

    /** The papers of a part, by key. */
    List<Source> papers(Part part) {
        return List.copyOf(of(part));
    }

    /** Whether a part was done for any object. */
    boolean wasDone(Part part) {
        return done.contains(part);
    }

    /** How many objects came how far. */
    int count(Status status) {
        return statuses.getOrDefault(status, 0);
    }

    /**
     * All papers, each once.
     *
     * @return papers in the order of their keys
     */
    public List<Source> papers() {
        NavigableSet<Source> all = new TreeSet<>(Comparator.comparing(Source::key));
        sources.values().forEach(all::addAll);
        return List.copyOf(all);
    }

    /**
     * The papers as a BibTeX file.
     *
     * @return entries in the order of their keys
     */
    public String bibtex() {
        StringBuilder text =
                new StringBuilder(
                        "% Papers behind the methods that were used, as far as the catalogue knows"
                                + " them. Check authors and titles.\n");
        papers().forEach(source -> text.append('\n').append(source.bibtex()));
        return text.toString();
    }
}
