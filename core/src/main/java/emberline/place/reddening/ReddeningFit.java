package emberline.place.reddening;

import emberline.place.TypePosterior;

/**
 * Type and extinction fitted together.
 *
 * @param avMag median extinction in V (mag)
 * @param lo68Mag lower end of the 68% interval (mag)
 * @param hi68Mag upper end of the 68% interval (mag)
 * @param lo95Mag lower end of the 95% interval (mag)
 * @param hi95Mag upper end of the 95% interval (mag)
 * @param logGain natural logarithm of how much more probable the measurements are with the
 *     extinctions that were tried, all alike beforehand, than with none
 * @param posterior type and gravity, whatever the extinction
 */
public record ReddeningFit(
        double avMag,
        double lo68Mag,
        double hi68Mag,
        double lo95Mag,
        double hi95Mag,
        double logGain,
        TypePosterior posterior) {}
