package org.levelgaze.sets;

import java.text.NumberFormat;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.levelgaze.agreement.Share;
import org.levelgaze.agreement.Terms;
import org.levelgaze.register.Task;
import org.levelgaze.register.Tasks;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.SiteId;
import org.springframework.stereotype.Component;

/** Puts the pages of sets together; none of them carries the true state of a piece. */
@Component
class SetPages {

    /** Between these shares of defective pieces a set counts as balanced (common practice, no source). */
    private static final double LEAST_DEFECTIVE = 0.4;

    private static final double MOST_DEFECTIVE = 0.6;

    private final ReferenceSets sets;
    private final Tasks tasks;

    SetPages(ReferenceSets sets, Tasks tasks) {
        this.sets = sets;
        this.tasks = tasks;
    }

    /** One set of the list. */
    record Line(ReferenceSet set, Task task, Edition newest) {}

    /**
     * One set.
     *
     * @param editions the newest first
     * @param readings who has seen the key of the newest edition
     * @param oneMiss what share one missed defective piece is; null: there is none
     * @param couldStillPass what share of defective pieces could still get through after a study without a miss
     * @param oneFalseAlarm what share one refused good piece is; null: there is none
     * @param balanced whether good and defective pieces are about as many
     */
    record Page(
            ReferenceSet set,
            Task task,
            List<Edition> editions,
            List<KeyReading> readings,
            @Nullable String oneMiss,
            @Nullable String couldStillPass,
            @Nullable String oneFalseAlarm,
            boolean balanced) {

        /** The edition that stands now; called by the template. */
        public Edition newest() {
            return editions.get(0);
        }
    }

    List<Line> list(SiteId site) {
        return sets.all(site).stream()
                .map(set -> new Line(set, tasks.get(site, set.taskId()), sets.newest(set)))
                .toList();
    }

    /**
     * The set with this code.
     *
     * @throws Refusal when there is none
     */
    ReferenceSet find(SiteId site, String code) {
        return sets.byCode(site, code).orElseThrow(() -> new Refusal(Refusal.Kind.NOT_FOUND, "unknown-set", code));
    }

    Page page(SiteId site, String code, Locale locale) {
        ReferenceSet set = find(site, code);
        Edition newest = sets.newest(set);
        int scored = newest.good() + newest.defective();
        double share = scored == 0 ? 0 : (double) newest.defective() / scored;
        return new Page(
                set,
                tasks.get(site, set.taskId()),
                sets.editions(set),
                sets.keyReadings(set, newest.number()),
                oneOf(newest.defective(), locale),
                newest.defective() == 0 ? null : percent(upper(newest.defective()), locale),
                oneOf(newest.good(), locale),
                share >= LEAST_DEFECTIVE && share <= MOST_DEFECTIVE);
    }

    /** The upper end of the exact interval of 0 misses among so many. */
    private static double upper(int pieces) {
        return Share.of(0, pieces, Terms.STANDARD.confidence()).clopperPearson().upper();
    }

    private static @Nullable String oneOf(int pieces, Locale locale) {
        return pieces == 0 ? null : percent(1.0 / pieces, locale);
    }

    private static String percent(double share, Locale locale) {
        NumberFormat format = NumberFormat.getNumberInstance(locale);
        format.setMaximumFractionDigits(share < 0.1 ? 1 : 0);
        return format.format(100 * share) + "\u00a0%";
    }
}
