package org.levelgaze.access;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.security.test.web.servlet.setup.SecurityMockMvcConfigurers.springSecurity;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.request;

import java.io.IOException;
import java.io.InputStreamReader;
import java.io.Reader;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.levelgaze.testing.As;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.http.HttpMethod;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.MvcResult;
import org.springframework.test.web.servlet.request.MockHttpServletRequestBuilder;
import org.springframework.test.web.servlet.request.RequestPostProcessor;
import org.springframework.test.web.servlet.setup.MockMvcBuilders;
import org.springframework.web.bind.annotation.RequestMethod;
import org.springframework.web.context.WebApplicationContext;
import org.springframework.web.method.HandlerMethod;
import org.springframework.web.servlet.mvc.method.RequestMappingInfo;
import org.springframework.web.servlet.mvc.method.RequestMappingInfoHandlerMapping;

/** Every route and every kind of caller, decided in {@code routes.csv} and tried with real requests. */
@SpringBootTest
@WithDatabase
class RouteTableTest {

    private static final String NOBODY = "nobody";

    @Autowired
    WebApplicationContext context;

    @Autowired
    List<RequestMappingInfoHandlerMapping> mappings;

    private MockMvc pages = MockMvcBuilders.standaloneSetup(new Object()).build();
    private List<CSVRecord> table = List.of();

    @BeforeEach
    void open() throws IOException {
        pages = MockMvcBuilders.webAppContextSetup(context)
                .apply(springSecurity())
                .build();
        try (Reader csv = new InputStreamReader(
                Objects.requireNonNull(RouteTableTest.class.getResourceAsStream("routes.csv")),
                StandardCharsets.UTF_8)) {
            table = CSVFormat.RFC4180
                    .builder()
                    .setHeader()
                    .setSkipHeaderRecord(true)
                    .get()
                    .parse(csv)
                    .getRecords();
        }
    }

    @Test
    void everyRouteThatAControllerAnswersIsInTheTable() {
        Set<String> decided = table.stream()
                .map(row -> row.get("method") + " " + row.get("route"))
                .collect(Collectors.toSet());

        List<String> answered = mappings.stream()
                .flatMap(mapping -> mapping.getHandlerMethods().entrySet().stream())
                .filter(route -> !isOfATest(route.getValue()))
                .flatMap(route -> routes(route.getKey()))
                .toList();

        assertThat(answered).contains("GET /sign-in", "GET /journal", "GET /actuator/health");
        assertThat(answered)
                .as("routes without a row in routes.csv; each needs one, and a line in Routes")
                .allMatch(decided::contains);
    }

    @Test
    void theTableDecidesEveryRouteForEveryKindOfCaller() {
        List<String> wrong = new ArrayList<>();
        for (CSVRecord row : table) {
            for (String caller : row.toMap().keySet()) {
                if (!"method".equals(caller) && !"route".equals(caller)) {
                    boolean allowed = goesThrough(row, caller);
                    if (allowed != "yes".equals(row.get(caller))) {
                        wrong.add(row.get("method") + " " + row.get("route") + " as " + caller + " is "
                                + (allowed ? "open" : "closed"));
                    }
                }
            }
        }
        assertThat(wrong).isEmpty();
    }

    @Test
    void whatIsInNoTableIsOpenToNobody() throws Exception {
        for (String path : List.of("/studies/1/answer-key", "/api/v1/secrets", "/actuator-old", "/h2-console")) {
            MvcResult result = pages.perform(request(HttpMethod.GET, path).with(As.person(Role.values())))
                    .andReturn();
            assertThat(result.getHandler()).as(path).isNull();
        }
    }

    private boolean goesThrough(CSVRecord row, String caller) {
        String path = row.get("route")
                .replace("{id}", "999999")
                .replace("{code}", "NONE")
                .replace("{type}", "forbidden");
        String tried = path.endsWith("/**") ? path.replace("/**", "/liveness") : path;
        MockHttpServletRequestBuilder sent =
                request(HttpMethod.valueOf(row.get("method")), tried).with(csrf());
        try {
            MvcResult result = pages.perform(NOBODY.equals(caller) ? sent : sent.with(caller(caller)))
                    .andReturn();
            return result.getHandler() != null || result.getResponse().getStatus() == 405;
        } catch (Exception thrownByTheController) {
            return true;
        }
    }

    /** Tests of other things bring controllers of their own, which no program has. */
    private static boolean isOfATest(HandlerMethod handler) {
        return handler.getBeanType()
                .getProtectionDomain()
                .getCodeSource()
                .getLocation()
                .getPath()
                .contains("test-classes");
    }

    private static RequestPostProcessor caller(String name) {
        return Scope.of(name).map(As::program).orElseGet(() -> As.person(Role.of(name)));
    }

    /** A mapping without a method answers all; the table has to decide over reading and sending. */
    private static Stream<String> routes(RequestMappingInfo mapping) {
        Set<RequestMethod> methods = mapping.getMethodsCondition().getMethods().isEmpty()
                ? Set.of(RequestMethod.GET, RequestMethod.POST)
                : mapping.getMethodsCondition().getMethods();
        return methods.stream()
                .flatMap(method -> mapping.getPatternValues().stream().map(pattern -> method + " " + pattern));
    }
}
