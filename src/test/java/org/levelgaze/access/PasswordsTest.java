package org.levelgaze.access;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatExceptionOfType;

import org.junit.jupiter.api.Test;
import org.levelgaze.shared.Refusal;

class PasswordsTest {

    private final Passwords passwords = new Passwords();

    @Test
    void takesTwelveCharactersButNotEleven() {
        assertThat(passwords.hash("a".repeat(12))).startsWith("{bcrypt}");
        assertThatExceptionOfType(Refusal.class)
                .isThrownBy(() -> passwords.hash("a".repeat(11)))
                .satisfies(refusal -> assertThat(refusal.type()).isEqualTo("password-too-short"));
    }

    @Test
    void countsCharactersNotHalvesOfThem() {
        assertThatExceptionOfType(Refusal.class)
                .isThrownBy(() -> passwords.hash("\uD83C\uDFFA".repeat(11)))
                .satisfies(refusal -> assertThat(refusal.type()).isEqualTo("password-too-short"));
    }

    @Test
    void takesSeventyTwoBytesButNotOneMore() {
        String longest = "a".repeat(72);
        assertThat(passwords.matches(longest, passwords.hash(longest))).isTrue();
        assertThatExceptionOfType(Refusal.class)
                .isThrownBy(() -> passwords.hash(longest + "a"))
                .satisfies(refusal -> assertThat(refusal.type()).isEqualTo("password-too-long"));
    }

    @Test
    void aLongerPasswordWithTheRightStartIsWrong() {
        String right = "a".repeat(72);
        assertThat(passwords.matches(right + "b", passwords.hash(right))).isFalse();
    }

    @Test
    void theSameLettersTypedOnAnotherKeyboardAreTheSame() {
        String composed = "gl\u00e4nzende Glasur";
        String apart = "gla\u0308nzende Glasur";
        assertThat(passwords.matches(apart, passwords.hash(composed))).isTrue();
    }

    @Test
    void nobodyHasThePasswordThatStandsInForNobodys() {
        assertThat(passwords.matches("a password that nobody has", null)).isFalse();
    }

    @Test
    void twoHashesOfOnePasswordDiffer() {
        assertThat(passwords.hash("glaze over slip")).isNotEqualTo(passwords.hash("glaze over slip"));
    }
}
