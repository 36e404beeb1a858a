package emberline.read;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.Map;
import nom.tam.fits.BasicHDU;
import nom.tam.fits.Fits;
import nom.tam.fits.Header;
import nom.tam.fits.ImageData;
import nom.tam.fits.ImageHDU;
import nom.tam.util.FitsOutputStream;

/** Makes FITS files by the FITS library. */
final class FitsFiles {

    private FitsFiles() {}

    /** A file with an image as its primary unit. */
    static byte[] image(Object array, Map<String, Object> keywords) {
        return file(imageHdu(array, keywords));
    }

    static ImageHDU imageHdu(Object array, Map<String, Object> keywords) {
        try {
            ImageHDU hdu = ImageData.from(array).toHDU();
            add(hdu.getHeader(), keywords);
            return hdu;
        } catch (RuntimeException e) {
            throw new IllegalStateException(e);
        }
    }

    static byte[] file(BasicHDU<?>... units) {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (Fits fits = new Fits()) {
            for (BasicHDU<?> unit : units) {
                fits.addHDU(unit);
            }
            fits.write(new FitsOutputStream(bytes));
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
        return bytes.toByteArray();
    }

    static void add(Header header, Map<String, Object> keywords) {
        keywords.forEach(
                (key, value) -> {
                    if (value instanceof Number number) {
                        if (value instanceof Integer) {
                            header.addValue(key, number.intValue(), "");
                        } else {
                            header.addValue(key, number.doubleValue(), "");
                        }
                    } else if (value instanceof Boolean flag) {
                        header.addValue(key, flag, "");
                    } else {
                        header.addValue(key, value.toString(), "");
                    }
                });
    }
}
