package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurer;
import emberline.place.calibrated.CalibrationFiles;
import emberline.place.calibrated.Calibrator;
import emberline.place.calibrated.FeatureNoise;
import emberline.place.kind.KindTrainer;
import emberline.place.kind.KindTrialTable;
import emberline.place.reference.ReferenceTable;
import emberline.read.CandidateList;
import emberline.reports.attach.AtomicFile;
import emberline.reports.attach.UnseenSummary;
import emberline.reports.attach.UnseenTable;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import emberline.survey.ReddeningMode;
import emberline.survey.ReferenceMaker;
import emberline.survey.Status;
import emberline.survey.SurveyRunner;
import emberline.survey.SurveySettings;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringReader;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** {@code calibrate}: measures a list of known types into a reference table. */
@Command(
        name = "calibrate",
        description = {
            "Measures a list of spectra of known type, gravity and kind and writes the reference"
                    + " table (values and errors, no pixels).",
            "The list needs known_type_number, known_gravity and known_kind beside name and"
                    + " spectrum; tier, group and dataset are used where they are there."
        },
        mixinStandardHelpOptions = true)
final class CalibrateCommand implements Callable<Integer> {

    @Spec private CommandSpec spec;
    @Mixin private ListOptions listOptions;

    @Option(
            names = "--out",
            paramLabel = "DIR",
            required = true,
            description = "Folder for the table; made if it does not stand there.")
    private Path out;

    private long failed;

    @Override
    public Integer call() throws IOException, InterruptedException {
        SurveySettings settings = listOptions.settings().withReddening(ReddeningMode.NEVER);
        FeatureCatalogue catalogue = listOptions.catalogue();
        CandidateList candidates = listOptions.read();
        Chain chain = new Chain(catalogue, listOptions.measuring(), settings);
        ReferenceMaker maker = new ReferenceMaker();
        KindTrainer trainer = new KindTrainer(new Measurer(catalogue, listOptions.measuring()));
        new SurveyRunner(chain, settings.threads())
                .run(
                        candidates,
                        result -> result,
                        result -> {
                            tell(result);
                            maker.add(result)
                                    .ifPresent(
                                            row ->
                                                    trainer.add(
                                                            row,
                                                            result.leading()
                                                                    .orElseThrow()
                                                                    .prepared()));
                        });
        ReferenceTable table = maker.table();
        Files.createDirectories(out);
        StringWriter text = new StringWriter();
        table.write(text, remarks("Values with one-sigma errors from the pixel noise; no pixels."));
        AtomicFile.write(out.resolve("reference.csv"), text.toString());
        ReferenceTable written = asWritten(text.toString());
        Calibrator.Outcome learned = new Calibrator(written, catalogue).calibrate();
        Map<String, String> files =
                CalibrationFiles.text(
                        learned.calibration(),
                        FeatureNoise.of(written),
                        remarks("Learned from reference.csv."));
        for (Map.Entry<String, String> file : files.entrySet()) {
            AtomicFile.write(out.resolve(file.getKey()), file.getValue());
        }
        AtomicFile.write(
                out.resolve("cross-validated.csv"),
                UnseenTable.text(
                        learned.unseen(),
                        remarks("Each object placed by loci that were learned without it.")));
        spec.commandLine()
                .getErr()
                .println(
                        table.rows().size()
                                + " spectra with "
                                + table.features().size()
                                + " features written to "
                                + out.resolve("reference.csv"));
        spec.commandLine().getOut().print(UnseenSummary.text(learned.unseen()));
        learnKinds(trainer);
        return ExitCode.of(candidates.rows().size(), failed);
    }

    /** Tells of an object from which nothing can be learned. */
    private void tell(ObjectResult result) {
        if (result.status() == Status.FAILED) {
            failed++;
            SingleSpectra.tellFailure(result, spec.commandLine().getErr());
        } else if (result.best().isEmpty()) {
            String name = result.candidate().name();
            spec.commandLine().getErr().println(name + ": left out: no spectrum to measure");
        }
    }

    /**
     * The table with its numbers as printed, so that whoever learns from the file learns the same.
     */
    private static ReferenceTable asWritten(String text) throws IOException {
        return ReferenceTable.read(new StringReader(text));
    }

    private void learnKinds(KindTrainer trainer) throws IOException {
        PrintWriter err = spec.commandLine().getErr();
        if (!trainer.isEnough()) {
            err.println(
                    "no model of kinds: there are too few spectra of late dwarfs, or of other"
                            + " objects, to learn from");
            return;
        }
        KindTrainer.Trained trained = trainer.train(err::println);
        ByteArrayOutputStream model = new ByteArrayOutputStream();
        trained.model().write(model);
        AtomicFile.write(out.resolve("kind-model.gz"), model.toByteArray());
        StringWriter trials = new StringWriter();
        KindTrialTable.write(trials, trained.trials());
        AtomicFile.write(out.resolve("kind-trials.csv"), trials.toString());
        err.println("model of kinds written to " + out.resolve("kind-model.gz"));
    }

    private List<String> remarks(String what) {
        return List.of(
                "Emberline "
                        + ProgramVersion.number()
                        + ": calibrate "
                        + listOptions.file().getFileName()
                        + ".",
                "Measured by this program on the spectra of the list; types, gravities and kinds as"
                        + " listed; `source` in reference.csv names the data set.",
                what);
    }
}
