package org.levelgaze.cli;

import java.util.List;
import org.levelgaze.journal.Journal;
import org.levelgaze.journal.JournalVerification;
import org.levelgaze.shared.Site;
import org.levelgaze.shared.Sites;
import org.levelgaze.studies.StudyVerification;
import org.springframework.boot.WebApplicationType;
import org.springframework.boot.builder.SpringApplicationBuilder;
import org.springframework.context.ConfigurableApplicationContext;

/** {@code verify}: walks the journal's chain and computes every stored conclusion anew. Changes nothing. */
final class VerifyCommand {

    private final Console console;

    VerifyCommand(Console console) {
        this.console = console;
    }

    int run(List<String> arguments) {
        if (!arguments.isEmpty()) {
            console.err().println(console.text("cli.verify.usage"));
            return Commands.REFUSED;
        }
        try (ConfigurableApplicationContext program = start()) {
            Sites sites = program.getBean(Sites.class);
            boolean holds = true;
            for (Site site : sites.all()) {
                holds &= journalHolds(site, program.getBean(Journal.class).verify(site.id()));
                holds &= studiesHold(
                        site, program.getBean(StudyVerification.class).verify(site.id()));
            }
            console.out().println(console.text(holds ? "cli.verify.holds" : "cli.verify.broken"));
            return holds ? Commands.DONE : Commands.BROKEN;
        } catch (RuntimeException e) {
            console.err().println(console.text("cli.verify.failed", reason(e)));
            return Commands.REFUSED;
        }
    }

    /** A program that is running on the same data keeps running; nothing is migrated. */
    private static ConfigurableApplicationContext start() {
        return new SpringApplicationBuilder(VerifyConfiguration.class)
                .web(WebApplicationType.NONE)
                .properties(
                        "levelgaze.database.join=true",
                        "spring.flyway.enabled=false",
                        "spring.jpa.hibernate.ddl-auto=none",
                        "logging.level.org.levelgaze=WARN")
                .run();
    }

    private boolean journalHolds(Site site, JournalVerification found) {
        Long firstBroken = found.firstBroken();
        console.out()
                .println(
                        firstBroken == null
                                ? console.text(
                                        "cli.verify.journal.intact", site.code(), found.entries(), found.headHash())
                                : console.text("cli.verify.journal.broken", site.code(), firstBroken));
        return found.intact();
    }

    private boolean studiesHold(Site site, StudyVerification.Report found) {
        int differences = found.differences().size();
        console.out().println(console.text("cli.verify.studies", site.code(), found.studies(), differences));
        for (StudyVerification.Difference one : found.differences()) {
            console.out().println("  " + console.text("cli.verify." + one.what(), one.study()));
        }
        return differences == 0;
    }

    /** The innermost reason says it best. */
    private static String reason(Throwable thrown) {
        Throwable reason = thrown;
        while (reason.getCause() != null) {
            reason = reason.getCause();
        }
        return String.valueOf(reason.getMessage());
    }
}
