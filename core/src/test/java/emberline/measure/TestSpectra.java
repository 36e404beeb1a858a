package emberline.measure;

import emberline.catalogue.FeatureCatalogue;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.Spectrum;
import java.util.List;
import java.util.function.DoubleUnaryOperator;

/** Spectra with known fluxes. */
final class TestSpectra {

    private TestSpectra() {}

    static PreparedSpectrum of(
            double low,
            double high,
            double stepMicron,
            double resolvingPower,
            double relativeSigma,
            DoubleUnaryOperator fluxOfMicron) {
        int size = (int) Math.round((high - low) / stepMicron) + 1;
        double[] wavelengths = new double[size];
        double[] flux = new double[size];
        double[] sigma = new double[size];
        for (int i = 0; i < size; i++) {
            wavelengths[i] = low + i * stepMicron;
            flux[i] = fluxOfMicron.applyAsDouble(wavelengths[i]);
            sigma[i] = relativeSigma * Math.abs(flux[i]);
        }
        return prepared(Spectrum.of(wavelengths, flux, sigma), resolvingPower);
    }

    /**
     * A noiseless spectrum from 0.6 to 2.5 micron that is sampled finely enough for windows of a
     * few Angstrom in the optical and of a few nanometres in the infrared.
     */
    static PreparedSpectrum fine(DoubleUnaryOperator fluxOfMicron) {
        int optical = 40_500;
        int size = optical + 29_900;
        double[] wavelengths = new double[size];
        double[] flux = new double[size];
        double[] sigma = new double[size];
        for (int i = 0; i < size; i++) {
            wavelengths[i] = i < optical ? 0.6 + i * 1e-5 : 1.005 + (i - optical) * 5e-5;
            flux[i] = fluxOfMicron.applyAsDouble(wavelengths[i]);
            sigma[i] = 1e-9 * flux[i];
        }
        return prepared(Spectrum.of(wavelengths, flux, sigma), 20_000);
    }

    static PreparedSpectrum prepared(Spectrum spectrum, double resolvingPower) {
        return new PreparedSpectrum(
                spectrum,
                new ResolvingPower(resolvingPower, Basis.GIVEN),
                NoiseModel.INDEPENDENT,
                List.of());
    }

    static Measurements measure(PreparedSpectrum prepared) {
        return new Measurer(FeatureCatalogue.standard(), Measuring.withDefaults())
                .measure(prepared);
    }

    static double value(Measurements measurements, String id) {
        return measurements
                .measured(id)
                .orElseThrow(
                        () ->
                                new AssertionError(
                                        id + ": " + measurements.of(id).orElseThrow().result()))
                .value();
    }
}
