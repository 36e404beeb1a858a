package emberline.cli;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A call of the program within a line of a shell.
 *
 * @param words its arguments
 * @param rest what follows them: a pipe, a redirection; empty where nothing does
 */
record ShellWords(List<String> words, String rest) {

    /** The program by its launcher or its jar, not as part of another word. */
    private static final Pattern PROGRAM =
            Pattern.compile("(?:^|[\\s(\"])(?:[\\w./-]*/)?emberline(?:\\.jar)?(?=[\\s)]|$)");

    ShellWords {
        words = List.copyOf(words);
    }

    /** The first call of the program in a line; nothing where there is none. */
    static Optional<ShellWords> ofLine(String line) {
        String joined = line.replace("\\\n", " ").replaceAll("\\$\\(\\w+\\)", "X");
        Matcher program = PROGRAM.matcher(joined);
        return program.find() ? Optional.of(split(joined.substring(program.end()))) : noCall();
    }

    private static Optional<ShellWords> noCall() {
        return Optional.empty();
    }

    private static ShellWords split(String text) {
        List<String> words = new ArrayList<>();
        StringBuilder word = new StringBuilder();
        boolean open = false;
        int k = 0;
        while (k < text.length()) {
            char c = text.charAt(k);
            int close = c == '\'' || c == '"' ? text.indexOf(c, k + 1) : -1;
            if (close > 0) {
                word.append(text, k + 1, close);
                open = true;
                k = close;
            } else if (Character.isWhitespace(c)) {
                open = keep(words, word, open);
            } else if (isEnd(text, k)) {
                break;
            } else {
                word.append(c);
                open = true;
            }
            k++;
        }
        keep(words, word, open);
        return new ShellWords(words, text.substring(Math.min(k, text.length())).strip());
    }

    private static boolean keep(List<String> words, StringBuilder word, boolean open) {
        if (open) {
            words.add(word.toString());
            word.setLength(0);
        }
        return false;
    }

    /** Whether the arguments end here; an angle within a word, as of a type's limit, does not. */
    private static boolean isEnd(String text, int k) {
        char c = text.charAt(k);
        boolean first = k == 0 || Character.isWhitespace(text.charAt(k - 1));
        return "|;&)\"".indexOf(c) >= 0
                || (first && ("<>#".indexOf(c) >= 0 || text.startsWith(":::", k)))
                || (first && text.startsWith("2>", k));
    }
}
