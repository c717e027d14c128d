package org.levelgaze.studies;

import java.time.Clock;
import java.time.Instant;
import org.levelgaze.agreement.Engine;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.Study;
import org.levelgaze.agreement.Terms;
import org.levelgaze.journal.Act;
import org.levelgaze.journal.Actor;
import org.levelgaze.journal.Journal;
import org.springframework.stereotype.Component;

/** Concludes a study: its findings are computed once and stored with the engine's version. */
@Component
class Conclusions {

    private final StudyRows studies;
    private final FindingRows findings;
    private final Journal journal;
    private final Clock clock;

    Conclusions(StudyRows studies, FindingRows findings, Journal journal, Clock clock) {
        this.studies = studies;
        this.findings = findings;
        this.journal = journal;
        this.clock = clock;
    }

    /** Part of the caller's transaction. */
    void conclude(Actor actor, StudyHead head, Study calls) {
        Instant now = clock.instant();
        Findings found = Engine.assess(calls, Terms.STANDARD);
        String json = FindingsJson.write(found);
        studies.insertConclusion(head.site(), head.id(), actor.who(), now);
        findings.insert(head, Engine.VERSION, found, json, now);
        journal.record(actor, Act.of("study.concluded", "study:" + head.id(), json));
    }
}
