package emberline.judge;

import java.util.Comparator;
import java.util.Optional;

/**
 * The motion of an object in the Galaxy.
 *
 * @param vtanKms tangential velocity (km/s)
 * @param vtanSigmaKms one-sigma error from the distance (km/s)
 * @param space velocity in the Galaxy; empty where the radial velocity or the position is not known
 */
public record Kinematics(double vtanKms, double vtanSigmaKms, Optional<Space> space) {

    /** km/s of one astronomical unit a year. */
    static final double KMS_PER_AU_YEAR = 4.740470446;

    /** Velocity within which a group is named (km/s). */
    private static final double NEAR_GROUP_KMS = 8;

    /** Rows turn ICRS into galactic axes (Hipparcos angles 192.85948, 27.12825, 32.93192 deg). */
    private static final double[][] TO_GALACTIC = {
        {-0.0548755604162, -0.8734370902349, -0.4838350155487},
        {0.4941094278756, -0.4448296299600, 0.7469822444972},
        {-0.8676661490190, -0.1980763734312, 0.4559837761751}
    };

    /**
     * Velocity relative to the Sun.
     *
     * @param uKms to the galactic centre (km/s)
     * @param vKms along the rotation of the Galaxy (km/s)
     * @param wKms to the north galactic pole (km/s)
     */
    public record Space(double uKms, double vKms, double wKms) {

        /** The known group that moves most alike, within 8 km/s. */
        Optional<YoungGroup> likeGroup() {
            return YoungGroup.all().stream()
                    .filter(group -> from(group) <= NEAR_GROUP_KMS)
                    .min(Comparator.comparingDouble(this::from));
        }

        private double from(YoungGroup group) {
            return Math.sqrt(
                    Math.pow(uKms - group.uKms(), 2)
                            + Math.pow(vKms - group.vKms(), 2)
                            + Math.pow(wKms - group.wKms(), 2));
        }
    }

    /** The motion, as far as it can be told. */
    static Optional<Kinematics> of(Astrometry astrometry, DistanceEstimate distance) {
        if (astrometry.properMotionMasYr().isEmpty()) {
            return Optional.empty();
        }
        double motion = astrometry.properMotionMasYr().getAsDouble() / 1000;
        double vtan = KMS_PER_AU_YEAR * motion * distance.pc().median();
        return Optional.of(
                new Kinematics(
                        vtan,
                        KMS_PER_AU_YEAR * motion * distance.pc().sigma(),
                        space(astrometry, distance.pc().median())));
    }

    private static Optional<Space> space(Astrometry astrometry, double pc) {
        if (astrometry.raDeg().isEmpty()
                || astrometry.decDeg().isEmpty()
                || astrometry.rvKms().isEmpty()) {
            return Optional.empty();
        }
        double ra = Math.toRadians(astrometry.raDeg().getAsDouble());
        double dec = Math.toRadians(astrometry.decDeg().getAsDouble());
        double along = astrometry.rvKms().getAsDouble();
        double east = KMS_PER_AU_YEAR * pc * astrometry.pmRaMasYr().orElseThrow() / 1000;
        double north = KMS_PER_AU_YEAR * pc * astrometry.pmDecMasYr().orElseThrow() / 1000;
        double[] v = {
            along * Math.cos(dec) * Math.cos(ra)
                    - east * Math.sin(ra)
                    - north * Math.sin(dec) * Math.cos(ra),
            along * Math.cos(dec) * Math.sin(ra)
                    + east * Math.cos(ra)
                    - north * Math.sin(dec) * Math.sin(ra),
            along * Math.sin(dec) + north * Math.cos(dec)
        };
        double[] uvw = new double[3];
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                uvw[i] += TO_GALACTIC[i][j] * v[j];
            }
        }
        return Optional.of(new Space(uvw[0], uvw[1], uvw[2]));
    }
}
