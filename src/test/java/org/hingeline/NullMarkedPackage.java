package org.hingeline;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.lang.ArchCondition;
import com.tngtech.archunit.lang.ConditionEvents;
import com.tngtech.archunit.lang.SimpleConditionEvent;
import org.jspecify.annotations.NullMarked;

/** The condition that a class stands in a package marked {@code @NullMarked}, so that the null checker guards it. */
final class NullMarkedPackage extends ArchCondition<JavaClass> {
    static final NullMarkedPackage STAND_IN_ONE = new NullMarkedPackage();

    private NullMarkedPackage() {
        super("stand in a null-marked package");
    }

    @Override
    public void check(JavaClass type, ConditionEvents events) {
        boolean marked = type.getPackage().isAnnotatedWith(NullMarked.class);
        events.add(new SimpleConditionEvent(
                type, marked, type.getFullName() + (marked ? " is" : " is not") + " in a null-marked package"));
    }
}
