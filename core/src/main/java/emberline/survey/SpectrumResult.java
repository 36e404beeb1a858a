package emberline.survey;

import emberline.measure.Measurements;
import emberline.measure.line.LineReport;
import emberline.place.TypeEstimate;
import emberline.prepare.PreparedSpectrum;
import emberline.prepare.Quality;
import java.util.Optional;

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
 * @param typeAlone the type by this spectrum alone; empty where it is the only one of the object,
 *     or too little was measured on it
 */
public record SpectrumResult(
        String path,
        String format,
        String sha256,
        PreparedSpectrum prepared,
        Quality quality,
        Measurements measurements,
        LineReport lines,
        Optional<TypeEstimate> typeAlone) {

    /**
     * An only spectrum, which is graded now.
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
        this(
                path,
                format,
                sha256,
                prepared,
                Quality.of(prepared),
                measurements,
                lines,
                Optional.empty());
    }

    /**
     * This spectrum as one of several.
     *
     * @param alone the type by it alone
     * @return the same with that type
     */
    SpectrumResult withTypeAlone(Optional<TypeEstimate> alone) {
        return new SpectrumResult(
                path, format, sha256, prepared, quality, measurements, lines, alone);
    }
}
