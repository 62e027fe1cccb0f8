package ladderwell.kernel;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.junit.AnalyzeClasses;
import com.tngtech.archunit.junit.ArchTest;
import com.tngtech.archunit.lang.ArchCondition;
import com.tngtech.archunit.lang.ArchRule;
import com.tngtech.archunit.lang.ConditionEvents;
import com.tngtech.archunit.lang.SimpleConditionEvent;

/** Which package of the kernel may use which, and who sees the protocol. */
@AnalyzeClasses(packages = "ladderwell.kernel", importOptions = ImportOption.DoNotIncludeTests.class)
class KernelRoomsTest {
    private static final String KERNEL = "ladderwell.kernel.";

    private static ArchRule only(String room, String... lower) {
        return classes()
                .that()
                .resideInAPackage(KERNEL + room + "..")
                .should(new ArchCondition<JavaClass>("use no kernel package but the allowed ones") {
                    @Override
                    public void check(JavaClass item, ConditionEvents events) {
                        item.getDirectDependenciesFromSelf().forEach(dependency -> {
                            String target = dependency.getTargetClass().getPackageName();
                            boolean allowed = !target.startsWith(KERNEL) || target.startsWith(KERNEL + room);
                            for (String name : lower) {
                                allowed |= target.startsWith(KERNEL + name);
                            }
                            if (!allowed) {
                                events.add(SimpleConditionEvent.violated(dependency, dependency.getDescription()));
                            }
                        });
                    }
                });
    }

    @ArchTest
    static final ArchRule session = only("session");

    @ArchTest
    static final ArchRule cell = only("cell", "session");

    @ArchTest
    static final ArchRule sentence = only("sentence");

    @ArchTest
    static final ArchRule magic = only("magic", "sentence", "cell");

    @ArchTest
    static final ArchRule picture = only("picture", "magic", "cell");

    @ArchTest
    static final ArchRule render = only("render", "picture", "magic", "cell");

    @ArchTest
    static final ArchRule notebook = only("notebook", "render", "picture", "magic", "cell");

    @ArchTest
    static final ArchRule host = only("host", "render", "picture", "magic", "sentence", "cell", "session");

    @ArchTest
    static final ArchRule onlyTheHostSeesTheProtocol = noClasses()
            .that()
            .resideOutsideOfPackages("ladderwell.kernel.host..", "ladderwell.kernel.command..")
            .should()
            .dependOnClassesThat()
            .resideInAnyPackage("io.github.spencerpark..", "org.zeromq..");

    @ArchTest
    static final ArchRule packagesAreFreeOfCycles =
            slices().matching("ladderwell.kernel.(*)..").should().beFreeOfCycles();
}
