package emberline.cli;

import emberline.reports.attach.AtomicFile;
import emberline.reports.page.PdfReport;
import emberline.survey.ObjectResult;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Path;

/** Writes PDF reports into a folder, each at once. */
final class ReportWriter {

    private final PdfReport pdf;
    private final Path folder;

    ReportWriter(PdfReport pdf, Path folder) {
        this.pdf = pdf;
        this.folder = folder;
    }

    /**
     * Writes the report of an object, if there is anything to report.
     *
     * @param result the result
     * @param stem file name without ending
     * @return whether there was anything to report
     * @throws IOException if it cannot be written
     */
    boolean write(ObjectResult result, String stem) throws IOException {
        if (!PdfReport.canReport(result)) {
            return false;
        }
        ByteArrayOutputStream bytes = new ByteArrayOutputStream(1 << 16);
        pdf.write(result, bytes);
        AtomicFile.write(folder.resolve(stem + ".pdf"), bytes.toByteArray());
        return true;
    }
}
