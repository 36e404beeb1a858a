package emberline;

import static org.junit.jupiter.api.Assumptions.assumeTrue;

import emberline.prepare.PreparedSpectrum;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.SpectrumReader;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.Medium;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;

/** The folder of real spectra beside the checkout; tests that need it skip where it is missing. */
public final class SharedSpectra {

    private SharedSpectra() {}

    /** The folder; skips the calling test where there is none. */
    public static Path folder() {
        Path root = Path.of(System.getProperty("emberline.root", ".."));
        Path folder = root.resolve("../shared/spectra").normalize();
        assumeTrue(
                Files.isRegularFile(folder.resolve("list.csv")),
                "skipped: no real spectra in shared/spectra beside the checkout");
        return folder;
    }

    /**
     * A spectrum of the public library of R 2000 among them, prepared; skips the calling test where
     * there is none.
     *
     * @param file its name, as in the manifest
     */
    public static PreparedSpectrum ofLibrary(String file)
            throws IOException, UnreadableSpectrumException {
        return new Preparer()
                .prepare(
                        new SpectrumReader()
                                .read(folder().resolve("originals/irtf_library").resolve(file)),
                        Preparing.withDefaults()
                                .withMedium(Medium.VACUUM)
                                .withResolvingPower(2000));
    }
}
