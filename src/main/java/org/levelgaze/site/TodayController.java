package org.levelgaze.site;

import java.util.List;
import org.levelgaze.shared.SiteId;
import org.levelgaze.shared.TodayLine;
import org.levelgaze.shared.TodaySource;
import org.springframework.beans.factory.ObjectProvider;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;

@Controller
class TodayController {

    private final ObjectProvider<TodaySource> sources;

    TodayController(ObjectProvider<TodaySource> sources) {
        this.sources = sources;
    }

    @GetMapping("/")
    String today(Model model) {
        List<TodayLine> lines = sources.orderedStream()
                .flatMap(source -> source.lines(SiteId.MAIN).stream())
                .toList();
        model.addAttribute("lines", lines);
        return "site/today";
    }
}
