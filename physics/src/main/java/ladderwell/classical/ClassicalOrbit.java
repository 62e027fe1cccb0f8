package ladderwell.classical;

/** The orbit of a classical particle of mass 1: its position and momentum at any time. */
public interface ClassicalOrbit {

    /** Position at time t. */
    double position(double time);

    /** Momentum at time t. */
    double momentum(double time);

    /** The outermost position on the +x side. */
    double turningPoint();

    /** The outermost position on the −x side; the mirror image of the other unless it is said otherwise. */
    default double leftTurningPoint() {
        return -turningPoint();
    }

    /** The harmonic orbit (H = (p² + x²)/2) through the given point. */
    static ClassicalOrbit harmonic(double position, double momentum) {
        return new Harmonic(position, momentum);
    }

    /**
     * Free flight between hard walls at ±half, at the given energy, starting at the position in the direction of the
     * momentum's sign (to the right where that is 0).
     */
    static ClassicalOrbit bouncing(double position, double momentum, double energy, double half) {
        double start = Math.max(-half, Math.min(half, position));
        double speed = Math.sqrt(2 * energy);
        return new Bouncing(start, momentum < 0 ? -speed : speed, half);
    }

    /** The orbit through the given point of any potential. */
    static ClassicalOrbit through(Landscape v, double position, double momentum) {
        double energy = momentum * momentum / 2 + v.value(position);
        if (momentum == 0 && v.slope(position) == 0) {
            return new Resting(position);
        }
        return Swing.through(v, position, energy)
                .<ClassicalOrbit>map(swing -> swing.period() > 0 && swing.right() > swing.left()
                        ? new SwingingOrbit(swing, position, momentum)
                        : new Resting(position))
                .orElseGet(() -> new LeavingOrbit(v, position, momentum));
    }

    /** The orbit through the given point at time 0 in a potential on the whole axis that moves. */
    static ClassicalOrbit driven(MovingSlope slope, double position, double momentum) {
        return new LeavingOrbit(slope, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, position, momentum);
    }

    /** The orbit of a mode whose velocity in phase space is known, driven and damped as it may be; from time 0 on. */
    static ClassicalOrbit along(PhaseVelocity velocity, double position, double momentum) {
        return new MeanFieldOrbit(velocity, position, momentum);
    }

    /**
     * The period of the motion at an energy that passes a position.
     *
     * @throws IllegalArgumentException if the particle cannot be there at that energy, or leaves
     */
    static double period(Landscape v, double position, double energy) {
        return Swing.through(v, position, energy)
                .orElseThrow(() ->
                        new IllegalArgumentException("at this energy the classical particle leaves the potential"))
                .period();
    }

    /** No motion. */
    record Resting(double at) implements ClassicalOrbit {
        @Override
        public double position(double time) {
            return at;
        }

        @Override
        public double momentum(double time) {
            return 0;
        }

        @Override
        public double turningPoint() {
            return at;
        }

        @Override
        public double leftTurningPoint() {
            return at;
        }
    }

    /** x = x₀ cos t + p₀ sin t. */
    record Harmonic(double startPosition, double startMomentum) implements ClassicalOrbit {
        @Override
        public double position(double time) {
            return startPosition * Math.cos(time) + startMomentum * Math.sin(time);
        }

        @Override
        public double momentum(double time) {
            return startMomentum * Math.cos(time) - startPosition * Math.sin(time);
        }

        @Override
        public double turningPoint() {
            return Math.hypot(startPosition, startMomentum);
        }
    }

    /** Uniform motion, folded at the walls. */
    record Bouncing(double startPosition, double startVelocity, double half) implements ClassicalOrbit {
        /** Distance from the left wall on the unfolded line, modulo a round trip of 4·half. */
        private double unfolded(double time) {
            double trip = 4 * half;
            double s = (startPosition + half + startVelocity * time) % trip;
            return s < 0 ? s + trip : s;
        }

        @Override
        public double position(double time) {
            double s = unfolded(time);
            return s <= 2 * half ? s - half : 3 * half - s;
        }

        @Override
        public double momentum(double time) {
            return unfolded(time) <= 2 * half ? startVelocity : -startVelocity;
        }

        @Override
        public double turningPoint() {
            return half;
        }
    }
}
