package ladderwell.kernel.command;

import com.google.gson.Gson;
import com.google.gson.GsonBuilder;
import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import java.io.FileNotFoundException;
import java.io.IOException;
import java.io.InputStream;
import java.lang.module.ModuleFinder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * The folder in which Jupyter finds the kernel: the jar, its class-data archive, marks, and {@code kernel.json}, which
 * is written last. Each file is moved into place whole, so that a kernel that is running or starting meanwhile sees
 * either the old or the new.
 *
 * @param folder the folder, absolute
 * @param name the name of the kernel
 * @param java the program that starts it: the Java that runs now
 */
record KernelSpec(Path folder, String name, Path java) {
    private static final List<String> MARKS = List.of("logo-svg.svg", "logo-32x32.png", "logo-64x64.png");

    private static final Gson GSON =
            new GsonBuilder().setPrettyPrinting().disableHtmlEscaping().create();

    static KernelSpec of(Path folder, String name) {
        boolean windows =
                System.getProperty("os.name", "").toLowerCase(Locale.ROOT).startsWith("windows");
        Path java = Path.of(System.getProperty("java.home"), "bin", windows ? "java.exe" : "java");
        return new KernelSpec(folder, name, java);
    }

    Path jar() {
        return folder.resolve("ladderwell.jar");
    }

    Path archive() {
        return folder.resolve("ladderwell.jsa");
    }

    /**
     * The command that starts the kernel, but for its arguments.
     *
     * @param archiving the flag that makes or uses a class-data archive
     */
    List<String> start(List<String> archiving) {
        List<String> command = new ArrayList<>(List.of(java.toString(), "-XX:+UseSerialGC"));
        command.addAll(archiving);
        if (ModuleFinder.ofSystem().find("jdk.incubator.vector").isPresent()) {
            command.add("--add-modules=jdk.incubator.vector");
        }
        command.addAll(List.of("-Djava.awt.headless=true", "-jar", jar().toString()));
        return command;
    }

    /** Brings the jar to its place. The archive of an older one goes: it would not fit. */
    void copyJar(Path from) throws IOException {
        Files.createDirectories(folder);
        if (Files.exists(jar()) && Files.isSameFile(from, jar())) {
            return;
        }
        Path part = folder.resolve("ladderwell.jar.part");
        Files.copy(from, part, StandardCopyOption.REPLACE_EXISTING);
        Files.deleteIfExists(archive());
        Files.move(part, jar(), StandardCopyOption.REPLACE_EXISTING);
    }

    /** Writes the marks and then {@code kernel.json}. */
    void write(boolean archived) throws IOException {
        for (String mark : MARKS) {
            try (InputStream in = KernelSpec.class.getResourceAsStream(mark)) {
                if (in == null) {
                    throw new FileNotFoundException("this jar lacks its " + mark);
                }
                Files.copy(in, folder.resolve(mark), StandardCopyOption.REPLACE_EXISTING);
            }
        }
        Path part = folder.resolve("kernel.json.part");
        Files.write(part, (GSON.toJson(json(archived)) + "\n").getBytes(StandardCharsets.UTF_8));
        Files.move(part, folder.resolve("kernel.json"), StandardCopyOption.REPLACE_EXISTING);
    }

    private JsonObject json(boolean archived) {
        JsonArray argv = new JsonArray();
        start(archived ? StartupArchive.use(archive()) : List.of()).forEach(argv::add);
        argv.add("kernel");
        argv.add("{connection_file}");
        JsonObject json = new JsonObject();
        json.add("argv", argv);
        json.addProperty("display_name", name.equals("ladderwell") ? "Ladderwell" : "Ladderwell (" + name + ")");
        json.addProperty("language", "java");
        json.addProperty("interrupt_mode", "message");
        json.add("metadata", new JsonObject());
        return json;
    }
}
