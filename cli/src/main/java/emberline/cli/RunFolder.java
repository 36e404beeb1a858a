package emberline.cli;

import emberline.catalogue.FeatureCatalogue;
import emberline.read.CandidateList;
import emberline.reports.attach.AtomicFile;
import emberline.reports.attach.ObjectJson;
import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumns;
import emberline.reports.attach.ResultTable;
import emberline.reports.attach.RunJson;
import emberline.reports.attach.SafeFileNames;
import emberline.reports.note.Attachments;
import emberline.reports.page.PdfReport;
import emberline.reports.survey.SurveyPage;
import emberline.survey.ObjectResult;
import java.io.Closeable;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/**
 * The output folder of a run over a list: {@code results.csv}, {@code objects/}, {@code reports/},
 * {@code survey.html}, {@code run.json} and the attachments of a note. Files of one object may be
 * written by several threads at once; everything else is written in the order of the list by one
 * thread.
 */
final class RunFolder implements Closeable {

    private final Path folder;
    private final SafeFileNames names;
    private final ResultTable table;
    private final SurveyPage page;
    private final RunJson run;
    private final Attachments attachments;
    private final Optional<ReportWriter> reports;
    private final int objects;
    private boolean complete;

    /**
     * Opens a folder, which is made if it does not stand there.
     *
     * @param folder where everything is written
     * @param list the candidates
     * @param run the record of the run
     * @param pdf writes the reports; empty for none
     * @param note the run as the attachments tell of it
     * @param catalogue the definitions with which the objects are measured
     * @throws IOException if the folder cannot be made or written to
     */
    RunFolder(
            Path folder,
            CandidateList list,
            RunJson run,
            Optional<PdfReport> pdf,
            Attachments.Run note,
            FeatureCatalogue catalogue)
            throws IOException {
        this.folder = folder;
        this.run = run;
        this.objects = list.rows().size();
        this.names =
                SafeFileNames.of(list.rows().stream().map(row -> row.candidate().name()).toList());
        Files.createDirectories(folder);
        Files.createDirectories(folder.resolve("objects"));
        this.reports = pdf.map(writer -> new ReportWriter(writer, folder.resolve("reports")));
        if (pdf.isPresent()) {
            Files.createDirectories(folder.resolve("reports"));
        }
        List<ResultColumn> columns = ResultColumns.forList(list.columns());
        this.attachments = Attachments.open(folder, columns, catalogue, note);
        this.table = ResultTable.open(folder.resolve("results.csv"), columns);
        this.page =
                SurveyPage.open(
                        folder.resolve("survey.html"),
                        list.file().getFileName().toString(),
                        ProgramVersion.number());
    }

    /** The stem of the files of an object. */
    private String stem(ObjectResult result) {
        return names.stem(result.candidate().row() - 1);
    }

    /** Writes the files of one object; several threads may do so at once. */
    void writeObject(ObjectResult result) throws IOException {
        AtomicFile.write(
                folder.resolve("objects").resolve(stem(result) + ".json"), ObjectJson.text(result));
        if (reports.isPresent()) {
            reports.get().write(result, stem(result));
        }
    }

    /** Adds an object to the tables; in the order of the list. */
    void add(ObjectResult result) throws IOException {
        table.write(result);
        attachments.add(result);
        page.add(result, stem(result), reports.isPresent() && PdfReport.canReport(result));
        run.add(result);
    }

    /** Puts everything in its place. */
    void complete() throws IOException {
        complete = true;
        table.close();
        page.close();
        attachments.complete();
        AtomicFile.write(folder.resolve("run.json"), run.text());
    }

    /**
     * Files of objects that an earlier run left in this folder and this run did not write.
     *
     * @return how many
     * @throws IOException if the folder cannot be listed
     */
    long leftovers() throws IOException {
        Set<String> own = new HashSet<>();
        for (int row = 0; row < objects; row++) {
            own.add(names.stem(row));
        }
        long left = 0;
        for (String part : List.of("objects", "reports")) {
            Path inside = folder.resolve(part);
            if (Files.isDirectory(inside)) {
                try (Stream<Path> files = Files.list(inside)) {
                    left +=
                            files.map(file -> file.getFileName().toString())
                                    .filter(name -> name.matches(".*\\.(json|pdf)"))
                                    .filter(
                                            name ->
                                                    !own.contains(
                                                            name.replaceFirst("\\.[^.]*$", "")))
                                    .count();
                }
            }
        }
        return left;
    }

    @Override
    public void close() throws IOException {
        attachments.close();
        if (!complete) {
            table.abandon();
            table.close();
            page.abandon();
            page.close();
        }
    }
}
