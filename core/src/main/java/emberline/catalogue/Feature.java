package emberline.catalogue;

import emberline.spectrum.Medium;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A measured quantity as its paper defines it: a band index or an equivalent width.
 *
 * @param id paper and symbol, in lower case, unique without regard to case, e.g. {@code
 *     reid1995/tio5}
 * @param symbol the name that the paper gives
 * @param kind band index or equivalent width
 * @param form how it is computed from windows or from other features
 * @param statistic how the pixels of a window become one number
 * @param species the absorber, e.g. {@code H2O}, or {@code CONTINUUM}
 * @param band the wavelength region
 * @param printedMedium the medium of the printed wavelengths; {@link #windows} are in vacuum anyway
 * @param mediumStated false where the paper is not known to state the medium and vacuum is assumed
 * @param minResolvingPower least resolving power of the spectra it was made for; empty: not known
 * @param maxResolvingPower greatest resolving power of the spectra it was made for; empty: not
 *     known
 * @param smoothToResolvingPower a spectrum finer than this is smoothed to it before the feature is
 *     measured; empty: never smoothed
 * @param source the paper
 * @param place table or section in the paper; blank where not known
 * @param howKnown how the definition reached this catalogue
 * @param confidencePercent how sure it is that the definition is exactly as printed, 0 to 100
 * @param sense how it answers to absorption
 * @param purpose what it is good for
 * @param note a remark; may be blank
 * @param windows its windows (micron, vacuum) in the order of the table; empty where it is made of
 *     features
 * @param parts the features it is made of; empty where it is made of windows
 */
public record Feature(
        String id,
        String symbol,
        Kind kind,
        Form form,
        Statistic statistic,
        String species,
        Band band,
        Medium printedMedium,
        boolean mediumStated,
        OptionalDouble minResolvingPower,
        OptionalDouble maxResolvingPower,
        OptionalDouble smoothToResolvingPower,
        Source source,
        String place,
        HowKnown howKnown,
        int confidencePercent,
        Sense sense,
        Purpose purpose,
        String note,
        List<FeatureWindow> windows,
        List<Part> parts) {

    /** Copies the lists and checks that windows and parts are those of the form. */
    public Feature {
        windows = List.copyOf(windows);
        parts = List.copyOf(parts);
        Optional<String> complaint = FormRules.complaint(form, windows, parts);
        if (complaint.isPresent()) {
            throw new IllegalArgumentException(
                    "feature " + id + " of form " + form + " " + complaint.get());
        }
    }

    /**
     * The windows of one role.
     *
     * @param role a role
     * @return windows in the order of the table; empty where there are none
     */
    public List<FeatureWindow> windows(Role role) {
        return windows.stream().filter(window -> window.role() == role).toList();
    }

    /**
     * The only window of a role.
     *
     * @param role a role that the form has once
     * @return the window
     * @throws IllegalArgumentException if there is none, or more than one
     */
    public Window window(Role role) {
        List<FeatureWindow> found = windows(role);
        if (found.size() != 1) {
            throw new IllegalArgumentException(
                    "feature " + id + " has " + found.size() + " windows " + role + ", not one");
        }
        return found.get(0).window();
    }

    /**
     * The parts of one role.
     *
     * @param role a role
     * @return parts in the order of the table; empty where there are none
     */
    public List<Part> parts(PartRole role) {
        return parts.stream().filter(part -> part.role() == role).toList();
    }

    /**
     * The interval from the lowest edge of its own windows to the highest.
     *
     * @return the span (micron, vacuum), or empty where the feature is made of features
     */
    public Optional<Window> span() {
        if (windows.isEmpty()) {
            return Optional.empty();
        }
        double low = Double.POSITIVE_INFINITY;
        double high = 0;
        for (FeatureWindow part : windows) {
            low = Math.min(low, part.window().lowMicron());
            high = Math.max(high, part.window().highMicron());
        }
        return Optional.of(new Window(low, high));
    }
}
