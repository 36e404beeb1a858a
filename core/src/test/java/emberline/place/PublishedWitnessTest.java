package emberline.place;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Relation;
import emberline.catalogue.Role;
import emberline.catalogue.Window;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.place.RelationEstimate.Use;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.apache.commons.math3.analysis.solvers.BrentSolver;
import org.junit.jupiter.api.Test;

/**
 * The combination of relations, on spectra that have flux in the windows of chosen relations only,
 * at the height at which each relation gives a chosen type.
 */
class PublishedWitnessTest {

    private static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();
    private static final double STEP = 5e-4;

    private static Relation relation(String id) {
        return CATALOGUE.relations().stream()
                .filter(r -> r.id().equals(id))
                .findFirst()
                .orElseThrow();
    }

    /** The index at which a relation gives a type. */
    private static double index(Relation relation, double type) {
        return new BrentSolver(1e-9)
                .solve(
                        200,
                        x -> relation.value(x) - type,
                        relation.validIndexMin().orElseThrow(),
                        relation.validIndexMax().orElseThrow());
    }

    private static Measurements measured(Map<String, Double> types, double sigma) {
        int size = (int) (1.7 / STEP);
        double[] wavelengths = new double[size];
        double[] flux = new double[size];
        double[] noise = new double[size];
        Arrays.fill(flux, Double.NaN);
        Arrays.fill(noise, sigma);
        for (int i = 0; i < size; i++) {
            wavelengths[i] = 0.7 + i * STEP;
        }
        types.forEach(
                (id, type) -> {
                    Relation relation = relation(id);
                    Feature feature = CATALOGUE.feature(relation.feature()).orElseThrow();
                    fill(wavelengths, flux, feature.window(Role.DENOMINATOR), 1);
                    fill(wavelengths, flux, feature.window(Role.NUMERATOR), index(relation, type));
                });
        return new Measurer(CATALOGUE, Measuring.withDefaults())
                .measure(
                        new PreparedSpectrum(
                                Spectrum.of(wavelengths, flux, noise),
                                new ResolvingPower(150, Basis.GIVEN),
                                NoiseModel.INDEPENDENT,
                                List.of()));
    }

    private static void fill(double[] wavelengths, double[] flux, Window window, double value) {
        for (int i = 0; i < flux.length; i++) {
            if (wavelengths[i] > window.lowMicron() - STEP
                    && wavelengths[i] < window.highMicron() + STEP) {
                flux[i] = value;
            }
        }
    }

    private static PublishedType witness(Map<String, Double> types, double sigma) {
        return new PublishedWitness(CATALOGUE).witness(measured(types, sigma));
    }

    private static Map<String, Double> water(double type) {
        Map<String, Double> types = new HashMap<>();
        types.put("allers2013/h2o", type);
        types.put("allers2013/h2o-1", type);
        types.put("allers2013/h2o-2", type);
        return types;
    }

    private static Use use(PublishedType type, String relation) {
        return type.estimates().stream()
                .filter(e -> e.relation().id().equals(relation))
                .findFirst()
                .orElseThrow()
                .use();
    }

    @Test
    void relationsThatAgreeAreCombined() {
        PublishedType type = witness(water(9), 1e-4);
        assertEquals(9, type.type().orElseThrow().typeNumber(), 0.05);
        water(9).keySet().forEach(id -> assertEquals(Use.COMBINED, use(type, id), id));
        assertTrue(type.scheme().contains("Allers"), type.scheme());
    }

    /** H2O and H2O-1 at L1 against H2O-2 at M5: the one that stands alone is set aside. */
    @Test
    void aRelationThatStandsAloneIsSetAside() {
        Map<String, Double> types = water(11);
        types.put("allers2013/h2o-2", 5.0);
        PublishedType type = witness(types, 1e-4);
        assertEquals(11, type.type().orElseThrow().typeNumber(), 0.1);
        assertEquals(Use.DISAGREES, use(type, "allers2013/h2o-2"));
    }

    @Test
    void noiseWidensTheError() {
        double sharp = witness(water(9), 1e-4).type().orElseThrow().sigmaSubclass();
        double noisy = witness(water(9), 0.2).type().orElseThrow().sigmaSubclass();
        assertTrue(noisy > 1.5 * sharp, sharp + " and " + noisy);
        assertTrue(sharp >= 0.5, "types are quoted to half a subclass: " + sharp);
    }

    @Test
    void oneRelationAloneIsSaid() {
        PublishedType type = witness(Map.of("allers2013/h2o", 9.0), 1e-4);
        assertEquals(9, type.type().orElseThrow().typeNumber(), 0.05);
        assertEquals("one-relation", type.findings().get(0).code());
    }

    private static double rms(String id) {
        return relation(id).rms().orElseThrow();
    }

    /** The mean weighted by 1 / rms squared; widened where the scatter is more than the rms. */
    @Test
    void relationsCountByTheirPrintedRms() {
        Map<String, Double> types = new HashMap<>();
        types.put("allers2013/h2o", 9.0);
        types.put("allers2013/h2o-1", 10.2);
        types.put("allers2013/h2o-2", 9.3);
        checkCombination(types);
        types.put("allers2013/h2o", 8.2);
        types.put("allers2013/h2o-2", 9.8);
        checkCombination(types);
    }

    private static void checkCombination(Map<String, Double> types) {
        double weights = 0;
        double sum = 0;
        for (String id : types.keySet()) {
            weights += Math.pow(rms(id), -2);
            sum += Math.pow(rms(id), -2) * types.get(id);
        }
        double chiSquare = 0;
        for (String id : types.keySet()) {
            chiSquare += Math.pow((types.get(id) - sum / weights) / rms(id), 2);
        }
        double widening = Math.max(1, chiSquare / 2);
        PublishedType found = witness(types, 1e-6);
        TypeEstimate type = found.type().orElseThrow();
        assertEquals(sum / weights, type.typeNumber(), 1e-3, types.toString());
        double sigma = Math.sqrt(0.25 + widening / weights);
        assertEquals(sigma, type.sigmaSubclass(), 1e-3, types.toString());
        assertTrue(found.scheme().startsWith("3 relations of Allers"), found.scheme());
        assertTrue(found.scheme().endsWith(", weighted by inverse variance"), found.scheme());
        assertTrue(found.findings().isEmpty(), found.findings().toString());
    }

    @Test
    void aRelationAloneHasItsRms() {
        PublishedType found = witness(Map.of("allers2013/h2o", 9.0), 1e-6);
        double sigma = Math.hypot(0.5, rms("allers2013/h2o"));
        assertEquals(sigma, found.type().orElseThrow().sigmaSubclass(), 1e-3);
        assertTrue(found.scheme().startsWith("1 relation of Allers"), found.scheme());
        assertEquals(1, found.findings().size());
    }

    private static RelationEstimate estimate(PublishedType type, String relation) {
        return type.estimates().stream()
                .filter(e -> e.relation().id().equals(relation))
                .findFirst()
                .orElseThrow();
    }

    /** Two subclasses off is near enough, two and a half is too far. */
    @Test
    void howFarARelationMayStand() {
        Map<String, Double> types = water(9);
        types.put("allers2013/h2o-2", 7.2);
        assertEquals(Use.COMBINED, use(witness(types, 1e-6), "allers2013/h2o-2"));
        types.put("allers2013/h2o-2", 6.3);
        PublishedType found = witness(types, 1e-6);
        RelationEstimate aside = estimate(found, "allers2013/h2o-2");
        assertEquals(Use.DISAGREES, aside.use());
        assertTrue(
                aside.reason().matches("-2[.][5-9] subclasses from where the others agree"),
                aside.reason());
        assertTrue(found.findings().isEmpty(), "one of three may stand aside");
    }

    @Test
    void asManyAsideAsCombinedIsWarnedOf() {
        Map<String, Double> types = new HashMap<>();
        types.put("allers2013/h2o", 13.5);
        types.put("allers2013/h2o-2", 5.0);
        List<String> codes = witness(types, 1e-6).findings().stream().map(f -> f.code()).toList();
        assertEquals(List.of("one-relation", "relations-disagree"), codes);
    }

    /** CH4-H is combined from T2 on; half a subclass before that noise may have moved it. */
    @Test
    void beforeTheCombinedPartOfItsRangeARelationIsOnlyShown() {
        String id = "burgasser2007/ch4-h";
        assertEquals(Use.COMBINED, use(witness(Map.of(id, 21.6), 1e-6), id));
        RelationEstimate before = estimate(witness(Map.of(id, 21.4), 1e-6), id);
        assertEquals(Use.SHOWN, before.use());
        assertEquals("outside the part of its range that is combined", before.reason());
        assertEquals(21.4, before.type().orElseThrow().typeNumber(), 1e-3);
    }

    @Test
    void anIndexOutsideAllRangesGivesNoType() {
        Relation relation = relation("allers2013/h2o");
        Feature feature = CATALOGUE.feature(relation.feature()).orElseThrow();
        double[] wavelengths = new double[(int) (1.7 / STEP)];
        Arrays.setAll(wavelengths, i -> 0.7 + i * STEP);
        double[] flux = new double[wavelengths.length];
        double[] noise = new double[wavelengths.length];
        Arrays.fill(flux, Double.NaN);
        Arrays.fill(noise, 1e-6);
        fill(wavelengths, flux, feature.window(Role.DENOMINATOR), 1);
        fill(wavelengths, flux, feature.window(Role.NUMERATOR), 3);
        PublishedType found =
                new PublishedWitness(CATALOGUE)
                        .witness(
                                new Measurer(CATALOGUE, Measuring.withDefaults())
                                        .measure(
                                                new PreparedSpectrum(
                                                        Spectrum.of(wavelengths, flux, noise),
                                                        new ResolvingPower(150, Basis.GIVEN),
                                                        NoiseModel.INDEPENDENT,
                                                        List.of())));
        assertTrue(found.type().isEmpty());
        RelationEstimate outside = estimate(found, relation.id());
        assertEquals(Use.OUTSIDE_RANGE, outside.use());
        assertEquals("index 3.000 outside 0.986 to 1.351", outside.reason());
        long measured = found.estimates().stream().filter(e -> e.use() != Use.NOT_MEASURED).count();
        assertTrue(
                found.scheme().startsWith("none of the " + measured + " measured indices"),
                found.scheme());
    }

    @Test
    void whatWasNotMeasuredSaysWhy() {
        RelationEstimate unused = estimate(witness(water(9), 1e-4), "burgasser2007/ch4-h");
        assertEquals(Use.NOT_MEASURED, unused.use());
        assertTrue(unused.reason().contains(": "), unused.reason());
        assertTrue(unused.type().isEmpty());
    }

    @Test
    void withoutAnyIndexTheReasonIsGiven() {
        PublishedType type =
                new PublishedWitness(CATALOGUE)
                        .witness(
                                new Measurer(CATALOGUE, Measuring.withDefaults())
                                        .measure(
                                                new PreparedSpectrum(
                                                        Spectrum.of(
                                                                new double[] {3.0, 3.1},
                                                                new double[] {1, 1},
                                                                new double[] {0.1, 0.1}),
                                                        new ResolvingPower(100, Basis.GIVEN),
                                                        NoiseModel.INDEPENDENT,
                                                        List.of())));
        assertTrue(type.type().isEmpty());
        assertTrue(type.scheme().contains("no index"), type.scheme());
        assertTrue(
                type.estimates().stream().allMatch(e -> e.use() == Use.NOT_MEASURED),
                "every relation is listed");
    }
}
