package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.reports.attach.AtomicFile;
import emberline.reports.attach.ObjectJson;
import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumns;
import emberline.reports.attach.ResultTable;
import emberline.reports.attach.RunJson;
import emberline.reports.ledger.ObjectEntry;
import emberline.reports.ledger.PlannedEntry;
import emberline.reports.ledger.RunIdentity;
import emberline.reports.ledger.RunLedger;
import emberline.reports.note.Attachments;
import emberline.reports.note.MethodsUsed;
import emberline.reports.page.PdfReport;
import emberline.reports.survey.SurveyPage;
import emberline.reports.survey.SurveyRow;
import emberline.survey.ObjectResult;
import emberline.survey.Status;
import emberline.survey.SurveyOrder;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Iterator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.stream.Stream;

/**
 * The files of a run over a list: {@code objects/} and {@code reports/}, written object by object
 * and by several threads at once; {@code results.csv}, {@code survey.html}, {@code run.json} and
 * the attachments of a note, written from the ledger at the end. Each file appears whole or not at
 * all.
 */
final class RunFolder {

    private static final long NO_FILE = -1;

    private final Path folder;
    private final List<ResultColumn> columns;
    private final boolean objectFiles;
    private final Optional<ReportWriter> reports;
    private final FeatureCatalogue catalogue;

    /**
     * A folder, which is made if it does not stand there.
     *
     * @param folder where everything is written
     * @param identity what the run is
     * @param catalogue the definitions with which the objects are measured
     * @param objectFiles whether each object gets a JSON file
     * @param pdf writes the reports; empty for none
     * @throws IOException if the folder cannot be made or written to
     */
    RunFolder(
            Path folder,
            RunIdentity identity,
            FeatureCatalogue catalogue,
            boolean objectFiles,
            Optional<PdfReport> pdf)
            throws IOException {
        this.folder = folder;
        this.columns = identity.columns();
        this.catalogue = catalogue;
        this.objectFiles = objectFiles;
        this.reports = pdf.map(writer -> new ReportWriter(writer, folder.resolve("reports")));
        Files.createDirectories(folder);
        if (objectFiles) {
            Files.createDirectories(folder.resolve("objects"));
        }
        if (pdf.isPresent()) {
            Files.createDirectories(folder.resolve("reports"));
        }
    }

    private Path json(String stem) {
        return folder.resolve("objects").resolve(stem + ".json");
    }

    private Path pdf(String stem) {
        return folder.resolve("reports").resolve(stem + ".pdf");
    }

    /**
     * Writes the files of one object; several threads may do so at once.
     *
     * @return what the ledger keeps of it
     */
    ObjectEntry write(ObjectResult result, String stem, String inputSha256, double seconds)
            throws IOException {
        long jsonBytes = NO_FILE;
        if (objectFiles) {
            byte[] text = ObjectJson.text(result).getBytes(StandardCharsets.UTF_8);
            AtomicFile.write(json(stem), text);
            jsonBytes = text.length;
        }
        boolean report = reports.isPresent() && reports.get().write(result, stem);
        MethodsUsed methods = new MethodsUsed(catalogue);
        methods.add(result);
        return new ObjectEntry(
                stem,
                inputSha256,
                columns.stream().map(column -> column.text(result)).toList(),
                SurveyRow.of(result, stem, report).text(),
                methods.text(),
                RunJson.inputs(result),
                jsonBytes,
                report ? Files.size(pdf(stem)) : NO_FILE,
                seconds);
    }

    /** Whether the files of an object that was recorded as done are all there. */
    boolean holds(String stem, PlannedEntry.Done done) throws IOException {
        return size(json(stem), done.jsonBytes()) && size(pdf(stem), done.pdfBytes());
    }

    private static boolean size(Path file, long expected) throws IOException {
        return expected == NO_FILE || (Files.exists(file) && Files.size(file) == expected);
    }

    /** Writes the tables of all objects that are done, and puts everything in its place. */
    void finish(RunLedger ledger, RunIdentity identity, String pageTitle) throws IOException {
        try (Attachments note =
                        Attachments.open(folder, columns, catalogue, note(identity, pageTitle));
                ResultTable table = ResultTable.open(folder.resolve("results.csv"), columns);
                SurveyPage page =
                        SurveyPage.open(
                                folder.resolve("survey.html"), pageTitle, identity.version());
                RunJson run =
                        RunJson.open(folder.resolve("run.json"), facts(identity), counts(ledger))) {
            boolean whole = false;
            try {
                int[] ranks = SurveyOrder.ranks(ledger.scores());
                AtomicInteger done = new AtomicInteger();
                int rankColumn =
                        columns.stream()
                                .map(ResultColumn::name)
                                .toList()
                                .indexOf(ResultColumns.RANK);
                ledger.forEachDone(
                        object -> {
                            int rank = ranks[done.getAndIncrement()];
                            List<String> cells = new ArrayList<>(object.cells());
                            cells.set(rankColumn, Integer.toString(rank));
                            table.writeRow(cells);
                            note.add(cells, object.status(), object.methods());
                            page.add(SurveyRow.parse(object.pageLine()).ranked(rank));
                            for (String input : object.inputs()) {
                                run.add(input);
                            }
                        });
                note.complete();
                whole = true;
            } finally {
                if (!whole) {
                    table.abandon();
                    page.abandon();
                    run.abandon();
                }
            }
        }
    }

    private static Attachments.Run note(RunIdentity identity, String list) {
        return new Attachments.Run(list, identity.version(), identity.options(), identity.seed());
    }

    private static RunJson.Facts facts(RunIdentity identity) {
        return new RunJson.Facts(
                identity.version(),
                identity.optionsAndRecorded(),
                identity.seed(),
                identity.listSha256(),
                identity.part());
    }

    private static Map<String, Long> counts(RunLedger ledger) throws IOException {
        Map<String, Long> known = ledger.progress().doneByStatus();
        Map<String, Long> counts = new LinkedHashMap<>();
        for (Status status : Status.values()) {
            counts.put(status.word(), known.getOrDefault(status.word(), 0L));
        }
        return counts;
    }

    /**
     * Files of objects that an earlier run left in this folder and that are not of this run.
     *
     * @return how many
     * @throws IOException if the folder cannot be listed
     */
    long leftovers(RunLedger ledger) throws IOException {
        long left = 0;
        for (String part : List.of("objects", "reports")) {
            Path inside = folder.resolve(part);
            if (!Files.isDirectory(inside)) {
                continue;
            }
            try (Stream<Path> files = Files.list(inside)) {
                for (Iterator<Path> all = files.iterator(); all.hasNext(); ) {
                    String name = all.next().getFileName().toString();
                    boolean ours = name.matches(".*\\.(json|pdf)") && !name.startsWith(".");
                    if (ours && !ledger.knowsStem(name.replaceFirst("\\.[^.]*$", ""))) {
                        left++;
                    }
                }
            }
        }
        return left;
    }
}
