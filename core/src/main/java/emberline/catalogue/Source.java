package emberline.catalogue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;

/**
 * A paper, or another work, that numbers come from. A blank text says that it is not known.
 *
 * @param key unique short name: letters, year and perhaps a letter, e.g. {@code reid1995}
 * @param authors surnames as cited, e.g. {@code Allers & Liu} or {@code Reid et al.}; not blank
 * @param year year of publication
 * @param journal abbreviation of the journal
 * @param volume volume of the journal
 * @param page first page or article number
 * @param title title as printed
 * @param doi digital object identifier without a prefix
 */
public record Source(
        String key,
        String authors,
        int year,
        String journal,
        String volume,
        String page,
        String title,
        String doi) {

    /** Checks key, authors and year. */
    public Source {
        if (!key.matches("[a-z]+[12][0-9]{3}[a-z]?")) {
            throw new IllegalArgumentException(
                    "source key '" + key + "': expected letters and a year such as reid1995");
        }
        if (authors.isBlank()) {
            throw new IllegalArgumentException("source " + key + ": expected the authors");
        }
        if (!(year >= 1800 && year < 2200)) {
            throw new IllegalArgumentException("source " + key + ": expected a year, not " + year);
        }
    }

    /**
     * Authors and year, as cited in a text.
     *
     * @return e.g. {@code Allers & Liu 2013}
     */
    public String shortCite() {
        return authors + " " + year;
    }

    /**
     * Authors, year and place, as far as known.
     *
     * @return e.g. {@code Allers & Liu 2013, ApJ 772, 79}
     */
    public String cite() {
        if (journal.isBlank()) {
            return title.isBlank() ? shortCite() : shortCite() + ", " + title;
        }
        String place = volume.isBlank() ? journal : journal + " " + volume;
        return shortCite() + ", " + place + (page.isBlank() ? "" : ", " + page);
    }

    /**
     * The entry for a BibTeX file; fields that are not known are left out.
     *
     * @return an entry of several lines, with a line end
     */
    public String bibtex() {
        List<String> fields = new ArrayList<>();
        fields.add("author = {" + bibtexAuthors() + "}");
        fields.add("year = {" + year + "}");
        Map<String, String> known =
                Map.of("title", title, "journal", journal, "volume", volume, "pages", page);
        for (String name : List.of("title", "journal", "volume", "pages")) {
            String value = known.get(name);
            if (!value.isBlank()) {
                fields.add(
                        name.equals("title")
                                ? "title = {{" + escaped(value) + "}}"
                                : name + " = {" + escaped(value) + "}");
            }
        }
        if (!doi.isBlank()) {
            fields.add("doi = {" + doi + "}");
        }
        String kind = journal.isBlank() ? "misc" : "article";
        return fields.stream()
                .collect(Collectors.joining(",\n  ", "@" + kind + "{" + key + ",\n  ", "\n}\n"));
    }

    private String bibtexAuthors() {
        boolean others = authors.endsWith(" et al.");
        String named = others ? authors.substring(0, authors.length() - 7) : authors;
        String joined =
                List.of(named.split(", | & ", -1)).stream()
                        .map(name -> "{" + escaped(name) + "}")
                        .collect(Collectors.joining(" and "));
        return others ? joined + " and others" : joined;
    }

    private static String escaped(String text) {
        return text.replace("&", "\\&").replace("%", "\\%").replace("_", "\\_");
    }
}
