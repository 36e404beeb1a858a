package emberline.demo;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.zip.GZIPOutputStream;

/** Makes the invented survey: every file by its name relative to the folder of the survey. */
final class SurveyMaker {

    /** Folder of the spectra within the survey. */
    static final String SPECTRA = "spectra/";

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
        for (String list : SurveyObject.lists()) {
            files.put(
                    list + ".csv",
                    SurveyTables.candidates(
                            objects.stream().filter(o -> o.list().equals(list)).toList(),
                            exposures));
        }
        files.put("truth.csv", SurveyTables.truth(objects, exposures));
        for (Map.Entry<Exposure, ObservedSpectrum> seen : observed().entrySet()) {
            Exposure exposure = seen.getKey();
            Optional<byte[]> bytes = exposure.fault().spoil(sound(seen.getValue(), exposure));
            if (bytes.isPresent()) {
                files.put(
                        SPECTRA + exposure.file(),
                        exposure.file().endsWith(".gz") ? packed(bytes.get()) : bytes.get());
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

    private static byte[] sound(ObservedSpectrum spectrum, Exposure exposure) throws IOException {
        return exposure.format().file().bytes(spectrum, exposure);
    }

    private static byte[] packed(byte[] plain) throws IOException {
        ByteArrayOutputStream packed = new ByteArrayOutputStream();
        try (GZIPOutputStream gzip = new GZIPOutputStream(packed)) {
            gzip.write(plain);
        }
        return packed.toByteArray();
    }

    /** The flux of an object on the grid of the model (erg/s/cm2/A), scaled to its J magnitude. */
    private double[] calibrated(SurveyObject object) {
        double magnitude = Photometry.of(object).trueMagnitude("j_mag");
        double[] atRest = JBand.scaled(model.flux(object), model.grid(), magnitude);
        return DopplerShift.of(atRest, object.radialVelocityKms().orElse(0));
    }
}
