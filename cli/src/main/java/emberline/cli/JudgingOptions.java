package emberline.cli;

import emberline.judge.Aim;
import emberline.judge.Judging;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** Options that say how objects are judged, and what is looked for. */
final class JudgingOptions {

    @Spec(Spec.Target.MIXEE)
    private CommandSpec spec;

    @Mixin private DecisionOptions decision;

    @Option(
            names = "--aim",
            paramLabel = "AIM[=W],...",
            defaultValue = "substellar",
            description =
                    "What is looked for: substellar, young, coolest, metal-poor, nearby, pairs;"
                            + " several"
                            + " with weights, e.g. young=2,nearby (default ${DEFAULT-VALUE}).")
    private String aim;

    /** How objects are judged. */
    Judging judging() {
        try {
            return decision.judging().withAims(Aim.parse(aim));
        } catch (IllegalArgumentException e) {
            throw new ParameterException(spec.commandLine(), "--aim: " + e.getMessage());
        }
    }
}
