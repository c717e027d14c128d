package org.levelgaze.access;

import static org.levelgaze.access.Role.ADMINISTRATOR;
import static org.levelgaze.access.Role.AUDITOR;
import static org.levelgaze.access.Role.HOLDER_OF_THE_STANDARD;
import static org.levelgaze.access.Role.PROCTOR;
import static org.levelgaze.access.Role.QUALITY_ENGINEER;

import java.util.Set;

/**
 * What roles and scopes add up to. A page of any module asks {@code request.isUserInRole("TRUE_STATES")} with the name of a
 * permission, and so needs to know neither roles nor tokens.
 */
public enum Permission {
    /** May read studies, appraisers, tasks and sets. */
    READ(Scope.READ, ADMINISTRATOR, QUALITY_ENGINEER, HOLDER_OF_THE_STANDARD, PROCTOR, AUDITOR),
    /** May see true states piece by piece; seeing them is recorded as having seen the answer key. */
    TRUE_STATES(Scope.KEY_READ, ADMINISTRATOR, QUALITY_ENGINEER, HOLDER_OF_THE_STANDARD, AUDITOR),
    /** May import studies and store facts. */
    WRITE(Scope.WRITE, ADMINISTRATOR, QUALITY_ENGINEER, HOLDER_OF_THE_STANDARD),
    /** May read the journal. */
    JOURNAL(Scope.READ, ADMINISTRATOR, QUALITY_ENGINEER, AUDITOR),
    /** May change settings, accounts and tokens. */
    SETTINGS(Scope.ADMIN, ADMINISTRATOR);

    private final Scope scope;

    @SuppressWarnings("ImmutableEnumChecker")
    private final Set<Role> roles;

    Permission(Scope scope, Role... roles) {
        this.scope = scope;
        this.roles = Set.of(roles);
    }

    boolean comesWith(Role role) {
        return roles.contains(role);
    }

    boolean comesWith(Scope granted) {
        return scope == granted;
    }

    /** The name of the right that Spring Security checks. */
    String authority() {
        return "ROLE_" + name();
    }
}
