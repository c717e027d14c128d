package org.levelgaze.site;

import jakarta.servlet.http.HttpServletRequest;
import java.util.List;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.TodayLine;
import org.levelgaze.shared.TodaySource;
import org.springframework.beans.factory.ObjectProvider;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;

/** The home page: what needs a hand today, as far as whoever looks may lend one. */
@Controller
class TodayController {

    private final ObjectProvider<TodaySource> sources;
    private final Doors doors;

    TodayController(ObjectProvider<TodaySource> sources, Doors doors) {
        this.sources = sources;
        this.doors = doors;
    }

    @GetMapping("/")
    String today(Actor reader, HttpServletRequest request, Model model) {
        List<TodayLine> lines = sources.orderedStream()
                .flatMap(source -> source.lines(reader.site(), reader.who()).stream())
                .filter(line -> doors.isOpen(request.getUserPrincipal(), request.getContextPath(), line.href()))
                .toList();
        model.addAttribute("lines", lines);
        return "site/today";
    }
}
