package emberline.demo;

import java.util.Arrays;

/** A unit of flux density as files write it; the model works in erg/s/cm2/A. */
enum FluxScale {
    /** Flux per unit wavelength in erg/s/cm2/A. */
    CGS("cgs", "erg/s/cm2/A", "erg / (Angstrom cm2 s)") {
        @Override
        double of(double cgs, double micron) {
            return cgs;
        }
    },
    /** Flux per unit wavelength in W/m2/um. */
    SI("si", "W/m2/um", "W / (m2 um)") {
        @Override
        double of(double cgs, double micron) {
            return cgs * 10;
        }
    },
    /** Flux per unit frequency in mJy. */
    MILLIJANSKY("mjy", "mJy", "mJy") {
        @Override
        double of(double cgs, double micron) {
            double angstrom = micron * 1e4;
            return cgs * angstrom * angstrom / SPEED_OF_LIGHT_ANGSTROM * 1e26;
        }
    },
    /** Flux per unit wavelength without a unit. */
    RELATIVE("relative", "", "") {
        @Override
        double of(double cgs, double micron) {
            return cgs * 1e15;
        }
    };

    /** Speed of light (Angstrom per second), exact. */
    private static final double SPEED_OF_LIGHT_ANGSTROM = 2.99792458e18;

    private final String word;
    private final String plain;
    private final String formal;

    FluxScale(String word, String plain, String formal) {
        this.word = word;
        this.plain = plain;
        this.formal = formal;
    }

    /** The scale with a word such as {@code mjy}. */
    static FluxScale named(String word) {
        return Arrays.stream(values())
                .filter(scale -> scale.word.equals(word))
                .findFirst()
                .orElseThrow(() -> new IllegalStateException("no flux unit " + word));
    }

    /** The unit as people and FITS headers write it; empty where there is none. */
    String plain() {
        return plain;
    }

    /** The unit in the form of ECSV; empty where there is none. */
    String formal() {
        return formal;
    }

    /**
     * A flux on this scale.
     *
     * @param cgs flux (erg/s/cm2/A)
     * @param micron wavelength (micron)
     * @return the flux in this unit
     */
    abstract double of(double cgs, double micron);
}
