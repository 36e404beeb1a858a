package emberline;

import static org.junit.jupiter.api.Assumptions.assumeTrue;

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
}
