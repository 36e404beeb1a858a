package emberline.cli;

import java.io.PrintWriter;
import java.io.StringWriter;

/**
 * A command line that was run.
 *
 * @param code its exit code
 * @param out what it printed as result
 * @param err what it said beside
 */
record CommandRun(int code, String out, String err) {

    static CommandRun of(Object... arguments) {
        StringWriter out = new StringWriter();
        StringWriter err = new StringWriter();
        String[] words = new String[arguments.length];
        for (int k = 0; k < words.length; k++) {
            words[k] = arguments[k].toString();
        }
        int code = Emberline.commandLine(new PrintWriter(out), new PrintWriter(err)).execute(words);
        return new CommandRun(code, out.toString(), err.toString());
    }
}
