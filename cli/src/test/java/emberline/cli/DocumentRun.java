package emberline.cli;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;

/**
 * A document whose console sessions were run.
 *
 * @param steps how many commands were run
 * @param troubles where it tells something else than what was printed
 * @param renewed the document with the outputs as they were printed
 */
record DocumentRun(int steps, List<String> troubles, MarkdownDocument renewed) {

    DocumentRun {
        troubles = List.copyOf(troubles);
    }

    /** Runs all console blocks of a document, one after the other, in one session. */
    static DocumentRun of(MarkdownDocument document, ConsoleSession session)
            throws IOException, InterruptedException {
        List<String> troubles = new ArrayList<>();
        MarkdownDocument renewed = document;
        int moved = 0;
        int count = 0;
        for (FencedBlock block : document.blocks()) {
            List<ConsoleStep> steps = block.isConsole() ? ConsoleStep.of(block) : List.of();
            for (int k = 0; k < steps.size(); k++) {
                ConsoleStep step = steps.get(k);
                List<String> printed = session.run(step.command());
                count++;
                boolean asksForCode =
                        k + 1 < steps.size() && steps.get(k + 1).command().equals("echo $?");
                String where = document.name() + ", line " + step.start() + ": " + step.command();
                if (session.lastCode() != ExitCode.DONE && !asksForCode) {
                    troubles.add(where + unexpectedCode(session.lastCode(), printed));
                }
                PrintedLines said = new PrintedLines(step.output());
                if (!said.agreesWith(printed)) {
                    troubles.add(where + difference(step.output(), printed));
                }
                List<String> fresh = said.broughtUpToDate(printed);
                renewed = renewed.with(step.start() + moved, step.end() + moved, fresh);
                moved += fresh.size() - step.output().size();
            }
        }
        return new DocumentRun(count, troubles, renewed);
    }

    private static String unexpectedCode(int code, List<String> printed) {
        return "\n  ended with exit code "
                + code
                + "; expected 0, or 'echo $?' after it\n"
                + String.join("\n", printed);
    }

    private static String difference(List<String> said, List<String> printed) {
        return "\n  the document says\n"
                + String.join("\n", said)
                + "\n  but it prints\n"
                + String.join("\n", printed)
                + "\n  Bring the documents up to date by -Demberline.docs=write.";
    }
}
