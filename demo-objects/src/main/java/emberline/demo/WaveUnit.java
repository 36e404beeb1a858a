package emberline.demo;

import java.util.Arrays;

/** A unit of wavelength as files write it. */
enum WaveUnit {
    /** Micron. */
    MICRON("micron", "um", 1),
    /** Nanometre. */
    NANOMETRE("nm", "nm", 1000),
    /** Angstrom. */
    ANGSTROM("Angstrom", "Angstrom", 10000);

    private final String word;
    private final String symbol;
    private final double perMicron;

    WaveUnit(String word, String symbol, double perMicron) {
        this.word = word;
        this.symbol = symbol;
        this.perMicron = perMicron;
    }

    /** The unit with a word such as {@code nm}. */
    static WaveUnit named(String word) {
        return Arrays.stream(values())
                .filter(unit -> unit.word.equals(word))
                .findFirst()
                .orElseThrow(() -> new IllegalStateException("no wavelength unit " + word));
    }

    /** The word for people. */
    String word() {
        return word;
    }

    /** The symbol for headers of FITS, VOTable and ECSV. */
    String symbol() {
        return symbol;
    }

    /** A wavelength in this unit. */
    double of(double micron) {
        return micron * perMicron;
    }
}
