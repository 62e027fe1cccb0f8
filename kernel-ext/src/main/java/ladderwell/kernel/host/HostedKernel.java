package ladderwell.kernel.host;

import io.github.spencerpark.jupyter.kernel.BaseKernel;
import io.github.spencerpark.jupyter.kernel.display.DisplayData;
import io.github.spencerpark.jupyter.kernel.magic.registry.Magics;
import java.lang.reflect.InvocationTargetException;
import java.lang.reflect.Method;
import ladderwell.kernel.cell.MimeBundle;

/**
 * A running kernel that is not ours, as far as a plugin needs it. Its class is not on our class path when we are
 * compiled, so what the common base class lacks is reached by reflection.
 */
final class HostedKernel {
    private static final String CLASS = "io.github.spencerpark.ijava.IJava";

    private final BaseKernel kernel;
    private final Magics magics;
    private final Method evaluate;

    private HostedKernel(BaseKernel kernel, Magics magics, Method evaluate) {
        this.kernel = kernel;
        this.magics = magics;
        this.evaluate = evaluate;
    }

    /**
     * The kernel of this process.
     *
     * @throws IllegalStateException when there is none, or one of another make
     */
    static HostedKernel running() {
        try {
            return of(find(Thread.currentThread().getContextClassLoader()));
        } catch (ClassNotFoundException e) {
            throw missing(e);
        }
    }

    /** The kernel that a class with the method {@code getKernelInstance} gives. */
    static HostedKernel of(Class<?> owner) {
        try {
            Object kernel = owner.getMethod("getKernelInstance").invoke(null);
            if (!(kernel instanceof BaseKernel base)) {
                throw new IllegalStateException("no Java kernel is running in this process; found " + kernel);
            }
            Object magics = kernel.getClass().getMethod("getMagics").invoke(kernel);
            return new HostedKernel(base, (Magics) magics, kernel.getClass().getMethod("evalRaw", String.class));
        } catch (ReflectiveOperationException | ClassCastException e) {
            throw missing(e);
        }
    }

    private static IllegalStateException missing(Exception e) {
        return new IllegalStateException(
                "Ladderwell can be installed in a running IJava kernel only; found none (" + e + ")", e);
    }

    private static Class<?> find(ClassLoader loader) throws ClassNotFoundException {
        try {
            return Class.forName(CLASS, true, HostedKernel.class.getClassLoader());
        } catch (ClassNotFoundException e) {
            return Class.forName(CLASS, true, loader);
        }
    }

    Magics magics() {
        return magics;
    }

    BaseKernel kernel() {
        return kernel;
    }

    /**
     * The value of an expression or statement in the kernel's session; null as Java has it.
     *
     * @throws Exception whatever the kernel throws when Java refuses the text or it throws
     */
    @SuppressWarnings("NullAway") // The kernel's own method returns null for statements.
    Object evaluate(String text) throws Exception {
        try {
            return evaluate.invoke(kernel, text);
        } catch (InvocationTargetException e) {
            if (e.getCause() instanceof Exception cause) {
                throw cause;
            }
            throw e;
        }
    }

    /** A bundle in the form in which the kernel shows it. */
    static DisplayData displayData(MimeBundle bundle) {
        DisplayData data = new DisplayData();
        bundle.data().forEach(data::putData);
        bundle.metadata().forEach(data::putMetaData);
        return data;
    }
}
