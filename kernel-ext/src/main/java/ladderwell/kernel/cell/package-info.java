/**
 * Cells and what working on them gives: the meeting point of the Java session, the declarations language, the renderers
 * and whoever shows the outcome (a Jupyter client or a notebook file). Knows neither the Jupyter protocol nor physics.
 *
 * <p>Reading order: {@link ladderwell.kernel.cell.Workbench} (one per notebook, runs cells), {@link
 * ladderwell.kernel.cell.CellOutput} and {@link ladderwell.kernel.cell.CellEnd} (what comes out), {@link
 * ladderwell.kernel.cell.CellText} (which lines are sentences and which are Java), {@link
 * ladderwell.kernel.cell.Sentences} with {@link ladderwell.kernel.cell.SentenceContext} (the declarations language, as
 * the workbench sees it), {@link ladderwell.kernel.cell.Names} (what has been declared).
 *
 * <p>Positions in text are Java {@code char} offsets; lines count from 1. A host that speaks another unit converts at
 * its edge.
 */
@NullMarked
package ladderwell.kernel.cell;

import org.jspecify.annotations.NullMarked;
