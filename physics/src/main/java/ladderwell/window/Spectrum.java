package ladderwell.window;

import ladderwell.operator.LadderPolynomial;

/**
 * Where the frequencies and the damping of a generator lie on a window, roughly: it sets the speed of a step, never its validity.
 *
 * @param least lowest frequency
 * @param most highest frequency
 * @param damping most negative real part of K's diagonal, at most 0
 */
record Spectrum(double least, double most, double damping) {
    /** Share of the coupling to the neighbours by which frequencies reach beyond the diagonal; 1 would be Gershgorin's circles. */
    private static final double COUPLED = 0.7;

    static Spectrum of(LadderPolynomial drift, long first, int levels) {
        double least = Double.POSITIVE_INFINITY;
        double most = Double.NEGATIVE_INFINITY;
        double damping = 0;
        Bands bands = Bands.of(drift, 1, first, levels, 0);
        for (int n = 0; n < levels; n++) {
            double centre = 0;
            double radius = 0;
            for (Bands.Band band : bands.all()) {
                if (band.shift == 0) {
                    centre = -band.im[n];
                    damping = Math.min(damping, band.re[n]);
                } else if (n + band.shift >= 0 && n + band.shift < levels) {
                    radius += COUPLED * Math.hypot(band.re[n], band.im[n]);
                }
            }
            least = Math.min(least, centre - radius);
            most = Math.max(most, centre + radius);
        }
        return new Spectrum(least, most, damping);
    }

    double width() {
        return most - least;
    }

    double centre() {
        return (least + most) / 2;
    }
}
