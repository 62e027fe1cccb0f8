package io.github.spencerpark.ijava;

import io.github.spencerpark.jupyter.kernel.BaseKernel;
import io.github.spencerpark.jupyter.kernel.LanguageInfo;
import io.github.spencerpark.jupyter.kernel.display.DisplayData;
import io.github.spencerpark.jupyter.kernel.magic.MagicParser;
import io.github.spencerpark.jupyter.kernel.magic.registry.Magics;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import ladderwell.kernel.session.JavaEnd;
import ladderwell.kernel.session.JavaSession;

/**
 * Stands in for the kernel of that name, which is on no public repository: the methods that a plugin calls, over the
 * base library's real magics and renderer. A line magic runs inside a snippet there; here it runs beside it.
 */
public final class IJava {
    private static Kernel kernel = new Kernel();

    private IJava() {}

    public static Kernel getKernelInstance() {
        return kernel;
    }

    /** Starts afresh. */
    public static Kernel restart() {
        kernel.session.close();
        kernel = new Kernel();
        return kernel;
    }

    /** The kernel. */
    public static final class Kernel extends BaseKernel {
        private final JavaSession session = new JavaSession(List.of("java.util.*"));
        private final Magics magics = new Magics();
        private final MagicParser parser = new MagicParser();
        public final List<DisplayData> displayed = new ArrayList<>();

        public Magics getMagics() {
            return magics;
        }

        public Object evalRaw(String text) throws Exception {
            JavaEnd end = session.run(text, 1, 1);
            if (end instanceof JavaEnd.Done done) {
                return done.value().orElse(null);
            }
            throw new Exception(end instanceof JavaEnd.Failed failed ? failed.message() : "stopped");
        }

        @Override
        public void display(DisplayData data) {
            displayed.add(data);
        }

        @Override
        public DisplayData eval(String cell) throws Exception {
            Optional<Object> value;
            var cellMagic = parser.parseCellMagic(cell);
            if (cellMagic != null) {
                var call = cellMagic.getMagicCall();
                value = Optional.ofNullable(magics.applyCellMagic(call.getName(), call.getArgs(), call.getBody()));
            } else if (cell.startsWith("%")) {
                List<Exception> thrown = new ArrayList<>();
                List<Object> values = new ArrayList<>();
                parser.transformLineMagics(cell, context -> {
                    try {
                        values.add(magics.applyLineMagic(
                                context.getMagicCall().getName(),
                                context.getMagicCall().getArgs()));
                    } catch (Exception e) {
                        thrown.add(e);
                    }
                    return "";
                });
                if (!thrown.isEmpty()) {
                    throw thrown.get(0);
                }
                value = Optional.ofNullable(values.get(values.size() - 1));
            } else {
                value = Optional.ofNullable(evalRaw(cell));
            }
            return value.map(v ->
                            v instanceof DisplayData data ? data : getRenderer().render(v))
                    .orElse(null);
        }

        @Override
        public LanguageInfo getLanguageInfo() {
            return new LanguageInfo.Builder("java").build();
        }
    }
}
