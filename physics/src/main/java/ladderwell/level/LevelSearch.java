package ladderwell.level;

import ladderwell.evidence.PhysicsException;
import ladderwell.numeric.Interruption;

/**
 * Finds single levels on one mesh: Newton's iteration on the matching angle, safeguarded by the count of zeros, and an enclosure at the end
 * where the count itself must change. Energies are e = 2E.
 */
final class LevelSearch {
    /** Depth of the tails where the wave function is wanted: φ has fallen to 2^−52. */
    private static final double WAVE_TAIL = 37;

    private static final int MOST_SHOTS = 300;

    private final CurveSurvey survey;
    final ShootingMesh mesh;
    private final Shot shot;

    /**
     * A level.
     *
     * @param e energy
     * @param rounding what rounding leaves open, estimated
     * @param fit error by the fit of the cells; NaN where the wave function has to tell
     */
    record Found(double e, double rounding, double fit) {}

    LevelSearch(CurveSurvey survey, double eLow, double eHigh) {
        this.survey = survey;
        mesh = new ShootingMesh(survey, eLow, eHigh);
        shot = new Shot(mesh, survey);
    }

    int shots() {
        return shot.count;
    }

    private double below(double e, double a) {
        double threshold = survey.threshold;
        if (e < threshold) {
            return e;
        }
        double from = Double.isInfinite(a) ? survey.bottom : a;
        return from + 0.5 * (threshold - from);
    }

    private double frequency(double e) {
        Cell c = mesh.cells()[Math.min(shot.mid, mesh.cells().length - 1)];
        return Math.sqrt(Math.max(e - c.mean, 1 / Math.max(c.r * c.r, survey.length * survey.length)));
    }

    private double deepest() {
        double deep = survey.threshold;
        for (Cell c : mesh.cells()) {
            deep = Math.min(deep, c.mean);
        }
        return survey.threshold - deep;
    }

    /** What the energy can be resolved to: its own rounding and that of the angles. */
    private double unit(double e, double slope) {
        // A slope next to nothing says that the edge lies badly, not that the energy cannot be resolved.
        double phase = Math.min(4e-16 / slope, 1e-12 * (Math.abs(e) + Math.abs(e - survey.bottom)));
        return Math.max(1e-15 * Math.abs(e), Math.max(phase, 1e-300));
    }

    /**
     * Level n of all, from a first guess.
     *
     * @param spacing distance expected to the level before of the same parity, NaN where unknown: where the matching angle rises as that says,
     *     Newton's iteration cannot have stopped on a steep step and the enclosure is left out
     */
    Found solve(long n, double guess, double spacing) {
        int parity = (int) (n & 1);
        int k = (int) (survey.even ? n / 2 : n);
        int forced = -1;
        double a = survey.bottom;
        double b = survey.threshold;
        boolean bracketed = false;
        boolean under = false;
        double e = Math.max(guess, survey.bottom + 1e-9 * Math.abs(survey.bottom));
        double s = 0;
        double before = Double.NaN;
        int first = shot.count;
        double width = Double.POSITIVE_INFINITY;
        int since = 0;
        while (shot.count - first < MOST_SHOTS) {
            Interruption.check();
            e = below(e, a);
            mesh.cover(e, ShootingMesh.TAIL);
            if (!under) {
                // The survey samples; the mesh meets every well on its way.
                a = Math.min(a, mesh.lowest());
            }
            shot.range(e, ShootingMesh.TAIL, forced);
            s = frequency(e);
            double f = shot.mismatch(e, k, s, parity, true, true);
            double slope = shot.slope;
            if (Double.isNaN(f)) {
                break;
            }
            if (f > 0) {
                b = Math.min(b, e);
                bracketed = true;
            } else {
                a = Math.max(a, e);
                under = true;
            }
            double step = Math.abs(f / slope);
            double best = e - f / slope;
            double noise = 2e-16 * (8 + shot.to - shot.from);
            double unit = unit(e, slope);
            // In a sweep the slope is known to change by about 1/n from level to level: Newton's next error is step · f
            // / n.
            boolean smooth = Math.abs(slope * spacing - 1) < 0.3;
            boolean settled = step <= 4 * unit
                    || Math.abs(f) <= noise
                    || step * Math.abs(slope / before - 1) < 0.4 * unit
                    || smooth && Math.abs(f) < 1e-5 && step * Math.abs(f) < 0.1 * n * unit;
            if (Math.abs(f) < 0.1 && settled) {
                double delta = 8 * unit + noise / slope;
                if (smooth) {
                    return found(best, delta, slope);
                }
                if (shot.mismatch(best + delta, k, s, parity, false, true) < 0) {
                    a = Math.max(a, best + delta);
                    under = true;
                } else if (shot.mismatch(best - delta, k, s, parity, false, true) > 0) {
                    b = Math.min(b, best - delta);
                    bracketed = true;
                } else {
                    return found(best, delta, slope);
                }
            }
            before = slope;
            if (!bracketed
                    && survey.threshold < Double.POSITIVE_INFINITY
                    && survey.threshold - a <= 1e-14 * Math.min(survey.threshold - survey.bottom, deepest())) {
                throw new IllegalArgumentException(
                        "the potential has no bound level " + n + ": its continuum begins at " + survey.threshold / 2);
            }
            if (b - a <= 2 * unit) {
                e = 0.5 * (a + b);
                forced = shot.bestEdge(e, parity);
                shot.range(e, ShootingMesh.TAIL, forced);
                s = frequency(e);
                shot.mismatch(e, k, s, parity, true, false);
                return found(e, b - a + 8 * unit, shot.slope);
            }
            double room = Math.max(e - survey.bottom, 1 / (survey.length * survey.length));
            best = Math.min(best, e + room);
            if (!(best > a && best < b)) {
                if (Double.isInfinite(b)) {
                    best = e + Math.min(room, Math.max(2 / slope, 0.1 * room));
                } else {
                    best = a + 0.5 * (b - a);
                }
            } else if (Math.abs(f) > 1.5 && !Double.isInfinite(b)) {
                best = Math.max(a + 0.1 * (b - a), Math.min(b - 0.1 * (b - a), best));
            }
            // Newton's iteration can go to and fro about a step of the angle, each time hardly nearer.
            if (b - a <= 0.5 * width) {
                width = b - a;
                since = 0;
            } else if (++since > 4 && Math.abs(f) > 1e-3 && !Double.isInfinite(b)) {
                best = a + 0.5 * (b - a);
                since = 0;
            }
            e = best;
        }
        double open = b - a;
        throw new PhysicsException.NotConverged(
                "level n = " + n,
                shot.count - first,
                Double.isNaN(open) ? Double.POSITIVE_INFINITY : open / 2,
                Double.isFinite(e) ? 1e-15 * Math.abs(e) : 0);
    }

    /**
     * Rounding of the angles in every cell, and of energies and potential in each other's size: a piecewise constant well with walls ten times as
     * high was once off by 6e-15 of the energy.
     */
    private Found found(double e, double delta, double slope) {
        double rounding = 4e-16 * (4 + 2 * (shot.to - shot.from)) / slope + 5e-15 * Math.abs(e);
        return new Found(e, Math.min(delta, rounding) + rounding, Double.NaN);
    }

    /** Number of levels below e. */
    long below(double e) {
        mesh.cover(e, ShootingMesh.TAIL);
        shot.range(e, ShootingMesh.TAIL, -1);
        double s = frequency(e);
        if (!survey.even) {
            return (long) Math.floor(shot.mismatch(e, 0, s, 0, false, true) + 1);
        }
        return (long) Math.floor(shot.mismatch(e, 0, s, 0, false, true) + 1)
                + (long) Math.floor(shot.mismatch(e, 0, s, 1, false, true) + 1);
    }

    /** The wave function of a found level, normed over the half line for an even potential. */
    Wave wave(long n, Found level) {
        // The mesh may have grown leftwards since: the matching edge is found anew there.
        mesh.cover(level.e, WAVE_TAIL);
        shot.range(level.e, WAVE_TAIL, -1);
        int parity = (int) (n & 1);
        shot.range(level.e, WAVE_TAIL, shot.bestEdge(level.e, parity));
        return shot.wave(level.e, frequency(level.e), parity);
    }

    /** Error of e by cutting the tails off: what a wall there would change. */
    double tailError(Wave wave) {
        double sum = 0;
        Cell[] cells = wave.cells();
        for (int side = 0; side < 2; side++) {
            double value = side == 0 ? wave.head() : wave.tail();
            Cell c = cells[side == 0 ? wave.from() : wave.to() - 1];
            sum += 2 * Math.sqrt(Math.max(0, c.mean - wave.e())) * value * value;
        }
        return sum;
    }
}
