package emberline.demo;

import emberline.spectrum.AirToVacuum;

/** The columns of a file: a spectrum in the units and the medium of its exposure. */
final class FileColumns {

    private final double[] wavelength;
    private final double[] flux;
    private final double[] sigma;

    private FileColumns(double[] wavelength, double[] flux, double[] sigma) {
        this.wavelength = wavelength;
        this.flux = flux;
        this.sigma = sigma;
    }

    /**
     * Converts a spectrum.
     *
     * @param spectrum in vacuum and erg/s/cm2/A
     * @param exposure the units and the medium of the file
     * @return the columns
     */
    static FileColumns of(ObservedSpectrum spectrum, Exposure exposure) {
        int size = spectrum.size();
        double[] wavelength = new double[size];
        double[] flux = new double[size];
        double[] sigma = new double[size];
        for (int i = 0; i < size; i++) {
            double vacuum = spectrum.micron(i);
            double written = exposure.air() ? AirToVacuum.airMicron(vacuum) : vacuum;
            wavelength[i] = exposure.wavelengthUnit().of(written);
            flux[i] = exposure.fluxUnit().of(spectrum.flux(i), vacuum);
            sigma[i] = exposure.fluxUnit().of(spectrum.sigma(i), vacuum);
        }
        return new FileColumns(wavelength, flux, sigma);
    }

    double[] wavelength() {
        return wavelength.clone();
    }

    double[] flux() {
        return flux.clone();
    }

    double[] sigma() {
        return sigma.clone();
    }
}
