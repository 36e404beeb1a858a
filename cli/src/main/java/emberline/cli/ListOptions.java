package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.read.CandidateList;
import emberline.read.CandidateListReader;
import emberline.read.ColumnSpelling;
import emberline.read.UnreadableListException;
import emberline.survey.SurveySettings;
import java.nio.file.Path;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** What every command takes that runs a candidate list through the chain. */
final class ListOptions {

    @Spec(Spec.Target.MIXEE)
    private CommandSpec spec;

    @Mixin private SpectrumOptions spectrumOptions;
    @Mixin private CatalogueOption catalogueOption;

    @Parameters(
            paramLabel = "LIST",
            description = "The candidate list: CSV, ECSV, VOTable or FITS.")
    private Path list;

    @Option(
            names = "--threads",
            paramLabel = "N",
            description = "Number of threads (default: one a processor).")
    private int threads = Runtime.getRuntime().availableProcessors();

    /** The file of the list. */
    Path file() {
        return list;
    }

    /** Reads the list, and asks about columns that look misspelt. */
    CandidateList read() throws UnreadableListException {
        CandidateList read = new CandidateListReader().read(list);
        for (String doubt : ColumnSpelling.doubts(read)) {
            spec.commandLine().getErr().println(list.getFileName() + ": " + doubt);
        }
        return read;
    }

    /** The settings of the run. */
    SurveySettings settings() {
        return spectrumOptions.settings(threads);
    }

    /** How features are measured. */
    Measuring measuring() {
        return spectrumOptions.measuring();
    }

    /** What is measured. */
    FeatureCatalogue catalogue() {
        return catalogueOption.load();
    }
}
