package org.levelgaze;

import static com.tngtech.archunit.base.DescribedPredicate.not;
import static com.tngtech.archunit.core.domain.JavaCall.Predicates.target;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.core.domain.properties.HasName.Predicates.nameMatching;
import static com.tngtech.archunit.core.domain.properties.HasOwner.Predicates.With.owner;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.methods;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noMethods;

import com.tngtech.archunit.base.DescribedPredicate;
import com.tngtech.archunit.core.domain.AccessTarget.CodeUnitCallTarget;
import com.tngtech.archunit.core.domain.JavaCall;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaMethod;
import com.tngtech.archunit.lang.ArchCondition;
import com.tngtech.archunit.lang.ArchRule;
import com.tngtech.archunit.lang.ConditionEvents;
import com.tngtech.archunit.lang.SimpleConditionEvent;
import jakarta.persistence.Embeddable;
import jakarta.persistence.Entity;
import jakarta.persistence.MappedSuperclass;
import java.time.Clock;
import java.time.ZoneId;
import java.util.Date;
import java.util.List;
import java.util.TimeZone;
import java.util.stream.Stream;
import org.jspecify.annotations.NullMarked;
import org.junit.platform.commons.annotation.Testable;
import org.springframework.data.repository.Repository;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.ControllerAdvice;

/**
 * The architecture's rules, over any root package, so that they can be held against what they forbid.
 *
 * @param root the package above the modules
 */
record ArchitectureRules(String root) {

    private static final List<String> LANGUAGE =
            List.of("java.lang..", "java.math..", "java.util..", "java.text..", "org.jspecify..");

    /** The engine is pure: no framework, no database, no clock, no other module. */
    ArchRule agreementIsPure() {
        return pure("agreement", "org.apache.commons.math3..");
    }

    /** Pictures are pure as well; a trend has dates on its axis, but nothing that tells today's. */
    ArchRule plotIsPure() {
        return pure("plot", "java.time..");
    }

    /** Reading a file of calls needs bytes and text, the engine's words for calls, and no framework. */
    ArchRule readingIsPure() {
        return pure(
                "studies.reading",
                "java.io..",
                "java.nio..",
                "java.security..",
                "org.apache.commons.csv..",
                "org.apache.commons.io..",
                root + ".agreement..",
                root + ".shared..");
    }

    /** Sentences take findings and words; no framework, no clock. */
    ArchRule sentencesArePure() {
        return pure("studies.sentences", "java.time..", root + ".agreement..");
    }

    private ArchRule pure(String module, String... more) {
        String[] itself = {root + "." + module + "..", "org.springframework.modulith"};
        return classes()
                .that()
                .resideInAPackage(root + "." + module + "..")
                .should()
                .onlyDependOnClassesThat(resideInAnyPackage(LANGUAGE.toArray(String[]::new))
                        .or(resideInAnyPackage(itself))
                        .or(resideInAnyPackage(more))
                        .and(not(type(Clock.class))))
                .because(module + " must be usable and testable with nothing around it");
    }

    /** Nobody but its own module loads an entity. */
    ArchRule entitiesAreNotPublic() {
        return classes()
                .that()
                .areAnnotatedWith(Entity.class)
                .or()
                .areAnnotatedWith(Embeddable.class)
                .or()
                .areAnnotatedWith(MappedSuperclass.class)
                .should()
                .notBePublic()
                .because("modules know each other by ids, public values and events")
                .allowEmptyShould(true);
    }

    /** Nobody but its own module asks a repository. */
    ArchRule repositoriesAreNotPublic() {
        return classes()
                .that()
                .areAssignableTo(Repository.class)
                .or()
                .areMetaAnnotatedWith(org.springframework.stereotype.Repository.class)
                .should()
                .notBePublic()
                .because("a module's tables are its own")
                .allowEmptyShould(true);
    }

    /** Pages and answers are called by requests alone. */
    ArchRule controllersAreNotPublic() {
        return classes()
                .that()
                .areMetaAnnotatedWith(Controller.class)
                .or()
                .areMetaAnnotatedWith(ControllerAdvice.class)
                .should()
                .notBePublic()
                .because("what two controllers need belongs in a service");
    }

    /** Time is a parameter. */
    ArchRule timeComesFromTheClock() {
        DescribedPredicate<JavaCall<?>> now = target(nameMatching("now"))
                .and(target(owner(resideInAnyPackage("java.time.."))))
                .and(not(target(takes(Clock.class))));
        DescribedPredicate<JavaCall<?>> clock =
                target(nameMatching("system.*|tick.*")).and(target(owner(type(Clock.class))));
        DescribedPredicate<JavaCall<?>> zone = target(nameMatching("systemDefault|getDefault|setDefault"))
                .and(target(owner(type(ZoneId.class).or(type(TimeZone.class)))));
        DescribedPredicate<JavaCall<?>> millis =
                target(nameMatching("currentTimeMillis")).and(target(owner(type(System.class))));
        return noClasses()
                .that()
                .doNotHaveFullyQualifiedName(root + ".ClockConfiguration")
                .should()
                .callCodeUnitWhere(now.or(clock).or(zone).or(millis).as("asks the machine for the time or the zone"))
                .orShould()
                .callConstructor(Date.class)
                .because("a test must be able to say what time it is");
    }

    private static DescribedPredicate<JavaClass> type(Class<?> type) {
        return DescribedPredicate.describe(type.getSimpleName(), each -> each.isEquivalentTo(type));
    }

    private static DescribedPredicate<CodeUnitCallTarget> takes(Class<?> type) {
        return DescribedPredicate.describe(
                "takes a " + type.getSimpleName(),
                each -> each.getRawParameterTypes().stream().anyMatch(parameter -> parameter.isEquivalentTo(type)));
    }

    /** Objects are complete from the start. */
    ArchRule nothingHasSetters() {
        return noMethods()
                .that(DescribedPredicate.describe(
                        "take one value and are not asked for by a class of others",
                        (JavaMethod method) -> method.getRawParameterTypes().size() == 1 && !isInherited(method)))
                .should()
                .haveNameMatching("set[A-Z].*")
                .because("what changes has a name of its own, and checks whether it may");
    }

    private static boolean isInherited(JavaMethod method) {
        return Stream.concat(
                        method.getOwner().getAllRawSuperclasses().stream(),
                        method.getOwner().getAllRawInterfaces().stream())
                .flatMap(type -> type.getMethods().stream())
                .anyMatch(other -> other.getName().equals(method.getName()));
    }

    /** A name says what is inside. */
    ArchRule namesSayWhatIsInside() {
        return noClasses()
                .should()
                .haveNameMatching(".*(Utils?|Manager|Helper|Impl)")
                .because("a class that a newcomer cannot place from its name is in the wrong room");
    }

    /**
     * Null is said, not guessed. The package is asked as Java loads it: a test's package has the mark from the main tree,
     * and must not bring a second package-info, which would hide the declared arrows of its module.
     */
    ArchRule packagesAreNullMarked() {
        return classes()
                .should(new ArchCondition<>("be in a package marked @NullMarked") {
                    @Override
                    public void check(JavaClass each, ConditionEvents events) {
                        boolean marked = each.reflect().getPackage().isAnnotationPresent(NullMarked.class);
                        events.add(new SimpleConditionEvent(each, marked, each.getName() + " is in a package without"));
                    }
                })
                .because("NullAway checks marked packages alone");
    }

    /** The build runs a test by its name. */
    ArchRule testsAreCalledTest() {
        return methods()
                .that()
                .areMetaAnnotatedWith(Testable.class)
                .should()
                .beDeclaredInClassesThat(nameMatching(".*Test(\\$.*)?").as("are named …Test"))
                .because("a class of another name is never run");
    }
}
