package emberline.survey.score;

import emberline.spectrum.SpectralType;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.TreeSet;
import java.util.function.Function;

/**
 * Type scores of a list divided by one property.
 *
 * @param title the property in words
 * @param scores one score for each part that holds objects
 */
public record Division(String title, List<TypeScore> scores) {

    /** Copies the list. */
    public Division {
        scores = List.copyOf(scores);
    }

    /** A part of a scale: from the first value on up to the last, which is outside. */
    private record Range(String label, double from, double to) {

        boolean holds(double value) {
            return value >= from && value < to;
        }
    }

    private static final List<Range> TYPES =
            List.of(types(-9, 4), types(4, 10), types(10, 15), types(15, 20), types(20, 30), y());

    private static final List<Range> FINE_TYPES =
            List.of(
                    types(-9, 2),
                    types(2, 4),
                    types(4, 6),
                    types(6, 8),
                    types(8, 10),
                    types(10, 12),
                    types(12, 14),
                    types(14, 16),
                    types(16, 18),
                    types(18, 20),
                    types(20, 23),
                    types(23, 26),
                    types(26, 30),
                    y());

    private static final List<Range> RESOLUTIONS =
            List.of(
                    new Range("below 75", 0, 75),
                    new Range("75 to 200", 75, 200),
                    new Range("200 to 1000", 200, 1000),
                    new Range("1000 to 3000", 1000, 3000),
                    new Range("3000 and above", 3000, Double.POSITIVE_INFINITY));

    private static final List<Range> SIGNALS =
            List.of(
                    new Range("below 10", Double.NEGATIVE_INFINITY, 10),
                    new Range("10 to 30", 10, 30),
                    new Range("30 to 100", 30, 100),
                    new Range("100 and above", 100, Double.POSITIVE_INFINITY));

    private static Range types(double from, double to) {
        String first = from < 0 ? "to " : new SpectralType(from).code() + " to ";
        return new Range(first + new SpectralType(to - 0.5).code(), from, to);
    }

    private static Range y() {
        return new Range("Y", 30, 40);
    }

    /** Every division of a list. */
    static List<Division> all(List<ScoredObject> objects) {
        return List.of(
                inRanges("type", objects, TYPES, o -> o.known().typeNumber()),
                inRanges("type, finer", objects, FINE_TYPES, o -> o.known().typeNumber()),
                byWord("tier", objects, ScoredObject::tier),
                inRanges("resolving power", objects, RESOLUTIONS, ScoredObject::resolvingPower),
                inRanges(
                        "signal-to-noise per pixel", objects, SIGNALS, ScoredObject::signalToNoise),
                byWord("gravity as listed", objects, o -> o.known().gravity()),
                byWord("data set", objects, ScoredObject::dataset));
    }

    private static Division inRanges(
            String title,
            List<ScoredObject> objects,
            List<Range> ranges,
            Function<ScoredObject, OptionalDouble> property) {
        List<TypeScore> scores = new ArrayList<>();
        for (Range range : ranges) {
            List<ScoredObject> inside =
                    objects.stream()
                            .filter(o -> property.apply(o).isPresent())
                            .filter(o -> range.holds(property.apply(o).getAsDouble()))
                            .toList();
            add(scores, range.label(), inside);
        }
        add(
                scores,
                "not known",
                objects.stream().filter(o -> property.apply(o).isEmpty()).toList());
        return new Division(title, scores);
    }

    private static Division byWord(
            String title, List<ScoredObject> objects, Function<ScoredObject, String> property) {
        List<TypeScore> scores = new ArrayList<>();
        for (String word : new TreeSet<>(objects.stream().map(property).toList())) {
            add(
                    scores,
                    word.isBlank() ? "not stated" : word,
                    objects.stream().filter(o -> property.apply(o).equals(word)).toList());
        }
        return new Division(title, scores);
    }

    private static void add(List<TypeScore> scores, String label, List<ScoredObject> objects) {
        TypeScore score = TypeScore.of(label, objects);
        if (score.objects() > 0) {
            scores.add(score);
        }
    }
}
