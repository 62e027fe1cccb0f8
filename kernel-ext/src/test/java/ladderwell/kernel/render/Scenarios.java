package ladderwell.kernel.render;

import static ladderwell.Observable.ENERGY;
import static ladderwell.Observable.POSITION;
import static ladderwell.Observable.RETURN_PROBABILITY;
import static ladderwell.Observable.SPREAD_OF_POSITION;
import static ladderwell.quantity.Units.ATOMIC_MASS;
import static ladderwell.quantity.Units.DEGREE;
import static ladderwell.quantity.Units.ELECTRONVOLT;
import static ladderwell.quantity.Units.ELECTRON_MASS;
import static ladderwell.quantity.Units.MEGAHERTZ;
import static ladderwell.quantity.Units.NANOMETRE;
import static ladderwell.quantity.Units.PERIOD;

import ladderwell.Box;
import ladderwell.FiniteWell;
import ladderwell.Harmonic;
import ladderwell.Oscillator;
import ladderwell.Run;
import ladderwell.kernel.magic.Animation;
import ladderwell.kernel.magic.LevelTable;
import ladderwell.kernel.magic.TableRead;
import tech.tablesaw.api.DoubleColumn;
import tech.tablesaw.api.LongColumn;
import tech.tablesaw.api.Table;

/** Invented motions to be shown: an ion in a trap, an electron in a well, and one in natural units. */
final class Scenarios {
    static final Harmonic TRAP = Oscillator.harmonic().mass(40, ATOMIC_MASS).frequency(1.2, MEGAHERTZ);
    static final FiniteWell WELL = Oscillator.finiteWell()
            .mass(0.067, ELECTRON_MASS)
            .width(24, NANOMETRE)
            .depth(0.3, ELECTRONVOLT);
    static final Box BOX = Oscillator.box().natural();

    private Scenarios() {}

    static Run ion() {
        return TRAP.coherent(9.5).phase(30, DEGREE).evolve(3, PERIOD).run();
    }

    static Run electron() {
        return WELL.superposition(0, 1, 2).evolve(4, PERIOD).run();
    }

    static Run natural() {
        return Oscillator.harmonic()
                .natural()
                .superposition(1, 2, 4)
                .evolve(2, PERIOD)
                .run();
    }

    static Animation animation(String name, Run run) {
        return new Animation(name, run, run.density());
    }

    static TableRead table(Run run) {
        return new TableRead(run, run.table(POSITION, SPREAD_OF_POSITION, ENERGY, RETURN_PROBABILITY));
    }

    static LevelTable levels(String name, Oscillator oscillator, long... levels) {
        LongColumn n = LongColumn.create("level");
        DoubleColumn energies = DoubleColumn.create("energy (scaled)");
        DoubleColumn errors = DoubleColumn.create("± energy (guaranteed)");
        for (long level : levels) {
            n.append(level);
            energies.append(oscillator.levels().energyHigh(level));
            errors.append(oscillator.levels().energyError(level));
        }
        return new LevelTable(name, oscillator, Table.create("levels", n, energies, errors), levels);
    }
}
