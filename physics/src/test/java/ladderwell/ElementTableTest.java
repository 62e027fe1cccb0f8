package ladderwell;

import static ladderwell.quantity.Units.ATOMIC_MASS;
import static ladderwell.quantity.Units.ELECTRON_MASS;
import static ladderwell.quantity.Units.KILOHERTZ;
import static ladderwell.quantity.Units.NANOMETRE;
import static ladderwell.quantity.Units.ONE;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import ladderwell.formula.Parameters;
import ladderwell.potential.Potential;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Quantity;
import org.junit.jupiter.api.Test;
import tech.tablesaw.api.Table;

class ElementTableTest {
    private static final long[] LOWEST = {0, 1, 2, 3};

    private static double element(Table table, int m, int n, int column) {
        for (int row = 0; row < table.rowCount(); row++) {
            if (table.longColumn(0).getLong(row) == m && table.longColumn(1).getLong(row) == n) {
                return table.doubleColumn(column).getDouble(row);
            }
        }
        throw new AssertionError("no row for " + m + " and " + n);
    }

    @Test
    void aHarmonicOscillatorCouplesNeighboursByTheRootOfTheUpperLevel() {
        Oscillator trap = Oscillator.harmonic().mass(40, ATOMIC_MASS).frequency(50, KILOHERTZ);
        Table table = trap.elementTable(LOWEST, Coupling.POSITION, Coupling.MOMENTUM);
        assertEquals(10, table.rowCount());
        assertEquals("⟨m|x|n⟩ / nm", table.column(2).name());
        assertEquals("± ⟨m|x|n⟩ / nm (guaranteed)", table.column(3).name());
        double omega = 2 * Math.PI * 50e3;
        double zero = Math.sqrt(Constants.HBAR / (2 * 40 * Constants.ATOMIC_MASS_CONSTANT * omega)) * 1e9;
        for (int n = 1; n <= 3; n++) {
            double expected = zero * Math.sqrt(n);
            // both sides round a few times
            assertEquals(expected, element(table, n - 1, n, 2), element(table, n - 1, n, 3) + 1e-14 * expected);
        }
        assertTrue(Math.abs(element(table, 0, 2, 2)) <= element(table, 0, 2, 3));
        // |⟨n−1|p|n⟩| = m ω |⟨n−1|x|n⟩|; one of them times −i
        assertTrue(
                table.column(4).name().startsWith("Im ⟨m|p|n⟩ / ħ/"),
                table.column(4).name());
        assertEquals(element(table, 0, 1, 4) * Math.sqrt(3), element(table, 2, 3, 4), element(table, 0, 1, 5) * 4);
    }

    @Test
    void functionsOfThePositionHaveTheirElementsInTheirOwnUnit() {
        Oscillator well = Oscillator.box().mass(1, ELECTRON_MASS).width(10, NANOMETRE);
        Table table = well.elementTable(
                LOWEST,
                Coupling.function("x^2"),
                Coupling.function("F*x", Parameters.none().with("F", "2 meV/nm")),
                Coupling.function("cos(2*pi*x/(10 nm))"));
        assertEquals("⟨m|x^2|n⟩ / m^2", table.column(2).name());
        // L² (1/12 − 1/(2π²(n+1)²)); common practice, no source
        double expected = 1e-16 * (1.0 / 12 - 1 / (2 * Math.PI * Math.PI));
        assertEquals(expected, element(table, 0, 0, 2), element(table, 0, 0, 3) + 1e-30);
        // −16 L/(9π²) between the two lowest levels, up to the sign of the functions; common practice, no source
        double dipole = 2 * 10 * 16 / (9 * Math.PI * Math.PI);
        assertEquals("⟨m|F*x|n⟩ / meV", table.column(4).name());
        assertEquals(dipole, Math.abs(element(table, 0, 1, 4)), element(table, 0, 1, 5) + 1e-13 * dipole);
        // cos(2πx/L) = −(cos(2π(x+L/2)/L)): half of the diagonal of the lowest level
        assertEquals("⟨m|cos(2*pi*x/(10 nm))|n⟩", table.column(6).name());
        assertEquals(0.5, element(table, 0, 0, 6), element(table, 0, 0, 7) + 1e-14);
    }

    @Test
    void elementsOfAnyPotentialSayThatTheyAreEstimated() {
        Oscillator morse = Oscillator.in(
                Potential.morse(Quantity.of(1, ONE), Quantity.of(40, ONE), ladderwell.formula.Amount.read("0.5")));
        Table table = morse.elementTable(LOWEST, Coupling.POSITION, Coupling.function("2*x"));
        assertTrue(table.column(3).name().endsWith("(estimated)"));
        for (int row = 0; row < table.rowCount(); row++) {
            double off = 2 * table.doubleColumn(3).getDouble(row)
                    + table.doubleColumn(5).getDouble(row);
            assertEquals(
                    2 * table.doubleColumn(2).getDouble(row),
                    table.doubleColumn(4).getDouble(row),
                    off);
        }
    }

    @Test
    void whatCouplesNothingIsNamed() {
        Oscillator mode = Oscillator.harmonic().natural();
        assertTrue(
                assertThrows(IllegalArgumentException.class, () -> mode.elementTable(LOWEST, Coupling.function("x*t")))
                        .getMessage()
                        .contains("depends on time"));
        assertThrows(IllegalArgumentException.class, () -> mode.elementTable(LOWEST));
        assertThrows(IllegalArgumentException.class, () -> mode.elementTable(new long[] {1, 1}, Coupling.POSITION));
        assertThrows(IllegalArgumentException.class, () -> mode.elementTable(LOWEST, Coupling.function(" ")));
        assertThrows(IllegalArgumentException.class, () -> mode.elementTable(new long[] {-1}, Coupling.POSITION));
    }
}
