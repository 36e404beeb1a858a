package emberline.judge.plan;

import emberline.place.GravityRange;
import emberline.place.calibrated.Forecast;
import java.util.List;

/**
 * A spectrum that is to be planned.
 *
 * @param setting object and instrument
 * @param aim what it should decide
 * @param sure probability from which the answer counts as sure, above 0.5 and below 1
 * @param signals median signal-to-noise a pixel to try, in ascending order
 * @param draws how many spectra are drawn at each
 * @param seed start of the random numbers
 */
public record PlanQuestion(
        Forecast.Setting setting,
        PlanAim aim,
        double sure,
        List<Double> signals,
        int draws,
        long seed) {

    /** The signal-to-noise that is tried where nothing else is said. */
    public static final List<Double> SIGNALS =
            List.of(
                    3.0, 5.0, 7.0, 10.0, 15.0, 20.0, 30.0, 40.0, 60.0, 80.0, 120.0, 160.0, 240.0,
                    320.0);

    /** Checks the numbers. */
    public PlanQuestion {
        signals = List.copyOf(signals);
        if (!(sure > 0.5 && sure < 1)) {
            throw new IllegalArgumentException(
                    "probability " + sure + ": expected one above 0.5 and below 1, such as 0.95");
        }
        if (draws < 20) {
            throw new IllegalArgumentException(draws + " draws: expected at least 20");
        }
        if (aim == PlanAim.GRAVITY && !GravityRange.contains(setting.typeNumber())) {
            throw new IllegalArgumentException(
                    "gravity is judged from "
                            + GravityRange.words()
                            + "; for other types plan another aim");
        }
    }
}
