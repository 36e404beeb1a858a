package emberline.catalogue;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Which windows and parts each form needs. */
final class FormRules {

    private static final int ANY_NUMBER = Integer.MAX_VALUE;
    private static final double EXPONENT_TOLERANCE = 1e-9;

    private FormRules() {}

    /**
     * What is wrong with the windows and parts of a form: one missing, one too many, one it does
     * not use, or exponents that do not sum to zero. The answer is a clause such as "lacks a window
     * LINE", or empty where all is right.
     */
    static Optional<String> complaint(Form form, List<FeatureWindow> windows, List<Part> parts) {
        List<Role> roles = new ArrayList<>();
        windows.forEach(window -> roles.add(window.role()));
        List<PartRole> partRoles = new ArrayList<>();
        parts.forEach(part -> partRoles.add(part.role()));
        return complaint("window", roles, windowSlots(form))
                .or(() -> complaint("part", partRoles, partSlots(form)))
                .or(() -> unbalanced(form, windows));
    }

    /** A role and how often it must and may occur. */
    private record Slot<R>(R role, int least, int most) {

        static <R> Slot<R> one(R role) {
            return new Slot<>(role, 1, 1);
        }

        static <R> Slot<R> perhaps(R role) {
            return new Slot<>(role, 0, 1);
        }

        static <R> Slot<R> many(R role) {
            return new Slot<>(role, 1, ANY_NUMBER);
        }
    }

    private static List<Slot<Role>> windowSlots(Form form) {
        return switch (form) {
            case RATIO_OF_MEANS, MAGNITUDE_OF_RATIO ->
                    List.of(Slot.one(Role.NUMERATOR), Slot.one(Role.DENOMINATOR));
            case RATIO_OF_WEIGHTED_SUMS ->
                    List.of(Slot.many(Role.NUMERATOR), Slot.many(Role.DENOMINATOR));
            case NORMALISED_DIFFERENCE -> List.of(Slot.one(Role.BAND_A), Slot.one(Role.BAND_B));
            case DOUBLE_RATIO ->
                    List.of(
                            Slot.one(Role.NUMERATOR_1),
                            Slot.one(Role.DENOMINATOR_1),
                            Slot.one(Role.NUMERATOR_2),
                            Slot.one(Role.DENOMINATOR_2));
            case PRODUCT_OF_POWERS -> List.of(new Slot<>(Role.FACTOR, 2, ANY_NUMBER));
            case INTERPOLATED_CONTINUUM_OVER_LINE, EQUIVALENT_WIDTH_LINEAR_CONTINUUM ->
                    List.of(
                            Slot.one(Role.LINE),
                            Slot.one(Role.CONTINUUM_1),
                            Slot.one(Role.CONTINUUM_2));
            case EQUIVALENT_WIDTH_MEAN_CONTINUUM ->
                    List.of(
                            Slot.one(Role.LINE),
                            Slot.one(Role.CONTINUUM_1),
                            Slot.perhaps(Role.CONTINUUM_2),
                            Slot.perhaps(Role.CONTINUUM_3),
                            Slot.perhaps(Role.CONTINUUM_4));
            case EQUIVALENT_WIDTH_FITTED_CONTINUUM ->
                    List.of(
                            Slot.one(Role.LINE),
                            Slot.one(Role.CONTINUUM_1),
                            Slot.one(Role.CONTINUUM_2),
                            Slot.perhaps(Role.CONTINUUM_3),
                            Slot.perhaps(Role.CONTINUUM_4));
            default -> List.of();
        };
    }

    private static List<Slot<PartRole>> partSlots(Form form) {
        return switch (form) {
            case SUM_OF_FEATURES -> List.of(new Slot<>(PartRole.TERM, 2, ANY_NUMBER));
            case LINEAR_COMBINATION_OF_FEATURES -> List.of(Slot.many(PartRole.TERM));
            case RATIO_OF_FEATURES ->
                    List.of(Slot.one(PartRole.DIVIDEND), Slot.one(PartRole.DIVISOR));
            case METALLICITY_SHORTFALL ->
                    List.of(Slot.one(PartRole.TIO5), Slot.one(PartRole.ARGUMENT));
            default -> List.of();
        };
    }

    private static <R> Optional<String> complaint(String what, List<R> given, List<Slot<R>> slots) {
        for (Slot<R> slot : slots) {
            long count = given.stream().filter(slot.role()::equals).count();
            if (count < slot.least()) {
                return Optional.of("lacks a " + what + " " + slot.role());
            }
            if (count > slot.most()) {
                return Optional.of("has " + count + " " + what + "s " + slot.role());
            }
        }
        return given.stream()
                .filter(role -> slots.stream().noneMatch(slot -> slot.role().equals(role)))
                .findFirst()
                .map(role -> "has a " + what + " " + role + " that it does not use");
    }

    private static Optional<String> unbalanced(Form form, List<FeatureWindow> windows) {
        double sum = windows.stream().mapToDouble(FeatureWindow::exponent).sum();
        return form != Form.PRODUCT_OF_POWERS || Math.abs(sum) < EXPONENT_TOLERANCE
                ? Optional.empty()
                : Optional.of("has exponents that sum to " + sum + " instead of 0");
    }
}
