package ladderwell.kernel.magic;

import java.util.ArrayList;
import java.util.List;
import ladderwell.Fact;
import ladderwell.LadderMode;
import ladderwell.Oscillator;
import ladderwell.evidence.Bound;
import ladderwell.formula.Amount;
import ladderwell.formula.Dimension;
import ladderwell.formula.Formula;
import ladderwell.formula.FormulaException;
import ladderwell.formula.Parameters;
import ladderwell.kernel.sentence.MisreadSentence;
import ladderwell.kernel.sentence.Place;
import ladderwell.kernel.sentence.Sentence;
import ladderwell.mode.Jump;
import ladderwell.mode.Mode;
import ladderwell.mode.Part;
import ladderwell.mode.Rate;
import ladderwell.operator.OperatorFormula;
import ladderwell.quantity.Frequency;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;

/** The oscillators whose sentence names a mode: kerr, duffing, hamiltonian, with what drives it and what it loses. */
record Modes(Sentence sentence) {
    private static final List<String> KEYS = List.of(
            "frequency",
            "kerr",
            "strength",
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
            "frame");

    LadderMode oscillator() throws MisreadSentence {
        refuseLoose();
        boolean formula = sentence.kind().equals("hamiltonian");
        double omega = omega();
        Mode mode = sentence.natural() ? Mode.natural(formula ? 0 : omega) : Mode.lab(formula ? 0 : omega);
        try {
            if (formula) {
                mode = mode.with(new Part.Given(hamiltonian()));
            } else if (sentence.has("kerr")) {
                mode = mode.with(new Part.Kerr(frequency("kerr")));
            } else {
                mode = mode.with(new Part.Duffing(frequency("strength")));
            }
            mode = lossy(driven(mode, omega), omega);
            double frame = frame(mode, omega);
            if (frame != 0) {
                mode = mode.rotating(frame);
            }
            return Oscillator.mode(sentence.kind(), mode, given());
        } catch (FormulaException e) {
            throw new MisreadSentence(e.reason(), inside(e), e);
        } catch (IllegalArgumentException e) {
            throw new MisreadSentence(
                    String.valueOf(e.getMessage()), sentence.placeSpokenOf(String.valueOf(e.getMessage())), e);
        }
    }

    private void refuseLoose() throws MisreadSentence {
        needs("at", "drive");
        needs("phase", "drive");
        needs("pump frequency", "parametric");
        needs("pump phase", "parametric");
        excludes("quality", "loss");
        excludes("temperature", "thermal");
        boolean hot = sentence.has("thermal") || sentence.has("temperature");
        if (hot && !sentence.has("loss") && !sentence.has("quality")) {
            String key = sentence.has("thermal") ? "thermal" : "temperature";
            throw new MisreadSentence(
                    "'" + key
                            + "' needs a loss: a bath heats through what it takes; give 'loss 12 kHz' or a 'gain' of its own",
                    sentence.placeOf(key));
        }
        if (sentence.kind().equals("hamiltonian") && sentence.has("frame")) {
            throw new MisreadSentence(
                    "a Hamiltonian given by its formula stands in the frame it is meant in; leave 'frame' out",
                    sentence.placeOf("frame"));
        }
    }

    private void needs(String key, String other) throws MisreadSentence {
        if (sentence.has(key) && !sentence.has(other)) {
            throw new MisreadSentence(
                    "'" + key + "' goes with '" + other + "', and that is not given; give '" + other + " 80 kHz'",
                    sentence.placeOf(key));
        }
    }

    private void excludes(String key, String other) throws MisreadSentence {
        if (sentence.has(key) && sentence.has(other)) {
            throw new MisreadSentence(
                    "'" + key + "' and '" + other + "' say the same thing twice; keep one of them",
                    sentence.placeOf(key));
        }
    }

    /** ω of the mode; 1 in natural units where it is not given, 0 where nothing says it. */
    private double omega() {
        if (sentence.has("frequency")) {
            return frequency("frequency");
        }
        return sentence.natural() && !sentence.kind().equals("hamiltonian") ? 1 : 0;
    }

    private double frequency(String key) {
        Quantity quantity = sentence.quantity(key);
        return sentence.natural() ? quantity.value() : Frequency.of(quantity).omega();
    }

    private double angle(String key) {
        return sentence.has(key) ? sentence.quantity(key).si() : 0;
    }

    private OperatorFormula hamiltonian() throws MisreadSentence {
        Parameters parameters = Parameters.none();
        for (String name : sentence.parameters()) {
            parameters = parameters.with(name, sentence.amount(name));
        }
        String text = sentence.text("formula");
        return sentence.natural()
                ? OperatorFormula.naturalHamiltonian(text, parameters)
                : OperatorFormula.hamiltonian(text, parameters);
    }

    private Mode driven(Mode mode, double omega) throws MisreadSentence {
        Mode driven = mode;
        if (sentence.has("drive")) {
            double strength = frequency("drive");
            Parameters f = Parameters.none()
                    .with("f", sentence.natural() ? Amount.number(strength) : new Amount(strength, Dimension.RATE));
            Formula envelope = sentence.natural() ? Formula.natural("f", f) : Formula.lab("f", f, Dimension.RATE);
            driven = driven.with(new Part.Drive(envelope, driveFrequency(omega), angle("phase")));
        }
        if (sentence.has("parametric")) {
            driven = driven.with(new Part.Pump(frequency("parametric"), pumpFrequency(omega), angle("pump phase")));
        }
        return driven;
    }

    private double driveFrequency(double omega) {
        return sentence.has("at") ? frequency("at") : omega;
    }

    private double pumpFrequency(double omega) {
        return sentence.has("pump frequency") ? frequency("pump frequency") : 2 * omega;
    }

    private Mode lossy(Mode mode, double omega) {
        Mode lossy = mode;
        if (sentence.has("loss") || sentence.has("quality")) {
            Rate kappa = sentence.has("loss") ? rate("loss") : Rate.quality(sentence.number("quality"), omega);
            double quanta = sentence.has("thermal")
                    ? sentence.number("thermal")
                    : sentence.has("temperature")
                            ? Jump.thermalQuanta(
                                    omega, sentence.quantity("temperature").si())
                            : 0;
            lossy = lossy.with(Jump.bath(kappa, quanta));
        }
        if (sentence.has("gain")) {
            lossy = lossy.with(Jump.gain(rate("gain")));
        }
        if (sentence.has("dephasing")) {
            lossy = lossy.with(Jump.dephasing(rate("dephasing")));
        }
        if (sentence.has("pair loss")) {
            lossy = lossy.with(Jump.pairLoss(rate("pair loss")));
        }
        return lossy;
    }

    private Rate rate(String key) {
        return sentence.natural() ? Rate.natural(sentence.quantity(key).value()) : Rate.of(sentence.quantity(key));
    }

    private double frame(Mode mode, double omega) {
        if (sentence.kind().equals("hamiltonian")) {
            return 0;
        }
        if (sentence.has("frame")) {
            return frequency("frame");
        }
        if (sentence.has("drive")) {
            return driveFrequency(omega);
        }
        if (sentence.has("parametric")) {
            return pumpFrequency(omega) / 2;
        }
        return mode.jumps().isEmpty() || sentence.kind().equals("duffing") ? 0 : omega;
    }

    /** The place of a mistake in the formula; the whole value where it came from an expression. */
    private Place inside(FormulaException e) {
        return Potentials.inside(sentence, e);
    }

    private List<Fact> given() {
        List<Fact> given = new ArrayList<>();
        for (String key : KEYS) {
            if (!sentence.has(key)) {
                continue;
            }
            boolean number = key.equals("quality") || key.equals("thermal");
            Quantity value = number ? Quantity.of(sentence.number(key), Units.ONE) : sentence.quantity(key);
            given.add(new Fact(key.equals("at") ? "drive frequency" : key, "", value, Bound.exact()));
        }
        return given;
    }
}
