package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.prepare.Degrading;
import emberline.read.CandidateList;
import emberline.reports.attach.AtomicFile;
import emberline.reports.attach.CheckJson;
import emberline.reports.attach.CheckTables;
import emberline.reports.page.CheckReport;
import emberline.reports.page.ReportSettings;
import emberline.survey.Chain;
import emberline.survey.HeldOutPlacers;
import emberline.survey.PlacerChoice;
import emberline.survey.ReddeningMode;
import emberline.survey.ReferenceMaker;
import emberline.survey.Status;
import emberline.survey.SurveyRunner;
import emberline.survey.SurveySettings;
import emberline.survey.score.CheckScore;
import emberline.survey.score.ScoredObject;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.Callable;
import java.util.stream.Collectors;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** {@code check}: scores the program on a list of known objects. */
@Command(
        name = "check",
        description = {
            "Takes a list of objects of known type, gravity and kind through the chain and says how"
                    + " far the results agree.",
            "Beside name and spectrum the list needs known_type_number or known_type; known_gravity,"
                    + " known_kind (dwarf where it is missing), known_metallicity (d, sd, esd, usd),"
                    + " tier and dataset are used where they are there.",
            "The degrade options show what the results are worth on poorer spectra."
        },
        mixinStandardHelpOptions = true)
final class CheckCommand implements Callable<Integer> {

    @Spec private CommandSpec spec;
    @Mixin private ListOptions listOptions;
    @Mixin private DegradeOptions degradeOptions;

    @Option(
            names = "--leave-out",
            description =
                    "Learn the calibration from this list, in ten folds, and place each object by"
                            + " one that has not seen it; takes the list twice. Without it the"
                            + " product's own calibration is used, and objects from which that was"
                            + " learned flatter the scores.")
    private boolean leaveOut;

    @Option(
            names = "--format",
            paramLabel = "text|json",
            defaultValue = "text",
            description = "Form of the scores on standard output (default ${DEFAULT-VALUE}).")
    private ScoreFormat format;

    @Option(
            names = "--out",
            paramLabel = "DIR",
            description =
                    "Folder for check.json, residuals.csv and check.pdf; made if it does not stand"
                            + " there (default: write no files).")
    private Path out;

    /** How scores are printed. */
    private enum ScoreFormat {
        TEXT,
        JSON
    }

    @Override
    public Integer call() throws IOException, InterruptedException {
        SurveySettings settings = listOptions.settings().withDegrading(degradeOptions.degrading());
        CandidateList candidates = listOptions.read();
        Chain chain = chain(candidates, settings);
        Progress progress =
                new Progress(
                        spec.commandLine().getErr(),
                        Progress.isTerminal(),
                        candidates.rows().size());
        List<ScoredObject> objects = new ArrayList<>();
        new SurveyRunner(chain, settings.threads())
                .run(
                        candidates,
                        ScoredObject::of,
                        object -> {
                            objects.add(object);
                            if (object.status() == Status.FAILED) {
                                progress.say(object.name() + ": failed: " + object.reason());
                            }
                            progress.step();
                        });
        CheckScore score = CheckScore.of(objects);
        String json = json(settings).text(score);
        if (out != null) {
            write(score, json, settings);
        }
        spec.commandLine()
                .getOut()
                .print(
                        format == ScoreFormat.JSON
                                ? json
                                : CheckTables.text(score, remark(settings)));
        spec.commandLine().getOut().flush();
        progress.finish(objects.size() + (objects.size() == 1 ? " object" : " objects"));
        return ExitCode.of(objects.size(), score.failed());
    }

    /** The chain that is scored; with {@code --leave-out} it is learned from the list first. */
    private Chain chain(CandidateList candidates, SurveySettings settings)
            throws IOException, InterruptedException {
        FeatureCatalogue catalogue = listOptions.catalogue();
        Measuring measuring = listOptions.measuring();
        if (!leaveOut) {
            return new Chain(catalogue, measuring, settings);
        }
        SurveySettings asObserved =
                settings.withDegrading(Degrading.none()).withReddening(ReddeningMode.NEVER);
        ReferenceMaker maker = new ReferenceMaker();
        new SurveyRunner(new Chain(catalogue, measuring, asObserved), settings.threads())
                .run(candidates, result -> result, maker::add);
        PlacerChoice unseen =
                HeldOutPlacers.learned(maker.table(), catalogue, settings.prior().load());
        return new Chain(catalogue, measuring, settings, unseen);
    }

    private CheckJson json(SurveySettings settings) {
        Map<String, String> options =
                new LinkedHashMap<>(RunOptions.of(settings, listOptions.measuring(), false));
        options.remove("reports");
        options.put("leave_out", Boolean.toString(leaveOut));
        options.putAll(DegradeOptions.record(settings.degrading()));
        return new CheckJson(ProgramVersion.number(), listName(), options, settings.seed());
    }

    private String listName() {
        return listOptions.file().getFileName().toString();
    }

    private void write(CheckScore score, String json, SurveySettings settings) throws IOException {
        Files.createDirectories(out);
        AtomicFile.write(out.resolve("check.json"), json);
        AtomicFile.write(out.resolve("residuals.csv"), CheckTables.residuals(score));
        if (CheckReport.canReport(score)) {
            ReportSettings paper = ReportSettings.of(ProgramVersion.number(), settings.seed());
            ByteArrayOutputStream pdf = new ByteArrayOutputStream();
            new CheckReport(paper).write(score, listName(), remark(settings), pdf);
            AtomicFile.write(out.resolve("check.pdf"), pdf.toByteArray());
        }
    }

    /** What must be known to read the scores. */
    private String remark(SurveySettings settings) {
        String degraded =
                DegradeOptions.record(settings.degrading()).entrySet().stream()
                        .filter(option -> !option.getValue().isEmpty())
                        .map(
                                option ->
                                        option.getKey().replace("degrade_", "")
                                                + " "
                                                + option.getValue())
                        .collect(Collectors.joining(", "));
        return (leaveOut
                        ? "Each type and gravity class was found by what was learned without the object;"
                                + " kinds were not: their model has seen the product's reference"
                                + " list."
                        : "Placed by the product's own calibration, which objects it was learned"
                                + " from flatter.")
                + (degraded.isEmpty() ? "" : " Spectra degraded: " + degraded + ".");
    }
}
