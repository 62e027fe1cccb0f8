package ladderwell.potential;

import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import ladderwell.formula.Amount;
import ladderwell.formula.Dimension;
import ladderwell.formula.Formula;
import ladderwell.formula.Parameters;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;
import tech.tablesaw.api.Table;

/**
 * A potential V(x) of one coordinate, constant in time. Immutable.
 *
 * @units x in the length of {@link #scale}, V in ħ²/(m length²)
 */
public sealed interface Potential
        permits CosinePotential,
                FormulaPotential,
                LennardJonesPotential,
                MorsePotential,
                PolynomialPotential,
                PoschlTellerPotential,
                TabulatedPotential {

    /** V(x); +∞ beyond the domain. */
    double value(double x);

    /** V at many points; {@code out} is as long as {@code x} and may be {@code x}. */
    default void values(double[] x, double[] out) {
        for (int i = 0; i < x.length; i++) {
            out[i] = value(x[i]);
        }
    }

    /** dV/dx inside the domain, away from breaks. */
    double slope(double x);

    /** Points inside the domain where V or one of its derivatives may jump, ascending; a copy. */
    default double[] breaks() {
        return new double[0];
    }

    /** Left end of the domain: a wall, or −∞. */
    default double left() {
        return Double.NEGATIVE_INFINITY;
    }

    /** Right end of the domain: a wall, or +∞. */
    default double right() {
        return Double.POSITIVE_INFINITY;
    }

    /** Coefficients of 1, x, x², …, where V is a polynomial; a copy. */
    default Optional<double[]> polynomial() {
        return Optional.empty();
    }

    /** True if V(−x) = V(x): by construction, or for a formula at all of several hundred points within rounding. */
    boolean isEven();

    /** Where to start: a position of the least value (one of several equal ones), or the end at which V falls to −∞. */
    double minimum();

    /** Energy above which nothing is bound: the lower of the limits of V at its open ends; +∞ where V confines everything. */
    default double edge() {
        return Double.POSITIVE_INFINITY;
    }

    /** Period of V where x is an angle or a place on a lattice, and the domain one period; empty elsewhere. */
    default OptionalDouble period() {
        return OptionalDouble.empty();
    }

    /** Bound on what is not known of V at any point of the domain; every level is uncertain by as much (Weyl). */
    default double uncertainty() {
        return 0;
    }

    /** The energy of level n where theory gives it in closed form. */
    default OptionalDouble closedForm(int n) {
        return OptionalDouble.empty();
    }

    /** The number of bound levels where theory gives it. */
    default OptionalInt levels() {
        return OptionalInt.empty();
    }

    /** False where it was declared as one that need not confine anything; such a potential has no levels here. */
    default boolean confines() {
        return true;
    }

    /** What 1 means. */
    Scale scale();

    /** The potential in one line, with its parameters as they were given. */
    String text();

    /** V = Σ coefficients[k] x^k in natural units. */
    static Potential polynomial(double... coefficients) {
        return PolynomialPotential.of(Scale.natural(), coefficients, "polynomial");
    }

    /**
     * Duffing's oscillator V = mω²x²/2 + βx⁴.
     *
     * @param frequency ω of small swings, as a frequency, a wavenumber or an energy
     * @param quartic β ≥ 0, such as Amount.read("0.1 eV/angstrom^4")
     */
    static Potential quartic(Quantity mass, Quantity frequency, Amount quartic) {
        Given given = Given.mass(mass);
        double omega = given.omega("frequency", frequency);
        double beta = given.positive("quartic coefficient", quartic, Dimension.of(1, -2, -2));
        Scale scale = given.isNatural() ? Scale.natural() : Scale.harmonic(given.mass(), omega);
        double factor = given.isNatural() ? omega * omega / 2 : 0.5;
        return PolynomialPotential.of(
                scale,
                new double[] {0, 0, factor, 0, given.scaled(beta, 4, scale)},
                "m w^2 x^2/2 + b x^4, w from " + frequency.plain() + ", b = " + quartic);
    }

    /** V = βx⁴; lengths in the natural one, (ħ²/(mβ))^(1/6). */
    static Potential quartic(Quantity mass, Amount quartic) {
        return power(mass, "quartic coefficient", quartic, 4);
    }

    /** V = γx⁶; lengths in (ħ²/(mγ))^(1/8). */
    static Potential sextic(Quantity mass, Amount sextic) {
        return power(mass, "sextic coefficient", sextic, 6);
    }

    private static Potential power(Quantity mass, String name, Amount amount, int power) {
        Given given = Given.mass(mass);
        double coefficient = given.positive(name, amount, Dimension.of(1, 2 - power, -2));
        Scale scale = given.scale(given.length(coefficient, power));
        double[] coefficients = new double[power + 1];
        coefficients[power] = given.scaled(coefficient, power, scale);
        return PolynomialPotential.of(scale, coefficients, "c x^" + power + ", c = " + amount);
    }

    /**
     * The symmetric double well V = B((2x/s)² − 1)²: minima of 0 at ±s/2, a barrier of height B at 0.
     *
     * @param separation s of the two minima
     * @param barrier B, an energy, a wavenumber or a temperature
     */
    static Potential doubleWell(Quantity mass, Quantity separation, Quantity barrier) {
        Given given = Given.mass(mass);
        double half = given.positive("separation", Amount.of(separation), Dimension.LENGTH) / 2;
        double height = given.positive("barrier", Amount.of(barrier), Dimension.ENERGY);
        // curvature 8B/(s/2)^2 at a minimum
        Scale scale = given.isNatural()
                ? Scale.natural()
                : Scale.harmonic(given.mass(), Math.sqrt(8 * height / given.mass()) / half);
        double b = given.scaled(height, 0, scale);
        double q = scale.length() / half * (scale.length() / half);
        return PolynomialPotential.of(
                scale,
                new double[] {b, 0, -2 * b * q, 0, b * q * q},
                "B((2x/s)^2 - 1)^2, s = " + separation.plain() + ", B = " + barrier.plain());
    }

    /**
     * A wall at x = 0 and a constant force towards it, V = Fx: a bouncing particle, a triangular well. Lengths in
     * (ħ²/(mF))^(1/3).
     *
     * @param force F, such as Amount.read("5 meV/nm")
     */
    static Potential linearWithWall(Quantity mass, Amount force) {
        Given given = Given.mass(mass);
        double f = given.positive("force", force, Dimension.FORCE);
        Scale scale = given.scale(given.length(f, 1));
        return new PolynomialPotential(
                new double[] {0, given.scaled(f, 1, scale)},
                0,
                Double.POSITIVE_INFINITY,
                scale,
                "F x for x > 0, wall at 0, F = " + force);
    }

    /**
     * Morse's potential D(1 − exp(−ax))², x from the equilibrium; lengths in 1/a.
     *
     * @param depth D, an energy, a wavenumber or a temperature
     * @param range a, such as Amount.read("1.9 /angstrom")
     */
    static Potential morse(Quantity mass, Quantity depth, Amount range) {
        Given given = Given.mass(mass);
        double d = given.positive("depth", Amount.of(depth), Dimension.ENERGY);
        double a = given.positive("range parameter", range, Dimension.LENGTH.power(-1));
        Scale scale = given.scale(1 / a);
        return new MorsePotential(
                given.scaled(d, 0, scale),
                a * scale.length(),
                scale,
                "D(1 - exp(-a x))^2, D = " + depth.plain() + ", a = " + range);
    }

    /**
     * Morse's potential from the constants of its levels, E = ħωₑ(n + ½) − ħωₑxₑ(n + ½)².
     *
     * @param harmonic ωₑ, as a wavenumber, a frequency or an energy
     * @param anharmonic ωₑxₑ, likewise
     */
    static Potential morseFromLevels(Quantity mass, Quantity harmonic, Quantity anharmonic) {
        Given given = Given.mass(mass);
        double we = given.omega("harmonic constant", harmonic);
        double wexe = given.omega("anharmonicity", anharmonic);
        double hbar = given.hbar();
        double a = Math.sqrt(2 * (given.mass() / hbar) * wexe);
        Scale scale = given.scale(1 / a);
        // D = ħωe²/(4 ωexe); in ħ²a²/m = 2ħωexe it is (ωe/ωexe)²/8
        double ratio = we / wexe;
        double depth = given.isNatural() ? we * ratio / 4 : ratio * ratio / 8;
        return new MorsePotential(
                depth,
                a * scale.length(),
                scale,
                "D(1 - exp(-a x))^2, we = " + harmonic.plain() + ", wexe = " + anharmonic.plain());
    }

    /**
     * Pöschl and Teller's potential −D/cosh²(x/w); lengths in w.
     *
     * @param depth D
     * @param width w
     */
    static Potential poschlTeller(Quantity mass, Quantity depth, Quantity width) {
        Given given = Given.mass(mass);
        double d = given.positive("depth", Amount.of(depth), Dimension.ENERGY);
        double w = given.positive("width", Amount.of(width), Dimension.LENGTH);
        Scale scale = given.scale(w);
        return new PoschlTellerPotential(
                given.scaled(d, 0, scale),
                scale.length() / w,
                scale,
                "-D/cosh(x/w)^2, D = " + depth.plain() + ", w = " + width.plain());
    }

    /**
     * A pendulum V = mr²ω²(1 − cos x) in its angle x.
     *
     * @param arm r, from the pivot to the point mass
     * @param frequency ω of small swings
     */
    static Potential pendulum(Quantity mass, Quantity arm, Quantity frequency) {
        Given given = Given.mass(mass);
        double r = given.positive("arm", Amount.of(arm), Dimension.LENGTH);
        double omega = given.omega("frequency", frequency);
        if (given.isNatural() && r != 1) {
            throw new IllegalArgumentException("in natural units the arm of a pendulum is 1, not " + r);
        }
        double inertia = given.mass() * r * r;
        // an angle is the coordinate: the moment of inertia stands for the mass, 1 rad for the length
        Scale scale = given.isNatural() ? Scale.natural() : Scale.turning(inertia);
        double height = inertia * omega / given.hbar() * (inertia * omega / given.hbar());
        return new CosinePotential(
                height, 1, scale, "m r^2 w^2 (1 - cos x), r = " + arm.plain() + ", w from " + frequency.plain());
    }

    /**
     * A site of an optical lattice, V = D sin²(2πx/λ); lengths in λ/2π.
     *
     * @param depth D
     * @param wavelength λ of the light; the sites are λ/2 apart
     */
    static Potential lattice(Quantity mass, Quantity depth, Quantity wavelength) {
        Given given = Given.mass(mass);
        double d = given.positive("depth", Amount.of(depth), Dimension.ENERGY);
        double k = 2 * Math.PI / given.positive("wavelength", Amount.of(wavelength), Dimension.LENGTH);
        Scale scale = given.scale(1 / k);
        return new CosinePotential(
                given.scaled(d, 0, scale) / 2,
                2 * k * scale.length(),
                scale,
                "D sin(2 pi x/L)^2, D = " + depth.plain() + ", L = " + wavelength.plain());
    }

    /**
     * A superconducting junction, H = 4E_C n² − E_J cos φ, measured from the bottom of the cosine: V = E_J(1 − cos φ), φ in
     * rad, energies in 8E_C.
     *
     * @param charging E_C, as an energy or as a frequency E_C/h
     * @param josephson E_J, likewise
     */
    static Potential junction(Quantity charging, Quantity josephson) {
        if ((charging.kind() == Kind.NUMBER) != (josephson.kind() == Kind.NUMBER)) {
            throw new IllegalArgumentException("give both energies of a junction with units, or neither");
        }
        boolean natural = charging.kind() == Kind.NUMBER;
        double ec = Given.anyOmega("charging energy", charging);
        double ej = Given.anyOmega("Josephson energy", josephson);
        // ħ²/m = 8 E_C at a length of 1 rad
        Scale scale = natural ? Scale.natural() : Scale.turning(Constants.HBAR / (8 * ec));
        return new CosinePotential(
                ej / (8 * ec),
                1,
                scale,
                "EJ(1 - cos x), EC = " + charging.plain() + ", EJ = " + josephson.plain()
                        + (natural ? ", energies in 8 EC" : ""));
    }

    /** Lennard-Jones's potential 4ε((σ/x)¹² − (σ/x)⁶), x &gt; 0. */
    static Potential lennardJones(Quantity mass, Quantity depth, Quantity sigma) {
        return lennardJones(mass, depth, sigma, 12, 6);
    }

    /**
     * Mie's generalisation Cε((σ/x)^p − (σ/x)^q) with the depth ε; lengths in σ.
     *
     * @param depth ε
     * @param sigma σ, where V crosses 0
     * @param repulsion p &gt; q
     * @param attraction q ≥ 1
     */
    static Potential lennardJones(Quantity mass, Quantity depth, Quantity sigma, int repulsion, int attraction) {
        Given given = Given.mass(mass);
        double e = given.positive("depth", Amount.of(depth), Dimension.ENERGY);
        double s = given.positive("sigma", Amount.of(sigma), Dimension.LENGTH);
        Scale scale = given.scale(s);
        return new LennardJonesPotential(
                given.scaled(e, 0, scale),
                s / scale.length(),
                repulsion,
                attraction,
                scale,
                "Lennard-Jones " + repulsion + "-" + attraction + ", depth " + depth.plain() + ", sigma "
                        + sigma.plain());
    }

    /**
     * Tabulated points joined by a monotone cubic spline (no overshoot between points); the domain ends with the table.
     *
     * @param lengthUnit unit of {@code x}; ONE in natural units
     * @param x at least 4 positions, ascending
     * @param energyUnit unit of {@code v} and {@code uncertainty}: an energy, a wavenumber, a temperature
     * @param v values
     * @param uncertainty of each value; empty where none is stated
     * @source F. N. Fritsch and R. E. Carlson, SIAM J. Numer. Anal. 17 (1980) 238; slopes: F. N. Fritsch and J. Butland, SIAM
     *     J. Sci. Stat. Comput. 5 (1984) 300
     */
    static Potential tabulated(
            Quantity mass, Unit lengthUnit, double[] x, Unit energyUnit, double[] v, double[] uncertainty) {
        return TabulatedPotential.of(Given.mass(mass), lengthUnit, x, energyUnit, v, uncertainty);
    }

    /**
     * Tabulated points from a table with columns for x, V and, if known, the uncertainty of V; in lab units the heads name the units:
     * "x / nm", "V / eV".
     *
     * @throws IllegalArgumentException naming the column, the row and what was expected
     */
    static Potential tabulated(Quantity mass, Table table) {
        return PointTable.potential(mass, table);
    }

    /**
     * A formula, with the mass known to it as {@code m}.
     *
     * @throws ladderwell.formula.FormulaException if the text is no energy
     */
    static Potential of(String text, Quantity mass, Parameters parameters) {
        Given given = Given.mass(mass);
        Parameters all = parameters.values().containsKey("m") ? parameters : parameters.with("m", Amount.of(mass));
        return of(given.isNatural() ? Formula.natural(text, all) : Formula.potential(text, all), mass);
    }

    /**
     * A formula on the whole axis. In lab units the length is where the potential has risen by the kinetic energy
     * ħ²/(2mℓ²) on average to both sides of its minimum; for a harmonic one that is √(ħ/mω).
     *
     * @throws IllegalArgumentException if V depends on time, is not bounded below, has no value somewhere or confines
     *     nothing
     */
    static Potential of(Formula formula, Quantity mass) {
        return FormulaPotential.of(formula, Given.mass(mass), Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
    }

    /**
     * A formula between two walls, or with one: an end of ±∞ is open.
     *
     * @param left left end, SI or natural; −∞ where open. V may be singular at an end
     * @param right right end, likewise
     */
    static Potential of(Formula formula, Quantity mass, double left, double right) {
        return FormulaPotential.of(formula, Given.mass(mass), left, right);
    }

    /**
     * A formula that need not confine anything, for packets: free, falling or inverted.
     *
     * @param length ℓ to scale by
     */
    static Potential open(Formula formula, Quantity mass, Quantity length) {
        Given given = Given.mass(mass);
        double l = given.positive("length", Amount.of(length), Dimension.LENGTH);
        return FormulaPotential.open(formula, given, given.scale(l));
    }
}
