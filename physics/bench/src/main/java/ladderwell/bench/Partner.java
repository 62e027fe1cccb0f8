package ladderwell.bench;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.OutputStreamWriter;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** A Python process that times its variants when asked; see partner.py for what is said. */
final class Partner implements AutoCloseable {
    /**
     * The time and error of one way to do the task.
     *
     * @param name a leading star marks a way beyond ordinary craft, shown beside the goal but not part of it
     * @param milliseconds shortest time of one run in a sample
     */
    record Variant(String name, double milliseconds, double error) {
        boolean tuned() {
            return name.startsWith("*");
        }
    }

    private final Process process;
    private final BufferedReader from;
    private final Writer to;
    private final String blas;

    Partner(Path scripts, List<String> command, int threads) throws IOException {
        List<String> line = new ArrayList<>(List.of("/usr/bin/python3", "-B"));
        line.add(scripts.resolve(command.get(0)).toString());
        line.addAll(command.subList(1, command.size()));
        ProcessBuilder builder = new ProcessBuilder(line).redirectError(ProcessBuilder.Redirect.INHERIT);
        builder.environment().put("OPENBLAS_NUM_THREADS", Integer.toString(threads));
        builder.environment().put("OMP_NUM_THREADS", Integer.toString(threads));
        process = builder.start();
        from = process.inputReader(StandardCharsets.UTF_8);
        to = new OutputStreamWriter(process.getOutputStream(), StandardCharsets.UTF_8);
        String[] ready = read().split("\t", 2);
        if (!ready[0].equals("ready") || ready.length != 2) {
            throw new IOException(command.get(0) + " did not begin with `ready`");
        }
        blas = ready[1];
    }

    /** The OpenBLAS kernel and its threads. */
    String blas() {
        return blas;
    }

    /** Times every variant once more. */
    List<Variant> sample() throws IOException {
        to.write("go\n");
        to.flush();
        List<Variant> variants = new ArrayList<>();
        for (String line = read(); !line.isEmpty(); line = read()) {
            String[] part = line.split("\t", 3);
            variants.add(new Variant(part[0], Double.parseDouble(part[1]), Double.parseDouble(part[2])));
        }
        return variants;
    }

    private String read() throws IOException {
        String line = from.readLine();
        if (line == null) {
            throw new IOException("the Python partner ended; its message is above");
        }
        return line;
    }

    @Override
    public void close() throws IOException {
        to.close();
        try {
            process.waitFor();
        } catch (InterruptedException interrupt) {
            process.destroy();
            Thread.currentThread().interrupt();
        }
    }
}
