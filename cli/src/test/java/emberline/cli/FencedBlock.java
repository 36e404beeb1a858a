package emberline.cli;

import java.util.List;

/**
 * A fenced block of a document.
 *
 * @param word the first word after the fence, such as {@code console}; empty where there is none
 * @param start place of its first line among the lines of the document, from 0
 * @param lines what stands between the fences
 */
record FencedBlock(String word, int start, List<String> lines) {

    /** The fence word of sessions that are run. */
    static final String CONSOLE = "console";

    FencedBlock {
        lines = List.copyOf(lines);
    }

    boolean isConsole() {
        return word.equals(CONSOLE);
    }
}
