package org.levelgaze.register;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.setup.SecurityMockMvcConfigurers.springSecurity;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;

import java.net.URI;
import java.util.Map;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.levelgaze.access.Scope;
import org.levelgaze.testing.As;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.mock.web.MockHttpServletResponse;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.setup.MockMvcBuilders;
import org.springframework.web.context.WebApplicationContext;
import tools.jackson.databind.json.JsonMapper;

/** Codes are the site's own and kept exactly as written, in addresses too. */
@SpringBootTest
@WithDatabase
class CodesInAddressesTest {

    private static final JsonMapper JSON = new JsonMapper();

    @Autowired
    WebApplicationContext context;

    @ParameterizedTest
    @ValueSource(strings = {"RIM/2", "50%", "C\\D", "a b", "Å+ß", "نور", "x?y#z", "..%2F..", "T//2", "a.b"})
    void aThingIsFoundByItsCodeWhateverSignsItHolds(String code) throws Exception {
        MockMvc mvc = MockMvcBuilders.webAppContextSetup(context)
                .apply(springSecurity())
                .build();
        MockHttpServletResponse made = mvc.perform(post("/api/v1/tasks")
                        .with(As.program(Scope.WRITE))
                        .contentType("application/json")
                        .content(JSON.writeValueAsString(Map.of("code", code, "name", "x"))))
                .andReturn()
                .getResponse();
        assertThat(made.getStatus()).as(made.getContentAsString()).isEqualTo(201);

        String address = made.getHeader("Location");
        MockHttpServletResponse found = mvc.perform(
                        get(URI.create(String.valueOf(address))).with(As.program(Scope.READ)))
                .andReturn()
                .getResponse();

        assertThat(found.getStatus()).as(address).isEqualTo(200);
        assertThat(JSON.readTree(found.getContentAsString()).get("code").asString())
                .isEqualTo(code);
    }

    @ParameterizedTest
    @ValueSource(strings = {".", "..", "A;B"})
    void aCodeThatWouldMeanSomethingElseInAnAddressIsRefused(String code) throws Exception {
        MockMvc mvc = MockMvcBuilders.webAppContextSetup(context)
                .apply(springSecurity())
                .build();
        MockHttpServletResponse answer = mvc.perform(post("/api/v1/tasks")
                        .with(As.program(Scope.WRITE))
                        .contentType("application/json")
                        .content(JSON.writeValueAsString(Map.of("code", code, "name", "x"))))
                .andReturn()
                .getResponse();

        assertThat(answer.getStatus()).isEqualTo(422);
    }
}
