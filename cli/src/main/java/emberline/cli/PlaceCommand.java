package emberline.cli;

import emberline.judge.Judging;
import emberline.read.UnreadableListException;
import emberline.reports.attach.PlacementTable;
import emberline.reports.attach.TableFormat;
import emberline.survey.ObjectResult;
import emberline.survey.SurveySettings;
import java.io.PrintWriter;
import java.util.List;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;

/** {@code place}: see its description. */
@Command(
        name = "place",
        description =
                "Places spectra on the sequence of spectral types, judges the objects, and prints a"
                        + " table.",
        mixinStandardHelpOptions = true)
final class PlaceCommand extends SpectraTableCommand {

    @Mixin private JudgingOptions judgingOptions;
    @Mixin private StandardsOption standardsOption;

    @Override
    Judging judging() {
        return judgingOptions.judging();
    }

    @Override
    SurveySettings completed(SurveySettings settings, PrintWriter err)
            throws UnreadableListException {
        return standardsOption.addTo(settings, err);
    }

    @Override
    String table(List<ObjectResult> results, TableFormat asked) {
        return PlacementTable.print(results, asked);
    }
}
