package emberline.catalogue;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.spectrum.AirToVacuum;
import emberline.spectrum.Medium;
import java.net.URISyntaxException;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

/** A user's folder on top of the catalogue of the product. */
class UserCatalogueTest {

    private final FeatureCatalogue standard = FeatureCatalogue.standard();
    private FeatureCatalogue both;

    @BeforeEach
    void load() throws InvalidCatalogueException, URISyntaxException {
        both = standard.with(Path.of(UserCatalogueTest.class.getResource("good").toURI()));
    }

    @Test
    void addsToTheCatalogueAndLeavesItAlone() {
        assertEquals(standard.features().size() + 3, both.features().size());
        assertEquals(standard.relations().size() + 1, both.relations().size());
        assertEquals(standard.typeBoundaries().size() + 1, both.typeBoundaries().size());
        assertTrue(both.feature("EXAMPLE2026/Ratio").isPresent());
        assertTrue(standard.feature("example2026/ratio").isEmpty());
        assertEquals("Example & Sample 2026", both.source("example2026").orElseThrow().shortCite());
    }

    @Test
    void airAngstromBecomesVacuumMicron() {
        Feature ratio = both.feature("example2026/ratio").orElseThrow();
        assertEquals(Medium.AIR, ratio.printedMedium());
        assertEquals(
                new Window(AirToVacuum.vacuumMicron(0.7), AirToVacuum.vacuumMicron(0.701)),
                ratio.window(Role.NUMERATOR));
        Window span = ratio.span().orElseThrow();
        assertEquals(AirToVacuum.vacuumMicron(0.7), span.lowMicron());
        assertEquals(AirToVacuum.vacuumMicron(0.711), span.highMicron());
    }

    @Test
    void unstatedMediumCountsAsVacuumAndSaysSo() {
        Feature magnitude = both.feature("example2026/magnitude").orElseThrow();
        assertEquals(Medium.VACUUM, magnitude.printedMedium());
        assertFalse(magnitude.mediumStated());
        assertEquals(new Window(3.2, 3.4), magnitude.window(Role.NUMERATOR));
        assertEquals(Statistic.MEAN, magnitude.statistic());
    }

    @Test
    void partsMayBeFeaturesOfTheProduct() {
        Feature mix = both.feature("example2026/mix").orElseThrow();
        assertEquals(
                List.of(
                        new Part(PartRole.TERM, "example2026/ratio", 2),
                        new Part(PartRole.TERM, "reid1995/tio5", -0.5)),
                mix.parts());
        assertTrue(mix.span().isEmpty());
        assertThrows(IllegalArgumentException.class, () -> mix.window(Role.LINE));
    }

    @Test
    void relationWithoutOptionalColumnsIsOpenAndNotTested() {
        Relation relation = both.relations().get(both.relations().size() - 1);
        assertEquals("example2026/from-mix", relation.id());
        assertEquals(Relation.Verdict.NOT_TESTED, relation.verdict());
        assertEquals(Relation.Population.ANY, relation.population());
        assertTrue(relation.covers(-1e9) && relation.covers(1e9));
        assertFalse(relation.covers(Double.NaN));
        assertEquals(11, relation.value(2));
        assertEquals(4, relation.slope(2));
    }

    @Test
    void theSameFolderTwiceCollides() throws URISyntaxException {
        Path good = Path.of(UserCatalogueTest.class.getResource("good").toURI());
        String message =
                assertThrows(InvalidCatalogueException.class, () -> both.with(good)).getMessage();
        assertTrue(message.contains("'example2026' exists already"), message);
    }
}
