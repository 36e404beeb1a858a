package emberline.place.kind;

import emberline.measure.Measurer;
import emberline.prepare.ExtinctionLaw;
import emberline.prepare.PreparedSpectrum;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.simple.RandomSource;

/**
 * Copies of a reference spectrum made worse, so that what learns knows noisy, coarse and reddened
 * spectra, and the rare kinds as well as the frequent ones. Copies are made of the pixels and
 * measured like any spectrum.
 */
final class TrainingCopies {

    private static final double FINE = 250;
    private static final double L_END = 20;

    private final Measurer measurer;
    private final KindFeatures features;
    private final ExtinctionLaw law = ExtinctionLaw.fitzpatrick1999(ExtinctionLaw.DIFFUSE_RV);

    TrainingCopies(Measurer measurer, KindFeatures features) {
        this.measurer = measurer;
        this.features = features;
    }

    /** Copies of a spectrum; the same ones for the same name. */
    List<TrainingRow> of(
            String name,
            String group,
            ObjectKind kind,
            OptionalDouble typeNumber,
            PreparedSpectrum prepared) {
        UniformRandomProvider random =
                RandomSource.XO_RO_SHI_RO_128_PP.create(0x6b696e64L + name.hashCode());
        List<TrainingRow> rows = new ArrayList<>();
        boolean fine = prepared.resolvingPower().value() > FINE;
        for (int k = 0; k < plainCopies(kind); k++) {
            PreparedSpectrum copy = shifted(kind, prepared, random);
            copy = slightlyReddened(kind, typeNumber, copy, k, random);
            boolean coarse = fine && k % 2 == 0;
            if (coarse) {
                copy = Degraded.coarse(copy, 50 + 150 * random.nextDouble());
            }
            double signalToNoise = signalToNoise(random);
            copy = Degraded.noisy(copy, signalToNoise, random);
            String how =
                    String.format(
                            Locale.ROOT,
                            "%s to %.0f%s",
                            TrainingRow.NOISY,
                            signalToNoise,
                            coarse ? ", made coarse" : "");
            rows.add(row(group, kind, how, copy));
        }
        boolean star = kind == ObjectKind.GIANT || kind == ObjectKind.EARLY_STAR;
        for (int k = 0; star && k < (kind == ObjectKind.GIANT ? 2 : 6); k++) {
            double avMag = 3 + 12 * random.nextDouble();
            PreparedSpectrum copy = Degraded.reddened(prepared, avMag, law);
            if (fine && k % 2 == 0) {
                copy = Degraded.coarse(copy, 50 + 150 * random.nextDouble());
            }
            copy = Degraded.noisy(copy, signalToNoise(random), random);
            rows.add(row(group, ObjectKind.REDDENED_BACKGROUND, "reddened", copy));
        }
        return rows;
    }

    private TrainingRow row(String group, ObjectKind kind, String how, PreparedSpectrum copy) {
        return new TrainingRow(group, kind, how, features.of(measurer.measure(copy)));
    }

    private static double signalToNoise(UniformRandomProvider random) {
        return 5 * Math.pow(16, random.nextDouble());
    }

    private static int plainCopies(ObjectKind kind) {
        return switch (kind) {
            case LATE_DWARF -> 3;
            case GIANT -> 4;
            case EARLY_STAR -> 8;
            case REDDENED_BACKGROUND -> 16;
            case CARBON_STAR, EXTRAGALACTIC -> 40;
            case UNLIKE_KNOWN -> 0;
        };
    }

    private static PreparedSpectrum shifted(
            ObjectKind kind, PreparedSpectrum prepared, UniformRandomProvider random) {
        if (kind != ObjectKind.EXTRAGALACTIC) {
            return prepared;
        }
        double square = random.nextDouble();
        return Degraded.stretched(prepared, 1 + 3 * square * square);
    }

    /** Carbon stars often, dwarfs before the T type sometimes lie behind a little dust. */
    private PreparedSpectrum slightlyReddened(
            ObjectKind kind,
            OptionalDouble typeNumber,
            PreparedSpectrum prepared,
            int copy,
            UniformRandomProvider random) {
        double most =
                switch (kind) {
                    case CARBON_STAR -> 4;
                    case LATE_DWARF -> copy == 0 && typeNumber.orElse(L_END) < L_END ? 3 : 0;
                    case GIANT, EARLY_STAR -> 1;
                    default -> 0;
                };
        return most == 0 ? prepared : Degraded.reddened(prepared, most * random.nextDouble(), law);
    }
}
