package emberline.reports.note;

import java.util.Map;

/** Text for LaTeX without packages: specials escaped, known signs as commands. */
final class LatexText {

    private static final Map<Integer, String> SIGNS =
            Map.ofEntries(
                    Map.entry((int) '\\', "\\textbackslash{}"),
                    Map.entry((int) '~', "\\textasciitilde{}"),
                    Map.entry((int) '^', "\\textasciicircum{}"),
                    Map.entry((int) '<', "\\ensuremath{<}"),
                    Map.entry((int) '>', "\\ensuremath{>}"),
                    Map.entry((int) '|', "\\ensuremath{|}"),
                    Map.entry((int) '\u00b1', "\\ensuremath{\\pm}"),
                    Map.entry((int) '\u2212', "\\ensuremath{-}"),
                    Map.entry((int) '\u2013', "--"),
                    Map.entry((int) '\u00d7', "\\ensuremath{\\times}"),
                    Map.entry((int) '\u00c5', "\\AA{}"),
                    Map.entry((int) '\u00b5', "\\ensuremath{\\mu}"),
                    Map.entry((int) '\u03b1', "\\ensuremath{\\alpha}"),
                    Map.entry((int) '\u03b2', "\\ensuremath{\\beta}"),
                    Map.entry((int) '\u03b3', "\\ensuremath{\\gamma}"),
                    Map.entry((int) '\u03b4', "\\ensuremath{\\delta}"),
                    Map.entry((int) '\u03bb', "\\ensuremath{\\lambda}"),
                    Map.entry((int) '\u03bc', "\\ensuremath{\\mu}"));

    private LatexText() {}

    /** The text; signs without a command lose their accents, or become {@code ?}. */
    static String of(String text) {
        StringBuilder escaped = new StringBuilder(text.length());
        text.codePoints()
                .forEach(
                        sign -> {
                            if ("&%$#_{}".indexOf(sign) >= 0) {
                                escaped.append('\\').appendCodePoint(sign);
                            } else if (SIGNS.containsKey(sign)) {
                                escaped.append(SIGNS.get(sign));
                            } else if (sign < 127) {
                                escaped.append(sign < 32 ? " " : Character.toString(sign));
                            } else {
                                escaped.append(PlainAscii.of(Character.toString(sign)));
                            }
                        });
        return escaped.toString();
    }
}
