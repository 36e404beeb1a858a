package emberline.measure;

import emberline.spectrum.RecentlyUsed;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import java.util.function.Supplier;

/**
 * Keeps what was prepared for the wavelength grids that were seen last. Two spectra share a grid if
 * their wavelengths, their good pixels and their resolving power are the same to the bit.
 */
final class GridCache {

    private static final int CAPACITY = 16;

    private final RecentlyUsed<Key, Measurer.Plan> plans = new RecentlyUsed<>(CAPACITY);

    /** What was prepared for the grid of a spectrum; prepared now if it was not yet. */
    Measurer.Plan of(
            Spectrum spectrum, ResolvingPower resolvingPower, Supplier<Measurer.Plan> prepare) {
        Key key = Key.of(spectrum, resolvingPower);
        return plans.get(key).orElseGet(() -> plans.keep(key, prepare.get()));
    }

    /** Identity of a grid: wavelengths, good pixels, resolving power. */
    private static final class Key {

        private final double[] wavelengths;
        private final boolean[] good;
        private final ResolvingPower resolvingPower;
        private final int hash;

        private Key(double[] wavelengths, boolean[] good, ResolvingPower resolvingPower) {
            this.wavelengths = wavelengths;
            this.good = good;
            this.resolvingPower = resolvingPower;
            this.hash =
                    31 * (31 * Arrays.hashCode(wavelengths) + Arrays.hashCode(good))
                            + resolvingPower.hashCode();
        }

        static Key of(Spectrum spectrum, ResolvingPower resolvingPower) {
            boolean[] good = new boolean[spectrum.size()];
            for (int i = 0; i < good.length; i++) {
                good[i] = spectrum.isGood(i);
            }
            return new Key(spectrum.wavelengthsMicron(), good, resolvingPower);
        }

        @Override
        public boolean equals(Object other) {
            return other instanceof Key that
                    && hash == that.hash
                    && resolvingPower.equals(that.resolvingPower)
                    && Arrays.equals(wavelengths, that.wavelengths)
                    && Arrays.equals(good, that.good);
        }

        @Override
        public int hashCode() {
            return hash;
        }
    }
}
