package org.levelgaze.site;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.http.MediaType;
import org.springframework.test.web.servlet.assertj.MvcTestResult;
import org.springframework.web.context.WebApplicationContext;

@SpringBootTest
@WithDatabase
class RefusalsTest {

    @Autowired
    WebApplicationContext context;

    @Test
    void aPageShowsTheSentenceAndEveryBadRow() {
        assertThat(SamplePages.of(context).get().uri("/sample/refused"))
                .hasStatus(422)
                .bodyText()
                .contains("This cannot be taken", "There is no problem type &quot;rows &amp; rims&quot;.")
                .contains("<td class=\"number\">41</td>", "<code>may&lt;be</code>", "<td>Status maybe</td>")
                .contains("2 of 3 such rows are shown.", "Back to Today");
    }

    @Test
    void theApiAnswersProblemDetails() {
        assertThat(SamplePages.of(context).get().uri("/api/v1/sample/refused"))
                .hasStatus(422)
                .hasContentType(MediaType.APPLICATION_PROBLEM_JSON)
                .bodyJson()
                .isLenientlyEqualTo("""
                        {"type": "/problems/problem-not-known", "title": "This cannot be taken", "status": 422,
                         "detail": "There is no problem type \\"rows & rims\\". The type stands at the end of \\"type\\" in the answer of the API.",
                         "errors": [{"row": 41, "column": "call", "value": "may<be", "message": "Status maybe"},
                                    {"row": 42, "column": "", "value": "", "message": "Page 2"}],
                         "rowsInAll": 3}
                        """);
    }

    @Test
    void theApiSpeaksTheLanguageAskedFor() {
        assertThat(SamplePages.of(context).get().uri("/api/v1/sample/refused").locale(Locale.GERMAN))
                .bodyJson()
                .extractingPath("$.detail")
                .asString()
                .startsWith("Den Problemtyp „rows & rims“ gibt es nicht.");
    }

    @ParameterizedTest
    @CsvSource({
        "MALFORMED, 400",
        "FORBIDDEN, 403",
        "NOT_FOUND, 404",
        "CONFLICT, 409",
        "INVALID, 422",
        "TOO_LARGE, 413",
        "TOO_MANY, 429"
    })
    void eachKindHasItsStatus(String kind, int status) {
        assertThat(SamplePages.of(context).get().uri("/api/v1/sample/kind?kind={kind}", kind))
                .hasStatus(status)
                .bodyJson()
                .doesNotHavePath("$.errors")
                .extractingPath("$.type")
                .isEqualTo("/problems/problem-not-known");
    }

    @Test
    void whatTheFrameworkRefusesIsAProblemToo() {
        isProblem(call("/api/v1/sample/kind"), 400, "malformed");
        isProblem(call("/api/v1/sample/kind?kind=x"), 400, "malformed");
        isProblem(post(MediaType.APPLICATION_JSON, "{"), 400, "malformed");
        isProblem(post(MediaType.APPLICATION_JSON, "{\"code\": \"\"}"), 422, "invalid");
        isProblem(post(MediaType.TEXT_XML, "<x/>"), 415, "unsupported-media-type");
        isProblem(call("/api/v1/sample/body"), 405, "method-not-allowed");
        isProblem(call("/api/v1/nothing"), 404, "not-found");
        isProblem(call("/api/v1/sample/broken"), 500, "failed");
    }

    @Test
    void aFieldThatBreaksARuleIsNamed() {
        assertThat(post(MediaType.APPLICATION_JSON, "{\"code\": \"\"}"))
                .bodyJson()
                .isLenientlyEqualTo("{\"fields\": [{\"field\": \"code\", \"message\": \"must not be blank\"}]}");
    }

    @Test
    void whatIsInsideStaysInside() {
        assertThat(call("/api/v1/sample/broken")).bodyText().doesNotContain("secret");
        assertThat(call("/sample/broken")).hasFailed();
    }

    private MvcTestResult call(String address) {
        return SamplePages.of(context).get().uri(address).exchange();
    }

    private MvcTestResult post(MediaType type, String body) {
        return SamplePages.of(context)
                .post()
                .uri("/api/v1/sample/body")
                .contentType(type)
                .content(body)
                .exchange();
    }

    private static void isProblem(MvcTestResult result, int status, String type) {
        assertThat(result)
                .hasStatus(status)
                .hasContentType(MediaType.APPLICATION_PROBLEM_JSON)
                .bodyJson()
                .extractingPath("$.type")
                .isEqualTo("/problems/" + type);
    }
}
