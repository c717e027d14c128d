package org.levelgaze.studies.pages;

import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.security.test.web.servlet.setup.SecurityMockMvcConfigurers.springSecurity;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;

import java.net.URI;
import java.nio.charset.StandardCharsets;
import java.util.Locale;
import org.levelgaze.access.Role;
import org.levelgaze.testing.As;
import org.springframework.mock.web.MockHttpServletResponse;
import org.springframework.test.web.servlet.MockMvc;
import org.springframework.test.web.servlet.request.MockHttpServletRequestBuilder;
import org.springframework.test.web.servlet.request.RequestPostProcessor;
import org.springframework.test.web.servlet.setup.MockMvcBuilders;
import org.springframework.web.context.WebApplicationContext;

/** Somebody who opens pages and reads what stands on them. */
final class Visit {

    private final MockMvc pages;
    private final RequestPostProcessor who;
    private final Locale locale;

    private Visit(MockMvc pages, RequestPostProcessor who, Locale locale) {
        this.pages = pages;
        this.who = who;
        this.locale = locale;
    }

    static Visit of(WebApplicationContext program, Role role) {
        return of(program, As.person(role));
    }

    static Visit of(WebApplicationContext program, RequestPostProcessor who) {
        MockMvc pages = MockMvcBuilders.webAppContextSetup(program)
                .apply(springSecurity())
                .build();
        return new Visit(pages, who, Locale.ENGLISH);
    }

    Visit inGerman() {
        return new Visit(pages, who, Locale.GERMAN);
    }

    MockHttpServletResponse open(String address) {
        return answer(get(URI.create(address)));
    }

    MockHttpServletResponse send(String address, String... fields) {
        MockHttpServletRequestBuilder request = post(URI.create(address)).with(csrf());
        for (int i = 0; i < fields.length; i += 2) {
            request = request.param(fields[i], fields[i + 1]);
        }
        return answer(request);
    }

    /** The text of a page as it is read: no tags, no entities, one space between words. */
    String read(String address) {
        return text(open(address));
    }

    static String text(MockHttpServletResponse response) {
        return new String(response.getContentAsByteArray(), StandardCharsets.UTF_8)
                .replaceAll("(?s)<head>.*?</head>", " ")
                .replaceAll("<[^>]*>", " ")
                .replace("&#39;", "'")
                .replace("&quot;", "\"")
                .replace("&lt;", "<")
                .replace("&gt;", ">")
                .replace("&amp;", "&")
                .replace('\u00a0', ' ')
                .replaceAll("\\s+", " ");
    }

    private MockHttpServletResponse answer(MockHttpServletRequestBuilder request) {
        try {
            return pages.perform(request.with(who).locale(locale)).andReturn().getResponse();
        } catch (Exception e) {
            throw new IllegalStateException(e);
        }
    }
}
