package emberline.place;

import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.GivenMeasurements;
import java.util.HashMap;
import java.util.Map;
import org.junit.jupiter.api.Test;

class BandCheckTest {

    /** Four features that are 1 on a smooth spectrum. */
    private static Map<String, Double> smooth() {
        Map<String, Double> values = new HashMap<>();
        values.put("burgasser2006/h2o-j", 1.0);
        values.put("burgasser2006/h2o-h", 1.0);
        values.put("burgasser2006/h2o-k", 1.0);
        values.put("allers2007/h2o", 1.0);
        return values;
    }

    private static boolean none(Map<String, Double> values, double sigma) {
        return BandCheck.showsNone(GivenMeasurements.of(values, sigma));
    }

    @Test
    void aSmoothSpectrumShowsNone() {
        assertTrue(none(smooth(), 0.001));
        Map<String, Double> shallow = smooth();
        shallow.put("allers2007/h2o", 1.029);
        assertTrue(none(shallow, 0.001));
    }

    @Test
    void oneBandIsEnoughInEmissionOrAbsorption() {
        for (double value : new double[] {0.9, 1.1}) {
            Map<String, Double> band = smooth();
            band.put("burgasser2006/h2o-h", value);
            assertFalse(none(band, 0.001));
            assertFalse(none(band, 0.033), "three sigma are a band");
            assertTrue(none(band, 0.034), "less is noise");
        }
    }

    @Test
    void fewerThanFourFeaturesSayNothing() {
        Map<String, Double> three = smooth();
        three.remove("allers2007/h2o");
        assertFalse(none(three, 0.001));
    }
}
