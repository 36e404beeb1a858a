package emberline.read;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.charset.StandardCharsets;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Forms of columns as the FITS standard (version 4.0, section 7.3) writes them. */
class FitsTableRowTest {

    private static FitsCards header(int rowBytes, String... forms) {
        StringBuilder cards = new StringBuilder();
        card(cards, "NAXIS1", rowBytes);
        card(cards, "TFIELDS", forms.length);
        for (int i = 0; i < forms.length; i++) {
            cards.append(
                    String.format(
                            Locale.ROOT, "%-80s", "TFORM" + (i + 1) + "  = '" + forms[i] + "'"));
        }
        cards.append(String.format(Locale.ROOT, "%-80s", "END"));
        int blocks = (cards.length() + FitsCards.BLOCK - 1) / FitsCards.BLOCK;
        return FitsCards.of(
                String.format(Locale.ROOT, "%-" + blocks * FitsCards.BLOCK + "s", cards)
                        .getBytes(StandardCharsets.ISO_8859_1));
    }

    private static void card(StringBuilder cards, String key, int value) {
        String line = String.format(Locale.ROOT, "%-8s= %20d", key, value);
        cards.append(String.format(Locale.ROOT, "%-80s", line));
    }

    @Test
    void columnsFollowEachOther() {
        assertEquals(3, FitsTableRow.columns(header(8 + 40 + 16, "8A", "10E", "1PE(900)")).size());
    }

    @ParameterizedTest
    @CsvSource({
        "47, 8A, 10E",
        "900, 8A, 99999999999999999999E",
        "900, 999999999D, 999999999D",
        "900, 8A, words"
    })
    void formsThatDoNotFitTheRowGiveNoColumns(int rowBytes, String first, String second) {
        assertEquals(0, FitsTableRow.columns(header(rowBytes, first, second)).size());
    }
}
