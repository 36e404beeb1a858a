package emberline.place;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.Spectrum;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class GravityScorerTest {

    private static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();

    /** A flat spectrum in which the four scored bands have chosen depths. */
    private static Measurements measured(
            double feh, double vo, double potassium, double hcont, double sigma) {
        double step = 2e-3;
        int size = 750;
        double[] wavelengths = new double[size];
        double[] flux = new double[size];
        double[] noise = new double[size];
        for (int i = 0; i < size; i++) {
            double l = 0.9 + i * step;
            wavelengths[i] = l;
            flux[i] =
                    1
                            / (l > 0.990 && l < 1.006
                                    ? feh
                                    : l > 1.049 && l < 1.067
                                            ? vo
                                            : l > 1.234 && l < 1.254
                                                    ? potassium
                                                    : l > 1.545 && l < 1.575 ? hcont : 1);
            noise[i] = sigma;
        }
        return new Measurer(CATALOGUE, Measuring.withDefaults())
                .measure(
                        new PreparedSpectrum(
                                Spectrum.of(wavelengths, flux, noise),
                                new ResolvingPower(100, Basis.GIVEN),
                                NoiseModel.INDEPENDENT,
                                List.of()));
    }

    private static GravityVerdict judge(Measurements measurements, double type) {
        return new GravityScorer(CATALOGUE)
                .judge(measurements, TypeEstimate.normal(type, 0.5), 1, true);
    }

    /**
     * Limits of Allers and Liu (2013) at L0, from memory: FeH_z 1.204 and 1.106, VO_z 1.122 and
     * 1.256, KI_J 1.098 and 1.061, H-cont 0.935 and 0.972.
     */
    @ParameterizedTest
    @CsvSource({
        "1.25, 1.00, 1.15, 0.90, FLD_G, 0000",
        "1.15, 1.20, 1.08, 0.95, INT_G, 1111",
        "1.05, 1.30, 1.02, 0.99, VL_G, 2222",
        "1.15, 1.00, 1.15, 0.99, FLD_G, 1002",
        "1.15, 1.00, 1.08, 0.99, INT_G, 1012",
        "1.25, 1.00, 1.08, 0.90, FLD_G, 0010"
    })
    void mediansOfScoresGiveTheClass(
            double feh,
            double vo,
            double potassium,
            double hcont,
            GravityClass gravity,
            String digits) {
        GravityVerdict verdict = judge(measured(feh, vo, potassium, hcont, 1e-4), 10);
        StringBuilder scores = new StringBuilder();
        verdict.scores().forEach(score -> scores.append(score.score().getAsInt()));
        assertEquals(digits, scores.toString());
        assertEquals(Optional.of(gravity), verdict.gravityClass());
    }

    @Test
    void probabilitiesAddUpAndFollowTheNoise() {
        GravityVerdict sure = judge(measured(1.05, 1.30, 1.02, 0.99, 1e-4), 10);
        GravityVerdict unsure = judge(measured(1.05, 1.30, 1.02, 0.99, 0.15), 10);
        for (GravityVerdict verdict : List.of(sure, unsure)) {
            assertEquals(
                    1,
                    verdict.pFieldGravity().getAsDouble()
                            + verdict.pIntermediateGravity().getAsDouble()
                            + verdict.pVeryLowGravity().getAsDouble(),
                    1e-9);
        }
        assertTrue(sure.pVeryLowGravity().getAsDouble() > 0.95);
        assertTrue(unsure.pVeryLowGravity().getAsDouble() < sure.pVeryLowGravity().getAsDouble());
    }

    /** The scheme is printed for M6 to L5, H-cont alone to L7. */
    @ParameterizedTest
    @CsvSource({"3", "5.4", "17.6", "22"})
    void outsideThePrintedTypesGravityIsNotJudged(double type) {
        GravityVerdict verdict = judge(measured(1.05, 1.30, 1.02, 0.99, 1e-4), type);
        assertEquals(Optional.empty(), verdict.gravityClass());
        assertTrue(verdict.reason().contains("outside M6 to L7"), verdict.reason());
    }

    @Test
    void lateTypesRestOnHContAlone() {
        GravityVerdict verdict = judge(measured(1.05, 1.30, 1.02, 0.99, 1e-4), 16.5);
        assertEquals(Optional.of(GravityClass.VL_G), verdict.gravityClass());
        assertEquals(1, verdict.scores().stream().filter(s -> s.score().isPresent()).count());
    }

    @Test
    void oneOfFourScoresIsNotEnough() {
        Measurements onlyH =
                new Measurer(CATALOGUE, Measuring.withDefaults()).measure(flat(1.4, 1.8));
        GravityVerdict verdict = judge(onlyH, 10);
        assertEquals(Optional.empty(), verdict.gravityClass());
        assertTrue(verdict.reason().contains("1 of 4"), verdict.reason());
    }

    private static PreparedSpectrum flat(double low, double high) {
        int size = (int) ((high - low) / 2e-3);
        double[] wavelengths = new double[size];
        double[] flux = new double[size];
        double[] noise = new double[size];
        for (int i = 0; i < size; i++) {
            wavelengths[i] = low + i * 2e-3;
            flux[i] = 1;
            noise[i] = 0.01;
        }
        return new PreparedSpectrum(
                Spectrum.of(wavelengths, flux, noise),
                new ResolvingPower(100, Basis.GIVEN),
                NoiseModel.INDEPENDENT,
                List.of());
    }
}
