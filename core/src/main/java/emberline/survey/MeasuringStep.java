package emberline.survey;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.measure.line.LineReport;
import emberline.measure.line.LineReporter;
import emberline.prepare.PreparedSpectrum;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.Observation;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.Finding;
import emberline.survey.StageTimes.Stage;
import java.util.Locale;
import java.util.OptionalDouble;

/** Prepares and measures one spectrum, at rest where that is asked for. */
final class MeasuringStep {

    private final Preparer preparer = new Preparer();
    private final Measurer measurer;
    private final LineReporter lines;
    private final boolean toMeasuredRest;
    private final StageTimes times;

    MeasuringStep(
            FeatureCatalogue catalogue,
            Measuring measuring,
            boolean toMeasuredRest,
            StageTimes times) {
        this.measurer = new Measurer(catalogue, measuring);
        this.lines = new LineReporter(catalogue, measuring.site());
        this.toMeasuredRest = toMeasuredRest;
        this.times = times;
    }

    /**
     * Prepares and measures a spectrum.
     *
     * @param path the path as listed
     * @param observation the spectrum as read
     * @param stated what is stated about it
     * @return its result
     * @throws UnreadableSpectrumException if it cannot be prepared
     */
    SpectrumResult measure(String path, Observation observation, Preparing stated)
            throws UnreadableSpectrumException {
        PreparedSpectrum prepared =
                times.timed(Stage.PREPARE, () -> preparer.prepare(observation, stated));
        Measurements measurements = times.timed(Stage.MEASURE, () -> measurer.measure(prepared));
        LineReport seen = times.timed(Stage.MEASURE, () -> lines.report(prepared, measurements));
        OptionalDouble velocity =
                stated.radialVelocityKms().isPresent()
                        ? OptionalDouble.empty()
                        : seen.velocity().significantKms();
        if (velocity.isPresent() && toMeasuredRest) {
            return measure(path, observation, stated.withRadialVelocityKms(velocity.getAsDouble()));
        }
        return new SpectrumResult(
                path,
                observation.format(),
                observation.sha256(),
                velocity.isPresent()
                        ? prepared.with(velocityLeftIn(velocity.getAsDouble()))
                        : prepared,
                measurements,
                seen);
    }

    private static Finding velocityLeftIn(double velocityKms) {
        return Finding.note(
                "velocity-left-in",
                String.format(
                        Locale.ROOT,
                        "the lines show a radial velocity of %.0f km/s, which was not taken out;"
                                + " it moves narrow windows by %.1f Angstrom at 1.25 micron",
                        velocityKms,
                        velocityKms / Preparer.SPEED_OF_LIGHT_KMS * 12_500));
    }

    /**
     * Prepares a spectrum without measuring it.
     *
     * @param observation the spectrum as read
     * @param stated what is stated about it
     * @return the spectrum to measure
     * @throws UnreadableSpectrumException if it cannot be prepared
     */
    PreparedSpectrum prepared(Observation observation, Preparing stated)
            throws UnreadableSpectrumException {
        return preparer.prepare(observation, stated);
    }

    /** The features alone of a prepared spectrum, without a look at the lines. */
    Measurements features(PreparedSpectrum prepared) {
        return measurer.measure(prepared);
    }
}
