package emberline.demo;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import nom.tam.fits.BasicHDU;
import nom.tam.fits.Fits;
import nom.tam.fits.FitsException;
import nom.tam.fits.Header;
import nom.tam.fits.header.Standard;
import nom.tam.util.FitsOutputStream;

/** FITS files made of image HDUs, as bytes. */
final class FitsBytes {

    private FitsBytes() {}

    /** An image HDU of an array of float. */
    static BasicHDU<?> image(Object array) throws IOException {
        try {
            return Fits.makeHDU(array);
        } catch (FitsException e) {
            throw new IOException("an image could not be made into a FITS HDU", e);
        }
    }

    /** Writes what every file of the survey says about itself. */
    static void describe(Header header, Exposure exposure) {
        header.addValue("OBJECT", exposure.object(), "invented object");
        header.addValue("INSTRUME", exposure.instrument().name(), "invented spectrograph");
        header.addValue("SPEC_RP", exposure.instrument().resolvingPower(), "resolving power");
        header.addValue("MEDIUM", exposure.air() ? "air" : "vacuum", "of the wavelengths");
        if (!exposure.fluxUnit().plain().isEmpty()) {
            header.addValue("BUNIT", exposure.fluxUnit().plain(), "unit of the flux");
        }
    }

    /** The bytes of a file of HDUs. */
    static byte[] of(BasicHDU<?>... units) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (Fits fits = new Fits();
                FitsOutputStream stream = new FitsOutputStream(bytes)) {
            for (BasicHDU<?> unit : units) {
                fits.addHDU(unit);
            }
            // The library writes the time of day into this comment; the survey must not depend on
            // it.
            units[0].getHeader().findCard(Standard.SIMPLE).setComment("conforms to FITS standard");
            fits.write(stream);
        } catch (FitsException e) {
            throw new IOException("a FITS file could not be written", e);
        }
        return bytes.toByteArray();
    }

    /** Rounds to single precision. */
    static float[] floats(double[] values) {
        float[] floats = new float[values.length];
        for (int i = 0; i < values.length; i++) {
            floats[i] = (float) values[i];
        }
        return floats;
    }
}
