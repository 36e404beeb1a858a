package emberline.reports.note;

import java.io.IOException;
import java.io.Writer;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * The main columns as rows of a LaTeX table, with marks for what the reader must know and the notes
 * that they refer to. Plain LaTeX, no packages. The digits are those of the results.
 */
final class LatexTable {

    private static final String HEAD =
            """
            \\begin{table*}
            \\caption{Spectral types, gravity and mass of the objects.}
            \\begin{tabular}{lllccccc}
            \\hline
            Object & Type & Kind & $\\sigma$ & Gravity & $T_\\mathrm{eff}$ & Mass & $P_\\mathrm{sub}$ \\\\
            """;

    private static final String FOOT =
            """
            \\hline
            \\end{tabular}

            \\medskip
            One-sigma errors; of the mass the 68\\% interval. $P_\\mathrm{sub}$: probability of a mass
            below 0.072 solar. An ellipsis: not known. One colon: the error of the type exceeds one
            subclass; two colons: two.""";

    /** Findings that a reader of the table must know, with the words of their notes. */
    private static final Map<String, String> NOTES =
            Map.ofEntries(
                    Map.entry("one-relation", "published type by one relation"),
                    Map.entry("relations-disagree", "published relations disagree"),
                    Map.entry("witnesses-disagree", "posterior and published relations disagree"),
                    Map.entry("gravity-by-one-feature", "gravity by one feature"),
                    Map.entry("gravity-class-unsure", "gravity class unsure"),
                    Map.entry("not-a-late-dwarf", "no late dwarf"),
                    Map.entry("kind-unsure", "kind unsure"),
                    Map.entry("kind-not-judged", "kind not judged"),
                    Map.entry("pair-candidate", "perhaps an unresolved pair"),
                    Map.entry("reddening-fitted", "extinction fitted with the type"),
                    Map.entry("grids-disagree", "evolution grids disagree"),
                    Map.entry("luminosity-unlike-type", "luminosity unlike that of the type"),
                    Map.entry("sigma-estimated", "noise estimated from the pixels"));

    private static final Set<String> LOWER = Set.of("poor", "unusable");

    private LatexTable() {}

    static void write(TableRows rows, String origin, Writer out) throws IOException {
        Map<String, Integer> places = new HashMap<>();
        for (int c = 0; c < rows.columns().size(); c++) {
            places.put(rows.columns().get(c).name(), c);
        }
        out.write("% " + PlainAscii.of(origin) + "\n" + HEAD);
        out.write(
                " & & & ("
                        + TableUnit.SUBCLASS.latex()
                        + ") & & ("
                        + TableUnit.KELVIN.latex()
                        + ") & ("
                        + TableUnit.MSUN.latex()
                        + ") & \\\\\n\\hline\n");
        Map<String, String> marks = new LinkedHashMap<>();
        rows.forEach(cells -> out.write(row(new Cells(places, cells), marks)));
        StringBuilder notes = new StringBuilder();
        marks.forEach(
                (words, mark) ->
                        notes.append(" $^\\mathrm{")
                                .append(mark)
                                .append("}$ ")
                                .append(words)
                                .append('.'));
        out.write(FOOT + notes + "\n\\end{table*}\n");
    }

    private record Cells(Map<String, Integer> places, List<String> cells) {

        String of(String column) {
            return cells.get(places.get(column));
        }

        /** A cell for LaTeX, an ellipsis where it is empty. */
        String shown(String column) {
            String cell = of(column);
            return cell.isEmpty() ? "\\ldots" : LatexText.of(cell);
        }
    }

    private static String row(Cells cells, Map<String, String> marks) {
        String mass =
                cells.of("mass_msun").isEmpty()
                        ? "\\ldots"
                        : "$"
                                + cells.of("mass_msun")
                                + "$ ($"
                                + cells.of("mass_msun_lo68")
                                + "$--$"
                                + cells.of("mass_msun_hi68")
                                + "$)";
        String teff =
                cells.of("teff_k").isEmpty()
                        ? "\\ldots"
                        : "$" + cells.of("teff_k") + " \\pm " + cells.of("teff_k_sigma") + "$";
        return String.join(
                        " & ",
                        LatexText.of(cells.of("name")) + marks(cells, marks),
                        cells.shown("type"),
                        cells.shown("kind"),
                        cells.shown("type_sigma"),
                        cells.shown("gravity"),
                        teff,
                        mass,
                        cells.shown("p_substellar"))
                + " \\\\\n";
    }

    private static String marks(Cells cells, Map<String, String> marks) {
        List<String> words = new ArrayList<>();
        for (String code : cells.of("findings").split(" ", -1)) {
            if (NOTES.containsKey(code)) {
                words.add(NOTES.get(code));
            }
        }
        if (LOWER.contains(cells.of("quality"))) {
            words.add("spectrum " + cells.of("quality"));
        }
        if (cells.of("status").equals("failed")) {
            words.add("not measured");
        }
        List<String> letters = new ArrayList<>();
        for (String word : words) {
            letters.add(marks.computeIfAbsent(word, w -> letter(marks.size())));
        }
        letters.sort(null);
        return letters.isEmpty() ? "" : "$^\\mathrm{" + String.join(",", letters) + "}$";
    }

    private static String letter(int number) {
        return Character.toString((char) ('a' + number));
    }
}
