package emberline.spectrum;

import java.util.Locale;
import java.util.Optional;

/** Photometric bands, each in one system; Vega magnitudes. */
public enum MagnitudeBand {
    /** J, 2MASS. */
    J_2MASS,
    /** H, 2MASS. */
    H_2MASS,
    /** Ks, 2MASS. */
    K_2MASS,
    /** J, MKO. */
    J_MKO,
    /** H, MKO. */
    H_MKO,
    /** K, MKO. */
    K_MKO,
    /** W1, WISE. */
    W1,
    /** W2, WISE. */
    W2,
    /** Y, MKO; 2MASS has none. */
    Y_MKO;

    /**
     * A band of a list.
     *
     * @param letter {@code y}, {@code j}, {@code h}, {@code k}, {@code w1} or {@code w2}
     * @param system {@code 2MASS} or {@code MKO}; not looked at for Y, W1 and W2
     * @return the band, or empty where the system is neither
     */
    public static Optional<MagnitudeBand> of(String letter, String system) {
        String name = letter.toUpperCase(Locale.ROOT);
        if (name.equals("Y")) {
            return Optional.of(Y_MKO);
        }
        String full =
                name.startsWith("W") ? name : name + "_" + system.trim().toUpperCase(Locale.ROOT);
        for (MagnitudeBand band : values()) {
            if (band.name().equals(full)) {
                return Optional.of(band);
            }
        }
        return Optional.empty();
    }

    /**
     * The band in words.
     *
     * @return for instance {@code H 2MASS} or {@code W2}
     */
    public String label() {
        return name().replace('_', ' ');
    }
}
