package emberline.cli;

import emberline.reports.attach.AtomicFile;
import emberline.reports.ledger.LedgerMerge;
import emberline.reports.ledger.RunIdentity;
import emberline.reports.ledger.RunLedger;
import emberline.reports.ledger.RunProgress;
import emberline.survey.Status;
import java.io.IOException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Iterator;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.stream.Stream;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** {@code merge}: joins the parts of a run. */
@Command(
        name = "merge",
        description = {
            "Joins the parts of a run that were made by sort --part 1/N ... N/N into one folder,"
                    + " which is the same as that of a single run.",
            "Refuses parts of different versions, options or lists, and incomplete or missing ones."
        },
        mixinStandardHelpOptions = true)
final class MergeCommand implements Callable<Integer> {

    @Spec private CommandSpec spec;
    @Mixin private CatalogueOption catalogueOption;

    @Parameters(paramLabel = "DIR", arity = "1..*", description = "The folders of all parts.")
    private List<Path> parts;

    @Option(
            names = "--out",
            paramLabel = "DIR",
            required = true,
            description = "Folder for the whole; made if it does not stand there.")
    private Path out;

    @Override
    @SuppressWarnings("try") // the lock is held, not used
    public Integer call() throws IOException {
        for (Path part : parts) {
            if (part.toAbsolutePath().normalize().equals(out.toAbsolutePath().normalize())) {
                throw new ParameterException(
                        spec.commandLine(),
                        "--out: expected a folder of its own but was one of the parts: " + out);
            }
        }
        RunIdentity whole = LedgerMerge.checked(parts);
        RunFolder folder =
                new RunFolder(out, whole, catalogueOption.load(), false, Optional.empty());
        try (RunLock lock = RunLock.of(out);
                RunLedger ledger = RunLedger.open(out, whole)) {
            LedgerMerge.copy(ledger, parts);
            for (Path part : parts) {
                takeFiles(part, "objects");
                takeFiles(part, "reports");
            }
            takeVerdicts(parts.get(0));
            folder.finish(ledger, whole, whole.listName());
            ledger.end(true);
            RunProgress merged = ledger.progress();
            spec.commandLine()
                    .getErr()
                    .println(
                            parts.size()
                                    + " parts with "
                                    + merged.done()
                                    + " objects merged into "
                                    + out);
            return ExitCode.of(
                    merged.done(), merged.doneByStatus().getOrDefault(Status.FAILED.word(), 0L));
        }
    }

    /** Takes the files of a folder over: as second names of the same files where that can be. */
    private void takeFiles(Path part, String inside) throws IOException {
        Path from = part.resolve(inside);
        if (!Files.isDirectory(from)) {
            return;
        }
        Path to = out.resolve(inside);
        Files.createDirectories(to);
        try (Stream<Path> files = Files.list(from)) {
            for (Iterator<Path> all = files.iterator(); all.hasNext(); ) {
                Path file = all.next();
                String name = file.getFileName().toString();
                if (!name.startsWith(".")) {
                    take(file, to.resolve(name));
                }
            }
        }
    }

    /** The observer's verdicts, which are the same in all parts. */
    private void takeVerdicts(Path part) throws IOException {
        Path verdicts = part.resolve("verdicts.csv");
        if (Files.exists(verdicts)) {
            take(verdicts, out.resolve("verdicts.csv"));
        }
    }

    /** Puts a file of a part in its place, by a link where the file system has them. */
    private static void take(Path file, Path target) throws IOException {
        AtomicFile taken = AtomicFile.beside(target);
        try {
            Path temporary = taken.temporary();
            try {
                Files.createLink(temporary, file);
            } catch (UnsupportedOperationException | FileSystemException e) {
                Files.copy(file, temporary);
            }
            taken.commit();
        } finally {
            taken.discard();
        }
    }
}
