package emberline.prepare;

import static emberline.PublishedRows.number;
import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.PublishedRows;
import java.io.IOException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ExtinctionLawTest {

    /** Values of an independent script; see the head of the table. */
    @Test
    void lawsGiveTheComputedExtinction() throws IOException {
        assertAll(
                PublishedRows.of("extinction.csv").stream()
                        .map(
                                row ->
                                        () ->
                                                assertEquals(
                                                        number(row, "expected"),
                                                        law(row.getField("law"), number(row, "r_v"))
                                                                .relativeTo(
                                                                        number(
                                                                                row,
                                                                                "wavelength_micron")),
                                                        number(row, "tolerance"),
                                                        row.toString())));
    }

    private static ExtinctionLaw law(String name, double rv) {
        return name.equals("F99")
                ? ExtinctionLaw.fitzpatrick1999(rv)
                : ExtinctionLaw.cardelli1989(rv);
    }

    /** The band value A_V of F99 is not that of 5495 Angstrom: 0.979 there (its Table 3). */
    @Test
    void fitzpatrickIsNotRenormalisedAtV() {
        assertEquals(0.979, ExtinctionLaw.fitzpatrick1999(3.1).relativeTo(0.5495), 0.002);
    }

    /** Optical values of the same script, dossier table of laws: 0.80 micron, R_V 3.1 and 5. */
    @Test
    void opticalCardelliMeetsTheComputedValues() {
        assertEquals(0.5975, ExtinctionLaw.cardelli1989(3.1).relativeTo(0.80), 2e-4);
        assertEquals(0.6674, ExtinctionLaw.cardelli1989(5).relativeTo(0.80), 2e-4);
    }

    @Test
    void extinctionFallsWithWavelength() {
        ExtinctionLaw law = ExtinctionLaw.fitzpatrick1999(ExtinctionLaw.DIFFUSE_RV);
        for (double micron = 0.5; micron < 3; micron += 0.01) {
            assertTrue(law.relativeTo(micron) > law.relativeTo(micron + 0.01));
        }
        assertEquals(3.1, law.rv());
    }

    @ParameterizedTest
    @ValueSource(doubles = {1.9, 6.1, Double.NaN})
    void strangeRvIsRefused(double rv) {
        assertThrows(IllegalArgumentException.class, () -> ExtinctionLaw.fitzpatrick1999(rv));
        assertThrows(IllegalArgumentException.class, () -> ExtinctionLaw.cardelli1989(rv));
    }

    @Test
    void farUltravioletIsRefused() {
        ExtinctionLaw law = ExtinctionLaw.fitzpatrick1999(3.1);
        assertThrows(IllegalArgumentException.class, () -> law.relativeTo(0.2));
    }
}
