package emberline.demo;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * The spectra of the invented survey over and over: each time moved by another radial velocity and
 * sampled by the same pixels, with as much noise again as there was.
 */
final class RepeatedObjects {

    private static final double SPEED_OF_LIGHT_KMS = 299_792.458;
    private static final double VELOCITY_SIGMA_KMS = 50;

    private final List<ObservedSpectrum> spectra = new ArrayList<>();
    private final List<Double> resolvingPowers = new ArrayList<>();

    RepeatedObjects() {
        for (Map.Entry<Exposure, ObservedSpectrum> one : new SurveyMaker().observed().entrySet()) {
            spectra.add(one.getValue());
            resolvingPowers.add(one.getKey().instrument().resolvingPower());
        }
    }

    /** The number of pixels of an object. */
    int pixels(int number) {
        return spectra.get(number % spectra.size()).size();
    }

    double resolvingPower(int number) {
        return resolvingPowers.get(number % spectra.size());
    }

    /** The spectrum of an object (micron, erg/s/cm2/A); depends on its number alone. */
    ObservedSpectrum spectrum(int number) {
        ObservedSpectrum base = spectra.get(number % spectra.size());
        UniformRandomProvider random =
                RandomSource.XO_RO_SHI_RO_128_PP.create(Seeds.of("large/" + number));
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        double stretch = 1 + normal.sample() * VELOCITY_SIGMA_KMS / SPEED_OF_LIGHT_KMS;
        double[] flux = new double[base.size()];
        double[] sigma = new double[base.size()];
        int below = 0;
        for (int i = 0; i < flux.length; i++) {
            double micron = base.micron(i) / stretch;
            while (below < flux.length - 2 && base.micron(below + 1) <= micron) {
                below++;
            }
            double step = base.micron(below + 1) - base.micron(below);
            double share = Math.max(0, Math.min(1, (micron - base.micron(below)) / step));
            double moved = base.flux(below) + share * (base.flux(below + 1) - base.flux(below));
            flux[i] = moved + base.sigma(i) * normal.sample();
            sigma[i] = base.sigma(i) * Math.sqrt(2);
        }
        return new ObservedSpectrum(base.microns(), flux, sigma);
    }
}
