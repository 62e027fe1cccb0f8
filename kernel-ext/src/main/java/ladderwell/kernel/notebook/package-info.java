/**
 * Notebook files without Jupyter: read one, run its code cells, store the outputs as a Jupyter client would, write it
 * back, and print it as one web page that stands alone.
 *
 * <p>Reading order: {@link ladderwell.kernel.notebook.Notebook} (the file, nbformat 4) and
 * {@link ladderwell.kernel.notebook.Cell}, {@link ladderwell.kernel.notebook.NotebookRun} (runs the cells), {@link
 * ladderwell.kernel.notebook.Report} (the page). Everything else serves one of these.
 *
 * <p>What a notebook says is not trusted: its Markdown, its attachments and outputs stored by someone else run no
 * script in the page. Outputs of this very run are shown as they are, scripts included, since the run itself has
 * already executed the notebook's Java (see docs/decisions/0005).
 */
@NullMarked
package ladderwell.kernel.notebook;

import org.jspecify.annotations.NullMarked;
