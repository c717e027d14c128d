package org.levelgaze.studies.pages;

import java.time.LocalDateTime;
import java.time.format.DateTimeParseException;
import java.util.Map;
import java.util.Objects;
import org.jspecify.annotations.Nullable;
import org.levelgaze.journal.Actor;
import org.levelgaze.register.Appraiser;
import org.levelgaze.register.AppraiserKind;
import org.levelgaze.register.Appraisers;
import org.levelgaze.shared.FieldFault;
import org.levelgaze.shared.Refusal;
import org.levelgaze.shared.Site;
import org.springframework.stereotype.Component;
import org.springframework.validation.BindingResult;

/** Enters what the forms of appraisers say; what cannot be taken is put beside its field. */
@Component
class AppraiserEntry {

    private static final Map<String, String> FIELDS = Map.of(
            "code-not-usable", "code",
            "appraiser-exists", "code",
            "name-not-usable", "name");
    private static final Map<String, String> CONFIGURATION_FIELDS = Map.of(
            "name-not-usable", "label",
            "configuration-exists", "label",
            "person-has-no-configuration", "label",
            "change-lies-ahead", "changedAt");

    private final Appraisers appraisers;

    AppraiserEntry(Appraisers appraisers) {
        this.appraisers = appraisers;
    }

    /** A person or a camera about to be entered. */
    record Form(
            @Nullable String code,
            @Nullable String name,
            @Nullable AppraiserKind kind) {}

    /** A configuration about to be entered; the time is that of the site. */
    record ConfigurationForm(
            @Nullable String label,
            @Nullable String changedAt,
            @Nullable String note) {}

    /** Who was entered; null: the form has faults. */
    @Nullable
    Appraiser create(Actor actor, Form form, BindingResult faults) {
        if (faults.hasErrors()) {
            return null;
        }
        try {
            String code = text(form.code()).strip();
            String name = text(form.name()).isBlank() ? code : text(form.name()).strip();
            AppraiserKind kind = Objects.requireNonNullElse(form.kind(), AppraiserKind.PERSON);
            return appraisers.create(actor, code, name, kind);
        } catch (Refusal refusal) {
            FieldFault.show(refusal, faults, FIELDS);
            return null;
        }
    }

    /** The camera as it is now; null: the form has faults. */
    @Nullable
    Appraiser configure(Actor actor, Site site, String code, ConfigurationForm form, BindingResult faults) {
        try {
            LocalDateTime changedAt = LocalDateTime.parse(text(form.changedAt()));
            return appraisers.addConfiguration(
                    actor,
                    code,
                    text(form.label()).strip(),
                    changedAt.atZone(site.zone()).toInstant(),
                    text(form.note()).strip());
        } catch (DateTimeParseException e) {
            faults.rejectValue("changedAt", "studies.appraiser.changedAt.missing");
        } catch (Refusal refusal) {
            FieldFault.show(refusal, faults, CONFIGURATION_FIELDS);
        }
        return null;
    }

    private static String text(@Nullable String typed) {
        return typed == null ? "" : typed;
    }
}
