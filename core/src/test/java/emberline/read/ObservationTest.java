package emberline.read;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class ObservationTest {

    private static final Observation.Origin ORIGIN =
            new Observation.Origin("x.txt", "plain text, 3 columns", "00");
    private static final Observation.Stated NOTHING =
            new Observation.Stated(Optional.empty(), Optional.empty());

    @Test
    void nothingChangesItFromOutside() {
        double[] waves = {1, 2};
        double[] flux = {3, 4};
        double[] sigma = {5, 6};
        Observation made =
                Observation.of(ORIGIN, waves, flux, Optional.of(sigma), NOTHING, new ArrayList<>());
        waves[0] = 9;
        flux[0] = 9;
        sigma[0] = 9;
        made.wavelengthsMicron()[1] = 9;
        made.fluxes()[1] = 9;
        made.fluxSigmas().orElseThrow()[1] = 9;
        assertArrayEquals(new double[] {1, 2}, made.wavelengthsMicron());
        assertArrayEquals(new double[] {3, 4}, made.fluxes());
        assertArrayEquals(new double[] {5, 6}, made.fluxSigmas().orElseThrow());
        assertEquals("x.txt (plain text, 3 columns), 2 pixels", made.toString());
    }

    @Test
    void badArraysAreRefused() {
        Optional<double[]> none = Optional.empty();
        double[] two = {1, 2};
        assertThrows(IllegalArgumentException.class, () -> make(new double[] {1}, two, none));
        assertThrows(IllegalArgumentException.class, () -> make(two, new double[3], none));
        assertThrows(
                IllegalArgumentException.class,
                () -> make(two, two, Optional.of(new double[] {1})));
        assertThrows(
                IllegalArgumentException.class,
                () -> make(new double[] {1, Double.NaN}, two, none));
        assertThrows(IllegalArgumentException.class, () -> make(new double[] {0, 1}, two, none));
        assertThrows(IllegalArgumentException.class, () -> make(new double[] {2, 2}, two, none));
    }

    private static Observation make(double[] waves, double[] flux, Optional<double[]> sigma) {
        return Observation.of(ORIGIN, waves, flux, sigma, NOTHING, List.of());
    }
}
