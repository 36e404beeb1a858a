package emberline.read;

import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** A unit of wavelength, known by the many ways in which files spell it. */
enum WavelengthUnit {
    ANGSTROM("angstrom", 1e-4),
    NANOMETRE("nm", 1e-3),
    MICRON("micron", 1),
    METRE("m", 1e6);

    /** What the message about an unknown unit lists. */
    static final String KNOWN = "angstrom, nm, micron (um) or m";

    private static final Map<String, WavelengthUnit> SPELLINGS =
            Map.ofEntries(
                    Map.entry("a", ANGSTROM),
                    Map.entry("aa", ANGSTROM),
                    Map.entry("ang", ANGSTROM),
                    Map.entry("angs", ANGSTROM),
                    Map.entry("angst", ANGSTROM),
                    Map.entry("angstrom", ANGSTROM),
                    Map.entry("angstroms", ANGSTROM),
                    Map.entry("angstroem", ANGSTROM),
                    Map.entry("\u00e5", ANGSTROM),
                    Map.entry("\u00e5ngstr\u00f6m", ANGSTROM),
                    Map.entry("nm", NANOMETRE),
                    Map.entry("nanometer", NANOMETRE),
                    Map.entry("nanometers", NANOMETRE),
                    Map.entry("nanometre", NANOMETRE),
                    Map.entry("nanometres", NANOMETRE),
                    Map.entry("um", MICRON),
                    Map.entry("\u00b5m", MICRON),
                    Map.entry("\u03bcm", MICRON),
                    Map.entry("mum", MICRON),
                    Map.entry("micron", MICRON),
                    Map.entry("microns", MICRON),
                    Map.entry("micrometer", MICRON),
                    Map.entry("micrometers", MICRON),
                    Map.entry("micrometre", MICRON),
                    Map.entry("micrometres", MICRON),
                    Map.entry("m", METRE),
                    Map.entry("meter", METRE),
                    Map.entry("meters", METRE),
                    Map.entry("metre", METRE),
                    Map.entry("metres", METRE));

    private static final Pattern LOGARITHM =
            Pattern.compile("(?<log>log10|log|dex|ln)\\s*[(\\[]?\\s*(?<unit>[^)\\]]*)[)\\]]?");

    private final String words;
    private final double inMicron;

    WavelengthUnit(String words, double inMicron) {
        this.words = words;
        this.inMicron = inMicron;
    }

    /** How wavelengths are written down: themselves or as a logarithm. */
    enum Scale {
        LINEAR,
        LOG10,
        LN;

        double wavelength(double written) {
            return switch (this) {
                case LINEAR -> written;
                case LOG10 -> Math.pow(10, written);
                case LN -> Math.exp(written);
            };
        }
    }

    /** A unit as written: the unit, if it says one, and whether it speaks of the logarithm. */
    record Written(Optional<WavelengthUnit> unit, Scale scale) {}

    String words() {
        return words;
    }

    /** The unit in micron. */
    double inMicron() {
        return inMicron;
    }

    /** Reads a plain unit; empty where the text names none of the known. */
    static Optional<WavelengthUnit> parse(String text) {
        String key = text.trim().toLowerCase(Locale.ROOT).replaceAll("[\\[\\](){}\\\\$.\\s]", "");
        if (key.equals("01nm")) {
            return Optional.of(ANGSTROM);
        }
        return Optional.ofNullable(SPELLINGS.get(key));
    }

    /** Reads a unit that may be a logarithm, such as {@code log10(Angstrom)}. */
    static Optional<Written> parseWritten(String text) {
        Optional<WavelengthUnit> plain = parse(text);
        if (plain.isPresent()) {
            return Optional.of(new Written(plain, Scale.LINEAR));
        }
        Matcher matcher = LOGARITHM.matcher(text.trim().toLowerCase(Locale.ROOT));
        if (!matcher.matches()) {
            return Optional.empty();
        }
        Scale scale = matcher.group("log").equals("ln") ? Scale.LN : Scale.LOG10;
        String unit = matcher.group("unit").replaceAll("lambda|wavelength|/", "").trim();
        if (unit.isEmpty()) {
            return Optional.of(new Written(Optional.empty(), scale));
        }
        return parse(unit).map(found -> new Written(Optional.of(found), scale));
    }

    /**
     * The unit in which wavelengths of optical or infrared spectra have such a size. Below 1e-3
     * they are in m, below 100 in micron, below 3000 in nm, above in angstrom.
     *
     * @param middle median wavelength as written
     */
    static WavelengthUnit plausible(double middle) {
        if (middle < 1e-3) {
            return METRE;
        }
        if (middle < 100) {
            return MICRON;
        }
        return middle < 3000 ? NANOMETRE : ANGSTROM;
    }
}
