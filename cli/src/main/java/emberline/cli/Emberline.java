package emberline.cli;

import emberline.reports.paint.HeadlessFonts;
import java.io.PrintWriter;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Set;
import java.util.logging.LogManager;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** The program: measures, places and judges cool-dwarf candidates from one-dimensional spectra. */
@Command(
        name = "emberline",
        description = {
            "Measures molecular bands and lines in spectra of cool-dwarf candidates (0.6 to 2.5"
                    + " micron), places each on the sequence M, L, T, Y, and reports.",
            "It supports and does not replace expert judgement."
        },
        mixinStandardHelpOptions = true,
        versionProvider = ProgramVersion.class,
        exitCodeListHeading = "%nExit codes:%n",
        exitCodeList = {
            "0:all was done",
            "1:finished, but some objects failed",
            "2:wrong arguments",
            "3:nothing could be read",
            "4:an output could not be written",
            "130, 143:sort was asked to end (SIGINT, SIGTERM); run it again to go on"
        })
public final class Emberline implements Runnable {

    private static final List<Class<?>> COMMANDS =
            List.of(
                    SortCommand.class,
                    SurveyStatusCommand.class,
                    MergeCommand.class,
                    MeasureCommand.class,
                    PlaceCommand.class,
                    JudgeCommand.class,
                    PlanCommand.class,
                    ReportCommand.class,
                    CatalogueCommand.class,
                    CalibrateCommand.class,
                    CheckCommand.class,
                    DoctorCommand.class,
                    CompletionCommand.class,
                    ManualCommand.class);

    /** Commands that tell of all the others. */
    private static final Set<Class<?>> ABOUT_ALL =
            Set.of(CompletionCommand.class, ManualCommand.class);

    /** Commands that draw nothing. */
    private static final Set<Class<?>> WITHOUT_CHARTS =
            Set.of(
                    SurveyStatusCommand.class,
                    MeasureCommand.class,
                    PlaceCommand.class,
                    JudgeCommand.class,
                    CatalogueCommand.class);

    @Spec private CommandSpec spec;

    /** Runs a command line and ends the program with its exit code. */
    @SuppressWarnings("SystemExitOutsideMain")
    public static void main(String[] arguments) {
        LogManager.getLogManager()
                .reset(); // the table and FITS libraries log what we report better
        PrintWriter out = new PrintWriter(System.out, false, StandardCharsets.UTF_8);
        PrintWriter err = new PrintWriter(System.err, true, StandardCharsets.UTF_8);
        List<Class<?>> asked = asked(arguments);
        if (asked.size() == 1 && !WITHOUT_CHARTS.containsAll(asked)) {
            prepareFonts(err);
        }
        int code = commandLine(out, err, asked).execute(arguments);
        if (out.checkError()) {
            err.println("standard output: cannot be written; check where it goes, then run again");
            code = ExitCode.NOT_WRITTEN;
        }
        System.exit(code);
    }

    private static void prepareFonts(PrintWriter err) {
        try {
            HeadlessFonts.prepare();
        } catch (UncheckedIOException e) {
            err.println(
                    "folder for temporary files: cannot be written ("
                            + e.getCause().getMessage()
                            + "); expected a writable one, for the fonts of the reports. Choose"
                            + " another by the Java option -Djava.io.tmpdir=DIR.");
        }
    }

    /**
     * What has to be described to run a command line. To describe all commands takes longer than
     * most of them run, so one that is named first is described alone.
     */
    static List<Class<?>> asked(String... arguments) {
        return COMMANDS.stream()
                .filter(command -> !ABOUT_ALL.contains(command))
                .filter(command -> arguments.length > 0 && arguments[0].equals(name(command)))
                .findFirst()
                .<List<Class<?>>>map(List::of)
                .orElse(COMMANDS);
    }

    private static String name(Class<?> command) {
        return command.getAnnotation(Command.class).name();
    }

    /**
     * The command line with given streams.
     *
     * @param out where results go
     * @param err where progress, findings and messages go
     * @return a command line, ready to execute
     */
    static CommandLine commandLine(PrintWriter out, PrintWriter err) {
        return commandLine(out, err, COMMANDS);
    }

    private static CommandLine commandLine(
            PrintWriter out, PrintWriter err, List<Class<?>> commands) {
        CommandLine line = new CommandLine(new Emberline());
        commands.forEach(line::addSubcommand);
        return line.setOut(out)
                .setErr(err)
                .setCaseInsensitiveEnumValuesAllowed(true)
                .setParameterExceptionHandler(new UsageFailure())
                .setExecutionExceptionHandler(new FailureHandler());
    }

    @Override
    public void run() {
        throw new ParameterException(spec.commandLine(), "expected a command");
    }
}
