package org.levelgaze.journal;

import java.time.ZonedDateTime;
import java.util.List;
import org.levelgaze.shared.Site;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;

@Controller
@RequestMapping("/journal")
class JournalController {

    private static final int PAGE = 50;

    private final Journal journal;

    JournalController(Journal journal) {
        this.journal = journal;
    }

    /** An entry as the page shows it, with its time at the site. */
    record Line(long seq, ZonedDateTime at, String actor, String act, String subject, String hash) {

        static Line of(JournalEntry entry, Site site) {
            return new Line(
                    entry.seq(),
                    entry.at().atZone(site.zone()),
                    entry.actor(),
                    entry.act(),
                    entry.subject(),
                    entry.hash());
        }
    }

    @GetMapping
    String entries(Site site, @RequestParam(defaultValue = "9223372036854775807") long before, Model model) {
        List<JournalEntry> found = journal.before(site.id(), before, PAGE + 1);
        List<Line> lines =
                found.stream().limit(PAGE).map(entry -> Line.of(entry, site)).toList();
        model.addAttribute("lines", lines);
        model.addAttribute("newest", before == Long.MAX_VALUE);
        model.addAttribute("older", found.size() > PAGE ? lines.get(PAGE - 1).seq() : null);
        return "journal/entries";
    }

    @GetMapping("/verification")
    String verification(Site site, Model model) {
        model.addAttribute("verification", journal.verify(site.id()));
        return "journal/verification";
    }
}
