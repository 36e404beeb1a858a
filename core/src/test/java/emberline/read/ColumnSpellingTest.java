package emberline.read;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class ColumnSpellingTest {

    @TempDir private Path folder;

    private List<String> doubts(String column) throws IOException {
        Path list = folder.resolve("list.csv");
        Files.writeString(list, "name,spectrum," + column + "\na,a.csv,1\n");
        return ColumnSpelling.doubts(new CandidateListReader().read(list).columns());
    }

    @ParameterizedTest
    @CsvSource({
        "paralax_mas, parallax_mas",
        "parallax, parallax_mas",
        "Parallax mas, parallax_mas",
        "resoluton, resolution",
        "jmag, j_mag",
        "w1, w1_mag",
        "rv, rv_kms",
        "lithum, lithium",
        "pmra_msayr, pmra_masyr",
        "knwon_type, known_type",
        "magsystem, mag_system"
    })
    void aMisspeltColumnIsAskedAbout(String written, String meant) throws IOException {
        assertEquals(
                List.of(
                        "column '"
                                + written
                                + "' is not used, only carried along; did you mean "
                                + meant
                                + "?"),
                doubts(written));
    }

    @ParameterizedTest
    @ValueSource(strings = {"z_mag", "y_mag", "w3_mag", "note", "field", "J_MAG", "l_mag", "x"})
    void columnsOfTheObserversOwnAreLeftAlone(String column) throws IOException {
        assertEquals(List.of(), doubts(column));
    }

    @ParameterizedTest
    @CsvSource({"'nmae,spectrum', nmae", "'name,spectra', spectra", "'name,Spectrm', Spectrm"})
    void aMissingColumnSaysWhatMayBeMeant(String header, String near) throws IOException {
        Path list = folder.resolve("list.csv");
        Files.writeString(list, header + "\na,a.csv\n");
        String message =
                assertThrows(
                                UnreadableListException.class,
                                () -> new CandidateListReader().read(list))
                        .getMessage();
        assertTrue(message.endsWith("Did you mean '" + near + "'? Rename it."), message);
    }

    @Test
    void fewestFaultsWin() {
        List<String> known = List.of("--resolution", "--out", "--site", "sort");
        assertEquals(Optional.of("--out"), NearestWord.to("--otu", known));
        assertEquals(Optional.of("sort"), NearestWord.to("srot", known));
        assertEquals(Optional.of("--resolution"), NearestWord.to("--RESOLUTOIN", known));
        assertEquals(Optional.empty(), NearestWord.to("--verbose", known));
        assertEquals(Optional.empty(), NearestWord.to("", known));
        assertEquals(Optional.empty(), NearestWord.to("x", List.of("y")));
    }
}
