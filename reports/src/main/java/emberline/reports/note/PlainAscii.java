package emberline.reports.note;

import java.text.Normalizer;
import java.util.Map;

/** Text for formats that know ASCII alone. */
final class PlainAscii {

    private static final Map<Integer, String> WORDS =
            Map.of(
                    (int) '\u00b1', "+-",
                    (int) '\u00d7', "x",
                    (int) '\u2212', "-",
                    (int) '\u2013', "-",
                    (int) '\u2265', ">=",
                    (int) '\u2264', "<=",
                    (int) '\u03b1', "alpha",
                    (int) '\u03b2', "beta",
                    (int) '\u03b3', "gamma",
                    (int) '\u03b4', "delta");

    private PlainAscii() {}

    /** The text on one line: accents dropped, what has no like becomes {@code ?}. */
    static String of(String text) {
        StringBuilder plain = new StringBuilder(text.length());
        Normalizer.normalize(text, Normalizer.Form.NFKD)
                .codePoints()
                .forEach(
                        sign -> {
                            if (sign < 32 || sign == 127) {
                                plain.append(' ');
                            } else if (sign < 127) {
                                plain.appendCodePoint(sign);
                            } else if (Character.getType(sign) != Character.NON_SPACING_MARK) {
                                plain.append(WORDS.getOrDefault(sign, "?"));
                            }
                        });
        return plain.toString();
    }
}
