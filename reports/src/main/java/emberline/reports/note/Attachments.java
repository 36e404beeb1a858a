package emberline.reports.note;

import emberline.catalogue.FeatureCatalogue;
import emberline.reports.attach.AtomicFile;
import emberline.reports.attach.ObjectSchema;
import emberline.reports.attach.ResultColumn;
import emberline.survey.ObjectResult;
import java.io.Closeable;
import java.io.IOException;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;

/**
 * Writes what goes into a note beside the reports: {@code results.ecsv}, {@code results.vot},
 * {@code results.mrt}, {@code table.tex}, {@code sources.bib}, {@code methods.txt} and the schema
 * of the JSON files. Rows are taken one by one in their order; the files appear when {@link
 * #complete} is called, each at once. Not for use by several threads at once.
 */
public final class Attachments implements Closeable {

    private final Path folder;
    private final Run run;
    private final MethodsUsed used;
    private final TableRows rows;

    private Attachments(Path folder, Run run, MethodsUsed used, TableRows rows) {
        this.folder = folder;
        this.run = run;
        this.used = used;
        this.rows = rows;
    }

    /**
     * The run that the files tell of.
     *
     * @param list name of the candidate list, or of what stands for it
     * @param version version of the program
     * @param options the options that bear on the results
     * @param seed start of the random draws
     */
    public record Run(String list, String version, Map<String, String> options, long seed) {

        /** Copies the map. */
        public Run {
            options = Map.copyOf(options);
        }

        private String origin() {
            return "Late dwarfs of " + list + ", measured and judged by Emberline " + version;
        }
    }

    /**
     * Opens the attachments of a folder.
     *
     * @param folder where the files will stand; it exists
     * @param columns the columns of the table
     * @param catalogue the definitions with which the objects are measured
     * @param run the run
     * @return attachments without rows
     * @throws IOException if the folder cannot be written to
     */
    public static Attachments open(
            Path folder, List<ResultColumn> columns, FeatureCatalogue catalogue, Run run)
            throws IOException {
        return new Attachments(
                folder,
                run,
                new MethodsUsed(catalogue),
                new TableRows(columns, folder.resolve(".rows.part")));
    }

    /**
     * Adds an object.
     *
     * @param result its result
     * @throws IOException if it cannot be written
     */
    public void add(ObjectResult result) throws IOException {
        rows.add(rows.columns().stream().map(column -> column.text(result)).toList());
        used.add(result);
    }

    /**
     * Adds an object whose row was made before.
     *
     * @param cells the texts of all columns in their order
     * @param status the word of its status
     * @param methods what {@link MethodsUsed#text} gave for it alone
     * @throws IOException if it cannot be written
     */
    public void add(List<String> cells, String status, String methods) throws IOException {
        rows.add(cells);
        used.add(status, methods);
    }

    /**
     * Writes the files.
     *
     * @throws IOException if one cannot be written
     */
    public void complete() throws IOException {
        rows.end();
        write("results.ecsv", out -> EcsvTable.write(rows, run.origin(), out));
        write("results.vot", out -> Votable.write(rows, run.origin(), out));
        write("results.mrt", out -> JournalTable.write(rows, run.origin(), "results.mrt", out));
        write("table.tex", out -> LatexTable.write(rows, run.origin(), out));
        write("sources.bib", out -> out.write(used.bibtex()));
        write(
                "methods.txt",
                out -> out.write(MethodsText.of(used, run.version(), run.options(), run.seed())));
        write(ObjectSchema.FILE, out -> out.write(ObjectSchema.text()));
    }

    /** Writes a file. */
    @FunctionalInterface
    private interface Content {
        void write(Writer out) throws IOException;
    }

    private void write(String name, Content content) throws IOException {
        AtomicFile file = AtomicFile.beside(folder.resolve(name));
        try {
            try (Writer out = Files.newBufferedWriter(file.temporary(), StandardCharsets.UTF_8)) {
                content.write(out);
            }
            file.commit();
        } finally {
            file.discard();
        }
    }

    @Override
    public void close() throws IOException {
        rows.close();
    }
}
