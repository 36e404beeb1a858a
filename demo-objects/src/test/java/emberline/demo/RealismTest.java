package emberline.demo;

import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.demo.RealObjects.RealObject;
import emberline.measure.Measurements;
import emberline.place.calibrated.Calibration;
import java.io.IOException;
import java.util.List;
import java.util.function.Predicate;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * The model beside real objects: every index is measured by the product on both, and the model must
 * lie within the distribution of real objects of its type. Real spectra are not part of this
 * project; without them the tests that need them are skipped. They write their figures to {@code
 * target/realism-*.csv}.
 */
class RealismTest {

    /** Indices with windows of 10 nm and more, which every resolution from 75 on can measure. */
    private static final List<String> INDICES =
            List.of(
                    "allers2007/h2o",
                    "allers2013/h2od",
                    "allers2013/feh_z",
                    "allers2013/vo_z",
                    "allers2013/ki_j",
                    "allers2013/h-cont",
                    "burgasser2006/h2o-j",
                    "burgasser2006/ch4-j",
                    "burgasser2006/h2o-h",
                    "burgasser2006/ch4-h",
                    "burgasser2006/h2o-k",
                    "burgasser2006/ch4-k",
                    "burgasser2006/k-j",
                    "burgasser2006b/y-j",
                    "burgasser2006b/k-h",
                    "burgasser2002/h2o-c",
                    "burgasser2002/co",
                    "slesnick2004/h2o-1",
                    "slesnick2004/h2o-2",
                    "tokunaga1999/k1",
                    "tokunaga1999/k2",
                    "testi2001/sh2o_j",
                    "testi2001/sh2o_h1",
                    "testi2001/sh2o_k",
                    "geballe2002/h2o_1.5",
                    "canty2013/h2-k",
                    "delorme2008/nh3-h",
                    "warren2007/w_j",
                    "bardalez2014/j-slope",
                    "bardalez2014/h-bump");

    /** Types at which there are enough real objects, and how far around them counts (subclass). */
    private static final List<double[]> FIELD =
            List.of(
                    new double[] {6, 1},
                    new double[] {8, 1},
                    new double[] {10, 1},
                    new double[] {12, 1},
                    new double[] {14.5, 1.5});

    private static final List<double[]> VERY_LOW =
            List.of(new double[] {9, 1}, new double[] {10.5, 1}, new double[] {13, 1.5});

    private static final List<double[]> T_DWARFS =
            List.of(new double[] {22, 1}, new double[] {25, 1.25}, new double[] {27.5, 1.5});

    private static final int LEAST_OBJECTS = 4;

    private static final Bench BENCH = new Bench();

    private static Measurements field(double type) {
        return BENCH.measureDwarf(type, "FLD-G", "prism");
    }

    private static List<Measurements> near(
            List<RealObject> objects, double[] at, Predicate<RealObject> which) {
        return objects.stream()
                .filter(which)
                .filter(object -> Math.abs(object.type() - at[0]) <= at[1])
                .map(RealObject::measurements)
                .toList();
    }

    /** Two in three of a normal distribution lie within one sigma, 95% within two. */
    @Test
    void indicesOfTheModelLieWithinThoseOfRealDwarfs() throws IOException {
        RealObjects.assumePresent();
        List<RealObject> dwarfs =
                RealObjects.read(
                        BENCH,
                        row ->
                                row.getField("known_kind").equals("dwarf")
                                        && row.getField("tier").matches("[AB]"));
        IndexComparison comparison = new IndexComparison();
        for (double[] at : FIELD) {
            comparison.withObjects(
                    "FLD-G " + at[0],
                    INDICES,
                    field(at[0]),
                    near(dwarfs, at, dwarf -> dwarf.gravity().isEmpty()),
                    LEAST_OBJECTS);
        }
        for (double[] at : VERY_LOW) {
            comparison.withObjects(
                    "VL-G " + at[0],
                    INDICES,
                    BENCH.measureDwarf(at[0], "VL-G", "prism"),
                    near(dwarfs, at, dwarf -> dwarf.gravity().equals("VL-G")),
                    LEAST_OBJECTS);
        }
        comparison.write("realism-dwarfs.csv");
        assertTrue(comparison.size() > 150, "comparisons: " + comparison.size());
        assertTrue(comparison.shareWithin(2) >= 0.93, "share: " + comparison.shareWithin(2));
    }

    /** Noisy and doubtful spectra count too: there are hardly others. */
    @Test
    void indicesOfTheModelLieWithinThoseOfRealTDwarfs() throws IOException {
        RealObjects.assumePresent();
        List<RealObject> dwarfs =
                RealObjects.read(
                        BENCH,
                        row ->
                                row.getField("known_kind").equals("dwarf")
                                        && row.getField("known_type_number")
                                                .matches("2[0-9](\\.\\d)?"));
        IndexComparison comparison = new IndexComparison();
        for (double[] at : T_DWARFS) {
            comparison.withObjects(
                    "T " + at[0],
                    INDICES,
                    field(at[0]),
                    near(dwarfs, at, dwarf -> true),
                    LEAST_OBJECTS);
        }
        comparison.write("realism-t-dwarfs.csv");
        assertTrue(comparison.size() > 60, "comparisons: " + comparison.size());
        assertTrue(comparison.shareWithin(2) >= 0.8, "share: " + comparison.shareWithin(2));
    }

    /** The loci were learned from real objects; those of T dwarfs lean on published relations. */
    @Test
    void indicesOfTheModelLieAlongTheCalibratedLoci() throws IOException {
        Calibration calibration = Calibration.standard();
        IndexComparison comparison = new IndexComparison();
        for (double type : new double[] {6, 8, 10, 12, 14, 16, 18, 20, 22, 25, 27}) {
            Measurements model = field(type);
            for (String index : INDICES) {
                calibration
                        .expected(index, type, 0)
                        .ifPresent(
                                locus ->
                                        comparison.withMean(
                                                index,
                                                "FLD-G " + type,
                                                locus.mean(),
                                                locus.scatter(),
                                                model));
            }
        }
        comparison.write("realism-loci.csv");
        assertTrue(comparison.size() > 150, "comparisons: " + comparison.size());
        assertTrue(comparison.shareWithin(2) >= 0.88, "share: " + comparison.shareWithin(2));
    }

    /** Objects that are made by a recipe, beside real ones of that kind and type. */
    @ParameterizedTest
    @CsvSource({
        "giant, 6, giant, M(5|5.5|6|7)[^eI]* ?III.*, 4, 0.9",
        "giant_late, 7.5, giant, M(7|8|9|8-9)[^I]* ?III.*, 4, 0.9",
        "carbon, 0, carbon, C.*, 5, 0.8",
        "early, 0, early, [AF].* V, 4, 0.9"
    })
    void indicesOfRecipesLieWithinThoseOfRealObjects(
            String recipe, double type, String kind, String published, int least, double share)
            throws IOException {
        RealObjects.assumePresent();
        List<Measurements> real =
                RealObjects.read(
                                BENCH,
                                row ->
                                        row.getField("known_kind").equals(kind)
                                                && row.getField("known_type").matches(published))
                        .stream()
                        .map(RealObject::measurements)
                        .toList();
        IndexComparison comparison = new IndexComparison();
        comparison.withObjects(
                recipe + " " + type,
                INDICES,
                BENCH.measureRecipe(recipe, type, "prism"),
                real,
                least);
        comparison.write("realism-" + recipe + "-" + type + ".csv");
        assertTrue(comparison.size() > 15, "comparisons: " + comparison.size());
        assertTrue(comparison.shareWithin(2) >= share, "share: " + comparison.shareWithin(2));
    }

    /**
     * There is one real subdwarf, noisy and of doubtful type, so only the sense is held in which
     * its indices differ from those of dwarfs of solar metallicity.
     */
    @ParameterizedTest
    @ValueSource(strings = {"burgasser2006/k-j", "burgasser2006b/k-h", "burgasser2002/h-j"})
    void aMetalPoorLDwarfIsBlueAsTheRealOneIs(String index) throws IOException {
        RealObjects.assumePresent();
        double real =
                RealObjects.read(BENCH, row -> row.getField("known_type").startsWith("sdL"))
                        .get(0)
                        .measurements()
                        .measured(index)
                        .orElseThrow()
                        .value();
        double solar = Calibration.standard().expected(index, 17, 0).orElseThrow().mean();
        double model = value(BENCH.measureRecipe("sd", 17, "prism"), index);
        double difference = model - value(field(17), index);
        assertTrue(real < solar, "real " + real + ", solar " + solar);
        assertTrue(difference < -0.02, "model: " + difference);
    }

    private static double value(Measurements measurements, String index) {
        return measurements.measured(index).orElseThrow().value();
    }
}
