package ladderwell;

import static ladderwell.quantity.Units.ONE;

import java.util.List;
import ladderwell.state.Amplitudes;

/**
 * Level n of an oscillator: the number state |n⟩ of a harmonic one.
 *
 * @param oscillator the oscillator
 * @param n the level, from 0
 */
public record NumberState(Oscillator oscillator, long n) implements State {

    public NumberState {
        Superposition.checkLevel(oscillator, n);
    }

    @Override
    public String kind() {
        return "number";
    }

    @Override
    public Amplitudes amplitudes(double tolerance) {
        return Amplitudes.level(n);
    }

    @Override
    public double meanEnergy() {
        return oscillator instanceof Ladder ladder
                ? ladder.numberEnergy(n)
                : oscillator.levels().energyHigh(n);
    }

    @Override
    public List<Fact> facts() {
        return List.of(
                Fact.exact("level", "n", n, ONE),
                new Shown(oscillator.scale()).energy("energy", "E_" + n, meanEnergy(), oscillator));
    }

    @Override
    public List<Fact> given() {
        return List.of(Fact.exact("level", "n", n, ONE));
    }
}
