package ladderwell;

import static ladderwell.Observable.ENERGY;
import static ladderwell.Observable.MEAN_QUANTA;
import static ladderwell.Observable.MOMENTUM;
import static ladderwell.Observable.POSITION;
import static ladderwell.Observable.RETURN_AMPLITUDE_IMAGINARY;
import static ladderwell.Observable.RETURN_AMPLITUDE_REAL;
import static ladderwell.Observable.RETURN_PROBABILITY;
import static ladderwell.Observable.SPREAD_OF_MOMENTUM;
import static ladderwell.Observable.SPREAD_OF_POSITION;
import static ladderwell.Observable.VARIANCE_OF_QUANTA;
import static ladderwell.Observable.population;
import static ladderwell.quantity.Units.ONE;
import static ladderwell.quantity.Units.RADIAN;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import ladderwell.evidence.Certainty;
import ladderwell.state.FiftyDigits;
import org.junit.jupiter.api.Test;

/** A guaranteed error is never exceeded: seeded random runs against 50-digit references. */
class HonestBoundsTest {
    private static final MathContext DIGITS = FiftyDigits.DIGITS;
    private static final BigDecimal HALF = new BigDecimal("0.5");

    private final Harmonic mode = Oscillator.harmonic().natural();
    private int compared;

    private void check(String what, Run run, Observable observable, int j, BigDecimal reference) {
        Series series = run.series(observable);
        assertEquals(Certainty.GUARANTEED, series.certainty());
        BigDecimal off = new BigDecimal(series.value(j)).subtract(reference).abs();
        assertTrue(
                off.compareTo(new BigDecimal(series.error(j))) <= 0,
                () -> what + ", " + observable.name() + " at t = " + run.time(j) + ": " + series.value(j) + " ± "
                        + series.error(j) + " is off by " + off.round(new MathContext(3)));
        compared++;
    }

    @Test
    void coherentStatesOnSevenHundredSeededRuns() {
        Random random = new Random(20261201);
        for (int i = 0; i < 700; i++) {
            double mean = Math.pow(10, -4 + 12 * random.nextDouble());
            double phase = 7 * random.nextDouble() - 3.5;
            double tolerance = Math.pow(10, -3 - 7 * random.nextDouble());
            double duration = Math.pow(10, -2 + 5 * random.nextDouble());
            Run run = mode.coherent(mean)
                    .phase(phase, RADIAN)
                    .evolve(duration, ONE)
                    .frames(1 + random.nextInt(3))
                    .tolerance(tolerance)
                    .run();
            String what = "case " + i + ": mean " + mean + ", phase " + phase + ", tolerance " + tolerance;
            BigDecimal n = new BigDecimal(mean);
            BigDecimal swing = n.add(n).sqrt(DIGITS);
            BigDecimal width = HALF.sqrt(DIGITS);
            for (int j = 0; j < run.times(); j++) {
                BigDecimal t = new BigDecimal(run.time(j));
                BigDecimal[] turn = FiftyDigits.cosSin(new BigDecimal(phase).subtract(t));
                check(what, run, POSITION, j, swing.multiply(turn[0], DIGITS));
                check(what, run, MOMENTUM, j, swing.multiply(turn[1], DIGITS));
                check(what, run, SPREAD_OF_POSITION, j, width);
                check(what, run, SPREAD_OF_MOMENTUM, j, width);
                check(what, run, MEAN_QUANTA, j, n);
                check(what, run, VARIANCE_OF_QUANTA, j, n);
                check(what, run, ENERGY, j, n.add(HALF));
                // ⟨α|αe^{-it}⟩ e^{-it/2} = exp(n̄(cos t − 1)) e^{-i(n̄ sin t + t/2)}
                BigDecimal[] ahead = FiftyDigits.cosSin(t);
                BigDecimal size = FiftyDigits.exp(
                        n.multiply(ahead[0].subtract(BigDecimal.ONE), DIGITS).max(new BigDecimal("-2000")));
                BigDecimal[] angle = FiftyDigits.cosSin(n.multiply(ahead[1]).add(t.multiply(HALF)));
                check(what, run, RETURN_AMPLITUDE_REAL, j, size.multiply(angle[0], DIGITS));
                check(
                        what,
                        run,
                        RETURN_AMPLITUDE_IMAGINARY,
                        j,
                        size.multiply(angle[1], DIGITS).negate());
                check(what, run, RETURN_PROBABILITY, j, size.multiply(size, DIGITS));
            }
            long level = Math.max(0, Math.round(mean + 3 * random.nextGaussian() * Math.sqrt(mean)));
            check(what, run, population(level), 0, FiftyDigits.poisson(mean, level));
        }
        assertTrue(compared > 14_000);
    }

    @Test
    void superpositionsOnFourHundredSeededRuns() {
        Random random = new Random(7);
        Box box = Oscillator.box().natural();
        for (int i = 0; i < 400; i++) {
            boolean ladder = i % 2 == 0;
            int size = 1 + random.nextInt(6);
            long[] levels = random.longs(0, ladder ? 100_000 : 300)
                    .distinct()
                    .limit(size)
                    .sorted()
                    .toArray();
            if (ladder && size > 1) {
                levels[1] = levels[0] + 1;
                levels = java.util.Arrays.stream(levels).distinct().sorted().toArray();
                size = levels.length;
            }
            double[] re = random.doubles(size, -1, 1).toArray();
            double[] im = random.doubles(size, -1, 1).toArray();
            Run run = (ladder ? mode : box)
                    .superposition(levels)
                    .weights(re, im)
                    .evolve(Math.pow(10, -2 + 4 * random.nextDouble()), ONE)
                    .frames(2)
                    .run();
            String what = "case " + i + ": levels " + java.util.Arrays.toString(levels);
            List<BigDecimal> weights = new ArrayList<>();
            BigDecimal norm = BigDecimal.ZERO;
            for (int k = 0; k < size; k++) {
                BigDecimal r = new BigDecimal(re[k]);
                BigDecimal m = new BigDecimal(im[k]);
                weights.add(r.multiply(r).add(m.multiply(m)));
                norm = norm.add(weights.get(k));
            }
            for (int j = 0; j < run.times(); j++) {
                BigDecimal t = new BigDecimal(run.time(j));
                BigDecimal amplitudeRe = BigDecimal.ZERO;
                BigDecimal amplitudeIm = BigDecimal.ZERO;
                BigDecimal energy = BigDecimal.ZERO;
                BigDecimal position = BigDecimal.ZERO;
                for (int k = 0; k < size; k++) {
                    BigDecimal p = weights.get(k).divide(norm, DIGITS);
                    BigDecimal e = ladder ? new BigDecimal(levels[k]).add(HALF) : boxEnergy(levels[k]);
                    BigDecimal[] turn = FiftyDigits.cosSin(e.multiply(t));
                    amplitudeRe = amplitudeRe.add(p.multiply(turn[0], DIGITS));
                    amplitudeIm = amplitudeIm.subtract(p.multiply(turn[1], DIGITS));
                    energy = energy.add(p.multiply(e, DIGITS));
                    if (ladder && k + 1 < size && levels[k + 1] == levels[k] + 1) {
                        // √2 Re(√(n+1) c_n* c_{n+1} e^{-it})
                        BigDecimal a = new BigDecimal(re[k]);
                        BigDecimal b = new BigDecimal(im[k]);
                        BigDecimal c = new BigDecimal(re[k + 1]);
                        BigDecimal d = new BigDecimal(im[k + 1]);
                        BigDecimal[] step = FiftyDigits.cosSin(t);
                        BigDecimal real = a.multiply(c).add(b.multiply(d));
                        BigDecimal imaginary = a.multiply(d).subtract(b.multiply(c));
                        position = position.add(new BigDecimal(2 * (levels[k] + 1))
                                .sqrt(DIGITS)
                                .multiply(real.multiply(step[0], DIGITS).add(imaginary.multiply(step[1], DIGITS)))
                                .divide(norm, DIGITS));
                    }
                }
                check(what, run, RETURN_AMPLITUDE_REAL, j, amplitudeRe);
                check(what, run, RETURN_AMPLITUDE_IMAGINARY, j, amplitudeIm);
                check(what, run, ENERGY, j, energy);
                if (ladder) {
                    check(what, run, POSITION, j, position);
                }
            }
            check(what, run, population(levels[0]), 1, weights.get(0).divide(norm, DIGITS));
        }
    }

    private static BigDecimal boxEnergy(long n) {
        BigDecimal k = FiftyDigits.PI.multiply(new BigDecimal(n + 1));
        return k.multiply(k).multiply(HALF);
    }
}
