package emberline.demo;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class ObserverTest {

    private static final ModelGrid GRID = new ModelGrid();
    private static final Observer OBSERVER = new Observer(GRID);

    private static Exposure exposure(String instrument, double sn, OptionalDouble gaps) {
        return new Exposure(
                "test",
                "test.csv",
                FileFormat.CSV,
                Instrument.named(instrument),
                sn,
                WaveUnit.MICRON,
                false,
                FluxScale.CGS,
                true,
                gaps,
                Fault.NONE);
    }

    private static double[] flat() {
        double[] flux = new double[GRID.size()];
        Arrays.fill(flux, 2.5);
        return flux;
    }

    @Test
    void aFlatSpectrumStaysFlatWithoutNoise() {
        ObservedSpectrum seen = OBSERVER.noiseless(flat(), Instrument.named("grism"));
        for (int i = 0; i < seen.size(); i++) {
            assertEquals(2.5, seen.flux(i), 1e-9);
        }
    }

    @Test
    void aNarrowLineGetsTheWidthOfTheInstrumentAndKeepsItsLight() {
        double[] flux = new double[GRID.size()];
        flux[(int) GRID.place(1.25)] = 1;
        Instrument medium = Instrument.named("medium");
        ObservedSpectrum seen = OBSERVER.noiseless(flux, medium);
        double[] edges = medium.edgesMicron();
        double light = 0;
        double mean = 0;
        double square = 0;
        for (int i = 0; i < seen.size(); i++) {
            double part = seen.flux(i) * (edges[i + 1] - edges[i]);
            light += part;
            mean += part * seen.micron(i);
            square += part * seen.micron(i) * seen.micron(i);
        }
        mean /= light;
        double sigma = Math.sqrt(square / light - mean * mean);
        double expected = 1.25 / 750 / 2.354820;
        double pixel = 1.25 / 750 / 2;
        assertEquals(1.25 / ModelGrid.PIXELS_PER_E, light, 1e-3 * light);
        assertEquals(1.25, mean, 2e-4);
        assertEquals(Math.sqrt(expected * expected + pixel * pixel / 12), sigma, 0.02 * sigma);
    }

    @Test
    void noiseScattersAsItsSigmaSays() {
        Exposure exposure = exposure("cross", 50, OptionalDouble.empty());
        ObservedSpectrum seen = OBSERVER.observe(flat(), exposure);
        double sum = 0;
        int count = 0;
        Atmosphere atmosphere = new Atmosphere();
        for (int i = 0; i < seen.size(); i++) {
            if (atmosphere.transmission(seen.micron(i)) > 0.999) {
                double x = (seen.flux(i) - 2.5) / seen.sigma(i);
                sum += x * x;
                count++;
            }
        }
        assertTrue(count > 500, "clear pixels: " + count);
        assertEquals(1, sum / count, 4 * Math.sqrt(2.0 / count), "reduced chi square");
    }

    @Test
    void theSkyOfKAndTheAtmosphereCostSignal() {
        ObservedSpectrum seen =
                OBSERVER.observe(flat(), exposure("prism", 50, OptionalDouble.empty()));
        double j = signalToNoise(seen, 1.25);
        assertEquals(50, j, 2);
        assertTrue(signalToNoise(seen, 2.38) < 0.7 * j, "K is noisier");
        assertTrue(signalToNoise(seen, 1.385) < 0.4 * j, "the water band is noisier");
    }

    private static double signalToNoise(ObservedSpectrum spectrum, double micron) {
        int pixel = 0;
        while (spectrum.micron(pixel) < micron) {
            pixel++;
        }
        return 2.5 / spectrum.sigma(pixel);
    }

    @Test
    void gapsLeaveOutWhatTheAtmosphereHides() {
        ObservedSpectrum whole =
                OBSERVER.observe(flat(), exposure("prism", 50, OptionalDouble.empty()));
        ObservedSpectrum cut =
                OBSERVER.observe(flat(), exposure("prism", 50, OptionalDouble.of(0.5)));
        assertTrue(cut.size() < whole.size());
        Atmosphere atmosphere = new Atmosphere();
        for (int i = 0; i < cut.size(); i++) {
            assertTrue(atmosphere.transmission(cut.micron(i)) >= 0.5);
        }
    }

    @Test
    void theSameObservationGivesTheSameSpectrum() {
        Exposure exposure = exposure("prism", 20, OptionalDouble.empty());
        assertArrayEquals(
                OBSERVER.observe(flat(), exposure).fluxes(),
                OBSERVER.observe(flat(), exposure).fluxes());
    }

    @Test
    void unitsOfFluxAndWavelengthAreConverted() {
        assertEquals(1e-15, FluxScale.SI.of(1e-16, 1.25), 1e-27, "1 erg/s/cm2/A = 10 W/m2/um");
        // 1 Jy = 1e-23 erg/s/cm2/Hz and F_lambda = F_nu c / lambda^2: by hand at 1 micron
        assertEquals(1, FluxScale.MILLIJANSKY.of(2.99792458e-26 / 1e-8 * 1e2, 1.0), 1e-9);
        assertEquals(12500, WaveUnit.named("Angstrom").of(1.25), 1e-9);
        assertEquals(1250, WaveUnit.named("nm").of(1.25), 1e-9);
    }

    @Test
    void unknownNamesAreRefused() {
        assertThrows(IllegalStateException.class, () -> Instrument.named("nothing"));
        assertThrows(IllegalStateException.class, () -> WaveUnit.named("furlong"));
        assertThrows(IllegalStateException.class, () -> FluxScale.named("candela"));
        assertThrows(IllegalStateException.class, () -> DemoTable.named("none.csv"));
    }
}
