package emberline.place.kind;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class KindModelTest {

    @Test
    void aModelComesBackFromItsBytes() throws IOException {
        ByteArrayOutputStream first = new ByteArrayOutputStream();
        KindModel.standard().orElseThrow().write(first);
        ByteArrayOutputStream second = new ByteArrayOutputStream();
        KindModel.read(new ByteArrayInputStream(first.toByteArray())).write(second);
        assertArrayEquals(first.toByteArray(), second.toByteArray());
        assertTrue(first.size() > 100_000);
    }

    @Test
    void whatIsNoModelIsRefused() {
        assertThrows(
                IOException.class,
                () -> KindModel.read(new ByteArrayInputStream(new byte[] {1, 2, 3})));
    }

    @Test
    void everyFeatureIsInTheCatalogue() {
        FeatureCatalogue catalogue = FeatureCatalogue.standard();
        KindFeatures.standard()
                .ids()
                .forEach(id -> assertTrue(catalogue.feature(id).isPresent(), id));
    }

    @Test
    void thePriorIsComplete() {
        assertEquals(7, KindPrior.standard().shares().size());
        Map<ObjectKind, Double> half = new EnumMap<>(KindPrior.standard().shares());
        half.put(ObjectKind.GIANT, 0.5);
        assertThrows(IllegalArgumentException.class, () -> new KindPrior(half));
    }

    @ParameterizedTest
    @CsvSource({
        "dwarf, 8, late dwarf",
        "dwarf, -2, early star",
        "subdwarf, 17, late dwarf",
        "giant, 6, giant",
        "carbon, 0, carbon star",
        "reddened, 0, reddened background"
    })
    void wordsOfAListAreKinds(String word, double type, String label) {
        assertEquals(
                label, ObjectKind.ofReference(word, OptionalDouble.of(type)).orElseThrow().label());
        assertTrue(ObjectKind.ofReference("comet", OptionalDouble.empty()).isEmpty());
    }

    @Test
    void regionsNeedMostOfTheirWindows() {
        KindFeatures features = KindFeatures.standard();
        double[] values = new double[features.size()];
        java.util.Arrays.fill(values, 1);
        FeatureVector all = new FeatureVector(values, new double[values.length]);
        assertEquals(Regions.ALL, Regions.covered(all, features));
        assertEquals(Regions.H, Regions.covered(all.within(Regions.H, features), features));
        assertEquals("RZJHK+", Coverage.of(all, features, Coverage.forests()).get(0).code());
        assertEquals(
                "H",
                Coverage.of(all.within(Regions.H, features), features, Coverage.forests())
                        .get(0)
                        .code());
        assertTrue(
                Coverage.of(all.within(0, features), features, List.of(Coverage.parse("H")))
                        .isEmpty());
    }
}
