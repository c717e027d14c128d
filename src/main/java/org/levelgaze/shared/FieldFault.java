package org.levelgaze.shared;

import java.util.Map;
import org.springframework.validation.BindingResult;

/** Puts what a form was refused for beside the field that it means; the form keeps what was typed. */
public final class FieldFault {

    private FieldFault() {}

    /**
     * Adds the refusal's sentence to a field.
     *
     * @param refusal why the form was not taken
     * @param form where the fault is shown
     * @param fields the field that each type of refusal means
     * @throws Refusal the refusal itself when it means no field
     */
    public static void show(Refusal refusal, BindingResult form, Map<String, String> fields) {
        String field = fields.get(refusal.type());
        if (field == null) {
            throw refusal;
        }
        form.rejectValue(field, refusal.messageKey(), refusal.arguments().toArray(), refusal.getMessage());
    }
}
