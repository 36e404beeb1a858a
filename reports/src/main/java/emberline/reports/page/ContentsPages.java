package emberline.reports.page;

import emberline.place.Placement;
import emberline.reports.attach.TypeText;
import emberline.reports.paint.Face;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.common.PDRectangle;
import org.apache.pdfbox.pdmodel.interactive.action.PDActionGoTo;
import org.apache.pdfbox.pdmodel.interactive.annotation.PDAnnotation;
import org.apache.pdfbox.pdmodel.interactive.annotation.PDAnnotationLink;
import org.apache.pdfbox.pdmodel.interactive.annotation.PDBorderStyleDictionary;
import org.apache.pdfbox.pdmodel.interactive.documentnavigation.destination.PDPageFitDestination;

/** The contents of a bound document: a row for each object, linked to its first page. */
final class ContentsPages {

    private static final float ROW = 13;
    private static final float FIRST_ROW = 46;
    private static final float[] COLUMNS = {250, 320, 375, 440};

    private final ReportDocument document;
    private final Paper paper;
    private final float right;

    ContentsPages(ReportDocument document, Paper paper) {
        this.document = document;
        this.paper = paper;
        this.right = paper.widthPoint() - FirstPage.MARGIN;
    }

    /**
     * An object of a bound document.
     *
     * @param result its result
     * @param page its first page in the document, from 0
     */
    record Entry(ObjectResult result, int page) {}

    private int rowsOfPage() {
        return (int) ((paper.heightPoint() - FirstPage.TOP - FIRST_ROW - FirstPage.FOOT) / ROW);
    }

    /** How many pages the contents of so many objects take up. */
    int pages(int objects) {
        return (objects + rowsOfPage() - 1) / rowsOfPage();
    }

    /** Writes the contents and puts them before all other pages. */
    void write(List<Entry> entries) throws IOException {
        PDDocument pdf = document.pdf();
        PDPage first = pdf.getPage(0);
        int pages = pages(entries.size());
        List<PDPage> made = new ArrayList<>();
        for (int page = 0; page < pages; page++) {
            List<Entry> rows =
                    entries.subList(
                            page * rowsOfPage(),
                            Math.min(entries.size(), (page + 1) * rowsOfPage()));
            try (Sheet sheet = new Sheet(document, paper)) {
                write(sheet, rows, entries.size(), pages);
                made.add(sheet.page());
            }
        }
        for (PDPage page : made) {
            pdf.getPages().remove(page);
            pdf.getPages().insertBefore(page, first);
        }
    }

    private void write(Sheet sheet, List<Entry> rows, int objects, int before) throws IOException {
        Styles styles = document.styles();
        float y = FirstPage.TOP + 14;
        sheet.text(styles.name(), FirstPage.MARGIN, y, "Spectral reports");
        sheet.textRight(styles.subhead(), right, y, objects + " objects");
        sheet.rule(FirstPage.MARGIN, right, y + 7, document.theme().ink(), 0.7f);
        Style quiet = styles.table().in(document.theme().quiet());
        String[] heads = {"type", "gravity", "decision", "status"};
        for (int c = 0; c < heads.length; c++) {
            sheet.text(quiet, FirstPage.MARGIN + COLUMNS[c], y + 20, heads[c]);
        }
        sheet.textRight(quiet, right, y + 20, "page");
        y = FirstPage.TOP + FIRST_ROW;
        for (Entry row : rows) {
            row(sheet, row, y, before);
            y += ROW;
        }
    }

    private void row(Sheet sheet, Entry entry, float y, int before) throws IOException {
        Style style = document.styles().subhead();
        ObjectResult result = entry.result();
        String name =
                document.lines()
                        .fit(style.with(Face.SANS_BOLD), result.candidate().name(), COLUMNS[0] - 8);
        sheet.text(style.with(Face.SANS_BOLD), FirstPage.MARGIN, y, name);
        String[] cells = {
            result.placement()
                    .flatMap(Placement::type)
                    .map(TypeText::code)
                    .orElse(
                            result.placement()
                                    .flatMap(p -> p.kind().kind())
                                    .map(k -> k.label())
                                    .orElse("no type")),
            result.placement()
                    .flatMap(p -> p.gravity().gravityClass())
                    .map(g -> g.label())
                    .orElse("\u2013"),
            result.judgement().map(j -> j.decision().word()).orElse("\u2013"),
            result.status().word()
        };
        for (int c = 0; c < cells.length; c++) {
            float next = c + 1 < COLUMNS.length ? COLUMNS[c + 1] : right - FirstPage.MARGIN - 20;
            sheet.text(
                    style,
                    FirstPage.MARGIN + COLUMNS[c],
                    y,
                    document.lines().fit(style, cells[c], next - COLUMNS[c] - 4));
        }
        sheet.textRight(style, right, y, Integer.toString(entry.page() + 1));
        link(sheet.page(), entry.page() - before, y);
    }

    /** A link over a row; at this moment the pages of the reports still stand first. */
    private void link(PDPage from, int target, float y) throws IOException {
        PDPageFitDestination destination = new PDPageFitDestination();
        destination.setPage(document.pdf().getPage(target));
        PDActionGoTo action = new PDActionGoTo();
        action.setDestination(destination);
        PDAnnotationLink link = new PDAnnotationLink();
        link.setAction(action);
        link.setPrinted(true);
        PDBorderStyleDictionary border = new PDBorderStyleDictionary();
        border.setWidth(0);
        link.setBorderStyle(border);
        link.setRectangle(
                new PDRectangle(
                        FirstPage.MARGIN,
                        paper.heightPoint() - y - 3,
                        right - FirstPage.MARGIN,
                        ROW - 1));
        List<PDAnnotation> annotations = from.getAnnotations();
        annotations.add(link);
        from.setAnnotations(annotations);
    }
}
