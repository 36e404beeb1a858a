package emberline.cli;

import emberline.reports.ledger.LedgerException;
import emberline.reports.ledger.RunLedger;
import emberline.reports.ledger.RunProgress;
import emberline.survey.Status;
import java.nio.file.Path;
import java.util.Locale;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** {@code survey-status}: how far a run is, while it goes on or after. */
@Command(
        name = "survey-status",
        description =
                "Prints how far a run is: while it goes on, after it stopped, or when it is"
                        + " complete.",
        mixinStandardHelpOptions = true)
final class SurveyStatusCommand implements Callable<Integer> {

    @Spec private CommandSpec spec;

    @Parameters(paramLabel = "DIR", description = "The folder that was given to sort with --out.")
    private Path folder;

    @Override
    public Integer call() throws LedgerException {
        spec.commandLine().getOut().print(text(RunLedger.progress(folder)));
        spec.commandLine().getOut().flush();
        return ExitCode.DONE;
    }

    static String text(RunProgress run) {
        StringBuilder text = new StringBuilder();
        text.append(run.listName());
        text.append(run.part().isEmpty() ? "" : ", part " + run.part());
        text.append(": ").append(run.state()).append('\n');
        text.append(run.done()).append(" of ").append(run.objects()).append(" objects done:");
        String separator = " ";
        for (Status status : Status.values()) {
            text.append(separator)
                    .append(run.doneByStatus().getOrDefault(status.word(), 0L))
                    .append(' ')
                    .append(status.word());
            separator = ", ";
        }
        text.append('\n');
        if (run.doneThisTime() > 0 && run.seconds() > 0) {
            double rate = run.doneThisTime() / run.seconds();
            text.append(String.format(Locale.ROOT, "%.1f objects a second", rate));
            if (run.state().equals("running")) {
                long left = Math.round((run.objects() - run.done()) / rate);
                text.append(String.format(Locale.ROOT, ", %d:%02d left", left / 60, left % 60));
            }
            text.append('\n');
        }
        if (run.state().equals("stopped") || run.state().equals("killed")) {
            text.append("run the same sort command again: it goes on from here\n");
        }
        for (RunProgress.Failure failure : run.failures()) {
            text.append(failure.name()).append(": failed: ").append(failure.reason()).append('\n');
        }
        return text.toString();
    }
}
