package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedList;
import emberline.SharedSpectra;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.place.TypeEstimate;
import emberline.place.TypePosterior;
import emberline.prepare.Degrader;
import emberline.prepare.Degrading;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.SpectrumReader;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

/**
 * Two noisy copies of each of many real spectra of known type, joined. The product's own
 * calibration has seen these objects, so the scores flatter; what is compared is one copy against
 * two.
 */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class SeveralSpectraTest {

    private static final double SIGNAL = 8;

    private final Calibration calibration = Calibration.standard();
    private final CalibratedWitness witness =
            new CalibratedWitness(calibration, TypePriors.FLAT.load());
    private final SeveralSpectra several = new SeveralSpectra(calibration, witness);
    private final Measurer measurer =
            new Measurer(FeatureCatalogue.standard(), Measuring.withDefaults());
    private final List<Trial> trials = new ArrayList<>();

    /** One object: its type, and what one copy, the joined copies and a better copy give. */
    private record Trial(
            double known,
            TypeEstimate one,
            TypeEstimate joined,
            TypeEstimate better,
            int findings) {}

    @BeforeAll
    void place() throws Exception {
        SharedSpectra.folder();
        for (Candidate candidate : SharedList.candidates()) {
            if (!candidate.text("known_kind").orElse("").equals("dwarf")
                    || !candidate.text("tier").orElse("").equals("A")
                    || candidate.number("known_type_number").orElse(-9) < 4
                    || candidate.number("known_type_number").orElse(40) > 29) {
                continue;
            }
            Measurements first = copy(candidate, SIGNAL, 1);
            Measurements second = copy(candidate, SIGNAL, 2);
            SeveralSpectra.Joined joined = several.join(List.of(first, second));
            Optional<TypeEstimate> one = type(first);
            Optional<TypeEstimate> both = type(joined.measurements());
            Optional<TypeEstimate> better = type(copy(candidate, SIGNAL * Math.sqrt(2), 3));
            if (one.isPresent() && both.isPresent() && better.isPresent()) {
                trials.add(
                        new Trial(
                                candidate.number("known_type_number").getAsDouble(),
                                one.get(),
                                both.get(),
                                better.get(),
                                joined.findings().size()));
            }
        }
    }

    private Optional<TypeEstimate> type(Measurements measurements) {
        return witness.witness(measurements).posterior().map(TypePosterior::estimate);
    }

    private Measurements copy(Candidate candidate, double signalToNoise, long seed)
            throws Exception {
        Preparing stated = Preparing.withDefaults();
        if (candidate.number("resolution").isPresent()) {
            stated = stated.withResolvingPower(candidate.number("resolution").getAsDouble());
        }
        Degrader.Degraded degraded =
                new Degrader()
                        .degrade(
                                new SpectrumReader()
                                        .read(
                                                SharedSpectra.folder()
                                                        .resolve(candidate.spectra().get(0))),
                                stated,
                                Degrading.none().toSignalToNoise(signalToNoise),
                                seed);
        return measurer.measure(new Preparer().prepare(degraded.observation(), degraded.stated()));
    }

    private interface Which {
        TypeEstimate of(Trial trial);
    }

    private double rms(Which which) {
        return Math.sqrt(
                trials.stream()
                        .mapToDouble(t -> Math.pow(which.of(t).typeNumber() - t.known, 2))
                        .average()
                        .orElseThrow());
    }

    private double sigma(Which which) {
        return trials.stream()
                .mapToDouble(t -> which.of(t).sigmaSubclass())
                .average()
                .orElseThrow();
    }

    private double inside(Which which, boolean is95) {
        return trials.stream()
                        .filter(
                                t ->
                                        (is95 ? which.of(t).lo95() : which.of(t).lo68()) <= t.known
                                                && t.known
                                                        <= (is95
                                                                ? which.of(t).hi95()
                                                                : which.of(t).hi68()))
                        .count()
                / (double) trials.size();
    }

    @Test
    void twoCopiesAreWorthOneOfLessNoise() {
        assertTrue(trials.size() > 100);
        // found: 0.56, 0.52 and 0.48 subclass; stated 0.61, 0.57 and 0.57
        assertTrue(rms(Trial::joined) < rms(Trial::one));
        assertEquals(sigma(Trial::better), sigma(Trial::joined), 0.06);
        assertTrue(sigma(Trial::joined) < sigma(Trial::one));
        assertTrue(inside(Trial::joined, true) > 0.9);
        assertTrue(inside(Trial::joined, false) > 0.6);
        // 3.3 sigma: hardly one in a hundred, though noise that is estimated has tails
        assertTrue(trials.stream().filter(t -> t.findings > 0).count() <= trials.size() / 50);
    }

    /** Copies without noise bring nothing new: the scatter of objects is not divided. */
    @Test
    void theScatterOfObjectsIsCountedOnce() throws Exception {
        Candidate candidate =
                SharedList.candidates().stream()
                        .filter(c -> c.name().equals("LHS 2924"))
                        .findFirst()
                        .orElseThrow();
        Measurements one = measurer.measure(SharedList.prepared(candidate));
        Measurements again = measurer.measure(SharedList.prepared(candidate));
        Measurements third = measurer.measure(SharedList.prepared(candidate));
        TypeEstimate alone = type(one).orElseThrow();
        TypeEstimate joined =
                type(several.join(List.of(one, again, third)).measurements()).orElseThrow();
        assertEquals(alone.typeNumber(), joined.typeNumber(), 0.05);
        assertTrue(joined.sigmaSubclass() > 0.93 * alone.sigmaSubclass());
    }

    @Test
    void spectraOfDifferentObjectsDisagree() throws Exception {
        Measurements late = measurer.measure(SharedList.prepared("LHS 2924"));
        Measurements later = measurer.measure(SharedList.prepared("2MASS J15065441+1321060"));
        SeveralSpectra.Joined joined = several.join(List.of(late, later));
        assertEquals(
                List.of("spectra-disagree"),
                joined.findings().stream().map(Finding::code).toList());
        assertEquals(2, joined.apart().size());
        assertTrue(joined.findings().get(0).text().startsWith("spectra 1 and 2"));
    }
}
