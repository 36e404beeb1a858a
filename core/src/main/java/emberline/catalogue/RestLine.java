package emberline.catalogue;

/**
 * An atomic line at rest.
 *
 * @param species the atom or ion, e.g. {@code K I}
 * @param vacuumMicron rest wavelength (micron, vacuum)
 * @param purpose what the line is good for
 * @param source where the wavelength comes from
 * @param place table in the source; blank where not known
 * @param howKnown how the wavelength reached this catalogue
 * @param confidencePercent how sure it is that it is exactly as printed, 0 to 100
 * @param note a remark; may be blank
 */
public record RestLine(
        String species,
        double vacuumMicron,
        Purpose purpose,
        Source source,
        String place,
        HowKnown howKnown,
        int confidencePercent,
        String note) {}
