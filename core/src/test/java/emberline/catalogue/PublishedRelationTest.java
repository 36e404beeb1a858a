package emberline.catalogue;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Relations and classes against values from outside. */
class PublishedRelationTest {

    private static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();

    private static Relation relation(String id) {
        return CATALOGUE.relations().stream()
                .filter(relation -> relation.id().equals(id))
                .findFirst()
                .orElseThrow();
    }

    @ParameterizedTest
    @MethodSource("answers")
    void relationAnswersAsExpected(NamedCsvRecord row) {
        double expected = TestTable.number(row, "expected") + TestTable.number(row, "add");
        assertEquals(
                expected,
                relation(row.getField("relation")).value(TestTable.number(row, "index")),
                TestTable.number(row, "tolerance"),
                row.toString());
    }

    static Stream<NamedCsvRecord> answers() throws IOException {
        return TestTable.rows(PublishedRelationTest.class, "published/relations.csv").stream();
    }

    /** The printed range of type comes out at the ends of a derived range of the index. */
    @ParameterizedTest
    @MethodSource("derivedRanges")
    void derivedRangeGivesThePrintedTypes(Relation relation) {
        double atMin = relation.value(relation.validIndexMin().getAsDouble());
        double atMax = relation.value(relation.validIndexMax().getAsDouble());
        assertEquals(relation.validTypeMin().getAsDouble(), Math.min(atMin, atMax), 0.03);
        assertEquals(relation.validTypeMax().getAsDouble(), Math.max(atMin, atMax), 0.03);
    }

    static Stream<Relation> derivedRanges() {
        return CATALOGUE.relations().stream()
                .filter(r -> r.validIndexBasis() == Relation.ValidIndexBasis.DERIVED);
    }

    /** The slope is the limit of the difference quotient. */
    @ParameterizedTest
    @MethodSource("derivedRanges")
    void slopeIsTheDerivative(Relation relation) {
        double x =
                (relation.validIndexMin().getAsDouble() + relation.validIndexMax().getAsDouble())
                        / 2;
        double step = 1e-5;
        double quotient = (relation.value(x + step) - relation.value(x - step)) / (2 * step);
        assertEquals(quotient, relation.slope(x), 1e-5 * (1 + Math.abs(quotient)));
    }

    /**
     * Twelve subdwarf spectra with published indices and types: curve, class and number. The class
     * of one lies 0.0013 below a limit.
     */
    @ParameterizedTest
    @MethodSource("subdwarfs")
    void subdwarfsGetTheirPublishedTypes(NamedCsvRecord row) {
        double sum = TestTable.number(row, "cah2") + TestTable.number(row, "cah3");
        double solar = relation("lepine2007/tio5-solar").value(sum);
        assertEquals(TestTable.number(row, "tio5_solar"), solar, 6e-4);
        double zeta = (1 - TestTable.number(row, "tio5")) / (1 - solar);
        assertEquals(TestTable.number(row, "zeta"), zeta, 6e-5);
        double type = relation("lepine2007/cah2+cah3").value(sum);
        List<MetallicityClass> classes = metallicityClasses("lepine2007/zeta", zeta);
        assertEquals(1, classes.size());
        double again =
                (1 - TestTable.number(row, "tio5"))
                        / (1 - relation("dhital2012/tio5-solar").value(sum));
        assertEquals(
                classes.get(0).name(),
                metallicityClasses("dhital2012/zeta", again).get(0).name(),
                "the recalibration gives the published class too");
        String number = String.valueOf(Math.rint(type * 2) / 2);
        assertEquals(row.getField("published_type"), classes.get(0).name().prefix() + "M" + number);
        boolean dwarf = classes.get(0).name() == MetallicityClass.Name.DWARF;
        double limit = relation("gizis1997/cah1-limit").value(TestTable.number(row, "tio5"));
        assertEquals(dwarf, TestTable.number(row, "cah1") >= limit);
    }

    private static List<MetallicityClass> metallicityClasses(String feature, double zeta) {
        return CATALOGUE.metallicityClasses().stream()
                .filter(one -> one.feature().equals(feature) && one.contains(zeta))
                .toList();
    }

    static Stream<NamedCsvRecord> subdwarfs() throws IOException {
        return TestTable.rows(PublishedRelationTest.class, "published/subdwarfs.csv").stream();
    }

    /**
     * T standards through the relations of two papers. Tolerance: three times the rms of the
     * relation, and what an index good to 0.03 adds.
     */
    @Test
    void standardsGetTheirTypes() throws IOException {
        int answers = 0;
        for (NamedCsvRecord row :
                TestTable.rows(PublishedRelationTest.class, "published/t_standards.csv")) {
            for (Relation relation : CATALOGUE.relations(Quantity.SPECTRAL_TYPE)) {
                String symbol = relation.feature().replace("burgasser2006/", "");
                if (relation.feature().equals(symbol) || symbol.equals("h2o-k")) {
                    continue;
                }
                double index = TestTable.number(row, symbol);
                double known = TestTable.number(row, "type_number");
                if (relation.covers(index) && known >= relation.validTypeMin().getAsDouble()) {
                    double tolerance =
                            3 * relation.rms().getAsDouble()
                                    + 0.03 * Math.abs(relation.slope(index));
                    assertEquals(known, relation.value(index), tolerance, relation.id());
                    answers++;
                }
            }
        }
        assertTrue(answers >= 50, "only " + answers + " answers");
    }

    /** The two VO-a lines of Cruz and Reid 2002 meet at 2.451, type 9.49 (computed apart). */
    @Test
    void branchesOfVoMeet() {
        assertEquals(9.49, relation("cruz2002/vo-a-sum").value(2.451), 0.005);
        assertEquals(9.49, relation("cruz2002/vo-a-sum-2").value(2.451), 0.005);
    }
}
