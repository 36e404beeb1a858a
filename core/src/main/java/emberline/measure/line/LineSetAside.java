package emberline.measure.line;

/**
 * A line that did not enter the radial velocity.
 *
 * @param species the atom, e.g. {@code K I}
 * @param restMicron wavelength at rest (micron, vacuum)
 * @param reason why
 */
public record LineSetAside(String species, double restMicron, String reason) {}
