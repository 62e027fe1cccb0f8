package ladderwell.phasespace;

import ladderwell.evidence.Bound;

/**
 * A state moved in phase space as a whole: D(α)|ψ⟩ or D ρ D†, α = (position + i momentum)/√2. Its functions are those of the state at points moved back,
 * so that far from the origin, at any number of quanta, nothing but the state itself has to be resolved.
 *
 * @param state the state that is moved
 * @param position by how much in position
 * @param momentum by how much in momentum
 * @param uncertainty bound on the error of either
 */
public record Displaced(PhaseState state, double position, double momentum, double uncertainty) implements PhaseState {

    public Displaced {
        if (!Double.isFinite(position) || !Double.isFinite(momentum) || !(uncertainty >= 0)) {
            throw new IllegalArgumentException(
                    "a state is displaced by finite numbers, not by " + position + ", " + momentum);
        }
    }

    /** A coherent state, the ground state displaced. */
    public static Displaced coherent(double position, double momentum, double uncertainty) {
        return new Displaced(
                new NumberWave(0, new double[] {1}, new double[] {0}, Bound.exact()), position, momentum, uncertainty);
    }

    /** A grid as it is seen from the state. */
    PhaseGrid back(PhaseGrid grid) {
        return new PhaseGrid(
                grid.x() - position, grid.p() - momentum, grid.halfX(), grid.halfP(), grid.nx(), grid.np());
    }

    private Support moved(Support box) {
        return new Support(
                box.left() + position,
                box.right() + position,
                box.low() + momentum,
                box.high() + momentum,
                box.missed());
    }

    @Override
    public Support support() {
        return moved(state.support());
    }

    @Override
    public Support visible(double share) {
        return moved(state.visible(share));
    }
}
