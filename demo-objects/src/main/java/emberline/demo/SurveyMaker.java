package emberline.demo;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.zip.GZIPOutputStream;

/** Makes the invented survey: every file by its name relative to the folder of the survey. */
final class SurveyMaker {

    /** Folder of the spectra within the survey. */
    static final String SPECTRA = "spectra/";

    /** Flux of a star of magnitude 0 in 2MASS J (erg/s/cm2/A), Cohen et al. 2003, AJ 126, 1090. */
    private static final double J_ZERO_CGS = 3.129e-10;

    private static final double J_LOW_MICRON = 1.17;
    private static final double J_HIGH_MICRON = 1.33;

    private final SkyModel model = new SkyModel();
    private final Observer observer = new Observer(model.grid());

    /**
     * Makes all files.
     *
     * @return bytes by name, in the order of the survey
     * @throws IOException if a library that writes a format fails
     */
    Map<String, byte[]> files() throws IOException {
        List<SurveyObject> objects = SurveyObject.all();
        List<Exposure> exposures = Exposure.all();
        Map<String, byte[]> files = new LinkedHashMap<>();
        files.put("candidates.csv", SurveyTables.candidates(objects, exposures));
        files.put("truth.csv", SurveyTables.truth(objects, exposures));
        for (SurveyObject object : objects) {
            double[] flux = calibrated(object);
            for (Exposure exposure : exposures) {
                if (exposure.object().equals(object.name())) {
                    files.put(SPECTRA + exposure.file(), bytes(flux, exposure));
                }
            }
        }
        return files;
    }

    /**
     * Observes all objects, without writing the spectra down.
     *
     * @return what was observed by how, in the order of the survey
     */
    Map<Exposure, ObservedSpectrum> observed() {
        Map<Exposure, ObservedSpectrum> observed = new LinkedHashMap<>();
        List<Exposure> exposures = Exposure.all();
        for (SurveyObject object : SurveyObject.all()) {
            double[] flux = calibrated(object);
            for (Exposure exposure : exposures) {
                if (exposure.object().equals(object.name())) {
                    observed.put(exposure, observer.observe(flux, exposure));
                }
            }
        }
        return observed;
    }

    private byte[] bytes(double[] flux, Exposure exposure) throws IOException {
        ObservedSpectrum spectrum = observer.observe(flux, exposure);
        byte[] plain = exposure.format().file().bytes(spectrum, exposure);
        if (!exposure.file().endsWith(".gz")) {
            return plain;
        }
        ByteArrayOutputStream packed = new ByteArrayOutputStream();
        try (GZIPOutputStream gzip = new GZIPOutputStream(packed)) {
            gzip.write(plain);
        }
        return packed.toByteArray();
    }

    /** The flux of an object on the grid of the model (erg/s/cm2/A), scaled to its J magnitude. */
    private double[] calibrated(SurveyObject object) {
        double[] flux = model.flux(object);
        ModelGrid grid = model.grid();
        double sum = 0;
        double width = 0;
        for (int i = 0; i < grid.size(); i++) {
            if (grid.micron(i) >= J_LOW_MICRON && grid.micron(i) <= J_HIGH_MICRON) {
                sum += flux[i] * grid.micron(i);
                width += grid.micron(i);
            }
        }
        double magnitude = Photometry.of(object).trueMagnitude("j_mag");
        double scale = J_ZERO_CGS * StrictMath.pow(10, -0.4 * magnitude) / (sum / width);
        for (int i = 0; i < flux.length; i++) {
            flux[i] *= scale;
        }
        return flux;
    }
}
