package org.hingeline.browser;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.Locale;
import org.hingeline.RunningService;
import org.hingeline.SteppedClock;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.Cookie;
import org.openqa.selenium.Keys;

/** What a person does with a phone at night: sign in, see what is wrong, take it on, change a limit, work out a dose. */
class NightShiftTest extends OnAPhone {
    /** Ω about 1.2 and 2.9 in the water of {@link #post}. */
    private static final double POOR_PH = 7.6;

    private static final double GOOD_PH = 8.05;

    private static final SteppedClock CLOCK = new SteppedClock();

    @BeforeAll
    static void open(@TempDir Path data) {
        open(data, CLOCK);
        service.addPerson(service.site(), "vic", "Vic Moss", Role.VIEWER);
        service.addPerson(service.site(), "lin", "Lin Sato", Role.OPERATOR);
    }

    @Test
    void a_wrong_password_is_told_and_the_fifth_locks_the_name_for_a_quarter_of_an_hour() {
        service.addPerson(service.site(), "rui", "Rui Paz", Role.OPERATOR);
        guest.arrive();
        for (int attempt = 1; attempt <= 4; attempt++) {
            guest.signIn("rui", "not the password").waitFor("Name and password do not match.");
            assertThat(guest.value("name")).isEqualTo("rui");
        }
        guest.signIn("rui", "not the password").waitFor("Too many failed attempts. Try again in 15 min");

        guest.signIn("rui", RunningService.PASSWORD).waitFor("Too many failed attempts.");
        assertThat(guest.path()).startsWith("/sign-in");

        CLOCK.pass(Duration.ofMinutes(16));
        guest.signIn("rui", RunningService.PASSWORD).waitFor("Signed in as Rui Paz");
    }

    @Test
    void the_first_page_says_in_words_which_tank_is_short_how_short_and_what_to_do() {
        post("larval-2", GOOD_PH);
        post("larval-3", POOR_PH);
        guest.comeIn("lin").waitFor("h1", "Larval tank 3 is short of carbonate.");

        assertThat(guest.text("#point-larval-3"))
                .containsPattern("Larval tank 3 short of carbonate")
                .containsPattern("Ω 1\\.\\d\\d ±0\\.\\d\\d, under your 2\\.00")
                .contains("Measured just now.")
                .contains("Do: Shut the line from the intake to tank 3");
        assertThat(guest.text("#point-larval-2"))
                .containsPattern("Larval tank 2 fit Ω 2\\.\\d\\d ±0\\.\\d\\d, your limit is 1\\.80");
        assertThat(guest.text(".to-do")).contains("Larval tank 3: Shut the line");
    }

    @Test
    void the_page_changes_by_itself_when_readings_come() {
        post("larval-4", GOOD_PH);
        guest.comeIn("lin").waitFor("#point-larval-4", "fit");
        guest.ask("window.sameDocument = 'yes'");
        guest.until(
                "the live line",
                () -> guest.ask("performance.getEntriesByType('resource').length > 0")
                        .equals("true"));

        post("larval-4", POOR_PH);
        guest.waitFor("#point-larval-4", "short of carbonate");

        assertThat(guest.ask("window.sameDocument")).isEqualTo("yes");
        post("larval-4", GOOD_PH);
        guest.waitFor("#point-larval-4", "fit");
    }

    @Test
    void an_alert_is_taken_on_with_one_tap_and_everybody_sees_by_whom() {
        raiseAt("larval-3");
        guest.comeIn("lin").waitFor("#point-larval-3", "Alert: Ω");

        guest.pressIn("#point-larval-3", "Acknowledge").waitFor("#point-larval-3", "Taken on by Lin Sato at ");

        assertThat(guest.has("#point-larval-3 .alert button")).isFalse();
        guest.comeIn("vic").open("/alerts");
        assertThat(guest.text()).contains("Larval tank 3: Ω").contains("Taken on by Lin Sato at ");
    }

    @Test
    void with_the_keyboard_alone_one_gets_to_the_content_and_takes_an_alert_on() {
        raiseAt("larval-1");
        guest.comeIn("lin").waitFor("#point-larval-1", "Alert: Ω");
        guest.open("/");

        guest.focused().sendKeys(Keys.TAB);
        assertThat(guest.focused().getText()).isEqualTo("Skip to the content");
        assertThat(guest.focused().getRect().getX()).isNotNegative();
        guest.focused().sendKeys(Keys.ENTER);
        assertThat(guest.focused().getAttribute("id")).isEqualTo("main");

        String button = guest.element("#point-larval-1 .alert button").getAttribute("id");
        for (int tabs = 0; tabs < 40 && !guest.focused().getAttribute("id").equals(button); tabs++) {
            guest.focused().sendKeys(Keys.TAB);
            assertThat(guest.ask("getComputedStyle(document.activeElement).outlineStyle"))
                    .as("outline of " + guest.focused().getText())
                    .isEqualTo("solid");
        }
        assertThat(guest.focused().getAttribute("id")).isEqualTo(button);
        guest.focused().sendKeys(Keys.ENTER);
        guest.waitFor("#point-larval-1", "Taken on by Lin Sato at ");
    }

    @Test
    void a_limit_is_refused_beside_its_field_saved_and_put_back() {
        guest.comeIn("lin").open("/points/larval-2");
        guest.pressIn("#limits", "Change")
                .type("below", "a lot")
                .type("action", "Call Lin.")
                .pressIn("#limits", "Save");
        guest.waitFor("Nothing was saved.");
        assertThat(guest.text("#limit-0-below-error")).isEqualTo("“a lot” is not a number");
        assertThat(guest.value("below")).isEqualTo("a lot");
        assertThat(guest.value("action")).isEqualTo("Call Lin.");
        guest.until("the wrong field", () -> "below".equals(guest.focused().getAttribute("name")));

        guest.type("below", "1,95").pressIn("#limits", "Save").waitFor("Ω below 1.95");
        assertThat(guest.text("#limits")).contains("Do: Call Lin.").contains("was changed.");

        guest.press("Put back").waitFor("Ω below 1.80");
        assertThat(guest.text("#limits")).contains("Do: Stop the exchange in tank 2");
    }

    @Test
    void a_dose_comes_in_steps_after_what_needs_no_chemical_and_with_its_cautions() {
        post("larval-2", POOR_PH);
        guest.comeIn("lin").open("/points/larval-2/dose");
        guest.element("input[value=anhydrous]").click();
        guest.press("Work out a dose").waitFor(".plan h2", "g of anhydrous sodium carbonate in");

        String plan = guest.text(".plan");
        assertThat(plan)
                .contains("Aeration to 420 µatm alone brings the water")
                .contains("Mind this before weighing")
                .contains("Causes serious eye irritation")
                .containsPattern("between [\\d ]+\u00a0?k?g and [\\d ]+\u00a0?k?g")
                .containsPattern("At once .* of stock then expect pH \\d\\.\\d\\d \\(total scale\\), Ω \\d\\.\\d\\d");
        assertThat(plan.indexOf("First, without a chemical")).isLessThan(plan.indexOf("Step by step"));
        assertThat(plan.indexOf("Mind this")).isLessThan(plan.indexOf("Step by step"));
        assertThat(guest.text()).contains("A suggestion: a person confirms, a person doses.");
    }

    @Test
    void no_dose_is_suggested_for_water_that_is_not_known_any_more() {
        post("larval-4", POOR_PH);
        CLOCK.pass(Duration.ofHours(3));
        guest.comeIn("lin").open("/points/larval-4/dose");
        guest.element("input[value=anhydrous]").click();
        guest.press("Work out a dose").waitFor(".plan h2", "No dose can be suggested.");

        assertThat(guest.text(".plan")).contains("Why").doesNotContain("Step by step");
    }

    @Test
    void a_viewer_sees_everything_and_can_change_nothing() {
        raiseAt("larval-3");
        guest.comeIn("vic").waitFor("#point-larval-3", "Alert: Ω");
        for (String page : new String[] {"/", "/alerts", "/messages", "/points/larval-3"}) {
            guest.open(page);
            assertThat(
                            guest.ask(
                                    "[...document.querySelectorAll('form[method=post]')].map(f => f.getAttribute('action')).join()"))
                    .as(page)
                    .isEqualTo("/sign-out");
        }
        guest.open("/setup");
        assertThat(guest.text()).contains("This is not open to you.");
    }

    @Test
    void who_works_at_two_sites_chooses_and_who_works_at_one_never_sees_the_other() {
        Site other = service.addPlace("""
                site: {code: alder-slough, name: Alder Slough Clams, zone: America/Vancouver}
                points:
                  - {code: pond, name: Nursery pond, kind: storage, position: 1}
                """);
        service.addPerson(other, "bo", "Bo Alder", Role.MANAGER);
        service.addPerson(service.site(), "eve", "Eve Two", Role.OPERATOR);
        service.addToSite(other, "eve", Role.VIEWER);

        guest.comeIn("eve").waitFor("Ilwen Narrows Shellfish");
        guest.ask("document.getElementById('site').value = 'alder-slough'");
        guest.press("Show").waitFor("h2", "Nursery pond");
        assertThat(guest.text()).contains("Signed in as Eve Two, viewer.");
        guest.press("Alerts").waitFor("h1", "No alert is open.");
        assertThat(guest.path()).isEqualTo("/alerts?site=alder-slough");

        guest.comeIn("bo").waitFor("Nursery pond");
        assertThat(guest.has(".sites")).isFalse();
        for (String page : new String[] {
            "/points/larval-3", "/?site=" + service.site().code(), "/points/larval-3/dose", "/alerts?site=ilwen-narrows"
        }) {
            guest.open(page);
            assertThat(guest.html()).as(page).doesNotContain("Ilwen", "Larval tank");
            assertThat(guest.text()).as(page).contains("There is no such page here.");
        }
    }

    @Test
    void what_does_not_come_from_our_own_form_is_refused_and_changes_nothing() {
        guest.comeIn("ana").open("/points/larval-2");
        String before = guest.text("#limits");
        var fields = new java.util.LinkedHashMap<String, String>();
        fields.put("quantity", "omegaAragonite");
        fields.put("below", "0.1");
        fields.put("deadband", "0.05");
        fields.put("priority", "low");
        fields.put("action", "Sleep on.");
        assertThat(guest.postWithoutOurForm("/points/larval-2/limits/omega-low", fields))
                .isEqualTo(403);
        fields.put("csrf", "made-up");
        assertThat(guest.postWithoutOurForm("/points/larval-2/limits/omega-low", fields))
                .isEqualTo(403);
        assertThat(guest.postWithoutOurForm("/setup/gateway-keys", java.util.Map.of("name", "intruder")))
                .isEqualTo(403);

        guest.open("/points/larval-2");
        assertThat(guest.text("#limits")).isEqualTo(before);
        guest.open("/setup");
        assertThat(guest.text()).doesNotContain("intruder");
    }

    @Test
    void signing_out_ends_it_and_the_cookie_was_never_for_scripts_or_other_sites() {
        guest.comeIn("lin");
        assertThat(phone.driver().manage().getCookies()).isNotEmpty().allSatisfy(cookie -> {
            assertThat(cookie.isHttpOnly()).as(cookie.getName()).isTrue();
            assertThat(cookie.getSameSite()).as(cookie.getName()).isIn("Lax", "Strict");
        });
        assertThat(guest.ask("document.cookie")).isEmpty();
        Cookie session = phone.driver().manage().getCookieNamed("hingeline_session");

        guest.press("Sign out").waitFor("h1", "Sign in");
        phone.driver().navigate().back();
        guest.waitFor("h1", "Sign in");

        phone.driver().manage().addCookie(session);
        guest.open("/");
        assertThat(guest.text("h1")).isEqualTo("Sign in");
    }

    /** An alert by two values out of the limit, further apart than its on-delay. */
    private static void raiseAt(String point) {
        post(point, GOOD_PH);
        CLOCK.pass(Duration.ofSeconds(40));
        post(point, POOR_PH);
        for (int i = 0; i < 3; i++) {
            CLOCK.pass(Duration.ofMinutes(4));
            post(point, POOR_PH);
        }
    }

    private static void post(String point, double ph) {
        Instant at = CLOCK.instant();
        String rows = row(point, "ph", ph, at) + "," + row(point, "temperature", 22, at) + ","
                + row(point, "salinity", 30, at) + "," + row(point, "totalAlkalinity", 2080, at);
        assertThat(service.postReadings("{\"readings\":[" + rows + "]}").statusCode())
                .isEqualTo(200);
    }

    private static String row(String point, String quantity, double value, Instant at) {
        return String.format(
                Locale.ROOT,
                "{\"point\":\"%s\",\"quantity\":\"%s\",\"value\":%s,\"at\":\"%s\"}",
                point,
                quantity,
                value,
                at);
    }
}
