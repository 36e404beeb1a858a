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

    static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();

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

    /** A noiseless spectrum from 0.6 to 2.5 micron, fine enough for windows of a few Angstrom. */
    static PreparedSpectrum fine(DoubleUnaryOperator fluxOfMicron) {
        return of(0.6, 2.5, 1e-5, 20_000, 1e-9, fluxOfMicron);
    }

    static PreparedSpectrum prepared(Spectrum spectrum, double resolvingPower) {
        return new PreparedSpectrum(
                spectrum,
                new ResolvingPower(resolvingPower, Basis.GIVEN),
                NoiseModel.INDEPENDENT,
                List.of());
    }

    static Measurements measure(PreparedSpectrum prepared) {
        return new Measurer(CATALOGUE, Measuring.withDefaults()).measure(prepared);
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
