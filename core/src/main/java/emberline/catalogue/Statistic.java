package emberline.catalogue;

/** How the pixels of a window become one number. */
public enum Statistic {
    /** Mean of the flux density, edge pixels weighted by their covered fraction. */
    MEAN,
    /** Median of the flux density of the pixels inside. */
    MEDIAN
}
