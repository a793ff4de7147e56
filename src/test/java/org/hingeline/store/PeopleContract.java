package org.hingeline.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.hingeline.store.Samples.T0;

import org.hingeline.alert.Priority;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.KeyBook.AccessToken;
import org.hingeline.monitor.KeyBook.GatewayKey;
import org.hingeline.monitor.PeopleBook.Membership;
import org.hingeline.monitor.PeopleBook.Person;
import org.hingeline.monitor.PeopleBook.PersonAtSite;
import org.hingeline.monitor.PeopleBook.Session;
import org.hingeline.monitor.PeopleBook.Subscriber;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.Test;

interface PeopleContract extends StoreUnderTest {

    @Test
    default void a_person_is_found_by_name_and_by_id() {
        assertThat(seen().people().countPeople()).isZero();

        long id = person("mia");

        Person mia = new Person(id, "mia", "Mia Berg", "hash", 0, null);
        assertThat(seen().people().personByName("mia")).contains(mia);
        assertThat(seen().people().person(id)).contains(mia);
        assertThat(seen().people().personByName("Mia")).isEmpty();
        assertThat(seen().people().person(id + 1)).isEmpty();
        assertThat(seen().people().countPeople()).isOne();
    }

    @Test
    default void a_person_saved_again_has_the_new_password_and_may_sign_in_at_once() {
        long id = person("mia");
        done().people().saveSignInFailures(id, 5, T0);

        long again = done().people().savePerson("mia", "Mia B.", "other", T0.plusSeconds(9));

        assertThat(again).isEqualTo(id);
        assertThat(seen().people().person(id)).contains(new Person(id, "mia", "Mia B.", "other", 0, null));
        assertThat(seen().people().countPeople()).isOne();
    }

    @Test
    default void failed_sign_ins_are_counted_and_forgotten() {
        long id = person("mia");

        done().people().saveSignInFailures(id, 5, T0);
        assertThat(seen().people().person(id)).contains(new Person(id, "mia", "Mia Berg", "hash", 5, T0));

        done().people().saveSignInFailures(id, 0, null);
        assertThat(seen().people().person(id)).contains(new Person(id, "mia", "Mia Berg", "hash", 0, null));
    }

    @Test
    default void a_person_may_do_different_things_at_different_sites() {
        Site south = Samples.site(store(), "south");
        Site north = Samples.site(store(), "north");
        long mia = person("mia");
        long ben = person("ben");
        store().writeOnly(books -> {
            books.people().saveMembership(mia, north.id(), Role.VIEWER);
            books.people().saveMembership(mia, south.id(), Role.OPERATOR);
            books.people().saveMembership(ben, north.id(), Role.MANAGER);
            books.people().saveMembership(mia, north.id(), Role.MANAGER);
        });

        assertThat(seen().people().memberships(mia))
                .containsExactly(new Membership(north, Role.MANAGER), new Membership(south, Role.OPERATOR));
        assertThat(seen().people().peopleOf(north.id()))
                .containsExactly(
                        new PersonAtSite(new Person(ben, "ben", "Mia Berg", "hash", 0, null), Role.MANAGER),
                        new PersonAtSite(new Person(mia, "mia", "Mia Berg", "hash", 0, null), Role.MANAGER));
        assertThat(seen().people().peopleOf(south.id()))
                .extracting(at -> at.person().id())
                .containsExactly(mia);
    }

    @Test
    default void a_session_lasts_until_it_is_removed() {
        long mia = person("mia");
        session("token-a", mia, 60);
        session("token-b", mia, 60);

        assertThat(seen().people().session("token-a")).contains(new Session(mia, "csrf", T0.plusSeconds(60)));

        done().people().removeSession("token-a");

        assertThat(seen().people().session("token-a")).isEmpty();
        assertThat(seen().people().session("token-b")).isPresent();
    }

    @Test
    default void sessions_expired_by_a_time_are_removed_and_no_others() {
        long mia = person("mia");
        session("before", mia, 59);
        session("at", mia, 60);
        session("after", mia, 61);

        done().people().removeSessionsExpiredBy(T0.plusSeconds(60));

        assertThat(seen().people().session("before")).isEmpty();
        assertThat(seen().people().session("at")).isEmpty();
        assertThat(seen().people().session("after")).isPresent();
    }

    @Test
    default void all_sessions_of_one_person_can_be_ended() {
        long mia = person("mia");
        long ben = person("ben");
        session("mia-1", mia, 60);
        session("mia-2", mia, 60);
        session("ben-1", ben, 60);

        done().people().removeSessionsOf(mia);

        assertThat(seen().people().session("mia-1")).isEmpty();
        assertThat(seen().people().session("mia-2")).isEmpty();
        assertThat(seen().people().session("ben-1")).isPresent();
    }

    @Test
    default void a_gateway_key_is_found_by_its_hash_until_it_is_revoked() {
        Site north = Samples.site(store(), "north");
        long id = done().keys().addGatewayKey(north.id(), "shed", "hash-1", T0);

        assertThat(seen().keys().gatewayKey("hash-1")).contains(new GatewayKey(id, north.id(), "shed", T0, null, null));

        done().keys().gatewayHeard(id, T0.plusSeconds(5));
        boolean revoked = done().keys().revokeGatewayKey(north.id(), id, T0.plusSeconds(9));

        assertThat(revoked).isTrue();
        assertThat(seen().keys().gatewayKey("hash-1")).isEmpty();
        assertThat(seen().keys().gatewayKeys(north.id()))
                .containsExactly(new GatewayKey(id, north.id(), "shed", T0, T0.plusSeconds(5), T0.plusSeconds(9)));
    }

    @Test
    default void a_gateway_key_is_revoked_once_and_only_by_its_own_site() {
        Site north = Samples.site(store(), "north");
        Site south = Samples.site(store(), "south");
        long id = done().keys().addGatewayKey(north.id(), "shed", "hash-1", T0);

        assertThat(done().keys().revokeGatewayKey(south.id(), id, T0)).isFalse();
        assertThat(seen().keys().gatewayKey("hash-1")).isPresent();
        assertThat(seen().keys().gatewayKeys(south.id())).isEmpty();
        assertThat(done().keys().revokeGatewayKey(north.id(), id, T0)).isTrue();
        assertThat(done().keys().revokeGatewayKey(north.id(), id, T0.plusSeconds(1)))
                .isFalse();
        assertThat(seen().keys().gatewayKeys(north.id()))
                .extracting(GatewayKey::revokedAt)
                .containsExactly(T0);
    }

    @Test
    default void an_access_token_is_found_by_its_hash_until_it_is_revoked() {
        Site north = Samples.site(store(), "north");
        Site south = Samples.site(store(), "south");
        long id = done().keys().addAccessToken(north.id(), "export", Role.OPERATOR, "hash-1", T0);

        assertThat(seen().keys().accessToken("hash-1"))
                .contains(new AccessToken(id, north.id(), "export", Role.OPERATOR, T0, null));
        assertThat(done().keys().revokeAccessToken(south.id(), id, T0)).isFalse();
        assertThat(done().keys().revokeAccessToken(north.id(), id, T0.plusSeconds(1)))
                .isTrue();
        assertThat(done().keys().revokeAccessToken(north.id(), id, T0.plusSeconds(2)))
                .isFalse();
        assertThat(seen().keys().accessToken("hash-1")).isEmpty();
        assertThat(seen().keys().accessTokens(north.id()))
                .containsExactly(new AccessToken(id, north.id(), "export", Role.OPERATOR, T0, T0.plusSeconds(1)));
        assertThat(seen().keys().accessTokens(south.id())).isEmpty();
    }

    @Test
    default void two_keys_never_share_a_hash() {
        Site north = Samples.site(store(), "north");
        Site south = Samples.site(store(), "south");
        done().keys().addGatewayKey(north.id(), "shed", "hash-1", T0);

        assertThatThrownBy(() -> done().keys().addGatewayKey(south.id(), "barn", "hash-1", T0))
                .isInstanceOf(RuntimeException.class);

        assertThat(seen().keys().gatewayKeys(south.id())).isEmpty();
    }

    @Test
    default void a_subscriber_comes_back_as_saved_and_keeps_its_id_when_saved_again() {
        Site north = Samples.site(store(), "north");
        Site south = Samples.site(store(), "south");
        Subscriber first = done().people()
                .saveSubscriber(
                        new Subscriber(0, north.id(), "night", "Night", "night@hatchery.example", Priority.HIGH, true));

        assertThat(first)
                .isEqualTo(new Subscriber(
                        first.id(), north.id(), "night", "Night", "night@hatchery.example", Priority.HIGH, true));

        Subscriber again = done().people()
                .saveSubscriber(
                        new Subscriber(0, north.id(), "night", "Nights", "n@hatchery.example", Priority.LOW, false));

        assertThat(again)
                .isEqualTo(new Subscriber(
                        first.id(), north.id(), "night", "Nights", "n@hatchery.example", Priority.LOW, false));
        assertThat(seen().people().subscribers(north.id())).containsExactly(again);
        assertThat(seen().people().subscribers(south.id())).isEmpty();
    }

    private long person(String name) {
        return done().people().savePerson(name, "Mia Berg", "hash", T0);
    }

    private void session(String token, long person, int seconds) {
        done().people().addSession(token, person, "csrf", T0, T0.plusSeconds(seconds));
    }
}
