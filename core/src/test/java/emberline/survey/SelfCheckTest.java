package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import java.util.List;
import org.junit.jupiter.api.Test;

class SelfCheckTest {

    @Test
    void everyValueIsFoundAnew() {
        List<SelfCheck.Line> lines = new SelfCheck(FeatureCatalogue.standard()).run();
        assertEquals(16, lines.size());
        for (SelfCheck.Line line : lines) {
            assertTrue(line.passed(), line.toString());
            assertFalse(line.origin().isBlank());
        }
    }

    @Test
    void aValueThatIsOffOrMissingFails() {
        assertTrue(new SelfCheck.Line("x", 1, 0.1, "test", 1.05).passed());
        assertFalse(new SelfCheck.Line("x", 1, 0.1, "test", 1.2).passed());
        assertFalse(new SelfCheck.Line("x", 1, 0.1, "test", Double.NaN).passed());
    }
}
