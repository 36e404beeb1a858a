package emberline.catalogue;

/** The wavelength region in which the windows of a feature lie. */
public enum Band {
    /** Below 1 micron. */
    OPTICAL,
    /** About 0.96 to 1.1 micron. */
    Y,
    /** About 1.1 to 1.4 micron. */
    J,
    /** About 1.4 to 1.85 micron. */
    H,
    /** About 1.9 to 2.5 micron. */
    K,
    /** About 2.8 to 4.2 micron. */
    L,
    /** About 4.4 to 5.5 micron. */
    M,
    /** Compares Y with J. */
    Y_J,
    /** Compares J with H. */
    J_H,
    /** Compares J with K. */
    J_K,
    /** Compares H with K. */
    H_K,
    /** Uses J, H and K. */
    J_H_K
}
