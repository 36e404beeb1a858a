package emberline.demo;

import java.io.IOException;
import nom.tam.fits.BasicHDU;

/** Writes a FITS image of three rows: wavelength, flux and sigma. */
final class FitsRowsFile implements SpectrumFile {

    @Override
    public byte[] bytes(ObservedSpectrum spectrum, Exposure exposure) throws IOException {
        FileColumns columns = FileColumns.of(spectrum, exposure);
        float[][] rows = {
            FitsBytes.floats(columns.wavelength()),
            FitsBytes.floats(columns.flux()),
            FitsBytes.floats(columns.sigma())
        };
        BasicHDU<?> image = FitsBytes.image(rows);
        FitsBytes.describe(image.getHeader(), exposure);
        image.getHeader().addValue("XUNITS", exposure.wavelengthUnit().symbol(), "of row 1");
        image.getHeader().addValue("YUNITS", exposure.fluxUnit().plain(), "of rows 2 and 3");
        return FitsBytes.of(image);
    }
}
