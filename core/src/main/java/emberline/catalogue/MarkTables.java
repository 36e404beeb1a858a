package emberline.catalogue;

import emberline.spectrum.Medium;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/** Reads what is marked on a spectrum: lines, telluric regions, molecular bands. */
final class MarkTables {

    private final CatalogueTables tables;
    private final KnownSources sources;

    MarkTables(CatalogueTables tables, KnownSources sources) {
        this.tables = tables;
        this.sources = sources;
    }

    /** The unit of a line. */
    private enum LineUnit {
        MICRON(Wavelengths.Unit.MICRON),
        ANGSTROM(Wavelengths.Unit.ANGSTROM);

        private final Wavelengths.Unit unit;

        LineUnit(Wavelengths.Unit unit) {
            this.unit = unit;
        }
    }

    List<RestLine> restLines() throws InvalidCatalogueException {
        List<RestLine> lines = new ArrayList<>();
        for (CatalogueRow row : CatalogueTable.read(tables, TableKind.LINES)) {
            Wavelengths.Unit unit = row.word("unit", LineUnit.class).unit;
            lines.add(
                    new RestLine(
                            row.text("species"),
                            Wavelengths.vacuumMicron(
                                    row, "wavelength", unit, row.word("medium", Medium.class)),
                            row.word("purpose", Purpose.class),
                            sources.of(row),
                            row.textOrBlank("place"),
                            row.howKnown(),
                            row.confidencePercent(),
                            row.textOrBlank("note")));
        }
        return lines;
    }

    List<TelluricRegion> telluricRegions() throws InvalidCatalogueException {
        List<TelluricRegion> regions = new ArrayList<>();
        for (CatalogueRow row : CatalogueTable.read(tables, TableKind.TELLURIC)) {
            regions.add(
                    new TelluricRegion(
                            row.text("cause"),
                            row.word("strength", TelluricRegion.Strength.class),
                            extent(row),
                            sources.of(row),
                            row.howKnown(),
                            row.confidencePercent(),
                            row.textOrBlank("note")));
        }
        return regions;
    }

    List<MolecularBand> molecularBands() throws InvalidCatalogueException {
        List<MolecularBand> bands = new ArrayList<>();
        for (CatalogueRow row : CatalogueTable.read(tables, TableKind.BANDS)) {
            String species = row.text("species");
            Window extent = extent(row);
            OptionalDouble head = row.optionalPositive("head_micron");
            double typeMin = row.number("type_min");
            double typeMax = row.number("type_max");
            Source source = sources.of(row);
            HowKnown howKnown = row.howKnown();
            int confidence = row.confidencePercent();
            bands.add(
                    row.made(
                            () ->
                                    new MolecularBand(
                                            species,
                                            extent,
                                            head,
                                            typeMin,
                                            typeMax,
                                            source,
                                            howKnown,
                                            confidence,
                                            row.textOrBlank("note"))));
        }
        return bands;
    }

    private static Window extent(CatalogueRow row) throws InvalidCatalogueException {
        return Wavelengths.window(
                row, "low_micron", "high_micron", Wavelengths.Unit.MICRON, Medium.VACUUM);
    }
}
