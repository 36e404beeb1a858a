package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import emberline.survey.Status;
import emberline.survey.SurveySettings;
import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/** Takes spectra that are named on the command line through the chain, each as an object. */
final class SingleSpectra {

    private SingleSpectra() {}

    /**
     * The results of spectra, with findings and failures told on the way.
     *
     * @param files the spectra; each becomes an object named after its file
     * @param catalogue what is measured
     * @param measuring how it is measured
     * @param settings what holds for all
     * @param err where findings and failures go
     * @return a result for each file, in order
     */
    static List<ObjectResult> run(
            List<Path> files,
            FeatureCatalogue catalogue,
            Measuring measuring,
            SurveySettings settings,
            PrintWriter err) {
        Chain chain = new Chain(catalogue, measuring, settings);
        List<ObjectResult> results = new ArrayList<>();
        for (Path file : files) {
            String path = file.toString();
            Candidate candidate =
                    new Candidate(name(file), results.size() + 1, List.of(path), Map.of());
            ObjectResult result = chain.run(candidate, Path.of(""));
            tell(result, err);
            results.add(result);
        }
        return results;
    }

    /** The file name without its endings, as far as something is left. */
    private static String name(Path file) {
        Path last = file.getFileName();
        String name = last == null ? file.toString() : last.toString();
        String stem =
                name.replaceFirst("(?i)(\\.(fits?|csv|txt|dat|ecsv|vot|xml|tsv))?(\\.gz)?$", "");
        return stem.isBlank() ? name : stem;
    }

    /** Says that an object failed and why. */
    static void tellFailure(ObjectResult result, PrintWriter err) {
        err.println(result.candidate().name() + ": failed: " + result.reason());
    }

    private static void tell(ObjectResult result, PrintWriter err) {
        String name = result.candidate().name();
        if (result.status() == Status.FAILED) {
            tellFailure(result, err);
            return;
        }
        for (Finding finding : result.findings()) {
            err.println(
                    name
                            + ": "
                            + finding.severity().name().toLowerCase(Locale.ROOT)
                            + ": "
                            + finding.text());
        }
    }

    /** The exit code for results. */
    static int exitCode(List<ObjectResult> results) {
        long failed = results.stream().filter(r -> r.status() == Status.FAILED).count();
        return ExitCode.of(results.size(), failed);
    }
}
