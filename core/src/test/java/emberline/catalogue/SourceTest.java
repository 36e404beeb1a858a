package emberline.catalogue;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** How a source is cited. */
class SourceTest {

    private static Source source(String authors, String journal, String title, String doi) {
        boolean printed = !journal.isBlank();
        return new Source(
                "example2026",
                authors,
                2026,
                journal,
                printed ? "12" : "",
                printed ? "A3" : "",
                title,
                doi);
    }

    @Test
    void citesAuthorsYearAndPlace() {
        assertEquals("One & Two 2026, A&A 12, A3", source("One & Two", "A&A", "", "").cite());
        assertEquals("One et al. 2026", source("One et al.", "", "", "").cite());
        assertEquals("One 2026, Lines", source("One", "", "Lines", "").cite());
    }

    @Test
    void bibtexHoldsWhatIsKnown() {
        assertEquals(
                """
                @article{example2026,
                  author = {{One} and {Two Three} and {Four}},
                  year = {2026},
                  title = {{Bands \\& lines}},
                  journal = {A\\&A},
                  volume = {12},
                  pages = {A3},
                  doi = {10.1/x_y}
                }
                """,
                source("One, Two Three & Four", "A&A", "Bands & lines", "10.1/x_y").bibtex());
    }

    @Test
    void bibtexOfAnUnknownJournalIsMisc() {
        assertEquals(
                """
                @misc{example2026,
                  author = {{One} and others},
                  year = {2026}
                }
                """,
                source("One et al.", "", "", "").bibtex());
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "Reid1995", "reid", "1995reid", "reid95", "reid1995ab"})
    void refusesAnUnusualKey(String key) {
        assertThrows(
                IllegalArgumentException.class,
                () -> new Source(key, "One", 1995, "", "", "", "", ""));
    }
}
