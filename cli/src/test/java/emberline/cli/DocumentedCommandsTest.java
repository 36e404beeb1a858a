package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import picocli.CommandLine;
import picocli.CommandLine.MissingParameterException;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParameterException;

/** Commands and options in the documents exist, and all that exist are in the documents. */
class DocumentedCommandsTest {

    private static final Pattern INLINE = Pattern.compile("`(emberline [^`]*)`");
    private static final Pattern OPTION = Pattern.compile("(?<![\\w-])--[a-z][a-z-]+");

    /** The calls of the program in blocks that are not run, such as recipes for a cluster. */
    private static List<String> calls(MarkdownDocument document) {
        List<String> calls = new ArrayList<>();
        for (FencedBlock block : document.blocks()) {
            if (!block.isConsole()) {
                calls.addAll(
                        List.of(
                                String.join("\n", block.lines())
                                        .replace("\\\n", " ")
                                        .split("\n", -1)));
            }
        }
        return calls;
    }

    /** What is wrong with the arguments; nothing where the program would take them. */
    private static Optional<String> refused(List<String> words, boolean mayBeIncomplete) {
        try {
            CommandTable.program().parseArgs(words.toArray(String[]::new));
            return Optional.empty();
        } catch (MissingParameterException e) {
            return mayBeIncomplete ? Optional.empty() : Optional.ofNullable(e.getMessage());
        } catch (ParameterException e) {
            return Optional.ofNullable(e.getMessage());
        }
    }

    @Test
    void callsInRecipesAreUnderstood() throws IOException {
        List<String> troubles = new ArrayList<>();
        int found = 0;
        for (MarkdownDocument document : ProjectDocuments.all()) {
            for (String line : calls(document)) {
                Optional<ShellWords> call = ShellWords.ofLine(line);
                if (call.isPresent()) {
                    found++;
                    refused(call.get().words(), false)
                            .ifPresent(why -> troubles.add(document.name() + ": " + line + why));
                }
            }
        }
        assertEquals(List.of(), troubles);
        assertTrue(found > 5, "calls found: " + found);
    }

    @Test
    void callsInTheProseAreUnderstood() throws IOException {
        List<String> troubles = new ArrayList<>();
        for (MarkdownDocument document : ProjectDocuments.all()) {
            Matcher calls = INLINE.matcher(document.prose());
            while (calls.find()) {
                List<String> words = ShellWords.ofLine(calls.group(1)).orElseThrow().words();
                refused(words, true)
                        .ifPresent(
                                why -> troubles.add(document.name() + ": " + calls.group() + why));
            }
        }
        assertEquals(List.of(), troubles);
    }

    @Test
    void aMisspeltRecipeIsNoticed() {
        String line = "exec java -jar emberline.jar sort list.csv --uot DIR > log";
        assertTrue(refused(ShellWords.ofLine(line).orElseThrow().words(), false).isPresent());
        assertEquals(
                List.of("sort", "a b.csv", "--out", "DIR"),
                ShellWords.ofLine("x && java -jar lib/emberline.jar sort 'a b.csv' --out DIR # y")
                        .orElseThrow()
                        .words());
        assertEquals(
                "| head -1", ShellWords.ofLine("emberline doctor | head -1").orElseThrow().rest());
        assertEquals(Optional.empty(), ShellWords.ofLine("cat emberline.txt"));
    }

    private static Set<String> documentedOptions() throws IOException {
        Set<String> documented = new TreeSet<>();
        for (MarkdownDocument document : ProjectDocuments.all()) {
            Matcher options = OPTION.matcher(document.prose().replaceAll("<!--.*-->", ""));
            options.results().forEach(found -> documented.add(found.group()));
        }
        return documented;
    }

    @Test
    void everyCommandAndOptionIsExplained() throws IOException {
        String prose = withoutGenerated(ProjectDocuments.named("cli/README.md"));
        List<String> missing = new ArrayList<>();
        for (CommandSpec command : CommandTable.commands()) {
            if (!prose.contains("`" + command.name())) {
                missing.add(command.name());
            }
            for (OptionSpec option : CommandTable.options(command)) {
                if (!Pattern.compile(option.longestName() + "(?![a-z-])").matcher(prose).find()) {
                    missing.add(command.name() + " " + option.longestName());
                }
            }
        }
        assertEquals(List.of(), missing, "not explained in cli/README.md");
    }

    /** A table that is made from the program explains nothing. */
    private static String withoutGenerated(MarkdownDocument document) {
        return document.prose()
                .replaceAll("(?s)<!-- made from the program: .*?<!-- end of \\w+ -->", "");
    }

    @Test
    void everyOptionOfTheProseExists() throws IOException {
        Set<String> known =
                CommandTable.commands().stream()
                        .flatMap(command -> command.options().stream())
                        .map(OptionSpec::longestName)
                        .collect(Collectors.toCollection(TreeSet::new));
        known.addAll(CommandTable.program().getCommandSpec().optionsMap().keySet());
        Set<String> strange = documentedOptions();
        strange.removeAll(known);
        assertEquals(Set.of(), strange);
    }

    @Test
    void helpNamesWhatTheTableNames() {
        CommandLine program = CommandTable.program();
        for (CommandSpec command : CommandTable.commands()) {
            String help = program.getSubcommands().get(command.name()).getUsageMessage();
            CommandTable.options(command)
                    .forEach(option -> assertTrue(help.contains(option.longestName()), help));
        }
    }
}
