package emberline.cli;

import emberline.reports.attach.PlacementTable;
import emberline.reports.attach.TableFormat;
import emberline.survey.ObjectResult;
import java.util.List;
import picocli.CommandLine.Command;

/** {@code place}: see its description. */
@Command(
        name = "place",
        description = "Places spectra on the sequence of spectral types and prints a table.",
        mixinStandardHelpOptions = true)
final class PlaceCommand extends SpectraTableCommand {

    @Override
    String table(List<ObjectResult> results, TableFormat asked) {
        return PlacementTable.print(results, asked);
    }
}
