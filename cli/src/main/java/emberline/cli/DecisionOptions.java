package emberline.cli;

import emberline.judge.AgeStatement;
import emberline.judge.Judging;
import java.util.function.Supplier;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** Options that say what is known of the age and from where on a decision is made. */
final class DecisionOptions {

    @Spec(Spec.Target.MIXEE)
    private CommandSpec spec;

    @Option(
            names = "--age",
            paramLabel = "AGE",
            description =
                    "Age where the list does not state one: 120+-8Myr, 50..150Myr, 2..8Gyr or the"
                            + " short name of a group such as ABDMG (default: even in time from"
                            + " 10 Myr to 10 Gyr).")
    private String age;

    @Option(
            names = "--decide",
            paramLabel = "HIGH,LOW",
            defaultValue = "0.95,0.05",
            description =
                    "Least probability for the decision substellar and greatest for stellar"
                            + " (default ${DEFAULT-VALUE}).")
    private String decide;

    /** How objects are judged, with the usual aim. */
    Judging judging() {
        Judging judging = checked("--decide", () -> Judging.withDefaults().withThresholds(decide));
        return age == null
                ? judging
                : judging.withAge(checked("--age", () -> AgeStatement.parse(age)));
    }

    private <T> T checked(String option, Supplier<T> read) {
        try {
            return read.get();
        } catch (IllegalArgumentException e) {
            throw new ParameterException(spec.commandLine(), option + ": " + e.getMessage());
        }
    }
}
