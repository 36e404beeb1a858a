package emberline.cli;

import java.nio.file.Path;

/** Where the demo survey stands. */
final class DemoRun {

    private DemoRun() {}

    static Path survey() {
        return Path.of(System.getProperty("emberline.root", ".."))
                .resolve("demo-objects/survey/candidates.csv");
    }
}
