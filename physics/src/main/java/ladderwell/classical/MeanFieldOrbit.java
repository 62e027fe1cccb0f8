package ladderwell.classical;

import java.util.ArrayList;
import java.util.List;
import ladderwell.numeric.Interruption;
import org.apache.commons.math3.ode.ContinuousOutputModel;
import org.apache.commons.math3.ode.FirstOrderDifferentialEquations;
import org.apache.commons.math3.ode.nonstiff.DormandPrince853Integrator;

/** The orbit of a velocity field in phase space, followed as far as it is asked for. */
final class MeanFieldOrbit implements ClassicalOrbit {
    private static final double TOLERANCE = 1e-10;
    /** Turning points are looked for up to this time, and at so many places. */
    private static final double LOOKED_AT = 40;

    private static final int LOOKS = 2000;

    private final PhaseVelocity velocity;
    private final double[] start;
    private final List<ContinuousOutputModel> pieces = new ArrayList<>();
    private double reached;

    MeanFieldOrbit(PhaseVelocity velocity, double position, double momentum) {
        this.velocity = velocity;
        start = new double[] {position, momentum};
    }

    private synchronized double[] at(double time) {
        while (reached < time) {
            extend(Math.max(1, Math.max(2 * reached, Math.min(time, 2 * reached + 100))));
        }
        for (ContinuousOutputModel piece : pieces) {
            if (time <= piece.getFinalTime()) {
                piece.setInterpolatedTime(time);
                return piece.getInterpolatedState();
            }
        }
        return start;
    }

    private void extend(double end) {
        double[] from = start;
        if (!pieces.isEmpty()) {
            ContinuousOutputModel last = pieces.get(pieces.size() - 1);
            last.setInterpolatedTime(reached);
            from = last.getInterpolatedState();
        }
        ContinuousOutputModel piece = new ContinuousOutputModel();
        DormandPrince853Integrator integrator =
                new DormandPrince853Integrator(1e-14 * end, end - reached, TOLERANCE, TOLERANCE);
        integrator.addStepHandler(piece);
        integrator.integrate(
                new FirstOrderDifferentialEquations() {
                    @Override
                    public int getDimension() {
                        return 2;
                    }

                    @Override
                    public void computeDerivatives(double t, double[] y, double[] out) {
                        Interruption.check();
                        velocity.at(t, y[0], y[1], out);
                    }
                },
                reached,
                from,
                end,
                from.clone());
        pieces.add(piece);
        reached = end;
    }

    @Override
    public double position(double time) {
        return at(time)[0];
    }

    @Override
    public double momentum(double time) {
        return at(time)[1];
    }

    private double outermost(int side) {
        double most = side * start[0];
        for (int i = 0; i <= LOOKS; i++) {
            most = Math.max(most, side * position(LOOKED_AT * i / LOOKS));
        }
        return side * most;
    }

    @Override
    public double turningPoint() {
        return outermost(1);
    }

    @Override
    public double leftTurningPoint() {
        return outermost(-1);
    }
}
