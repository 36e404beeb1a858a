package emberline.read;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.spectrum.Candidate;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/**
 * Real spectra as their authors wrote them, against copies of the same spectra that were made with
 * independent software. The copies lack pixels without flux, and their numbers were rounded to
 * seven and six digits, which is what the tolerances allow for.
 */
class RealSpectraTest {

    private static final double WAVELENGTH_TOLERANCE = 1e-5;
    private static final double FLUX_TOLERANCE = 1e-3;

    private static final Path SPECTRA =
            Path.of(System.getProperty("emberline.root", "."), "..", "shared", "spectra")
                    .normalize();

    @BeforeAll
    static void spectraMustBeThere() {
        Assumptions.assumeTrue(
                Files.isRegularFile(SPECTRA.resolve("list-originals.csv")),
                "the real spectra are not beside this checkout (" + SPECTRA + ")");
    }

    @Test
    void everyListedOriginalAgreesWithItsCopy() throws IOException {
        Map<String, Map<String, String>> manifest = manifest();
        CandidateList list = new CandidateListReader().read(SPECTRA.resolve("list-originals.csv"));
        assertEquals(429, list.rows().size());
        List<String> complaints = new ArrayList<>();
        SpectrumReader reader = new SpectrumReader();
        int compared = 0;
        for (ListedCandidate row : list.rows()) {
            assertTrue(row.problem().isEmpty(), () -> row.problem().orElse(""));
            String original = row.candidate().spectra().get(0);
            try {
                Observation ours = reader.read(SPECTRA.resolve(original));
                compareSummary(ours, manifest.get(original), complaints);
                String copy = manifest.get(original).get("file");
                if (!copy.isEmpty()) {
                    compare(ours, SPECTRA.resolve(copy), complaints);
                    compared++;
                }
            } catch (UnreadableSpectrumException e) {
                complaints.add(e.getMessage());
            }
        }
        assertEquals(List.of(), complaints);
        assertTrue(compared >= 260, compared + " copies were compared");
    }

    /** The row of each original in the manifest beside the spectra. */
    private static Map<String, Map<String, String>> manifest() throws IOException {
        Map<String, Map<String, String>> rows = new HashMap<>();
        try (TableRows table = ListTableReader.open(SPECTRA.resolve("manifest.csv"))) {
            int original = table.columns().indexOf("original_file");
            for (var next = table.next(); next.isPresent(); next = table.next()) {
                List<String> cells = next.get();
                Map<String, String> row = new HashMap<>();
                for (int i = 0; i < cells.size(); i++) {
                    row.put(table.columns().get(i), cells.get(i));
                }
                rows.put(cells.get(original), row);
            }
        }
        return rows;
    }

    /** Range of wavelengths and presence of noise as the manifest gives them. */
    private static void compareSummary(
            Observation ours, Map<String, String> manifest, List<String> complaints) {
        double[] waves = ours.wavelengthsMicron();
        double[] fluxes = ours.fluxes();
        double first = Double.NaN;
        double last = Double.NaN;
        for (int i = 0; i < waves.length; i++) {
            if (Double.isFinite(fluxes[i]) && fluxes[i] != 0) {
                first = Double.isNaN(first) ? waves[i] : first;
                last = waves[i];
            }
        }
        double theirFirst = Double.parseDouble(manifest.get("wave_min_um"));
        double theirLast = Double.parseDouble(manifest.get("wave_max_um"));
        // Printed to four decimals; pixels at the ends may have been dropped in the copy.
        if (!(Math.abs(first - theirFirst) <= 2e-4) || !(Math.abs(last - theirLast) <= 2e-4)) {
            complaints.add(ours.source() + ": " + first + " to " + last + " micron");
        }
        // The copies dropped the noise of a file where most of it is missing.
        boolean noise = manifest.get("has_sigma").equals("True");
        double[] sigmas = ours.fluxSigmas().orElse(new double[0]);
        long known = Arrays.stream(sigmas).filter(Double::isFinite).count();
        if (noise != known > ours.size() / 2) {
            complaints.add(ours.source() + ": noise in one of the two only");
        }
    }

    /** Every pixel of the copy must be one of ours, with the same flux up to one factor. */
    private static void compare(Observation ours, Path copy, List<String> complaints)
            throws IOException {
        double[][] theirs = numbers(copy);
        double[] waves = ours.wavelengthsMicron();
        double[] fluxes = ours.fluxes();
        int[] match = new int[theirs[0].length];
        double[] ratios = new double[match.length];
        for (int i = 0; i < match.length; i++) {
            match[i] = nearest(waves, theirs[0][i]);
            double off = Math.abs(waves[match[i]] / theirs[0][i] - 1);
            if (!(off <= WAVELENGTH_TOLERANCE)) {
                complaints.add(ours.source() + ": no pixel at " + theirs[0][i] + " micron");
                return;
            }
            ratios[i] = fluxes[match[i]] / theirs[1][i];
        }
        double factor = median(ratios);
        double scale = median(Arrays.stream(theirs[1]).map(Math::abs).toArray());
        int differing = 0;
        for (int i = 0; i < match.length; i++) {
            double difference = Math.abs(fluxes[match[i]] / factor - theirs[1][i]);
            // Where the copy keeps two pixels at one wavelength, we keep one of them.
            boolean tie =
                    (i > 0 && match[i] == match[i - 1])
                            || (i + 1 < match.length && match[i] == match[i + 1]);
            boolean same = difference <= FLUX_TOLERANCE * Math.max(scale, Math.abs(theirs[1][i]));
            if (!same && !tie) {
                differing++;
            }
        }
        if (differing > 0) {
            complaints.add(ours.source() + ": " + differing + " fluxes differ");
        }
        compareNoise(ours, theirs, match, factor, complaints);
        long good = Arrays.stream(fluxes).filter(Double::isFinite).count();
        if (good < match.length - 10 || good > match.length * 1.02 + 10) {
            complaints.add(
                    ours.source() + ": " + good + " good pixels, the copy has " + match.length);
        }
    }

    /** Where both know the noise it must be the same, on the scale of the flux. */
    private static void compareNoise(
            Observation ours,
            double[][] theirs,
            int[] match,
            double factor,
            List<String> complaints) {
        double[] sigmas = ours.fluxSigmas().orElse(new double[ours.size()]);
        int compared = 0;
        int differing = 0;
        for (int i = 0; i < match.length; i++) {
            double sigma = sigmas[match[i]] / factor;
            boolean unique =
                    (i == 0 || match[i] != match[i - 1])
                            && (i + 1 == match.length || match[i] != match[i + 1]);
            if (sigma > 0 && theirs[2][i] > 0 && unique) {
                compared++;
                differing += Math.abs(sigma / theirs[2][i] - 1) <= FLUX_TOLERANCE ? 0 : 1;
            }
        }
        if (differing > 0) {
            complaints.add(ours.source() + ": " + differing + " of " + compared + " sigmas differ");
        }
    }

    /** Reads the copy without any of the code under test. */
    private static double[][] numbers(Path copy) throws IOException {
        List<String> lines = Files.readAllLines(copy);
        double[][] columns = new double[3][lines.size() - 1];
        for (int i = 1; i < lines.size(); i++) {
            String[] cells = lines.get(i).split(",", -1);
            columns[0][i - 1] = Double.parseDouble(cells[0]);
            columns[1][i - 1] = Double.parseDouble(cells[1]);
            columns[2][i - 1] = cells[2].isEmpty() ? Double.NaN : Double.parseDouble(cells[2]);
        }
        return columns;
    }

    private static int nearest(double[] waves, double wave) {
        int found = Arrays.binarySearch(waves, wave);
        if (found >= 0) {
            return found;
        }
        int above = Math.min(waves.length - 1, -found - 1);
        int below = Math.max(0, above - 1);
        return waves[above] - wave < wave - waves[below] ? above : below;
    }

    private static double median(double[] values) {
        double[] finite = Arrays.stream(values).filter(Double::isFinite).sorted().toArray();
        return finite[finite.length / 2];
    }

    /** Everything else that lies there; what is refused is named with its reason. */
    @Test
    void otherOriginalsAreReadOrRefusedForAKnownReason() throws IOException {
        Map<String, String> refused = new HashMap<>();
        int read = 0;
        try (Stream<Path> files = Files.walk(SPECTRA.resolve("originals"))) {
            for (Path file : files.filter(Files::isRegularFile).sorted().toList()) {
                try {
                    new SpectrumReader().read(file);
                    read++;
                } catch (UnreadableSpectrumException e) {
                    refused.put(file.getFileName().toString(), e.getMessage());
                }
            }
        }
        assertTrue(refused.remove("spEigenStar-53724.fits").contains("several spectra"));
        assertTrue(refused.remove("spEigenStar-55734.fits").contains("several spectra"));
        assertTrue(refused.remove("M82_template_norm.sed").contains("stands twice"));
        assertTrue(refused.remove("Sey2_template_norm.sed").contains("stands twice"));
        assertEquals(Map.of(), refused);
        assertEquals(540, read);
    }

    @Test
    void everyListedSpectrumIsRead() throws IOException {
        List<String> complaints = new ArrayList<>();
        CandidateList list = new CandidateListReader().read(SPECTRA.resolve("list.csv"));
        assertEquals(608, list.rows().size());
        for (ListedCandidate row : list.rows()) {
            Candidate candidate = row.candidate();
            try {
                new SpectrumReader().read(SPECTRA.resolve(candidate.spectra().get(0)));
            } catch (UnreadableSpectrumException e) {
                complaints.add(e.getMessage());
            }
        }
        assertEquals(List.of(), complaints);
    }
}
