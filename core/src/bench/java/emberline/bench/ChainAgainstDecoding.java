package emberline.bench;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
import emberline.survey.Chain;
import emberline.survey.StageTimes.Stage;
import emberline.survey.SurveySettings;
import java.io.ByteArrayInputStream;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import nom.tam.fits.BasicHDU;
import nom.tam.fits.Fits;

/**
 * What the whole chain costs beside the bare decoding of the same FITS files by the FITS library:
 * processor time of one thread, the files in the cache of the system. Called with a list whose
 * spectra are FITS files; prints the lowest of several rounds.
 */
public final class ChainAgainstDecoding {

    private static final int ROUNDS = 5;

    private ChainAgainstDecoding() {}

    /**
     * Measures.
     *
     * @param arguments the list
     * @throws Exception if a file cannot be read
     */
    public static void main(String[] arguments) throws Exception {
        Path list = Path.of(arguments[0]);
        Path folder = list.toAbsolutePath().getParent();
        List<ListedCandidate> rows = new CandidateListReader().read(list).rows();
        Chain chain =
                new Chain(
                        FeatureCatalogue.standard(),
                        Measuring.withDefaults(),
                        SurveySettings.withDefaults());
        double decoding = Double.POSITIVE_INFINITY;
        double whole = Double.POSITIVE_INFINITY;
        for (int round = 0; round < ROUNDS; round++) {
            long start = cpu();
            long numbers = 0;
            for (ListedCandidate row : rows) {
                numbers += decoded(folder.resolve(row.candidate().spectra().get(0)));
            }
            decoding = Math.min(decoding, micros(cpu() - start) / rows.size());
            start = cpu();
            for (ListedCandidate row : rows) {
                numbers += chain.run(row.candidate(), folder).findings().size();
            }
            whole = Math.min(whole, micros(cpu() - start) / rows.size());
            System.out.printf(
                    Locale.ROOT,
                    "decoding %.0f us, chain %.0f us an object, ratio %.1f (%d)%n",
                    decoding,
                    whole,
                    whole / decoding,
                    numbers);
        }
        for (Stage stage : Stage.values()) {
            System.out.printf(
                    Locale.ROOT,
                    "%s: %.0f us an object, first round included%n",
                    stage,
                    chain.times().seconds(stage) * 1e6 / rows.size() / ROUNDS);
        }
    }

    private static long decoded(Path file) throws Exception {
        long numbers = 0;
        try (Fits fits = new Fits(new ByteArrayInputStream(Files.readAllBytes(file)))) {
            for (BasicHDU<?> hdu = fits.readHDU(); hdu != null; hdu = fits.readHDU()) {
                Object data = hdu.getKernel();
                numbers += data == null ? 0 : 1;
            }
        }
        return numbers;
    }

    private static long cpu() {
        return ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime();
    }

    private static double micros(long nanos) {
        return nanos * 1e-3;
    }
}
