package ladderwell.level;

import ladderwell.numeric.DoubleDouble;

/**
 * One bound level of the finite well, solved.
 *
 * <p>Letters: k wave number inside, κ decay constant outside, θ the phase at the wall: φ = A sin(θ + k (1/2 − x)) inside, so
 * that tan θ = k/κ, and sin θ = k/k₀, cos θ = κ/k₀ with k₀ = √(2V₀).
 *
 * @param waveNumber k
 * @param energy E = k²/2
 * @param energyError absolute, guaranteed
 * @param decay κ
 * @param decayError relative, guaranteed
 * @param wallSine sin θ
 * @param wallCosine cos θ
 */
record WellLevel(
        DoubleDouble waveNumber,
        DoubleDouble energy,
        double energyError,
        double decay,
        double decayError,
        double wallSine,
        double wallCosine) {

    /** A of φ = A sin(…) inside: A² = 2 / (1 + 2/κ), the tails being as heavy as a width 1/κ on either side. */
    double amplitude() {
        return Math.sqrt(2 * decay / (decay + 2));
    }
}
