package emberline.demo;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.read.Observation;
import emberline.read.SpectrumReader;
import emberline.read.UnreadableSpectrumException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What is wrong with a file on purpose is wrong, and the product says so. */
class FaultTest {

    private static final Path SURVEY =
            Path.of(System.getProperty("emberline.root", ".."), "demo-objects", "survey");

    @Test
    void aSoundFileStaysAsItIs() {
        byte[] sound = {1, 2, 3};
        assertArrayEquals(sound, Fault.NONE.spoil(sound).orElseThrow());
        assertEquals("", Fault.NONE.words());
    }

    @Test
    void aFileIsCutMissingOrMisstated() {
        byte[] sound = "wavelength_nm,flux\n1,2\n".getBytes(StandardCharsets.UTF_8);
        assertEquals(sound.length / 2, Fault.CUT_OFF.spoil(sound).orElseThrow().length);
        assertTrue(Fault.MISSING.spoil(sound).isEmpty());
        assertEquals(
                "wavelength_micron,flux\n1,2\n",
                new String(Fault.STATES_MICRON.spoil(sound).orElseThrow(), StandardCharsets.UTF_8));
        IllegalStateException thrown =
                assertThrows(IllegalStateException.class, () -> Fault.STATES_CGS.spoil(sound));
        assertTrue(thrown.getMessage().contains("mJy"), thrown.getMessage());
    }

    @ParameterizedTest
    @CsvSource({
        "tamarisk-0825+0412.csv, no such file",
        "tamarisk-0833-0149.fits, cut off",
        "tamarisk-0841+0318.csv, in micron",
        "tamarisk-0849-0507.ecsv, unknown flux unit 'K'",
        "tamarisk-0809+0206-b.fits, cut off",
        "tamarisk-0817-0321-b.csv, in micron"
    })
    void aSpoiltFileIsRefusedWithTheReason(String file, String reason) {
        UnreadableSpectrumException thrown =
                assertThrows(
                        UnreadableSpectrumException.class,
                        () -> new SpectrumReader().read(SURVEY, "spectra/" + file));
        assertTrue(thrown.getMessage().contains(reason), thrown.getMessage());
    }

    /** A wrong unit that could be right cannot be told from the file alone. */
    @Test
    void fluxPerFrequencyStatedAsPerWavelengthIsRead(@TempDir Path folder) throws Exception {
        String file = "tamarisk-0857+0140.txt";
        String text = Files.readString(SURVEY.resolve("spectra").resolve(file));
        assertTrue(text.contains("flux in erg/s/cm2/A"), text.substring(0, 200));
        Files.writeString(folder.resolve(file), text);
        Observation read = new SpectrumReader().read(folder, file);
        assertTrue(read.size() > 200);
    }
}
