package emberline.read;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Arrays;
import java.util.Map;
import java.util.stream.Stream;
import java.util.zip.GZIPOutputStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Files made to harm: each is refused soon, with a message, and without touching anything else. */
class HostileFilesTest {

    private static final Duration SOON = Duration.ofSeconds(20);

    @TempDir private Path folder;

    private static String refusal(byte[] file) {
        return assertTimeoutPreemptively(
                SOON,
                () ->
                        assertThrows(
                                        UnreadableSpectrumException.class,
                                        () -> new SpectrumReader().read(file, "hostile"))
                                .getMessage());
    }

    private static byte[] utf8(String text) {
        return text.getBytes(StandardCharsets.UTF_8);
    }

    private static String votable(String prolog, String cell) {
        return prolog
                + "<VOTABLE version='1.3'><RESOURCE><TABLE>"
                + "<FIELD name='wavelength' datatype='double' unit='um'/>"
                + "<FIELD name='flux' datatype='double'/><DATA><TABLEDATA>"
                + "<TR><TD>1.0</TD><TD>"
                + cell
                + "</TD></TR><TR><TD>1.1</TD><TD>2</TD></TR>"
                + "</TABLEDATA></DATA></TABLE></RESOURCE></VOTABLE>";
    }

    /** Ten levels of ten: a thousand million words, were it ever expanded. */
    private static String laughs(String declaration) {
        StringBuilder text = new StringBuilder("<?xml version='1.0'?><!DOCTYPE VOTABLE [");
        text.append("<!ENTITY l0 'ha'>");
        for (int level = 1; level < 10; level++) {
            String below = "&l" + (level - 1) + ";";
            text.append("<!ENTITY l").append(level).append(" '");
            text.append(below.repeat(10)).append("'>");
        }
        return text.append(declaration).append("]>").toString();
    }

    static Stream<Arguments> entities() {
        return Stream.of(
                Arguments.of("billion laughs", votable(laughs(""), "&l9;")),
                Arguments.of(
                        "one long entity many times",
                        votable(
                                "<?xml version='1.0'?><!DOCTYPE VOTABLE [<!ENTITY a '"
                                        + "a".repeat(50_000)
                                        + "'>]>",
                                "&a;".repeat(50_000))),
                Arguments.of(
                        "parameter entity",
                        votable(
                                "<?xml version='1.0'?><!DOCTYPE VOTABLE [<!ENTITY % p SYSTEM"
                                        + " 'http://127.0.0.1:9/p.dtd'> %p;]>",
                                "1")),
                Arguments.of(
                        "external subset",
                        votable(
                                "<?xml version='1.0'?><!DOCTYPE VOTABLE SYSTEM"
                                        + " 'http://127.0.0.1:9/v.dtd'>",
                                "1")),
                Arguments.of("undeclared entity", votable("", "&nothing;")),
                Arguments.of(
                        "default attributes",
                        votable(
                                "<!DOCTYPE VOTABLE [<!ATTLIST STREAM href CDATA"
                                        + " 'http://127.0.0.1:9/data'>]>",
                                "1")));
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("entities")
    void entitiesAreRefusedBeforeTheyAreExpanded(String what, String text) {
        String message = refusal(utf8(text));
        assertTrue(message.contains("; expected "), message);
        assertTrue(message.length() < 600, "a message of " + message.length());
    }

    /** A declaration must not be hidden from the guard by how its letters are coded. */
    @ParameterizedTest
    @ValueSource(strings = {"UTF-16", "UTF-16LE", "UTF-16BE", "UTF-32", "IBM037", "IBM500"})
    void otherCodingsHideNothing(String charset) throws IOException {
        Path secret = Files.writeString(folder.resolve("secret.txt"), "1.5");
        String text =
                votable(
                        "<?xml version='1.0' encoding='"
                                + charset
                                + "'?><!DOCTYPE VOTABLE [<!ENTITY e SYSTEM '"
                                + secret.toUri()
                                + "'>]>",
                        "&e;");
        String coded = refusal(text.getBytes(Charset.forName(charset)));
        String claimed = refusal(text.getBytes(StandardCharsets.US_ASCII));
        assertFalse(coded.contains("1.5") || claimed.contains("1.5"), coded + claimed);
    }

    /** The header of an ECSV table is YAML, which has bombs and constructors of its own. */
    @ParameterizedTest
    @ValueSource(
            strings = {
                "a: &a [x,x,x,x,x,x,x,x,x]",
                "a: !!javax.script.ScriptEngineManager [!!java.net.URLClassLoader"
                        + " [[!!java.net.URL ['http://127.0.0.1:9/']]]]",
                "a: !!java.io.FileOutputStream [MADE]"
            })
    void yamlOfEcsvMakesNothing(String line) {
        StringBuilder header = new StringBuilder("# ");
        header.append('%').append("ECSV 1.0\n# ---\n");
        Path made = folder.resolve("made");
        header.append("# ").append(line.replace("MADE", made.toString())).append('\n');
        if (line.contains("&a")) {
            for (char level = 'b'; level < 'k'; level++) {
                String alias = "*" + (char) (level - 1);
                header.append("# " + level + ": &" + level + " [");
                header.append((alias + ",").repeat(8)).append(alias).append("]\n");
            }
        }
        header.append("# datatype:\n# - {name: wavelength, unit: um, datatype: float64}\n");
        header.append("# - {name: flux, datatype: float64}\nwavelength flux\n1.0 1\n1.1 2\n");
        assertTimeoutPreemptively(
                SOON,
                () -> {
                    try {
                        Observation read = new SpectrumReader().read(utf8("" + header), "y.ecsv");
                        assertEquals(2, read.size());
                    } catch (UnreadableSpectrumException e) {
                        assertTrue(e.getMessage().contains("; expected "), e.getMessage());
                    }
                });
        assertFalse(Files.exists(made), "a file was made");
    }

    private static byte[] zeros(int megabytes, int members) throws IOException {
        ByteArrayOutputStream packed = new ByteArrayOutputStream();
        for (int member = 0; member < members; member++) {
            try (GZIPOutputStream out = new GZIPOutputStream(packed)) {
                byte[] block = new byte[1 << 20];
                Arrays.fill(block, (byte) '1');
                for (int k = 0; k < megabytes; k++) {
                    out.write(block);
                }
            }
        }
        return packed.toByteArray();
    }

    /** The cap holds for the sum of all members of a file. */
    @ParameterizedTest
    @ValueSource(ints = {1, 2, 40})
    void gzipBombsStopAtTheCap(int members) throws IOException {
        byte[] bomb = zeros(80 / members, members);
        Runtime runtime = Runtime.getRuntime();
        String message = refusal(bomb);
        assertTrue(message.contains("bytes that unpack to more than"), message);
        assertTrue(message.contains("expected at most 512 MB"), message);
        assertTrue(runtime.totalMemory() <= runtime.maxMemory());
    }

    private static byte[] header(String... cards) {
        StringBuilder text = new StringBuilder();
        for (String card : cards) {
            text.append(String.format("%-80s", card));
        }
        text.append(String.format("%-80s", "END"));
        int blocks = (text.length() + 2879) / 2880;
        return String.format("%-" + 2880 * blocks + "s", text)
                .getBytes(StandardCharsets.ISO_8859_1);
    }

    private static byte[] primary(String bitpix, String... axes) {
        String[] cards = new String[3 + axes.length];
        cards[0] = "SIMPLE  =                    T";
        cards[1] = "BITPIX  = " + bitpix;
        cards[2] = "NAXIS   = " + axes.length;
        for (int k = 0; k < axes.length; k++) {
            cards[3 + k] = String.format("NAXIS%-3d= %s", k + 1, axes[k]);
        }
        return header(cards);
    }

    static Stream<Arguments> headers() {
        return Stream.of(
                Arguments.of("10^12 pixels", primary("-64", "1000000000000")),
                Arguments.of("10^12 pixels of two axes", primary("-32", "1000000", "1000000")),
                Arguments.of("more than a long holds", primary("64", "99999999999999999999")),
                Arguments.of(
                        "a product that overflows to 0",
                        primary("8", "65536", "65536", "65536", "65536")),
                Arguments.of("negative axis", primary("-64", "-5")),
                Arguments.of("two negative axes", primary("-64", "-40", "-50")),
                Arguments.of("a fraction of a pixel", primary("-64", "0.5")),
                Arguments.of("BITPIX of nothing", primary("0", "2000000000")),
                Arguments.of("odd BITPIX", primary("7", "100")),
                Arguments.of("BITPIX that overflows", primary("-2147483648", "1")),
                Arguments.of("not a number", primary("-64", "NaN")),
                Arguments.of("infinite", primary("-64", "1E400")),
                Arguments.of("words for numbers", primary("'many'", "'more'")),
                Arguments.of(
                        "negative groups",
                        header(
                                "SIMPLE  =                    T",
                                "BITPIX  =                  -64",
                                "NAXIS   =                    1",
                                "NAXIS1  =            500000000",
                                "GCOUNT  =                   -9",
                                "PCOUNT  =           -500000000")),
                Arguments.of("no END", Arrays.copyOf(primary("-64", "2"), 80)),
                Arguments.of("no END for long", blanks(3_000_000)),
                Arguments.of("CONTINUE without end", continued()),
                Arguments.of("NUL bytes in the header", nuls()),
                Arguments.of(
                        "letters beyond ASCII",
                        header("SIMPLE  =                    T", "OBJECT  = '\u00e9\u00ff'")));
    }

    private static byte[] blanks(int size) {
        byte[] start = "SIMPLE  =                    T".getBytes(StandardCharsets.US_ASCII);
        byte[] file = Arrays.copyOf(start, size);
        Arrays.fill(file, start.length, size, (byte) ' ');
        return file;
    }

    private static byte[] continued() {
        String[] cards = new String[20_000];
        Arrays.fill(cards, "CONTINUE  'and so on &'");
        cards[0] = "SIMPLE  =                    T";
        cards[1] = "BITPIX  =                    8";
        cards[2] = "NAXIS   =                    0";
        cards[3] = "LONGEST = 'begins &'";
        return header(cards);
    }

    private static byte[] nuls() {
        byte[] file = primary("-64", "2");
        Arrays.fill(file, 240, 700, (byte) 0);
        return file;
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("headers")
    void headersThatClaimTooMuchAreRefused(String what, byte[] file) {
        String message = refusal(file);
        assertTrue(message.contains("; expected ") && message.endsWith("."), message);
        assertTrue(message.length() < 1000, "a message of " + message.length());
        assertTrue(message.chars().allMatch(c -> c >= ' '), message);
    }

    /**
     * Numbers written in the wrong order of bytes are refused or read as what they say, not more.
     */
    @Test
    void wrongEndiannessIsNoSpectrumOrHasFindings() {
        double[][] rows = new double[2][500];
        for (int i = 0; i < 500; i++) {
            rows[0][i] = 0.8 + 0.002 * i;
            rows[1][i] = 1 + 0.1 * Math.sin(i);
        }
        byte[] file = FitsFiles.image(rows, Map.of());
        for (int at = 2880; at < 2880 + 8000; at += 8) {
            for (int k = 0; k < 4; k++) {
                byte swapped = file[at + k];
                file[at + k] = file[at + 7 - k];
                file[at + 7 - k] = swapped;
            }
        }
        String message = refusal(file);
        assertTrue(message.contains("; expected "), message);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "1.0 2\u0000\n1.1 3\n",
                "\u0000\u0000\u00001.0 2\n1.1 3\n",
                "wavelength_micron,flux\n1.0,\u00002\n1.1,3\n"
            })
    void nulBytesInTextAreRefused(String text) {
        assertTrue(refusal(utf8(text)).contains("; expected "));
    }

    private static String longText(int kind) {
        return switch (kind) {
            case 0 -> "9".repeat(2_000_000) + " 1\n1.1 2\n";
            case 1 -> "1e" + "9".repeat(100_000) + " 1\n1.1 2\n";
            case 2 -> "1 ".repeat(1_000_000) + "\n";
            case 3 -> "\"".repeat(1_000_001) + "\n1 2\n";
            case 4 -> "#".repeat(1_000_000) + "\n# unit: " + "(".repeat(200_000) + "\nw f\n";
            case 5 -> "a,".repeat(300_000) + "b\n" + "1,".repeat(300_000) + "2\n";
            case 6 -> "\n".repeat(3_000_000);
            default -> "wavelength (" + "m^2 ".repeat(50_000) + "),flux\n1,2\n2,3\n";
        };
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 1, 2, 3, 4, 5, 6, 7})
    void endlessLinesAndCellsAreRefusedSoon(int kind) {
        String message = refusal(utf8(longText(kind)));
        assertTrue(message.contains("; expected "), "no expectation");
        assertTrue(message.length() < 1000, "a message of " + message.length());
    }
}
