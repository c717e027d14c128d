package org.levelgaze.studies;

import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.levelgaze.shared.Refusal;

/**
 * Marks the place after one study in the list of studies: new studies do not move it.
 *
 * @param day the day of that study
 * @param id its number
 */
record StudyCursor(LocalDate day, long id) {

    private static final Pattern TEXT = Pattern.compile("(\\d{4}-\\d{2}-\\d{2})\\.(\\d{1,18})");

    static StudyCursor after(StudyHead study) {
        return new StudyCursor(study.performedOn(), study.id());
    }

    /**
     * Reads what {@link #text()} wrote.
     *
     * @throws Refusal when it is something else
     */
    static StudyCursor of(String text) {
        Matcher parts = TEXT.matcher(text);
        if (parts.matches()) {
            try {
                return new StudyCursor(LocalDate.parse(parts.group(1)), Long.parseLong(parts.group(2)));
            } catch (DateTimeException e) {
                throw refusal(text);
            }
        }
        throw refusal(text);
    }

    private static Refusal refusal(String text) {
        return new Refusal(Refusal.Kind.MALFORMED, "cursor-not-usable", text);
    }

    String text() {
        return day + "." + id;
    }
}
