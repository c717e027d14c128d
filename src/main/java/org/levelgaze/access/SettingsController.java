package org.levelgaze.access;

import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.GetMapping;

@Controller
class SettingsController {

    @GetMapping("/settings")
    String settings() {
        return "access/settings";
    }
}
