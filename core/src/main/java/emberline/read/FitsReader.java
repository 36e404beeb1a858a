package emberline.read;

import java.util.List;
import java.util.Optional;

/**
 * Reads a spectrum from a FITS file: from the first image or table of it, in the order of the file,
 * that holds one.
 */
final class FitsReader {

    private FitsReader() {}

    static RawSpectrum read(FileContent content) throws UnreadableSpectrumException {
        List<FitsUnit> units = FitsUnit.all(content);
        UnreadableSpectrumException first = null;
        for (FitsUnit unit : units) {
            try {
                Optional<RawSpectrum> spectrum = tryUnit(unit, units);
                if (spectrum.isPresent()) {
                    return spectrum.get();
                }
            } catch (UnreadableSpectrumException e) {
                first = first == null ? e : first;
            }
        }
        if (first != null) {
            throw first;
        }
        throw new UnreadableSpectrumException(
                content.name(),
                units.size() == 1 ? "one HDU without data" : units.size() + " HDUs without data",
                "an image or a table with a spectrum",
                "Check that the file was written completely.");
    }

    private static Optional<RawSpectrum> tryUnit(FitsUnit unit, List<FitsUnit> units)
            throws UnreadableSpectrumException {
        if (unit.isTable()) {
            return Optional.of(
                    TabularReader.read(unit.where(), FitsTableColumns.of(unit, units.get(0))));
        }
        return unit.isImage()
                ? Optional.of(new FitsImageReader(unit, units).read())
                : Optional.empty();
    }

    /** What a library says about a failure, in one short line. */
    static String reason(Exception e) {
        String message = e.getMessage() == null ? e.getClass().getSimpleName() : e.getMessage();
        String line = message.lines().findFirst().orElse("").trim();
        return line.length() > 120 ? line.substring(0, 120) + "..." : line;
    }
}
