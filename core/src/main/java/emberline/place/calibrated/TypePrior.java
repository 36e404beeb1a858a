package emberline.place.calibrated;

import emberline.place.GravityClass;
import java.util.EnumMap;
import java.util.Map;

/** What is thought of type and gravity before the spectrum is looked at. */
public interface TypePrior {

    /**
     * The density of the prior.
     *
     * @param typeNumber type number (M0 = 0 to Y1 = 31)
     * @param gravity the gravity class
     * @return relative density, positive
     */
    double density(double typeNumber, GravityClass gravity);

    /**
     * The shares of the gravity classes in the prior at one type.
     *
     * @param typeNumber type number (M0 = 0 to Y1 = 31)
     * @return the share of every class; they add up to 1
     */
    default Map<GravityClass, Double> classShares(double typeNumber) {
        Map<GravityClass, Double> shares = new EnumMap<>(GravityClass.class);
        double sum = 0;
        for (GravityClass gravity : GravityClass.values()) {
            sum += density(typeNumber, gravity);
        }
        for (GravityClass gravity : GravityClass.values()) {
            shares.put(gravity, density(typeNumber, gravity) / sum);
        }
        return shares;
    }
}
