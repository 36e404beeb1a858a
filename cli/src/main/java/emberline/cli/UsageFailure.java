package emberline.cli;

import emberline.read.NearestWord;
import java.io.PrintWriter;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import picocli.CommandLine;
import picocli.CommandLine.IParameterExceptionHandler;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.UnmatchedArgumentException;

/**
 * Says what is wrong with a command line, what was most likely meant, and where the help is; never
 * the whole help.
 */
final class UsageFailure implements IParameterExceptionHandler {

    @Override
    public int handleParseException(ParameterException failure, String[] arguments) {
        CommandLine commandLine = failure.getCommandLine();
        PrintWriter err = commandLine.getErr();
        Optional<String> unknown = unknown(failure, commandLine);
        String message = failure.getMessage();
        if (unknown.isPresent() && !message.contains("'" + unknown.get() + "'")) {
            message = "Unknown option: '" + unknown.get() + "'";
        }
        err.println(message);
        unknown.flatMap(word -> NearestWord.to(word, known(word, commandLine.getCommandSpec())))
                .ifPresent(near -> err.println("Did you mean " + near + "?"));
        err.println(
                "'"
                        + commandLine.getCommandSpec().qualifiedName()
                        + " --help' lists what there is.");
        err.flush();
        return ExitCode.WRONG_USAGE;
    }

    /** The first word of the command line that nothing takes, without its value. */
    private static Optional<String> unknown(ParameterException failure, CommandLine commandLine) {
        List<String> words =
                failure instanceof UnmatchedArgumentException unmatched
                        ? unmatched.getUnmatched()
                        : commandLine.getUnmatchedArguments().stream()
                                .filter(word -> word.startsWith("-"))
                                .toList();
        return words.stream().findFirst().map(word -> word.replaceFirst("=.*", ""));
    }

    private static List<String> known(String word, CommandSpec command) {
        List<String> known = new ArrayList<>();
        if (word.startsWith("-")) {
            for (OptionSpec option : command.options()) {
                known.addAll(List.of(option.names()));
            }
        } else {
            known.addAll(command.subcommands().keySet());
        }
        return known;
    }
}
