package org.levelgaze.site;

import jakarta.servlet.http.HttpServletRequest;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.levelgaze.site.ApiCall.Answer;
import org.levelgaze.site.ApiCall.Parameter;
import org.springdoc.webmvc.api.OpenApiWebMvcResource;
import org.springframework.stereotype.Component;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** Reads the calls of the API out of its OpenAPI document, so that page and document cannot differ. */
@Component
class ApiDocument {

    private static final List<String> METHODS = List.of("get", "post", "put", "patch", "delete");

    private final OpenApiWebMvcResource document;
    private final JsonMapper json;

    ApiDocument(OpenApiWebMvcResource document, JsonMapper json) {
        this.document = document;
        this.json = json;
    }

    /** The calls by address, then by method. */
    List<ApiCall> calls(HttpServletRequest request, Locale locale) throws IOException {
        JsonNode root = json.readTree(document.openapiJson(request, request.getServletPath(), locale));
        List<ApiCall> calls = new ArrayList<>();
        for (var path : root.path("paths").properties()) {
            for (String method : METHODS) {
                JsonNode call = path.getValue().path(method);
                if (!call.isMissingNode()) {
                    calls.add(call(method, path.getKey(), call));
                }
            }
        }
        return calls;
    }

    private static ApiCall call(String method, String path, JsonNode call) {
        List<Parameter> parameters = new ArrayList<>();
        for (JsonNode parameter : call.path("parameters")) {
            parameters.add(new Parameter(
                    text(parameter, "name"),
                    text(parameter, "in"),
                    parameter.path("required").asBoolean(false),
                    about(parameter)));
        }
        List<Answer> answers = new ArrayList<>();
        for (var answer : call.path("responses").properties()) {
            answers.add(
                    new Answer(answer.getKey(), text(answer.getValue(), "description"), formats(answer.getValue())));
        }
        return new ApiCall(
                method.toUpperCase(Locale.ROOT),
                path,
                text(call, "summary"),
                parameters,
                formats(call.path("requestBody")),
                answers);
    }

    private static String about(JsonNode parameter) {
        String description = text(parameter, "description");
        JsonNode schema = parameter.path("schema");
        String format = text(schema, "format");
        String type = format.isEmpty() ? text(schema, "type") : format;
        return description.isEmpty() ? type : description;
    }

    private static List<String> formats(JsonNode holder) {
        return holder.path("content").properties().stream()
                .map(format -> format.getKey())
                .toList();
    }

    private static String text(JsonNode node, String name) {
        return node.path(name).asString("");
    }
}
