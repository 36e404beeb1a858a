package emberline.judge;

import emberline.judge.PropertyRelations.Quantity;
import emberline.place.GravityClass;
import emberline.spectrum.MagnitudeBand;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;

/** Finds physical properties by type, each mixed over types and sequences with their scatter. */
final class PropertyFinder {

    private static final double ENOUGH = 0.5;

    private final PropertyRelations relations;

    PropertyFinder(PropertyRelations relations) {
        this.relations = relations;
    }

    private static final class Moments {
        private double weight;
        private double first;
        private double second;

        void add(double share, double mean, double rms) {
            weight += share;
            first += share * mean;
            second += share * (mean * mean + rms * rms);
        }

        Optional<Estimate> estimate() {
            if (!(weight > ENOUGH)) {
                return Optional.empty();
            }
            double mean = first / weight;
            return Optional.of(
                    Estimate.normal(mean, Math.sqrt(Math.max(0, second / weight - mean * mean))));
        }
    }

    /** A quantity by type on the field and young sequences, mixed by the part of the young one. */
    Optional<Estimate> byType(Quantity quantity, TypeMix mix, double young) {
        Moments moments = new Moments();
        for (int n = 0; n < TypeAxis.SIZE; n++) {
            double p = mix.type(n);
            double type = TypeAxis.type(n);
            if (p > 0) {
                add(moments, relations.at(quantity, Sequence.FIELD, type), type, p * (1 - young));
                add(moments, relations.at(quantity, Sequence.YOUNG, type), type, p * young);
            }
        }
        return moments.estimate();
    }

    private static void add(
            Moments moments, Optional<TypeRelation> relation, double type, double share) {
        if (share > 0) {
            relation.ifPresent(r -> moments.add(share, r.at(type), r.rms(type)));
        }
    }

    /** Bolometric corrections by band. */
    Map<MagnitudeBand, Estimate> bolometricCorrections(TypeMix mix, double young) {
        Map<MagnitudeBand, Estimate> found = new EnumMap<>(MagnitudeBand.class);
        for (MagnitudeBand band : MagnitudeBand.values()) {
            Moments moments = new Moments();
            for (int n = 0; n < TypeAxis.SIZE; n++) {
                double p = mix.type(n);
                double type = TypeAxis.type(n);
                if (p > 0) {
                    add(
                            moments,
                            relations.at(Quantity.BC, band, Sequence.FIELD, type),
                            type,
                            p * (1 - young));
                    add(
                            moments,
                            relations.at(Quantity.BC, band, Sequence.YOUNG, type),
                            type,
                            p * young);
                }
            }
            moments.estimate().ifPresent(estimate -> found.put(band, estimate));
        }
        return found;
    }

    /** Absolute magnitudes by band, each gravity class on its own sequence. */
    Map<MagnitudeBand, Estimate> absoluteMagnitudes(TypeMix mix) {
        Map<MagnitudeBand, Estimate> found = new EnumMap<>(MagnitudeBand.class);
        for (MagnitudeBand band : MagnitudeBand.values()) {
            Moments moments = new Moments();
            for (int n = 0; n < TypeAxis.SIZE; n++) {
                double type = TypeAxis.type(n);
                for (GravityClass gravity : GravityClass.values()) {
                    double p = mix.type(n) > 0 ? mix.type(n, gravity) : 0;
                    if (p > 0) {
                        add(
                                moments,
                                relations.at(
                                        Quantity.ABS_MAG,
                                        band,
                                        DistanceFinder.sequence(gravity),
                                        type),
                                type,
                                p);
                    }
                }
            }
            moments.estimate().ifPresent(estimate -> found.put(band, estimate));
        }
        return found;
    }

    /** A measured luminosity, mixed over the sequences. */
    static Estimate measured(LuminosityFinder.Measured measured, double young) {
        Moments moments = new Moments();
        moments.add(1 - young, measured.field().value(), measured.field().sigmaDex());
        moments.add(young, measured.young().value(), measured.young().sigmaDex());
        return moments.estimate().orElseThrow();
    }
}
