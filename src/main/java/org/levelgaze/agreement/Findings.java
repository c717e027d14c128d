package org.levelgaze.agreement;

import java.util.List;

/**
 * What the calls of one study show. Component names and nesting are those of the JSON form. An undefined figure is
 * {@code null} beside a reason, never NaN or infinite.
 *
 * @param confidence level of every interval, above 0 and below 1
 * @param study what was judged, by how many, how often
 * @param appraisers each by himself, in the order in which they appear
 * @param together all of them
 */
public record Findings(
        double confidence, StudyShape study, List<AppraiserFindings> appraisers, TogetherFindings together) {

    /** Keeps its own copy of the list. */
    public Findings {
        appraisers = List.copyOf(appraisers);
    }
}
