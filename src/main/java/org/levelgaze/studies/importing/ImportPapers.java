package org.levelgaze.studies.importing;

import java.util.Optional;
import org.springframework.stereotype.Component;
import tools.jackson.databind.json.JsonMapper;

/** Writes and reads what is kept as JSON with an upload. */
@Component
class ImportPapers {

    private final JsonMapper json;

    ImportPapers(JsonMapper json) {
        this.json = json;
    }

    String write(Object paper) {
        return json.writeValueAsString(paper);
    }

    /** What was ordered last, if anything was. */
    Optional<ImportOrder> order(Upload upload) {
        return Optional.ofNullable(upload.request()).map(text -> json.readValue(text, ImportOrder.class));
    }

    /** Why the last run stored nothing, if there was such a run. */
    Optional<ImportProblem> problem(Upload upload) {
        return Optional.ofNullable(upload.problem()).map(text -> json.readValue(text, ImportProblem.class));
    }
}
