package emberline.survey.score;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.MetallicityClass.Name;
import emberline.place.GravityClass;
import emberline.place.TypeEstimate;
import emberline.spectrum.Candidate;
import emberline.survey.Status;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import org.junit.jupiter.api.Test;

class CheckScoreTest {

    private static ScoredObject dwarf(String name, double known, double found, double sigma) {
        return object(name, "dwarf", known, Optional.of(TypeEstimate.normal(found, sigma)), "", "");
    }

    private static ScoredObject object(
            String name,
            String kind,
            double known,
            Optional<TypeEstimate> type,
            String gravity,
            String judgedKind) {
        return new ScoredObject(
                name,
                name,
                "invented",
                "A",
                new ScoredObject.Known(
                        kind, OptionalDouble.of(known), gravity, Optional.of(Name.DWARF)),
                new ScoredObject.Found(
                        type,
                        gravity.isBlank() ? Optional.empty() : Optional.of(GravityClass.VL_G),
                        judgedKind,
                        Optional.of(Name.SUBDWARF)),
                OptionalDouble.of(120),
                OptionalDouble.of(25),
                Status.MEASURED,
                "",
                List.of("one-relation"));
    }

    private static TypeScore part(CheckScore score, String title, String label) {
        return score.divisions().stream()
                .filter(division -> division.title().equals(title))
                .flatMap(division -> division.scores().stream())
                .filter(one -> one.label().equals(label))
                .findFirst()
                .orElseThrow();
    }

    /** Differences -1, 0, 0, 1, 5 by hand. */
    @Test
    void figuresAreThoseComputedByHand() {
        CheckScore score =
                CheckScore.of(
                        List.of(
                                dwarf("a", 10, 9, 1),
                                dwarf("b", 10, 10, 1),
                                dwarf("c", 11, 11, 1),
                                dwarf("d", 12, 13, 1.5),
                                dwarf("e", 13, 18, 1),
                                object("f", "dwarf", 14, Optional.empty(), "", "")));
        TypeScore all = score.types().get(0);
        assertEquals(6, all.objects());
        assertEquals(5, all.typed());
        TypeScore.Figures figures = all.figures().orElseThrow();
        assertEquals(1, figures.bias(), 1e-12);
        assertEquals(Math.sqrt(27 / 5.0), figures.rms(), 1e-12);
        assertEquals(1, figures.medianAbsolute(), 1e-12);
        assertEquals(1.4826, figures.robustScatter(), 1e-12);
        assertEquals(1, figures.medianSigma(), 1e-12);
        assertEquals(0.8, figures.inside68(), 1e-12);
        assertEquals(0.8, figures.inside95(), 1e-12);
        assertEquals(List.of("e"), score.outliers().stream().map(ScoredObject::name).toList());
        assertEquals(6, part(score, "type", "L0 to L4.5").objects());
        assertEquals(3, part(score, "type, finer", "L0 to L1.5").typed());
        assertEquals(6, part(score, "resolving power", "75 to 200").objects());
        assertEquals(6, part(score, "signal-to-noise per pixel", "10 to 30").objects());
    }

    @Test
    void smallErrorsMakeAnOutlierToo() {
        CheckScore score = CheckScore.of(List.of(dwarf("a", 10, 10.4, 0.1), dwarf("b", 10, 11, 1)));
        assertEquals(List.of("a"), score.outliers().stream().map(ScoredObject::name).toList());
    }

    /** Errors that are drawn as stated come out as covered as they claim to be. */
    @Test
    void trueIntervalsAreFoundTrue() {
        Random random = new Random(3);
        List<ScoredObject> objects = new ArrayList<>();
        for (int i = 0; i < 4000; i++) {
            objects.add(dwarf("o" + i, 10, 10 + 0.7 * random.nextGaussian(), 0.7));
        }
        CheckScore score = CheckScore.of(objects);
        TypeScore.Figures figures = score.types().get(0).figures().orElseThrow();
        // binomial errors of 4000: 0.007 and 0.0034
        assertEquals(0.683, figures.inside68(), 0.025);
        assertEquals(0.95, figures.inside95(), 0.012);
        score.coverage().forEach(p -> assertEquals(p.nominal(), p.actual(), 0.03));
        assertEquals(0.7, figures.robustScatter(), 0.04);
    }

    @Test
    void onlySingleDwarfsCountForTypes() {
        Optional<TypeEstimate> type = Optional.of(TypeEstimate.normal(12, 1));
        CheckScore score =
                CheckScore.of(
                        List.of(
                                object("giant", "giant", 8, type, "", ""),
                                object("pair", "pair", 12, type, "", "")));
        assertEquals(0, score.types().get(0).objects());
        assertTrue(score.coverage().isEmpty() && score.outliers().isEmpty());
        assertEquals(1, score.kind().contaminantsTyped());
        assertEquals(1, score.kind().allLateDwarfs());
    }

    @Test
    void classesAreCountedKnownAgainstFound() {
        Optional<TypeEstimate> type = Optional.of(TypeEstimate.normal(12, 1));
        CheckScore score =
                CheckScore.of(
                        List.of(
                                object("young", "dwarf", 10, type, "VL-G", "late dwarf"),
                                object("old", "dwarf", 10, type, "FLD-G", "giant"),
                                object("t", "dwarf", 25, type, "VL-G", "late dwarf"),
                                object("g", "giant", 3, type, "", "late dwarf"),
                                object("h", "giant", 3, type, "", "giant")));
        assertEquals(1, score.gravity().count("VL-G", "VL-G"), "T dwarfs are not in the table");
        assertEquals(1, score.gravity().count("FLD-G", "VL-G"));
        assertEquals(1, score.gravity().judged("FLD-G"));
        KindScore kind = score.kind();
        assertEquals(List.of(3, 2), List.of(kind.lateDwarfs(), kind.lateDwarfsKept()));
        assertEquals(List.of(2, 1), List.of(kind.contaminants(), kind.contaminantsLetIn()));
        assertEquals(1, kind.table().count("giant", "late dwarf"));
        assertEquals(5, score.metallicity().count("d", "sd"));
    }

    @Test
    void whatIsKnownIsReadFromTheList() {
        ScoredObject.Known code =
                ScoredObject.Known.of(row(Map.of("known_type", "sdL7:", "known_kind", "subdwarf")));
        assertEquals(OptionalDouble.of(17), code.typeNumber());
        assertEquals(Optional.of(Name.SUBDWARF), code.metallicity());
        ScoredObject.Known dwarf = ScoredObject.Known.of(row(Map.of("known_type_number", "4.5")));
        assertEquals("dwarf", dwarf.kind());
        assertEquals(Optional.of(Name.DWARF), dwarf.metallicity());
        assertTrue(dwarf.isLateDwarf());
        ScoredObject.Known off = ScoredObject.Known.of(row(Map.of("known_type_number", "99")));
        assertTrue(off.typeNumber().isEmpty());
        ScoredObject.Known stated =
                ScoredObject.Known.of(row(Map.of("known_metallicity", "esd", "known_kind", "x")));
        assertEquals(Optional.of(Name.EXTREME_SUBDWARF), stated.metallicity());
        assertFalse(stated.holdsDwarf());
    }

    private static Candidate row(Map<String, String> cells) {
        return new Candidate("n", 1, List.of(), cells);
    }
}
