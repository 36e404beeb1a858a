package emberline.place.calibrated;

import emberline.place.GravityClass;

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
}
