package org.levelgaze.agreement;

import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** Counts, per true defect kind, how often one appraiser finds and names it. */
final class KindTally {

    private KindTally() {}

    /** {@code null} when the study knows no true kinds; else every true kind in the order of first appearance. */
    static @Nullable List<DefectKindFindings> of(Study study, int appraiser, double confidence) {
        long[] pieces = new long[study.kinds().size()];
        boolean any = false;
        for (int kind : study.trueKind) {
            if (kind != Study.NO_KIND) {
                pieces[kind]++;
                any = true;
            }
        }
        return any ? counted(study, appraiser, confidence, pieces) : null;
    }

    private static List<DefectKindFindings> counted(Study study, int appraiser, double confidence, long[] pieces) {
        long[] calls = new long[pieces.length];
        long[] found = new long[pieces.length];
        long[] named = new long[pieces.length];
        for (int at = study.from[appraiser]; at < study.from[appraiser + 1]; at++) {
            int kind = study.trueKind[study.piece[at]];
            if (kind != Study.NO_KIND) {
                calls[kind]++;
                found[kind] += study.reject[at];
                named[kind] += study.seen != null && study.seen[at] == kind ? study.reject[at] : 0;
            }
        }
        List<DefectKindFindings> findings = new ArrayList<>();
        for (int kind = 0; kind < pieces.length; kind++) {
            if (pieces[kind] > 0) {
                long nameable = study.seen == null ? 0 : found[kind];
                findings.add(new DefectKindFindings(
                        study.kinds().get(kind),
                        Share.of(found[kind], calls[kind], confidence),
                        Share.of(named[kind], nameable, confidence)));
            }
        }
        return findings;
    }
}
