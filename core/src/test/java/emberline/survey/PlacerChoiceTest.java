package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;

import emberline.catalogue.FeatureCatalogue;
import emberline.place.Placer;
import emberline.spectrum.Candidate;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class PlacerChoiceTest {

    private static Candidate named(String name, Map<String, String> cells) {
        return new Candidate(name, 1, List.of(), cells);
    }

    @Test
    void spectraOfOneObjectShareAGroup() {
        String group = ObjectGroup.of(named("2MASS J03552337+1133437", Map.of()));
        assertEquals("J0355+11", group);
        assertEquals(group, ObjectGroup.of(named("2MASS J0355+1133 (2)", Map.of())));
        assertEquals("GJ 229 B", ObjectGroup.of(named("GJ 229 B (3)", Map.of())));
        assertEquals("mine", ObjectGroup.of(named("2MASS J0355+1133", Map.of("group", "mine"))));
    }

    @Test
    void eachGroupIsPlacedByThePlacerThatHasNotSeenIt() {
        Placer one = new Placer(FeatureCatalogue.standard());
        Placer other = new Placer(FeatureCatalogue.standard());
        PlacerChoice choice = PlacerChoice.byGroup(g -> g.equals("J0355+11") ? one : other);
        assertSame(one, choice.placerFor(named("2MASS J0355+1133 (2)", Map.of())));
        assertSame(other, choice.placerFor(named("GJ 229 B", Map.of())));
    }
}
