package emberline.survey;

import emberline.measure.Measurements;
import emberline.measure.line.LineReport;
import emberline.prepare.PreparedSpectrum;

/**
 * One spectrum of an object after reading, preparing and measuring.
 *
 * @param path the path as listed or given
 * @param format what kind of file it is, in words
 * @param sha256 checksum of the file's bytes, hexadecimal
 * @param prepared the prepared spectrum
 * @param measurements every feature of the catalogue
 * @param lines what its lines say: widths seen or limits, radial velocity
 */
public record SpectrumResult(
        String path,
        String format,
        String sha256,
        PreparedSpectrum prepared,
        Measurements measurements,
        LineReport lines) {}
