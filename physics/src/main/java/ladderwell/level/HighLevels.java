package ladderwell.level;

import ladderwell.numeric.Interruption;
import org.jspecify.annotations.Nullable;

/**
 * Levels far above the bottom of a well by its phase functions: one alone by the secant rule and an enclosure, many from a table of the excess
 * over the logarithm of the energy, which is as smooth as the action of classical mechanics. Energies are e = 2E.
 */
final class HighLevels {
    private static final int MOST_ROUNDS = 16;
    private static final long FAR = 1024;
    /** Of heights, in logarithm: not tried with the lowest degree. */
    private static final double WIDE = 1.5;

    /** A pure power of the height needs degree 1. */
    private static final int[] DEGREES = {9, 13, 20, 40};

    private final CurveSurvey survey;

    HighLevels(CurveSurvey survey) {
        this.survey = survey;
    }

    /** About the energy of the place between levels n − 1 and n, to 1e-4 of its height or so. */
    private double near(double levels) {
        double e = survey.energyOf(levels);
        double height = e - survey.bottom;
        double here = survey.action(e);
        double step = 0.02 * height;
        double above = survey.action(e + step);
        double better = e + (levels - here) / (above - here) * step;
        return Math.abs(better - e) < 0.1 * height ? better : e;
    }

    /** Level n; null where the well is not of the kind. */
    LevelSearch.@Nullable Found one(long n) {
        double e = near(n + 0.5);
        double height = e - survey.bottom;
        PhaseWell well = PhaseWell.of(survey, e - 2e-3 * height, n);
        if (well == null) {
            return null;
        }
        double f = well.excess(e, n);
        double slope = well.slope;
        double a = Double.NEGATIVE_INFINITY;
        double b = Double.POSITIVE_INFINITY;
        for (int round = 0; round < MOST_ROUNDS && !Double.isNaN(f); round++) {
            Interruption.check();
            if (f > 0) {
                b = Math.min(b, e);
            } else {
                a = Math.max(a, e);
            }
            double step = -f / slope;
            double unit = Math.max(1e-15 * Math.abs(e), 1e-300);
            if (Math.abs(step) <= 4 * unit || Math.abs(f) <= well.noise) {
                double delta = 8 * unit + well.noise / slope;
                double best = e + step;
                // The count itself must change here.
                if (well.excess(best - delta, n) <= 0 && well.excess(best + delta, n) >= 0) {
                    return found(
                            best, Math.min(delta, rounding(well.noise / slope, best)), well.noise / slope, well.fit);
                }
                return null;
            }
            double next = e + step;
            if (!(next > a && next < b)) {
                return null;
            }
            if (next < well.eLow() || next > e + 0.05 * height) {
                well = PhaseWell.of(survey, next - 1e-4 * height, n);
                if (well == null) {
                    return null;
                }
            }
            double before = f;
            f = well.excess(next, n);
            slope = (f - before) / (next - e);
            if (!(slope > 0)) {
                return null;
            }
            e = next;
        }
        return null;
    }

    private static double rounding(double noise, double e) {
        return noise + 5e-15 * Math.abs(e);
    }

    private static LevelSearch.Found found(double e, double delta, double noise, double fit) {
        double rounding = rounding(noise, e);
        return new LevelSearch.Found(e, Math.min(delta, rounding) + rounding, fit);
    }

    /** Number of levels below e; −1 where the well is not of the kind. */
    long below(double e, double about) {
        PhaseWell well = PhaseWell.of(survey, e, about);
        if (well == null) {
            return -1;
        }
        double first = well.excess(e, 0);
        double second = survey.even ? well.excess(e, 1) : 0;
        if (Double.isNaN(first) || Double.isNaN(second)) {
            return -1;
        }
        return survey.even
                ? (long) Math.floor(first / 2 + 1) + (long) Math.floor(second / 2 + 1)
                : (long) Math.floor(first + 1);
    }

    /** A table for levels first … last; null where the excess is not smooth there. */
    @Nullable Table table(long first, long last) {
        double low = near(first);
        double height = low - survey.bottom;
        low -= 4e-3 * height;
        double high = near(last + 1.0);
        high += 4e-3 * (high - survey.bottom);
        if (!(high < survey.threshold && high > low)) {
            return null;
        }
        // Higher up the meshes that lead from one turning point to the next grow long: a well for each energy is
        // quicker.
        PhaseWell well = first < FAR ? PhaseWell.of(survey, low, first) : null;
        if (well == null && first < FAR) {
            return null;
        }
        double unit = low - survey.bottom;
        double range = Math.log((high - survey.bottom) / unit);
        for (int degree : DEGREES) {
            if (range > WIDE && degree < 10) {
                continue;
            }
            Interruption.check();
            Table table = Table.of(well, survey, unit, range, degree, first);
            if (table != null) {
                return table.holds(first, last) ? table : null;
            }
        }
        return null;
    }

    /** ln((n + ½ + excess)/centre) as a Chebyshev series in ln((e − bottom)/unit). */
    static final class Table {
        private final double bottom;
        private final double unit;
        private final double half;
        private final double centre;
        private final double[] series;
        /** Of n over n + ½. */
        private final double noise;

        private final double fit;
        private final double from;
        private final double to;
        private final double lowest;
        private final double highest;

        private Table(
                double bottom, double unit, double half, double centre, double[] series, double noise, double fit) {
            this.bottom = bottom;
            this.unit = unit;
            this.half = half;
            this.centre = centre;
            this.series = series;
            this.noise = noise;
            this.fit = fit;
            double[] out = new double[2];
            at(-1, out);
            from = out[0];
            lowest = centre * Math.exp(from) - 0.5;
            at(1, out);
            to = out[0];
            highest = centre * Math.exp(to) - 0.5;
        }

        static @Nullable Table of(
                @Nullable PhaseWell well, CurveSurvey survey, double unit, double range, int degree, double levels) {
            int m = degree + 1;
            double half = range / 2;
            double[] value = new double[m];
            double noise = 0;
            double fit = 0;
            for (int j = m - 1; j >= 0; j--) {
                double t = half * (1 + Math.cos(Math.PI * (j + 0.5) / m));
                double e = survey.bottom + unit * Math.exp(t);
                PhaseWell own = well == null ? PhaseWell.of(survey, e, levels) : well;
                if (own == null) {
                    return null;
                }
                value[j] = own.excess(e, 0) + 0.5;
                // A level can tell no more than its own rounding and what that of the angle makes of it.
                double open = own.noise + 4e-16 * value[j];
                if (!(value[j] > 1 && own.apart <= 4 * open)) {
                    return null;
                }
                noise = Math.max(noise, open / value[j]);
                fit = Math.max(fit, own.fit);
            }
            double centre = value[m / 2];
            for (int j = 0; j < m; j++) {
                value[j] = Math.log(value[j] / centre);
            }
            double[] series = new double[m];
            for (int k = 0; k < m; k++) {
                double sum = 0;
                for (int j = 0; j < m; j++) {
                    sum += value[j] * Math.cos(Math.PI * k * (j + 0.5) / m);
                }
                series[k] = sum * (k == 0 ? 1.0 : 2.0) / m;
            }
            double left = Math.abs(series[degree]) + Math.abs(series[degree - 1]);
            if (!(left <= 4 * noise)) {
                return null;
            }
            double off = left;
            Table table = new Table(survey.bottom, unit, half, centre, series, noise, fit);
            double[] out = new double[2];
            for (double s : new double[] {-0.981, 0.137, 0.933}) {
                table.at(s, out);
                double e = survey.bottom + unit * Math.exp(half * (1 + s));
                PhaseWell own = well == null ? PhaseWell.of(survey, e, levels) : well;
                if (own == null) {
                    return null;
                }
                double there = own.excess(e, 0) + 0.5;
                off = Math.max(off, Math.abs(out[0] - Math.log(there / centre)));
            }
            return off <= 6 * noise ? new Table(survey.bottom, unit, half, centre, series, noise + off, fit) : null;
        }

        /** {ln((n + ½)/centre), its derivative by s} at s in [−1, 1]. */
        private void at(double s, double[] out) {
            double b1 = 0;
            double b2 = 0;
            double d1 = 0;
            double d2 = 0;
            for (int k = series.length - 1; k > 0; k--) {
                double b = 2 * s * b1 - b2 + series[k];
                double d = 2 * s * d1 - d2 + 2 * b1;
                b2 = b1;
                b1 = b;
                d2 = d1;
                d1 = d;
            }
            out[0] = s * b1 - b2 + series[0];
            out[1] = s * d1 - d2 + b1;
        }

        boolean holds(long first, long last) {
            return lowest <= first && highest >= last;
        }

        LevelSearch.Found level(long n) {
            double[] out = new double[2];
            double e = energy(n, out);
            return found(e, Double.POSITIVE_INFINITY, noise * half * (e - bottom) / out[1], fit);
        }

        /** e of level n; leaves the derivative of {@link #at} in out[1]. */
        double energy(long n, double[] out) {
            double wanted = Math.log((n + 0.5) / centre);
            double s = 2 * (wanted - from) / (to - from) - 1;
            for (int round = 0; round < 8; round++) {
                at(s, out);
                double step = (wanted - out[0]) / out[1];
                s += step;
                if (Math.abs(step) < 1e-8) {
                    break;
                }
            }
            return bottom + unit * Math.exp(half * (1 + s));
        }
    }
}
