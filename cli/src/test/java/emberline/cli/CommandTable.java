package emberline.cli;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import picocli.CommandLine;
import picocli.CommandLine.Model.ArgSpec;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;

/** The commands with their options as a table of a document. */
final class CommandTable {

    private CommandTable() {}

    /** The program as it is parsed, to be looked at. */
    static CommandLine program() {
        return Emberline.commandLine(
                new PrintWriter(new StringWriter()), new PrintWriter(new StringWriter()));
    }

    /** The commands that are shown in the help, in its order. */
    static List<CommandSpec> commands() {
        return program().getSubcommands().values().stream()
                .map(CommandLine::getCommandSpec)
                .filter(spec -> !spec.usageMessage().hidden())
                .toList();
    }

    /** The options of a command but {@code --help} and {@code --version}. */
    static List<OptionSpec> options(CommandSpec command) {
        return command.options().stream()
                .filter(option -> !option.hidden() && !option.usageHelp() && !option.versionHelp())
                .toList();
    }

    static GeneratedPart part() {
        List<String> lines = new ArrayList<>();
        lines.add("| command | options |");
        lines.add("|---|---|");
        for (CommandSpec command : commands()) {
            String words =
                    command.positionalParameters().stream()
                            .map(CommandTable::label)
                            .map(label -> " " + label)
                            .collect(Collectors.joining());
            lines.add(
                    String.format(
                            "| `%s%s` | %s |",
                            command.name(),
                            words,
                            options(command).stream()
                                    .map(option -> "`" + option.longestName() + value(option) + "`")
                                    .sorted()
                                    .collect(Collectors.joining(" "))));
        }
        return new GeneratedPart("cli/README.md", "commands", lines);
    }

    private static String label(ArgSpec parameter) {
        String many = parameter.arity().max() > 1 ? "..." : "";
        String label = parameter.paramLabel() + many;
        return parameter.arity().min() == 0 ? "[" + label + "]" : label;
    }

    private static String value(OptionSpec option) {
        return option.arity().max() == 0 ? "" : " " + option.paramLabel().replace("|", "\\|");
    }
}
