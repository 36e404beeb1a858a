package emberline.reports.attach;

import emberline.place.TypeEstimate;
import emberline.place.photometric.PhotometricType;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** What the colours of an object say as JSON. */
final class PhotometricJson {

    private PhotometricJson() {}

    static Map<String, Object> map(PhotometricType colours) {
        Map<String, Object> map = new LinkedHashMap<>();
        Optional<TypeEstimate> type = colours.type();
        map.put("colours", colours.colours());
        map.put("type", type.map(TypeText::code).orElse(""));
        map.put("type_number", number(type.map(TypeEstimate::typeNumber)));
        map.put("type_sigma", number(type.map(TypeEstimate::sigmaSubclass)));
        map.put("type_lo68", number(type.map(TypeEstimate::lo68)));
        map.put("type_hi68", number(type.map(TypeEstimate::hi68)));
        map.put("type_lo95", number(type.map(TypeEstimate::lo95)));
        map.put("type_hi95", number(type.map(TypeEstimate::hi95)));
        map.put("reason", colours.reason());
        map.put("chi_square", JsonText.number(Digits.fixed(colours.chiSquare(), 2)));
        map.put("freedom", colours.freedom());
        OptionalDouble reduced = colours.reducedChiSquare();
        map.put(
                "reduced_chi_square",
                reduced.isPresent()
                        ? JsonText.number(Digits.fixed(reduced.getAsDouble(), 2))
                        : null);
        map.put("p_reddened", JsonText.number(Digits.probability(colours.pReddened())));
        map.put("a_v", JsonText.number(Digits.type(colours.avMag())));
        map.put("spectrum_gain_bits", JsonText.number(Digits.fixed(colours.spectrumGainBits(), 2)));
        return map;
    }

    private static Object number(Optional<Double> subclass) {
        return JsonText.number(subclass.map(Digits::type).orElse(""));
    }
}
