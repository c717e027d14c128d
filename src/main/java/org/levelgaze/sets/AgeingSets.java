package org.levelgaze.sets;

import java.nio.charset.StandardCharsets;
import java.time.LocalDate;
import java.time.format.DateTimeFormatter;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import org.levelgaze.register.Tasks;
import org.levelgaze.shared.SiteId;
import org.levelgaze.shared.Sites;
import org.levelgaze.shared.TodayLine;
import org.levelgaze.shared.TodaySource;
import org.springframework.context.MessageSource;
import org.springframework.context.i18n.LocaleContextHolder;
import org.springframework.stereotype.Component;
import org.springframework.web.util.UriUtils;

/** Sets that are out of date, or will be soon. */
@Component
class AgeingSets implements TodaySource {

    private static final int WARN_DAYS = 60;
    private static final int MOST = 20;

    private final ReferenceSets sets;
    private final Tasks tasks;
    private final Sites sites;
    private final MessageSource messages;

    AgeingSets(ReferenceSets sets, Tasks tasks, Sites sites, MessageSource messages) {
        this.sets = sets;
        this.tasks = tasks;
        this.sites = sites;
        this.messages = messages;
    }

    private record Ageing(ReferenceSet set, LocalDate lastDay) {}

    @Override
    public List<TodayLine> lines(SiteId site, String who) {
        List<ReferenceSet> all = sets.all(site);
        if (all.isEmpty()) {
            return List.of();
        }
        LocalDate today = sites.today(site);
        return all.stream()
                .map(set -> new Ageing(set, sets.newest(set).validUntil()))
                .filter(one -> !one.lastDay().isAfter(today.plusDays(WARN_DAYS)))
                .sorted(Comparator.comparing(Ageing::lastDay))
                .limit(MOST)
                .map(one -> line(one, today))
                .toList();
    }

    private TodayLine line(Ageing one, LocalDate today) {
        Locale locale = LocaleContextHolder.getLocale();
        String pattern = messages.getMessage("site.day", null, locale);
        String lastDay = DateTimeFormatter.ofPattern(pattern, locale).format(one.lastDay());
        String task = tasks.get(one.set().site(), one.set().taskId()).name();
        String sentence = one.lastDay().isBefore(today) ? "sets.today.past" : "sets.today.soon";
        return new TodayLine(
                sentence,
                List.of(one.set().code(), task, lastDay),
                "sets.today.button",
                "/sets/" + UriUtils.encodePathSegment(one.set().code(), StandardCharsets.UTF_8));
    }
}
