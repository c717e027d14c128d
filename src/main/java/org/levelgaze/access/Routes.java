package org.levelgaze.access;

import static org.levelgaze.access.Admission.anyPerson;
import static org.levelgaze.access.Admission.everybody;
import static org.levelgaze.access.Admission.people;
import static org.levelgaze.access.Admission.programs;
import static org.springframework.http.HttpMethod.GET;
import static org.springframework.http.HttpMethod.POST;

import jakarta.servlet.http.HttpServletRequest;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Supplier;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpMethod;
import org.springframework.security.core.Authentication;

/**
 * Every route of the program and who may take it; the first that matches decides, and what is not here is open to nobody.
 * A new route needs a line here and one in the table of {@code RouteTableTest}.
 */
final class Routes {

    private static final List<Route> ALL = new Routes().lay();

    private final List<Route> laid = new ArrayList<>();

    private Routes() {}

    /** The route that decides over a request, if there is one. */
    static Optional<Route> of(HttpServletRequest request) {
        return ALL.stream().filter(route -> route.matches(request)).findFirst();
    }

    /** Whether a request may go on; who sent it is looked up only when that matters. */
    static boolean admit(HttpServletRequest request, Supplier<? extends @Nullable Authentication> caller) {
        Optional<Admission> admission = of(request).map(Route::admission);
        return admission.isPresent()
                && (admission.get().open() || admission.get().admits(caller.get()));
    }

    /** The methods that the address of a request takes, none when there is nothing at it. */
    static Set<HttpMethod> methodsAt(HttpServletRequest request) {
        return ALL.stream()
                .filter(route -> route.path().matches(request))
                .map(Route::method)
                .collect(Collectors.toSet());
    }

    private List<Route> lay() {
        open();
        pages();
        settings();
        api();
        measurements();
        return List.copyOf(laid);
    }

    private void open() {
        add(GET, everybody(), "/css/**", "/js/**", "/fonts/**", "/icons/**", "/webjars/**", "/favicon.ico");
        add(GET, everybody(), "/problems", "/problems/**", "/error");
        add(POST, everybody(), "/error");
        add(GET, everybody(), "/setup", "/sign-in");
        add(POST, everybody(), "/setup", "/sign-in", "/sign-out");
    }

    private void pages() {
        add(GET, anyPerson(), "/", "/account");
        add(POST, anyPerson(), "/account/password", "/account/language");
        add(GET, people(Permission.WRITE), "/studies/import", "/studies/import/**");
        add(POST, people(Permission.WRITE), "/studies/import", "/studies/import/**");
        add(GET, people(Permission.READ), "/studies", "/studies/{id}", "/studies/{id}/summary");
        add(GET, people(Permission.READ), "/studies/{id}/findings.json");
        add(POST, people(Permission.WRITE), "/studies/{id}/conclusion");
        add(GET, people(Permission.TRUE_STATES), "/studies/{id}/pieces");
        add(POST, people(Permission.TRUE_STATES), "/studies/{id}/pieces");
        add(GET, people(Permission.TRUE_STATES), "/studies/{id}/calls.csv", "/studies/{id}/workbook.xlsx");
        add(GET, people(Permission.READ), "/appraisers", "/appraisers/{code}");
        add(POST, people(Permission.WRITE), "/appraisers", "/appraisers/{code}/configurations");
        add(GET, people(Permission.READ), "/tasks", "/tasks/{code}");
        add(POST, people(Permission.WRITE), "/tasks");
        add(GET, people(Permission.READ), "/sets", "/sets/{code}");
        add(GET, people(Permission.TRUE_STATES), "/sets/{code}/key");
        add(POST, people(Permission.TRUE_STATES), "/sets/{code}/key");
        add(GET, people(Permission.JOURNAL), "/journal", "/journal/verification");
    }

    private void settings() {
        add(GET, people(Permission.SETTINGS), "/settings", "/settings/**");
        add(POST, people(Permission.SETTINGS), "/settings/**");
    }

    private void api() {
        add(GET, anyPerson().or(programs(Scope.values())), "/api", "/api/openapi.json", "/api/openapi.json/**");
        add(GET, programs(Scope.READ), "/api/v1/appraisers", "/api/v1/appraisers/{code}");
        add(GET, programs(Scope.READ), "/api/v1/appraisers/{code}/configurations", "/api/v1/appraisers/{code}/trend");
        add(POST, programs(Scope.WRITE), "/api/v1/appraisers", "/api/v1/appraisers/{code}/configurations");
        add(GET, programs(Scope.READ), "/api/v1/tasks", "/api/v1/tasks/{code}");
        add(POST, programs(Scope.WRITE), "/api/v1/tasks");
        add(GET, programs(Scope.READ), "/api/v1/sets", "/api/v1/sets/{code}");
        add(POST, programs(Scope.WRITE), "/api/v1/sets");
        add(GET, programs(Scope.READ), "/api/v1/studies", "/api/v1/studies/{id}", "/api/v1/studies/{id}/findings");
        add(GET, programs(Scope.KEY_READ), "/api/v1/studies/{id}/calls.csv", "/api/v1/sets/{code}/pieces");
        add(POST, programs(Scope.WRITE), "/api/v1/studies");
        add(GET, programs(Scope.READ), "/api/v1/journal", "/api/v1/journal/verification");
    }

    private void measurements() {
        add(GET, everybody(), "/actuator/health", "/actuator/health/liveness", "/actuator/health/readiness");
        add(GET, people(Role.ADMINISTRATOR).or(programs(Scope.ADMIN)), "/actuator", "/actuator/**");
    }

    private void add(HttpMethod method, Admission admission, String... patterns) {
        for (String pattern : patterns) {
            laid.add(new Route(method, pattern, admission));
        }
    }
}
