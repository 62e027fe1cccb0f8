package ladderwell.kernel.command;

import java.io.IOException;
import java.io.PrintStream;
import java.nio.file.AccessDeniedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Objects;
import java.util.Optional;
import java.util.concurrent.Callable;
import ladderwell.kernel.cell.CellText;
import ladderwell.kernel.cell.Workbench;
import ladderwell.kernel.magic.Declarations;
import ladderwell.kernel.notebook.Cell;
import ladderwell.kernel.notebook.CellRunner;
import ladderwell.kernel.notebook.Notebook;
import ladderwell.kernel.notebook.NotebookException;
import ladderwell.kernel.notebook.NotebookRun;
import ladderwell.kernel.notebook.Report;
import ladderwell.kernel.notebook.RunEnd;
import ladderwell.kernel.render.Renderings;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code ladderwell run}: executes a notebook and writes it back with its outputs, and one web page beside it. */
@Command(
        name = "run",
        description = {
            "Run a notebook and write it back executed, with a self-contained web page beside it.",
            "Everything is written even when a cell fails; the cells after it are then left without outputs."
        },
        mixinStandardHelpOptions = true)
final class RunCommand implements Callable<Integer> {
    private static final int CELL_FAILED = 1;
    private static final int INTERRUPTED = 130;

    @Parameters(paramLabel = "NOTEBOOK", description = "a notebook of nbformat 4")
    @SuppressWarnings("NullAway.Init")
    private Path notebook;

    @Option(names = "--output", paramLabel = "FILE", description = "where to write it executed (default: in place)")
    private @Nullable Path output;

    @Option(
            names = "--html",
            paramLabel = "FILE",
            description = "where to write the page (default: beside the executed notebook, named .html)")
    private @Nullable Path html;

    @Override
    public Integer call() throws CommandException {
        Practice.loadTablesInBackground();
        // The workbench takes the streams of the process for the cells; what is said here goes to the real one.
        PrintStream say = System.err;
        Path executed = output == null ? notebook : output;
        Path page = html == null ? besides(executed) : html;
        Notebook read = read();
        checkWritable(executed);
        checkWritable(page);
        if (executed.toAbsolutePath().normalize().equals(page.toAbsolutePath().normalize())) {
            throw new CommandException("the notebook and the page would be the same file " + page);
        }
        try (Workbench bench = new Workbench(new Declarations(), new Renderings())) {
            if (read.cells().stream().anyMatch(RunCommand::needsJava)) {
                bench.startJava();
            }
            NotebookRun run = new NotebookRun(read, CellRunner.on(bench), new ProgressLines(say));
            Writing writing = () -> {
                read.write(executed);
                new Report(read, notebook, notebook.getFileName() + ", run with " + CommandTable.Version.line())
                        .write(page);
            };
            RunEnd end = StopSignal.guard(run, writing);
            return said(end, say, executed, page);
        } catch (IOException e) {
            throw new CommandException("the outcome cannot be written: " + reason(e), e);
        }
    }

    private Notebook read() throws CommandException {
        try {
            Notebook read = Notebook.read(notebook);
            Optional<String> foreign = read.language().filter(language -> !language.equals("java"));
            if (foreign.isPresent()) {
                throw new CommandException(
                        notebook + " is written in " + foreign.get() + "; Ladderwell runs notebooks in Java");
            }
            return read;
        } catch (NotebookException e) {
            throw new CommandException(String.valueOf(e.getMessage()), e);
        }
    }

    private static boolean needsJava(Cell cell) {
        return cell.kind() == Cell.Kind.CODE && CellText.of(cell.source()).hasJava();
    }

    private static Path besides(Path executed) {
        String name = String.valueOf(executed.getFileName());
        return executed.resolveSibling(name.replaceFirst("\\.ipynb$", "") + ".html");
    }

    /** Finds out before the work what would spoil it afterwards. */
    private static void checkWritable(Path file) throws CommandException {
        Path folder = Objects.requireNonNull(file.toAbsolutePath().getParent());
        if (!Files.isDirectory(folder)) {
            throw new CommandException("there is no folder " + folder + " to write " + file.getFileName() + " to");
        }
        if (Files.isDirectory(file) || !Files.isWritable(Files.exists(file) ? file : folder)) {
            throw new CommandException(file + " cannot be written");
        }
    }

    private static int said(RunEnd end, PrintStream say, Path executed, Path page) {
        int code = 0;
        if (end instanceof RunEnd.Failed failed) {
            String line = failed.line().isPresent() ? ", line " + failed.line().getAsInt() : "";
            say.println("cell [" + failed.number() + "]" + line + ": " + failed.name() + ": " + failed.message());
            code = CELL_FAILED;
        } else if (end instanceof RunEnd.Stopped stopped) {
            say.println("interrupted at cell [" + stopped.number() + "]");
            code = INTERRUPTED;
        }
        say.println("wrote " + executed + " and " + page);
        return code;
    }

    static String reason(IOException e) {
        String message = String.valueOf(e.getMessage());
        return e instanceof AccessDeniedException ? "access to " + message + " is denied" : message;
    }
}
