package org.levelgaze.studies.pages;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.dhatim.fastexcel.reader.ReadableWorkbook;
import org.dhatim.fastexcel.reader.Row;
import org.dhatim.fastexcel.reader.Sheet;
import org.junit.jupiter.api.Test;
import org.levelgaze.access.Role;
import org.levelgaze.access.Scope;
import org.levelgaze.agreement.Engine;
import org.levelgaze.agreement.Terms;
import org.levelgaze.sets.KeyReading;
import org.levelgaze.sets.ReferenceSet;
import org.levelgaze.sets.ReferenceSets;
import org.levelgaze.shared.SiteId;
import org.levelgaze.studies.Studies;
import org.levelgaze.studies.StudyHead;
import org.levelgaze.studies.reading.CallReader;
import org.levelgaze.studies.reading.Reading;
import org.levelgaze.testing.As;
import org.levelgaze.testing.WithDatabase;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.web.context.WebApplicationContext;

/** True states open by an act that is recorded, and files of them are safe for a spreadsheet. */
@SpringBootTest
@WithDatabase
class KeyAndFilesTest {

    /** A label and a kind that a spreadsheet would take for formulas; one piece is not judged by anybody. */
    private static final String DANGEROUS = """
            piece,reference,appraiser,trial,call,defect,seen
            =1+1,defective,%1$s,1,reject,@crack,@crack
            "plain, with comma",good,%1$s,1,reject,,-dent
            nobody,good,%1$s,1,,,
            =1+1,defective,%1$s,2,accept,@crack,
            """;

    @Autowired
    WebApplicationContext program;

    @Test
    void thePiecesOpenOnlyByAnActThatIsRecordedOnce() {
        StudyHead study = study("ASK", "ASK-ANA");
        String address = "/studies/" + study.id() + "/pieces";
        Visit engineer = visit(Role.QUALITY_ENGINEER);

        assertThat(engineer.read(address))
                .contains("counts as having seen the answer key", "Open and record it")
                .doesNotContain("plain, with comma");
        assertThat(readings(study)).isEmpty();

        assertThat(engineer.send(address).getRedirectedUrl()).isEqualTo(address);
        engineer.send(address);
        assertThat(engineer.read(address))
                .contains("plain, with comma", "=1+1", "You count as having seen the answer key")
                .doesNotContain("Open and record it");
        assertThat(readings(study)).singleElement().satisfies(reading -> {
            assertThat(reading.who()).isEqualTo("account:1");
            assertThat(reading.page()).isEqualTo(address);
        });
    }

    @Test
    void whoMayNotSeeTrueStatesIsNotOfferedThem() {
        StudyHead study = study("PROCTOR", "PROCTOR-ANA");
        Visit proctor = visit(Role.PROCTOR);

        assertThat(proctor.read("/studies/" + study.id()))
                .contains("How does PROCTOR-ANA judge?", "Findings as JSON")
                .doesNotContain("Which pieces were miscalled?", "Calls as CSV", "plain, with comma");
        for (String file : List.of("/pieces", "/calls.csv", "/workbook.xlsx")) {
            assertThat(proctor.open("/studies/" + study.id() + file).getStatus())
                    .as(file)
                    .isEqualTo(403);
        }
        assertThat(readings(study)).isEmpty();
    }

    @Test
    void aFileOfCallsLeadsToTheQuestionFirst() {
        StudyHead study = study("LEAD", "LEAD-ANA");
        Visit engineer = visit(Role.QUALITY_ENGINEER);

        for (String file : List.of("/calls.csv", "/workbook.xlsx")) {
            assertThat(engineer.open("/studies/" + study.id() + file).getRedirectedUrl())
                    .as(file)
                    .endsWith("pieces");
        }
        assertThat(readings(study)).isEmpty();
    }

    @Test
    void writesCallsThatASpreadsheetTakesAsText() {
        StudyHead study = study("CSV", "CSV-ANA");

        String csv = opened(study, "/calls.csv");

        assertThat(csv.split("\r\n", -1))
                .containsExactly(
                        "piece,reference,appraiser,trial,call,defect,seen",
                        "'=1+1,defective,CSV-ANA,1,reject,'@crack,'@crack",
                        "\"plain, with comma\",good,CSV-ANA,1,reject,,'-dent",
                        "'=1+1,defective,CSV-ANA,2,accept,'@crack,",
                        "nobody,good,CSV-ANA,1,,,",
                        "");
    }

    /** AIAG MSA 4th ed. (from memory), from file to store to file: the findings are the same, figure by figure. */
    @Test
    void theFileOfCallsCanBeImportedAgain() throws IOException {
        StudyHead study = new Plant(program).study("AGAIN", Plant.DAY, true, Plant.published());

        byte[] csv = opened(study, "/calls.csv").getBytes(StandardCharsets.UTF_8);

        Reading again = CallReader.standard().read(new ByteArrayInputStream(csv));
        assertThat(Engine.assess(((Reading.Read) again).calls().toStudy(), Terms.STANDARD))
                .isEqualTo(program.getBean(Studies.class).findings(study).orElseThrow());
    }

    @Test
    void theSpreadsheetHoldsValuesAndNoFormula() throws IOException {
        StudyHead study = study("XLSX", "XLSX-ANA");
        visit(Role.AUDITOR).send("/studies/" + study.id() + "/pieces");
        byte[] file = visit(Role.AUDITOR)
                .open("/studies/" + study.id() + "/workbook.xlsx")
                .getContentAsByteArray();

        try (ReadableWorkbook book = new ReadableWorkbook(new ByteArrayInputStream(file))) {
            assertThat(book.getSheets().map(Sheet::getName)).containsExactly("findings", "calls");
            List<List<String>> calls = cells(book.findSheet("calls").orElseThrow());
            assertThat(calls.get(0))
                    .containsExactly("piece", "reference", "appraiser", "trial", "call", "defect", "seen");
            assertThat(calls.get(1))
                    .containsExactly("'=1+1", "defective", "XLSX-ANA", "1", "reject", "'@crack", "'@crack");
            assertThat(calls).hasSize(5);
            List<List<String>> findings = cells(book.findSheet("findings").orElseThrow());
            assertThat(findings.get(0)).containsExactly("appraiser", "figure", "k", "n", "value", "lower", "upper");
            assertThat(findings)
                    .anySatisfy(row -> assertThat(row).startsWith("XLSX-ANA", "falseAccept", "1", "2", "0.5"));
        }
    }

    @Test
    void theFindingsComeToTheLetterAsTheyWereStored() {
        StudyHead study = study("JSON", "JSON-ANA");

        var response = visit(Role.PROCTOR).open("/studies/" + study.id() + "/findings.json");

        assertThat(new String(response.getContentAsByteArray(), StandardCharsets.UTF_8))
                .isEqualTo(program.getBean(Studies.class).findingsJson(study).orElseThrow());
        assertThat(response.getHeader("Content-Disposition"))
                .isEqualTo("attachment; filename=\"study-" + study.id() + "-findings.json\"");
    }

    @Test
    void aProgramReadsCallsWithTheScopeForItAndIsRecorded() {
        StudyHead study = study("API", "API-ANA");
        String address = "/api/v1/studies/" + study.id() + "/calls.csv";

        assertThat(Visit.of(program, As.program(Scope.READ)).open(address).getStatus())
                .isEqualTo(403);
        assertThat(Visit.text(Visit.of(program, As.program(Scope.KEY_READ)).open(address)))
                .startsWith("piece,reference,appraiser,trial,call");
        assertThat(readings(study)).extracting(KeyReading::who).containsExactly("token:1");
    }

    private StudyHead study(String mark, String appraiser) {
        return new Plant(program).study(mark, Plant.DAY, true, DANGEROUS.formatted(appraiser));
    }

    private String opened(StudyHead study, String file) {
        Visit engineer = visit(Role.QUALITY_ENGINEER);
        engineer.send("/studies/" + study.id() + "/pieces");
        return new String(
                engineer.open("/studies/" + study.id() + file).getContentAsByteArray(), StandardCharsets.UTF_8);
    }

    /** Whoever brought the file with the true states has seen them; that is not what is asked here. */
    private List<KeyReading> readings(StudyHead study) {
        ReferenceSets sets = program.getBean(ReferenceSets.class);
        ReferenceSet set = sets.get(SiteId.MAIN, study.setId());
        return sets.keyReadings(set, study.edition()).stream()
                .filter(reading -> !reading.who().equals(Plant.ENGINEER.who()))
                .toList();
    }

    private static List<List<String>> cells(Sheet sheet) throws IOException {
        List<List<String>> all = new ArrayList<>();
        try (Stream<Row> rows = sheet.openStream()) {
            rows.forEach(row -> all.add(row.stream()
                    .map(cell -> {
                        assertThat(cell == null ? null : cell.getFormula()).isNull();
                        return cell == null ? "" : cell.getRawValue();
                    })
                    .toList()));
        }
        return all;
    }

    private Visit visit(Role role) {
        return Visit.of(program, role);
    }
}
