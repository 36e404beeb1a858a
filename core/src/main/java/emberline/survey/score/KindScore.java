package emberline.survey.score;

import emberline.place.kind.ObjectKind;
import java.util.List;

/**
 * How well late dwarfs are told from other objects. A late dwarf is a dwarf, subdwarf or pair of M4
 * or later; what is no dwarf at all is a contaminant.
 *
 * @param table known kinds against judged ones
 * @param lateDwarfs late dwarfs of which the kind was judged
 * @param lateDwarfsKept those of them that were called late dwarfs
 * @param contaminants contaminants of which the kind was judged
 * @param contaminantsLetIn those of them that were called late dwarfs
 * @param lateDwarfsTyped late dwarfs that were given a type, of {@code allLateDwarfs}
 * @param allLateDwarfs late dwarfs, judged or not
 * @param contaminantsTyped contaminants that were given a type, of {@code allContaminants}
 * @param allContaminants contaminants, judged or not
 */
public record KindScore(
        Confusion table,
        int lateDwarfs,
        int lateDwarfsKept,
        int contaminants,
        int contaminantsLetIn,
        int lateDwarfsTyped,
        int allLateDwarfs,
        int contaminantsTyped,
        int allContaminants) {

    /** The kind that the product gives to late dwarfs. */
    private static final String LATE_DWARF = ObjectKind.LATE_DWARF.label();

    static KindScore of(List<ScoredObject> objects) {
        List<ScoredObject> late = objects.stream().filter(o -> o.known().isLateDwarf()).toList();
        List<ScoredObject> other = objects.stream().filter(o -> !o.known().holdsDwarf()).toList();
        return new KindScore(
                Confusion.of(
                        objects,
                        List.of(LATE_DWARF, "early M dwarf"),
                        List.of(LATE_DWARF),
                        KindScore::knownKind,
                        o -> o.found().kind()),
                judged(late),
                called(late),
                judged(other),
                called(other),
                typed(late),
                late.size(),
                typed(other),
                other.size());
    }

    private static String knownKind(ScoredObject object) {
        if (!object.known().kind().equals(ScoredObject.DWARF)) {
            return object.known().kind();
        }
        return object.known().isLateDwarf() ? LATE_DWARF : "early M dwarf";
    }

    private static int judged(List<ScoredObject> objects) {
        return (int) objects.stream().filter(o -> !o.found().kind().isBlank()).count();
    }

    private static int called(List<ScoredObject> objects) {
        return (int) objects.stream().filter(o -> o.found().kind().equals(LATE_DWARF)).count();
    }

    private static int typed(List<ScoredObject> objects) {
        return (int) objects.stream().filter(o -> o.found().type().isPresent()).count();
    }
}
