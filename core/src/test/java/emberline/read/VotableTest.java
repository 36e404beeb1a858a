package emberline.read;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import uk.ac.starlink.ecsv.EcsvTableWriter;
import uk.ac.starlink.table.ColumnData;
import uk.ac.starlink.table.ColumnInfo;
import uk.ac.starlink.table.ColumnStarTable;
import uk.ac.starlink.table.PrimitiveArrayColumn;
import uk.ac.starlink.table.StarTableWriter;
import uk.ac.starlink.votable.DataFormat;
import uk.ac.starlink.votable.VOTableVersion;
import uk.ac.starlink.votable.VOTableWriter;

/** VOTable and ECSV written by the table library, read back; and what must never be followed. */
class VotableTest {

    @TempDir Path folder;

    private static ColumnInfo info(String name, String unit, String ucd) {
        ColumnInfo info = new ColumnInfo(name, Double.class, "");
        info.setUnitString(unit);
        info.setUCD(ucd);
        return info;
    }

    private static double[][] numbers() {
        SplittableRandom random = new SplittableRandom(5);
        double[][] columns = new double[3][400];
        for (int i = 0; i < 400; i++) {
            columns[0][i] = 1 + 0.002 * (i + 0.4 * random.nextDouble());
            columns[1][i] = i % 50 == 7 ? Double.NaN : random.nextDouble(-1, 3) * 1e-15;
            columns[2][i] = random.nextDouble(0.1, 0.2) * 1e-15;
        }
        return columns;
    }

    private static byte[] written(StarTableWriter writer, double[][] numbers) throws IOException {
        ColumnStarTable table = ColumnStarTable.makeTableWithRows(numbers[0].length);
        ColumnInfo[] infos = {
            info("wavelength", "um", "em.wl"),
            info("flux", "W.m-2.um-1", "phot.flux.density"),
            info("flux_error", "W.m-2.um-1", "stat.error;phot.flux.density")
        };
        for (int i = 0; i < 3; i++) {
            ColumnData data = PrimitiveArrayColumn.makePrimitiveColumn(infos[i], numbers[i]);
            table.addColumn(data);
        }
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        writer.writeStarTable(table, out);
        return out.toByteArray();
    }

    private static void assertSame(double[][] numbers, Observation read) {
        assertEquals(numbers[0].length, read.size());
        double[] sigma = read.fluxSigmas().orElseThrow();
        for (int i = 0; i < read.size(); i++) {
            assertEquals(numbers[0][i], read.wavelengthsMicron()[i]);
            assertEquals(numbers[1][i], read.fluxes()[i]);
            assertEquals(Double.isNaN(numbers[1][i]) ? Double.NaN : numbers[2][i], sigma[i]);
        }
        assertEquals(0, read.findings().size(), read.findings().toString());
    }

    @Test
    void everySerialisationIsReadToTheLastDigit() throws IOException {
        double[][] numbers = numbers();
        for (DataFormat format :
                new DataFormat[] {DataFormat.TABLEDATA, DataFormat.BINARY, DataFormat.BINARY2}) {
            byte[] file = written(new VOTableWriter(format, true, VOTableVersion.V13), numbers);
            Observation read = new SpectrumReader().read(file, "spectrum");
            assertEquals("VOTable, 3 columns", read.format());
            assertSame(numbers, read);
        }
    }

    @Test
    void ecsvIsReadToTheLastDigit() throws IOException {
        double[][] numbers = numbers();
        byte[] file = written(EcsvTableWriter.SPACE_WRITER, numbers);
        Observation read = new SpectrumReader().read(file, "spectrum");
        assertEquals("ECSV table, 3 columns", read.format());
        assertSame(numbers, read);
    }

    @Test
    void aNearbyFileIsNeverReadForAnEntityOrAStream() throws IOException {
        Path secret = Files.writeString(folder.resolve("secret.txt"), "1.5");
        String head =
                "<VOTABLE version='1.3'><RESOURCE><TABLE>"
                        + "<FIELD name='wavelength' datatype='double' unit='um'/>"
                        + "<FIELD name='flux' datatype='double'/><DATA>";
        String tail = "</DATA></TABLE></RESOURCE></VOTABLE>";
        String entity =
                "<?xml version='1.0'?><!DOCTYPE VOTABLE [<!ENTITY e SYSTEM '"
                        + secret.toUri()
                        + "'>]>"
                        + head
                        + "<TABLEDATA><TR><TD>1</TD><TD>&e;</TD></TR></TABLEDATA>"
                        + tail;
        String stream = head + "<BINARY><STREAM href='" + secret.toUri() + "'/></BINARY>" + tail;
        for (String text : new String[] {entity, stream}) {
            String message = refusal(text);
            assertFalse(message.contains("1.5"), message);
            assertTrue(
                    message.contains("DOCTYPE") || message.contains("STREAM with href"), message);
        }
    }

    private static String refusal(String text) {
        return assertThrows(
                        UnreadableSpectrumException.class,
                        () ->
                                new SpectrumReader()
                                        .read(text.getBytes(StandardCharsets.UTF_8), "v.xml"))
                .getMessage();
    }

    @Test
    void textThatLooksLikeACommandIsOnlyText() throws IOException {
        Path made = folder.resolve("made");
        refusal("<touch " + made + "\n1 2\n3 4\n");
        assertFalse(Files.exists(made), "a command was run");
    }

    @Test
    void elementsNestedWithoutEndAreRefused() {
        String message = refusal("<VOTABLE>" + "<RESOURCE>".repeat(200));
        assertTrue(message.contains("elements nested more than 100 deep"), message);
    }

    @Test
    void rowsOfArraysThatTheFileCannotHoldAreRefused() {
        String text =
                "<VOTABLE version='1.3'><RESOURCE><TABLE>"
                        + "<FIELD name='wavelength' datatype='double' arraysize='20000'/>"
                        + "<FIELD name='flux' datatype='double' arraysize='20000'/><DATA><TABLEDATA>"
                        + "<TR><TD/><TD/></TR>".repeat(3000)
                        + "</TABLEDATA></DATA></TABLE></RESOURCE></VOTABLE>";
        assertTrue(refusal(text).contains("rows declared to hold more numbers than a file of"));
    }

    @ParameterizedTest
    @ValueSource(strings = {"votable", "ecsv"})
    void damagedTablesNeverEscapeTheMessage(String kind) throws IOException {
        SplittableRandom random = new SplittableRandom(13);
        byte[] whole =
                written(
                        kind.equals("ecsv")
                                ? EcsvTableWriter.SPACE_WRITER
                                : new VOTableWriter(DataFormat.TABLEDATA, true, VOTableVersion.V13),
                        numbers());
        int refused = 0;
        for (int trial = 0; trial < 150; trial++) {
            byte[] damaged = whole.clone();
            int place = random.nextInt(Math.min(2500, damaged.length));
            damaged[place] = (byte) (32 + random.nextInt(95));
            try {
                new SpectrumReader().read(damaged, "damaged");
            } catch (UnreadableSpectrumException e) {
                refused++;
            }
        }
        assertTrue(refused > 10, "only " + refused + " were refused");
    }
}
