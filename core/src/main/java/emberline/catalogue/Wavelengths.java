package emberline.catalogue;

import emberline.spectrum.AirToVacuum;
import emberline.spectrum.Medium;

/** Turns printed wavelengths into micron in vacuum: the only place where that is done. */
final class Wavelengths {

    /** Shortest wavelength that a catalogue may hold (micron). */
    static final double SHORTEST_MICRON = 0.3;

    /** Longest wavelength that a catalogue may hold (micron). */
    static final double LONGEST_MICRON = 5.5;

    private static final double ANGSTROM_PER_MICRON = 1e4;

    private Wavelengths() {}

    /** The unit of a printed wavelength. */
    enum Unit {
        MICRON,
        ANGSTROM,
        /** Of a feature without windows. */
        NONE
    }

    /** A printed wavelength of a row in micron in vacuum. */
    static double vacuumMicron(CatalogueRow row, String column, Unit unit, Medium medium)
            throws InvalidCatalogueException {
        double printed = row.number(column);
        double micron = unit == Unit.ANGSTROM ? printed / ANGSTROM_PER_MICRON : printed;
        if (!(micron >= SHORTEST_MICRON && micron <= LONGEST_MICRON)) {
            throw row.fault(
                    column,
                    micron + " micron",
                    "a wavelength from " + SHORTEST_MICRON + " to " + LONGEST_MICRON + " micron",
                    "Check whether the unit is MICRON or ANGSTROM.");
        }
        return medium == Medium.AIR ? AirToVacuum.vacuumMicron(micron) : micron;
    }

    /** The window between two columns of a row. */
    static Window window(
            CatalogueRow row, String lowColumn, String highColumn, Unit unit, Medium medium)
            throws InvalidCatalogueException {
        double low = vacuumMicron(row, lowColumn, unit, medium);
        double high = vacuumMicron(row, highColumn, unit, medium);
        if (!(low < high)) {
            throw row.fault(
                    highColumn,
                    row.text(highColumn) + " after " + row.text(lowColumn),
                    lowColumn + " below " + highColumn,
                    "Exchange the two, or correct them.");
        }
        return new Window(low, high);
    }
}
