package emberline.read;

import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Map;
import java.util.SplittableRandom;
import nom.tam.fits.BinaryTable;
import nom.tam.fits.BinaryTableHDU;
import nom.tam.fits.NullDataHDU;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class BadFitsTest {

    private static byte[] image() {
        double[][] rows = new double[3][2000];
        for (int i = 0; i < 2000; i++) {
            rows[0][i] = 0.8 + 0.001 * i;
            rows[1][i] = 1 + Math.sin(i);
            rows[2][i] = 0.1;
        }
        return FitsFiles.image(rows, Map.of("XUNITS", "um", "YUNITS", "W/m2/um"));
    }

    private static byte[] table() {
        BinaryTable table = new BinaryTable();
        double[] wave = new double[500];
        for (int i = 0; i < wave.length; i++) {
            wave[i] = 1 + i;
        }
        table.addColumn(wave);
        table.addColumn(wave.clone());
        BinaryTableHDU hdu = table.toHDU();
        FitsFiles.add(hdu.getHeader(), Map.of("TTYPE1", "wave", "TTYPE2", "flux"));
        return FitsFiles.file(new NullDataHDU(), hdu);
    }

    private static byte[] header(String... cards) {
        StringBuilder text = new StringBuilder();
        for (String card : cards) {
            text.append(String.format("%-80s", card));
        }
        text.append(String.format("%-80s", "END"));
        return String.format("%-2880s", text).getBytes(StandardCharsets.US_ASCII);
    }

    private static String refusal(byte[] file) {
        String message =
                assertThrows(
                                UnreadableSpectrumException.class,
                                () -> new SpectrumReader().read(file, "bad.fits"))
                        .getMessage();
        assertTrue(message.contains("; expected ") && message.endsWith("."), message);
        return message;
    }

    @Test
    void hugeDeclaredSizeIsRefusedBeforeMemoryIsTaken() {
        byte[] file =
                header(
                        "SIMPLE  =                    T",
                        "BITPIX  =                  -64",
                        "NAXIS   =                    1",
                        "NAXIS1  =           2000000000");
        assertTrue(
                refusal(file)
                        .contains(
                                "bad.fits, HDU 0: the header declares 16000000000 bytes of data but"
                                        + " the file has 0; expected a whole FITS file"));
    }

    @Test
    void sizesThatOverflowAreRefused() {
        byte[] file =
                header(
                        "SIMPLE  =                    T",
                        "BITPIX  =                   64",
                        "NAXIS   =                    3",
                        "NAXIS1  =           2147483647",
                        "NAXIS2  =           2147483647",
                        "NAXIS3  =           2147483647");
        assertTrue(refusal(file).contains("bytes of data but the file has 0"));
        byte[] axes =
                header(
                        "SIMPLE  =                    T",
                        "BITPIX  =                   64",
                        "NAXIS   =           2147483647");
        assertTrue(refusal(axes).contains("NAXIS = 2147483647; expected 0 to 999 axes"));
        byte[] missing =
                header(
                        "SIMPLE  =                    T",
                        "BITPIX  =                   64",
                        "NAXIS   =                    1");
        assertTrue(refusal(missing).contains("no valid keyword NAXIS1"));
    }

    @Test
    void cellsWiderThanTheRowAreRefused() {
        byte[] primary =
                header(
                        "SIMPLE  =                    T",
                        "BITPIX  =                    8",
                        "NAXIS   =                    0");
        byte[] table =
                header(
                        "XTENSION= 'BINTABLE'",
                        "BITPIX  =                    8",
                        "NAXIS   =                    2",
                        "NAXIS1  =                   16",
                        "NAXIS2  =                    1",
                        "PCOUNT  =                    0",
                        "GCOUNT  =                    1",
                        "TFIELDS =                    2",
                        "TFORM1  = '2000000000D'",
                        "TTYPE1  = 'wave    '",
                        "TFORM2  = '2000000000D'",
                        "TTYPE2  = 'flux    '");
        byte[] file = Arrays.copyOf(primary, 3 * 2880);
        System.arraycopy(table, 0, file, 2880, 2880);
        assertTrue(refusal(file).contains("HDU 1: "));
    }

    @ParameterizedTest
    @ValueSource(ints = {9, 80, 1000, 2879, 2880, 3000, 20000, 50000})
    void cutOffImageIsRefused(int length) {
        String message = refusal(Arrays.copyOf(image(), length));
        assertTrue(message.contains("cut off"), message);
    }

    @Test
    void onlyTheFillingIsMissing() throws UnreadableSpectrumException {
        byte[] file = image();
        int data = 2880 + 3 * 2000 * 8;
        assertTrue(
                new SpectrumReader().read(Arrays.copyOf(file, data), "short.fits").size() == 2000);
    }

    @Test
    void otherFilesNamedFitsAreToldWhatTheyAre() {
        assertTrue(refusal(bytes("\u0089PNG\r\n\u001a\n....")).contains("bad.fits: a PNG picture"));
        assertTrue(refusal(bytes("%PDF-1.7 ...")).contains("a PDF document"));
        assertTrue(refusal(bytes("PK\u0003\u0004....")).contains("a ZIP archive"));
        assertTrue(refusal(bytes("<html><body>no</body></html>")).contains("a web page (HTML)"));
        assertTrue(refusal(bytes("\u00ff\u00d8\u00ff\u00e0JFIF")).contains("a JPEG picture"));
        assertTrue(refusal(bytes("BZh91AY")).contains("a bzip2 archive"));
        assertTrue(refusal(bytes("\u0089HDF\r\n")).contains("an HDF5 file"));
        assertTrue(refusal(bytes("\u0093NUMPY\u0001")).contains("a NumPy array file"));
        assertTrue(refusal(bytes("\u00ff\u00fe1\u00000\u0000")).contains("text in UTF-16"));
        assertTrue(refusal(bytes("\0\0\1\2\3")).contains("binary data of an unknown kind"));
    }

    private static byte[] bytes(String latin) {
        return latin.getBytes(StandardCharsets.ISO_8859_1);
    }

    /** Whatever one byte is changed to, the answer is a spectrum or a message, nothing else. */
    @Test
    void damagedFilesNeverEscapeTheMessage() {
        SplittableRandom random = new SplittableRandom(11);
        int refused = 0;
        for (byte[] whole : new byte[][] {image(), table()}) {
            for (int trial = 0; trial < 600; trial++) {
                byte[] damaged = whole.clone();
                int changes = 1 + random.nextInt(3);
                for (int i = 0; i < changes; i++) {
                    int place = random.nextInt(Math.min(damaged.length, 3 * 2880));
                    damaged[place] = (byte) (32 + random.nextInt(95));
                }
                try {
                    new SpectrumReader().read(damaged, "damaged.fits");
                } catch (UnreadableSpectrumException e) {
                    refused++;
                }
            }
        }
        assertTrue(refused > 50, "only " + refused + " were refused");
    }
}
