package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedSpectra;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.place.GravityClass;
import emberline.place.TypeEstimate;
import emberline.read.CandidateList;
import emberline.read.CandidateListReader;
import emberline.spectrum.Candidate;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

/**
 * The chain on real spectra with published types: several public libraries, gathered with their
 * references in the manifest beside them.
 */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class RealSurveyTest {

    private List<Placed> list;
    private List<Placed> originals;

    /** What is kept of a result. */
    private record Placed(
            Candidate candidate,
            Status status,
            Optional<TypeEstimate> type,
            Optional<GravityClass> gravity) {

        static Placed of(ObjectResult result) {
            return new Placed(
                    result.candidate(),
                    result.status(),
                    result.placement().flatMap(p -> p.published().type()),
                    result.placement().flatMap(p -> p.gravity().gravityClass()));
        }

        boolean isGoodLateDwarf() {
            return candidate.text("known_kind").equals(Optional.of("dwarf"))
                    && List.of("A", "B").contains(candidate.text("tier").orElse(""))
                    && candidate.number("known_type_number").orElse(-9) >= 4;
        }

        double difference() {
            return type.orElseThrow().typeNumber()
                    - candidate.number("known_type_number").orElseThrow();
        }
    }

    @BeforeAll
    void run() throws Exception {
        Path folder = SharedSpectra.folder();
        list = run(folder.resolve("list.csv"));
        originals = run(folder.resolve("list-originals.csv"));
    }

    private static List<Placed> run(Path file) throws IOException, InterruptedException {
        SurveySettings settings = SurveySettings.withDefaults().withThreads(2);
        Chain chain = new Chain(FeatureCatalogue.standard(), Measuring.withDefaults(), settings);
        CandidateList candidates = new CandidateListReader().read(file);
        List<Placed> placed = new ArrayList<>();
        new SurveyRunner(chain, settings.threads()).run(candidates, Placed::of, placed::add);
        return placed;
    }

    @Test
    void everyRowHasAResultInItsPlace() {
        assertEquals(608, list.size());
        assertEquals(429, originals.size());
        for (int row = 0; row < list.size(); row++) {
            assertEquals(row + 1, list.get(row).candidate().row());
        }
    }

    /** Four galaxy templates have two equal wavelengths; they are refused as they should be. */
    @Test
    void allButTheSpectraWithEqualWavelengthsAreRead() {
        List<String> failed =
                list.stream()
                        .filter(p -> p.status() == Status.FAILED)
                        .map(p -> p.candidate().spectra().get(0))
                        .toList();
        assertTrue(
                failed.stream().allMatch(path -> path.startsWith("extragal/"))
                        && failed.size() <= 4,
                failed.toString());
    }

    @Test
    void originalsAreReadAndGiveTheSameTypes() {
        long read = originals.stream().filter(p -> p.status() != Status.FAILED).count();
        assertTrue(read >= 0.98 * originals.size(), read + " of " + originals.size());
        Map<String, Placed> byName = new HashMap<>();
        for (Placed placed : list) {
            if (placed.candidate().spectra().get(0).endsWith(".csv")) {
                byName.put(placed.candidate().name(), placed);
            }
        }
        List<String> off = new ArrayList<>();
        int compared = 0;
        for (Placed original : originals) {
            Placed copy = byName.get(original.candidate().name());
            if (copy != null && copy.type().isPresent()) {
                compared++;
                double difference =
                        original.type().map(TypeEstimate::typeNumber).orElse(99.0)
                                - copy.type().get().typeNumber();
                if (Math.abs(difference) > 0.2) {
                    off.add(original.candidate().name() + " " + difference);
                }
            }
        }
        assertTrue(off.size() <= 0.02 * compared, compared + " compared, off: " + off);
    }

    @Test
    void lateDwarfsGetTheirPublishedTypes() {
        List<Placed> good = list.stream().filter(Placed::isGoodLateDwarf).toList();
        List<Placed> typed = good.stream().filter(p -> p.type().isPresent()).toList();
        double[] off = typed.stream().mapToDouble(p -> Math.abs(p.difference())).sorted().toArray();
        double rms = Math.sqrt(Arrays.stream(off).map(x -> x * x).average().orElseThrow());
        String figures =
                String.format(
                        Locale.ROOT,
                        "typed %d of %d, median %.2f, rms %.2f",
                        typed.size(),
                        good.size(),
                        off[off.length / 2],
                        rms);
        assertTrue(typed.size() >= 0.9 * good.size(), figures);
        assertTrue(off[off.length / 2] <= 0.55, figures);
        assertTrue(rms <= 1.25, figures);
    }

    /** Published classes of the same objects; the scores are from memory. */
    @Test
    void gravityScoresFindMostObjectsOfVeryLowGravity() {
        List<Placed> judged =
                list.stream()
                        .filter(Placed::isGoodLateDwarf)
                        .filter(p -> p.gravity().isPresent())
                        .toList();
        List<Placed> veryLow = known(judged, "VL-G");
        long found = veryLow.stream().filter(p -> p.gravity().get() == GravityClass.VL_G).count();
        assertTrue(veryLow.size() >= 35, veryLow.size() + " VL-G judged");
        assertTrue(found >= 0.7 * veryLow.size(), found + " of " + veryLow.size() + " VL-G");
        List<Placed> field = known(judged, "FLD-G");
        long kept = field.stream().filter(p -> p.gravity().get() == GravityClass.FLD_G).count();
        assertTrue(field.size() >= 7, field.size() + " FLD-G judged");
        assertTrue(kept >= 0.7 * field.size(), kept + " of " + field.size() + " FLD-G");
    }

    private static List<Placed> known(List<Placed> placed, String gravity) {
        return placed.stream()
                .filter(p -> p.candidate().text("known_gravity").equals(Optional.of(gravity)))
                .toList();
    }
}
