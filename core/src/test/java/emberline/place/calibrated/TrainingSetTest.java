package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.Measurement.Measured;
import emberline.place.calibrated.TrainingSet.Dwarf;
import emberline.place.calibrated.TrainingSet.Point;
import emberline.place.reference.ReferenceRow;
import emberline.place.reference.ReferenceTable;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import org.junit.jupiter.api.Test;

/** Which spectra teach, and how much. */
class TrainingSetTest {

    private static final Map<String, Measured> ONE = Map.of("x", new Measured(1.5, 0.1));

    private static TrainingSet of(ReferenceRow... rows) {
        return TrainingSet.of(new ReferenceTable(List.of("x"), List.of(rows)), Map.of());
    }

    private static ReferenceRow unlike(String kind, OptionalDouble type) {
        return new ReferenceRow(
                "o", "o", type, "", kind, "A", "invented", 120, OptionalDouble.empty(), ONE);
    }

    @Test
    void tiersWeigh() {
        TrainingSet set =
                of(
                        Invented.row("a", 5, "", "A", ONE),
                        Invented.row("b", 6, "", "B", ONE),
                        Invented.row("c", 7, "", "C", ONE),
                        Invented.row("d", 8, "", "D", ONE));
        assertEquals(List.of(1.0, 0.8, 0.3), set.dwarfs().stream().map(Dwarf::weight).toList());
        assertEquals(List.of(5.0, 6.0, 7.0), set.dwarfs().stream().map(Dwarf::typeNumber).toList());
    }

    @Test
    void onlyDwarfsOfKnownTypeUpToY1Teach() {
        TrainingSet set =
                of(
                        unlike("giant", OptionalDouble.of(5)),
                        unlike("dwarf", OptionalDouble.empty()),
                        unlike("dwarf", OptionalDouble.of(31.5)),
                        unlike("dwarf", OptionalDouble.of(31)));
        assertEquals(List.of(31.0), set.dwarfs().stream().map(Dwarf::typeNumber).toList());
    }

    /** Spectra without remark have the mean gravity of their group, else that of the field. */
    @Test
    void gravityIsThatOfTheObject() {
        TrainingSet set =
                of(
                        Invented.row("a", 5, "VL-G", "A", ONE),
                        Invented.row("b", 5, "young", "A", ONE),
                        Invented.row("c", 5, "INT-G", "A", ONE),
                        Invented.row("d", 5, "FLD-G", "A", ONE),
                        Invented.row("e", 5, "", "A", ONE),
                        Invented.row("a", 5, "INT-G", "D", ONE),
                        Invented.row("a", 5, "", "A", ONE));
        List<Double> expected = List.of(1.0, 0.7, 0.5, 0.0, 0.0, 0.75);
        assertEquals(expected, set.dwarfs().stream().map(Dwarf::lowGravity).toList());
    }

    @Test
    void aGiantOfTheSameNameTellsNoGravity() {
        ReferenceRow giant =
                new ReferenceRow(
                        "g",
                        "a",
                        OptionalDouble.of(5),
                        "VL-G",
                        "giant",
                        "A",
                        "invented",
                        120,
                        OptionalDouble.empty(),
                        ONE);
        assertEquals(0, of(giant, Invented.row("a", 5, "", "A", ONE)).dwarfs().get(0).lowGravity());
    }

    @Test
    void pointsAreDwarfsThenAnchors() {
        Point anchor = new Point(25, 0, 1, 0.7, 0, 0.2);
        ReferenceTable table =
                new ReferenceTable(
                        List.of("x"),
                        List.of(
                                Invented.row("a", 5, "VL-G", "B", ONE),
                                Invented.row("b", 6, "", "A", Map.of())));
        TrainingSet set = TrainingSet.of(table, Map.of("x", List.of(anchor)));
        assertEquals(List.of(new Point(5, 1, 0.8, 1.5, 0.1, 0), anchor), set.points("x"));
        assertTrue(set.points("y").isEmpty());
        TrainingSet without = set.without(Set.of("a"));
        assertEquals(List.of(anchor), without.points("x"));
        assertEquals(1, without.dwarfs().size());
        assertEquals("b", without.dwarfs().get(0).row().group());
    }
}
