package org.hingeline.browser;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.Locale;
import org.hingeline.SteppedClock;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.By;

/** With a phone beside the tank: from an open alert to a recorded dose, taken back, confirmed by another, corrected. */
class DoseRecordTest extends OnAPhone {
    private static final SteppedClock CLOCK = new SteppedClock();

    @BeforeAll
    static void open(@TempDir Path data) {
        open(data, CLOCK);
        service.addPerson(service.site(), "vic", "Vic Moss", Role.VIEWER);
        service.addPerson(service.site(), "lin", "Lin Sato", Role.OPERATOR);
        service.addPerson(service.site(), "rui", "Rui Paz", Role.OPERATOR);
    }

    @Test
    void from_an_open_alert_to_a_recorded_dose_with_nothing_typed_but_the_lot() {
        raiseAt("larval-3");
        guest.comeIn("lin").waitFor("#point-larval-3", "Alert: Ω");
        planFrom("larval-3");

        double massG = Double.parseDouble(guest.element("#put-in [name=massG]").getDomProperty("value"));
        assertThat(massG).isPositive();
        assertThat(guest.text("#put-in"))
                .contains("Anhydrous sodium carbonate, 99 %")
                .contains("by Lin Sato");
        assertThat(guest.element("#put-in button").getSize().height).isGreaterThanOrEqualTo(64);
        guest.element("#put-in [name=lot]").sendKeys("SA-2291");
        guest.pressIn("#put-in", "Record it").waitFor("recorded. For ten minutes you can undo it.");

        assertThat(guest.path()).startsWith("/points/larval-3");
        assertThat(guest.text("#doses"))
                .contains("Anhydrous sodium carbonate, 99 %, lot SA-2291. Recorded by Lin Sato, after a plan.")
                .contains("The tank is still mixing.")
                .containsPattern("Foretold: pH 7\\.60 to 7\\.\\d\\d \\(change ±0\\.0\\d\\d\\)");
        assertThat(guest.ask("document.documentElement.scrollWidth <= window.innerWidth"))
                .isEqualTo("true");
        assertThat(guest.console()).isEmpty();
    }

    @Test
    void a_dose_is_taken_back_with_one_tap_for_ten_minutes_and_then_corrected() {
        raiseAt("larval-2");
        guest.comeIn("lin").open("/points/larval-2");
        planFrom("larval-2");
        guest.element("#put-in [name=lot]").sendKeys("SA-1");
        guest.pressIn("#put-in", "Record it").waitFor("#doses", "Undo");

        guest.pressIn("#doses", "Undo").waitFor("undone. The record stays and says so.");

        assertThat(guest.text("#doses")).contains("undone by Lin Sato").doesNotContain("Undo");
        assertThat(guest.has("#doses .struck")).isTrue();

        planFrom("larval-2");
        guest.element("#put-in [name=lot]").sendKeys("SA-2");
        guest.pressIn("#put-in", "Record it").waitFor("#doses", "SA-2");
        CLOCK.pass(Duration.ofMinutes(11));
        guest.open("/points/larval-2");
        assertThat(guest.text("#doses")).contains("SA-2").doesNotContain("Undo");

        guest.pressIn("#doses", "Correct");
        guest.type("massG", "12.5").type("lot", "SA-3").type("note", "Read the balance wrong.");
        guest.pressIn("#doses", "Enter the correction").waitFor("The correction is entered");
        assertThat(guest.text("#doses"))
                .contains("12.5 g")
                .contains("corrected by another entry")
                .contains("“Read the balance wrong.”");
    }

    @Test
    void what_is_wrong_with_a_record_is_told_beside_the_field_and_nothing_is_lost() {
        raiseAt("larval-4");
        guest.comeIn("lin");
        planFrom("larval-4");
        guest.element("#put-in [name=massG]").clear();
        guest.element("#put-in [name=massG]").sendKeys("a bit");
        guest.element("#put-in [name=lot]").sendKeys("SA-7");
        guest.pressIn("#put-in", "Record it").waitFor("“a bit” is not a number");

        assertThat(guest.value("lot")).isEqualTo("SA-7");
        guest.type("massG", "20");
        guest.press("Record it").waitFor("20.0 g recorded.");
        assertThat(guest.text("#doses")).contains("Anhydrous sodium carbonate, 99 %, lot SA-7.");
    }

    @Test
    void a_large_dose_waits_for_another_person_and_a_viewer_only_sees_it() {
        raiseAt("larval-1");
        guest.comeIn("lin");
        planFrom("larval-1");
        guest.element("#put-in [name=massG]").clear();
        guest.element("#put-in [name=massG]").sendKeys("600");
        guest.element("#put-in [name=lot]").sendKeys("SA-9");
        guest.pressIn("#put-in", "Record it").waitFor("Put nothing in before it is confirmed.");
        assertThat(guest.text("#doses")).contains("waits for a second person").doesNotContain("Confirm 600");

        guest.comeIn("vic").open("/points/larval-1");
        assertThat(guest.text("#doses")).contains("waits for a second person");
        assertThat(guest.has("#doses form")).isFalse();

        guest.comeIn("rui").open("/points/larval-1");
        guest.pressIn("#doses", "Confirm 600 g").waitFor("600 g confirmed. It can be put in.");
        assertThat(guest.text("#doses")).contains("Recorded by Lin Sato, confirmed by Rui Paz");
    }

    @Test
    void a_dose_without_a_plan_goes_on_record_too_and_the_bag_is_remembered() {
        guest.comeIn("lin").open("/points/storage").press("Record a dose").waitFor("h1", "Record a dose for");
        guest.element("[value='sodium-carbonate/decahydrate']")
                .findElement(By.xpath(".."))
                .click();
        guest.type("massG", "40").type("lot", "WS-114").press("Record it").waitFor("40.0 g recorded.");
        assertThat(guest.text("#doses"))
                .contains("Decahydrate sodium carbonate, 99 %, lot WS-114. Recorded by Lin Sato.")
                .contains("Nothing was foretold");

        guest.press("Record a dose").waitFor("h1", "Record a dose for");

        assertThat(guest.value("lot")).isEqualTo("WS-114");
        assertThat(guest.element("[value='sodium-carbonate/decahydrate']").isSelected())
                .isTrue();
        guest.type("massG", "0").press("Record it").waitFor("0 must be above 0");
        assertThat(guest.element("[value='sodium-carbonate/decahydrate']").isSelected())
                .isTrue();
        assertThat(guest.console()).noneMatch(line -> line.contains("SEVERE") && !line.contains("422"));
    }

    private static void planFrom(String point) {
        guest.open("/points/" + point).press("Plan a dose").waitFor("h1", "A dose for");
        guest.element("[value=anhydrous]").findElement(By.xpath("..")).click();
        guest.press("Work out a dose").waitFor("Record what was put in");
    }

    /** An alert by values out of the limit for longer than its on-delay. */
    private static void raiseAt(String point) {
        post(point, 8.05);
        CLOCK.pass(Duration.ofSeconds(40));
        post(point, 7.6);
        for (int i = 0; i < 3; i++) {
            CLOCK.pass(Duration.ofMinutes(4));
            post(point, 7.6);
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
