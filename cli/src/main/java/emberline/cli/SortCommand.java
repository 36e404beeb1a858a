package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.read.CandidateList;
import emberline.reports.attach.RunJson;
import emberline.reports.note.Attachments;
import emberline.reports.page.PdfReport;
import emberline.reports.page.ReportSettings;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import emberline.survey.Status;
import emberline.survey.SurveyRunner;
import emberline.survey.SurveySettings;
import emberline.survey.verdict.Verdicts;
import java.io.IOException;
import java.nio.file.Path;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** {@code sort}: takes a candidate list through the whole chain. */
@Command(
        name = "sort",
        description = {
            "Takes a list of candidates through the whole chain and writes a folder with"
                    + " results.csv, objects/NAME.json, reports/NAME.pdf, survey.html, run.json and"
                    + " what goes into a note: results.ecsv, results.vot, results.mrt, table.tex,"
                    + " sources.bib and methods.txt.",
            "The list needs the columns name and spectrum (path relative to the list; several"
                    + " joined by ;)."
        },
        mixinStandardHelpOptions = true)
final class SortCommand implements Callable<Integer> {

    @Spec private CommandSpec spec;
    @Mixin private ListOptions listOptions;
    @Mixin private JudgingOptions judgingOptions;
    @Mixin private StandardsOption standardsOption;

    @Option(
            names = "--out",
            paramLabel = "DIR",
            required = true,
            description = "Folder for the results; made if it does not stand there.")
    private Path out;

    @Option(names = "--no-reports", description = "Write no PDF reports.")
    private boolean noReports;

    @Mixin private VerdictOptions verdictOptions;

    private final Map<Status, Long> counts = new EnumMap<>(Status.class);

    @Override
    public Integer call() throws IOException, InterruptedException {
        SurveySettings settings =
                standardsOption.addTo(
                        listOptions.settings().withJudging(judgingOptions.judging()),
                        spec.commandLine().getErr());
        FeatureCatalogue catalogue = listOptions.catalogue();
        CandidateList candidates = listOptions.read();
        Verdicts verdicts = verdictOptions.verdicts(out);
        Chain chain = new Chain(catalogue, listOptions.measuring(), settings);
        Progress progress =
                new Progress(
                        spec.commandLine().getErr(),
                        Progress.isTerminal(),
                        candidates.rows().size());
        verdictOptions.strangers(verdicts, candidates).forEach(progress::say);
        try (RunFolder folder =
                new RunFolder(
                        out,
                        candidates,
                        record(settings, verdicts),
                        pdf(settings, catalogue),
                        note(settings, candidates),
                        catalogue)) {
            verdictOptions.keep(verdicts, out);
            new SurveyRunner(chain, settings.threads())
                    .run(
                            candidates,
                            measured -> {
                                ObjectResult result =
                                        measured.withVerdict(
                                                verdicts.of(measured.candidate().name()));
                                folder.writeObject(result);
                                return result;
                            },
                            result -> {
                                folder.add(result);
                                tell(result, progress);
                            });
            folder.complete();
            long left = folder.leftovers();
            if (left > 0) {
                progress.say(
                        out
                                + ": holds "
                                + left
                                + " files of objects of an earlier run, which are not in this list;"
                                + " remove them, or give each list a folder of its own");
            }
        }
        progress.finish(summary(candidates.rows().size()));
        return ExitCode.of(candidates.rows().size(), counts.getOrDefault(Status.FAILED, 0L));
    }

    private Optional<PdfReport> pdf(SurveySettings settings, FeatureCatalogue catalogue) {
        return noReports
                ? Optional.empty()
                : Optional.of(
                        new PdfReport(
                                ReportSettings.of(ProgramVersion.number(), settings.seed()),
                                catalogue));
    }

    private void tell(ObjectResult result, Progress progress) {
        counts.merge(result.status(), 1L, Long::sum);
        if (result.status() == Status.FAILED) {
            progress.say(result.candidate().name() + ": failed: " + result.reason());
        }
        progress.step();
    }

    private String summary(int objects) {
        StringBuilder text = new StringBuilder(objects + (objects == 1 ? " object:" : " objects:"));
        for (Status status : Status.values()) {
            text.append(
                    String.format(
                            Locale.ROOT,
                            " %d %s,",
                            counts.getOrDefault(status, 0L),
                            status.word()));
        }
        return text.append(" written to ").append(out).toString();
    }

    private Attachments.Run note(SurveySettings settings, CandidateList candidates) {
        return new Attachments.Run(
                candidates.file().getFileName().toString(),
                ProgramVersion.number(),
                RunOptions.of(settings, listOptions.measuring(), !noReports),
                settings.seed());
    }

    private RunJson record(SurveySettings settings, Verdicts verdicts) throws IOException {
        Map<String, String> options =
                new LinkedHashMap<>(RunOptions.of(settings, listOptions.measuring(), !noReports));
        options.put("verdicts_sha256", VerdictOptions.checksum(verdicts));
        if (standardsOption.file().isPresent()) {
            Path standards = standardsOption.file().get();
            options.put("standards", standards.getFileName().toString());
            options.put("standards_sha256", FileChecksum.sha256(standards));
        }
        return new RunJson(
                ProgramVersion.number(),
                options,
                settings.seed(),
                FileChecksum.sha256(listOptions.file()));
    }
}
