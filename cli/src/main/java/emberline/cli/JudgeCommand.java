package emberline.cli;

import emberline.place.GravityClass;
import emberline.place.TypeEstimate;
import emberline.reports.attach.PlacementTable;
import emberline.reports.attach.TableFormat;
import emberline.spectrum.Candidate;
import emberline.spectrum.SpectralType;
import emberline.survey.KnownObject;
import emberline.survey.ObjectResult;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** {@code judge}: judges objects whose type is known from elsewhere. */
@Command(
        name = "judge",
        description =
                "Judges objects whose spectral type is known from elsewhere: properties, age, mass,"
                        + " and whether they are below the hydrogen-burning limit.",
        mixinStandardHelpOptions = true)
final class JudgeCommand implements Callable<Integer> {

    private static final double LEAST_TYPE = 0;

    @Spec private CommandSpec spec;
    @Mixin private JudgingOptions judgingOptions;

    @Option(
            names = "--type",
            paramLabel = "TYPE",
            required = true,
            arity = "1..*",
            description = "Spectral type, e.g. L3.5; several make a table.")
    private List<String> types;

    @Option(
            names = "--type-sigma",
            paramLabel = "SUBCLASS",
            defaultValue = "0.5",
            description = "One-sigma error of the type (default ${DEFAULT-VALUE}).")
    private double typeSigma;

    @Option(
            names = "--gravity",
            paramLabel = "FLD-G|INT-G|VL-G",
            description = "Gravity class, taken as sure; without it the class is not known.")
    private String gravity;

    @Option(
            names = "--lithium",
            paramLabel = "yes|no",
            description =
                    "Whether Li I 6708 is seen in a spectrum good enough; without it it is not"
                            + " known.")
    private String lithium;

    @Option(names = "--parallax", paramLabel = "MAS", description = "Parallax (mas).")
    private String parallax;

    @Option(
            names = "--parallax-err",
            paramLabel = "MAS",
            description = "One-sigma error of the parallax (mas).")
    private String parallaxError;

    @Option(
            names = "--column",
            paramLabel = "NAME=VALUE",
            description =
                    "Whatever else a list can hold, by the name of its column, e.g. h_mag=12.3;"
                            + " may be given several times.")
    private Map<String, String> columns = new LinkedHashMap<>();

    @Option(
            names = "--format",
            paramLabel = "text|csv|json",
            defaultValue = "text",
            description = "Form of the table (default ${DEFAULT-VALUE}).")
    private TableFormat format;

    @Override
    public Integer call() {
        KnownObject known = new KnownObject(judgingOptions.judging());
        Optional<GravityClass> given = gravityClass();
        List<ObjectResult> results = new ArrayList<>();
        for (String type : types) {
            results.add(
                    known.judged(
                            new Candidate(type, results.size() + 1, List.of(), cells()),
                            estimate(type),
                            given));
        }
        spec.commandLine().getOut().print(PlacementTable.print(results, format));
        spec.commandLine().getOut().flush();
        return ExitCode.DONE;
    }

    private TypeEstimate estimate(String code) {
        SpectralType type =
                SpectralType.parse(code)
                        .filter(t -> t.number() >= LEAST_TYPE)
                        .orElseThrow(() -> wrong("--type", "a type such as M8 or L3.5", code));
        if (!(typeSigma > 0) || typeSigma > 10) {
            throw wrong("--type-sigma", "a number above 0 and up to 10", "" + typeSigma);
        }
        return TypeEstimate.normal(type.number(), typeSigma);
    }

    private Optional<GravityClass> gravityClass() {
        if (gravity == null) {
            return Optional.empty();
        }
        return Optional.of(
                GravityClass.ofLabel(gravity)
                        .orElseThrow(() -> wrong("--gravity", GravityClass.labels(), gravity)));
    }

    private Map<String, String> cells() {
        Map<String, String> cells = new LinkedHashMap<>(columns);
        put(cells, "lithium", lithium);
        put(cells, "parallax_mas", parallax);
        put(cells, "parallax_mas_err", parallaxError);
        return cells;
    }

    private static void put(Map<String, String> cells, String column, String value) {
        if (value != null) {
            cells.put(column, value);
        }
    }

    private ParameterException wrong(String option, String expected, String was) {
        return new ParameterException(
                spec.commandLine(), option + ": expected " + expected + " but was " + was);
    }
}
