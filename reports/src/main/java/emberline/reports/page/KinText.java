package emberline.reports.page;

import emberline.place.kind.Kin;
import emberline.place.kind.ObjectKind;
import emberline.reports.attach.Digits;
import emberline.spectrum.SpectralType;

/** A reference object in words. */
final class KinText {

    private KinText() {}

    /** Type and gravity as published; the kind where it has no type. */
    static String what(Kin kin) {
        String gravity = kin.gravity().isBlank() ? "" : " " + kin.gravity();
        if (kin.typeNumber().isEmpty()) {
            return kin.kind().label() + gravity;
        }
        String type = new SpectralType(kin.typeNumber().getAsDouble()).code() + gravity;
        return kin.kind() == ObjectKind.LATE_DWARF ? type : type + ", " + kin.kind().label();
    }

    /** The distance: about 1 for twins. */
    static String distance(Kin kin) {
        return Digits.fixed(kin.distance(), 2);
    }
}
