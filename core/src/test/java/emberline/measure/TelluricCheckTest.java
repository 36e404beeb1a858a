package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.HowKnown;
import emberline.catalogue.TelluricRegion;
import emberline.catalogue.TelluricRegion.Strength;
import emberline.catalogue.Window;
import emberline.measure.Measurement.Why;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class TelluricCheckTest {

    private static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();

    /** The lower window of H2O-J, 1.140 to 1.165, lies wholly in the wet band at 1.105 to 1.165. */
    @ParameterizedTest
    @CsvSource({"SPACE, 0", "DRY, 0", "WET, 1"})
    void theSiteDecidesWhatIsFlagged(Site site, double share) {
        TelluricCheck check = new TelluricCheck(CATALOGUE, CATALOGUE.telluricRegions(), site);
        assertEquals(
                share, check.share(CATALOGUE.feature("burgasser2006/h2o-j").orElseThrow()), 1e-9);
    }

    /** H2O-C takes 2.000 to 2.040 over 2.090 to 2.130; CO2 spoils 1.995 to 2.035. */
    @Test
    void theLargestShareOfAWindowCounts() {
        TelluricCheck check = new TelluricCheck(CATALOGUE, CATALOGUE.telluricRegions(), Site.DRY);
        assertEquals(
                35.0 / 40,
                check.share(CATALOGUE.feature("burgasser2002/h2o-c").orElseThrow()),
                1e-9);
    }

    @Test
    void anOpaqueWindowIsRefused() {
        TelluricRegion opaque =
                new TelluricRegion(
                        "H2O",
                        Strength.OPAQUE,
                        new Window(1.14, 1.16),
                        CATALOGUE.sources().get(0),
                        HowKnown.FROM_MEMORY,
                        80,
                        "");
        var feature = CATALOGUE.feature("burgasser2006/h2o-j").orElseThrow();
        var refusal =
                new TelluricCheck(CATALOGUE, List.of(opaque), Site.DRY)
                        .refusal(feature)
                        .orElseThrow();
        assertEquals(Why.TELLURIC, refusal.why());
        assertTrue(refusal.detail().contains("80%"), refusal.detail());
        assertTrue(
                new TelluricCheck(CATALOGUE, List.of(opaque), Site.SPACE)
                        .refusal(feature)
                        .isEmpty());
    }

    @Test
    void noShippedFeatureIsRefused() {
        TelluricCheck check = new TelluricCheck(CATALOGUE, CATALOGUE.telluricRegions(), Site.WET);
        CATALOGUE.features().forEach(f -> assertTrue(check.refusal(f).isEmpty(), f.id()));
    }

    /** A composite has no windows of its own: what spoils its parts spoils it. */
    @Test
    void aCompositeHasTheLargestShareOfItsParts() {
        TelluricCheck check = new TelluricCheck(CATALOGUE, CATALOGUE.telluricRegions(), Site.WET);
        int spoiled = 0;
        for (Feature composite : CATALOGUE.features()) {
            if (!composite.parts().isEmpty()) {
                double largest =
                        composite.parts().stream()
                                .map(part -> CATALOGUE.feature(part.feature()).orElseThrow())
                                .mapToDouble(check::share)
                                .max()
                                .orElseThrow();
                assertEquals(largest, check.share(composite), composite.id());
                spoiled += largest > 0 ? 1 : 0;
            }
        }
        assertTrue(spoiled > 0, "no composite of the catalogue has a spoiled part");
    }
}
