package emberline.cli;

import emberline.judge.Aim;
import emberline.judge.Judge;
import emberline.judge.Judging;
import emberline.judge.plan.PlanAim;
import emberline.judge.plan.PlanQuestion;
import emberline.judge.plan.SignalPlan;
import emberline.judge.plan.SignalPlanner;
import emberline.place.GravityClass;
import emberline.place.calibrated.Calibration;
import emberline.place.calibrated.FeatureNoise;
import emberline.place.calibrated.Forecast;
import emberline.place.calibrated.TypePrior;
import emberline.place.calibrated.TypePriors;
import emberline.reports.attach.AtomicFile;
import emberline.reports.attach.PlanTable;
import emberline.reports.attach.TableFormat;
import emberline.reports.page.PlanReport;
import emberline.reports.page.ReportSettings;
import emberline.spectrum.SpectralType;
import emberline.survey.SurveySettings;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Path;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** {@code plan}: tells what signal-to-noise a question needs. */
@Command(
        name = "plan",
        description =
                "Tells from which signal-to-noise a spectrum makes an answer sure, by drawing and"
                        + " judging spectra that have not been taken yet.",
        mixinStandardHelpOptions = true)
final class PlanCommand implements Callable<Integer> {

    private static final double LATEST_TYPE = 31;
    private static final double LEAST_RESOLUTION = 30;

    @Spec private CommandSpec spec;
    @Mixin private DecisionOptions decision;

    @Option(
            names = "--type",
            paramLabel = "TYPE",
            required = true,
            description = "Spectral type the object is thought to have, e.g. L3.")
    private String type;

    @Option(
            names = "--gravity",
            paramLabel = "FLD-G|INT-G|VL-G",
            defaultValue = "FLD-G",
            description = "Gravity class it is thought to have (default ${DEFAULT-VALUE}).")
    private String gravity;

    @Option(
            names = "--resolution",
            paramLabel = "R",
            defaultValue = "120",
            description = "Resolving power of the spectrum (default ${DEFAULT-VALUE}).")
    private double resolution;

    @Option(
            names = "--aim",
            paramLabel = "gravity|substellar|young|coolest",
            defaultValue = "gravity",
            description = "What the spectrum should decide (default ${DEFAULT-VALUE}).")
    private String aim;

    @Option(
            names = "--snr-now",
            paramLabel = "N",
            description =
                    "Median signal-to-noise a pixel of a spectrum at hand; exposure times are then"
                            + " given as multiples of its own.")
    private Double signalNow;

    @Option(
            names = "--draws",
            paramLabel = "N",
            defaultValue = "200",
            description = "Spectra drawn at each signal-to-noise (default ${DEFAULT-VALUE}).")
    private int draws;

    @Option(
            names = "--prior",
            paramLabel = "flat|volume|magnitude",
            defaultValue = "flat",
            description = "What is thought of types beforehand (default ${DEFAULT-VALUE}).")
    private TypePriors prior;

    @Option(
            names = "--seed",
            paramLabel = "N",
            defaultValue = "" + SurveySettings.DEFAULT_SEED,
            description = "Start of all random draws (default ${DEFAULT-VALUE}).")
    private long seed;

    @Option(
            names = "--chart",
            paramLabel = "FILE",
            description = "Write the charts of the plan to a PDF file.")
    private Path chart;

    @Option(
            names = "--format",
            paramLabel = "text|csv|json",
            defaultValue = "text",
            description = "Form of the table (default ${DEFAULT-VALUE}).")
    private TableFormat format;

    @Override
    public Integer call() throws IOException {
        PlanQuestion question = question();
        Judging judging =
                question.aim() == PlanAim.GRAVITY
                        ? decision.judging()
                        : decision.judging()
                                .withAims(Map.of(Aim.valueOf(question.aim().name()), 1.0));
        TypePrior known = prior.load();
        Forecast forecast = new Forecast(Calibration.standard(), known, FeatureNoise.standard());
        SignalPlan plan = plan(new SignalPlanner(forecast, new Judge(judging), known), question);
        OptionalDouble now =
                signalNow == null ? OptionalDouble.empty() : OptionalDouble.of(signalNow);
        spec.commandLine().getOut().print(new PlanTable(plan, now).print(format));
        spec.commandLine().getOut().flush();
        if (chart != null) {
            ByteArrayOutputStream pdf = new ByteArrayOutputStream();
            new PlanReport(ReportSettings.of(ProgramVersion.number(), seed)).write(plan, pdf);
            AtomicFile.write(chart, pdf.toByteArray());
        }
        return ExitCode.DONE;
    }

    private SignalPlan plan(SignalPlanner planner, PlanQuestion question) {
        try {
            return planner.plan(question);
        } catch (IllegalArgumentException e) {
            throw wrong("--type and --resolution: " + e.getMessage());
        }
    }

    private PlanQuestion question() {
        SpectralType parsed =
                SpectralType.parse(type)
                        .filter(t -> t.number() >= 0 && t.number() <= LATEST_TYPE)
                        .orElseThrow(
                                () -> wrong("--type: expected one from M0 to Y1 but was " + type));
        GravityClass wanted =
                GravityClass.ofLabel(gravity)
                        .orElseThrow(
                                () ->
                                        wrong(
                                                "--gravity: expected "
                                                        + GravityClass.labels()
                                                        + " but was "
                                                        + gravity));
        if (!(resolution >= LEAST_RESOLUTION)) {
            throw wrong("--resolution: expected at least 30 but was " + resolution);
        }
        if (signalNow != null && !(signalNow > 0)) {
            throw wrong("--snr-now: expected a number above zero but was " + signalNow);
        }
        try {
            return new PlanQuestion(
                    new Forecast.Setting(parsed.number(), wanted, resolution),
                    PlanAim.parse(aim),
                    decision.judging().substellarFrom(),
                    PlanQuestion.SIGNALS,
                    draws,
                    seed);
        } catch (IllegalArgumentException e) {
            throw wrong(e.getMessage());
        }
    }

    private ParameterException wrong(String message) {
        return new ParameterException(spec.commandLine(), message);
    }
}
