package ladderwell.kernel.notebook;

import ladderwell.kernel.cell.CellEnd;
import ladderwell.kernel.cell.CellOutput;
import ladderwell.kernel.cell.Workbench;

/** Where the cells of a notebook run; a {@link Workbench} but for tests. */
public interface CellRunner {
    /** Runs a cell; never throws for what the cell does. */
    CellEnd run(String code, int number, CellOutput output);

    /** Ends the running cell, from any thread. */
    void interrupt();

    /** Cells that run on a workbench. */
    static CellRunner on(Workbench workbench) {
        return new CellRunner() {
            @Override
            public CellEnd run(String code, int number, CellOutput output) {
                return workbench.run(code, number, output);
            }

            @Override
            public void interrupt() {
                workbench.interrupt();
            }
        };
    }
}
