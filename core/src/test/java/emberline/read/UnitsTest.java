package emberline.read;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class UnitsTest {

    @ParameterizedTest
    @ValueSource(
            strings = {
                "erg/s/cm2/A",
                "erg/s/cm2/Angstrom",
                "erg/cm^2/s/A",
                "erg s-1 cm-2 A-1",
                "erg s^-1 cm^-2 Angstrom^-1",
                "erg.s**-1.cm**-2.angstrom**-1",
                "ergss-1cm-2A-1",
                "ergs s-1 cm-2 A-1",
                "10**-17 erg/s/cm**2/Ang",
                "1E-17 erg/cm^2/s/Ang",
                "1.0E-17 erg/cm/s/Ang",
                "10^(-16) erg/(s cm2 Angstrom)",
                "erg / (Angstrom s cm2)",
                "Wm-2um-1",
                "W/m2/um",
                "W m^{-2} \u00b5m^{-1}",
                "W m\u207b\u00b2 \u03bcm\u207b\u00b9",
                "W/m^2/micron",
                "W/m2/nm",
                "erg/cm2 s A",
                "erg s-1 cm-2 um-1 sr-1",
                "F_lambda",
                "mW m-2 nm-1"
            })
    void fluxPerWavelengthIsKnown(String text) {
        assertEquals(Optional.of(FluxUnit.F_LAMBDA), FluxUnit.parse(text));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "Jy",
                "mJy",
                "uJy",
                "\u00b5Jy",
                "1e-3 Jy",
                "erg/s/cm2/Hz",
                "erg s-1 cm-2 Hz-1",
                "W/m2/Hz",
                "W m-2 Hz-1",
                "W/(m2 Hz)",
                "10**-23 erg/s/cm**2/Hz",
                "F_nu"
            })
    void fluxPerFrequencyIsKnown(String text) {
        assertEquals(Optional.of(FluxUnit.F_NU), FluxUnit.parse(text));
    }

    @ParameterizedTest
    @CsvSource({
        "W/m2, LAMBDA_F_LAMBDA",
        "erg/s/cm2, LAMBDA_F_LAMBDA",
        "photons/s/cm2/A, PHOTONS",
        "ph s-1 m-2 um-1, PHOTONS",
        "DN / s, RELATIVE",
        "counts, RELATIVE",
        "ADU, RELATIVE",
        "electron/s, RELATIVE",
        "normalized, RELATIVE",
        "DU/PIXEL, RELATIVE",
    })
    void otherFluxesAreKnown(String text, FluxUnit unit) {
        assertEquals(Optional.of(unit), FluxUnit.parse(text));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "mag",
                "ABmag",
                "K",
                "erg/s",
                "m/s",
                "W/m3/Hz",
                "erg/(s cm2",
                "cm-1",
                "Jy/A"
            })
    void whatIsNoFluxIsUnknown(String text) {
        assertEquals(Optional.empty(), FluxUnit.parse(text));
    }

    @ParameterizedTest
    @CsvSource({
        "Angstrom, ANGSTROM",
        "ANGSTROMS, ANGSTROM",
        "A, ANGSTROM",
        "Ang, ANGSTROM",
        "\u00c5, ANGSTROM",
        "0.1nm, ANGSTROM",
        "nm, NANOMETRE",
        "nanometers, NANOMETRE",
        "um, MICRON",
        "Microns, MICRON",
        "mum, MICRON",
        "\u00b5m, MICRON",
        "\\mu m, MICRON",
        "[um], MICRON",
        "m, METRE",
        "meters, METRE",
    })
    void wavelengthUnitsAreKnown(String text, WavelengthUnit unit) {
        assertEquals(Optional.of(unit), WavelengthUnit.parse(text));
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "Hz", "km", "pixel", "furlong", "cm-1"})
    void otherUnitsAreUnknown(String text) {
        assertEquals(Optional.empty(), WavelengthUnit.parse(text));
    }

    @Test
    void logarithmsAreTold() {
        assertEquals(
                Optional.of(
                        new WavelengthUnit.Written(
                                Optional.of(WavelengthUnit.ANGSTROM), WavelengthUnit.Scale.LOG10)),
                WavelengthUnit.parseWritten("log10(Angstrom)"));
        assertEquals(
                Optional.of(
                        new WavelengthUnit.Written(
                                Optional.of(WavelengthUnit.MICRON), WavelengthUnit.Scale.LN)),
                WavelengthUnit.parseWritten("ln um"));
        assertEquals(Optional.empty(), WavelengthUnit.parseWritten("log(parsec)"));
    }

    @ParameterizedTest
    @CsvSource({
        "6500e-10, METRE",
        "0.65, MICRON",
        "20, MICRON",
        "650, NANOMETRE",
        "2200, NANOMETRE",
        "6500, ANGSTROM",
        "22000, ANGSTROM",
    })
    void unitIsToldByTheSizeOfWavelengths(double middle, WavelengthUnit unit) {
        assertEquals(unit, WavelengthUnit.plausible(middle));
    }

    /** F_nu = 1 Jy everywhere is F_lambda falling as lambda^-2. */
    @Test
    void factorsFollowTheDefinitions() {
        assertEquals(0.25, FluxUnit.F_NU.toPerWavelength(2));
        assertEquals(0.5, FluxUnit.LAMBDA_F_LAMBDA.toPerWavelength(2));
        assertEquals(0.5, FluxUnit.PHOTONS.toPerWavelength(2));
        assertEquals(1, FluxUnit.RELATIVE.toPerWavelength(2));
    }
}
