package org.levelgaze.register;

import java.util.List;
import java.util.Optional;
import org.levelgaze.shared.SiteId;

/**
 * What is judged: a product family, a characteristic, a station.
 *
 * @param site where
 * @param id its number
 * @param code the site's own code
 * @param name its name on screen
 * @param defectKinds the ways of being defective, in the order in which they were entered
 */
public record Task(SiteId site, long id, String code, String name, List<DefectKind> defectKinds) {

    /** Keeps its own copy of the defect kinds. */
    public Task {
        defectKinds = List.copyOf(defectKinds);
    }

    /** The defect kind with this code, if the task has it. */
    public Optional<DefectKind> defectKind(String wanted) {
        return defectKinds.stream().filter(kind -> kind.code().equals(wanted)).findFirst();
    }
}
