package emberline.reports.page;

import emberline.catalogue.FeatureCatalogue;
import emberline.place.calibrated.Calibration;
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
    private final Calibration calibration = Calibration.standard();
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

    /**
     * Writes the reports of several objects as one document: a contents page with links, then the
     * reports in their order, under bookmarks.
     *
     * @param results results of objects that {@link #canReport can be reported}, at least one
     * @param stream where the PDF goes; it is not closed
     * @throws IOException if it cannot be written
     * @throws IllegalArgumentException if there is none, or one has nothing to report
     */
    public void bind(List<ObjectResult> results, OutputStream stream) throws IOException {
        if (results.isEmpty() || !results.stream().allMatch(PdfReport::canReport)) {
            throw new IllegalArgumentException(
                    "bound report of "
                            + results.size()
                            + " objects: expected at least one, and each with a spectrum that was"
                            + " read, measured and placed");
        }
        room.print(document -> bind(document, results), stream);
    }

    private void write(ReportDocument document, ObjectResult result) throws IOException {
        List<Columns.Bookmark> sections = pages(document, result);
        footers(document, List.of(new ContentsPages.Entry(result, 0)));
        PDDocumentOutline outline = new PDDocumentOutline();
        outline.addLast(item("Finding", document.pdf().getPage(0)));
        sections.forEach(section -> outline.addLast(item(section.title(), section.sheet().page())));
        document.pdf().getDocumentCatalog().setDocumentOutline(outline);
        PdfIdentity.stamp(
                document.pdf(),
                result.candidate().name() + ": spectral report",
                parts(List.of(result)),
                settings);
    }

    private void bind(ReportDocument document, List<ObjectResult> results) throws IOException {
        PDDocument pdf = document.pdf();
        ContentsPages contents = new ContentsPages(document, settings.paper());
        int before = contents.pages(results.size());
        PDDocumentOutline outline = new PDDocumentOutline();
        List<ContentsPages.Entry> entries = new ArrayList<>();
        for (ObjectResult result : results) {
            int first = pdf.getNumberOfPages();
            entries.add(new ContentsPages.Entry(result, before + first));
            List<Columns.Bookmark> sections = pages(document, result);
            PDOutlineItem object = item(result.candidate().name(), pdf.getPage(first));
            object.addLast(item("Finding", pdf.getPage(first)));
            sections.forEach(s -> object.addLast(item(s.title(), s.sheet().page())));
            outline.addLast(object);
        }
        contents.write(entries);
        outline.addFirst(item("Contents", pdf.getPage(0)));
        pdf.getDocumentCatalog().setDocumentOutline(outline);
        footers(document, entries);
        PdfIdentity.stamp(
                pdf,
                "Spectral reports of " + results.size() + " objects",
                parts(results),
                settings);
    }

    /** The pages of an object; returns where the sections after the first page begin. */
    private List<Columns.Bookmark> pages(ReportDocument document, ObjectResult result)
            throws IOException {
        boolean gravityShown;
        try (Sheet first = new Sheet(document, settings.paper())) {
            gravityShown =
                    new FirstPage(document, catalogue, calibration, settings.paper())
                            .write(first, result);
        }
        return new DetailPage(document, catalogue, calibration, settings, result)
                .write(!gravityShown);
    }

    private static List<String> parts(List<ObjectResult> results) {
        List<String> parts = new ArrayList<>();
        for (ObjectResult result : results) {
            parts.add(result.candidate().name());
            result.spectra().forEach(spectrum -> parts.add(spectrum.sha256()));
        }
        return parts;
    }

    /** The name of the object at the left of each page, program and page number at the right. */
    private void footers(ReportDocument document, List<ContentsPages.Entry> entries)
            throws IOException {
        PDDocument pdf = document.pdf();
        int total = pdf.getNumberOfPages();
        Style style = document.styles().small();
        float left = FirstPage.MARGIN;
        float right = settings.paper().widthPoint() - FirstPage.MARGIN;
        float baseline = FirstPage.FOOT - 14;
        int entry = -1;
        for (int i = 0; i < total; i++) {
            while (entry + 1 < entries.size() && entries.get(entry + 1).page() <= i) {
                entry++;
            }
            String number =
                    "Emberline " + settings.programVersion() + "  ·  " + (i + 1) + " / " + total;
            float numberWidth = document.lines().width(style, number);
            String of = entry < 0 ? "Contents" : entries.get(entry).result().candidate().name();
            String name = document.lines().fit(style, of, right - left - numberWidth - 20);
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

    private static PDOutlineItem item(String title, PDPage page) {
        PDPageFitDestination destination = new PDPageFitDestination();
        destination.setPage(page);
        PDOutlineItem item = new PDOutlineItem();
        item.setTitle(title);
        item.setDestination(destination);
        return item;
    }
}
