package emberline.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;

/** Where the demo survey stands. */
final class DemoRun {

    private DemoRun() {}

    static Path survey() {
        return Path.of(System.getProperty("emberline.root", ".."))
                .resolve("demo-objects/survey/candidates.csv");
    }

    /** How many of its objects are known by photometry alone. */
    static long withoutSpectrum() throws IOException {
        return Files.readAllLines(survey()).stream()
                .filter(row -> row.split(",", -1)[1].isEmpty())
                .count();
    }
}
