package ladderwell.kernel.command;

import static org.junit.jupiter.api.Assertions.assertDoesNotThrow;
import static org.junit.jupiter.api.Assertions.assertThrows;

import ladderwell.kernel.cell.Rehearsal;
import ladderwell.kernel.magic.Declarations;
import ladderwell.kernel.render.Renderings;
import org.junit.jupiter.api.Test;

class PracticeTest {
    @Test
    void theRehearsedFirstCellIsRight() {
        assertDoesNotThrow(Practice::rehearse);
    }

    @Test
    void aRehearsalOfAWrongSentenceSaysSo() {
        assertThrows(
                IllegalStateException.class,
                () -> Rehearsal.run(
                        "%%declare\noscillator trap: harmonic, mass -1 u", new Declarations(), new Renderings()));
    }

    @Test
    void whatARehearsalDeclaredIsThrownAway() {
        Declarations declarations = new Declarations();
        Rehearsal.run("%%declare\noscillator trap: harmonic, natural", declarations, new Renderings());

        assertThrows(
                IllegalStateException.class,
                () -> Rehearsal.run("%%declare\nstate psi: number in trap, level 1", declarations, new Renderings()));
    }
}
