package emberline.read;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.prepare.PreparedSpectrum;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import java.nio.file.Path;

/** Any bytes as a spectrum or a list: an answer or the declared exception, nothing else. */
public final class FuzzedReaders {

    private static final Measurer MEASURER =
            new Measurer(FeatureCatalogue.standard(), Measuring.withDefaults());

    private FuzzedReaders() {}

    /** Reads, prepares and measures a spectrum. */
    public static void spectrum(byte[] input) {
        try {
            Observation read = new SpectrumReader().read(input, "fuzzed");
            double before = 0;
            for (double micron : read.wavelengthsMicron()) {
                require(micron > before && Double.isFinite(micron), "wavelengths do not increase");
                before = micron;
            }
            require(read.fluxes().length == read.size(), "fluxes");
            PreparedSpectrum prepared = new Preparer().prepare(read, Preparing.withDefaults());
            Measurements measured = MEASURER.measure(prepared);
            require(measured.all().size() > 100, "features");
            measured.intervals68(1);
        } catch (UnreadableSpectrumException e) {
            requireMessage(e.getMessage());
        }
    }

    /** Reads a candidate list. */
    public static void list(byte[] input) {
        try {
            CandidateList list =
                    CandidateListReader.read(
                            FileContent.of(input.clone(), "fuzzed"), Path.of("fuzzed"));
            require(!list.rows().isEmpty(), "a list without rows");
            for (ListedCandidate row : list.rows()) {
                require(!row.candidate().name().isBlank(), "an object without name");
                row.problem().ifPresent(problem -> require(!problem.isBlank(), "no words"));
            }
            ColumnSpelling.doubts(list.columns());
        } catch (UnreadableSpectrumException | UnreadableListException e) {
            requireMessage(e.getMessage());
        }
    }

    private static void requireMessage(String message) {
        require(message.contains("; expected ") && message.endsWith("."), message);
        require(message.length() < 2000, "a message of " + message.length() + " characters");
    }

    private static void require(boolean holds, String what) {
        if (!holds) {
            throw new AssertionError(what);
        }
    }
}
