package emberline.demo;

import java.io.BufferedOutputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import nom.tam.fits.BasicHDU;

/**
 * Writes a survey of any size to measure speed with: the spectra of the invented survey over and
 * over, each time with another radial velocity (50 km/s, one sigma) and more noise. Nothing of it
 * is kept in the project. The same number gives the same bytes, and object by object the same
 * spectra in both forms.
 *
 * <p>Call with three arguments: a folder, the number of objects, and {@code files} (a FITS image of
 * three rows each, with {@code list.csv}) or {@code packed} (one FITS table {@code packed.fits}
 * with a row for each object and arrays of variable length).
 */
public final class MakeLargeSurvey {

    private static final int FILES_A_FOLDER = 1000;
    private static final int NAME_LETTERS = 16;
    private static final int BLOCK = 2880;

    private final RepeatedObjects objects = new RepeatedObjects();
    private final Path folder;
    private final int count;

    private MakeLargeSurvey(Path folder, int count) {
        this.folder = folder;
        this.count = count;
    }

    /**
     * Writes a survey.
     *
     * @param arguments folder, number of objects, {@code files} or {@code packed}
     * @throws IOException if a file cannot be written
     * @throws IllegalArgumentException if the arguments are not these
     */
    public static void main(String[] arguments) throws IOException {
        if (arguments.length != 3 || !arguments[2].matches("files|packed")) {
            throw new IllegalArgumentException(
                    "expected three arguments: FOLDER NUMBER files|packed");
        }
        MakeLargeSurvey maker =
                new MakeLargeSurvey(Path.of(arguments[0]), Integer.parseInt(arguments[1]));
        Files.createDirectories(maker.folder);
        if (arguments[2].equals("files")) {
            maker.writeFiles();
        } else {
            maker.writePacked();
        }
    }

    private static String name(int number) {
        return String.format(Locale.ROOT, "Large-%07d", number);
    }

    private void writeFiles() throws IOException {
        try (Writer list = Files.newBufferedWriter(folder.resolve("list.csv"))) {
            list.write("name,spectrum,medium,resolution\n");
            for (int number = 0; number < count; number++) {
                String file =
                        String.format(
                                Locale.ROOT,
                                "spectra/%04d/%s.fits",
                                number / FILES_A_FOLDER,
                                name(number));
                if (number % FILES_A_FOLDER == 0) {
                    Files.createDirectories(folder.resolve(file).getParent());
                }
                Files.write(folder.resolve(file), image(objects.spectrum(number)));
                list.write(
                        String.format(
                                Locale.ROOT,
                                "%s,%s,vacuum,%.0f%n",
                                name(number),
                                file,
                                objects.resolvingPower(number)));
            }
        }
    }

    private static byte[] image(ObservedSpectrum spectrum) throws IOException {
        float[][] rows = {
            FitsBytes.floats(spectrum.microns()),
            FitsBytes.floats(spectrum.fluxes()),
            FitsBytes.floats(spectrum.sigmas())
        };
        BasicHDU<?> image = FitsBytes.image(rows);
        image.getHeader().addValue("XUNITS", "um", "of row 1");
        image.getHeader().addValue("YUNITS", "erg/s/cm2/A", "of rows 2 and 3");
        return FitsBytes.of(image);
    }

    private void writePacked() throws IOException {
        long heap = 0;
        for (int number = 0; number < count; number++) {
            heap += 12L * objects.pixels(number);
        }
        int rowBytes = NAME_LETTERS + 8 + 8 + 3 * 16;
        try (DataOutputStream out =
                new DataOutputStream(
                        new BufferedOutputStream(
                                Files.newOutputStream(folder.resolve("packed.fits")), 1 << 16))) {
            out.write(cards("SIMPLE  = T", "BITPIX  = 8", "NAXIS   = 0", "EXTEND  = T"));
            out.write(tableHeader(rowBytes, heap));
            long at = 0;
            for (int number = 0; number < count; number++) {
                out.write(text(name(number), NAME_LETTERS));
                out.write(text("vacuum", 8));
                out.writeDouble(objects.resolvingPower(number));
                for (int column = 0; column < 3; column++) {
                    out.writeLong(objects.pixels(number));
                    out.writeLong(at);
                    at += 4L * objects.pixels(number);
                }
            }
            for (int number = 0; number < count; number++) {
                ObservedSpectrum spectrum = objects.spectrum(number);
                for (double[] values :
                        new double[][] {spectrum.microns(), spectrum.fluxes(), spectrum.sigmas()}) {
                    for (float value : FitsBytes.floats(values)) {
                        out.writeFloat(value);
                    }
                }
            }
            long data = (long) rowBytes * count + heap;
            out.write(new byte[(int) ((BLOCK - data % BLOCK) % BLOCK)]);
        }
    }

    private byte[] tableHeader(int rowBytes, long heap) {
        return cards(
                "XTENSION= 'BINTABLE'",
                "BITPIX  = 8",
                "NAXIS   = 2",
                "NAXIS1  = " + rowBytes,
                "NAXIS2  = " + count,
                "PCOUNT  = " + heap,
                "GCOUNT  = 1",
                "TFIELDS = 6",
                "TTYPE1  = 'name'",
                "TFORM1  = '" + NAME_LETTERS + "A'",
                "TTYPE2  = 'medium'",
                "TFORM2  = '8A'",
                "TTYPE3  = 'resolution'",
                "TFORM3  = 'D'",
                "TTYPE4  = 'wavelength'",
                "TFORM4  = '1QE'",
                "TUNIT4  = 'um'",
                "TTYPE5  = 'flux'",
                "TFORM5  = '1QE'",
                "TUNIT5  = 'erg/s/cm2/A'",
                "TTYPE6  = 'sigma'",
                "TFORM6  = '1QE'",
                "TUNIT6  = 'erg/s/cm2/A'");
    }

    private static byte[] text(String text, int length) {
        return String.format(Locale.ROOT, "%-" + length + "s", text)
                .getBytes(StandardCharsets.US_ASCII);
    }

    /** Header blocks; numbers and truth values end in column 30. */
    private static byte[] cards(String... cards) {
        StringBuilder text = new StringBuilder();
        for (String card : cards) {
            String value = card.substring(10);
            text.append(
                    String.format(
                            Locale.ROOT,
                            "%-80s",
                            card.substring(0, 10)
                                    + (value.startsWith("'")
                                            ? value
                                            : String.format(Locale.ROOT, "%20s", value))));
        }
        text.append(String.format(Locale.ROOT, "%-80s", "END"));
        while (text.length() % BLOCK != 0) {
            text.append(' ');
        }
        return text.toString().getBytes(StandardCharsets.US_ASCII);
    }
}
