package org.levelgaze.access;

import java.util.Arrays;
import java.util.HashSet;
import java.util.Set;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.springframework.security.core.Authentication;

/**
 * Who may take a route.
 *
 * @param open whether no sign-in is needed
 * @param authorities otherwise the rights of which one is enough
 */
record Admission(boolean open, Set<String> authorities) {

    /** Anybody at all. */
    static Admission everybody() {
        return new Admission(true, Set.of());
    }

    /** Any person who is signed in. */
    static Admission anyPerson() {
        return people(Role.values());
    }

    /** People with one of these roles. */
    static Admission people(Role... roles) {
        return new Admission(false, Arrays.stream(roles).map(Role::authority).collect(Collectors.toSet()));
    }

    /** People whose roles come with a permission. */
    static Admission people(Permission permission) {
        return people(Arrays.stream(Role.values()).filter(permission::comesWith).toArray(Role[]::new));
    }

    /** Programs with a token that has one of these scopes. */
    static Admission programs(Scope... scopes) {
        return new Admission(false, Arrays.stream(scopes).map(Scope::authority).collect(Collectors.toSet()));
    }

    /** Whoever this or the other admits. */
    Admission or(Admission other) {
        Set<String> both = new HashSet<>(authorities);
        both.addAll(other.authorities);
        return new Admission(open || other.open, Set.copyOf(both));
    }

    boolean admits(@Nullable Authentication caller) {
        return open || (caller != null && caller.isAuthenticated() && hasOneOf(caller));
    }

    private boolean hasOneOf(Authentication caller) {
        return caller.getAuthorities().stream().anyMatch(right -> authorities.contains(right.getAuthority()));
    }

    /** The scopes of which one would be enough, for the answer to a token without them. */
    String scopes() {
        return Arrays.stream(Scope.values())
                .filter(scope -> authorities.contains(scope.authority()))
                .map(Scope::code)
                .collect(Collectors.joining(", "));
    }
}
