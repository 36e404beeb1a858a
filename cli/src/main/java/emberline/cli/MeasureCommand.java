package emberline.cli;

import emberline.reports.attach.MeasurementTable;
import emberline.reports.attach.TableFormat;
import emberline.survey.ObjectResult;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** {@code measure}: see its description. */
@Command(
        name = "measure",
        description = "Measures every feature of the catalogue on spectra and prints a table.",
        mixinStandardHelpOptions = true)
final class MeasureCommand implements Callable<Integer> {

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

    @Override
    public Integer call() {
        List<ObjectResult> results =
                SingleSpectra.run(
                        spectra,
                        catalogueOption.load(),
                        spectrumOptions.measuring(),
                        spectrumOptions.settings(1),
                        spec.commandLine().getErr());
        spec.commandLine().getOut().print(MeasurementTable.print(results, format));
        spec.commandLine().getOut().flush();
        return SingleSpectra.exitCode(results);
    }
}
