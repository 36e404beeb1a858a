package emberline.survey;

import emberline.measure.Measurements;
import emberline.measure.line.LineReport;
import emberline.prepare.PreparedSpectrum;
import emberline.prepare.Quality;

/**
 * One spectrum of an object after reading, preparing and measuring.
 *
 * @param path the path as listed or given
 * @param format what kind of file it is, in words
 * @param sha256 checksum of the file's bytes, hexadecimal
 * @param prepared the prepared spectrum
 * @param quality how good it is
 * @param measurements every feature of the catalogue
 * @param lines what its lines say: widths seen or limits, radial velocity
 */
public record SpectrumResult(
        String path,
        String format,
        String sha256,
        PreparedSpectrum prepared,
        Quality quality,
        Measurements measurements,
        LineReport lines) {

    /**
     * A result whose spectrum is graded now.
     *
     * @param path the path as listed or given
     * @param format what kind of file it is, in words
     * @param sha256 checksum of the file's bytes, hexadecimal
     * @param prepared the prepared spectrum
     * @param measurements every feature of the catalogue
     * @param lines what its lines say
     */
    public SpectrumResult(
            String path,
            String format,
            String sha256,
            PreparedSpectrum prepared,
            Measurements measurements,
            LineReport lines) {
        this(path, format, sha256, prepared, Quality.of(prepared), measurements, lines);
    }
}
