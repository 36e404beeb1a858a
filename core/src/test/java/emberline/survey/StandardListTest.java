package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.read.UnreadableListException;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class StandardListTest {

    @TempDir private Path folder;

    private Path list(String... lines) throws IOException {
        StringBuilder spectrum = new StringBuilder("wavelength_micron,flux,sigma\n");
        for (int i = 0; i < 600; i++) {
            double micron = 0.9 + i * 0.0025;
            spectrum.append(String.format(Locale.ROOT, "%.4f,%.4f,0.01%n", micron, 2 - micron / 2));
        }
        Files.writeString(folder.resolve("s.csv"), spectrum);
        Path list = folder.resolve("standards.csv");
        Files.write(list, List.of(lines));
        return list;
    }

    private String trouble(String... lines) throws IOException {
        Path list = list(lines);
        String message =
                assertThrows(UnreadableListException.class, () -> StandardList.read(list))
                        .getMessage();
        assertTrue(message.startsWith(list.toString()), message);
        return message;
    }

    @Test
    void standardsAreReadAndOtherKindsLeftOut() throws IOException {
        StandardList standards =
                StandardList.read(
                        list(
                                "name,spectrum,known_type,known_type_number,known_kind",
                                "a,s.csv,L3.5,,",
                                "b,s.csv;s.csv,L3+L5,14,dwarf",
                                "c,s.csv,M8 III,,giant"));
        assertEquals(3, standards.spectra());
        assertEquals(List.of("c"), standards.leftOut());
    }

    @Test
    void standardsMayBeNamedByAPattern() throws IOException {
        Path file = list("name,spectrum,known_type", "a,s*.csv;s.csv,L3", "b,t?.csv,L4");
        Files.copy(folder.resolve("s.csv"), folder.resolve("s2.csv"));
        Files.copy(folder.resolve("s.csv"), folder.resolve("t1.csv"));
        Files.copy(folder.resolve("s.csv"), folder.resolve("standards-of-mine.txt"));
        Files.move(file, folder.resolve("list.txt"));
        StandardList standards = StandardList.read(folder.resolve("list.txt"));
        assertEquals(4, standards.spectra());
        assertEquals(4, standards.comparison().checksums().size());
    }

    @Test
    void theChecksumsChangeWithTheSpectra() throws IOException {
        Path file = list("name,spectrum,known_type", "a,s.csv,L3");
        List<String> before = StandardList.read(file).comparison().checksums();
        String text = Files.readString(folder.resolve("s.csv"));
        Files.writeString(folder.resolve("s.csv"), text.replace("0.9025,", "0.9026,"));
        List<String> after = StandardList.read(file).comparison().checksums();
        assertEquals(before.size(), after.size());
        assertNotEquals(before, after);
    }

    @Test
    void faultsNameFileRowAndColumn() throws IOException {
        String none = trouble("name,spectrum", "a,s.csv");
        assertTrue(none.contains("no column 'known_type'"), none);
        String blank = trouble("name,spectrum,known_type", "a,s.csv,L1", "b,s.csv,");
        assertTrue(blank.contains("row 2, column known_type: ''"), blank);
        String odd = trouble("name,spectrum,known_type", "a,s.csv,G2V");
        assertTrue(odd.contains("row 1, column known_type: 'G2V'; expected"), odd);
        String number = trouble("name,spectrum,known_type,known_type_number", "a,s.csv,L1,77");
        assertTrue(number.contains("row 1, column known_type_number: 77"), number);
        String missing = trouble("name,spectrum,known_type", "a,gone.csv,L1");
        assertTrue(missing.contains("row 1, column spectrum: "), missing);
        String empty = trouble("name,spectrum,known_type,j_mag,k_mag", "a,,L1,14,13");
        assertTrue(empty.contains("row 1, column spectrum: nothing; expected"), empty);
        String twice = trouble("name,spectrum,known_type", "a,s.csv,L1", "a,s.csv,L2");
        assertTrue(twice.contains("row 2, column name"), twice);
        String giants = trouble("name,spectrum,known_type,known_kind", "a,s.csv,M8,giant");
        assertTrue(giants.contains("known_kind"), giants);
    }
}
