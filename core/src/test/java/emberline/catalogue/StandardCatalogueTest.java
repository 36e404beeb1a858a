package emberline.catalogue;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

/** The catalogue of the product as data. */
class StandardCatalogueTest {

    private final FeatureCatalogue catalogue = FeatureCatalogue.standard();

    /** A change of these numbers is a change of the product and must be meant. */
    @Test
    void holdsWhatItHeldBefore() {
        assertEquals(170, catalogue.features().size());
        assertEquals(62, catalogue.relations().size());
        assertEquals(53, catalogue.relations(Quantity.SPECTRAL_TYPE).size());
        assertEquals(37, catalogue.gravityThresholds().size());
        assertEquals(96, catalogue.typeBoundaries().size());
        assertEquals(6, catalogue.pairPlanes().size());
        assertEquals(4, catalogue.metallicityClasses().size());
        assertEquals(53, catalogue.sources().size());
    }
}
