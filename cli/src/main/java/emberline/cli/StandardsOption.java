package emberline.cli;

import emberline.read.UnreadableListException;
import emberline.survey.StandardList;
import emberline.survey.SurveySettings;
import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.Optional;
import picocli.CommandLine.Option;

/** The observer's own standards. */
final class StandardsOption {

    @Option(
            names = "--standards",
            paramLabel = "LIST",
            description =
                    "List of spectra of known type to compare with (as for sort, with the column"
                            + " known_type). Options about spectra, such as --resolution, do not"
                            + " hold for them: the list states what holds.")
    private Path standards;

    /** The file of the list. */
    Optional<Path> file() {
        return Optional.ofNullable(standards);
    }

    /** The settings with the standards, which are read and prepared now. */
    SurveySettings addTo(SurveySettings settings, PrintWriter err) throws UnreadableListException {
        if (standards == null) {
            return settings;
        }
        StandardList list = StandardList.read(standards);
        if (!list.leftOut().isEmpty()) {
            err.println(
                    standards
                            + ": left out, since column known_kind says that they are no dwarfs: "
                            + String.join(", ", list.leftOut()));
        }
        return settings.withStandards(list.comparison());
    }
}
