package emberline.cli;

import emberline.read.NearestWord;
import emberline.reports.attach.AtomicFile;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.Callable;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** {@code manual}: prints a manual page, or writes all of them. */
@Command(
        name = "manual",
        description = {
            "Prints the manual page of a command for man, or writes the pages of all.",
            "To read one: emberline manual sort | man -l -"
        },
        mixinStandardHelpOptions = true)
final class ManualCommand implements Callable<Integer> {

    @Spec private CommandSpec spec;

    @Parameters(
            paramLabel = "COMMAND",
            arity = "0..1",
            description = "Whose page; without it that of the program.")
    private String command;

    @Option(
            names = "--out",
            paramLabel = "DIR",
            description = "Write the pages of all commands there instead.")
    private Path out;

    @Override
    public Integer call() throws IOException {
        CommandSpec root = spec.root();
        String version = ProgramVersion.number();
        if (out != null) {
            Files.createDirectories(out);
            for (CommandSpec each : all(root)) {
                Path page = out.resolve(ManualPage.fileName(each));
                AtomicFile.write(page, ManualPage.of(each, version));
                spec.commandLine().getOut().println(page);
            }
        } else {
            spec.commandLine().getOut().print(ManualPage.of(asked(root), version));
        }
        spec.commandLine().getOut().flush();
        return ExitCode.DONE;
    }

    private static List<CommandSpec> all(CommandSpec root) {
        List<CommandSpec> all = new ArrayList<>(List.of(root));
        root.subcommands().values().forEach(one -> all.add(one.getCommandSpec()));
        return all;
    }

    private CommandSpec asked(CommandSpec root) {
        if (command == null) {
            return root;
        }
        Map<String, CommandLine> known = root.subcommands();
        if (!known.containsKey(command)) {
            throw new ParameterException(
                    spec.commandLine(),
                    "no command "
                            + command
                            + ": expected one of "
                            + String.join(", ", known.keySet())
                            + NearestWord.to(command, known.keySet())
                                    .map(near -> "; did you mean " + near + "?")
                                    .orElse(""));
        }
        return known.get(command).getCommandSpec();
    }
}
