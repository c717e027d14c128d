package org.levelgaze.access;

import java.util.List;
import org.levelgaze.shared.Sites;
import org.springframework.boot.web.servlet.FilterRegistrationBean;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import org.springframework.core.annotation.Order;
import org.springframework.security.authentication.AuthenticationManager;
import org.springframework.security.authentication.BadCredentialsException;
import org.springframework.security.authorization.AuthorizationDecision;
import org.springframework.security.config.ObjectPostProcessor;
import org.springframework.security.config.annotation.web.builders.HttpSecurity;
import org.springframework.security.config.annotation.web.configurers.AbstractHttpConfigurer;
import org.springframework.security.config.http.SessionCreationPolicy;
import org.springframework.security.web.SecurityFilterChain;
import org.springframework.security.web.access.intercept.AuthorizationFilter;
import org.springframework.security.web.authentication.AnonymousAuthenticationFilter;
import org.springframework.security.web.authentication.session.ChangeSessionIdAuthenticationStrategy;
import org.springframework.security.web.authentication.session.CompositeSessionAuthenticationStrategy;
import org.springframework.security.web.authentication.session.SessionAuthenticationStrategy;
import org.springframework.security.web.context.NullSecurityContextRepository;
import org.springframework.security.web.csrf.CsrfAuthenticationStrategy;
import org.springframework.security.web.csrf.CsrfTokenRepository;
import org.springframework.security.web.csrf.HttpSessionCsrfTokenRepository;
import org.springframework.security.web.header.writers.ReferrerPolicyHeaderWriter.ReferrerPolicy;
import org.springframework.security.web.savedrequest.HttpSessionRequestCache;
import org.springframework.security.web.savedrequest.RequestCache;

/**
 * The filters in front of everything, in three chains: the API takes tokens alone and keeps no session; its document and the
 * measurements take either; pages take a browser's session. All three ask {@link Routes}.
 */
@Configuration(proxyBeanMethods = false)
class SecurityChains {

    private static final String CONTENT_POLICY = "default-src 'none'; script-src 'self'; style-src 'self'; "
            + "img-src 'self' data:; font-src 'self'; connect-src 'self'; form-action 'self'; base-uri 'none'; "
            + "frame-ancestors 'none'";
    private static final String UNUSED_DEVICES =
            "camera=(), microphone=(), geolocation=(), payment=(), usb=(), browsing-topics=()";

    private final RefusedRequests refused;
    private final SessionAccounts sessions;

    SecurityChains(RefusedRequests refused, SessionAccounts sessions) {
        this.refused = refused;
        this.sessions = sessions;
    }

    @Bean
    @Order(1)
    SecurityFilterChain api(HttpSecurity http, TokenFilter tokens, IdempotencyFilter repeats) {
        http.securityMatcher("/api/v1/**")
                .securityContext(context -> context.securityContextRepository(new NullSecurityContextRepository()))
                .sessionManagement(session -> session.sessionCreationPolicy(SessionCreationPolicy.STATELESS))
                .csrf(AbstractHttpConfigurer::disable)
                .requestCache(cache -> cache.disable())
                .addFilterBefore(tokens, AnonymousAuthenticationFilter.class)
                .addFilterAfter(repeats, AuthorizationFilter.class);
        return closed(http);
    }

    @Bean
    @Order(2)
    SecurityFilterChain documentAndMeasurements(HttpSecurity http, TokenFilter tokens, RequestCache wanted) {
        http.securityMatcher("/api", "/api/**", "/actuator", "/actuator/**")
                .securityContext(context -> context.securityContextRepository(sessions))
                .csrf(AbstractHttpConfigurer::disable)
                .requestCache(cache -> cache.requestCache(wanted))
                .addFilterBefore(tokens, AnonymousAuthenticationFilter.class);
        return closed(http);
    }

    @Bean
    @Order(3)
    SecurityFilterChain pages(HttpSecurity http, CsrfTokenRepository forms, RequestCache wanted) {
        http.securityContext(context -> context.securityContextRepository(sessions))
                .csrf(csrf -> csrf.csrfTokenRepository(forms))
                .requestCache(cache -> cache.requestCache(wanted));
        return closed(http);
    }

    /** What every chain shares: the routes, the answers to whoever may not, and the headers. */
    private SecurityFilterChain closed(HttpSecurity http) {
        return http.logout(AbstractHttpConfigurer::disable)
                .authorizeHttpRequests(requests -> requests.withObjectPostProcessor(withoutErrorPages())
                        .anyRequest()
                        .access((caller, asked) -> new AuthorizationDecision(Routes.admit(asked.getRequest(), caller))))
                .exceptionHandling(
                        failures -> failures.authenticationEntryPoint(refused).accessDeniedHandler(refused))
                .headers(headers -> headers.httpStrictTransportSecurity(https -> https.includeSubDomains(false))
                        .contentSecurityPolicy(policy -> policy.policyDirectives(CONTENT_POLICY))
                        .referrerPolicy(referrer -> referrer.policy(ReferrerPolicy.SAME_ORIGIN))
                        .permissionsPolicyHeader(devices -> devices.policy(UNUSED_DEVICES)))
                .build();
    }

    /** The page of an error is shown to whoever ran into it. */
    private static ObjectPostProcessor<AuthorizationFilter> withoutErrorPages() {
        return new ObjectPostProcessor<>() {
            @Override
            public <F extends AuthorizationFilter> F postProcess(F filter) {
                filter.setFilterErrorDispatch(false);
                return filter;
            }
        };
    }

    @Bean
    TokenFilter tokenFilter(Tokens tokens, Sites sites) {
        return new TokenFilter(tokens, sites, refused);
    }

    /** These filters stand in the chains alone, not a second time in front of every request. */
    @Bean
    static FilterRegistrationBean<TokenFilter> tokenFilterOnlyInChains(TokenFilter filter) {
        FilterRegistrationBean<TokenFilter> registration = new FilterRegistrationBean<>(filter);
        registration.setEnabled(false);
        return registration;
    }

    @Bean
    static FilterRegistrationBean<IdempotencyFilter> idempotencyFilterOnlyInChains(IdempotencyFilter filter) {
        FilterRegistrationBean<IdempotencyFilter> registration = new FilterRegistrationBean<>(filter);
        registration.setEnabled(false);
        return registration;
    }

    @Bean
    static CsrfTokenRepository forms() {
        return new HttpSessionCsrfTokenRepository();
    }

    /** Remembers which page was asked for before the sign-in. */
    @Bean
    static RequestCache wanted() {
        HttpSessionRequestCache cache = new HttpSessionRequestCache();
        cache.setRequestMatcher(request -> "GET".equals(request.getMethod())
                && request.getHeader("HX-Request") == null
                && Routes.of(request).isPresent());
        return cache;
    }

    /** At sign-in the session and its forms get new secrets, so that what somebody planted before is worth nothing. */
    @Bean
    static SessionAuthenticationStrategy freshSecrets(CsrfTokenRepository forms) {
        return new CompositeSessionAuthenticationStrategy(
                List.of(new ChangeSessionIdAuthenticationStrategy(), new CsrfAuthenticationStrategy(forms)));
    }

    /** Sign-in is ours; this keeps the framework from making a user with a password of its own. */
    @Bean
    static AuthenticationManager nobodyElse() {
        return request -> {
            throw new BadCredentialsException("Not used");
        };
    }
}
