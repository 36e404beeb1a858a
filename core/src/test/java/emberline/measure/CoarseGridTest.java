package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Grids with fewer pixels than windows, with noise that neighbours share. */
class CoarseGridTest {

    private final Measurer measurer = new Measurer(TestSpectra.CATALOGUE, Measuring.withDefaults());

    private static PreparedSpectrum spectrum(
            int pixels, double lag1, double lag2, double sigmaGrowth) {
        double[] wavelengths = new double[pixels];
        double[] flux = new double[pixels];
        double[] sigma = new double[pixels];
        for (int i = 0; i < pixels; i++) {
            wavelengths[i] = 0.6 * Math.pow(2.5 / 0.6, i / (pixels - 1.0));
            flux[i] = 1 + 0.3 * Math.sin(9 * wavelengths[i]);
            sigma[i] = 0.001 * Math.pow(sigmaGrowth, i / (pixels - 1.0));
        }
        return new PreparedSpectrum(
                Spectrum.of(wavelengths, flux, sigma),
                new ResolvingPower(Math.max(2, pixels / 2.9), Basis.GIVEN),
                new NoiseModel(false, 1, lag1, lag2),
                List.of());
    }

    /** The scatter of draws is the sigma of the feature, whichever factor they were made by. */
    @ParameterizedTest
    @CsvSource({
        "2, 0, 0, 1", "3, 0.5, 0.1, 1", "8, 0.69, 0.24, 1", "15, 0.3, 0, 1",
        "25, 0.66, 0.17, 1", "40, 0, 0, 1", "40, 0.69, 0.24, 30", "60, 0.495, 0, 1",
        "90, 0.66, 0.17, 1", "120, 0, 0, 1", "120, 0.69, 0.24, 1", "180, 0.6, 0.2, 30",
        "250, 0.69, 0.24, 1", "400, 0.66, 0.17, 1", "700, 0.69, 0.24, 1"
    })
    void drawsScatterAsTheFeatureDoes(int pixels, double lag1, double lag2, double growth) {
        Measurements measured = measurer.measure(spectrum(pixels, lag1, lag2, growth));
        List<String> ids =
                measured.all().stream()
                        .map(one -> one.feature().id())
                        .filter(id -> measured.measured(id).isPresent())
                        .toList();
        double[][] draws = measured.draws(ids, 2000, 5);
        for (int f = 0; f < ids.size(); f++) {
            Measurement.Measured feature = measured.measured(ids.get(f)).orElseThrow();
            assertTrue(Arrays.stream(draws[f]).allMatch(Double::isFinite), ids.get(f));
            if (feature.oneSigma() < 0.02 * Math.abs(feature.value())) {
                // four sampling errors of the scatter of 2000 draws, and what is not linear
                assertEquals(1, scatter(draws[f]) / feature.oneSigma(), 0.1, ids.get(f));
            }
        }
    }

    private static double scatter(double[] values) {
        double mean = Arrays.stream(values).average().orElseThrow();
        return Math.sqrt(
                Arrays.stream(values).map(v -> (v - mean) * (v - mean)).sum() / values.length);
    }
}
