package org.levelgaze.studies;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.levelgaze.agreement.Engine;
import org.levelgaze.agreement.Findings;
import org.levelgaze.agreement.Study;
import org.levelgaze.agreement.Terms;
import org.levelgaze.shared.SiteId;
import org.springframework.stereotype.Service;

/** Computes every stored conclusion anew from the facts and compares. */
@Service
public class StudyVerification {

    private static final int PAGE = 500;

    private final StudyRows rows;
    private final FindingRows findings;
    private final Studies studies;

    StudyVerification(StudyRows rows, FindingRows findings, Studies studies) {
        this.rows = rows;
        this.findings = findings;
        this.studies = studies;
    }

    /**
     * What the comparison showed.
     *
     * @param studies how many studies were looked at
     * @param differences every stored thing that does not follow from the facts
     */
    public record Report(long studies, List<Difference> differences) {

        /** Keeps its own copy of the list. */
        public Report {
            differences = List.copyOf(differences);
        }
    }

    /**
     * A stored thing that does not follow from the facts.
     *
     * @param study the study's number
     * @param what which thing
     */
    public record Difference(long study, What what) {}

    /** What can differ. */
    public enum What {
        /** The head names another number of calls than are stored. */
        CALLS,
        /** The study is concluded and has no findings. */
        FINDINGS_MISSING,
        /** The stored findings are not those of the stored calls. */
        FINDINGS,
        /** The figures that lists and trends read are not those of the findings. */
        FIGURES
    }

    /** Looks at every study of the site, one at a time. */
    public Report verify(SiteId site) {
        List<Difference> differences = new ArrayList<>();
        long seen = 0;
        long last = 0;
        List<Long> page = rows.idsAfter(site, last, PAGE);
        while (!page.isEmpty()) {
            for (long id : page) {
                verify(studies.get(site, id)).ifPresent(what -> differences.add(new Difference(id, what)));
                last = id;
                seen++;
            }
            page = rows.idsAfter(site, last, PAGE);
        }
        return new Report(seen, differences);
    }

    private Optional<What> verify(StudyHead head) {
        if (studies.storedCalls(head) != head.calls()) {
            return Optional.of(What.CALLS);
        }
        if (!head.concluded()) {
            return Optional.empty();
        }
        Optional<FindingRows.StoredFinding> stored = findings.newest(head.site(), head.id());
        if (stored.isEmpty()) {
            return Optional.of(What.FINDINGS_MISSING);
        }
        return compare(head, stored.get());
    }

    /** Findings of an older engine are history: they are not recomputed by this one. */
    private Optional<What> compare(StudyHead head, FindingRows.StoredFinding stored) {
        if (!stored.engine().equals(Engine.VERSION)) {
            return Optional.empty();
        }
        Study study = studies.forEngine(head);
        Findings found = Engine.assess(study, new Terms(stored.confidence(), null));
        if (!FindingsJson.write(found).equals(stored.json())) {
            return Optional.of(What.FINDINGS);
        }
        boolean same = findings.figuresAgree(head, stored, found);
        return same ? Optional.empty() : Optional.of(What.FIGURES);
    }
}
