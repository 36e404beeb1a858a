package emberline.reports.page;

import emberline.catalogue.FeatureCatalogue;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.io.OutputStream;
import java.util.ArrayList;
import java.util.List;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.PDPageContentStream;
import org.apache.pdfbox.pdmodel.PDPageContentStream.AppendMode;
import org.apache.pdfbox.pdmodel.interactive.documentnavigation.destination.PDPageFitDestination;
import org.apache.pdfbox.pdmodel.interactive.documentnavigation.outline.PDDocumentOutline;
import org.apache.pdfbox.pdmodel.interactive.documentnavigation.outline.PDOutlineItem;

/**
 * Writes the report of an object as a PDF: vector charts, embedded fonts, selectable text in
 * reading order, bookmarks, PDF/A-2b metadata. The same result and settings give the same bytes.
 * Make one and use it for all objects, from as many threads as wanted: it keeps the parsed fonts.
 */
public final class PdfReport {

    private final ReportSettings settings;
    private final FeatureCatalogue catalogue;
    private final PrintRoom room = new PrintRoom();

    /**
     * A writer of reports.
     *
     * @param settings paper, version and seed
     * @param catalogue the definitions with which the objects were measured and placed
     */
    public PdfReport(ReportSettings settings, FeatureCatalogue catalogue) {
        this.settings = settings;
        this.catalogue = catalogue;
    }

    /**
     * Whether there is anything to report.
     *
     * @param result the result of an object
     * @return true if it has a spectrum and a placement; an object that failed has no report
     */
    public static boolean canReport(ObjectResult result) {
        return !result.spectra().isEmpty()
                && result.best().isPresent()
                && result.placement().isPresent();
    }

    /**
     * Writes the report of an object.
     *
     * @param result the result of an object that {@link #canReport can be reported}
     * @param stream where the PDF goes; it is not closed
     * @throws IOException if it cannot be written
     * @throws IllegalArgumentException if there is nothing to report
     */
    public void write(ObjectResult result, OutputStream stream) throws IOException {
        if (!canReport(result)) {
            throw new IllegalArgumentException(
                    result.candidate().name()
                            + " has nothing to report: "
                            + result.reason()
                            + "; expected a spectrum that was read, measured and placed");
        }
        room.print(document -> write(document, result), stream);
    }

    private void write(ReportDocument document, ObjectResult result) throws IOException {
        try (Sheet first = new Sheet(document, settings.paper())) {
            new FirstPage(document, catalogue, settings.paper()).write(first, result);
        }
        List<Flow.Bookmark> sections = new DetailPages(document, catalogue, settings).write(result);
        footers(document, result);
        outline(document.pdf(), sections);
        List<String> parts = new ArrayList<>(List.of(result.candidate().name()));
        result.spectra().forEach(spectrum -> parts.add(spectrum.sha256()));
        PdfIdentity.stamp(
                document.pdf(), result.candidate().name() + ": spectral report", parts, settings);
    }

    private void footers(ReportDocument document, ObjectResult result) throws IOException {
        PDDocument pdf = document.pdf();
        int total = pdf.getNumberOfPages();
        Style style = document.styles().small();
        float left = FirstPage.MARGIN;
        float right = settings.paper().widthPoint() - FirstPage.MARGIN;
        float baseline = FirstPage.FOOT - 14;
        for (int i = 0; i < total; i++) {
            String number =
                    "Emberline " + settings.programVersion() + "  ·  " + (i + 1) + " / " + total;
            float numberWidth = document.lines().width(style, number);
            String name =
                    document.lines()
                            .fit(style, result.candidate().name(), right - left - numberWidth - 20);
            PDPage page = pdf.getPage(i);
            try (PDPageContentStream content =
                    new PDPageContentStream(pdf, page, AppendMode.APPEND, true, true)) {
                content.setNonStrokingColor(style.colour());
                line(document, content, style, left, baseline, name);
                line(document, content, style, right - numberWidth, baseline, number);
            }
        }
    }

    private static void line(
            ReportDocument document,
            PDPageContentStream content,
            Style style,
            float x,
            float baseline,
            String text)
            throws IOException {
        if (text.isBlank()) {
            return;
        }
        content.beginText();
        content.setFont(document.fonts().font(style.face()), style.sizePoint());
        content.newLineAtOffset(x, baseline);
        content.showText(text);
        content.endText();
    }

    private static void outline(PDDocument pdf, List<Flow.Bookmark> sections) {
        PDDocumentOutline outline = new PDDocumentOutline();
        outline.addLast(item("Finding", pdf.getPage(0)));
        for (Flow.Bookmark section : sections) {
            outline.addLast(item(section.title(), section.sheet().page()));
        }
        pdf.getDocumentCatalog().setDocumentOutline(outline);
    }

    private static PDOutlineItem item(String title, PDPage page) {
        PDPageFitDestination destination = new PDPageFitDestination();
        destination.setPage(page);
        PDOutlineItem item = new PDOutlineItem();
        item.setTitle(title);
        item.setDestination(destination);
        return item;
    }
}
