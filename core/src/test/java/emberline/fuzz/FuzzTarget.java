package emberline.fuzz;

import emberline.catalogue.FuzzedCatalogue;
import emberline.judge.AgeStatement;
import emberline.judge.Aim;
import emberline.judge.Judging;
import emberline.read.FuzzedReaders;
import emberline.spectrum.SpectralType;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;

/** What takes bytes of strangers. */
enum FuzzTarget {
    /** Files of spectra, in every format. */
    SPECTRUM,
    /** Candidate lists. */
    LIST,
    /** Tables of definitions. */
    CATALOGUE,
    /** Ages, aims, thresholds and spectral types as they are written in options and columns. */
    STATEMENT;

    /** Takes some bytes; anything thrown is a fault. */
    void run(byte[] input) {
        switch (this) {
            case SPECTRUM -> FuzzedReaders.spectrum(input);
            case LIST -> FuzzedReaders.list(input);
            case CATALOGUE -> FuzzedCatalogue.tables(input);
            case STATEMENT -> statement(input);
            default -> throw new IllegalStateException("no such target: " + this);
        }
    }

    /** Folders of resources with inputs to begin with. */
    List<String> seeds() {
        String own = "fuzz/" + name().toLowerCase(Locale.ROOT);
        return switch (this) {
            case SPECTRUM -> List.of(own, "read/good", "read/bad");
            case LIST -> List.of(own, "read/good");
            default -> List.of(own);
        };
    }

    private static void statement(byte[] input) {
        String text = new String(input, StandardCharsets.UTF_8);
        SpectralType.parse(text);
        List<Runnable> parsers =
                List.of(
                        () -> AgeStatement.parse(text),
                        () -> Aim.parse(text),
                        () -> Judging.withDefaults().withThresholds(text));
        for (Runnable parser : parsers) {
            try {
                parser.run();
            } catch (IllegalArgumentException e) {
                if (!e.getMessage().contains("expected")) {
                    throw new AssertionError("a refusal that expects nothing: " + e, e);
                }
            }
        }
    }
}
