package emberline.cli;

import java.util.ArrayList;
import java.util.List;

/**
 * A command of a console session, and what it is said to print.
 *
 * @param command the command without its prompt; several lines where it goes on
 * @param start place of the first line of the output in the document, from 0
 * @param output the lines after the command, up to the next command
 */
record ConsoleStep(String command, int start, List<String> output) {

    private static final String PROMPT = "$ ";

    ConsoleStep {
        output = List.copyOf(output);
    }

    /** Place after the last line of the output. */
    int end() {
        return start + output.size();
    }

    /**
     * The steps of a block. A line that begins with a dollar and a blank is a command; it goes on
     * where the line ends with a backslash, and, where it has {@code << 'END'}, up to a line {@code
     * END}. What follows is its output.
     */
    static List<ConsoleStep> of(FencedBlock block) {
        List<ConsoleStep> steps = new ArrayList<>();
        List<String> lines = block.lines();
        int k = 0;
        while (k < lines.size()) {
            if (!lines.get(k).startsWith(PROMPT)) {
                throw new IllegalArgumentException(
                        "line "
                                + (block.start() + k + 1)
                                + ": a console block begins with a command after '$ '");
            }
            int last = lastOfCommand(lines, k);
            String command =
                    String.join("\n", lines.subList(k, last + 1)).substring(PROMPT.length());
            int next = last + 1;
            while (next < lines.size() && !lines.get(next).startsWith(PROMPT)) {
                next++;
            }
            steps.add(
                    new ConsoleStep(
                            command, block.start() + last + 1, lines.subList(last + 1, next)));
            k = next;
        }
        return List.copyOf(steps);
    }

    private static int lastOfCommand(List<String> lines, int first) {
        int last = first;
        while (lines.get(last).endsWith("\\") && last + 1 < lines.size()) {
            last++;
        }
        if (lines.get(last).contains("<< 'END'")) {
            while (last + 1 < lines.size() && !lines.get(last).equals("END")) {
                last++;
            }
        }
        return last;
    }
}
