package org.levelgaze.site;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;

import java.util.Locale;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.setup.MockMvcBuilders;
import org.springframework.web.context.WebApplicationContext;

@SpringBootTest
@WithDatabase
class ApiPagesTest {

    @Autowired
    WebApplicationContext context;

    private MockMvcTester pages = MockMvcTester.of();

    @BeforeEach
    void open() {
        pages = MockMvcTester.create(MockMvcBuilders.webAppContextSetup(context)
                .defaultRequest(get("/").locale(Locale.ENGLISH))
                .build());
    }

    @Test
    void theDocumentNamesItsVersionTokenAndProblems() {
        assertThat(pages.get().uri("/api/openapi.json"))
                .hasStatusOk()
                .bodyJson()
                .isLenientlyEqualTo("""
                        {"openapi": "3.1.0", "info": {"title": "Levelgaze", "version": "1"},
                         "servers": [{"url": "/"}], "security": [{"token": []}],
                         "components": {"securitySchemes": {"token": {"type": "http", "scheme": "bearer"}},
                                        "schemas": {"Problem": {"required": ["type", "title", "status", "detail"]}}}}
                        """);
    }

    @Test
    void theDocumentHasNoPagesOfTheProgram() {
        assertThat(pages.get().uri("/api/openapi.json"))
                .bodyJson()
                .extractingPath("$.paths")
                .asMap()
                .allSatisfy((path, calls) -> assertThat(path).startsWith("/api/v"));
    }

    @Test
    void thePageLeadsToTheDocument() {
        assertThat(pages.get().uri("/api"))
                .hasStatusOk()
                .bodyText()
                .contains("What can other software ask?", "href=\"/api/openapi.json\"");
    }

    @Test
    void aProblemIsExplained() {
        assertThat(pages.get().uri("/problems/problem-not-known"))
                .hasStatusOk()
                .bodyText()
                .contains("There is no problem type &quot;…&quot;.");
        assertThat(pages.get().uri("/problems/not-found")).bodyText().contains("There is nothing at ….");
    }

    @Test
    void aProblemThatIsNoneIsNotFound() {
        assertThat(pages.get().uri("/problems/nonsense"))
                .hasStatus(404)
                .bodyText()
                .contains("There is no problem type &quot;nonsense&quot;.");
    }
}
