package emberline.place.standard;

import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import java.util.List;
import java.util.function.DoubleUnaryOperator;

/** Invented standards of simple shape. */
final class FlatStandards {

    private FlatStandards() {}

    static Standard of(String name, double type, double flux) {
        return of(name, type, 120, 0.65, 2.45, w -> flux);
    }

    static Standard of(
            String name,
            double type,
            double resolvingPower,
            double lowMicron,
            double highMicron,
            DoubleUnaryOperator flux) {
        int size = 600;
        double step = (highMicron - lowMicron) / size;
        double[] wavelengths = new double[size];
        double[] fluxes = new double[size];
        double[] sigmas = new double[size];
        for (int i = 0; i < size; i++) {
            wavelengths[i] = lowMicron + i * step;
            fluxes[i] = flux.applyAsDouble(wavelengths[i]);
            sigmas[i] = 0.01 * fluxes[i];
        }
        return new Standard(
                name,
                type,
                name,
                "",
                new PreparedSpectrum(
                        Spectrum.of(wavelengths, fluxes, sigmas),
                        new ResolvingPower(resolvingPower, ResolvingPower.Basis.GIVEN),
                        NoiseModel.INDEPENDENT,
                        List.of()));
    }

    static StandardLibrary.Level level(Standard... standards) {
        return new StandardLibrary.Level(List.of(standards), new CommonGrid(60));
    }
}
