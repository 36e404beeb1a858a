package emberline.reports.page;

import emberline.catalogue.Source;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;

/** The papers of a report, numbered in the order of their keys. */
final class SourceList {

    private final List<Source> sources;

    SourceList(List<Source> used) {
        Set<Source> unique = new TreeSet<>(Comparator.comparing(Source::key));
        unique.addAll(used);
        this.sources = new ArrayList<>(unique);
    }

    /** The mark of a paper in the text, e.g. {@code [4]}; empty for one that is not listed. */
    String mark(Source source) {
        int place = sources.indexOf(source);
        return place < 0 ? "" : "[" + (place + 1) + "]";
    }

    /** The number of a paper, e.g. {@code 4}; empty for one that is not listed. */
    String number(Source source) {
        int place = sources.indexOf(source);
        return place < 0 ? "" : Integer.toString(place + 1);
    }

    List<Source> sources() {
        return sources;
    }
}
