package emberline.read;

import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import emberline.spectrum.ResolvingPower;
import java.util.List;
import java.util.Optional;
import java.util.function.IntFunction;

/**
 * A spectrum as it stands in a file, before units are converted and pixels ordered: the common form
 * into which every format is read.
 *
 * @param format the format in words
 * @param samples the numbers
 * @param units what they are counted in, as written
 * @param medium the medium as the file states it
 * @param resolvingPower the resolving power as the file states it
 * @param findings what was found so far
 * @param place names a pixel by its index in the words of the format, e.g. {@code line 12}
 */
record RawSpectrum(
        String format,
        Samples samples,
        Units units,
        Optional<Medium> medium,
        Optional<ResolvingPower> resolvingPower,
        List<Finding> findings,
        IntFunction<String> place) {

    RawSpectrum {
        findings = List.copyOf(findings);
    }

    /**
     * What the numbers are counted in, as written.
     *
     * @param scale whether wavelengths or their logarithms are given
     * @param wavelength unit of the wavelength, empty where not stated
     * @param flux unit of the flux, empty where not stated
     * @param noiseKind what the noise numbers are
     * @param noise unit of the noise, empty where not stated
     */
    record Units(
            WavelengthUnit.Scale scale,
            Optional<String> wavelength,
            Optional<String> flux,
            ColumnRoles.NoiseKind noiseKind,
            Optional<String> noise) {}

    /**
     * The numbers of a spectrum: parallel arrays that this package hands on and never writes to
     * once they are here.
     */
    static final class Samples {
        private final double[] wavelengths;
        private final double[] fluxes;
        private final Optional<double[]> noise;
        private final Optional<double[]> mask;

        /**
         * Takes parallel arrays.
         *
         * @param noise noise of the flux, where there is one
         * @param mask marks of bad pixels, 0 = good, where there are any
         */
        Samples(
                double[] wavelengths,
                double[] fluxes,
                Optional<double[]> noise,
                Optional<double[]> mask) {
            this.wavelengths = wavelengths;
            this.fluxes = fluxes;
            this.noise = noise;
            this.mask = mask;
        }

        double[] wavelengths() {
            return wavelengths;
        }

        double[] fluxes() {
            return fluxes;
        }

        Optional<double[]> noise() {
            return noise;
        }

        Optional<double[]> mask() {
            return mask;
        }
    }
}
