package emberline.fuzz;

import java.util.Locale;

/**
 * Where the coverage-guided fuzzer comes in; the profile {@code fuzz} runs it. The target is named
 * by the system property {@code emberline.fuzz.target}.
 */
public final class CoverageFuzz {

    private static final FuzzTarget TARGET =
            FuzzTarget.valueOf(
                    System.getProperty("emberline.fuzz.target", "spectrum")
                            .toUpperCase(Locale.ROOT));

    private CoverageFuzz() {}

    /** Takes one input. */
    public static void fuzzerTestOneInput(byte[] input) {
        TARGET.run(input);
    }
}
