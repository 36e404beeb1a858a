package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.reports.attach.AtomicFile;
import emberline.reports.attach.ResultColumns;
import emberline.reports.attach.SafeFileNames;
import emberline.reports.note.Attachments;
import emberline.reports.page.Paper;
import emberline.reports.page.PdfReport;
import emberline.reports.page.ReportSettings;
import emberline.survey.ObjectResult;
import emberline.survey.SurveySettings;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** {@code report}: writes the PDF report of spectra. */
@Command(
        name = "report",
        description = "Writes a PDF report for each spectrum and prints the names of the files.",
        mixinStandardHelpOptions = true)
final class ReportCommand implements Callable<Integer> {

    private static final String BOUND = "bound-reports.pdf";

    @Spec private CommandSpec spec;
    @Mixin private SpectrumOptions spectrumOptions;
    @Mixin private JudgingOptions judgingOptions;
    @Mixin private StandardsOption standardsOption;
    @Mixin private CatalogueOption catalogueOption;

    @Parameters(paramLabel = "SPECTRUM", arity = "1..*", description = "Files of spectra.")
    private List<Path> spectra;

    @Option(
            names = "--out",
            paramLabel = "DIR",
            required = true,
            description = "Folder for the reports; made if it does not stand there.")
    private Path out;

    @Option(
            names = "--paper",
            paramLabel = "a4|letter",
            defaultValue = "a4",
            description = "Size of the pages (default ${DEFAULT-VALUE}).")
    private Paper paper;

    @Option(
            names = "--bind",
            description = "Also write all reports as one PDF with contents, " + BOUND + ".")
    private boolean bind;

    @Option(
            names = "--attachments",
            description =
                    "Also write what goes into a note: results.ecsv, results.vot, results.mrt,"
                            + " table.tex, sources.bib, methods.txt.")
    private boolean attachments;

    @Override
    public Integer call() throws IOException {
        SurveySettings settings =
                standardsOption.addTo(
                        spectrumOptions.settings(1).withJudging(judgingOptions.judging()),
                        spec.commandLine().getErr());
        FeatureCatalogue catalogue = catalogueOption.load();
        List<ObjectResult> results =
                SingleSpectra.run(
                        spectra,
                        catalogue,
                        spectrumOptions.measuring(),
                        settings,
                        spec.commandLine().getErr());
        PdfReport pdf =
                new PdfReport(
                        ReportSettings.of(ProgramVersion.number(), settings.seed())
                                .withPaper(paper),
                        catalogue);
        Files.createDirectories(out);
        ReportWriter writer = new ReportWriter(pdf, out);
        SafeFileNames names =
                SafeFileNames.of(results.stream().map(r -> r.candidate().name()).toList());
        for (int k = 0; k < results.size(); k++) {
            if (writer.write(results.get(k), names.stem(k))) {
                spec.commandLine().getOut().println(out.resolve(names.stem(k) + ".pdf"));
            }
        }
        if (bind) {
            bind(pdf, results);
        }
        if (attachments) {
            attach(results, catalogue, settings);
        }
        spec.commandLine().getOut().flush();
        return SingleSpectra.exitCode(results);
    }

    private void bind(PdfReport pdf, List<ObjectResult> results) throws IOException {
        List<ObjectResult> shown = results.stream().filter(PdfReport::canReport).toList();
        if (!shown.isEmpty()) {
            ByteArrayOutputStream bytes = new ByteArrayOutputStream();
            pdf.bind(shown, bytes);
            AtomicFile.write(out.resolve(BOUND), bytes.toByteArray());
            spec.commandLine().getOut().println(out.resolve(BOUND));
        }
    }

    private void attach(
            List<ObjectResult> results, FeatureCatalogue catalogue, SurveySettings settings)
            throws IOException {
        Attachments.Run run =
                new Attachments.Run(
                        "the spectra given",
                        ProgramVersion.number(),
                        RunOptions.of(settings, spectrumOptions.measuring(), true),
                        settings.seed());
        try (Attachments note = Attachments.open(out, ResultColumns.standard(), catalogue, run)) {
            for (ObjectResult result : results) {
                note.add(result);
            }
            note.complete();
        }
    }
}
