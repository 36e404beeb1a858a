package emberline.demo;

import java.io.IOException;
import nom.tam.fits.BasicHDU;
import nom.tam.fits.Header;

/**
 * Writes a FITS image of the flux with the wavelengths as keywords, linear or logarithmic as the
 * pixels of the instrument are; the noise, where asked for, goes into an extension.
 */
final class FitsImageFile implements SpectrumFile {

    @Override
    public byte[] bytes(ObservedSpectrum spectrum, Exposure exposure) throws IOException {
        FileColumns columns = FileColumns.of(spectrum, exposure);
        BasicHDU<?> flux = FitsBytes.image(FitsBytes.floats(columns.flux()));
        FitsBytes.describe(flux.getHeader(), exposure);
        addWavelengths(flux.getHeader(), columns.wavelength(), exposure);
        if (!exposure.withSigma()) {
            return FitsBytes.of(flux);
        }
        BasicHDU<?> sigma = FitsBytes.image(FitsBytes.floats(columns.sigma()));
        sigma.getHeader().addValue("EXTNAME", "SIGMA", "one-sigma noise of the flux");
        return FitsBytes.of(flux, sigma);
    }

    private static void addWavelengths(Header header, double[] wavelength, Exposure exposure) {
        boolean log = exposure.instrument().logarithmic();
        double first = log ? StrictMath.log10(wavelength[0]) : wavelength[0];
        int last = wavelength.length - 1;
        double end = log ? StrictMath.log10(wavelength[last]) : wavelength[last];
        header.addValue("CTYPE1", log ? "LOGLAM" : "WAVE", log ? "log10 of wavelength" : "");
        header.addValue("CUNIT1", exposure.wavelengthUnit().symbol(), "");
        header.addValue("CRPIX1", 1.0, "");
        header.addValue("CRVAL1", first, "");
        header.addValue("CDELT1", (end - first) / last, "");
        if (log) {
            header.addValue("DC-FLAG", 1, "logarithmic wavelengths");
        }
    }
}
