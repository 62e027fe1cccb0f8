package ladderwell.level;

import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import java.util.function.DoubleUnaryOperator;
import ladderwell.evidence.Bound;
import ladderwell.evidence.PhysicsException;
import ladderwell.numeric.Interruption;
import org.jspecify.annotations.Nullable;

/**
 * Levels of any potential by shooting: single levels are found when asked for and kept. Levels 128, 256, … begin new meshes whose cells are
 * as long as the higher energies allow; their energies come from phase functions where the well has them, and from a mesh otherwise. Energies
 * inside are e = 2E.
 */
final class ShootingLevels implements Levels {
    private static final long LAST = 50_000_000;
    private static final int FIRST_BAND = 7;
    private static final int SCANNED = 512;
    private static final int REMEMBERED = 20_000;
    /** So many levels of a band asked for one by one are worth a table of it. */
    private static final int SINGLE = 12;
    /** Factors of 2 in a table. */
    private static final int WIDE = 3;

    private final CurveSurvey survey;
    private final Map<Integer, LevelSearch> bands = new HashMap<>();
    private final HighLevels high;
    private final Map<Integer, Band> highBands = new HashMap<>();
    private final Map<Long, Solved> known = new HashMap<>();
    private long count = -1;

    /** A level; the wave and with it the error are added when asked for. */
    private static final class Solved {
        final LevelSearch.Found found;

        @Nullable Wave wave;

        double error;

        Solved(LevelSearch.Found found) {
            this.found = found;
            error = found.rounding() + found.fit();
        }
    }

    /** What is known by phase functions of levels 128 … 1023, 1024 … 8191 and so on. */
    private static final class Band {
        HighLevels.@Nullable Table table;

        int asked;
        boolean refused;
    }

    ShootingLevels(PotentialCurve curve) {
        survey = new CurveSurvey(curve);
        high = new HighLevels(survey);
    }

    @Override
    public Kind kind() {
        return Kind.GENERAL;
    }

    private static int band(long n) {
        return Math.max(FIRST_BAND - 1, 63 - Long.numberOfLeadingZeros(Math.max(1, n)));
    }

    private LevelSearch search(long n) {
        int band = band(n);
        LevelSearch search = bands.get(band);
        if (search == null) {
            double low = band < FIRST_BAND ? Double.NEGATIVE_INFINITY : survey.energyOf(0.9 * (1L << band));
            double high = survey.singular ? Math.max(Math.abs(survey.energyOf(1.1 * (2L << band))), nearBottom()) : 0;
            search = new LevelSearch(survey, low, high);
            bands.put(band, search);
        }
        return search;
    }

    /** Size of the lowest energies at a singular end. */
    private double nearBottom() {
        return Math.min(Math.abs(survey.energyOf(0.6)) * 4, Math.abs(survey.bottom));
    }

    private synchronized Solved solved(long n) {
        Solved level = known.get(n);
        if (level != null) {
            return level;
        }
        if (n < 0) {
            throw new IllegalArgumentException("level " + n + " does not exist: levels count from 0");
        }
        if (n > LAST) {
            throw new IllegalArgumentException(
                    "levels of a general potential are computed up to n = " + LAST + ", got " + n);
        }
        LevelSearch.Found found = byPhase(n);
        level = new Solved(found == null ? shot(n) : found);
        if (known.size() >= REMEMBERED) {
            known.clear();
        }
        known.put(n, level);
        return level;
    }

    private LevelSearch.Found shot(long n) {
        LevelSearch search = search(n);
        double guess = extrapolated(n);
        Solved twin = known.get(n - 2);
        double spacing = survey.even && twin != null ? guess - twin.found.e() : Double.NaN;
        LevelSearch.Found found = Double.isNaN(guess)
                ? search.solve(n, survey.energyOf(n + 0.5), Double.NaN)
                : search.solve(n, guess, spacing);
        // Where the band began too high for an unusual potential, the mesh for all energies serves.
        return found.e() < search.mesh.eLow() ? search(0).solve(n, found.e(), Double.NaN) : found;
    }

    /** The search whose mesh serves a level found. */
    private LevelSearch searchOf(long n, double e) {
        LevelSearch search = search(n);
        return e < search.mesh.eLow() ? search(0) : search;
    }

    /** Which table may hold level n; -1 for none. */
    private static int tableOf(long n) {
        return Math.floorDiv(63 - Long.numberOfLeadingZeros(Math.max(1, n)) - FIRST_BAND, WIDE);
    }

    private static long firstOf(long n) {
        return 1L << FIRST_BAND + tableOf(n) * WIDE;
    }

    private Band highBand(long n) {
        return highBands.computeIfAbsent(tableOf(n), k -> new Band());
    }

    private LevelSearch.@Nullable Found byPhase(long n) {
        if (band(n) < FIRST_BAND) {
            return null;
        }
        Band band = highBand(n);
        HighLevels.Table table = band.asked >= SINGLE ? table(band, n) : band.table;
        if (table != null && table.holds(n, n)) {
            return table.level(n);
        }
        LevelSearch.Found found = band.refused ? null : high.one(n);
        band.refused |= found == null;
        band.asked++;
        return found;
    }

    /** The table of the band of level n, made when first asked for; null where it cannot be made. */
    private HighLevels.@Nullable Table table(Band band, long n) {
        if (band.table == null && !band.refused) {
            long first = firstOf(n);
            long last = (first << WIDE) - 1;
            if (survey.threshold < Double.POSITIVE_INFINITY) {
                last = Math.min(last, count() - 2);
            }
            band.table = n <= last ? high.table(first, last) : null;
            band.refused = band.table == null;
        }
        return band.table;
    }

    /** From six neighbours below, or four; NaN where they are not all known. */
    private double extrapolated(long n) {
        double[] e = new double[6];
        int many = 0;
        while (many < e.length) {
            Solved neighbour = known.get(n - 1 - many);
            if (neighbour == null) {
                break;
            }
            e[many++] = neighbour.found.e();
        }
        if (many < 4) {
            return Double.NaN;
        }
        double guess = many < 6
                ? 4 * e[0] - 6 * e[1] + 4 * e[2] - e[3]
                : 6 * e[0] - 15 * e[1] + 20 * e[2] - 15 * e[3] + 6 * e[4] - e[5];
        return guess > e[0] ? guess : Double.NaN;
    }

    private synchronized Wave wave(long n) {
        Solved level = solved(n);
        Wave wave = level.wave;
        if (wave == null) {
            Interruption.check();
            LevelSearch search = searchOf(n, level.found.e());
            wave = search.wave(n, level.found);
            level.wave = wave;
            level.error = level.found.rounding() + wave.fitError() + search.tailError(wave);
            if (Double.isNaN(level.error)) {
                level.wave = null;
                throw new PhysicsException.NotConverged(
                        "the wave function of level n = " + n, 1, Double.POSITIVE_INFINITY, level.found.rounding());
            }
        }
        return wave;
    }

    private double error(long n) {
        Solved level = solved(n);
        if (Double.isNaN(level.error)) {
            wave(n);
        }
        return level.error;
    }

    @Override
    public boolean alternates() {
        return survey.even;
    }

    @Override
    public synchronized long count() {
        if (count < 0) {
            count = counted();
        }
        return count;
    }

    private long counted() {
        double top = survey.threshold;
        if (Double.isInfinite(top)) {
            return Long.MAX_VALUE;
        }
        double depth = Math.min(top - survey.bottom, Math.abs(top - survey.energyOf(0.5)) * 10);
        // Nearer to the threshold than rounding of the potential nothing can be told.
        double least = 1e-14 * Math.max(Math.abs(top), Math.abs(survey.bottom));
        LevelSearch search = search(0);
        long some = search.below(top - Math.max(1e-6 * depth, least));
        long more = search.below(top - Math.max(1e-9 * depth, least));
        if (more > 2 * some + 10) {
            // A tail like 1/x carries levels without end.
            return Long.MAX_VALUE;
        }
        return search.below(top - Math.max(1e-13 * depth, least));
    }

    @Override
    public double energyHigh(long n) {
        return solved(n).found.e() / 2;
    }

    @Override
    public double energyLow(long n) {
        Points.checkLevel(n, Long.MAX_VALUE);
        return 0;
    }

    @Override
    public double energyError(long n) {
        return error(n) / 2;
    }

    @Override
    public Bound energyBound(long n) {
        return Bound.estimated(energyError(n));
    }

    @Override
    public synchronized double[] energies(long first, int count) {
        Points.check(first, count, Long.MAX_VALUE, new double[0]);
        double[] energies = new double[count];
        int i = 0;
        while (i < count) {
            long n = first + i;
            long end = Math.min(first + count, tableOf(n) < 0 ? 1L << FIRST_BAND : firstOf(n) << WIDE);
            HighLevels.Table table = null;
            if (tableOf(n) >= 0 && n <= LAST && end - n > SINGLE) {
                table = table(highBand(n), n);
            }
            if (table == null || !table.holds(n, n)) {
                energies[i++] = energyHigh(n);
                continue;
            }
            double[] room = new double[2];
            while (first + i < end && table.holds(n, first + i)) {
                energies[i] = table.energy(first + i, room) / 2;
                i++;
            }
            Interruption.check();
        }
        return energies;
    }

    @Override
    public synchronized long countBelow(double energy) {
        Points.checkEnergy(energy);
        double e = 2 * energy;
        if (e <= survey.bottom) {
            return 0;
        }
        if (e >= survey.threshold) {
            return count();
        }
        double about = survey.action(e);
        if (about > 2 << FIRST_BAND) {
            long below = high.below(e, about);
            if (below >= 0) {
                return below;
            }
        }
        return search(about > 200 ? (long) (0.4 * about) : 0).below(e);
    }

    @Override
    public double threshold() {
        return survey.threshold / 2;
    }

    @Override
    public double binding(long n) {
        return survey.threshold / 2 - energyHigh(n);
    }

    @Override
    public double decay(long n) {
        return Math.sqrt(survey.threshold - 2 * energyHigh(n));
    }

    @Override
    public double decayError(long n) {
        return Double.isInfinite(survey.threshold) ? 0 : energyError(n) / (2 * binding(n));
    }

    @Override
    public double splitting(long n) {
        double simple = Levels.super.splitting(n);
        if (!survey.even || (n & 1) == 1) {
            return simple;
        }
        // y_e(0) y_o′(0) = (e_o − e_e) ∫₀ y_e y_o, without cancellation.
        Wave even = wave(n);
        Wave odd = wave(n + 1);
        double[] out = new double[2];
        even.at(0, EtaSeries.room(), out);
        double value = out[0];
        odd.at(0, EtaSeries.room(), out);
        WaveTable table = new WaveTable(new Wave[] {even, odd});
        double[] ones = new double[table.x.length];
        Arrays.fill(ones, 1);
        return Math.abs(value * out[1] / table.sum(table.value[0], table.value[1], ones)) / 2;
    }

    @Override
    public Bound splittingBound(long n) {
        if (!survey.even || (n & 1) == 1) {
            return Levels.super.splittingBound(n);
        }
        // What an error of the potential or the energy does to the action under the barrier.
        Wave wave = wave(n);
        double relative = 2e-14 + waveError(n) + waveError(n + 1);
        for (int i = wave.from(); i < wave.to(); i++) {
            Cell c = wave.cells()[i];
            double above = c.mean - wave.e();
            if (above > 0) {
                relative += 2 * c.r * (c.fit + error(n) + error(n + 1)) / Math.max(Math.sqrt(above), 1 / c.r);
            }
        }
        return Bound.estimated(relative * splitting(n));
    }

    @Override
    public Cluster cluster(long n) {
        Points.checkLevel(n, count());
        long first = n;
        long last = n;
        if (!survey.even) {
            while (first > 0 && together(first - 1)) {
                first--;
            }
            while (last + 1 < count() && together(last)) {
                last++;
            }
        }
        double spread = energyHigh(last) - energyHigh(first) + energyError(first) + energyError(last);
        return new Cluster(first, last, first == last ? Bound.exact() : Bound.estimated(spread));
    }

    private boolean together(long n) {
        return energyHigh(n + 1) - energyHigh(n) <= 4 * (energyError(n) + energyError(n + 1));
    }

    /** Estimated norm error of a wave function: its energy's error over the distance to the levels it can mix with. */
    private double waveError(long n) {
        int step = survey.even ? 2 : 1;
        double gap = Double.POSITIVE_INFINITY;
        if (n >= step) {
            gap = 2 * (energyHigh(n) - energyHigh(n - step));
        }
        if (n + step < count()) {
            gap = Math.min(gap, 2 * (energyHigh(n + step) - energyHigh(n)));
        }
        if (survey.threshold < Double.POSITIVE_INFINITY) {
            gap = Math.min(gap, survey.threshold - 2 * energyHigh(n));
        }
        return gap > 0 ? Math.min(2, 4 * error(n) / gap + 4e-15) : 2;
    }

    @Override
    public double[][] waveFunctions(long first, int count, double[] x) {
        Points.check(first, count, Long.MAX_VALUE, x);
        double[][] table = new double[count][x.length];
        Wave[] waves = new Wave[count];
        for (int row = 0; row < count; row++) {
            waves[row] = wave(first + row);
        }
        double[] g = EtaSeries.room();
        double[] out = new double[2];
        double[] u = new double[Cell.TERMS];
        double[] v = new double[Cell.TERMS];
        int[] near = new int[count];
        double scale = survey.even ? Math.sqrt(0.5) : 1;
        for (int i = 0; i < x.length; i++) {
            if (x[i] <= survey.left || x[i] >= survey.right) {
                continue;
            }
            if ((i & 63) == 0) {
                Interruption.check();
            }
            double place = survey.even ? Math.abs(x[i]) : x[i];
            // The polynomials of a cell serve all levels on the same mesh.
            Cell known = null;
            for (int row = 0; row < count; row++) {
                Wave wave = waves[row];
                double value;
                if (place >= wave.left() && place < wave.right()) {
                    int index = wave.cell(place, near[row]);
                    near[row] = index;
                    Cell cell = wave.cells()[index];
                    double s = (place - cell.centre) / cell.r;
                    if (cell != known) {
                        cell.shapes(s, u, v);
                        known = cell;
                    }
                    value = cell.value(s, cell.z(wave.e()), wave.values()[index], wave.slopes()[index], u, v, g);
                } else {
                    wave.at(place, g, out);
                    value = out[0];
                }
                boolean odd = ((first + row) & 1) == 1;
                table[row][i] = survey.even && odd && x[i] < 0 ? -scale * value : scale * value;
            }
        }
        return table;
    }

    @Override
    public double waveFunctionError(long last) {
        double worst = 0;
        for (long n = Math.max(0, last - 3); n <= last; n++) {
            // |f|² ≤ ‖f‖ ‖f′‖ for the error f, whose slope is that of the highest level.
            worst = Math.max(worst, waveError(n));
        }
        double slope = Math.sqrt(Math.max(2 * energyHigh(last) - survey.bottom, 1 / (survey.length * survey.length)));
        return 2 * worst * Math.sqrt(slope);
    }

    @Override
    public double reach(long n, double drop) {
        Points.checkDrop(drop);
        double[] extent = extent(n, drop);
        double wall = Double.isInfinite(survey.left) ? 0 : Math.abs(survey.left);
        return Math.max(Math.abs(extent[1]), Math.max(Math.abs(extent[0]), wall));
    }

    @Override
    public double[] extent(long n, double drop) {
        Points.checkDrop(drop);
        Wave wave = wave(n);
        double right = beyond(wave.right(), wave.tail(), wave.cells()[wave.to() - 1].mean - wave.e(), drop);
        if (survey.even) {
            double reach = shrunk(wave, 0, right, drop);
            return new double[] {-reach, reach};
        }
        double left = -beyond(-wave.left(), wave.head(), wave.cells()[wave.from()].mean - wave.e(), drop);
        double middle = (left + right) / 2;
        return new double[] {shrunk(wave, middle, left, drop), shrunk(wave, middle, right, drop)};
    }

    /** From an end towards the middle until |φ| reaches the drop; on the way it only grows. */
    private double shrunk(Wave wave, double middle, double end, double drop) {
        double scale = survey.even ? Math.sqrt(0.5) : 1;
        double[] room = EtaSeries.room();
        double[] out = new double[2];
        for (int i = SCANNED; i > 0; i--) {
            double x = middle + (end - middle) * i / SCANNED;
            if (x > wave.left() && x < wave.right()) {
                wave.at(x, room, out);
                if (scale * Math.abs(out[0]) >= drop) {
                    return middle + (end - middle) * Math.min(i + 1, SCANNED) / SCANNED;
                }
            }
        }
        return end;
    }

    private static double beyond(double end, double value, double square, double drop) {
        return value > drop && square > 0 ? end + Math.log(value / drop) / Math.sqrt(square) : end;
    }

    @Override
    public Elements elements(long[] levels) {
        Points.checkList(levels, Long.MAX_VALUE);
        Wave[] waves = new Wave[levels.length];
        double[] off = new double[levels.length];
        for (int i = 0; i < levels.length; i++) {
            waves[i] = wave(levels[i]);
            off[i] = waveError(levels[i]);
        }
        return WaveTable.elements(levels, waves, off, survey.even);
    }

    @Override
    public Element element(long m, long n, DoubleUnaryOperator f) {
        WaveTable table = new WaveTable(new Wave[] {wave(m), wave(n)});
        boolean opposite = ((m ^ n) & 1) == 1;
        double[] values = new double[table.x.length];
        double[] sizes = new double[table.x.length];
        for (int j = 0; j < values.length; j++) {
            double here = f.applyAsDouble(table.x[j]);
            double there = survey.even ? f.applyAsDouble(-table.x[j]) : here;
            if (Double.isNaN(here) || Double.isNaN(there)) {
                throw new IllegalArgumentException(
                        "the function is not a number at x = " + (Double.isNaN(here) ? "" : "-") + table.x[j]);
            }
            values[j] = survey.even ? 0.5 * (opposite ? here - there : here + there) : here;
            sizes[j] = Math.max(Math.abs(here), Math.abs(there));
        }
        double value = table.sum(table.value[0], table.value[1], values);
        double size = Math.sqrt(
                table.sum(table.value[0], table.value[0], sizes) * table.sum(table.value[1], table.value[1], sizes));
        return new Element(value, Bound.estimated(size * (2 * waveError(m) + 2 * waveError(n) + 1e-14)));
    }

    @Override
    public String toString() {
        return "levels of a general potential";
    }
}
