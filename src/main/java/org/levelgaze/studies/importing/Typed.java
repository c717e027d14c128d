package org.levelgaze.studies.importing;

import java.util.List;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/** What comes out of a form: fields that were not sent count as empty, blanks around a text as slips. */
final class Typed {

    private Typed() {}

    static String text(@Nullable String typed) {
        return typed == null ? "" : typed.strip();
    }

    static <T> List<T> list(@Nullable List<@Nullable T> typed) {
        return typed == null
                ? List.of()
                : typed.stream().filter(Objects::nonNull).toList();
    }
}
