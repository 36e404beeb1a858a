package emberline.place.kind;

import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import java.util.List;
import java.util.function.DoubleUnaryOperator;

/** Spectra without noise of a given shape. */
final class InventedSpectra {

    private InventedSpectra() {}

    /** With 2.5 pixels a resolution element. */
    static PreparedSpectrum of(
            double lowMicron,
            double highMicron,
            double resolvingPower,
            DoubleUnaryOperator flux,
            double sigma) {
        double step = 1 / (2.5 * resolvingPower);
        int size = (int) (Math.log(highMicron / lowMicron) / step) + 1;
        double[] wavelengths = new double[size];
        double[] fluxes = new double[size];
        double[] sigmas = new double[size];
        for (int i = 0; i < size; i++) {
            wavelengths[i] = lowMicron * Math.exp(i * step);
            fluxes[i] = flux.applyAsDouble(wavelengths[i]);
            sigmas[i] = sigma;
        }
        return new PreparedSpectrum(
                Spectrum.of(wavelengths, fluxes, sigmas),
                new ResolvingPower(resolvingPower, ResolvingPower.Basis.GIVEN),
                NoiseModel.INDEPENDENT,
                List.of());
    }
}
