package org.levelgaze.journal;

import io.swagger.v3.oas.annotations.Operation;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;

@RestController
@RequestMapping("/api/v1/journal")
class JournalApi {

    private static final int PAGE = 100;

    private final Journal journal;

    JournalApi(Journal journal) {
        this.journal = journal;
    }

    /**
     * Entries in the order in which they were written.
     *
     * @param items up to a hundred entries
     * @param next what {@code after} has to be for the following ones, null when there are none
     */
    record Page(List<JournalEntry> items, @Nullable Long next) {

        static Page of(List<JournalEntry> oneMore) {
            return oneMore.size() <= PAGE
                    ? new Page(oneMore, null)
                    : new Page(oneMore.subList(0, PAGE), oneMore.get(PAGE - 1).seq());
        }
    }

    @Operation(summary = "Entries in the order in which they were written")
    @GetMapping
    Page entries(Actor actor, @RequestParam(defaultValue = "0") long after) {
        return Page.of(journal.after(actor.site(), after, PAGE + 1));
    }

    @Operation(summary = "Walk the chain and say whether it holds")
    @GetMapping("/verification")
    JournalVerification verification(Actor actor) {
        return journal.verify(actor.site());
    }
}
