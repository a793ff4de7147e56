package org.hingeline;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.Architectures.layeredArchitecture;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;

import com.tngtech.archunit.base.DescribedPredicate;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.junit.AnalyzeClasses;
import com.tngtech.archunit.junit.ArchTest;
import com.tngtech.archunit.lang.ArchRule;
import java.time.Clock;
import java.time.Instant;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZonedDateTime;

/** Which package may see which: the outline drawn in DEVELOPERS.md, as a test. */
@AnalyzeClasses(packages = "org.hingeline", importOptions = ImportOption.DoNotIncludeTests.class)
class ArchitectureTest {
    private static final String[] CORE = {
        "org.hingeline.measure..",
        "org.hingeline.seawater..",
        "org.hingeline.quality..",
        "org.hingeline.alert..",
        "org.hingeline.dosing..",
        "org.hingeline.hatchery.."
    };

    @ArchTest
    static final ArchRule packages_point_one_way = layeredArchitecture()
            .consideringOnlyDependenciesInLayers()
            .layer("measure")
            .definedBy("org.hingeline.measure..")
            .layer("seawater")
            .definedBy("org.hingeline.seawater..")
            .layer("quality")
            .definedBy("org.hingeline.quality..")
            .layer("alert")
            .definedBy("org.hingeline.alert..")
            .layer("dosing")
            .definedBy("org.hingeline.dosing..")
            .layer("hatchery")
            .definedBy("org.hingeline.hatchery..")
            .layer("monitor")
            .definedBy("org.hingeline.monitor..")
            .layer("store")
            .definedBy("org.hingeline.store..")
            .layer("delivery")
            .definedBy("org.hingeline.delivery..")
            .layer("web")
            .definedBy("org.hingeline.web..")
            .layer("config")
            .definedBy("org.hingeline.config..")
            .layer("demo")
            .definedBy("org.hingeline.demo..")
            .layer("root")
            .definedBy("org.hingeline")
            .whereLayer("measure")
            .mayNotAccessAnyLayer()
            .whereLayer("seawater")
            .mayOnlyAccessLayers("measure")
            .whereLayer("quality")
            .mayOnlyAccessLayers("measure")
            .whereLayer("alert")
            .mayOnlyAccessLayers("measure")
            .whereLayer("dosing")
            .mayOnlyAccessLayers("measure", "seawater")
            .whereLayer("hatchery")
            .mayOnlyAccessLayers("measure", "seawater")
            .whereLayer("monitor")
            .mayOnlyAccessLayers("measure", "seawater", "quality", "alert", "dosing", "hatchery")
            .whereLayer("store")
            .mayOnlyAccessLayers("measure", "seawater", "quality", "alert", "dosing", "hatchery", "monitor")
            .whereLayer("delivery")
            .mayOnlyAccessLayers("measure", "seawater", "quality", "alert", "dosing", "hatchery", "monitor")
            .whereLayer("web")
            .mayOnlyAccessLayers("measure", "seawater", "quality", "alert", "dosing", "hatchery", "monitor")
            .whereLayer("config")
            .mayOnlyAccessLayers("measure", "seawater", "quality", "alert", "dosing", "hatchery", "monitor")
            .whereLayer("demo")
            .mayOnlyAccessLayers("measure", "seawater", "quality", "alert", "dosing", "hatchery")
            .whereLayer("root")
            .mayNotBeAccessedByAnyLayer();

    @ArchTest
    static final ArchRule the_core_needs_nothing_but_java = classes()
            .that()
            .resideInAnyPackage(CORE)
            .should()
            .onlyDependOnClassesThat()
            .resideInAnyPackage(concat(CORE, "java..", "org.jspecify.annotations.."))
            .because("the core is pure: it can be read, tested and moved without the rest");

    @ArchTest
    static final ArchRule the_core_touches_neither_files_nor_network_nor_database = noClasses()
            .that()
            .resideInAnyPackage(CORE)
            .should()
            .dependOnClassesThat()
            .resideInAnyPackage("java.io..", "java.net..", "java.nio..", "java.sql..", "javax.sql..");

    @ArchTest
    static final ArchRule the_clock_is_passed_in = noClasses()
            .that()
            .resideOutsideOfPackage("org.hingeline")
            .should()
            .callMethod(Instant.class, "now")
            .orShould()
            .callMethod(LocalDate.class, "now")
            .orShould()
            .callMethod(LocalDateTime.class, "now")
            .orShould()
            .callMethod(OffsetDateTime.class, "now")
            .orShould()
            .callMethod(ZonedDateTime.class, "now")
            .orShould()
            .callMethod(Clock.class, "systemUTC")
            .orShould()
            .callMethod(Clock.class, "systemDefaultZone")
            .orShould()
            .callMethod(System.class, "currentTimeMillis");

    @ArchTest
    static final ArchRule every_package_is_null_marked = classes()
            .that(new DescribedPredicate<JavaClass>("are hand-written") {
                @Override
                public boolean test(JavaClass type) {
                    return !type.getPackageName().startsWith("org.hingeline.web.pages");
                }
            })
            .should(NullMarkedPackage.STAND_IN_ONE);

    @ArchTest
    static final ArchRule no_two_packages_need_each_other =
            slices().matching("org.hingeline.(*)..").should().beFreeOfCycles();

    private static String[] concat(String[] first, String... more) {
        String[] all = java.util.Arrays.copyOf(first, first.length + more.length);
        System.arraycopy(more, 0, all, first.length, more.length);
        return all;
    }
}
