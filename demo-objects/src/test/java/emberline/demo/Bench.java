package emberline.demo;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.place.Placement;
import emberline.place.Placer;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import java.util.List;

/** The model, observed without noise, and the product that measures and places what comes out. */
final class Bench {

    private final FeatureCatalogue catalogue = FeatureCatalogue.standard();
    private final Measurer measurer = new Measurer(catalogue, Measuring.withDefaults());
    private final Placer placer = new Placer(catalogue);
    private final SkyModel model = new SkyModel();
    private final Observer observer = new Observer(model.grid());

    Measurements measureDwarf(double type, String gravity, String instrument) {
        return measure(SurveyObject.dwarf(type, gravity), instrument);
    }

    Measurements measureRecipe(String recipe, double type, String instrument) {
        return measure(SurveyObject.made(recipe, type, "FLD-G", 0, 0), instrument);
    }

    private Measurements measure(SurveyObject object, String instrument) {
        Instrument with = Instrument.named(instrument);
        double[] flux = model.flux(object);
        ObservedSpectrum ideal = observer.noiseless(flux, with);
        return measure(ideal.microns(), ideal.fluxes(), ideal.sigmas(), with.resolvingPower());
    }

    Measurements measure(double[] micron, double[] flux, double[] sigma, double resolvingPower) {
        return measurer.measure(
                new PreparedSpectrum(
                        Spectrum.of(micron, flux, sigma),
                        new ResolvingPower(resolvingPower, ResolvingPower.Basis.GIVEN),
                        NoiseModel.INDEPENDENT,
                        List.of()));
    }

    Placement placeDwarf(double type, String gravity, String instrument) {
        return placer.place(measureDwarf(type, gravity, instrument), 1);
    }

    double valueOfDwarf(double type, String gravity, String instrument, String feature) {
        return measureDwarf(type, gravity, instrument)
                .measured(feature)
                .map(Measured::value)
                .orElseThrow();
    }

    SkyModel model() {
        return model;
    }

    Observer observer() {
        return observer;
    }
}
