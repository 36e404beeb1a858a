package emberline.cli;

import emberline.read.UnreadableListException;
import emberline.survey.verdict.UnreadableVerdictsException;
import java.io.IOException;
import picocli.CommandLine;
import picocli.CommandLine.IExecutionExceptionHandler;
import picocli.CommandLine.ParseResult;

/** Turns what a command throws into a message and an exit code. */
final class FailureHandler implements IExecutionExceptionHandler {

    @Override
    public int handleExecutionException(
            Exception failure, CommandLine commandLine, ParseResult parsed) {
        if (failure instanceof UnreadableListException
                || failure instanceof UnreadableVerdictsException) {
            commandLine.getErr().println(failure.getMessage());
            return ExitCode.NOTHING_READ;
        }
        if (failure instanceof IOException trouble) {
            commandLine.getErr().println(OutputTrouble.message(trouble));
            return ExitCode.NOT_WRITTEN;
        }
        commandLine
                .getErr()
                .println(
                        "internal error: "
                                + failure
                                + "; please report it with the command and its input");
        return ExitCode.NOT_WRITTEN;
    }
}
