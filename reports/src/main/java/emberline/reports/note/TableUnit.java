package emberline.reports.note;

import java.util.Arrays;

/** The units of result columns, as the formats write them. */
enum TableUnit {
    /** No unit: text, probabilities, ratios, logarithms. */
    NONE("", "", "", "---", ""),
    /** Spectral subclass: a scale of its own, a pure number to other programs. */
    SUBCLASS("subclass", "", "", "---", "subclass"),
    /** Magnitude. */
    MAG("mag", "mag", "mag", "mag", "mag"),
    /** Million years. */
    MYR("Myr", "Myr", "Myr", "Myr", "Myr"),
    /** Mass of Jupiter. */
    MJUP("Mjup", "'Mjup'", "jupiterMass", "Mjup", "$M_\\mathrm{Jup}$"),
    /** Mass of the Sun. */
    MSUN("Msun", "solMass", "solMass", "solMass", "$M_\\odot$"),
    /** Radius of the Sun. */
    RSUN("Rsun", "solRad", "solRad", "solRad", "$R_\\odot$"),
    /** Kelvin. */
    KELVIN("K", "K", "K", "K", "K"),
    /** Parsec. */
    PARSEC("pc", "pc", "pc", "pc", "pc"),
    /** Kilometre per second. */
    KMS("km/s", "km/s", "km / s", "km/s", "km\\,s$^{-1}$"),
    /** Degree. */
    DEGREE("deg", "deg", "deg", "deg", "deg"),
    /** Milliarcsecond. */
    MAS("mas", "mas", "mas", "mas", "mas"),
    /** Milliarcsecond per year. */
    MAS_YEAR("mas/yr", "mas/yr", "mas / yr", "mas/yr", "mas\\,yr$^{-1}$");

    private final String plain;
    private final String vounit;
    private final String ecsv;
    private final String journal;
    private final String latex;

    TableUnit(String plain, String vounit, String ecsv, String journal, String latex) {
        this.plain = plain;
        this.vounit = vounit;
        this.ecsv = ecsv;
        this.journal = journal;
        this.latex = latex;
    }

    /**
     * The unit of a column.
     *
     * @throws IllegalArgumentException if the formats do not know it
     */
    static TableUnit of(String plain) {
        return Arrays.stream(values())
                .filter(unit -> unit.plain.equals(plain))
                .findFirst()
                .orElseThrow(
                        () ->
                                new IllegalArgumentException(
                                        "unit '"
                                                + plain
                                                + "': expected one that tables can write"));
    }

    /** As the unit standard of the Virtual Observatory has it; empty for pure numbers. */
    String vounit() {
        return vounit;
    }

    /** As ECSV has it; empty for pure numbers. */
    String ecsv() {
        return ecsv;
    }

    /** As machine-readable journal tables have it. */
    String journal() {
        return journal;
    }

    /** As LaTeX has it. */
    String latex() {
        return latex;
    }
}
