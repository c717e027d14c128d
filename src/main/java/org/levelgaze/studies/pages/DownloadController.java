package org.levelgaze.studies.pages;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import org.levelgaze.journal.Actor;
import org.levelgaze.shared.Refusal;
import org.levelgaze.studies.Studies;
import org.springframework.http.ContentDisposition;
import org.springframework.http.HttpHeaders;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;

/**
 * What can be taken along. Files of calls show true states: whoever has not seen the answer key yet is led to the page
 * that asks first.
 */
@Controller
class DownloadController {

    private final Studies studies;
    private final Ladders ladders;
    private final CallsCsv csv;
    private final StudyWorkbook workbook;

    DownloadController(Studies studies, Ladders ladders, CallsCsv csv, StudyWorkbook workbook) {
        this.studies = studies;
        this.ladders = ladders;
        this.csv = csv;
        this.workbook = workbook;
    }

    @GetMapping("/studies/{id}/findings.json")
    void findings(Actor actor, @PathVariable long id, HttpServletResponse response) throws IOException {
        String json = studies.findingsJson(studies.get(actor.site(), id))
                .orElseThrow(() -> new Refusal(Refusal.Kind.CONFLICT, "study-not-concluded", Long.toString(id)));
        file(response, "application/json", "study-" + id + "-findings.json");
        response.getOutputStream().write(json.getBytes(StandardCharsets.UTF_8));
    }

    @GetMapping("/studies/{id}/calls.csv")
    void calls(Actor actor, @PathVariable long id, HttpServletResponse response) throws IOException {
        StudyHeading heading = ladders.heading(actor, id);
        if (ladders.opened(actor, heading)) {
            file(response, "text/csv;charset=UTF-8", "study-" + id + "-calls.csv");
            csv.write(heading.study(), response.getOutputStream());
        } else {
            response.sendRedirect("pieces");
        }
    }

    @GetMapping("/studies/{id}/workbook.xlsx")
    void workbook(Actor actor, @PathVariable long id, HttpServletResponse response) throws IOException {
        StudyHeading heading = ladders.heading(actor, id);
        if (ladders.opened(actor, heading)) {
            String type = "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet";
            file(response, type, "study-" + id + ".xlsx");
            workbook.write(heading.study(), response.getOutputStream());
        } else {
            response.sendRedirect("pieces");
        }
    }

    private static void file(HttpServletResponse response, String type, String name) {
        response.setContentType(type);
        response.setHeader(
                HttpHeaders.CONTENT_DISPOSITION,
                ContentDisposition.attachment().filename(name).build().toString());
    }
}
