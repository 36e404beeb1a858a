package emberline.survey;

import emberline.measure.Measurements;
import emberline.place.Placer;
import emberline.prepare.Degrader.Degraded;
import emberline.prepare.Dereddening;
import emberline.prepare.ExtinctionLaw;
import emberline.prepare.PreparedSpectrum;
import emberline.prepare.Preparing;
import emberline.read.UnreadableSpectrumException;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;

/**
 * What is measured on the spectra of an object once an extinction is taken out. They are prepared
 * once: extinction moves neither wavelengths nor what is known of the noise.
 */
final class ExtinctionTrials {

    private final MeasuringStep measuring;
    private final Placer placer;
    private final List<OneSpectrum> spectra = new ArrayList<>();

    private record OneSpectrum(PreparedSpectrum prepared, Dereddening extinction) {}

    private ExtinctionTrials(MeasuringStep measuring, Placer placer) {
        this.measuring = measuring;
        this.placer = placer;
    }

    /**
     * Prepares the trials.
     *
     * @param measuring what measures
     * @param placer what joins the spectra of an object
     * @param used the spectra, which were prepared before
     * @return the trials
     */
    static ExtinctionTrials of(MeasuringStep measuring, Placer placer, Collection<Degraded> used) {
        ExtinctionTrials trials = new ExtinctionTrials(measuring, placer);
        for (Degraded one : used) {
            trials.add(one);
        }
        return trials;
    }

    private void add(Degraded one) {
        double rv = ExtinctionLaw.DIFFUSE_RV;
        Preparing stated = one.stated().withExtinction(new Preparing.Extinction(0, rv));
        try {
            PreparedSpectrum prepared = measuring.prepared(one.observation(), stated);
            spectra.add(new OneSpectrum(prepared, new Dereddening(prepared.spectrum(), rv)));
        } catch (UnreadableSpectrumException e) {
            throw new IllegalStateException("prepared before, but not now", e);
        }
    }

    /**
     * The features of the object without an extinction.
     *
     * @param avMag what is taken out (mag in V)
     * @return the features of all its spectra
     */
    Measurements at(double avMag) {
        List<Measurements> all = new ArrayList<>();
        for (OneSpectrum one : spectra) {
            all.add(measuring.features(one.prepared.with(one.extinction.without(avMag))));
        }
        return placer.join(all).measurements();
    }
}
