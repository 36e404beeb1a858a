package emberline.measure.line;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.RestLine;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.Spectrum;
import java.util.List;
import java.util.Random;
import java.util.Set;

/**
 * Invented spectra with Gaussian absorption lines of K I and Na I at their places in the J band.
 */
final class InventedLines {

    static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();

    private static final Set<String> SPECIES = Set.of("K I", "Na I");
    private static final double SPEED_OF_LIGHT_KMS = 299_792.458;
    private static final double LOW = 1.12;
    private static final double HIGH = 1.28;

    private InventedLines() {}

    /**
     * A spectrum from 1.12 to 1.28 micron with 2.5 pixels a resolution element.
     *
     * @param depth depth of the unresolved lines in units of the continuum
     */
    static PreparedSpectrum spectrum(
            double resolvingPower, double kms, double depth, double signalToNoise, long seed) {
        Random random = new Random(seed);
        int pixels = (int) (2.5 * resolvingPower * Math.log(HIGH / LOW));
        double[] wavelength = new double[pixels];
        double[] flux = new double[pixels];
        double[] sigma = new double[pixels];
        double beta = kms / SPEED_OF_LIGHT_KMS;
        double shift = Math.sqrt((1 + beta) / (1 - beta));
        for (int i = 0; i < pixels; i++) {
            wavelength[i] = LOW * Math.pow(HIGH / LOW, i / (pixels - 1.0));
            double clean = continuum(wavelength[i]);
            double lines = 0;
            for (RestLine line : CATALOGUE.restLines()) {
                if (SPECIES.contains(line.species())) {
                    double width = line.vacuumMicron() / resolvingPower / 2.3548;
                    double z = (wavelength[i] - shift * line.vacuumMicron()) / width;
                    lines += depth * Math.exp(-z * z / 2);
                }
            }
            sigma[i] = clean / signalToNoise;
            flux[i] = clean * (1 - lines) + sigma[i] * random.nextGaussian();
        }
        return prepared(Spectrum.of(wavelength, flux, sigma), resolvingPower);
    }

    private static double continuum(double micron) {
        return 1 + 0.8 * (micron - 1.2);
    }

    static PreparedSpectrum prepared(Spectrum spectrum, double resolvingPower) {
        return new PreparedSpectrum(
                spectrum,
                new ResolvingPower(resolvingPower, Basis.GIVEN),
                NoiseModel.INDEPENDENT,
                List.of());
    }
}
