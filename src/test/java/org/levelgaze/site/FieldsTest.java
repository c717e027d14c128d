package org.levelgaze.site;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.web.context.WebApplicationContext;

@SpringBootTest
@WithDatabase
class FieldsTest {

    @Autowired
    WebApplicationContext context;

    @Test
    void everyFieldHasALabelAndKeepsItsValue() {
        assertThat(SamplePages.of(context).get().uri("/sample"))
                .hasStatusOk()
                .bodyText()
                .contains("<label for=\"code\">Code</label>")
                .contains("value=\"RIM &amp; &lt;b&gt;\"", "required=\"required\"", "maxlength=\"40\"")
                .contains("aria-describedby=\"code-hint\"", "id=\"code-hint\"")
                .contains("type=\"password\" autocomplete=\"off\" id=\"secret\" name=\"secret\" value=\"\"")
                .contains("type=\"date\" id=\"day\" name=\"day\" value=\"2026-03-09\"")
                .contains("<option value=\"rim\" selected=\"selected\">Rim</option>")
                .contains("<label for=\"sure\">I am sure</label>", "checked=\"checked\"")
                .contains("type=\"file\"", "accept=\".csv\"")
                .contains("<label for=\"note\">Note</label>")
                .doesNotContain("aria-invalid")
                .containsOnlyOnce("name=\"kind\"")
                .containsOnlyOnce("name=\"note\"");
    }

    @Test
    void aFaultIsSaidBesideItsField() {
        assertThat(SamplePages.of(context).post().uri("/sample").param("code", " "))
                .bodyText()
                .contains("aria-invalid=\"true\"", "aria-describedby=\"code-hint code-fault\"")
                .containsPattern("id=\"code-fault\">\\s*<span>must not be blank</span>");
    }

    @Test
    void aNoticeNamesWhatWasDone() {
        assertThat(SamplePages.of(context).get().uri("/sample")).bodyText().contains("role=\"status\">Page 4</p>");
    }

    @Test
    void pagesOfAListKeepItsFilter() {
        assertThat(SamplePages.of(context).get().uri("/sample?task=rim&page=1"))
                .bodyText()
                .contains("href=\"?task=rim&amp;page=0\"", "href=\"?task=rim&amp;page=2\"", "Page 2");
    }

    @Test
    void aPictureStandsAboveItsTable() {
        assertThat(SamplePages.of(context).get().uri("/sample"))
                .bodyText()
                .contains("<svg id=\"p\"></svg>", "<figcaption>How to read &lt;it&gt;</figcaption>")
                .contains("Show as a table", "<td>&lt;1&gt;</td>");
    }
}
