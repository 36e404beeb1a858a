package emberline.read;

import emberline.spectrum.Medium;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;

/**
 * Which column of a table plays which part: by UCD or utype first, then by name, then by unit.
 *
 * @param wavelength index of the wavelength column
 * @param scale whether it holds wavelengths or their logarithm
 * @param flux index of the flux column
 * @param noise index of the column with the noise of the flux
 * @param noiseKind what the noise column holds
 * @param mask index of the column that marks bad pixels
 * @param medium the medium, where the name of the wavelength column says it
 */
record ColumnRoles(
        int wavelength,
        WavelengthUnit.Scale scale,
        int flux,
        OptionalInt noise,
        NoiseKind noiseKind,
        OptionalInt mask,
        Optional<Medium> medium) {

    /** Names of columns as files write them; an earlier name wins over a later one. */
    private static final List<String> WAVELENGTH =
            words(
                    "wavelength wavelengths wave waves lambda lam wl wvl wavel wlen wavelen w"
                            + " wavelength_vac wavelength_vacuum wave_vac wave_vacuum vac_wave"
                            + " lambda_vac lam_vac vacuum_wavelength wavelength_air wave_air"
                            + " air_wave lambda_air lam_air air_wavelength awav wave_obs"
                            + " wavelength_obs spectral_axis spectral spectral_value");

    private static final List<String> LOG_WAVELENGTH =
            words(
                    "loglam loglambda log_lam log_lambda logwave log_wave logwavelength"
                            + " log_wavelength log10lam log10_lam log10lambda log10_lambda"
                            + " log10_wavelength log10wavelength logwl log_wl");

    private static final List<String> FLUX =
            words(
                    "flux fluxes flux_density fluxdensity f_lambda flambda flam flux_lambda f_lam"
                            + " flux_flam fnu f_nu flux_nu f flx spec spectrum flux_value flux_axis"
                            + " flux_reduced flux_cal flux_calibrated flux_norm norm_flux"
                            + " normalized_flux normalised_flux relative_flux intensity"
                            + " photon_flux fl counts");

    private static final List<String> SIGMA =
            words(
                    "sigma flux_sigma sigma_flux flux_err flux_error fluxerr fluxerror flux_errors"
                            + " err error errors e_flux eflux err_flux error_flux ferr flux_unc"
                            + " flux_uncertainty unc uncertainty uncertainties uncert fluxunc"
                            + " flux_stat_error stat_error staterror flux_err_reduced flux_std"
                            + " std stddev std_dev stdev noise sig dflux d_flux flux_accuracy"
                            + " e_flambda e_flam e_fnu flam_err fnu_err flambda_err e f_err sd"
                            + " one_sigma onesigma rms errs");

    private static final List<String> INVERSE_VARIANCE =
            words("ivar inverse_variance invvar inv_var flux_ivar ivar_flux flux_invvar");

    private static final List<String> VARIANCE =
            words("variance var flux_variance flux_var var_flux variance_flux");

    private static final List<String> MASK =
            words("mask masked flux_mask bad badpix bad_pixel badpixel bad_mask dq and_mask");

    /** What a noise column holds. */
    enum NoiseKind {
        SIGMA,
        VARIANCE,
        INVERSE_VARIANCE
    }

    /** Finds the parts among the columns; empty where no wavelength or no flux is found. */
    static Optional<ColumnRoles> find(List<ColumnLabel> labels) {
        Search search = new Search(labels);
        OptionalInt plain = search.wavelength();
        OptionalInt log = search.named(LOG_WAVELENGTH);
        boolean useLog = plain.isEmpty() && log.isPresent();
        OptionalInt wavelength = useLog ? log : plain;
        if (wavelength.isEmpty()) {
            wavelength = search.onlyLength();
        }
        if (wavelength.isEmpty()) {
            return Optional.empty();
        }
        int axis = wavelength.getAsInt();
        OptionalInt flux = search.flux(axis);
        if (flux.isEmpty()) {
            return Optional.empty();
        }
        WavelengthUnit.Scale scale =
                labels.get(axis)
                        .unit()
                        .flatMap(WavelengthUnit::parseWritten)
                        .map(WavelengthUnit.Written::scale)
                        .filter(written -> written != WavelengthUnit.Scale.LINEAR)
                        .orElse(useLog ? WavelengthUnit.Scale.LOG10 : WavelengthUnit.Scale.LINEAR);
        return Optional.of(search.complete(axis, scale, flux.getAsInt()));
    }

    /** The first three columns in the order wavelength, flux, sigma. */
    static ColumnRoles byPosition(int columns) {
        return new ColumnRoles(
                0,
                WavelengthUnit.Scale.LINEAR,
                1,
                columns > 2 ? OptionalInt.of(2) : OptionalInt.empty(),
                NoiseKind.SIGMA,
                OptionalInt.empty(),
                Optional.empty());
    }

    private static List<String> words(String text) {
        return List.of(text.split(" ", -1));
    }

    /** A search through the labels of one table. */
    private record Search(List<ColumnLabel> labels) {

        OptionalInt wavelength() {
            OptionalInt byMeaning = first(this::meansWavelength);
            return byMeaning.isPresent() ? byMeaning : named(WAVELENGTH);
        }

        private boolean meansWavelength(int column) {
            boolean byUcd = ucd(column).startsWith("em.wl") && !ucd(column).contains("stat");
            return byUcd || utype(column).endsWith("spectralaxis.value");
        }

        private boolean meansFlux(int column) {
            boolean byUcd = ucd(column).contains("phot.flu") && !ucd(column).contains("stat.err");
            return byUcd || utype(column).endsWith("fluxaxis.value");
        }

        private boolean meansNoise(int column) {
            boolean byUcd =
                    ucd(column).equals("stat.error")
                            || (ucd(column).contains("stat.err") && ucd(column).contains("phot"));
            return byUcd || utype(column).contains("fluxaxis.accuracy");
        }

        private boolean hasFluxUnit(int column) {
            return labels.get(column)
                    .unit()
                    .flatMap(FluxUnit::parse)
                    .filter(unit -> unit != FluxUnit.RELATIVE)
                    .isPresent();
        }

        OptionalInt onlyLength() {
            int[] found =
                    IntStream.range(0, labels.size())
                            .filter(
                                    i ->
                                            labels.get(i)
                                                    .unit()
                                                    .flatMap(WavelengthUnit::parseWritten)
                                                    .isPresent())
                            .toArray();
            return found.length == 1 ? OptionalInt.of(found[0]) : OptionalInt.empty();
        }

        OptionalInt flux(int axis) {
            OptionalInt byMeaning = first(this::meansFlux);
            if (byMeaning.isPresent()) {
                return byMeaning;
            }
            OptionalInt byName = named(FLUX);
            return byName.isPresent()
                    ? byName
                    : first(i -> i != axis && noiseName(i).isEmpty() && hasFluxUnit(i));
        }

        ColumnRoles complete(int axis, WavelengthUnit.Scale scale, int flux) {
            OptionalInt noise = first(i -> i != axis && i != flux && meansNoise(i));
            NoiseKind kind = NoiseKind.SIGMA;
            for (NoiseKind candidate : NoiseKind.values()) {
                if (noise.isEmpty()) {
                    noise = named(names(candidate));
                    kind = candidate;
                }
            }
            String name = labels.get(axis).name();
            Optional<Medium> medium = Optional.empty();
            if (name.contains("air") || name.equals("awav")) {
                medium = Optional.of(Medium.AIR);
            } else if (name.contains("vac")) {
                medium = Optional.of(Medium.VACUUM);
            }
            return new ColumnRoles(axis, scale, flux, noise, kind, named(MASK), medium);
        }

        private Optional<NoiseKind> noiseName(int column) {
            for (NoiseKind kind : NoiseKind.values()) {
                if (names(kind).contains(labels.get(column).name())) {
                    return Optional.of(kind);
                }
            }
            return Optional.empty();
        }

        private static List<String> names(NoiseKind kind) {
            return switch (kind) {
                case SIGMA -> SIGMA;
                case VARIANCE -> VARIANCE;
                case INVERSE_VARIANCE -> INVERSE_VARIANCE;
            };
        }

        OptionalInt named(List<String> names) {
            for (String name : names) {
                OptionalInt found = first(i -> labels.get(i).name().equals(name));
                if (found.isPresent()) {
                    return found;
                }
            }
            return OptionalInt.empty();
        }

        private OptionalInt first(IntPredicate test) {
            return IntStream.range(0, labels.size()).filter(test).findFirst();
        }

        private String ucd(int column) {
            return labels.get(column).ucd().toLowerCase(Locale.ROOT);
        }

        private String utype(int column) {
            return labels.get(column).utype().toLowerCase(Locale.ROOT);
        }
    }
}
