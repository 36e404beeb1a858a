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
