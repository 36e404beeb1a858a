package emberline.survey;

import emberline.place.Placement;
import emberline.place.Placer;
import emberline.place.calibrated.SeveralSpectra;
import emberline.place.reddening.ReddeningCall;
import emberline.place.reddening.ReddeningFit;
import emberline.prepare.Degrader.Degraded;
import emberline.prepare.ExtinctionLaw;
import emberline.prepare.Preparing;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/** Places an object by all its spectra, with the extinction taken out where it is fitted. */
final class PlacingStep {

    private final MeasuringStep measuring;
    private final PlacerChoice placers;
    private final ReddeningMode reddeningMode;
    private final long seed;

    PlacingStep(
            MeasuringStep measuring, PlacerChoice placers, ReddeningMode reddeningMode, long seed) {
        this.measuring = measuring;
        this.placers = placers;
        this.reddeningMode = reddeningMode;
        this.seed = seed;
    }

    /** A placement with the spectra that it rests on and what is to be said of its extinction. */
    record Placed(
            List<SpectrumResult> spectra,
            SeveralSpectra.Joined joined,
            Placement placement,
            Optional<Finding> reddening) {}

    /** Places an object as it is seen, or with the extinction taken out that was fitted. */
    Placed place(Candidate candidate, List<SpectrumResult> spectra, Map<String, Degraded> used) {
        Placer placer = placers.placerFor(candidate);
        long draws = ObjectSeed.of(candidate.name(), seed);
        SeveralSpectra.Joined joined = joined(placer, spectra);
        Placement asSeen = placer.place(joined.measurements(), draws);
        Optional<String> call =
                switch (reddeningMode) {
                    case NEVER -> Optional.empty();
                    case CALLED_FOR -> ReddeningCall.reason(asSeen);
                    case ALWAYS -> Optional.of("");
                };
        boolean onCall = reddeningMode == ReddeningMode.CALLED_FOR;
        double leastGain = onCall ? ReddeningCall.LEAST_GAIN : Double.NEGATIVE_INFINITY;
        Optional<ReddeningFit> fit =
                call.flatMap(
                        reason ->
                                placer.fitReddening(
                                        ExtinctionTrials.of(measuring, placer, used.values())::at,
                                        leastGain));
        if (fit.isEmpty()) {
            Optional<Finding> finding =
                    onCall ? call.map(PlacingStep::notBelieved) : Optional.empty();
            return new Placed(spectra, joined, asSeen, finding);
        }
        List<SpectrumResult> freed = new ArrayList<>();
        used.forEach((path, one) -> freed.add(again(path, one, fit.get().avMag())));
        SeveralSpectra.Joined freedJoined = joined(placer, freed);
        Placement placement = placer.place(freedJoined.measurements(), fit, draws);
        if (onCall && !ReddeningCall.isBelieved(fit.get(), placement)) {
            return new Placed(spectra, joined, asSeen, call.map(PlacingStep::notBelieved));
        }
        Finding finding = fitted(call.orElseThrow(), fit.get());
        return new Placed(freed, freedJoined, placement, Optional.of(finding));
    }

    private static SeveralSpectra.Joined joined(Placer placer, List<SpectrumResult> spectra) {
        return placer.join(spectra.stream().map(SpectrumResult::measurements).toList());
    }

    /** Measures a spectrum that was measured before, with another extinction taken out. */
    private SpectrumResult again(String path, Degraded one, double avMag) {
        try {
            return measuring.measure(path, one.observation(), freed(one, avMag));
        } catch (UnreadableSpectrumException e) {
            throw new IllegalStateException(path + ": prepared before, but not now", e);
        }
    }

    private static Preparing freed(Degraded one, double avMag) {
        return one.stated()
                .withExtinction(new Preparing.Extinction(avMag, ExtinctionLaw.DIFFUSE_RV));
    }

    private static Finding fitted(String reason, ReddeningFit fit) {
        return Finding.note(
                "reddening-fitted",
                String.format(
                        Locale.ROOT,
                        "%sextinction in V fitted together with the type: %.1f mag (68%%: %.1f to"
                                + " %.1f); %.1f mag was taken out before measuring",
                        reason.isEmpty() ? "" : reason + ": ",
                        fit.avMag(),
                        fit.lo68Mag(),
                        fit.hi68Mag(),
                        fit.avMag()));
    }

    private static Finding notBelieved(String reason) {
        return Finding.note(
                "reddening-not-believed",
                reason
                        + ", so extinction was fitted; none makes a late dwarf of it surely enough, and"
                        + " nothing was taken out (--fit-reddening takes out the best)");
    }
}
