package org.levelgaze.site;

import java.util.List;
import java.util.Locale;

/**
 * One call of the API as its page shows it.
 *
 * @param method GET, POST and so on
 * @param path the address, with names in braces
 * @param summary what it does, empty when the document does not say
 * @param parameters what the address takes
 * @param body the formats of the body, none when it takes none
 * @param answers what comes back
 */
record ApiCall(
        String method,
        String path,
        String summary,
        List<Parameter> parameters,
        List<String> body,
        List<Answer> answers) {

    /** Names the call within the page. */
    public String anchor() {
        return (method + path).toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-");
    }

    /**
     * One parameter.
     *
     * @param name its name
     * @param place {@code path}, {@code query} or {@code header}
     * @param isRequired whether it must be given
     * @param about what it means, else its format
     */
    record Parameter(String name, String place, boolean isRequired, String about) {}

    /**
     * One answer.
     *
     * @param status the HTTP status, or {@code default}
     * @param about what it means
     * @param formats its formats
     */
    record Answer(String status, String about, List<String> formats) {}
}
