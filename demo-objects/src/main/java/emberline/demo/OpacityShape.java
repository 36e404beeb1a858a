package emberline.demo;

/** A form of the dependence of opacity on wavelength, with up to four parameters in micron. */
enum OpacityShape {
    /** A band head at a: exponential decay b to the red, c to the blue. */
    HEAD {
        @Override
        double at(double micron, double a, double b, double c, double d) {
            return micron >= a
                    ? StrictMath.exp((a - micron) / b)
                    : StrictMath.exp((micron - a) / c);
        }
    },
    /** A trapezoid with feet a and d and top from b to c. */
    TRAPEZOID {
        @Override
        double at(double micron, double a, double b, double c, double d) {
            if (micron <= a || micron >= d) {
                return 0;
            }
            if (micron < b) {
                return (micron - a) / (b - a);
            }
            return micron > c ? (d - micron) / (d - c) : 1;
        }
    },
    /** A normal curve of centre a and standard deviation b. */
    GAUSS {
        @Override
        double at(double micron, double a, double b, double c, double d) {
            double x = (micron - a) / b;
            return StrictMath.exp(-0.5 * x * x);
        }
    },
    /** A Lorentz profile of centre a and half width b, cut softly at 40 half widths. */
    LINE {
        @Override
        double at(double micron, double a, double b, double c, double d) {
            double x = (micron - a) / b;
            return StrictMath.exp(-x * x / (CUT * CUT)) / (1 + x * x);
        }
    },
    /** The far pressure wing of a resonance line at a with core width b. */
    WING {
        @Override
        double at(double micron, double a, double b, double c, double d) {
            double x = (micron - a) / b;
            return 1 / (1 + x * x);
        }
    },
    /** A power law with exponent -a, 1 at one micron. */
    POWER {
        @Override
        double at(double micron, double a, double b, double c, double d) {
            return StrictMath.pow(micron, -a);
        }
    };

    private static final double CUT = 40;

    /**
     * The relative opacity at a wavelength.
     *
     * @param micron wavelength (micron, vacuum)
     * @param a first parameter of the shape
     * @param b second parameter
     * @param c third parameter
     * @param d fourth parameter
     * @return opacity, 1 at the peak
     */
    abstract double at(double micron, double a, double b, double c, double d);
}
