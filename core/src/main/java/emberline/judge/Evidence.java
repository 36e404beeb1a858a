package emberline.judge;

import emberline.place.GravityClass;
import emberline.place.TypePosterior;
import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * All that an object is judged by.
 *
 * @param type joint probability of type and gravity class
 * @param gravityPrior probability of each class that went into {@code type} before the object was
 *     looked at; it is divided out, so that the age is not told twice. Empty where the gravity was
 *     not judged: the class is no evidence then
 * @param lithium what is known of Li I 6708
 * @param halpha what H alpha shows
 * @param photometry magnitudes by band
 * @param astrometry position and motion
 * @param age what is stated about the age; empty where nothing is
 * @param pMetalPoor probability that it is metal-poor, from the spectrum; empty where not judged
 * @param pBlendCriteria probability that its spectrum meets enough criteria of a blend of two
 *     dwarfs; empty where not judged
 */
public record Evidence(
        TypePosterior type,
        Map<GravityClass, Double> gravityPrior,
        LithiumTest lithium,
        Halpha halpha,
        Map<MagnitudeBand, Magnitude> photometry,
        Astrometry astrometry,
        Optional<AgeStatement> age,
        OptionalDouble pMetalPoor,
        OptionalDouble pBlendCriteria) {

    /** Copies the maps and checks the prior. */
    public Evidence {
        gravityPrior = gravityPrior.isEmpty() ? Map.of() : Map.copyOf(new EnumMap<>(gravityPrior));
        for (GravityClass gravity : GravityClass.values()) {
            if (!gravityPrior.isEmpty() && !(gravityPrior.getOrDefault(gravity, 0.0) > 0)) {
                throw new IllegalArgumentException(
                        "prior of " + gravity.label() + ": expected a positive probability");
            }
        }
        photometry = Map.copyOf(photometry);
    }

    /**
     * A type and nothing else.
     *
     * @param type joint probability of type and gravity class
     * @param gravityPrior as above
     * @return the evidence
     */
    public static Evidence of(TypePosterior type, Map<GravityClass, Double> gravityPrior) {
        return new Evidence(
                type,
                gravityPrior,
                LithiumTest.unknown(),
                Halpha.UNKNOWN,
                Map.of(),
                Astrometry.none(),
                Optional.empty(),
                OptionalDouble.empty(),
                OptionalDouble.empty());
    }

    /**
     * A type with normal errors.
     *
     * @param typeNumber type (M0 = 0)
     * @param sigmaSubclass one-sigma error (subclass), positive
     * @param gravity the gravity class, taken as sure; empty where it was not judged
     * @return the evidence
     */
    public static Evidence ofType(
            double typeNumber, double sigmaSubclass, Optional<GravityClass> gravity) {
        double third = 1.0 / GravityOrder.COUNT;
        Map<GravityClass, Double> share = new EnumMap<>(GravityClass.class);
        Map<GravityClass, Double> flat = new EnumMap<>(GravityClass.class);
        for (GravityClass one : GravityClass.values()) {
            flat.put(one, third);
            share.put(one, gravity.map(g -> g == one ? 1.0 : 0.0).orElse(third));
        }
        return of(
                NormalType.posterior(typeNumber, sigmaSubclass, share),
                gravity.isPresent() ? flat : Map.of());
    }

    /**
     * The same with a test for lithium.
     *
     * @param test what is known of Li I 6708
     * @return new evidence
     */
    public Evidence withLithium(LithiumTest test) {
        return new Evidence(
                type,
                gravityPrior,
                test,
                halpha,
                photometry,
                astrometry,
                age,
                pMetalPoor,
                pBlendCriteria);
    }

    /**
     * The same with magnitudes.
     *
     * @param magnitudes by band
     * @return new evidence
     */
    public Evidence withPhotometry(Map<MagnitudeBand, Magnitude> magnitudes) {
        return new Evidence(
                type,
                gravityPrior,
                lithium,
                halpha,
                magnitudes,
                astrometry,
                age,
                pMetalPoor,
                pBlendCriteria);
    }

    /**
     * The same with position and motion.
     *
     * @param known position and motion
     * @return new evidence
     */
    public Evidence withAstrometry(Astrometry known) {
        return new Evidence(
                type,
                gravityPrior,
                lithium,
                halpha,
                photometry,
                known,
                age,
                pMetalPoor,
                pBlendCriteria);
    }

    /**
     * The same with a stated age.
     *
     * @param stated the age
     * @return new evidence
     */
    public Evidence withAge(AgeStatement stated) {
        return new Evidence(
                type,
                gravityPrior,
                lithium,
                halpha,
                photometry,
                astrometry,
                Optional.of(stated),
                pMetalPoor,
                pBlendCriteria);
    }

    /**
     * The same with the probability of a metal-poor object.
     *
     * @param probability 0 to 1
     * @return new evidence
     */
    public Evidence withMetalPoor(double probability) {
        return new Evidence(
                type,
                gravityPrior,
                lithium,
                halpha,
                photometry,
                astrometry,
                age,
                OptionalDouble.of(probability),
                pBlendCriteria);
    }

    /**
     * The same with the probability that the criteria of a blend are met.
     *
     * @param probability 0 to 1
     * @return new evidence
     */
    public Evidence withBlendCriteria(double probability) {
        return new Evidence(
                type,
                gravityPrior,
                lithium,
                halpha,
                photometry,
                astrometry,
                age,
                pMetalPoor,
                OptionalDouble.of(probability));
    }
}
