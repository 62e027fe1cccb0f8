package ladderwell.level;

/**
 * The functions ξ(Z) = cos √−Z and η₀(Z) = sin √−Z / √−Z (hyperbolic for Z &gt; 0) with η_m = ((η_{m−2}) − (2m − 1) η_{m−1}) / Z, η_{−1} = ξ
 * (Ixaru, J. Comput. Phys. 1984). dη_m/dZ = η_{m+1} / 2.
 */
final class EtaSeries {
    /** Highest index ever asked for, with room for the extra ones of the power series. */
    static final int LAST = 44;

    private static final double LN_2 = Math.log(2);
    private static final double[] ODD = new double[240];
    /** 1/k: three divisions a step would take most of the time. */
    private static final double[] ONE_OVER = new double[400];

    static {
        ODD[0] = 1;
        for (int m = 1; m < ODD.length; m++) {
            ODD[m] = Math.min(ODD[m - 1] * (2 * m + 1), 1e300);
        }
    }

    static {
        for (int k = 1; k < ONE_OVER.length; k++) {
            ONE_OVER[k] = 1.0 / k;
        }
    }

    private EtaSeries() {}

    /** Room for {@link #fill}. */
    static double[] room() {
        return new double[240];
    }

    /**
     * g[0] = ξ(Z), g[1 + m] = η_m(Z) for m = 0 … last, all divided by a power of two that keeps them from overflow.
     *
     * @return the exponent of that power, 0 unless Z exceeds 10 000
     */
    static int fill(double z, int last, double[] g) {
        if (Math.abs(z) > Math.max(120, last * last)) {
            int exponent = 0;
            if (z < 0) {
                double w = Math.sqrt(-z);
                g[0] = Math.cos(w);
                g[1] = Math.sin(w) / w;
            } else {
                double w = Math.sqrt(z);
                if (w > 100) {
                    exponent = (int) (w / LN_2);
                }
                double grow = Math.exp(w - exponent * LN_2);
                double fall = exponent > 0 ? 0 : 1 / grow;
                g[0] = (grow + fall) / 2;
                g[1] = (grow - fall) / (2 * w);
            }
            double inverse = 1 / z;
            for (int m = 1; m <= last; m++) {
                g[m + 1] = (g[m - 1] - (2 * m - 1) * g[m]) * inverse;
            }
            return exponent;
        }
        double root = Math.sqrt(Math.abs(z));
        // A lower start of the downward recurrence loses digits for Z < −40.
        int n = Math.max(Math.max(last, 2), (int) (1.3 * root));
        double half = z / 2;
        double sum = 1;
        double before = 1;
        for (int q = (int) (6 + 1.76 * root); q > 0; q--) {
            double t = half * ONE_OVER[q];
            sum = Math.fma(t * ONE_OVER[2 * (n + q) + 1], sum, 1);
            before = Math.fma(t * ONE_OVER[2 * (n + q) - 1], before, 1);
        }
        g[n + 1] = sum / ODD[n];
        g[n] = before / ODD[n - 1];
        double next = g[n + 1];
        double here = g[n];
        for (int m = n - 1; m > 0; m--) {
            double lower = Math.fma(2 * m + 1, here, z * next);
            g[m] = lower;
            next = here;
            here = lower;
        }
        g[0] = g[1] + z * g[2];
        return 0;
    }
}
