package org.levelgaze.studies;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.setup.SecurityMockMvcConfigurers.springSecurity;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;

import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInfo;
import org.levelgaze.access.Scope;
import org.levelgaze.testing.As;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.mock.web.MockHttpServletResponse;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.setup.MockMvcBuilders;
import org.springframework.web.context.WebApplicationContext;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** The contract that other software relies on. */
@SpringBootTest
@WithDatabase
class StudyApiTest {

    private static final JsonMapper JSON = new JsonMapper();

    @Autowired
    WebApplicationContext context;

    private MockMvc mvc;
    private String task = "";

    @BeforeEach
    void aTask(TestInfo test) throws Exception {
        mvc = MockMvcBuilders.webAppContextSetup(context)
                .apply(springSecurity())
                .build();
        task = "API-" + test.getTestMethod().orElseThrow().getName();
        MockHttpServletResponse made = mvc.perform(post("/api/v1/tasks")
                        .with(As.program(Scope.WRITE))
                        .contentType("application/json")
                        .content("{\"code\":\"%s\",\"name\":\"x\"}".formatted(task)))
                .andReturn()
                .getResponse();
        assertThat(made.getStatus()).as(made.getContentAsString()).isEqualTo(201);
        assertThat(made.getHeader("Location")).endsWith("/api/v1/tasks/" + task);
    }

    @Test
    void answersAStudyWithItsAddress() throws Exception {
        MockHttpServletResponse answer = bring("S1", "2026-02-03", file("ANA", "accept", "reject"), true);

        JsonNode study = JSON.readTree(answer.getContentAsString());
        assertThat(answer.getStatus()).isEqualTo(201);
        assertThat(answer.getHeader("Location")).isEqualTo("/api/v1/studies/" + study.get("id"));
        assertThat(study.get("task").asString()).isEqualTo(task);
        assertThat(study.get("performedOn").asString()).isEqualTo("2026-02-03");
        assertThat(study.get("concludedAt").isNull()).isFalse();
    }

    /** Counts and kappa of appraiser A: AIAG MSA 4th ed., 50 pieces x 3 x 3, from memory, recomputed. */
    @Test
    void answersTheFindingsOfThePublishedStudy() throws Exception {
        String file;
        try (InputStream calls = getClass().getResourceAsStream("/reference/aiag_msa4_calls.csv")) {
            file = new String(Objects.requireNonNull(calls).readAllBytes(), StandardCharsets.UTF_8);
        }
        JsonNode study = JSON.readTree(bring("S2", "2026-02-03", file, true).getContentAsString());

        JsonNode first = read("/api/v1/studies/" + study.get("id") + "/findings")
                .get("appraisers")
                .get(0);
        assertThat(first.at("/effectiveness/byPiece/k").asInt()).isEqualTo(42);
        assertThat(first.at("/falseAccept/k").asInt()).isEqualTo(3);
        assertThat(first.at("/falseReject/k").asInt()).isEqualTo(5);
        assertThat(first.at("/kappaToReference/kappa").asDouble())
                .isEqualTo(0.8787878787878788, org.assertj.core.api.Assertions.within(1e-9));
    }

    @Test
    void namesEveryBadRowAndKeepsNothing() throws Exception {
        String bad = "piece,reference,appraiser,trial,call\n1,good,ANA,1,maybe\n2,defective,ANA,0,reject\n";
        MockHttpServletResponse answer = bring("S3", "2026-02-03", bad, true);

        JsonNode problem = JSON.readTree(answer.getContentAsString());
        assertThat(answer.getStatus()).isEqualTo(422);
        assertThat(answer.getContentType()).startsWith("application/problem+json");
        assertThat(problem.get("type").asString()).isEqualTo("/problems/bad-rows");
        assertThat(problem.get("rowsInAll").asInt()).isEqualTo(2);
        assertThat(problem.at("/errors/0/row").asInt()).isEqualTo(2);
        assertThat(problem.at("/errors/0/column").asString()).isEqualTo("call");
        assertThat(problem.at("/errors/0/value").asString()).isEqualTo("maybe");
        assertThat(problem.at("/errors/1/row").asInt()).isEqualTo(3);
        assertThat(read("/api/v1/studies?task=" + task).get("items")).isEmpty();
    }

    @Test
    void refusesUnknownSetsAndAppraisersUnlessToldToMakeThem() throws Exception {
        assertThat(problem(bring("S4", "2026-02-03", file("NOBODY-YET", "accept", "reject"), false)))
                .isEqualTo("422 /problems/unknown-set");
        bring("S4", "2026-02-03", file("ANA", "accept", "reject"), true);
        assertThat(problem(bring("S4", "2026-02-04", file("NOBODY-YET", "accept", "reject"), false)))
                .isEqualTo("422 /problems/unknown-appraisers");
    }

    @Test
    void refusesTheSameBytesForTheSameTaskSetAndDay() throws Exception {
        String file = file("ANA", "accept", "accept");
        bring("S5", "2026-02-03", file, true);

        assertThat(problem(bring("S5", "2026-02-03", file, true))).isEqualTo("409 /problems/duplicate-study");
        assertThat(bring("S5", "2026-02-04", file, true).getStatus()).isEqualTo(201);
    }

    @Test
    void refusesWhatCannotBe() throws Exception {
        String file = file("ANA", "accept", "reject");

        assertThat(problem(bring("S6", "2199-01-01", file, true))).isEqualTo("422 /problems/study-lies-ahead");
        assertThat(problem(bring("S6", "yesterday", file, true))).isEqualTo("400 /problems/malformed");
        assertThat(problem(bring("S6", "2026-02-03", "", true))).startsWith("422 /problems/file-");
    }

    @Test
    void listsTheLatestDayFirstPageByPage() throws Exception {
        for (int day = 1; day <= 5; day++) {
            bring("S7", "2026-03-0" + day, file("ANA", "accept", "reject"), true);
        }
        List<String> days = new ArrayList<>();
        String after = "";
        while (after != null) {
            JsonNode page = read("/api/v1/studies?limit=2&task=" + task + after);
            page.get("items").forEach(study -> days.add(study.get("performedOn").asString()));
            after = page.get("next").isNull()
                    ? null
                    : "&after=" + page.get("next").asString();
        }

        assertThat(days).containsExactly("2026-03-05", "2026-03-04", "2026-03-03", "2026-03-02", "2026-03-01");
    }

    @Test
    void refusesAMarkThatItDidNotGive() throws Exception {
        for (String mark : List.of("abc", "2026-02-31.1", "2026-02-03.99999999999999999999", "3")) {
            MockHttpServletResponse answer = mvc.perform(
                            get("/api/v1/studies").param("after", mark).with(As.program(Scope.READ)))
                    .andReturn()
                    .getResponse();
            assertThat(problem(answer)).as(mark).isEqualTo("400 /problems/cursor-not-usable");
        }
    }

    private MockHttpServletResponse bring(String set, String day, String csv, boolean create) throws Exception {
        return mvc.perform(post("/api/v1/studies")
                        .param("task", task)
                        .param("set", task + set)
                        .param("performedOn", day)
                        .param("create", Boolean.toString(create))
                        .with(As.program(Scope.WRITE))
                        .contentType("text/csv")
                        .content(csv))
                .andReturn()
                .getResponse();
    }

    private JsonNode read(String address) throws Exception {
        MockHttpServletResponse answer = mvc.perform(get(address).with(As.program(Scope.READ)))
                .andReturn()
                .getResponse();
        assertThat(answer.getStatus()).as(answer.getContentAsString()).isEqualTo(200);
        return JSON.readTree(answer.getContentAsString());
    }

    private static String problem(MockHttpServletResponse answer) throws Exception {
        JsonNode problem = JSON.readTree(answer.getContentAsString());
        return answer.getStatus() + " " + problem.get("type").asString();
    }

    private static String file(String appraiser, String onGood, String onDefective) {
        return "piece,reference,appraiser,trial,call\n1,good,%1$s,1,%2$s\n2,defective,%1$s,1,%3$s\n"
                .formatted(appraiser, onGood, onDefective);
    }
}
