package emberline.reports.page;

import java.util.ArrayList;
import java.util.List;

/** Breaks texts into lines. */
final class Lines {

    private static final String ELLIPSIS = "\u2026";

    private final FontSet fonts;

    Lines(FontSet fonts) {
        this.fonts = fonts;
    }

    float width(Style style, String text) {
        return cleanWidth(style, fonts.clean(style.face(), text));
    }

    private float cleanWidth(Style style, String clean) {
        return fonts.width(style.face(), clean, style.sizePoint());
    }

    /** Lines of at most a width; a word that is longer is broken. At least one line. */
    List<String> wrap(Style style, String text, float width) {
        List<String> lines = new ArrayList<>();
        StringBuilder line = new StringBuilder();
        float reached = 0;
        float blank = cleanWidth(style, " ");
        for (String word : fonts.clean(style.face(), text).split(" +", -1)) {
            float wide = cleanWidth(style, word);
            if (!line.isEmpty() && reached + blank + wide <= width) {
                line.append(' ').append(word);
                reached += blank + wide;
                continue;
            }
            if (!line.isEmpty()) {
                lines.add(line.toString());
                line.setLength(0);
            }
            String rest = word;
            while (wide > width && rest.length() > 1) {
                int end = fitting(style, rest, width);
                lines.add(rest.substring(0, end));
                rest = rest.substring(end);
                wide = cleanWidth(style, rest);
            }
            line.append(rest);
            reached = wide;
        }
        if (!line.isEmpty() || lines.isEmpty()) {
            lines.add(line.toString());
        }
        return lines;
    }

    /** At most so many lines; an ellipsis ends the last one where text is left out. */
    List<String> wrap(Style style, String text, float width, int most) {
        List<String> lines = wrap(style, text, width);
        if (lines.size() <= most) {
            return lines;
        }
        List<String> kept = new ArrayList<>(lines.subList(0, most));
        kept.set(
                most - 1,
                fit(style, String.join(" ", lines.subList(most - 1, lines.size())), width));
        return kept;
    }

    /** The text, or as much of it as fits with an ellipsis. */
    String fit(Style style, String text, float width) {
        String clean = fonts.clean(style.face(), text);
        if (cleanWidth(style, clean) <= width) {
            return clean;
        }
        int end = clean.length();
        while (end > 0 && cleanWidth(style, clean.substring(0, end) + ELLIPSIS) > width) {
            end -= Character.isLowSurrogate(clean.charAt(end - 1)) ? 2 : 1;
        }
        return clean.substring(0, Math.max(0, end)).stripTrailing() + ELLIPSIS;
    }

    private int fitting(Style style, String word, float width) {
        int end = 1;
        while (end < word.length() && cleanWidth(style, word.substring(0, end + 1)) <= width) {
            end++;
        }
        boolean split = Character.isHighSurrogate(word.charAt(end - 1)) && end < word.length();
        return split ? end + 1 : end;
    }
}
