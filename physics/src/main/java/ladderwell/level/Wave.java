package ladderwell.level;

import org.jspecify.annotations.Nullable;

/**
 * One solved wave function on the cells of a mesh, scaled as {@link Shot} left it.
 *
 * @param head value at the left end of the first cell, from where it decays; 0 at a wall
 * @param tail the same at the right end
 * @param near factor of the series at a singular left end
 */
record Wave(
        Cell[] cells,
        @Nullable SingularEdge edge,
        double e,
        int from,
        int to,
        double[] values,
        double[] slopes,
        double head,
        double tail,
        double near) {

    double left() {
        return cells[from].a;
    }

    double right() {
        return cells[to - 1].b;
    }

    /** Mean potential of the cell at x. */
    double mean(double x) {
        return cells[x <= left() ? from : x >= right() ? to - 1 : cell(x)].mean;
    }

    /** The cell at x, sought from a place near it. */
    int cell(double x, int near) {
        if (near >= from && near < to && cells[near].a <= x) {
            if (near + 1 >= to || x < cells[near + 1].a) {
                return near;
            }
            if (near + 2 >= to || x < cells[near + 2].a) {
                return near + 1;
            }
        }
        return cell(x);
    }

    private int cell(double x) {
        int low = from;
        int high = to - 1;
        while (low < high) {
            int middle = (low + high + 1) >>> 1;
            if (cells[middle].a <= x) {
                low = middle;
            } else {
                high = middle - 1;
            }
        }
        return low;
    }

    /** {φ, φ′} at x into out. */
    void at(double x, double[] g, double[] out) {
        if (x >= right()) {
            Cell last = cells[to - 1];
            double kappa = Math.sqrt(Math.max(0, last.mean - e));
            double value = x == right() || tail != 0 ? tail * Math.exp(-kappa * (x - right())) : 0;
            out[0] = value;
            out[1] = -kappa * value;
            return;
        }
        if (x < left()) {
            if (edge != null && from == 0) {
                double tau = 1 - (left() - x) / edge.width();
                if (tau <= 0) {
                    out[0] = 0;
                    out[1] = 0;
                    return;
                }
                double[] q = edge.at(e, tau);
                out[0] = near * q[0];
                out[1] = near * q[1];
                return;
            }
            double kappa = Math.sqrt(Math.max(0, cells[from].mean - e));
            double value = head == 0 ? 0 : head * Math.exp(-kappa * (left() - x));
            out[0] = value;
            out[1] = kappa * value;
            return;
        }
        int low = cell(x);
        Cell c = cells[low];
        c.at((x - c.centre) / c.r, c.z(e), values[low], slopes[low], g, out);
        out[1] /= c.r;
    }

    /** ∫ |v − fit| φ², to first order the error of e by the fit. */
    double fitError() {
        double sum = 0;
        for (int i = from; i < to; i++) {
            Cell c = cells[i];
            double square = values[i] * values[i] + slopes[i] * slopes[i] / Math.max(1, -c.z(e));
            sum += c.fit * square * 2 * c.r;
        }
        return sum;
    }
}
