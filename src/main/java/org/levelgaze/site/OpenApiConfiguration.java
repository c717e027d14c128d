package org.levelgaze.site;

import io.swagger.v3.oas.models.Components;
import io.swagger.v3.oas.models.OpenAPI;
import io.swagger.v3.oas.models.info.Info;
import io.swagger.v3.oas.models.info.License;
import io.swagger.v3.oas.models.media.ArraySchema;
import io.swagger.v3.oas.models.media.Content;
import io.swagger.v3.oas.models.media.IntegerSchema;
import io.swagger.v3.oas.models.media.MediaType;
import io.swagger.v3.oas.models.media.ObjectSchema;
import io.swagger.v3.oas.models.media.Schema;
import io.swagger.v3.oas.models.media.StringSchema;
import io.swagger.v3.oas.models.responses.ApiResponse;
import io.swagger.v3.oas.models.security.SecurityRequirement;
import io.swagger.v3.oas.models.security.SecurityScheme;
import io.swagger.v3.oas.models.servers.Server;
import java.util.List;
import org.springdoc.core.customizers.OpenApiCustomizer;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;

/** What the OpenAPI document says beside the calls: the token, and the problem details that any call may answer. */
@Configuration(proxyBeanMethods = false)
class OpenApiConfiguration {

    private static final String TOKEN = "token";
    private static final String PROBLEM = "Problem";

    @Bean
    OpenAPI openApi() {
        return new OpenAPI()
                .info(new Info()
                        .title("Levelgaze")
                        .version("1")
                        .description("Who may judge good from defective, on which reference set, and how well. "
                                + "Dates are ISO 8601, at the site; a 2xx answer is stored and journalled.")
                        .license(new License().name("Apache-2.0").identifier("Apache-2.0")))
                .servers(List.of(new Server().url("/")))
                .components(new Components()
                        .addSecuritySchemes(
                                TOKEN,
                                new SecurityScheme()
                                        .type(SecurityScheme.Type.HTTP)
                                        .scheme("bearer")))
                .addSecurityItem(new SecurityRequirement().addList(TOKEN));
    }

    /** Every call may answer a problem. */
    @Bean
    OpenApiCustomizer problemsEverywhere() {
        ApiResponse answer = new ApiResponse()
                .description("What was not taken, and why (RFC 9457)")
                .content(new Content()
                        .addMediaType(
                                "application/problem+json",
                                new MediaType().schema(new Schema<>().$ref("#/components/schemas/" + PROBLEM))));
        return document -> {
            document.getComponents().addSchemas(PROBLEM, problem()).addSchemas("BadRow", badRow());
            document.getPaths()
                    .values()
                    .forEach(path -> path.readOperations()
                            .forEach(call -> call.getResponses().addApiResponse("default", answer)));
        };
    }

    private static ObjectSchema problem() {
        ObjectSchema problem = new ObjectSchema();
        problem.addProperty("type", text("a stable name below /problems/, where it is explained"));
        problem.addProperty("title", text("what the status means, in the language asked for"));
        problem.addProperty("status", new IntegerSchema().description("the HTTP status"));
        problem.addProperty("detail", text("the thing, the place and the way out, in the language asked for"));
        problem.addProperty("instance", text("the address that was asked"));
        problem.addProperty(
                "errors",
                new ArraySchema()
                        .items(new Schema<>().$ref("#/components/schemas/BadRow"))
                        .description("the first bad rows of a file"));
        problem.addProperty("rowsInAll", new IntegerSchema().description("how many bad rows there are in all"));
        problem.setRequired(List.of("type", "title", "status", "detail"));
        return problem;
    }

    private static ObjectSchema badRow() {
        ObjectSchema row = new ObjectSchema();
        row.addProperty("row", new IntegerSchema().description("the line of the file, its header being 1"));
        row.addProperty("column", text("empty when the whole row is meant"));
        row.addProperty("value", text("what stands there"));
        row.addProperty("message", text("what was expected"));
        row.setRequired(List.of("row", "column", "value", "message"));
        return row;
    }

    private static Schema<String> text(String description) {
        Schema<String> schema = new StringSchema();
        schema.setDescription(description);
        return schema;
    }
}
