package emberline.survey;

import emberline.place.Placer;
import emberline.spectrum.Candidate;
import java.util.function.Function;

/**
 * Which placer places an object. One that learnt from known objects must not be tested on an object
 * it learnt from: there each group of objects has a placer that has not seen it.
 */
@FunctionalInterface
public interface PlacerChoice {

    /**
     * The placer of an object; called from several threads.
     *
     * @param candidate the object
     * @return the placer that places it
     */
    Placer placerFor(Candidate candidate);

    /**
     * One placer for all objects.
     *
     * @param placer the placer
     * @return a choice that always takes it
     */
    static PlacerChoice always(Placer placer) {
        return candidate -> placer;
    }

    /**
     * A placer by {@link ObjectGroup group}, for scores that leave the tested object out.
     *
     * @param byGroup from the name of a group to the placer that has not learnt from it; called
     *     from several threads
     * @return a choice that asks for the group of each object
     */
    static PlacerChoice byGroup(Function<String, Placer> byGroup) {
        return candidate -> byGroup.apply(ObjectGroup.of(candidate));
    }
}
