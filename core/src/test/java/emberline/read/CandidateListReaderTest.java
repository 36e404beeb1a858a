package emberline.read;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.spectrum.Candidate;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.zip.GZIPOutputStream;
import nom.tam.fits.BinaryTable;
import nom.tam.fits.BinaryTableHDU;
import nom.tam.fits.NullDataHDU;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class CandidateListReaderTest {

    @TempDir Path folder;

    private CandidateList read(String text) throws IOException {
        return read(text.getBytes(StandardCharsets.UTF_8));
    }

    private CandidateList read(byte[] bytes) throws IOException {
        return new CandidateListReader().read(Files.write(folder.resolve("list"), bytes));
    }

    private String refusal(String text) {
        return assertThrows(UnreadableListException.class, () -> read(text)).getMessage();
    }

    private static String problem(CandidateList list, int row) {
        return list.rows().get(row - 1).problem().orElse("");
    }

    @Test
    void rowsAreKeptWithTheirCells() throws IOException {
        CandidateList list =
                read(
                        """
                        Name,SPECTRUM,medium,resolution,ra_deg,J_mag,My Note
                        # a comment
                        A 1,a.fits; b/c.csv ,vacuum,2000,12.5,14.25,"good, I think"
                        B 2,b.fits,,,,,
                        """);
        assertEquals(
                List.of("name", "spectrum", "medium", "resolution", "ra_deg", "j_mag", "My Note"),
                list.columns());
        var first = list.rows().get(0).candidate();
        assertEquals("A 1", first.name());
        assertEquals(1, first.row());
        assertEquals(List.of("a.fits", "b/c.csv"), first.spectra());
        assertEquals(OptionalDouble.of(14.25), first.number("j_mag"));
        assertEquals(Optional.of("good, I think"), first.text("My Note"));
        assertEquals(Optional.empty(), list.rows().get(0).problem());
        assertEquals(Optional.empty(), list.rows().get(1).problem());
        assertEquals(2, list.rows().get(1).candidate().row());
        assertEquals(folder.resolve("list"), list.file());
    }

    @ParameterizedTest
    @ValueSource(strings = {"30000", "-30000", "31000.5"})
    void impossibleVelocitiesAreProblemsOfTheirRow(String velocity) throws IOException {
        CandidateList list = read("name,spectrum,rv_kms\nA,a.fits,29999\nB,b.fits," + velocity);
        assertEquals("", problem(list, 1));
        assertTrue(
                problem(list, 2)
                        .startsWith(
                                "row 2, column rv_kms: '"
                                        + velocity
                                        + "'; expected a velocity between -30000 and 30000 km/s. "),
                problem(list, 2));
    }

    @ParameterizedTest
    @ValueSource(strings = {"0", "-0.5"})
    void resolutionsThatAreNotPositiveAreProblemsOfTheirRow(String value) throws IOException {
        CandidateList list = read("name,spectrum,resolution\nA,a.fits," + value);
        assertTrue(
                problem(list, 1)
                        .startsWith(
                                "row 1, column resolution: '" + value + "'; expected a positive"),
                problem(list, 1));
    }

    @ParameterizedTest
    @ValueSource(strings = {",", ";", "\t"})
    void separatorIsTold(String separator) throws IOException {
        CandidateList list =
                read(
                        "\ufeffname,spectrum,note\nA,a.fits,x\nB,\"b.fits;c.fits\",y\n"
                                .replace(",", separator));
        assertEquals(List.of("name", "spectrum", "note"), list.columns());
        assertEquals(List.of("b.fits", "c.fits"), list.rows().get(1).candidate().spectra());
    }

    @Test
    void problemsAreSaidRowByRow() throws IOException {
        CandidateList list =
                read(
                        """
                        name,spectrum,medium,resolution,j_mag,parallax_mas
                        A,a.fits,vacuum,2000,14.2,5.5
                        a ,b.fits,vacuum,2000,14.2,5.5
                        ,c.fits,vacuum,2000,14.2,5.5
                        D,,vacuum,2000,14.2,5.5
                        E,e.fits,water,2000,14.2,5.5
                        F,f.fits,air,about 2000,14.2,5.5
                        G,g.fits,air,-5,14.2,5.5
                        H,h.fits,air,2000,bright,5.5
                        I,i.fits,air,2000
                        J,j.fits,air,2000,14.2,5.5,more
                        K,k.fits,AIR,2000,NaN,-1.5
                        """);
        assertEquals(11, list.rows().size());
        assertEquals("", problem(list, 1));
        assertEquals(
                "row 2, column name: 'a' stands in row 1 already; expected every name once. Rename"
                        + " it, or join its spectra by ; in one row.",
                problem(list, 2));
        assertTrue(problem(list, 3).startsWith("row 3, column name: no name; expected a name."));
        assertEquals("row 3", list.rows().get(2).candidate().name());
        assertTrue(problem(list, 4).startsWith("row 4, column spectrum: no path; expected"));
        assertTrue(
                problem(list, 5)
                        .startsWith("row 5, column medium: 'water'; expected air or vacuum."));
        assertTrue(
                problem(list, 6)
                        .startsWith(
                                "row 6, column resolution: 'about 2000'; expected a positive"
                                        + " number."));
        assertTrue(problem(list, 7).startsWith("row 7, column resolution: '-5'"));
        assertTrue(problem(list, 8).startsWith("row 8, column j_mag: 'bright'; expected a number"));
        assertTrue(problem(list, 9).startsWith("row 9: 4 cells; expected 6"));
        assertTrue(problem(list, 10).startsWith("row 10: 7 cells; expected 6"));
        assertEquals("", problem(list, 11));
    }

    @Test
    void filesThatAreNoListAreRefused() throws IOException {
        assertEquals(
                "list: no column 'spectrum' among name, path; expected the columns name and"
                        + " spectrum. Name the columns in the first line, separated by commas.",
                refusal("name,path\nA,a.fits\n"));
        assertTrue(refusal("spectrum\na.fits\n").contains("no column 'name' among spectrum"));
        assertTrue(refusal("name,spectrum\n").contains("no rows below the names"));
        assertTrue(refusal("").contains("an empty file (0 bytes)"));
        assertTrue(refusal("\n\n").contains("no line of column names"));
        assertTrue(refusal("name,spectrum,name\nA,a,B\n").contains("'name' stands twice"));
        assertTrue(
                refusal("name,spectrum\nA,\"a.fits\nB,b.fits")
                        .contains("a quote that is never closed"));
        assertTrue(refusal("<html></html>").contains("a web page (HTML); expected a candidate"));
        assertTrue(refusal("%PDF-1.4").contains("a PDF document"));
        byte[] image = FitsFiles.image(new double[] {1, 2}, Map.of());
        assertTrue(
                assertThrows(UnreadableListException.class, () -> read(image))
                        .getMessage()
                        .contains("a FITS file without a table"));
        assertTrue(
                assertThrows(
                                UnreadableListException.class,
                                () -> new CandidateListReader().read(folder.resolve("none.csv")))
                        .getMessage()
                        .contains("none.csv: no such file"));
    }

    @Test
    void votableAndEcsvAreRead() throws IOException {
        CandidateList votable =
                read(
                        """
                        <?xml version="1.0"?>
                        <VOTABLE version="1.3"><RESOURCE><TABLE>
                        <FIELD name="name" datatype="char" arraysize="*"/>
                        <FIELD name="spectrum" datatype="char" arraysize="*"/>
                        <FIELD name="resolution" datatype="double"/>
                        <FIELD name="rank" datatype="int"/>
                        <DATA><TABLEDATA>
                        <TR><TD>A</TD><TD>a.fits</TD><TD>2000</TD><TD>3</TD></TR>
                        <TR><TD>B</TD><TD>b.fits</TD><TD>NaN</TD><TD/></TR>
                        </TABLEDATA></DATA></TABLE></RESOURCE></VOTABLE>
                        """);
        assertEquals(Optional.of("2000"), votable.rows().get(0).candidate().text("resolution"));
        assertEquals(Optional.of("3"), votable.rows().get(0).candidate().text("rank"));
        assertEquals(Optional.empty(), votable.rows().get(1).candidate().text("resolution"));
        assertEquals(Optional.empty(), votable.rows().get(1).problem());
        CandidateList ecsv =
                read(
                        """
                        # %ECSV 1.0
                        # ---
                        # datatype:
                        # - {name: name, datatype: string}
                        # - {name: spectrum, datatype: string}
                        # - {name: j_mag, unit: mag, datatype: float32}
                        name spectrum j_mag
                        "A 1" a.fits 14.1
                        B b.fits ""
                        """);
        assertEquals(OptionalDouble.of(14.1), ecsv.rows().get(0).candidate().number("j_mag"));
        assertEquals("A 1", ecsv.rows().get(0).candidate().name());
        assertTrue(refusal("<!DOCTYPE VOTABLE [<!ENTITY e 'x'>]><VOTABLE/>").contains("DOCTYPE"));
    }

    @Test
    void fitsTableIsReadPackedOrNot() throws IOException {
        BinaryTable table = new BinaryTable();
        table.addColumn(new String[] {"A 1", "B"});
        table.addColumn(new String[] {"a.fits", "b.fits;c.fits"});
        table.addColumn(new double[] {14.25, 15.5});
        BinaryTableHDU hdu = table.toHDU();
        FitsFiles.add(
                hdu.getHeader(), Map.of("TTYPE1", "name", "TTYPE2", "spectrum", "TTYPE3", "k_mag"));
        byte[] file = FitsFiles.file(new NullDataHDU(), hdu);
        ByteArrayOutputStream packed = new ByteArrayOutputStream();
        try (GZIPOutputStream out = new GZIPOutputStream(packed)) {
            out.write(file);
        }
        for (byte[] bytes : new byte[][] {file, packed.toByteArray()}) {
            CandidateList list = read(bytes);
            assertEquals(List.of("name", "spectrum", "k_mag"), list.columns());
            assertEquals(List.of("b.fits", "c.fits"), list.rows().get(1).candidate().spectra());
            assertEquals(OptionalDouble.of(15.5), list.rows().get(1).candidate().number("k_mag"));
        }
    }

    @Test
    void spectraMayBeMissingWhereMagnitudesStand() throws IOException {
        CandidateList list =
                read("name,spectrum,y_mag,J_mag,k_mag\nA,,17.1,16,\nB,,,16,\nC,c.fits,,,\n");
        assertTrue(list.rows().get(0).problem().isEmpty());
        assertTrue(list.rows().get(0).candidate().spectra().isEmpty());
        assertTrue(problem(list, 2).contains("or two magnitudes"), problem(list, 2));
        assertTrue(list.rows().get(2).problem().isEmpty());
        CandidateList colours = read("name,j_mag,h_mag\nA,16,15\n");
        assertTrue(colours.rows().get(0).problem().isEmpty());
        assertTrue(refusal("name,j_mag\nA,16\n").contains("no column 'spectrum'"));
    }

    @Test
    void someCellsMayHoldAValueForEachSpectrum() throws IOException {
        CandidateList list =
                read(
                        """
                        name,spectrum,medium,resolution,rv_kms
                        A,"a.fits;b.fits",air;vacuum,2000;,10;-3
                        B,"a.fits;b.fits",air,120,
                        C,"a.fits;b.fits",air;steam,120,
                        D,"a.fits;b.fits",air,120;-7,
                        E,a.fits,,120;300,
                        """);
        Candidate both = list.rows().get(0).candidate();
        assertTrue(list.rows().get(0).problem().isEmpty());
        assertEquals("air", both.forSpectrum(0).text("medium").orElseThrow());
        assertEquals("vacuum", both.forSpectrum(1).text("medium").orElseThrow());
        assertEquals(2000, both.forSpectrum(0).number("resolution").orElseThrow());
        assertTrue(both.forSpectrum(1).number("resolution").isEmpty());
        assertEquals(-3, both.forSpectrum(1).number("rv_kms").orElseThrow());
        assertEquals(
                120,
                list.rows().get(1).candidate().forSpectrum(1).number("resolution").orElseThrow());
        assertTrue(problem(list, 3).contains("'steam'; expected air or vacuum, or as many"));
        assertTrue(problem(list, 4).contains("'-7'; expected a positive number"));
        assertTrue(problem(list, 5).contains("'120;300'"));
    }
}
