package org.levelgaze.access;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatExceptionOfType;

import java.util.Locale;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.levelgaze.shared.Refusal;

class NewAccountTest {

    @ParameterizedTest
    @ValueSource(strings = {"ana", "Ána", "עֲנָת", "آنا", "ана", "安娜", "ana@tarnhollow.example", "a", "🏺"})
    void takesLoginNamesOfEveryScript(String name) {
        assertThat(account(name, "Ana").loginName()).isEqualTo(name);
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "  ", "ana tarn", "ana\ttarn", "ana\u202Enimda", "ana\u200B", "ana\u0000", "\uFEFFana"})
    void refusesLoginNamesWithSpacesOrLettersThatNobodySees(String name) {
        assertThatExceptionOfType(Refusal.class)
                .isThrownBy(() -> account(name, "Ana"))
                .satisfies(refusal -> assertThat(refusal.type()).isEqualTo("login-name"));
    }

    @Test
    void takesALoginNameOfAHundredLettersButNotOneMore() {
        assertThat(account("a".repeat(100), "Ana").loginName()).hasSize(100);
        assertThatExceptionOfType(Refusal.class).isThrownBy(() -> account("a".repeat(101), "Ana"));
    }

    @Test
    void refusesADisplayNameThatTurnsTheTextAround() {
        assertThatExceptionOfType(Refusal.class)
                .isThrownBy(() -> account("ana", "Ana\u202E"))
                .satisfies(refusal -> assertThat(refusal.type()).isEqualTo("display-name"));
    }

    @ParameterizedTest
    @CsvSource({"ANA, ana", "Größe, GRÖSSE", "JU\u0308RGEN, jürgen", "ａｎａ, ana", "Σίσυφος, ΣΊΣΥΦΟΣ"})
    void whatLooksTheSameIsTheSame(String one, String other) {
        assertThat(NewAccount.key(one)).isEqualTo(NewAccount.key(other));
    }

    @Test
    void whatDiffersStaysDifferent() {
        assertThat(NewAccount.key("ana")).isNotEqualTo(NewAccount.key("anna"));
    }

    @Test
    void neverShowsItsPassword() {
        assertThat(account("ana", "Ana").toString()).doesNotContain("glaze");
    }

    private static NewAccount account(String loginName, String displayName) {
        return new NewAccount(loginName, displayName, "glaze over slip", Set.of(Role.AUDITOR), Locale.ENGLISH);
    }
}
