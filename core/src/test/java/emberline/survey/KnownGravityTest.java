package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;

import emberline.spectrum.Candidate;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class KnownGravityTest {

    private static String of(Map<String, String> cells) {
        return KnownGravity.of(new Candidate("A", 1, List.of("a.csv"), cells));
    }

    @ParameterizedTest
    @CsvSource({
        "L2 alpha, FLD-G",
        "L1: beta, INT-G",
        "L3 gamma, VL-G",
        "M9.5delta, VL-G",
        "L0β, INT-G",
        "L4γ, VL-G",
        "L5 beta/gamma, young",
        "sdM7 gamma, VL-G",
        "L2 alpha/beta, ''",
        "L1 pec, ''",
        "G9 II CN1 H_delta1, ''",
        "M6 II H_delta1, ''",
        "betamax, ''"
    })
    void greekLettersBehindTheTypeTell(String type, String expected) {
        assertEquals(expected, of(Map.of("known_type", type)));
    }

    @Test
    void theColumnGoesBeforeTheRemark() {
        assertEquals("INT-G", of(Map.of("known_type", "L1 gamma", "known_gravity", "INT-G")));
    }

    @Test
    void nothingIsKnownWithoutEither() {
        assertEquals("", of(Map.of()));
    }
}
