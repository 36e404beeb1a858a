package emberline.demo;

import java.util.ArrayList;
import java.util.List;

/**
 * An invented spectrograph.
 *
 * @param name its name
 * @param lowMicron shortest wavelength (micron, vacuum)
 * @param highMicron longest wavelength (micron, vacuum)
 * @param resolvingPower resolving power, the same at all wavelengths
 * @param pixels pixels to a resolution element
 * @param logarithmic whether pixels are equal in the logarithm of wavelength, else in wavelength
 * @param sky brightness of the sky in J, in units of the peak of the object
 */
record Instrument(
        String name,
        double lowMicron,
        double highMicron,
        double resolvingPower,
        double pixels,
        boolean logarithmic,
        double sky) {

    /**
     * An instrument of {@code instruments.csv}.
     *
     * @param name its name there
     * @return the instrument
     * @throws IllegalStateException if there is none of that name
     */
    static Instrument named(String name) {
        List<String> names = new ArrayList<>();
        for (DemoTable.Row row : DemoTable.named("instruments.csv").rows()) {
            names.add(row.text("instrument"));
            if (row.text("instrument").equals(name)) {
                return new Instrument(
                        name,
                        row.number("low_micron"),
                        row.number("high_micron"),
                        row.number("resolution"),
                        row.number("pixels"),
                        row.text("step").equals("LOG"),
                        row.number("sky"));
            }
        }
        throw new IllegalStateException(
                "instrument " + name + " is not in instruments.csv: expected one of " + names);
    }

    /** The edges of its pixels (micron, vacuum), one more than there are pixels. */
    double[] edgesMicron() {
        double perPixel = 1 / (resolvingPower * pixels);
        if (logarithmic) {
            int count = (int) (StrictMath.log(highMicron / lowMicron) / perPixel);
            double[] edges = new double[count + 1];
            for (int i = 0; i <= count; i++) {
                edges[i] = lowMicron * StrictMath.exp(i * perPixel);
            }
            return edges;
        }
        double step = (lowMicron + highMicron) / 2 * perPixel;
        int count = (int) ((highMicron - lowMicron) / step);
        double[] edges = new double[count + 1];
        for (int i = 0; i <= count; i++) {
            edges[i] = lowMicron + i * step;
        }
        return edges;
    }
}
