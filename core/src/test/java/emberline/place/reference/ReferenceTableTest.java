package emberline.place.reference;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurement.Measured;
import java.io.IOException;
import java.io.StringReader;
import java.io.StringWriter;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class ReferenceTableTest {

    private static final String TEXT =
            "# a remark\n"
                    + "object,group,type_number,gravity,kind,tier,source,resolution,snr,"
                    + "a/one,a/one sigma,b/two,b/two sigma\n"
                    + "\"Dwarf, first\",Dwarf,13.5,VL-G,dwarf,A,lib2013,120,57.3,"
                    + "0.8123,0.011,,\n"
                    + "Star,Star,,,giant,B,lib2009,2000,,1.0500,0.2,-2.5000,0.0015\n";

    private static ReferenceTable table() throws IOException {
        return ReferenceTable.read(new StringReader(TEXT));
    }

    @Test
    void everyCellIsRead() throws IOException {
        ReferenceTable table = table();
        assertEquals(List.of("a/one", "b/two"), table.features());
        ReferenceRow dwarf =
                new ReferenceRow(
                        "Dwarf, first",
                        "Dwarf",
                        OptionalDouble.of(13.5),
                        "VL-G",
                        "dwarf",
                        "A",
                        "lib2013",
                        120,
                        OptionalDouble.of(57.3),
                        Map.of("a/one", new Measured(0.8123, 0.011)));
        Map<String, Measured> both = new LinkedHashMap<>();
        both.put("a/one", new Measured(1.05, 0.2));
        both.put("b/two", new Measured(-2.5, 0.0015));
        ReferenceRow star =
                new ReferenceRow(
                        "Star",
                        "Star",
                        OptionalDouble.empty(),
                        "",
                        "giant",
                        "B",
                        "lib2009",
                        2000,
                        OptionalDouble.empty(),
                        both);
        assertEquals(List.of(dwarf, star), table.rows());
        assertEquals(Optional.of(new Measured(-2.5, 0.0015)), star.feature("b/two"));
        assertTrue(dwarf.feature("b/two").isEmpty());
    }

    @Test
    void whatIsWrittenReadsTheSame() throws IOException {
        StringWriter text = new StringWriter();
        table().write(text, List.of("a remark"));
        assertEquals(table(), ReferenceTable.read(new StringReader(text.toString())));
        assertTrue(text.toString().startsWith("# a remark\nobject,group,type_number,"), "header");
    }

    @Test
    void theStandardFeaturesAreInTheCatalogue() {
        FeatureCatalogue catalogue = FeatureCatalogue.standard();
        List<String> features = ReferenceTable.standardFeatures();
        assertTrue(features.size() > 30, features.toString());
        features.forEach(id -> assertTrue(catalogue.feature(id).isPresent(), id));
    }
}
