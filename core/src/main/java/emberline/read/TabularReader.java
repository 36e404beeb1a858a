package emberline.read;

import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import emberline.spectrum.ResolvingPower;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.IntFunction;
import java.util.stream.Collectors;

/** Makes a spectrum of labelled columns, wherever they come from. */
final class TabularReader {

    private TabularReader() {}

    /** Columns of a table that are read one by one, when they are wanted. */
    interface Columns {
        /** What is known of each column. */
        List<ColumnLabel> labels();

        /** The numbers of a column, NaN where there is none. */
        double[] values(int column) throws UnreadableSpectrumException;

        /** The format in words. */
        String format();

        /** Names a row by its index from 0. */
        IntFunction<String> place();

        /** What the file says beside the table. */
        Keywords keywords();
    }

    /** Whether wavelength and flux can be told among the columns. */
    static boolean holdsSpectrum(List<ColumnLabel> labels) {
        return ColumnRoles.find(labels).isPresent();
    }

    /** Reads the spectrum; refuses a table without wavelength or flux. */
    static RawSpectrum read(String where, Columns columns) throws UnreadableSpectrumException {
        List<ColumnLabel> labels = columns.labels();
        Optional<ColumnRoles> found = ColumnRoles.find(labels);
        if (found.isEmpty()) {
            throw noSpectrum(where, labels);
        }
        return read(columns, found.get(), new ArrayList<>());
    }

    /** Reads the spectrum from columns whose parts are known. */
    static RawSpectrum read(Columns columns, ColumnRoles roles, List<Finding> findings)
            throws UnreadableSpectrumException {
        RawSpectrum.Samples samples =
                new RawSpectrum.Samples(
                        columns.values(roles.wavelength()),
                        columns.values(roles.flux()),
                        optional(columns, roles.noise()),
                        optional(columns, roles.mask()));
        Optional<Medium> medium = roles.medium().or(() -> columns.keywords().medium());
        Optional<ResolvingPower> power = columns.keywords().resolvingPower(findings);
        return new RawSpectrum(
                columns.format(),
                samples,
                units(columns.labels(), roles),
                medium,
                power,
                findings,
                columns.place());
    }

    static UnreadableSpectrumException noSpectrum(String where, List<ColumnLabel> labels) {
        String names = labels.stream().map(ColumnLabel::name).collect(Collectors.joining(", "));
        return new UnreadableSpectrumException(
                where,
                "a table with the columns " + names,
                "a column of wavelengths and one of fluxes",
                "Name them wavelength and flux (and sigma for the noise).");
    }

    private static RawSpectrum.Units units(List<ColumnLabel> labels, ColumnRoles roles) {
        ColumnLabel flux = labels.get(roles.flux());
        Optional<String> fluxUnit = flux.unit();
        if (fluxUnit.isEmpty() && flux.name().matches("f(lux)?_?nu")) {
            fluxUnit = Optional.of("F_nu");
        } else if (fluxUnit.isEmpty() && flux.name().matches("f(lux)?_?(f?lam|lambda)")) {
            fluxUnit = Optional.of("F_lambda");
        }
        return new RawSpectrum.Units(
                roles.scale(),
                labels.get(roles.wavelength()).unit(),
                fluxUnit,
                roles.noiseKind(),
                roles.noise().isPresent()
                        ? labels.get(roles.noise().getAsInt()).unit()
                        : Optional.empty());
    }

    private static Optional<double[]> optional(Columns columns, OptionalInt column)
            throws UnreadableSpectrumException {
        return column.isPresent()
                ? Optional.of(columns.values(column.getAsInt()))
                : Optional.empty();
    }
}
