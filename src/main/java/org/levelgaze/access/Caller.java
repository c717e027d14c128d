package org.levelgaze.access;

import java.util.Arrays;
import java.util.Collection;
import java.util.LinkedHashSet;
import java.util.Set;
import java.util.function.Predicate;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.springframework.security.authentication.AbstractAuthenticationToken;
import org.springframework.security.core.GrantedAuthority;
import org.springframework.security.core.authority.AuthorityUtils;

/** Whoever sent a request: a person who is signed in, or a program with a token. */
public final class Caller extends AbstractAuthenticationToken {

    private static final long serialVersionUID = 1L;

    private final transient Actor actor;
    private final String displayName;

    private Caller(Actor actor, String displayName, Collection<? extends GrantedAuthority> authorities) {
        super(authorities);
        this.actor = actor;
        this.displayName = displayName;
        setAuthenticated(true);
    }

    /**
     * A person who is signed in.
     *
     * @param actor the account, at its site
     * @param displayName the person's name on screen
     * @param roles the account's roles
     */
    public static Caller person(Actor actor, String displayName, Set<Role> roles) {
        Set<String> rights = permissions(permission -> roles.stream().anyMatch(permission::comesWith));
        roles.forEach(role -> rights.add(role.authority()));
        rights.add("ROLE_PERSON");
        return new Caller(actor, displayName, AuthorityUtils.createAuthorityList(rights));
    }

    /**
     * A program with a token.
     *
     * @param actor the token, at its site
     * @param label what the token is called
     * @param scopes what the token may do
     */
    public static Caller program(Actor actor, String label, Set<Scope> scopes) {
        Set<String> rights = permissions(permission -> scopes.stream().anyMatch(permission::comesWith));
        scopes.forEach(scope -> rights.add(scope.authority()));
        return new Caller(actor, label, AuthorityUtils.createAuthorityList(rights));
    }

    private static Set<String> permissions(Predicate<Permission> granted) {
        Set<String> rights = new LinkedHashSet<>();
        Arrays.stream(Permission.values()).filter(granted).forEach(permission -> rights.add(permission.authority()));
        return rights;
    }

    /** Who acts, and at which site. */
    public Actor actor() {
        return actor;
    }

    /** Whether this is a person in a browser, not a program with a token. */
    public boolean isPerson() {
        return getAuthorities().stream().anyMatch(right -> "ROLE_PERSON".equals(right.getAuthority()));
    }

    /** The person's name on screen, or what the token is called. */
    @Override
    public String getName() {
        return displayName;
    }

    @Override
    public Object getPrincipal() {
        return actor.who();
    }

    /** What proved the identity is not kept. */
    @Override
    public @Nullable Object getCredentials() {
        return null;
    }
}
