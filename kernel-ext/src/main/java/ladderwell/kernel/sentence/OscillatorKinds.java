package ladderwell.kernel.sentence;

import static ladderwell.quantity.Kind.ANGULAR_FREQUENCY;
import static ladderwell.quantity.Kind.CYCLE_FREQUENCY;
import static ladderwell.quantity.Kind.ENERGY;
import static ladderwell.quantity.Kind.LENGTH;
import static ladderwell.quantity.Kind.MASS;
import static ladderwell.quantity.Kind.TEMPERATURE;
import static ladderwell.quantity.Kind.WAVENUMBER;

import java.util.Arrays;

/** The kinds of oscillator, as the table of the language lists them. */
final class OscillatorKinds {
    private static final Key MASS_KEY = Key.quantity("mass", "mass of the particle", MASS);
    private static final Key NATURAL =
            Key.of("natural", Form.FLAG, "", "natural units: values are plain numbers, without units");
    private static final Key WIDTH = Key.quantity("width", "full width L, from wall to wall", LENGTH);

    private static final NounKind HARMONIC = NounKind.of(
                    "harmonic",
                    "harmonic oscillator",
                    "the motion of a trapped ion, a cavity mode, a small vibration: levels evenly spaced",
                    "H = p²/2m + mω²x²/2,  E_n = ħω(n + ½)")
            .keys(
                    MASS_KEY,
                    Key.quantity(
                                    "frequency",
                                    "cycle frequency ν in Hz, or angular frequency ω in rad/s or /s",
                                    CYCLE_FREQUENCY,
                                    ANGULAR_FREQUENCY)
                            .formula("ω = 2πν for ν in Hz; a rate in rad/s or /s is ω as it stands"),
                    Key.quantity("wavenumber", "wavenumber ν̃ = 1/λ of the transition between neighbours", WAVENUMBER)
                            .formula("ω = 2πcν̃"),
                    Key.quantity("spacing", "spacing of the levels as an energy", ENERGY)
                            .formula("ω = E/ħ"),
                    NATURAL.formula("ħ = m = ω = 1"))
            .ways(
                    Way.of("mass", "frequency"),
                    Way.of("mass", "wavenumber"),
                    Way.of("mass", "spacing"),
                    Way.of("natural"));

    private static final NounKind BOX = NounKind.of(
                    "box",
                    "box",
                    "a particle between two walls that nothing passes",
                    "V = 0 for |x| < L/2, infinite outside,  E_n = π²ħ²(n + 1)²/2mL²")
            .alias("infinite well")
            .keys(MASS_KEY, WIDTH, NATURAL.formula("ħ = m = L = 1"))
            .ways(Way.of("mass", "width"), Way.of("natural"));

    private static final NounKind FINITE_WELL = NounKind.of(
                    "finite well",
                    "finite well",
                    "a particle in a square well of finite depth, such as an electron in a quantum well",
                    "V = 0 for |x| < L/2, V₀ outside")
            .keys(
                    MASS_KEY,
                    WIDTH,
                    Key.quantity("depth", "depth V₀ of the well", ENERGY),
                    NATURAL.formula("ħ = m = L = 1; the depth is counted in ħ²/mL²"))
            .ways(Way.of("mass", "width", "depth"), Way.of("natural", "depth"));

    private static final Key DEPTH = Key.quantity("depth", "depth of the well", ENERGY, WAVENUMBER, TEMPERATURE);
    private static final Key FREQUENCY =
            Key.quantity("frequency", "frequency of small swings", CYCLE_FREQUENCY, ANGULAR_FREQUENCY);

    private static final NounKind POTENTIAL = NounKind.of(
                    "potential",
                    "potential",
                    "a particle in a potential given by a formula in x, and in t where it moves, with parameters that are given as"
                            + " keys",
                    "numbers with units, + − * / ^, exp log sin cos tan sinh cosh tanh sqrt abs sign step min max gauss"
                            + " if(…); x, t, m, pi, hbar")
            .argument(Key.of("formula", Form.TEXT, "\"a*x^4 - b*x^2\"", "V(x) or V(x, t) as a formula"))
            .withParameters()
            .keys(
                    MASS_KEY,
                    Key.quantity("left", "a wall at this x; V need have no value beyond", LENGTH)
                            .standard("none"),
                    Key.quantity("right", "a wall at this x; V need have no value beyond", LENGTH)
                            .standard("none"),
                    Key.quantity(
                                    "scale",
                                    "for a potential that need not bind: free, falling, over a barrier; what lengths are"
                                            + " counted in, such as the size of the packet",
                                    LENGTH)
                            .standard("none, the potential binds"),
                    NATURAL.formula("ħ = m = 1"))
            .ways(
                    Way.of("mass").with("left", "right", "scale"),
                    Way.of("natural").with("left", "right", "scale"));

    private static final NounKind QUARTIC = NounKind.of(
                    "quartic",
                    "quartic oscillator",
                    "a harmonic oscillator with a stiffening, or the quartic alone",
                    "V = mω²x²/2 + βx⁴")
            .keys(
                    MASS_KEY,
                    FREQUENCY.standard("0, the quartic alone"),
                    Key.of("coefficient", Form.AMOUNT, "0.1 eV/angstrom^4", "coefficient β of x⁴"),
                    NATURAL.formula("ħ = m = 1"))
            .ways(
                    Way.of("mass", "coefficient").with("frequency"),
                    Way.of("natural", "coefficient").with("frequency"));

    private static final NounKind SEXTIC = NounKind.of(
                    "sextic", "sextic oscillator", "a particle held by a sixth power", "V = γx⁶")
            .keys(
                    MASS_KEY,
                    Key.of("coefficient", Form.AMOUNT, "0.1 eV/angstrom^6", "coefficient γ of x⁶"),
                    NATURAL.formula("ħ = m = 1"))
            .ways(Way.of("mass", "coefficient"), Way.of("natural", "coefficient"));

    private static final NounKind DOUBLE_WELL = NounKind.of(
                    "double well",
                    "double well",
                    "two equal wells with a barrier between them: tunnelling",
                    "V = B((2x/s)² − 1)²")
            .keys(
                    MASS_KEY,
                    Key.quantity("separation", "distance s of the two minima", LENGTH),
                    Key.quantity("barrier", "height B of the barrier", ENERGY, WAVENUMBER, TEMPERATURE),
                    NATURAL.formula("ħ = m = 1"))
            .ways(Way.of("mass", "separation", "barrier"), Way.of("natural", "separation", "barrier"));

    private static final NounKind MORSE = NounKind.of(
                    "morse",
                    "Morse oscillator",
                    "the vibration of a molecule with two atoms, up to dissociation",
                    "V = D(1 − e^{−ax})²,  E_n = ħωₑ(n + ½) − ħωₑxₑ(n + ½)²")
            .keys(
                    MASS_KEY.formula("the reduced mass of a molecule"),
                    Key.quantity("wavenumber", "ωₑ as a wavenumber", WAVENUMBER),
                    Key.quantity("frequency", "ωₑ as a frequency", CYCLE_FREQUENCY, ANGULAR_FREQUENCY),
                    Key.quantity("anharmonicity", "ωₑxₑ", WAVENUMBER, CYCLE_FREQUENCY, ANGULAR_FREQUENCY, ENERGY),
                    DEPTH.formula("D, from the minimum to the edge of dissociation"),
                    Key.of("range", Form.AMOUNT, "1.9 /angstrom", "a, the inverse of the range"),
                    NATURAL.formula("ħ = m = 1"))
            .ways(
                    Way.of("mass", "wavenumber", "anharmonicity"),
                    Way.of("mass", "frequency", "anharmonicity"),
                    Way.of("mass", "depth", "range"),
                    Way.of("natural", "depth", "range"));

    private static final NounKind POSCHL_TELLER = NounKind.of(
                    "poschl-teller",
                    "Pöschl–Teller well",
                    "a smooth well that ends, with levels in closed form",
                    "V = −D/cosh²(x/w)")
            .alias("pöschl-teller")
            .keys(MASS_KEY, DEPTH, Key.quantity("width", "width w", LENGTH), NATURAL.formula("ħ = m = 1"))
            .ways(Way.of("mass", "depth", "width"), Way.of("natural", "depth", "width"));

    private static final NounKind PENDULUM = NounKind.of(
                    "pendulum", "pendulum", "a mass on a rigid arm, the coordinate x its angle", "V = mr²ω²(1 − cos x)")
            .keys(MASS_KEY, Key.quantity("arm", "arm r", LENGTH), FREQUENCY, NATURAL.formula("ħ = m = r = 1"))
            .ways(Way.of("mass", "arm", "frequency"), Way.of("natural", "frequency"));

    private static final NounKind LATTICE = NounKind.of(
                    "lattice",
                    "site of a lattice",
                    "one site of an optical lattice, periodic, at quasi-momentum 0",
                    "V = D sin²(2πx/λ)")
            .keys(
                    MASS_KEY,
                    DEPTH.formula("D, from the bottom to the top"),
                    Key.quantity("wavelength", "wavelength λ of the light; the sites are λ/2 apart", LENGTH),
                    NATURAL.formula("ħ = m = 1"))
            .ways(Way.of("mass", "depth", "wavelength"), Way.of("natural", "depth", "wavelength"));

    private static final NounKind JUNCTION = NounKind.of(
                    "junction",
                    "superconducting junction",
                    "a junction shunted by a capacitance, the coordinate x its phase",
                    "H = 4E_C(n − n_g)² + E_J(1 − cos x)")
            .keys(
                    Key.quantity("charging", "charging energy E_C, as an energy or E_C/h", CYCLE_FREQUENCY, ENERGY),
                    Key.quantity("josephson", "Josephson energy E_J, as an energy or E_J/h", CYCLE_FREQUENCY, ENERGY),
                    Key.of("charge", Form.NUMBER, "0.25", "offset charge n_g in pairs")
                            .formula("φ(x + 2π) = e^{2πi n_g} φ(x)")
                            .standard("0"),
                    NATURAL.formula("energies in 8E_C"))
            .ways(
                    Way.of("charging", "josephson").with("charge"),
                    Way.of("natural", "charging", "josephson").with("charge"));

    private static final NounKind LINEAR = NounKind.of(
                    "linear with wall",
                    "linear potential with a wall",
                    "a constant force towards a wall at x = 0: a bouncing particle, a triangular well",
                    "V = Fx for x > 0")
            .keys(MASS_KEY, Key.of("force", Form.AMOUNT, "5 meV/nm", "the force F"), NATURAL.formula("ħ = m = 1"))
            .ways(Way.of("mass", "force"), Way.of("natural", "force"));

    private static final NounKind LENNARD_JONES = NounKind.of(
                    "lennard-jones",
                    "Lennard-Jones potential",
                    "two atoms that attract from afar and repel when near",
                    "V = 4ε((σ/x)¹² − (σ/x)⁶), or other powers")
            .keys(
                    MASS_KEY,
                    DEPTH.formula("ε"),
                    Key.quantity("sigma", "distance σ at which V crosses 0", LENGTH),
                    Key.count("repulsion", 2, 60, "12", "power of the repulsion")
                            .standard("12"),
                    Key.count("attraction", 1, 59, "6", "power of the attraction")
                            .standard("6"),
                    NATURAL.formula("ħ = m = 1"))
            .ways(
                    Way.of("mass", "depth", "sigma").with("repulsion", "attraction"),
                    Way.of("natural", "depth", "sigma").with("repulsion", "attraction"));

    private static final NounKind TABULATED = NounKind.of(
                    "tabulated",
                    "tabulated potential",
                    "a potential read from a table of points, joined without overshoot",
                    "columns x, V and, if known, the uncertainty of V; units in the heads, as in \"x / nm\"")
            .argument(Key.of("file", Form.TEXT, "\"points.csv\"", "a file of comma separated values"))
            .keys(MASS_KEY, NATURAL.formula("ħ = m = 1"))
            .ways(Way.of("mass"), Way.of("natural"));

    private OscillatorKinds() {}

    static NounKind[] all() {
        NounKind[] modes = ModeKinds.all();
        NounKind[] wells = {
            HARMONIC,
            BOX,
            FINITE_WELL,
            POTENTIAL,
            QUARTIC,
            SEXTIC,
            DOUBLE_WELL,
            MORSE,
            POSCHL_TELLER,
            PENDULUM,
            LATTICE,
            JUNCTION,
            LINEAR,
            LENNARD_JONES,
            TABULATED
        };
        NounKind[] all = Arrays.copyOf(wells, wells.length + modes.length);
        System.arraycopy(modes, 0, all, wells.length, modes.length);
        return all;
    }
}
