package emberline.cli;

import emberline.reports.attach.MeasurementTable;
import emberline.reports.attach.TableFormat;
import emberline.survey.ObjectResult;
import java.util.List;
import picocli.CommandLine.Command;

/** {@code measure}: see its description. */
@Command(
        name = "measure",
        description = "Measures every feature of the catalogue on spectra and prints a table.",
        mixinStandardHelpOptions = true)
final class MeasureCommand extends SpectraTableCommand {

    @Override
    String table(List<ObjectResult> results, TableFormat asked) {
        return MeasurementTable.print(results, asked);
    }
}
