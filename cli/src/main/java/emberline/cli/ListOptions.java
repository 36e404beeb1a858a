package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.read.CandidateList;
import emberline.read.CandidateListReader;
import emberline.read.CandidateSource;
import emberline.read.ColumnSpelling;
import emberline.read.UnreadableListException;
import emberline.survey.SurveySettings;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
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

    /** The objects of the list, one by one. */
    CandidateSource source() throws UnreadableListException {
        return CandidateSource.of(list);
    }

    /** What to ask about columns that look misspelt. */
    List<String> doubts(List<String> columns) {
        return ColumnSpelling.doubts(columns).stream()
                .map(doubt -> list.getFileName() + ": " + doubt)
                .toList();
    }

    /** Reads the list, and asks about columns that look misspelt. */
    CandidateList read() throws UnreadableListException {
        CandidateList read = new CandidateListReader().read(list);
        doubts(read.columns()).forEach(spec.commandLine().getErr()::println);
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

    /** Checksum of the user's own definitions; empty where there are none. */
    String catalogueSha256() throws IOException {
        return catalogueOption.sha256();
    }

    /** What is measured. */
    FeatureCatalogue catalogue() {
        return catalogueOption.load();
    }
}
