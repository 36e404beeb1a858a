package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertNotSame;
import static org.junit.jupiter.api.Assertions.assertSame;

import emberline.SharedSpectra;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.place.Placement;
import emberline.place.calibrated.TypePriors;
import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
import emberline.spectrum.Candidate;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class HeldOutPlacersTest {

    private static boolean isLearnedFrom(Candidate candidate) {
        return candidate.text("known_kind").orElse("").equals("dwarf")
                && candidate.text("dataset").orElse("").equals("cruz18_templates");
    }

    /** Real dwarfs: an object is placed otherwise by placers that have and have not seen it. */
    @Test
    void anObjectIsPlacedByAPlacerThatHasNotSeenIt() throws Exception {
        Path folder = SharedSpectra.folder();
        FeatureCatalogue catalogue = FeatureCatalogue.standard();
        Chain chain = new Chain(catalogue, Measuring.withDefaults(), SurveySettings.withDefaults());
        List<ObjectResult> results =
                new CandidateListReader()
                        .read(folder.resolve("list.csv")).rows().stream()
                                .map(ListedCandidate::candidate)
                                .filter(HeldOutPlacersTest::isLearnedFrom)
                                .map(candidate -> chain.run(candidate, folder))
                                .toList();
        ReferenceMaker maker = new ReferenceMaker();
        results.forEach(maker::add);
        PlacerChoice choice =
                HeldOutPlacers.learned(maker.table(), catalogue, TypePriors.FLAT.load());
        Candidate giant = new Candidate("never seen", 1, List.of(), Map.of());
        ObjectResult known = results.get(0);
        assertNotSame(choice.placerFor(giant), choice.placerFor(known.candidate()));
        assertSame(
                choice.placerFor(known.candidate()),
                choice.placerFor(
                        new Candidate(known.candidate().name() + " (7)", 9, List.of(), Map.of())));
        Placement unseen = choice.placerFor(known.candidate()).place(known.best().orElseThrow(), 1);
        Placement seen = choice.placerFor(giant).place(known.best().orElseThrow(), 1);
        double one = unseen.type().orElseThrow().typeNumber();
        double other = seen.type().orElseThrow().typeNumber();
        assertNotEquals(one, other);
    }
}
