package ladderwell.kernel.sentence;

import static ladderwell.quantity.Kind.ANGLE;
import static ladderwell.quantity.Kind.ANGULAR_FREQUENCY;
import static ladderwell.quantity.Kind.CYCLE_FREQUENCY;
import static ladderwell.quantity.Kind.TEMPERATURE;
import static ladderwell.quantity.Kind.TIME;

/** The kinds of oscillator that are modes on number states: nonlinear, driven, lossy. */
final class ModeKinds {
    private static final Key FREQUENCY = Key.quantity(
                    "frequency", "frequency of the mode: ν in Hz or ω in rad/s", CYCLE_FREQUENCY, ANGULAR_FREQUENCY)
            .formula("ω n in H/ħ");

    /** What may join every kind. */
    private static final Key[] COMMON = {
        rate("loss", "rate κ at which quanta are lost", "L = a; a linewidth in Hz counts 2π, a lifetime is 1/κ"),
        Key.of("quality", Form.NUMBER, "2e5", "quality factor Q in place of a loss")
                .formula("κ = ω/Q"),
        Key.of("thermal", Form.NUMBER, "0.02", "mean quanta n_th of the bath that takes the loss")
                .formula("loss κ(n_th + 1), gain κ n_th")
                .standard("0"),
        Key.quantity("temperature", "temperature of the bath in place of its quanta", TEMPERATURE)
                .formula("n_th = 1/(e^{ħω/kT} − 1)"),
        rate("gain", "rate of gain", "L = a†"),
        rate("dephasing", "rate of dephasing γ", "L = n; coherences of |m⟩ and |n⟩ decay at γ(m − n)²/2"),
        rate("pair loss", "rate at which pairs are lost", "L = a²"),
        Key.quantity("drive", "strength f of a drive", CYCLE_FREQUENCY, ANGULAR_FREQUENCY)
                .formula("f cos(ω_d t + φ)(a + a†), seen in the frame at ω_d: (f/2)(a† + a)"),
        Key.quantity("phase", "phase φ of the drive", ANGLE).standard("0 deg"),
        Key.quantity("parametric", "strength G of a two-quantum (parametric) pump", CYCLE_FREQUENCY, ANGULAR_FREQUENCY)
                .formula("G cos(ω_p t + φ)(a + a†)², seen in the frame at ω_p/2: (G/2)(a†² + a²)"),
        Key.quantity("pump frequency", "frequency ω_p of the pump", CYCLE_FREQUENCY, ANGULAR_FREQUENCY)
                .standard("twice the mode's"),
        Key.quantity("pump phase", "phase φ of the pump", ANGLE).standard("0 deg"),
        Key.quantity(
                        "frame",
                        "frequency of the frame that the motion is seen in; 0 Hz is the lab",
                        CYCLE_FREQUENCY,
                        ANGULAR_FREQUENCY)
                .standard("that of the drive, half the pump's, or of the mode where it is lossy; else the lab"),
        Key.of("natural", Form.FLAG, "", "natural units: values are plain numbers, without units")
                .formula("ħ = 1; times in 1/ω of the frequency given, or of 1")
    };

    private static final Key AT = Key.quantity(
                    "at", "frequency ω_d of the drive, behind its strength", CYCLE_FREQUENCY, ANGULAR_FREQUENCY)
            .standard("the mode's own");

    private static final NounKind KERR = kind(
            NounKind.of(
                    "kerr",
                    "Kerr mode",
                    "a cavity or circuit mode whose spacing changes from level to level; driven, pumped and lossy as it may be",
                    "H/ħ = ω n + (K/2) n(n − 1)"),
            new String[] {"kerr"},
            FREQUENCY,
            Key.quantity(
                            "kerr",
                            "Kerr strength K, the change of spacing from one level to the next",
                            CYCLE_FREQUENCY,
                            ANGULAR_FREQUENCY)
                    .formula("(K/2) a†²a²"));

    private static final NounKind DUFFING = kind(
            NounKind.of(
                    "duffing",
                    "Duffing mode",
                    "a mode with a quartic term; in a rotating frame only its part that keeps the quanta counts",
                    "H/ħ = ω n + g x⁴,  x = (a + a†)/√2"),
            new String[] {"strength"},
            FREQUENCY,
            Key.quantity("strength", "strength g of x⁴ as a frequency", CYCLE_FREQUENCY, ANGULAR_FREQUENCY));

    private static final NounKind HAMILTONIAN = kind(
                    NounKind.of(
                            "hamiltonian",
                            "Hamiltonian of its own",
                            "any polynomial in a, a† (also ad), n, x and p; what varies with t stands as a factor",
                            "H/ħ as a frequency or an energy; x and p are quadratures, [x, p] = i"),
                    new String[] {},
                    FREQUENCY
                            .standard("none")
                            .formula("what quality, temperature and periods refer to; not added to H"))
            .argument(
                    Key.of("formula", Form.TEXT, "\"w*n + k/2*n*(n-1) + f*(a + a†)\"", "the Hamiltonian as a formula"))
            .withParameters();

    private ModeKinds() {}

    private static Key rate(String word, String meaning, String formula) {
        return Key.quantity(word, meaning, CYCLE_FREQUENCY, ANGULAR_FREQUENCY, TIME)
                .formula(formula);
    }

    private static NounKind kind(NounKind kind, String[] own, Key... keys) {
        Key[] all = new Key[keys.length + COMMON.length];
        System.arraycopy(keys, 0, all, 0, keys.length);
        System.arraycopy(COMMON, 0, all, keys.length, COMMON.length);
        String[] optional = {
            "loss",
            "quality",
            "thermal",
            "temperature",
            "gain",
            "dephasing",
            "pair loss",
            "drive",
            "at",
            "phase",
            "parametric",
            "pump frequency",
            "pump phase",
            "frame"
        };
        boolean formula = own.length == 0;
        String[] lab = with(own, formula ? new String[] {} : new String[] {"frequency"});
        String[] natural = with(own, new String[] {"natural"});
        String[] free = with(optional, new String[] {"frequency"});
        return kind.keys(all)
                .links(AT)
                .ways(
                        Way.of(lab).with(formula ? free : optional),
                        Way.of(natural).with(free));
    }

    private static String[] with(String[] some, String[] more) {
        String[] all = new String[some.length + more.length];
        System.arraycopy(some, 0, all, 0, some.length);
        System.arraycopy(more, 0, all, some.length, more.length);
        return all;
    }

    static NounKind[] all() {
        return new NounKind[] {KERR, DUFFING, HAMILTONIAN};
    }
}
