package org.levelgaze.database;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ProgramsTest {

    @ParameterizedTest
    @CsvSource({
        "Linux, amd64, postgres-linux-x86_64.txz",
        "Linux, aarch64, postgres-linux-arm_64.txz",
        "Mac OS X, aarch64, postgres-darwin-arm_64.txz",
        "Mac OS X, x86_64, postgres-darwin-x86_64.txz",
        "Windows Server 2022, amd64, postgres-windows-x86_64.txz"
    })
    void areNamedAfterTheMachine(String system, String processor, String archive) {
        assertThat(Programs.archive(system, processor)).isEqualTo(archive);
    }

    @Test
    void areRefusedWhenTheJarWasBuiltForAnotherMachine(@TempDir Path folder) {
        assertThatThrownBy(() -> Programs.unpack(Home.in(folder), "postgres-abacus.txz"))
                .isInstanceOf(DatabaseRefusal.class)
                .hasMessage("This jar was built for another kind of machine: it does not bring postgres-abacus.txz.");
    }

    @Test
    void areOfTheMajorVersionThatDataFoldersAreHeldAgainst() {
        Home home = Home.in(PreparedHome.original());
        ServerCommands commands =
                new ServerCommands(Programs.unpack(home, Programs.archive()), ServerUser.find(home.folder()), home);

        assertThat(commands.run("postgres", List.of("--version")).output())
                .startsWith("postgres (PostgreSQL) " + Programs.MAJOR + ".");
    }
}
