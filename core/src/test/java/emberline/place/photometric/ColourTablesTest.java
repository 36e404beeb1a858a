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
        ColourTemplates templates = new ColourTemplates();
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

    @Test
    void theGridGoesFromM5ToY1() {
        assertEquals(0, ColourTemplates.point(5));
        assertEquals(260, ColourTemplates.point(31));
        assertEquals(0, ColourTemplates.point(2));
        assertEquals(260, ColourTemplates.point(40));
        assertEquals(71, ColourTemplates.point(12.12));
        assertEquals(12.1, ColourTemplates.typeNumber(71), 1e-12);
    }

    /** The scatter of two colours is shared as the settings say, with a step of one subclass. */
    @Test
    void theCorrelationIsThatOfItsClass() {
        ColourTemplates templates = new ColourTemplates();
        ColourSettings settings = ColourSettings.standard();
        double early = settings.of("correlation-early");
        double ofL = settings.of("correlation-l");
        double ofT = settings.of("correlation-t");
        assertEquals(early, templates.correlation(ColourTemplates.point(6)), 1e-12);
        assertEquals(early, templates.correlation(ColourTemplates.point(9)), 1e-12);
        assertEquals((early + ofL) / 2, templates.correlation(ColourTemplates.point(9.5)), 1e-9);
        assertEquals(ofL, templates.correlation(ColourTemplates.point(10)), 1e-12);
        assertEquals(ofL, templates.correlation(ColourTemplates.point(19)), 1e-12);
        assertEquals(
                ofL + 0.3 * (ofT - ofL), templates.correlation(ColourTemplates.point(19.3)), 1e-9);
        assertEquals(ofT, templates.correlation(ColourTemplates.point(25)), 1e-12);
    }

    /** Every row of the table is there, as printed. */
    @Test
    void otherKindsAreRead() {
        List<ColourTemplates.Other> others = new ColourTemplates().others();
        assertEquals(ProductTable.at(FOLDER + "other-kinds.csv").rows().size(), others.size());
        for (int i = 0; i < others.size(); i++) {
            NamedCsvRecord row = ProductTable.at(FOLDER + "other-kinds.csv").rows().get(i);
            assertEquals(row.getField("kind"), others.get(i).kind().label());
            assertEquals(Double.parseDouble(row.getField("j_h_2mass")), others.get(i).jMinusH());
            assertEquals(Double.parseDouble(row.getField("h_k_2mass")), others.get(i).hMinusK());
        }
    }

    /** Classes of low gravity differ from the field only where there are medians of them. */
    @Test
    void lowGravityDepartsFromTheFieldOnlyWhereItIsKnown() {
        ColourTemplates templates = new ColourTemplates();
        for (TemplateColour colour : TemplateColour.values()) {
            for (GravityClass gravity : List.of(GravityClass.INT_G, GravityClass.VL_G)) {
                double[] types =
                        ProductTable.at(FOLDER + "templates.csv").rows().stream()
                                .filter(row -> row.getField("colour").equals(colour.name()))
                                .filter(row -> row.getField("gravity").equals(gravity.label()))
                                .mapToDouble(row -> Double.parseDouble(row.getField("type_number")))
                                .toArray();
                for (int point = 0; point < ColourTemplates.SIZE; point++) {
                    double type = ColourTemplates.typeNumber(point);
                    boolean known =
                            types.length > 0
                                    && type > types[0] - 0.06
                                    && type < types[types.length - 1] + 0.06;
                    boolean departs =
                            templates.median(colour, gravity, point)
                                    != templates.median(colour, GravityClass.FLD_G, point);
                    assertEquals(known, departs, colour + " " + gravity + " at " + type);
                }
            }
        }
    }
}
