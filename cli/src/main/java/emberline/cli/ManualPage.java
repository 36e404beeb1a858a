package emberline.cli;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import picocli.CommandLine;
import picocli.CommandLine.Help;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.Model.PositionalParamSpec;

/** The manual page of a command, in the language of {@code man}, made from what its help says. */
final class ManualPage {

    private final CommandSpec command;
    private final String version;
    private final StringBuilder text = new StringBuilder();

    private ManualPage(CommandSpec command, String version) {
        this.command = command;
        this.version = version;
    }

    /** The name of the file of a page, such as {@code emberline-sort.1}. */
    static String fileName(CommandSpec command) {
        return command.qualifiedName("-") + ".1";
    }

    /** The page of a command. */
    static String of(CommandSpec command, String version) {
        return new ManualPage(command, version).written();
    }

    private String written() {
        String name = command.qualifiedName("-");
        line(
                ".TH \""
                        + escaped(name.toUpperCase(Locale.ROOT))
                        + "\" 1 \"\" \"emberline "
                        + escaped(version)
                        + "\" \"Emberline manual\"");
        String[] description = described(command.usageMessage().description());
        section("NAME");
        line(escaped(name) + " \\- " + escaped(firstSentence(description)));
        section("SYNOPSIS");
        line(".B " + escaped(command.qualifiedName()));
        line(escaped(synopsis()));
        section("DESCRIPTION");
        for (String paragraph : description) {
            line(".PP");
            line(escaped(paragraph));
        }
        parameters();
        commands();
        exitCodes();
        others();
        return text.toString();
    }

    private String synopsis() {
        String whole =
                new CommandLine(command).getHelp().synopsis(0).replaceAll("\\s+", " ").trim();
        String own = command.qualifiedName();
        return whole.startsWith(own) ? whole.substring(own.length()).trim() : whole;
    }

    private void parameters() {
        if (!command.positionalParameters().isEmpty()) {
            section("ARGUMENTS");
            for (PositionalParamSpec parameter : command.positionalParameters()) {
                item(parameter.paramLabel(), described(parameter.description()));
            }
        }
        section("OPTIONS");
        for (OptionSpec option : command.options()) {
            String names = String.join(", ", option.names());
            boolean takesValue = option.arity().max() > 0;
            item(
                    takesValue ? names + "=" + option.paramLabel() : names,
                    described(resolved(option)));
        }
    }

    /** The description of an option with its default and its values filled in. */
    private static String[] resolved(OptionSpec option) {
        List<String> lines = new ArrayList<>();
        for (String line : option.description()) {
            String value = option.defaultValue() == null ? "" : option.defaultValue();
            List<String> candidates = new ArrayList<>();
            if (option.completionCandidates() != null) {
                option.completionCandidates().forEach(candidates::add);
            }
            lines.add(
                    line.replace("${DEFAULT-VALUE}", value)
                            .replace("${COMPLETION-CANDIDATES}", String.join(", ", candidates)));
        }
        return lines.toArray(String[]::new);
    }

    private void commands() {
        if (command.subcommands().isEmpty()) {
            return;
        }
        section("COMMANDS");
        for (Map.Entry<String, CommandLine> one : command.subcommands().entrySet()) {
            item(
                    one.getKey(),
                    described(one.getValue().getCommandSpec().usageMessage().description()));
        }
    }

    private void exitCodes() {
        section("EXIT STATUS");
        command.root()
                .usageMessage()
                .exitCodeList()
                .forEach((code, meaning) -> item(code, meaning));
    }

    private void others() {
        List<String> pages = new ArrayList<>();
        CommandSpec root = command.root();
        if (command != root) {
            pages.add(root.name() + "(1)");
        }
        for (String other : command.subcommands().keySet()) {
            pages.add(root.name() + "-" + other + "(1)");
        }
        section("SEE ALSO");
        line(escaped(String.join(", ", pages)));
    }

    private static String[] described(String[] lines) {
        String[] plain = new String[lines.length];
        for (int k = 0; k < lines.length; k++) {
            plain[k] = Help.Ansi.OFF.string(lines[k].replace("%%", "%").replace("%n", " "));
        }
        return plain;
    }

    private static String firstSentence(String[] description) {
        String first = description.length == 0 ? "" : description[0];
        int end = first.indexOf(". ");
        return end < 0 ? first : first.substring(0, end + 1);
    }

    private void section(String title) {
        line(".SH " + title);
    }

    private void item(String head, String... body) {
        line(".TP");
        line(".B " + escaped(head));
        line(escaped(String.join(" ", body)));
    }

    private void line(String line) {
        text.append(line).append('\n');
    }

    /** Text that {@code man} prints as it stands. */
    static String escaped(String plain) {
        String escaped = plain.replace("\\", "\\e").replace("-", "\\-").replace('\n', ' ');
        return escaped.startsWith(".") || escaped.startsWith("'") ? "\\&" + escaped : escaped;
    }
}
