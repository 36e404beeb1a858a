package emberline.place.photometric;

/** The colours of the template table; each is a difference of two magnitudes (Vega). */
enum TemplateColour {
    /** Y - J, MKO. */
    Y_J_MKO,
    /** J - H, MKO. */
    J_H_MKO,
    /** H - K, MKO. */
    H_K_MKO,
    /** K (MKO) - W1. */
    K_MKO_W1,
    /** J - H, 2MASS. */
    J_H_2MASS,
    /** H - Ks, 2MASS. */
    H_K_2MASS,
    /** Ks (2MASS) - W1. */
    K_2MASS_W1,
    /** W1 - W2. */
    W1_W2,
    /** J of 2MASS less J of MKO. */
    J_2MASS_J_MKO
}
