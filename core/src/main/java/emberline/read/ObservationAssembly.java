package emberline.read;

import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Makes an observation of a spectrum as it stands in a file: converts wavelengths to micron, flux
 * to flux per unit wavelength and noise to one sigma, marks bad pixels and puts the pixels in
 * order.
 */
final class ObservationAssembly {

    /** Median wavelengths outside this range are no spectrum of a star (micron). */
    private static final double SHORTEST_MICRON = 0.01;

    private static final double LONGEST_MICRON = 1000;

    /** So many exact zeros in a row are a gap that was filled, not a measurement. */
    private static final int ZEROS_OF_A_GAP = 3;

    private final FileContent content;
    private final RawSpectrum raw;
    private final List<Finding> findings;

    private ObservationAssembly(FileContent content, RawSpectrum raw) {
        this.content = content;
        this.raw = raw;
        this.findings = new ArrayList<>(raw.findings());
    }

    static Observation assemble(FileContent content, RawSpectrum raw)
            throws UnreadableSpectrumException {
        return new ObservationAssembly(content, raw).observation();
    }

    private Observation observation() throws UnreadableSpectrumException {
        double[] micron = wavelengthsMicron();
        double[] flux = raw.samples().fluxes().clone();
        Optional<double[]> sigma = sigmas();
        markBad(flux, sigma);
        int[] order = new PixelOrder(content.name(), micron, flux, raw.place(), findings).rising();
        toPerWavelength(micron, flux, sigma);
        double[] orderedMicron = pick(micron, order);
        double[] orderedFlux = pick(flux, order);
        Optional<double[]> orderedSigma = sigma.map(s -> pick(s, order));
        refuseEmpty(orderedFlux);
        return Observation.of(
                new Observation.Origin(
                        content.name(), content.formatWords(raw.format()), content.sha256()),
                orderedMicron,
                orderedFlux,
                orderedSigma,
                new Observation.Stated(raw.medium(), raw.resolvingPower()),
                findings);
    }

    private double[] wavelengthsMicron() throws UnreadableSpectrumException {
        double[] written = raw.samples().wavelengths();
        double[] waves = new double[written.length];
        WavelengthUnit.Scale scale = raw.units().scale();
        for (int i = 0; i < waves.length; i++) {
            waves[i] = scale.wavelength(written[i]);
        }
        double middle = median(waves);
        WavelengthUnit unit = wavelengthUnit(middle, waves);
        double factor = unit.inMicron();
        if (Double.isFinite(middle)
                && !(middle * factor >= SHORTEST_MICRON && middle * factor <= LONGEST_MICRON)) {
            throw new UnreadableSpectrumException(
                    content.name(),
                    "wavelengths around " + (float) middle + " in " + unit.words(),
                    "an ultraviolet, optical or infrared spectrum",
                    "Check the wavelength column and its unit.");
        }
        if (unit != WavelengthUnit.MICRON) {
            for (int i = 0; i < waves.length; i++) {
                waves[i] *= factor;
            }
        }
        return waves;
    }

    private WavelengthUnit wavelengthUnit(double middle, double[] waves)
            throws UnreadableSpectrumException {
        Optional<String> text = raw.units().wavelength();
        if (text.isPresent()) {
            Optional<WavelengthUnit.Written> written = WavelengthUnit.parseWritten(text.get());
            if (written.isEmpty()) {
                throw new UnreadableSpectrumException(
                        content.name(),
                        "unknown wavelength unit '" + text.get() + "'",
                        WavelengthUnit.KNOWN,
                        "Correct the unit in the file, or convert the wavelengths.");
            }
            if (written.get().unit().isPresent()) {
                return written.get().unit().get();
            }
        }
        WavelengthUnit assumed = WavelengthUnit.plausible(middle);
        if (Double.isFinite(middle)) {
            findings.add(
                    Finding.caution(
                            "wavelength-unit-assumed",
                            "The file states no wavelength unit; values from "
                                    + (float)
                                            Arrays.stream(waves).filter(w -> w > 0).min().orElse(0)
                                    + " to "
                                    + (float)
                                            Arrays.stream(waves).filter(w -> w > 0).max().orElse(0)
                                    + " were taken as "
                                    + assumed.words()
                                    + "."));
        }
        return assumed;
    }

    private static double median(double[] values) {
        double[] finite = Arrays.stream(values).filter(v -> v > 0 && v < 1e300).toArray();
        Arrays.sort(finite);
        return finite.length == 0 ? Double.NaN : finite[finite.length / 2];
    }

    private Optional<double[]> sigmas() throws UnreadableSpectrumException {
        if (raw.samples().noise().isEmpty() || !sameUnitAsFlux()) {
            return Optional.empty();
        }
        double[] noise = raw.samples().noise().get();
        double[] sigma = new double[noise.length];
        int unknown = 0;
        for (int i = 0; i < sigma.length; i++) {
            double s =
                    switch (raw.units().noiseKind()) {
                        case SIGMA -> noise[i];
                        case VARIANCE -> Math.sqrt(noise[i]);
                        case INVERSE_VARIANCE -> 1 / Math.sqrt(noise[i]);
                    };
            boolean known = s > 0 && s < Double.POSITIVE_INFINITY;
            sigma[i] = known ? s : Double.NaN;
            unknown += known ? 0 : 1;
        }
        if (unknown == sigma.length) {
            findings.add(
                    Finding.note(
                            "sigma-empty",
                            "The file has a place for the noise but no positive value in it."));
            return Optional.empty();
        }
        return Optional.of(sigma);
    }

    /** Whether the noise can stand beside the flux; a sigma in another unit cannot. */
    private boolean sameUnitAsFlux() throws UnreadableSpectrumException {
        Optional<String> noise = raw.units().noise();
        Optional<String> flux = raw.units().flux();
        boolean comparable =
                raw.units().noiseKind() == ColumnRoles.NoiseKind.SIGMA
                        && noise.isPresent()
                        && flux.isPresent();
        if (!comparable || squeezed(noise.get()).equals(squeezed(flux.get()))) {
            return true;
        }
        Optional<FluxUnit> noiseUnit = FluxUnit.parse(noise.get());
        boolean sameKind = noiseUnit.isPresent() && noiseUnit.equals(FluxUnit.parse(flux.get()));
        if (sameKind && digits(noise.get()).equals(digits(flux.get()))) {
            return true;
        }
        findings.add(
                Finding.warning(
                        "sigma-unit-differs",
                        "The noise is in '"
                                + noise.get()
                                + "' but the flux in '"
                                + flux.get()
                                + "'; the noise was not used."));
        return false;
    }

    private static String squeezed(String unit) {
        return unit.replaceAll("\\s", "").toLowerCase(Locale.ROOT);
    }

    private static String digits(String unit) {
        return unit.replaceAll("[^0-9]", "");
    }

    private void markBad(double[] flux, Optional<double[]> sigma) {
        Optional<double[]> noise = raw.samples().noise();
        Optional<double[]> mask = raw.samples().mask();
        boolean inverse = raw.units().noiseKind() == ColumnRoles.NoiseKind.INVERSE_VARIANCE;
        int masked = 0;
        int zeroWeight = 0;
        for (int i = 0; i < flux.length; i++) {
            boolean hidden = mask.isPresent() && mask.get()[i] != 0;
            boolean weightless = inverse && noise.isPresent() && !(noise.get()[i] > 0);
            boolean unmeasured = flux[i] == 0 && noise.isPresent() && noise.get()[i] == 0;
            masked += hidden ? 1 : 0;
            zeroWeight += weightless ? 1 : 0;
            if (hidden || weightless || unmeasured || Double.isInfinite(flux[i])) {
                flux[i] = Double.NaN;
            }
        }
        int zeros = markZeroGaps(flux);
        for (int i = 0; i < flux.length; i++) {
            if (sigma.isPresent() && Double.isNaN(flux[i])) {
                sigma.get()[i] = Double.NaN;
            }
        }
        if (mask.isPresent()) {
            findings.add(masking(masked, flux.length));
        }
        if (zeroWeight > 0) {
            note("zero-weight-pixels", zeroWeight + " pixels of inverse variance 0 count as bad.");
        }
        if (zeros > 0) {
            note(
                    "zero-flux-gaps",
                    zeros + " pixels of exactly zero flux in a row with others count as bad.");
        }
    }

    private static Finding masking(int masked, int size) {
        String text =
                "A mask column was applied (0 = good): "
                        + masked
                        + " of "
                        + size
                        + " pixels count as bad.";
        return masked * 2 > size
                ? Finding.warning("mask-applied", text)
                : Finding.note("mask-applied", text);
    }

    private static int markZeroGaps(double[] flux) {
        int marked = 0;
        int run = 0;
        for (int i = 0; i <= flux.length; i++) {
            if (i < flux.length && flux[i] == 0) {
                run++;
            } else {
                if (run >= ZEROS_OF_A_GAP) {
                    Arrays.fill(flux, i - run, i, Double.NaN);
                    marked += run;
                }
                run = 0;
            }
        }
        return marked;
    }

    private void toPerWavelength(double[] micron, double[] flux, Optional<double[]> sigma)
            throws UnreadableSpectrumException {
        FluxUnit unit = fluxUnit();
        if (unit == FluxUnit.F_LAMBDA || unit == FluxUnit.RELATIVE) {
            return;
        }
        for (int i = 0; i < flux.length; i++) {
            double factor = unit.toPerWavelength(micron[i]);
            flux[i] *= factor;
            if (sigma.isPresent()) {
                sigma.get()[i] *= factor;
            }
        }
    }

    private FluxUnit fluxUnit() throws UnreadableSpectrumException {
        Optional<String> text = raw.units().flux();
        if (text.isEmpty()) {
            findings.add(
                    Finding.caution(
                            "flux-unit-assumed",
                            "The file states no flux unit; the flux was taken as flux per unit"
                                    + " wavelength."));
            return FluxUnit.F_LAMBDA;
        }
        Optional<FluxUnit> unit = FluxUnit.parse(text.get());
        if (unit.isEmpty()) {
            throw new UnreadableSpectrumException(
                    content.name(),
                    "unknown flux unit '" + text.get() + "'",
                    FluxUnit.KNOWN,
                    "Correct the unit in the file, or convert the flux.");
        }
        String stated = "Flux in '" + text.get() + "' ";
        switch (unit.get()) {
            case F_NU -> note("flux-from-f-nu", stated + "was converted to flux per wavelength.");
            case LAMBDA_F_LAMBDA ->
                    note("flux-from-lambda-f-lambda", stated + "was divided by wavelength.");
            case PHOTONS -> note("flux-from-photons", stated + "was divided by wavelength.");
            case RELATIVE ->
                    findings.add(
                            Finding.caution(
                                    "flux-unit-relative",
                                    stated + "was taken as relative flux per unit wavelength."));
            default -> {
                return unit.get();
            }
        }
        return unit.get();
    }

    private void refuseEmpty(double[] flux) throws UnreadableSpectrumException {
        int nan = 0;
        int zero = 0;
        for (double f : flux) {
            nan += Double.isNaN(f) ? 1 : 0;
            zero += f == 0 ? 1 : 0;
        }
        if (nan + zero == flux.length) {
            throw new UnreadableSpectrumException(
                    content.name(),
                    "none of the " + flux.length + " pixels has a flux (all NaN, zero or masked)",
                    "a spectrum with measured fluxes",
                    "Check that the flux column is the right one and that the reduction worked.");
        }
    }

    private void note(String code, String text) {
        findings.add(Finding.note(code, text));
    }

    private static double[] pick(double[] values, int[] order) {
        double[] picked = new double[order.length];
        for (int i = 0; i < order.length; i++) {
            picked[i] = values[order[i]];
        }
        return picked;
    }
}
