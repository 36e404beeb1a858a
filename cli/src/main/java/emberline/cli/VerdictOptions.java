package emberline.cli;

import emberline.read.CandidateRows;
import emberline.read.CandidateSource;
import emberline.read.Checksum;
import emberline.read.ListedCandidate;
import emberline.reports.attach.AtomicFile;
import emberline.reports.attach.VerdictTable;
import emberline.survey.verdict.UnreadableVerdictsException;
import emberline.survey.verdict.VerdictFile;
import emberline.survey.verdict.Verdicts;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import picocli.CommandLine.Option;

/**
 * The observer's verdicts of a run. They are kept as {@code verdicts.csv} in the folder of the
 * results, so that a later run into the same folder has them without being told.
 */
final class VerdictOptions {

    private static final String KEPT = "verdicts.csv";

    @Option(
            names = "--verdicts",
            paramLabel = "FILE",
            description = {
                "Your verdicts, as exported from survey.html: CSV with name and any of verdict,"
                        + " verdict_type, verdict_gravity, verdict_note. They override what the"
                        + " program says. Verdicts of earlier runs into the same folder are kept;"
                        + " a row with a name alone takes one back."
            })
    private Path file;

    /**
     * The verdicts that hold: those kept in the folder, then those of the file, which win.
     *
     * @throws UnreadableVerdictsException if one of the two files cannot be read
     */
    Verdicts verdicts(Path folder) throws UnreadableVerdictsException {
        Path kept = folder.resolve(KEPT);
        Verdicts former = Files.exists(kept) ? VerdictFile.read(kept) : Verdicts.none();
        return file == null ? former : former.with(VerdictFile.read(file));
    }

    /** What is to be said of verdicts on objects that are not in the list. */
    List<String> strangers(Verdicts verdicts, CandidateSource source) throws IOException {
        if (verdicts.entries().isEmpty()) {
            return List.of();
        }
        List<String> met = new ArrayList<>();
        try (CandidateRows rows = source.open()) {
            for (Optional<ListedCandidate> row = rows.next(); row.isPresent(); row = rows.next()) {
                if (verdicts.entries().containsKey(row.get().candidate().name())) {
                    met.add(row.get().candidate().name());
                }
            }
        }
        return verdicts.strangers(met);
    }

    /**
     * Keeps the verdicts in the folder.
     *
     * @throws IOException if they cannot be written
     */
    void keep(Verdicts verdicts, Path folder) throws IOException {
        Path kept = folder.resolve(KEPT);
        if (!verdicts.entries().isEmpty() || Files.exists(kept)) {
            AtomicFile.write(kept, VerdictTable.text(verdicts));
        }
    }

    /** A checksum of the verdicts; empty where there are none. */
    static String checksum(Verdicts verdicts) {
        return verdicts.entries().isEmpty()
                ? ""
                : Checksum.of(VerdictTable.text(verdicts).getBytes(StandardCharsets.UTF_8));
    }
}
