package emberline.measure.line;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurement.NotMeasured;
import emberline.measure.Measurement.Why;
import emberline.measure.Site;
import emberline.prepare.PreparedSpectrum;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Finds the radial velocity of a spectrum from the centres of its atomic lines: a first velocity
 * from all lines together, then a Gaussian fit of each line near it, then their mean. At least
 * {@value #LEAST_LINES} lines must be seen at {@value #SEEN} sigma, at a resolving power of at
 * least {@value #LEAST_RESOLVING_POWER}.
 */
final class VelocityFinder {

    private static final double LEAST_RESOLVING_POWER = 1000;
    private static final int LEAST_LINES = 3;
    private static final double SEEN = 5;

    /**
     * Error of the wavelength scale in resolution elements, common to all lines. Found on 17 dwarfs
     * of the IRTF spectral library (R 2000; Rayner et al. 2009, shifted to rest by their authors):
     * their velocities scatter by a twentieth of an element.
     */
    private static final double SCALE_ERROR = 0.05;

    /** A line further from the first velocity than this (resolution elements) is another one. */
    private static final double NEAR = 0.75;

    /** Narrower than this (in units of an unresolved line) is a bad pixel. */
    private static final double NARROWEST = 0.5;

    /** Wider than this is a band, not a line. */
    private static final double WIDEST = 3;

    private final FeatureCatalogue catalogue;
    private final Site site;

    VelocityFinder(FeatureCatalogue catalogue, Site site) {
        this.catalogue = catalogue;
        this.site = site;
    }

    RadialVelocity find(PreparedSpectrum prepared) {
        double resolvingPower = prepared.resolvingPower().value();
        double scale = SCALE_ERROR * FittingLine.elementKms(resolvingPower);
        if (resolvingPower < LEAST_RESOLVING_POWER) {
            return new RadialVelocity(
                    new NotMeasured(
                            Why.TOO_COARSE,
                            String.format(
                                    Locale.ROOT,
                                    "resolving power %.0f; a velocity needs %.0f or more",
                                    resolvingPower,
                                    LEAST_RESOLVING_POWER)),
                    scale,
                    List.of(),
                    List.of());
        }
        LineChoice choice = new LineChoice(catalogue, site, prepared.spectrum(), resolvingPower);
        List<LineSetAside> setAside = new ArrayList<>(choice.setAside());
        if (choice.fitting().size() < LEAST_LINES) {
            return new RadialVelocity(
                    tooFew(Why.NOT_COVERED, choice.fitting().size(), "in reach and unblended"),
                    scale,
                    List.of(),
                    setAside);
        }
        double start = StartVelocity.find(prepared.spectrum(), choice.fitting());
        List<LineVelocity> seen = new ArrayList<>();
        for (FittingLine line : choice.fitting()) {
            fit(prepared, line, start, seen, setAside);
        }
        if (seen.size() < LEAST_LINES) {
            return new RadialVelocity(
                    tooFew(
                            Why.TOO_NOISY,
                            seen.size(),
                            String.format(
                                    Locale.ROOT, "seen at %.0f sigma near one velocity", SEEN)),
                    scale,
                    seen,
                    setAside);
        }
        VelocityMean mean = new VelocityMean(seen);
        setAside.addAll(mean.rejected());
        if (mean.used().size() < LEAST_LINES) {
            return new RadialVelocity(
                    tooFew(Why.OUTSIDE_VALID_RANGE, mean.used().size(), "in agreement"),
                    scale,
                    mean.used(),
                    setAside);
        }
        return new RadialVelocity(mean.mean(), scale, mean.used(), setAside);
    }

    private static NotMeasured tooFew(Why why, int count, String what) {
        return new NotMeasured(
                why,
                String.format(Locale.ROOT, "%d lines %s; %d are needed", count, what, LEAST_LINES));
    }

    private static void fit(
            PreparedSpectrum prepared,
            FittingLine line,
            double startKms,
            List<LineVelocity> seen,
            List<LineSetAside> setAside) {
        Optional<LineSegment> segment = LineSegment.of(prepared.spectrum(), line, startKms);
        if (segment.isEmpty()) {
            setAside.add(line.setAside("too few good pixels around it"));
            return;
        }
        Optional<LineFit> fit = LineFit.of(segment.get(), line, startKms, prepared.noise());
        Optional<String> fault =
                fit.isEmpty()
                        ? Optional.of("the fit did not converge")
                        : fault(fit.get(), line, startKms);
        if (fault.isPresent()) {
            setAside.add(line.setAside(fault.get()));
            return;
        }
        seen.add(
                new LineVelocity(
                        line.species(),
                        line.restMicron(),
                        fit.get().kms(),
                        fit.get().sigmaKms(),
                        Math.abs(fit.get().signal())));
    }

    /** Why a fit is not that of the line at the first velocity; empty where it is. */
    private static Optional<String> fault(LineFit fit, FittingLine line, double startKms) {
        double signal = line.emits() ? -fit.signal() : fit.signal();
        if (!(signal >= SEEN)) {
            return Optional.of(
                    String.format(
                            Locale.ROOT, "seen at %.1f sigma; %.0f are needed", signal, SEEN));
        }
        if (!(fit.width() >= NARROWEST && fit.width() <= WIDEST)) {
            return Optional.of(
                    String.format(
                            Locale.ROOT,
                            "%.1f times as wide as an unresolved line; expected %.1f to %.0f",
                            fit.width(),
                            NARROWEST,
                            WIDEST));
        }
        if (!(Math.abs(fit.kms() - startKms) <= NEAR * line.elementKms())) {
            return Optional.of(
                    String.format(
                            Locale.ROOT,
                            "its fit at %.0f km/s is not near the %.0f km/s of all lines together",
                            fit.kms(),
                            startKms));
        }
        return Optional.empty();
    }
}
