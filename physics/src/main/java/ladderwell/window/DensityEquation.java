package ladderwell.window;

import java.util.ArrayList;
import java.util.List;
import ladderwell.operator.LadderPolynomial;

/**
 * dσ/ds = factor · (K σ + σ K† + Σ G σ G† − c σ). σ is Hermitian: rows hold the lower triangle and as many mirrored elements right of it as an
 * application reaches.
 *
 * @shape row m, column n at (m + margin) · stride + margin + n
 */
final class DensityEquation extends Equation {
    private final int stride;
    private final int mirrored;
    private final List<List<Bands>> jumps = new ArrayList<>();
    private final Plane row;
    private final double[] weights;
    private final double terms;
    private double weighted;

    /** @param shift c, real, subtracted from L */
    DensityEquation(Generator generator, long first, int levels, double factor, double shift) {
        super(generator, first, levels, factor);
        stride = (levels + 2 * margin() + 7) / 8 * 8;
        double[] diagonal = drift.get(0).diagonal().re;
        for (int n = 0; n < levels; n++) {
            diagonal[margin() + n] -= factor * shift / 2;
        }
        boolean several = false;
        for (List<LadderPolynomial> g : generator.jumps()) {
            List<Bands> orders = new ArrayList<>();
            for (LadderPolynomial part : g) {
                Bands bands = Bands.of(part, Math.sqrt(factor), first, levels, margin());
                bands = new Bands(bands.all().stream()
                        .filter(band -> !band.realIsZero() || !band.imaginaryIsZero())
                        .toList());
                orders.add(bands);
            }
            several |= orders.size() > 1 || orders.get(0).all().size() > 1;
            jumps.add(orders);
        }
        mirrored = several ? 2 * reach : reach;
        row = new Plane(stride);
        // ‖Σ |w_i| |σ|‖ ≤ √count ‖(Σ w_i²)^½ σ‖ over the products that make one element
        double[] sums = new double[levels];
        int count = 0;
        for (int j = 0; j < norms.length; j++) {
            norms[j] = 2 * drift.get(j).norm();
        }
        for (Bands.Band band : drift.get(0).all()) {
            // left and right meet in one product on the diagonal
            boolean fused = band.shift == 0;
            count += fused ? 1 : 2;
            for (int n = 0; n < levels; n++) {
                double size = band.size(margin() + n);
                sums[n] += (fused ? 4 : 2) * size * size;
            }
        }
        for (List<Bands> g : jumps) {
            for (int i = 0; i < g.size(); i++) {
                for (int j = 0; j < g.size(); j++) {
                    if (i + j < norms.length) {
                        norms[i + j] += g.get(i).norm() * g.get(j).norm();
                    }
                }
            }
            int own = g.get(0).all().size();
            count += own * own;
            for (int n = 0; n < levels; n++) {
                double sum = 0;
                for (Bands.Band band : g.get(0).all()) {
                    sum += band.size(margin() + n);
                }
                sums[n] += sum * sum * sum * sum;
            }
        }
        weights = new double[levels];
        double most = 0;
        for (int n = 0; n < levels; n++) {
            most = Math.max(most, sums[n]);
            weights[n] = most;
        }
        terms = U * (count + ROUNDINGS) * Math.sqrt(count);
    }

    private int at(int m, int n) {
        return (m + margin()) * stride + margin() + n;
    }

    @Override
    Plane plane() {
        return new Plane((levels + 2 * margin()) * stride);
    }

    @Override
    void apply(Plane[] c, int order, int most, Plane out) {
        for (int m = low; m < levels + reach; m++) {
            int o = at(m, low);
            int length = m - low + 1;
            boolean inside = m >= 0 && m < levels;
            for (int j = 0; j <= Math.min(Math.min(order, most), drift.size() - 1); j++) {
                Plane y = c[order - j];
                for (Bands.Band band : drift.get(j).all()) {
                    if (band.shift == 0) {
                        if (inside) {
                            int i = margin() + m;
                            Rows.diagonal(
                                    out, o, y, o, length, band.re[i], band.im[i], band.re, band.im, margin() + low);
                        }
                        continue;
                    }
                    left(band, y, m, out, o, at(m - band.shift, low), length);
                    if (inside) {
                        Rows.times(out, o, y, o - band.shift, length, 1, 0, band, margin() + low - band.shift);
                    }
                }
            }
            for (List<Bands> g : jumps) {
                jump(g, c, order, most, m, out, o, length);
            }
        }
    }

    /** out row += w_b(m − b) · row m − b of y. */
    private void left(Bands.Band band, Plane y, int m, Plane out, int o, int x, int length) {
        int i = m - band.shift;
        if (i >= 0 && i < levels) {
            double re = band.re[margin() + i];
            double im = band.im[margin() + i];
            if (re != 0 || im != 0) {
                Rows.add(out, o, y, x, length, re, im);
            }
        }
    }

    private void jump(List<Bands> g, Plane[] c, int order, int most, int m, Plane out, int o, int length) {
        if (g.size() == 1 && g.get(0).all().size() == 1) {
            Bands.Band band = g.get(0).all().get(0);
            int i = m - band.shift;
            if (i >= 0 && i < levels) {
                double re = band.re[margin() + i];
                double im = band.im[margin() + i];
                int x = at(i, low - band.shift);
                Rows.times(out, o, c[order], x, length, re, im, band, margin() + low - band.shift);
            }
            return;
        }
        // (G σ)_k row by row, then times G†
        for (int k = Math.max(0, order - Math.min(most, g.size() - 1)); k <= order; k++) {
            int wide = Math.min(length + 2 * reach, stride);
            row.clear(0, wide);
            for (int j = 0; j <= Math.min(Math.min(k, most - (order - k)), g.size() - 1); j++) {
                for (Bands.Band band : g.get(j).all()) {
                    left(band, c[k - j], m, row, 0, at(m - band.shift, low - reach), wide);
                }
            }
            for (Bands.Band band : g.get(order - k).all()) {
                Rows.times(out, o, row, reach - band.shift, length, 1, 0, band, margin() + low - band.shift);
            }
        }
    }

    @Override
    void tidy(Plane y) {
        int from = at(-reach, -margin());
        y.clear(from, at(0, -margin()));
        y.clear(at(levels, -margin()), at(levels + reach, -margin()));
        for (int m = 0; m < levels; m++) {
            y.clear(at(m, -margin()), at(m, 0));
            int end = Math.min(mirrored, levels - 1 - m);
            for (int k = 1; k <= end; k++) {
                int here = at(m, m + k);
                int there = at(m + k, m);
                y.re[here] = y.re[there];
                y.im[here] = -y.im[there];
            }
        }
    }

    @Override
    double rank() {
        return Math.sqrt(levels);
    }

    @Override
    double size(Plane y) {
        double sum = 0;
        double heavy = 0;
        for (int m = 0; m < levels; m++) {
            double squares = row(y, m);
            sum += squares;
            heavy += weights[m] * squares;
        }
        weighted = heavy;
        return Math.sqrt(sum);
    }

    @Override
    void copy(Plane from, Plane to) {
        for (int m = 0; m < levels; m++) {
            int length = Math.min(m + 1 + mirrored, levels);
            System.arraycopy(from.re, at(m, 0), to.re, at(m, 0), length);
            System.arraycopy(from.im, at(m, 0), to.im, at(m, 0), length);
        }
    }

    /** Squares of row m and of its mirror image, the element on the diagonal once. */
    private double row(Plane y, int m) {
        double last = y.re[at(m, m)];
        return 2 * Rows.squares(y, at(m, 0), m) + last * last;
    }

    @Override
    double rounding() {
        return terms * Math.sqrt(weighted);
    }

    @Override
    void border(Plane y, double[] belowAndAbove) {
        double above = 0;
        double corner = 0;
        for (int m = levels; m < levels + reach; m++) {
            above += Rows.squares(y, at(m, 0), levels);
            corner += 2 * Rows.squares(y, at(m, levels), m - levels + 1);
        }
        double below = 0;
        double lower = 0;
        if (low < 0) {
            for (int m = 0; m < levels; m++) {
                below += Rows.squares(y, at(m, low), reach);
            }
            for (int m = low; m < 0; m++) {
                lower += 2 * Rows.squares(y, at(m, low), m - low + 1);
            }
            for (int m = levels; m < levels + reach; m++) {
                corner += 2 * Rows.squares(y, at(m, low), reach);
            }
        }
        // ‖B‖₁ ≤ √rows ‖B‖_F; B stands twice, beside and below the window
        double twice = 2 * Math.sqrt(reach);
        belowAndAbove[0] = twice * Math.sqrt(below) + Math.sqrt(2.0 * reach * lower);
        belowAndAbove[1] = twice * Math.sqrt(above) + Math.sqrt(2.0 * reach * corner);
    }

    @Override
    List<Outside> outside() {
        double twice = 2 * Math.sqrt(reach);
        double corner = Math.sqrt(2.0 * reach);
        int above = reach * levels;
        int square = reach * (reach + 1) / 2;
        List<Outside> all = new ArrayList<>();
        int at = 0;
        all.add(new Outside(at, at += above, twice, false));
        all.add(new Outside(at, at += square, corner, false));
        if (low < 0) {
            all.add(new Outside(at, at += above, twice, true));
            all.add(new Outside(at, at += square, corner, true));
            all.add(new Outside(at, at + reach * reach, corner, false));
        }
        return all;
    }

    @Override
    void takeOutside(Plane y, double[] re, double[] im) {
        int at = 0;
        for (int m = levels; m < levels + reach; m++) {
            at = take(y, at(m, 0), levels, 1, re, im, at);
        }
        for (int m = levels; m < levels + reach; m++) {
            at = take(y, at(m, levels), m - levels + 1, Math.sqrt(2), re, im, at);
        }
        if (low < 0) {
            for (int m = 0; m < levels; m++) {
                at = take(y, at(m, low), reach, 1, re, im, at);
            }
            for (int m = low; m < 0; m++) {
                at = take(y, at(m, low), m - low + 1, Math.sqrt(2), re, im, at);
            }
            for (int m = levels; m < levels + reach; m++) {
                at = take(y, at(m, low), reach, Math.sqrt(2), re, im, at);
            }
        }
    }

    private static int take(Plane y, int from, int count, double grown, double[] re, double[] im, int at) {
        for (int i = 0; i < count; i++) {
            re[at + i] = grown * y.re[from + i];
            im[at + i] = grown * y.im[from + i];
        }
        return at + count;
    }

    @Override
    double roundings() {
        return terms;
    }

    @Override
    void accumulate(Plane y, double c, Plane out) {
        for (int m = 0; m < levels; m++) {
            Rows.real(out.re, at(m, 0), y.re, at(m, 0), m + 1, c);
            Rows.real(out.im, at(m, 0), y.im, at(m, 0), m + 1, c);
        }
    }

    @Override
    void scale(Plane y, double re, double im) {
        for (int m = 0; m < levels; m++) {
            for (int i = at(m, 0); i <= at(m, m); i++) {
                y.re[i] *= re;
                y.im[i] *= re;
            }
        }
    }

    @Override
    double[] lowering(Plane y, int k) {
        double re = 0;
        double im = 0;
        for (int n = 0; n + k < levels; n++) {
            re += root(n, k) * y.re[at(n + k, n)];
            im += root(n, k) * y.im[at(n + k, n)];
        }
        return new double[] {re, im};
    }

    @Override
    void turn(Plane y, double theta) {
        for (int m = 0; m < levels; m++) {
            for (int n = 0; n <= m; n++) {
                double c = Math.cos(theta * (m - n));
                double s = Math.sin(theta * (m - n));
                int i = at(m, n);
                double re = y.re[i];
                y.re[i] = c * re - s * y.im[i];
                y.im[i] = c * y.im[i] + s * re;
            }
        }
        tidy(y);
    }

    @Override
    double quanta(Plane y) {
        double sum = 0;
        for (int n = 0; n < levels; n++) {
            sum += (first + n) * y.re[at(n, n)];
        }
        return sum;
    }

    @Override
    void moveTo(Plane y, Equation other, Plane target) {
        DensityEquation there = (DensityEquation) other;
        long from = Math.max(first, there.first);
        long to = Math.min(first + levels, there.first + there.levels);
        for (long m = from; m < to; m++) {
            int length = (int) (m - from) + 1;
            int source = at((int) (m - first), (int) (from - first));
            int goal = there.at((int) (m - there.first), (int) (from - there.first));
            System.arraycopy(y.re, source, target.re, goal, length);
            System.arraycopy(y.im, source, target.im, goal, length);
        }
        there.tidy(target);
    }

    @Override
    double edge(Plane y, boolean below, int count) {
        double beside = 0;
        double corner = 0;
        if (below) {
            for (int m = 0; m < levels; m++) {
                double squares = Rows.squares(y, at(m, 0), Math.min(m + 1, count));
                if (m < count) {
                    corner += 2 * squares;
                } else {
                    beside += squares;
                }
            }
        } else {
            int from = levels - count;
            for (int m = from; m < levels; m++) {
                beside += Rows.squares(y, at(m, 0), from);
                corner += 2 * Rows.squares(y, at(m, from), m - from + 1);
            }
        }
        return 2 * Math.sqrt(count * beside) + Math.sqrt(count * corner);
    }

    /** Copies the lower triangle out, packed by rows; the diagonal is real. */
    void unload(Plane y, double[] re, double[] im) {
        for (int m = 0; m < levels; m++) {
            System.arraycopy(y.re, at(m, 0), re, m * (m + 1) / 2, m + 1);
            System.arraycopy(y.im, at(m, 0), im, m * (m + 1) / 2, m);
        }
    }

    /** Puts a lower triangle in, packed by rows. */
    void load(double[] re, double[] im, Plane y) {
        for (int m = 0; m < levels; m++) {
            System.arraycopy(re, m * (m + 1) / 2, y.re, at(m, 0), m + 1);
            System.arraycopy(im, m * (m + 1) / 2, y.im, at(m, 0), m);
        }
        tidy(y);
    }
}
