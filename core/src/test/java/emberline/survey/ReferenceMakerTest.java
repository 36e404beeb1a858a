package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedSpectra;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.place.reference.ReferenceRow;
import emberline.place.reference.ReferenceTable;
import emberline.spectrum.Candidate;
import java.io.StringReader;
import java.io.StringWriter;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class ReferenceMakerTest {

    private static Candidate known(String name, String file, int row) {
        Map<String, String> cells = new LinkedHashMap<>();
        cells.put("known_type_number", "13");
        cells.put("known_gravity", "FLD-G");
        cells.put("known_kind", "dwarf");
        cells.put("tier", "A");
        cells.put("resolution", "120");
        cells.put("dataset", "templates");
        return new Candidate(name, row, List.of(file), cells);
    }

    private static ReferenceTable table(Path folder) {
        Chain chain =
                new Chain(
                        FeatureCatalogue.standard(),
                        Measuring.withDefaults(),
                        SurveySettings.withDefaults());
        ReferenceMaker maker = new ReferenceMaker();
        maker.add(chain.run(known("2MASS J1234+5678", "cruz18_templates/L3_f.csv", 1), folder));
        maker.add(chain.run(known("2MASS J1234+5678 (2)", "cruz18_templates/L3_g.csv", 2), folder));
        maker.add(chain.run(known("gone", "no-such-file.csv", 3), folder));
        return maker.table();
    }

    @Test
    void whatWasMeasuredComesBackFromTheTable() throws Exception {
        ReferenceTable table = table(SharedSpectra.folder());
        StringWriter text = new StringWriter();
        table.write(text, List.of("a remark"));
        ReferenceTable read = ReferenceTable.read(new StringReader(text.toString()));
        assertEquals(table.features(), read.features());
        assertEquals(2, read.rows().size());
        ReferenceRow row = read.rows().get(0);
        assertEquals(13, row.typeNumber().orElseThrow());
        assertEquals("dwarf", row.kind());
        double expected = table.rows().get(0).feature("burgasser2006/h2o-j").orElseThrow().value();
        assertEquals(expected, row.feature("burgasser2006/h2o-j").orElseThrow().value(), 5e-5);
    }

    @Test
    void spectraOfOneObjectAreOneGroup() throws Exception {
        List<ReferenceRow> rows = table(SharedSpectra.folder()).rows();
        assertEquals(rows.get(0).group(), rows.get(1).group());
    }

    @Test
    void everyFeatureOfTheTableIsInTheCatalogue() {
        FeatureCatalogue catalogue = FeatureCatalogue.standard();
        List<String> features = ReferenceTable.standardFeatures();
        assertTrue(features.size() > 50);
        features.forEach(id -> assertTrue(catalogue.feature(id).isPresent(), id));
    }
}
