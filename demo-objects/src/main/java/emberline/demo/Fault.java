package emberline.demo;

import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Optional;

/** What is wrong with a file of the survey, on purpose: observers get such files too. */
enum Fault {
    /** A sound file. */
    NONE("") {
        @Override
        Optional<byte[]> spoil(byte[] sound) {
            return Optional.of(sound);
        }
    },
    /** Listed, but not there. */
    MISSING("file does not exist") {
        @Override
        Optional<byte[]> spoil(byte[] sound) {
            return Optional.empty();
        }
    },
    /** The first half alone, as after a broken transfer. */
    CUT_OFF("file is cut off") {
        @Override
        Optional<byte[]> spoil(byte[] sound) {
            return Optional.of(Arrays.copyOf(sound, sound.length / 2));
        }
    },
    /** Nanometres that are said to be micron. */
    STATES_MICRON("wavelengths in nm stated as micron") {
        @Override
        Optional<byte[]> spoil(byte[] sound) {
            return replaced(sound, "wavelength_nm", "wavelength_micron");
        }
    },
    /** A unit of flux that is none. */
    STATES_KELVIN("flux stated in kelvin") {
        @Override
        Optional<byte[]> spoil(byte[] sound) {
            return replaced(sound, FluxScale.CGS.formal(), "K");
        }
    },
    /** Flux per unit frequency that is said to be per unit wavelength. */
    STATES_CGS("flux in mJy stated as erg/s/cm2/A") {
        @Override
        Optional<byte[]> spoil(byte[] sound) {
            return replaced(sound, FluxScale.MILLIJANSKY.plain(), FluxScale.CGS.plain());
        }
    };

    private final String words;

    Fault(String words) {
        this.words = words;
    }

    /** What the truth table says; empty for a sound file. */
    String words() {
        return words;
    }

    /**
     * Spoils a file.
     *
     * @param sound its bytes
     * @return the bytes that are written; empty where no file is written
     * @throws IllegalStateException if there is nothing in the file that could be misstated
     */
    abstract Optional<byte[]> spoil(byte[] sound);

    private static Optional<byte[]> replaced(byte[] sound, String truth, String statement) {
        String text = new String(sound, StandardCharsets.UTF_8);
        if (!text.contains(truth)) {
            throw new IllegalStateException(
                    "found no '" + truth + "' to misstate: expected it in the head of the file");
        }
        return Optional.of(text.replace(truth, statement).getBytes(StandardCharsets.UTF_8));
    }
}
