package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.read.CandidateRows;
import emberline.read.CandidateSource;
import emberline.read.Checksum;
import emberline.reports.ledger.RunIdentity;
import emberline.reports.ledger.RunProgress;
import emberline.reports.page.PdfReport;
import emberline.reports.page.ReportSettings;
import emberline.survey.Chain;
import emberline.survey.Status;
import emberline.survey.SurveyPart;
import emberline.survey.SurveySettings;
import emberline.survey.verdict.Verdicts;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
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
                    + " joined by ;, or a pattern such as night1/*.fits).",
            "In place of the list: a FITS file that holds many spectra (table with array columns,"
                    + " a row each; an HDU each; an image with a row each), a folder of spectra, or"
                    + " a pattern in quotes."
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

    @Option(
            names = "--no-objects",
            description = "Write no JSON file for each object; results.csv and the ledger remain.")
    private boolean noObjects;

    @Option(
            names = "--part",
            paramLabel = "I/N",
            description =
                    "Run part I of N parts of the list; merge joins the folders of all parts.")
    private String part;

    @Option(
            names = "--timings",
            description = "Say where time went, how many objects a second, and peak memory.")
    private boolean timings;

    @Override
    public Integer call() throws IOException, InterruptedException {
        try (StopSignal stop = new StopSignal()) {
            return sort(stop);
        }
    }

    private int sort(StopSignal stop) throws IOException, InterruptedException {
        long start = System.nanoTime();
        SurveySettings settings =
                standardsOption.addTo(
                        listOptions.settings().withJudging(judgingOptions.judging()),
                        spec.commandLine().getErr());
        SurveyPart mine = part();
        FeatureCatalogue catalogue = listOptions.catalogue();
        CandidateSource source = listOptions.source();
        Verdicts verdicts = verdictOptions.verdicts(out);
        RunIdentity identity = identity(source, settings, verdicts, mine);
        listOptions.doubts(identity.listColumns()).forEach(spec.commandLine().getErr()::println);
        verdictOptions.strangers(verdicts, source).forEach(spec.commandLine().getErr()::println);
        RunFolder folder =
                new RunFolder(out, identity, catalogue, !noObjects, pdf(settings, catalogue));
        Chain chain = new Chain(catalogue, listOptions.measuring(), settings);
        Progress[] progress = new Progress[1];
        SurveyRun run = new SurveyRun(out, identity, folder, chain, source, mine, verdicts);
        SurveyRun.Ending ending =
                run.run(
                        settings.threads(),
                        stop,
                        objects -> {
                            verdictOptions.keep(verdicts, out);
                            progress[0] = progress(objects);
                            return progress[0];
                        });
        progress[0].finish(summary(ending));
        RunProgress reached = ending.progress();
        if (timings) {
            double seconds = (System.nanoTime() - start) * 1e-9;
            progress[0].say(
                    TimingText.of(
                            chain.times(), settings.threads(), reached.doneThisTime(), seconds));
        }
        return ending.complete()
                ? ExitCode.of(
                        reached.done(),
                        reached.doneByStatus().getOrDefault(Status.FAILED.word(), 0L))
                : ExitCode.SOME_FAILED;
    }

    private Progress progress(long objects) {
        return new Progress(spec.commandLine().getErr(), Progress.isTerminal(), objects);
    }

    private SurveyPart part() {
        try {
            return part == null ? SurveyPart.whole() : SurveyPart.parse(part);
        } catch (IllegalArgumentException e) {
            throw new ParameterException(spec.commandLine(), "--part: " + e.getMessage());
        }
    }

    private Optional<PdfReport> pdf(SurveySettings settings, FeatureCatalogue catalogue) {
        return noReports
                ? Optional.empty()
                : Optional.of(
                        new PdfReport(
                                ReportSettings.of(ProgramVersion.number(), settings.seed()),
                                catalogue));
    }

    private String summary(SurveyRun.Ending ending) {
        RunProgress run = ending.progress();
        long objects = ending.complete() ? run.objects() : run.done();
        StringBuilder text = new StringBuilder();
        if (!ending.complete()) {
            text.append("stopped; run the same command again to go on. So far ");
        }
        text.append(objects).append(objects == 1 ? " object:" : " objects:");
        for (Status status : Status.values()) {
            text.append(
                    String.format(
                            Locale.ROOT,
                            " %d %s,",
                            run.doneByStatus().getOrDefault(status.word(), 0L),
                            status.word()));
        }
        if (ending.unchanged() > 0) {
            text.append(" ").append(ending.unchanged()).append(" of them unchanged,");
        }
        return text.append(" written to ").append(out).toString();
    }

    private RunIdentity identity(
            CandidateSource source, SurveySettings settings, Verdicts verdicts, SurveyPart mine)
            throws IOException {
        try (CandidateRows rows = source.open()) {
            return new RunIdentity(
                    ProgramVersion.number(),
                    options(settings),
                    Map.of("verdicts_sha256", VerdictOptions.checksum(verdicts)),
                    settings.seed(),
                    source.name(),
                    source.sha256(),
                    rows.columns(),
                    mine.text());
        }
    }

    private Map<String, String> options(SurveySettings settings) throws IOException {
        Map<String, String> options =
                new LinkedHashMap<>(RunOptions.of(settings, listOptions.measuring(), !noReports));
        options.put("catalogue", listOptions.catalogueSha256());
        options.put("objects", noObjects ? "none" : "json");
        if (standardsOption.file().isPresent()) {
            Path standards = standardsOption.file().get();
            options.put("standards", standards.getFileName().toString());
            String spectra = String.join("\n", settings.standards().get().checksums());
            String all = Checksum.of(standards) + "\n" + spectra;
            options.put("standards_sha256", Checksum.of(all.getBytes(StandardCharsets.UTF_8)));
        }
        return options;
    }
}
