package emberline.read;

import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The dimensions of a flux unit as written in a file: how many powers of energy, time, length and
 * photon it holds. Factors of scale are read over, since a flux may be on any scale. Blanks, points
 * and stars multiply, a stroke divides; powers may be written {@code cm-2}, {@code cm^-2}, {@code
 * cm**(-2)}.
 *
 * @param energy power of energy
 * @param time power of time
 * @param length power of length
 * @param photon power of number of photons
 */
record UnitExponents(int energy, int time, int length, int photon) {

    private static final UnitExponents NONE = new UnitExponents(0, 0, 0, 0);
    private static final UnitExponents LENGTH = new UnitExponents(0, 0, 1, 0);
    private static final UnitExponents ENERGY = new UnitExponents(1, 0, 0, 0);
    private static final UnitExponents TIME = new UnitExponents(0, 1, 0, 0);
    private static final UnitExponents POWER = new UnitExponents(1, -1, 0, 0);
    private static final UnitExponents PHOTON = new UnitExponents(0, 0, 0, 1);
    private static final UnitExponents JANSKY = new UnitExponents(1, 0, -2, 0);

    /** Longest first, so that {@code micron} is not read as {@code m}. */
    private static final Map<String, UnitExponents> ATOMS = atoms();

    private static final Pattern NUMBER = Pattern.compile("\\d+\\.?\\d*(e[+-]?\\d+)?");
    private static final Pattern POWER_OF =
            Pattern.compile("(\\*\\*|\\^)?(\\(([+-]?\\d+)\\)|([+-]?\\d+))");

    /** How the looser habits of writing units are read. */
    private record Reading(boolean ergsIsPlural, boolean strokeDividesAllThatFollows) {}

    /**
     * Reads a unit under one pair of habits.
     *
     * @param ergsIsPlural whether {@code ergs} is the plural of erg rather than erg times second
     * @param strokeDividesAllThatFollows whether {@code erg/cm2 s A} means erg/(cm2 s A)
     */
    static Optional<UnitExponents> parse(
            String text, boolean ergsIsPlural, boolean strokeDividesAllThatFollows) {
        String plain =
                text.toLowerCase(Locale.ROOT)
                        .replace('{', '(')
                        .replace('}', ')')
                        .replace('[', '(')
                        .replace(']', ')')
                        .replace("\u207b", "-")
                        .replace("\u2212", "-")
                        .replace("\u00b9", "1")
                        .replace("\u00b2", "2")
                        .replace("\u00b3", "3")
                        .replaceAll("[$\\\\]", "");
        Walk walk = new Walk(plain, new Reading(ergsIsPlural, strokeDividesAllThatFollows));
        UnitExponents found = walk.product();
        return found == null || walk.at < plain.length() ? Optional.empty() : Optional.of(found);
    }

    private UnitExponents times(UnitExponents other, int power) {
        return new UnitExponents(
                energy + power * other.energy,
                time + power * other.time,
                length + power * other.length,
                photon + power * other.photon);
    }

    private static Map<String, UnitExponents> atoms() {
        Map<String, UnitExponents> atoms =
                new TreeMap<>(
                        (a, b) ->
                                a.length() == b.length()
                                        ? a.compareTo(b)
                                        : b.length() - a.length());
        put(atoms, ENERGY, "erg ergs j joule joules");
        put(atoms, POWER, "w watt watts mw uw nw pw");
        put(atoms, TIME, "s sec second seconds");
        put(atoms, new UnitExponents(0, -1, 0, 0), "hz hertz ghz");
        put(atoms, LENGTH, "m cm mm um nm micron microns mum meter metre meters metres");
        put(atoms, LENGTH, "\u00b5m \u03bcm micrometer micrometre micrometers micrometres");
        put(atoms, LENGTH, "nanometer nanometre nanometers nanometres a aa ang angs angst");
        put(atoms, LENGTH, "angstrom angstroms angstroem \u00e5 \u00e5ngstr\u00f6m");
        put(atoms, JANSKY, "jy mjy ujy \u00b5jy \u03bcjy njy kjy jansky janskys");
        put(atoms, PHOTON, "photon photons phot ph");
        put(atoms, NONE, "sr arcsec arcsec2 pix pixel");
        return atoms;
    }

    private static void put(Map<String, UnitExponents> atoms, UnitExponents unit, String names) {
        for (String name : names.split(" ", -1)) {
            atoms.put(name, unit);
        }
    }

    /** One pass over a unit text; null stands for "not a unit". */
    private static final class Walk {
        private final String text;
        private final Reading reading;
        private int at;

        Walk(String text, Reading reading) {
            this.text = text;
            this.reading = reading;
        }

        /** Factors up to the end or to a closing bracket. */
        UnitExponents product() {
            UnitExponents sum = NONE;
            int sign = 1;
            boolean any = false;
            while (true) {
                boolean divides = skipSeparators();
                if (divides) {
                    sign = -1;
                } else if (!reading.strokeDividesAllThatFollows()) {
                    sign = 1;
                }
                if (at == text.length() || text.charAt(at) == ')') {
                    return any ? sum : null;
                }
                UnitExponents factor = factor();
                if (factor == null) {
                    return null;
                }
                sum = sum.times(factor, sign);
                any = true;
            }
        }

        private boolean skipSeparators() {
            boolean divides = false;
            while (at < text.length() && " \t./*\u00b7\u00d7_".indexOf(text.charAt(at)) >= 0) {
                divides |= text.charAt(at) == '/';
                at++;
            }
            return divides;
        }

        private UnitExponents factor() {
            Matcher number = NUMBER.matcher(text).region(at, text.length());
            if (number.lookingAt()) {
                at = number.end();
                power();
                return NONE;
            }
            UnitExponents base = text.charAt(at) == '(' ? bracket() : atom();
            return base == null ? null : NONE.times(base, power());
        }

        private UnitExponents bracket() {
            at++;
            UnitExponents inside = product();
            if (inside == null || at == text.length()) {
                return null;
            }
            at++;
            return inside;
        }

        private UnitExponents atom() {
            for (Map.Entry<String, UnitExponents> atom : ATOMS.entrySet()) {
                boolean plural = atom.getKey().equals("ergs");
                if (text.startsWith(atom.getKey(), at) && (!plural || reading.ergsIsPlural())) {
                    at += atom.getKey().length();
                    return atom.getValue();
                }
            }
            return null;
        }

        private int power() {
            Matcher power = POWER_OF.matcher(text).region(at, text.length());
            if (!power.lookingAt()) {
                return 1;
            }
            at = power.end();
            String digits = power.group(3) == null ? power.group(4) : power.group(3);
            return digits.length() > 4 ? 99 : Integer.parseInt(digits);
        }
    }
}
