package emberline.read;

import java.util.Locale;
import java.util.Optional;
import java.util.Set;

/**
 * What a flux is counted per: the kind of a flux unit. Its scale does not matter here, since fluxes
 * may be on any one scale.
 */
enum FluxUnit {
    /** Energy per area, time and wavelength. */
    F_LAMBDA,
    /** Energy per area, time and frequency; Jy among them. */
    F_NU,
    /** Energy per area and time: wavelength times F_lambda. */
    LAMBDA_F_LAMBDA,
    /** Photons per area, time and wavelength. */
    PHOTONS,
    /** Counts, or a flux normalised to something. */
    RELATIVE;

    /** What the message about an unknown unit lists. */
    static final String KNOWN =
            "a unit such as erg/s/cm2/A, W/m2/um, Jy, mJy, erg/s/cm2/Hz, W/m2/Hz, photons/s/cm2/A,"
                    + " counts or none";

    private static final UnitExponents PER_WAVELENGTH = new UnitExponents(1, -1, -3, 0);
    private static final UnitExponents PER_FREQUENCY = new UnitExponents(1, 0, -2, 0);
    private static final UnitExponents TOTAL = new UnitExponents(1, -1, -2, 0);
    private static final UnitExponents PHOTON_RATE = new UnitExponents(0, -1, -3, 1);

    private static final Set<String> RELATIVE_WORDS =
            Set.of(
                    "count",
                    "counts",
                    "countss",
                    "ct",
                    "cts",
                    "adu",
                    "adus",
                    "dn",
                    "dns",
                    "dnsec",
                    "dupixel",
                    "du",
                    "e",
                    "es",
                    "electron",
                    "electrons",
                    "electronss",
                    "electron/s",
                    "normalized",
                    "normalised",
                    "relative",
                    "relativeflux",
                    "arbitrary",
                    "arb",
                    "arbitraryunits",
                    "unitless",
                    "dimensionless",
                    "none",
                    "unknown",
                    "undefined",
                    "instrumental",
                    "norm",
                    "normflux");

    /** Reads a unit, or one of the words F_lambda and F_nu; empty where it names no flux. */
    static Optional<FluxUnit> parse(String text) {
        String letters = text.toLowerCase(Locale.ROOT).replaceAll("[^a-z/]", "");
        if (RELATIVE_WORDS.contains(letters.replace("/", ""))) {
            return Optional.of(RELATIVE);
        }
        if (letters.equals("fnu")) {
            return Optional.of(F_NU);
        }
        if (letters.equals("flambda") || letters.equals("flam")) {
            return Optional.of(F_LAMBDA);
        }
        boolean namesWavelength =
                text.matches("(?i).*([/ ]|\\b)(a|aa|ang\\w*|nm|um|microns?)\\b.*");
        for (boolean plural : new boolean[] {true, false}) {
            for (boolean dividesAll : new boolean[] {false, true}) {
                Optional<FluxUnit> unit =
                        UnitExponents.parse(text.trim(), plural, dividesAll)
                                .flatMap(FluxUnit::ofDimensions);
                if (unit.isPresent()) {
                    // Some surveys write erg/cm/s/Ang for erg/cm2/s/Ang.
                    boolean meant = unit.get() == LAMBDA_F_LAMBDA && namesWavelength;
                    return meant ? Optional.of(F_LAMBDA) : unit;
                }
            }
        }
        return Optional.empty();
    }

    private static Optional<FluxUnit> ofDimensions(UnitExponents unit) {
        if (unit.equals(PER_WAVELENGTH)) {
            return Optional.of(F_LAMBDA);
        }
        if (unit.equals(PER_FREQUENCY)) {
            return Optional.of(F_NU);
        }
        if (unit.equals(TOTAL)) {
            return Optional.of(LAMBDA_F_LAMBDA);
        }
        return unit.equals(PHOTON_RATE) ? Optional.of(PHOTONS) : Optional.empty();
    }

    /**
     * What a flux in this unit is multiplied by to be per unit wavelength: F_lambda = F_nu c /
     * lambda^2, or (lambda F_lambda) / lambda, or photons times h c / lambda, each without its
     * constants.
     *
     * @param wavelengthMicron wavelength (micron)
     */
    double toPerWavelength(double wavelengthMicron) {
        return switch (this) {
            case F_LAMBDA, RELATIVE -> 1;
            case F_NU -> 1 / (wavelengthMicron * wavelengthMicron);
            case LAMBDA_F_LAMBDA, PHOTONS -> 1 / wavelengthMicron;
        };
    }
}
