package emberline.place.photometric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.catalogue.HowKnown;
import emberline.place.GravityClass;
import emberline.read.ProductTable;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;

/** The tables of colours: sources, and curves that stay near the printed medians. */
class ColourTablesTest {

    private static final String FOLDER = "/emberline/place/photometric/";

    @Test
    void everyRowNamesASourceOfTheTableAndHowItIsKnown() {
        Set<String> keys =
                ProductTable.at(FOLDER + "sources.csv").rows().stream()
                        .map(row -> row.getField("key"))
                        .collect(Collectors.toSet());
        int rows = 0;
        for (String table : List.of("templates.csv", "other-kinds.csv", "settings.csv")) {
            for (NamedCsvRecord row : ProductTable.at(FOLDER + table).rows()) {
                assertTrue(keys.contains(row.getField("source")), table + ": " + row);
                HowKnown.valueOf(row.getField("how_known"));
                rows++;
            }
        }
        assertTrue(rows > 400);
    }

    @Test
    void curvesStayNearTheMedians() {
        ColourTemplates templates = ColourTemplates.standard();
        int compared = 0;
        for (NamedCsvRecord row : ProductTable.at(FOLDER + "templates.csv").rows()) {
            String objects = row.getField("objects");
            if (objects.isEmpty() || Integer.parseInt(objects) < 20) {
                continue;
            }
            TemplateColour colour = TemplateColour.valueOf(row.getField("colour"));
            GravityClass gravity =
                    row.getField("gravity").equals("FLD-G")
                            ? GravityClass.FLD_G
                            : row.getField("gravity").equals("INT-G")
                                    ? GravityClass.INT_G
                                    : GravityClass.VL_G;
            int point = ColourTemplates.point(Double.parseDouble(row.getField("type_number")));
            double median = Double.parseDouble(row.getField("median"));
            assertEquals(
                    median,
                    templates.median(colour, gravity, point),
                    (gravity == GravityClass.FLD_G ? 0.8 : 1.5) * templates.scatter(colour, point),
                    row.toString());
            compared++;
        }
        assertTrue(compared > 100, compared + " medians");
    }
}
