package emberline.cli;

import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** {@code doctor}: says whether this machine and this installation can do the work. */
@Command(
        name = "doctor",
        description = {
            "Checks Java, memory, encoding, fonts and the folder for results, takes a built-in"
                    + " spectrum through the whole chain, and finds known values anew.",
            "Exit code 0 where all passed, 1 where something failed. Nothing stays behind."
        },
        mixinStandardHelpOptions = true)
final class DoctorCommand implements Callable<Integer> {

    @Spec private CommandSpec spec;

    @Option(
            names = "--out",
            paramLabel = "DIR",
            defaultValue = ".",
            description = "Folder where results shall be written (default: the current one).")
    private Path out;

    @Override
    public Integer call() {
        List<DoctorCheck> checks = new InstallationCheck(out).run();
        int width = checks.stream().mapToInt(check -> check.what().length()).max().orElse(0);
        PrintWriter print = spec.commandLine().getOut();
        long failed = 0;
        for (DoctorCheck check : checks) {
            print.println(
                    (check.passed() ? "pass  " : "FAIL  ")
                            + check.what()
                            + " ".repeat(width - check.what().length() + 2)
                            + check.found());
            if (!check.passed()) {
                failed++;
                print.println("      " + check.advice());
            }
        }
        print.println(
                failed == 0
                        ? "all " + checks.size() + " checks passed"
                        : failed + " of " + checks.size() + " checks failed");
        print.flush();
        return failed == 0 ? ExitCode.DONE : ExitCode.SOME_FAILED;
    }
}
