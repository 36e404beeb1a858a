package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.reports.attach.AtomicFile;
import emberline.reports.page.PdfReport;
import emberline.reports.page.ReportSettings;
import emberline.spectrum.Candidate;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import emberline.survey.SelfCheck;
import emberline.survey.Status;
import emberline.survey.SurveySettings;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/** Whether this machine and this installation can do the work. */
final class InstallationCheck {

    private static final int LEAST_JAVA = 17;
    private static final long LEAST_MEMORY_BYTES = 400L << 20;
    private static final long LEAST_SPACE_BYTES = 100L << 20;

    /** A name with letters of two scripts, as objects of other tables may have. */
    private static final String FOREIGN_NAME = "\u03b5 Eridani \u2605";

    private final Path folder;

    /**
     * A check.
     *
     * @param folder where results shall be written; it need not stand there yet
     */
    InstallationCheck(Path folder) {
        this.folder = folder;
    }

    /** Looks at everything; whatever goes wrong is a line that did not pass. */
    List<DoctorCheck> run() {
        List<DoctorCheck> checks = new ArrayList<>();
        checks.add(java());
        checks.add(memory());
        checks.add(processors());
        checks.add(encoding());
        checks.addAll(writing());
        checks.addAll(values());
        return checks;
    }

    private static DoctorCheck java() {
        return DoctorCheck.of(
                Runtime.version().feature() >= LEAST_JAVA,
                "Java",
                System.getProperty("java.version")
                        + " of "
                        + System.getProperty("java.vendor")
                        + ", "
                        + System.getProperty("os.name")
                        + " "
                        + System.getProperty("os.arch"),
                "Install Java " + LEAST_JAVA + " or newer.");
    }

    private static DoctorCheck memory() {
        long most = Runtime.getRuntime().maxMemory();
        return DoctorCheck.of(
                most >= LEAST_MEMORY_BYTES,
                "memory",
                megabytes(most) + " at most",
                "Give the program "
                        + megabytes(LEAST_MEMORY_BYTES)
                        + " or more: java -Xmx1g -jar emberline.jar ...");
    }

    private static DoctorCheck processors() {
        int count = Runtime.getRuntime().availableProcessors();
        return DoctorCheck.passed("processors", count + ", so many threads by default");
    }

    /** Names of files go through the encoding of the system; all else is UTF-8 by itself. */
    private static DoctorCheck encoding() {
        String names = System.getProperty("sun.jnu.encoding", Charset.defaultCharset().name());
        boolean all =
                Charset.isSupported(names)
                        && Charset.forName(names).newEncoder().canEncode(FOREIGN_NAME);
        return DoctorCheck.of(
                all,
                "locale and encoding",
                Locale.getDefault().toLanguageTag() + ", file names in " + names,
                "File names with letters beyond ASCII cannot be opened; set LC_ALL=C.UTF-8 before"
                        + " the program is started.");
    }

    private List<DoctorCheck> writing() {
        List<DoctorCheck> checks = new ArrayList<>();
        boolean made = !Files.exists(folder);
        Path sub = folder.resolve("emberline-doctor-" + ProcessHandle.current().pid());
        try {
            Files.createDirectories(sub);
            Path file = sub.resolve("check.txt");
            AtomicFile.write(file, FOREIGN_NAME);
            boolean same = Files.readString(file).equals(FOREIGN_NAME);
            Files.delete(file);
            long space = Files.getFileStore(sub).getUsableSpace();
            checks.add(
                    DoctorCheck.of(
                            same && space >= LEAST_SPACE_BYTES,
                            "folder " + folder.toAbsolutePath().normalize(),
                            "can be written, " + megabytes(space) + " free",
                            "Make room, or choose another folder with --out."));
            checks.addAll(oneObject(sub));
        } catch (IOException e) {
            checks.add(
                    DoctorCheck.failed(
                            "folder " + folder.toAbsolutePath().normalize(),
                            OutputTrouble.message(e),
                            "Choose a folder that you may write to with --out."));
        } finally {
            remove(sub);
            if (made) {
                remove(folder);
            }
        }
        return checks;
    }

    private static void remove(Path empty) {
        try {
            Files.deleteIfExists(empty);
        } catch (IOException e) {
            // something else stands in it by now, so it stays
            return;
        }
    }

    /** Takes the built-in spectrum through the whole chain, down to its report. */
    private static List<DoctorCheck> oneObject(Path sub) throws IOException {
        Path spectrum = sub.resolve("built-in.csv");
        try {
            Files.write(spectrum, SelfCheck.builtInSpectrum());
            FeatureCatalogue catalogue = FeatureCatalogue.standard();
            SurveySettings settings = SurveySettings.withDefaults();
            ObjectResult result =
                    new Chain(catalogue, Measuring.withDefaults(), settings)
                            .run(
                                    new Candidate(
                                            "built-in",
                                            1,
                                            List.of(spectrum.getFileName().toString()),
                                            Map.of()),
                                    sub);
            DoctorCheck chain =
                    DoctorCheck.of(
                            result.status() != Status.FAILED,
                            "whole chain",
                            result.status() == Status.FAILED
                                    ? result.reason()
                                    : "a built-in spectrum was read, measured, placed and judged",
                            "Unpack the program anew; all jars in lib must belong together.");
            return List.of(chain, report(result, catalogue, settings));
        } finally {
            Files.deleteIfExists(spectrum);
        }
    }

    private static DoctorCheck report(
            ObjectResult result, FeatureCatalogue catalogue, SurveySettings settings) {
        String advice =
                "Check that the folder for temporary files ("
                        + System.getProperty("java.io.tmpdir")
                        + ") can be written, and that this Java has java.desktop.";
        try {
            ByteArrayOutputStream bytes = new ByteArrayOutputStream();
            new PdfReport(ReportSettings.of(ProgramVersion.number(), settings.seed()), catalogue)
                    .write(result, bytes);
            boolean pdf = bytes.toString(StandardCharsets.ISO_8859_1).startsWith("%PDF");
            return DoctorCheck.of(
                    pdf,
                    "fonts and reports",
                    "a report of " + bytes.size() / 1024 + " kB was made",
                    advice);
        } catch (IOException | RuntimeException | LinkageError e) {
            return DoctorCheck.failed("fonts and reports", "no report: " + e, advice);
        }
    }

    private static List<DoctorCheck> values() {
        List<DoctorCheck> checks = new ArrayList<>();
        for (SelfCheck.Line line : new SelfCheck(FeatureCatalogue.standard()).run()) {
            checks.add(
                    DoctorCheck.of(
                            line.passed(),
                            line.what(),
                            String.format(
                                    Locale.ROOT,
                                    "%.7g; expected %.7g +- %.1g",
                                    line.found(),
                                    line.expected(),
                                    line.tolerance()),
                            "Unpack the program anew; if it stays, report it."));
        }
        return checks;
    }

    private static String megabytes(long bytes) {
        return (bytes >> 20) + " MB";
    }
}
