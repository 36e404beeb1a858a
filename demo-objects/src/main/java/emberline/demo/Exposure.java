package emberline.demo;

import java.util.List;
import java.util.OptionalDouble;

/**
 * One spectrum of the survey: what was used and how it is written down.
 *
 * @param object name of the object
 * @param file name of the file
 * @param format format of the file
 * @param instrument the spectrograph
 * @param signalToNoise per pixel, at the peak of J or of the brightest pixels
 * @param wavelengthUnit unit of the wavelengths in the file
 * @param air whether the wavelengths of the file are in air
 * @param fluxUnit unit of the flux in the file
 * @param withSigma whether the file holds the noise
 * @param leastTransmission pixels where the atmosphere lets through less are left out
 * @param fault what is wrong with the file
 */
record Exposure(
        String object,
        String file,
        FileFormat format,
        Instrument instrument,
        double signalToNoise,
        WaveUnit wavelengthUnit,
        boolean air,
        FluxScale fluxUnit,
        boolean withSigma,
        OptionalDouble leastTransmission,
        Fault fault) {

    /** All observations in the order of {@code observations.csv}. */
    static List<Exposure> all() {
        return DemoTable.named("observations.csv").rows().stream().map(Exposure::of).toList();
    }

    private static Exposure of(DemoTable.Row row) {
        return new Exposure(
                row.text("name"),
                row.text("file"),
                FileFormat.valueOf(row.text("format")),
                Instrument.named(row.text("instrument")),
                row.number("sn"),
                WaveUnit.named(row.text("wave_unit")),
                row.text("medium").equals("air"),
                FluxScale.named(row.text("flux_unit")),
                row.text("sigma").equals("yes"),
                row.isBlank("gaps")
                        ? OptionalDouble.empty()
                        : OptionalDouble.of(row.number("gaps")),
                row.isBlank("fault") ? Fault.NONE : Fault.valueOf(row.text("fault")));
    }
}
