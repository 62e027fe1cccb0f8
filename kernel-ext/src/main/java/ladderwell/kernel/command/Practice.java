package ladderwell.kernel.command;

import static ladderwell.quantity.Units.PERIOD;

import java.util.concurrent.CancellationException;
import java.util.function.BooleanSupplier;
import ladderwell.FiniteWell;
import ladderwell.Harmonic;
import ladderwell.Observable;
import ladderwell.Oscillator;
import ladderwell.Run;
import ladderwell.kernel.cell.Rehearsal;
import ladderwell.kernel.magic.Animation;
import ladderwell.kernel.magic.Declarations;
import ladderwell.kernel.magic.TableRead;
import ladderwell.kernel.render.Renderings;
import tech.tablesaw.api.Table;

/**
 * Evolves, reads and draws a few states in the background after the kernel has connected, so that the first evolution a
 * user asks for finds its classes loaded and its loops compiled. Values it makes are thrown away.
 */
final class Practice {
    /** A client's first cell comes before it. */
    private static final int FIRST_PAUSE_MILLIS = 600;

    private static final int PAUSE_MILLIS = 10;

    private static final int ROUNDS = 12;

    private Practice() {}

    /** What a first cell is likely to say, in small. */
    private static final String FIRST_CELL = """
            %%declare
            oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz
            state psi: coherent in trap, mean 9.5, phase 30 deg
            evolve run: psi for 2 periods, frames 20
            """;

    /**
     * Rehearses a first cell at once, and the rest in pauses.
     *
     * @param idle whether nobody waits for anything
     */
    static void startInBackground(BooleanSupplier idle) {
        Thread rehearsal = new Thread(Practice::rehearse, "rehearsal");
        rehearsal.setDaemon(true);
        rehearsal.start();
        Thread thread = new Thread(() -> run(idle), "practice");
        thread.setDaemon(true);
        thread.setPriority(Thread.MIN_PRIORITY);
        thread.start();
    }

    /** Runs a small first cell aside, in the moment that a client takes before it sends its own. */
    static void rehearse() {
        Rehearsal.run(FIRST_CELL, new Declarations(), new Renderings());
    }

    /** The first table of a process looks through the class path for readers and writers, for up to a second. */
    static void loadTablesInBackground() {
        Thread thread = new Thread(
                () -> {
                    Table unused = Table.create("practice");
                },
                "tables");
        thread.setDaemon(true);
        thread.start();
    }

    private static void run(BooleanSupplier idle) {
        try {
            Thread.sleep(FIRST_PAUSE_MILLIS);
            for (int round = 0; round < ROUNDS; round++) {
                do {
                    Thread.sleep(PAUSE_MILLIS);
                } while (!idle.getAsBoolean());
                once(10 + 20 * round);
            }
        } catch (InterruptedException | CancellationException e) {
            Thread.currentThread().interrupt();
        }
    }

    private static void once(double mean) {
        Renderings renderings = new Renderings();
        Harmonic mode = Oscillator.harmonic().natural();
        Run swing = mode.coherent(mean).evolve(2, PERIOD).run();
        renderings.render(new TableRead(
                swing,
                swing.table(
                        Observable.POSITION,
                        Observable.SPREAD_OF_POSITION,
                        Observable.ENERGY,
                        Observable.RETURN_PROBABILITY)));
        renderings.render(new Animation("practice", swing, swing.density()));
        FiniteWell well = Oscillator.finiteWell().natural(100);
        Run beat = well.superposition(0, 1, 2).evolve(2, PERIOD).frames(40).run();
        renderings.render(new Animation("practice", beat, beat.density()));
    }
}
