package emberline.cli;

import emberline.judge.Judging;
import emberline.read.UnreadableListException;
import emberline.reports.attach.TableFormat;
import emberline.survey.ObjectResult;
import emberline.survey.SurveySettings;
import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** A command that takes spectra through the chain and prints a table of their results. */
abstract class SpectraTableCommand implements Callable<Integer> {

    @Spec private CommandSpec spec;
    @Mixin private SpectrumOptions spectrumOptions;
    @Mixin private CatalogueOption catalogueOption;

    @Parameters(paramLabel = "SPECTRUM", arity = "1..*", description = "Files of spectra.")
    private List<Path> spectra;

    @Option(
            names = "--format",
            paramLabel = "text|csv|json",
            defaultValue = "text",
            description = "Form of the table (default ${DEFAULT-VALUE}).")
    private TableFormat format;

    /** The table of the results in a format, with a line end. */
    abstract String table(List<ObjectResult> results, TableFormat asked);

    /** How objects are judged; by default as usual. */
    Judging judging() {
        return Judging.withDefaults();
    }

    /** The settings as the command adds to them; by default as they are. */
    SurveySettings completed(SurveySettings settings, PrintWriter err)
            throws UnreadableListException {
        return settings;
    }

    @Override
    public Integer call() throws UnreadableListException {
        List<ObjectResult> results =
                SingleSpectra.run(
                        spectra,
                        catalogueOption.load(),
                        spectrumOptions.measuring(),
                        completed(
                                spectrumOptions.settings(1).withJudging(judging()),
                                spec.commandLine().getErr()),
                        spec.commandLine().getErr());
        spec.commandLine().getOut().print(table(results, format));
        spec.commandLine().getOut().flush();
        return SingleSpectra.exitCode(results);
    }
}
