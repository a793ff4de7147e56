package org.hingeline.browser;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.By;
import org.openqa.selenium.Keys;
import org.openqa.selenium.support.ui.Select;

/** A person with a phone asks how a number came about, tries another, and brings numbers of their own. */
class CalculatorOnAPhoneTest extends OnAPhone {
    @BeforeAll
    static void open(@TempDir Path data) {
        open(data, Clock.systemUTC());
        service.addPerson(service.site(), "vic", "Vic Moss", Role.VIEWER);
        Instant now = Instant.now();
        StringBuilder rows = new StringBuilder();
        for (int minutes : new int[] {60, 40, 20, 0}) {
            for (String reading : new String[] {
                "ph\",\"value\":7." + (70 + minutes / 10),
                "temperature\",\"value\":22",
                "salinity\",\"value\":30",
                "totalAlkalinity\",\"value\":2080"
            }) {
                rows.append(rows.isEmpty() ? "" : ",")
                        .append("{\"point\":\"larval-3\",\"at\":\"")
                        .append(now.minusSeconds(60L * minutes))
                        .append("\",\"quantity\":\"")
                        .append(reading)
                        .append("}");
            }
        }
        assertThat(service.postReadings("{\"readings\":[" + rows + "]}").statusCode())
                .isEqualTo(200);
    }

    @Test
    void asks_how_the_water_was_computed_sees_where_it_came_from_and_tries_another_ph() {
        guest.comeIn("vic").open("/points/larval-3");
        String shown = guest.text(".one .omega");
        guest.press("How was this computed?").waitFor("h1", "How the water at Larval tank 3 was computed");

        assertThat(guest.path()).isEqualTo("/calculator?point=larval-3");
        assertThat(guest.text(".great")).isEqualTo(shown);
        guest.until(
                "the result in view",
                () -> Integer.parseInt(
                                guest.ask("Math.round(document.getElementById('state').getBoundingClientRect().top)"))
                        < 60);
        assertThat(guest.text(".origins")).contains("pH 7.7 ±0.02 total scale sensor ph-3 read ");
        assertThat(guest.element("svg.map").getAttribute("aria-label"))
                .contains("Ω rises with pH and with alkalinity.")
                .contains("Ω 2.00, your limit, lies at pH ");
        assertThat(guest.text("svg.map")).contains("your limit 2.00").contains(shown);
        assertThat(guest.ask("document.querySelector('.line-limit').getBoundingClientRect().width > 20"))
                .isEqualTo("true");

        guest.type("ph", "8,05").press("Work it out").waitFor(".changed", "You changed pH.");
        assertThat(guest.text(".changed")).contains("At the point it was " + shown + " ±");
        assertThat(omega()).isGreaterThan(2.4);
        assertThat(guest.value("ph")).isEqualTo("8,05");
        assertThat(guest.text(".verdict-of")).contains("Above the limit of 2.00");

        guest.press("Back to the point’s own numbers").waitFor(".great", shown);
        assertThat(guest.has(".changed")).isFalse();
    }

    @Test
    void asks_the_same_of_a_moment_in_the_course() {
        guest.comeIn("vic").open("/points/larval-3");
        guest.until("the chart", () -> guest.has(".charts canvas"));
        guest.element(".charts").sendKeys(Keys.HOME);
        guest.waitFor(".said-at", "How was this computed?");
        String said = guest.text(".said-at");
        guest.element(".said-at a").click();

        guest.waitFor("h1", "How the water at Larval tank 3 was computed");
        assertThat(said).contains(guest.text(".great") + " ±");
        assertThat(guest.value("ph")).isEqualTo("7.76");
    }

    @Test
    void brings_numbers_of_their_own_in_their_own_units() {
        guest.comeIn("vic").press("Calculator").waitFor("h1", "What water is this?");
        assertThat(guest.element("[name=dic]").isDisplayed()).isFalse();

        guest.element("label[for=pair-ta-dic]").click();
        guest.until("the fields of the pair", () -> guest.element("[name=dic]").isDisplayed());
        assertThat(guest.element("[name=ph]").isDisplayed()).isFalse();
        new Select(guest.element("[name=tempUnit]")).selectByVisibleText("°F");
        new Select(guest.element("[name=taUnit]")).selectByVisibleText("meq/L");
        assertThat(guest.value("taPm")).isEqualTo("0.01");
        assertThat(guest.value("tempPm")).isEqualTo("0.18");
        guest.type("temp", "71,6").type("salt", "30").type("ta", "2,1223").press("Work it out");

        guest.waitFor("See what is marked below.");
        assertThat(guest.text("#c-dic-error")).contains("Fill it in");
        guest.until("the empty field", () -> "dic".equals(guest.focused().getAttribute("name")));

        guest.type("dic", "1950").type("warmTo", "77").press("Work it out").waitFor(".becomes", "closed, at 77 °F");
        assertThat(guest.text(".whole")).contains("total alkalinity 2 080 ±10 µmol/kg = 2.122 ±0.010 meq/L");
        assertThat(guest.path()).contains("pair=ta-dic").doesNotContain("ph=", "pco2", "silicate");
        String found = guest.text(".great");
        phone.driver().navigate().refresh();
        guest.waitFor(".great", found);
        assertThat(guest.console().stream().filter(line -> !line.contains("422")))
                .isEmpty();
    }

    @Test
    void holds_an_electrode_against_tris() {
        guest.comeIn("vic").open("/calculator");
        guest.press("Check a pH electrode in tris").waitFor("h1", "Check a pH electrode in tris");
        guest.type("temp", "21,5").type("ph", "8,10").press("Compare").waitFor(".verdict-of h2", "too low.");

        assertThat(guest.text(".verdict-of")).contains("Do not trust its readings");
    }

    private static double omega() {
        return Double.parseDouble(
                phone.driver().findElement(By.cssSelector(".great")).getText().replace("Ω ", ""));
    }
}
