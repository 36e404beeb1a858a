package emberline.survey.verdict;

import java.io.IOException;
import java.util.List;

/** Says what is wrong with a file of verdicts, every fault on a line of its own. */
public final class UnreadableVerdictsException extends IOException {

    private static final long serialVersionUID = 1L;

    /**
     * Makes the exception.
     *
     * @param faults one sentence each: where, what was found, what was expected, what to do
     */
    UnreadableVerdictsException(List<String> faults) {
        super(String.join("\n", faults));
    }
}
