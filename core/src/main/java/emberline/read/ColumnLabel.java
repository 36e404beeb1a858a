package emberline.read;

import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * What a file says about a column.
 *
 * @param name the bare name in lower case, words joined by underscores, without its unit
 * @param unit the unit as written, or empty where there is none
 * @param ucd the UCD or an empty text
 * @param utype the utype or an empty text
 */
record ColumnLabel(String name, Optional<String> unit, String ucd, String utype) {

    private static final Pattern BRACKETED = Pattern.compile("(.*?)\\s*[\\[(](.+)[\\])]");
    private static final Pattern SUFFIXED =
            Pattern.compile(
                    "((?:log10|log)?_?(?:wave|lam|wl|wvl)[a-z_]*?)[_\\s]"
                            + "(angstroms?|ang|aa|a|nm|um|microns?|m)"
                            + "|(.+?)[_\\s]([mu]?jy)");
    private static final Pattern LOGARITHM = Pattern.compile("(?:log10|log)\\((.*)\\)");

    /** A column known by its name alone, which may carry a unit. */
    static ColumnLabel of(String name) {
        return of(name, Optional.empty(), "", "");
    }

    /** A column as a table describes it; a unit within the name counts where no other is given. */
    static ColumnLabel of(String name, Optional<String> unit, String ucd, String utype) {
        String text = name.trim();
        Optional<String> stated = unit.map(String::trim).filter(u -> !u.isEmpty());
        Matcher logarithm = LOGARITHM.matcher(text.toLowerCase(Locale.ROOT));
        if (logarithm.matches()) {
            return new ColumnLabel("log" + bare(logarithm.group(1)), stated, ucd, utype);
        }
        for (Pattern pattern : new Pattern[] {BRACKETED, SUFFIXED}) {
            String subject = pattern == SUFFIXED ? text.toLowerCase(Locale.ROOT) : text;
            Matcher matcher = pattern.matcher(subject);
            if (matcher.matches()) {
                int group = matcher.group(1) == null ? 3 : 1;
                Optional<String> within = Optional.of(matcher.group(group + 1).trim());
                return new ColumnLabel(
                        bare(matcher.group(group)), stated.or(() -> within), ucd, utype);
            }
        }
        return new ColumnLabel(bare(text), stated, ucd, utype);
    }

    private static String bare(String name) {
        return name.toLowerCase(Locale.ROOT)
                .trim()
                .replace("\u03bb", "lambda")
                .replaceAll("[\\s.\\-]+", "_")
                .replaceAll("[^a-z0-9_]", "");
    }
}
