package emberline.cli;

import java.util.concurrent.Callable;
import picocli.AutoComplete;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Spec;

/** {@code completion}: prints a script by which shells complete commands and options. */
@Command(
        name = "completion",
        description = {
            "Prints a script that completes commands, options and their values in bash and zsh.",
            "For this session: source <(emberline completion)"
        },
        mixinStandardHelpOptions = true)
final class CompletionCommand implements Callable<Integer> {

    @Spec private CommandSpec spec;

    @Override
    public Integer call() {
        CommandSpec root = spec.root();
        spec.commandLine().getOut().print(AutoComplete.bash(root.name(), root.commandLine()));
        spec.commandLine().getOut().flush();
        return ExitCode.DONE;
    }
}
