package ladderwell.launch;

import java.lang.reflect.InvocationTargetException;

/** Checks the Java it runs on, in one line where it will not do, and hands over to the command line. */
public final class Launcher {
    private static final int OLDEST = 17;

    /** The exit code where Java will not do. */
    private static final int WRONG_JAVA = 3;

    private Launcher() {}

    /**
     * Starts the command line.
     *
     * @param arguments as typed
     */
    public static void main(String[] arguments) throws Throwable {
        String complaint = complaint(System.getProperty("java.specification.version", "0"), hasShell());
        if (!complaint.isEmpty()) {
            System.err.println("ladderwell: " + complaint + "; this is Java " + System.getProperty("java.version")
                    + " in " + System.getProperty("java.home"));
            System.exit(WRONG_JAVA);
        }
        try {
            Class.forName("ladderwell.kernel.command.Ladderwell")
                    .getMethod("main", String[].class)
                    .invoke(null, (Object) arguments);
        } catch (InvocationTargetException e) {
            throw e.getCause();
        }
    }

    /** What is wrong with a Java of this version, or nothing. */
    static String complaint(String version, boolean hasShell) {
        int feature;
        try {
            String number = version.startsWith("1.") ? version.substring(2) : version;
            feature = Integer.parseInt(number.split("\\.")[0]);
        } catch (NumberFormatException e) {
            feature = OLDEST;
        }
        if (feature < OLDEST) {
            return "Java " + OLDEST + " or newer is needed";
        }
        return hasShell ? "" : "a full JDK is needed, with the module jdk.jshell";
    }

    private static boolean hasShell() {
        try {
            Class.forName("jdk.jshell.JShell", false, ClassLoader.getSystemClassLoader());
            return true;
        } catch (ClassNotFoundException | LinkageError e) {
            return false;
        }
    }
}
