package ladderwell.kernel.host;

import io.github.spencerpark.jupyter.kernel.display.DisplayData;
import io.github.spencerpark.jupyter.kernel.display.RenderContext;
import io.github.spencerpark.jupyter.kernel.display.mime.MIMEType;
import java.util.List;
import java.util.Optional;
import ladderwell.Oscillator;
import ladderwell.Run;
import ladderwell.State;
import ladderwell.kernel.cell.CellOutput;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.cell.Names;
import ladderwell.kernel.cell.Renderer;
import ladderwell.kernel.cell.SentenceContext;
import ladderwell.kernel.cell.SentenceFailure;
import ladderwell.kernel.cell.Sentences;
import ladderwell.kernel.magic.Animation;
import ladderwell.kernel.magic.Declarations;
import ladderwell.kernel.magic.Declared;
import ladderwell.kernel.magic.LevelTable;
import ladderwell.kernel.magic.TableRead;
import ladderwell.kernel.render.Renderings;
import ladderwell.kernel.sentence.Noun;
import org.jspecify.annotations.Nullable;
import tech.tablesaw.api.Table;
import tech.tablesaw.plotly.components.Figure;

/**
 * Ladderwell inside an existing IJava kernel: with the jar on its class path, one call installs the sentences as magics
 * and the forms in which results are shown.
 *
 * <p>That kernel cuts the arguments of a line magic at blanks and drops quotes and backslashes. They are put back as far
 * as can be told; {@code %%declare} passes its lines unharmed and is the safer form.
 */
public final class Plugin {
    private final HostedKernel host;
    private final Sentences sentences;
    private final Renderer renderer;
    private final HostedNames names;

    private Plugin(HostedKernel host, Sentences sentences, Renderer renderer) {
        this.host = host;
        this.sentences = sentences;
        this.renderer = renderer;
        this.names = new HostedNames(host);
    }

    /**
     * Installs Ladderwell in the running kernel: the nouns as line magics, {@code %%declare}, and the forms of its
     * results.
     *
     * @throws IllegalStateException when no IJava kernel is running in this process
     */
    public static void install() {
        Declarations declarations = new Declarations();
        List<String> nouns =
                declarations.grammar().nouns().stream().map(Noun::word).toList();
        List<Class<?>> shown = List.of(
                Oscillator.class,
                State.class,
                Run.class,
                Declared.class,
                TableRead.class,
                LevelTable.class,
                Animation.class,
                Table.class,
                Figure.class);
        install(declarations, new Renderings(), nouns, shown);
    }

    /**
     * Installs a language in the running kernel.
     *
     * @param nouns the words that become line magics
     * @param shown the types whose values the renderer shows, also where plain Java cells return them
     */
    static void install(Sentences sentences, Renderer renderer, List<String> nouns, List<Class<?>> shown) {
        HostedKernel host = HostedKernel.running();
        Plugin plugin = new Plugin(host, sentences, renderer);
        for (String noun : nouns) {
            host.magics().registerLineMagic(noun, arguments -> plugin.run("%" + noun + " " + joined(arguments)));
        }
        host.magics()
                .registerCellMagic(
                        "declare", (arguments, body) -> plugin.run("%%declare " + joined(arguments) + "\n" + body));
        shown.forEach(plugin::show);
    }

    private <T> void show(Class<T> type) {
        host.kernel()
                .getRenderer()
                .createRegistration(type)
                .preferring(MIMEType.TEXT_HTML)
                .supporting(MIMEType.TEXT_PLAIN)
                .register(this::show);
    }

    private void show(Object value, RenderContext context) {
        MimeBundle bundle = renderer.render(value);
        bundle.data().forEach((type, text) -> {
            if (type.equals(MimeBundle.PLAIN) || type.equals(MimeBundle.HTML)) {
                MIMEType mime = type.equals(MimeBundle.HTML) ? MIMEType.TEXT_HTML : MIMEType.TEXT_PLAIN;
                context.renderIfRequested(mime, () -> text);
            }
        });
    }

    /** The arguments as they were typed, as far as can be told: the kernel took away quotes and blanks. */
    static String joined(List<String> arguments) {
        StringBuilder line = new StringBuilder();
        for (int i = 0; i < arguments.size(); i++) {
            String argument = arguments.get(i);
            boolean commaFollows =
                    i + 1 < arguments.size() && arguments.get(i + 1).startsWith(",");
            boolean inBraces = line.lastIndexOf("{") > line.lastIndexOf("}") || argument.startsWith("{");
            boolean quoted = commaFollows || !inBraces && argument.matches(".*[\\s*(].*");
            line.append(i == 0 || argument.startsWith(",") ? "" : " ")
                    .append(quoted && !argument.startsWith(",") ? "\"" + argument + "\"" : argument);
        }
        return line.toString();
    }

    /**
     * For the kernel's own use: the text that defines a variable calls this to get its value.
     *
     * @throws IllegalStateException when no variable of that name is being defined
     */
    public static Object value(String name) {
        return HostedNames.handedOver(name);
    }

    private @Nullable Object run(String text) throws Exception {
        Magic magic = new Magic();
        try {
            sentences.run(text, magic);
        } catch (SentenceFailure e) {
            names.undo();
            magic.showLast();
            for (String line : e.lines()) {
                System.err.println(line);
            }
            throw new IllegalArgumentException(e.message(), e);
        } catch (RuntimeException | Error e) {
            names.undo();
            throw e;
        }
        names.keep();
        return magic.last;
    }

    /** One run of one magic. */
    private final class Magic implements SentenceContext, CellOutput {
        private @Nullable DisplayData last;

        @Override
        public Names names() {
            return names;
        }

        @Override
        public int firstLine() {
            return 1;
        }

        @Override
        public Object evaluate(String expression) throws SentenceFailure {
            Object value;
            try {
                names.keep();
                value = host.evaluate(expression);
            } catch (Exception e) {
                String why = e.getMessage() == null ? e.toString() : e.getMessage();
                throw new SentenceFailure("Java cannot evaluate {" + expression + "}: " + why, List.of(), e);
            }
            if (value == null) {
                throw new SentenceFailure("{" + expression + "} has no value", List.of());
            }
            return value;
        }

        @Override
        public void emit(Object result) {
            showLast();
            last = HostedKernel.displayData(renderer.render(result));
        }

        private void showLast() {
            DisplayData data = last;
            if (data != null) {
                host.kernel().display(data);
                last = null;
            }
        }

        @Override
        public CellOutput output() {
            return this;
        }

        @Override
        public void stdout(String text) {
            System.out.print(text);
        }

        @Override
        public void stderr(String text) {
            System.err.print(text);
        }

        @Override
        public void display(MimeBundle bundle, Optional<String> displayId) {
            showLast();
            DisplayData data = HostedKernel.displayData(bundle);
            displayId.ifPresent(data::setDisplayId);
            host.kernel().display(data);
        }

        @Override
        public void update(MimeBundle bundle, String displayId) {
            host.kernel().getIO().display.updateDisplay(displayId, HostedKernel.displayData(bundle));
        }

        @Override
        public void clear(boolean wait) {
            // That kernel has no such message; what was shown stays.
        }
    }
}
