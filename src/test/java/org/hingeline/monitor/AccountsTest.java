package org.hingeline.monitor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.time.Duration;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Accounts.SignIn;
import org.hingeline.monitor.Accounts.SignIn.Locked;
import org.hingeline.monitor.Accounts.SignIn.Welcome;
import org.hingeline.monitor.Accounts.SignIn.Wrong;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

class AccountsTest {
    private static final String PASSWORD = "tide pool 17";

    private final Hatchery hatchery = Hatchery.empty();
    private final Accounts accounts = hatchery.accounts;

    @BeforeEach
    void ana() {
        accounts.savePerson(hatchery.site, "ana", "Ana", PASSWORD, Role.OPERATOR, "test");
    }

    @Test
    void the_right_password_opens_a_session_with_the_role_at_the_site() {
        Welcome welcome = welcome(PASSWORD);

        Caller caller = accounts.bySession(welcome.token()).orElseThrow();
        assertThat(caller.name()).isEqualTo("Ana");
        assertThat(caller.browser()).isTrue();
        assertThat(caller.at("cove").orElseThrow().role()).isEqualTo(Role.OPERATOR);
        assertThat(caller.at("elsewhere")).isEmpty();
    }

    @Test
    void a_wrong_password_and_an_unknown_name_get_the_same_answer() {
        assertThat(accounts.signIn("ana", "wrong password")).isEqualTo(new Wrong());
        assertThat(accounts.signIn("bo", PASSWORD)).isEqualTo(new Wrong());
        assertThat(accounts.signIn("ana", "x".repeat(100_000))).isEqualTo(new Wrong());
    }

    @Test
    void too_many_failures_lock_even_the_right_password_out_until_the_lock_ends() {
        fail(2);
        SignIn third = accounts.signIn("ana", "wrong password");
        assertThat(third).isEqualTo(new Locked(Hatchery.T0.plus(Duration.ofMinutes(15))));
        assertThat(accounts.signIn("ana", PASSWORD)).isEqualTo(third);

        hatchery.clock.pass(Duration.ofMinutes(15));
        assertThat(accounts.signIn("ana", PASSWORD)).isInstanceOf(Welcome.class);
    }

    @Test
    void a_success_forgives_the_failures_before_it() {
        fail(2);
        welcome(PASSWORD);
        fail(2);
    }

    @Test
    void a_session_ends_by_time_by_signing_out_and_by_a_new_password() {
        String byTime = welcome(PASSWORD).token();
        hatchery.clock.pass(Duration.ofHours(12).minusMillis(1));
        assertThat(accounts.bySession(byTime)).isPresent();
        hatchery.clock.pass(Duration.ofMillis(1));
        assertThat(accounts.bySession(byTime)).isEmpty();

        String bySigningOut = welcome(PASSWORD).token();
        accounts.signOut(bySigningOut);
        assertThat(accounts.bySession(bySigningOut)).isEmpty();

        String byPassword = welcome(PASSWORD).token();
        accounts.savePerson(hatchery.site, "ana", "Ana", "another tide 18", Role.VIEWER, "test");
        assertThat(accounts.bySession(byPassword)).isEmpty();
        assertThat(accounts.signIn("ana", PASSWORD)).isEqualTo(new Wrong());
        welcome("another tide 18");
    }

    @Test
    void a_name_of_another_site_is_taken_and_its_password_stays() {
        Site other = hatchery.otherSite();

        assertThatThrownBy(
                        () -> accounts.savePerson(other, "ana", "Not Ana", "stolen tide 19", Role.MANAGER, "stranger"))
                .isInstanceOf(FieldFaultsException.class)
                .hasMessageContaining("taken");
        welcome(PASSWORD);
    }

    @Test
    void a_person_of_two_sites_is_changed_by_neither_alone_but_by_whoever_runs_the_service() {
        Site other = hatchery.otherSite();
        accounts.addToSite(other, "ana", Role.MANAGER, "command line");

        assertThatThrownBy(() ->
                        accounts.savePerson(hatchery.site, "ana", "Ana", "stolen tide 19", Role.VIEWER, "manager"))
                .isInstanceOf(FieldFaultsException.class)
                .hasMessageContaining("other sites too");
        String token = welcome(PASSWORD).token();

        accounts.setPassword(hatchery.site, "ana", "another tide 18", "command line");
        assertThat(accounts.bySession(token)).isEmpty();
        assertThat(accounts.signIn("ana", PASSWORD)).isEqualTo(new Wrong());
        Caller caller = accounts.bySession(welcome("another tide 18").token()).orElseThrow();
        assertThat(caller.siteCodes()).contains("cove", "other");
    }

    @Test
    void keys_and_tokens_open_until_they_are_revoked_and_only_by_their_own_site() {
        String key = accounts.makeGatewayKey(hatchery.site, "quay", "test");
        String token = accounts.makeAccessToken(hatchery.site, "script", Role.VIEWER, "test");
        long keyId = accounts.byGatewayKey(key).orElseThrow().id();
        Caller script = accounts.byToken(token).orElseThrow();
        assertThat(script.browser()).isFalse();
        assertThat(script.at("cove").orElseThrow().role()).isEqualTo(Role.VIEWER);
        assertThat(accounts.byToken(key)).isEmpty();
        assertThat(accounts.byGatewayKey(token)).isEmpty();

        long tokenId = accounts.accessTokens(hatchery.site).get(0).id();
        Site other = hatchery.otherSite();
        assertThat(accounts.revokeGatewayKey(other, keyId, "stranger")).isFalse();
        assertThat(accounts.revokeAccessToken(other, tokenId, "stranger")).isFalse();
        assertThat(accounts.byGatewayKey(key)).isPresent();

        assertThat(accounts.revokeGatewayKey(hatchery.site, keyId, "test")).isTrue();
        assertThat(accounts.revokeAccessToken(hatchery.site, tokenId, "test")).isTrue();
        assertThat(accounts.byGatewayKey(key)).isEmpty();
        assertThat(accounts.byToken(token)).isEmpty();
    }

    @Test
    void no_table_holds_a_secret() throws SQLException {
        String key = accounts.makeGatewayKey(hatchery.site, "quay", "test");
        String token = accounts.makeAccessToken(hatchery.site, "script", Role.VIEWER, "test");
        String session = welcome(PASSWORD).token();

        String everything = everything();

        assertThat(everything).contains("ana@example.org").contains("$argon2id$v=19$m=19456,t=2,p=1$");
        assertThat(everything).doesNotContain(key, token, session, PASSWORD);
        assertThat(everything).contains(Secrets.hash(key), Secrets.hash(token), Secrets.hash(session));
    }

    @Test
    void what_cannot_be_a_person_is_told_with_what_would_be_accepted() {
        assertThatThrownBy(() -> accounts.savePerson(hatchery.site, "An a", " ", "short", Role.VIEWER, "test"))
                .isInstanceOfSatisfying(
                        FieldFaultsException.class,
                        e -> assertThat(e.faults())
                                .extracting(FieldFaults.Fault::field)
                                .containsExactly("name", "displayName", "password"))
                .hasMessageContaining("An a")
                .hasMessageContaining("10 to 200")
                .hasMessageNotContaining("short");
    }

    private void fail(int times) {
        for (int i = 0; i < times; i++) {
            assertThat(accounts.signIn("ana", "wrong password")).isEqualTo(new Wrong());
        }
    }

    private Welcome welcome(String password) {
        SignIn result = accounts.signIn("ana", password);
        assertThat(result).isInstanceOf(Welcome.class);
        return (Welcome) result;
    }

    private String everything() throws SQLException {
        StringBuilder all = new StringBuilder();
        try (Connection connection = hatchery.database.schedulerDataSource().getConnection()) {
            for (String table : Hatchery.tables(connection)) {
                try (Statement statement = connection.createStatement();
                        ResultSet rows = statement.executeQuery("SELECT * FROM " + table)) {
                    while (rows.next()) {
                        for (int i = 1; i <= rows.getMetaData().getColumnCount(); i++) {
                            all.append(rows.getString(i)).append('\n');
                        }
                    }
                }
            }
        }
        return all.toString();
    }
}
