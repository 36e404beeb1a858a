package emberline.cli;

import java.util.ArrayList;
import java.util.List;

/**
 * A part of a document that is made from the program itself. It stands between the lines {@code
 * <!-- made from the program: NAME -->} and {@code <!-- end of NAME -->}.
 *
 * @param document the document it stands in, as seen from the root of the project
 * @param name its name in those lines
 * @param lines what belongs between them
 */
record GeneratedPart(String document, String name, List<String> lines) {

    GeneratedPart {
        lines = List.copyOf(lines);
    }

    private String opening() {
        return "<!-- made from the program: " + name + " -->";
    }

    /** The document with this part as the program makes it. */
    MarkdownDocument in(MarkdownDocument before) {
        int start = before.lines().indexOf(opening());
        int end = before.lines().indexOf("<!-- end of " + name + " -->");
        if (start < 0 || end < start) {
            throw new IllegalArgumentException(
                    before.name() + ": expected the lines '" + opening() + "' and its end");
        }
        List<String> spaced = new ArrayList<>();
        spaced.add("");
        spaced.addAll(lines);
        spaced.add("");
        return before.with(start + 1, end, spaced);
    }
}
