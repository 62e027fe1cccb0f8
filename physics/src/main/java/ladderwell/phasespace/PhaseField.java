package ladderwell.phasespace;

import ladderwell.evidence.Bound;

/** A Wigner or Husimi function on a grid. @shape [position][momentum] @units scaled: per unit of action ħ */
public final class PhaseField {
    private final Kind kind;
    private final PhaseGrid grid;
    private final double[][] values;
    private final Bound bound;

    /** What the values are of. */
    public enum Kind {
        /** W, negative in places. */
        WIGNER,
        /** Q, nowhere negative but for rounding. */
        HUSIMI
    }

    /**
     * A number read from the field.
     *
     * @param value the number
     * @param bound how far it can be off
     */
    public record Reading(double value, Bound bound) {}

    PhaseField(Kind kind, PhaseGrid grid, double[][] values, Bound bound) {
        this.kind = kind;
        this.grid = grid;
        this.values = values;
        this.bound = bound;
    }

    /** The same values at the points of another grid. */
    PhaseField on(PhaseGrid other, Bound there) {
        return new PhaseField(kind, other, values, there);
    }

    /** Wigner or Husimi. */
    public Kind kind() {
        return kind;
    }

    /** The points. */
    public PhaseGrid grid() {
        return grid;
    }

    /** The value at the i-th position and j-th momentum. */
    public double value(int i, int j) {
        return values[i][j];
    }

    /** The values at one position, the array itself for hot loops; read only. */
    public double[] row(int i) {
        return values[i];
    }

    /** How far any value can be off. */
    public Bound bound() {
        return bound;
    }

    /** The largest |value|, for a scale. */
    public double peak() {
        double peak = 0;
        for (double[] row : values) {
            for (double value : row) {
                peak = Math.max(peak, Math.abs(value));
            }
        }
        return peak;
    }

    /** The least value. */
    public double least() {
        double least = Double.POSITIVE_INFINITY;
        for (double[] row : values) {
            for (double value : row) {
                least = Math.min(least, value);
            }
        }
        return least;
    }

    /**
     * The sum over momenta at each position: the density in position, where the grid covers the state's momenta in steps below π over the width of
     * the state in position.
     *
     * @shape [positions]
     */
    public double[] overMomenta() {
        double[] density = new double[grid.nx()];
        for (int i = 0; i < density.length; i++) {
            double sum = 0;
            for (double value : values[i]) {
                sum += value;
            }
            density[i] = sum * grid.stepP();
        }
        return density;
    }

    /** The sum over positions at each momentum: the density in momentum, likewise. @shape [momenta] */
    public double[] overPositions() {
        double[] density = new double[grid.np()];
        for (double[] row : values) {
            for (int j = 0; j < density.length; j++) {
                density[j] += row[j] * grid.stepX();
            }
        }
        return density;
    }

    /** The sum over all points times the area of a cell: 1 where the grid covers the state and resolves it. */
    public double total() {
        double sum = 0;
        for (double[] row : values) {
            double line = 0;
            for (double value : row) {
                line += value;
            }
            sum += line;
        }
        return sum * grid.cell();
    }

    /**
     * ∫|W| dx dp − 1 over the grid: 0 where W is nowhere negative; half of it is the volume of the negative parts. Along each position |W| is
     * integrated between its zeros, found on cubics; the error is estimated from what every second position gives, and from the values' own.
     */
    public Reading negativity() {
        return Negativity.of(this);
    }
}
