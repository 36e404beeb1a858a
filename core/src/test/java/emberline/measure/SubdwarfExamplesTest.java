package emberline.measure;

import static emberline.PublishedRows.number;
import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.PublishedRows;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.MetallicityClass;
import emberline.catalogue.Relation;
import java.io.IOException;
import org.junit.jupiter.api.Test;

/** Published subdwarfs: the metallicity index, its class and the subtype from printed indices. */
class SubdwarfExamplesTest {

    private static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();

    private static Relation relation(String id) {
        return CATALOGUE.relations().stream()
                .filter(r -> r.id().equals(id))
                .findFirst()
                .orElseThrow();
    }

    @Test
    void zetaClassAndSubtypeAreThePublishedOnes() throws IOException {
        assertAll(PublishedRows.of("subdwarf-examples.csv").stream().map(row -> () -> check(row)));
    }

    private static void check(NamedCsvRecord row) {
        String object = row.getField("object");
        double tio5 = number(row, "tio5");
        double sum = number(row, "cah2") + number(row, "cah3");
        Relation solar = relation("lepine2007/tio5-solar");
        assertEquals(number(row, "tio5_solar"), solar.value(sum), 6e-4, object);
        double zeta = Composite.shortfall(solar.coefficients()).value(new double[] {tio5, sum});
        assertEquals(number(row, "zeta"), zeta, 6e-5, object);
        double type = relation("lepine2007/cah2+cah3").value(sum);
        assertEquals(number(row, "raw_type"), type, 6e-4, object);
        String prefix =
                CATALOGUE.metallicityClasses().stream()
                        .filter(c -> c.feature().equals("lepine2007/zeta") && c.contains(zeta))
                        .map(MetallicityClass::name)
                        .map(MetallicityClass.Name::prefix)
                        .findFirst()
                        .orElseThrow();
        double half = Math.rint(2 * type) / 2;
        assertEquals(row.getField("published_type"), prefix + "M" + half, object);
    }
}
