package org.hingeline.browser;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.util.List;
import java.util.function.Supplier;
import org.hingeline.RunningService;
import org.hingeline.monitor.Role;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Every page in both sizes: nothing blocked, nothing failed, nothing wider than the screen. */
class EveryPageTest {
    private static final List<String> PAGES = List.of(
            "/",
            "/alerts",
            "/messages",
            "/setup",
            "/points/larval-3",
            "/points/larval-4",
            "/points/larval-3/dose",
            "/points/larval-3/doses",
            "/calculator",
            "/calculator?point=larval-3",
            "/calculator?temp=8&salt=12&pair=dic-pco2&dic=1500&pco2=90&pco2Unit=Pa&limit=1.5&warmTo=20&airTo=420"
                    + "&blendShare=30&blendTemp=12&blendSalt=28&blendPh=7.8&blendTa=2000&ammonia=0.5&calcium=4",
            "/calculator/electrode",
            "/calculator/electrode?temp=21.5&salt=35&ph=8.36&phUnit=total");

    enum Size {
        PHONE(Browser::phone),
        DESK(Browser::desktop);

        private final Supplier<Browser> browser;

        Size(Supplier<Browser> browser) {
            this.browser = browser;
        }
    }

    @TempDir
    static Path data;

    private static RunningService service;

    @BeforeAll
    static void open() {
        service = RunningService.start(data, Clock.systemUTC());
        Instant now = Instant.now();
        StringBuilder rows = new StringBuilder();
        for (int minutes = 240; minutes >= 0; minutes -= 20) {
            for (String pair : List.of(
                    "ph\",\"value\":7.6",
                    "temperature\",\"value\":22",
                    "salinity\",\"value\":30",
                    "totalAlkalinity\",\"value\":2080")) {
                rows.append(rows.isEmpty() ? "" : ",")
                        .append("{\"point\":\"larval-3\",\"at\":\"")
                        .append(now.minusSeconds(60L * minutes))
                        .append("\",\"quantity\":\"")
                        .append(pair)
                        .append("}");
            }
        }
        assertThat(service.postReadings("{\"readings\":[" + rows + "]}").statusCode())
                .isEqualTo(200);
        String dose = """
                {"key":"every-page-1","point":"larval-3","massG":54,"lot":"SA-2291","at":"%s",
                 "agent":{"code":"sodium-carbonate","hydration":"anhydrous","assayPercent":99}}
                """.formatted(now.minusSeconds(3600));
        assertThat(service.send("POST", "/api/v1/doses", service.token(Role.OPERATOR), dose)
                        .statusCode())
                .isEqualTo(201);
    }

    @AfterAll
    static void close() {
        if (service != null) {
            service.close();
        }
    }

    @ParameterizedTest
    @EnumSource(Size.class)
    void stays_within_the_screen_and_the_browser_has_nothing_to_complain_of(Size size) {
        try (Browser browser = size.browser.get()) {
            Guest guest = new Guest(browser, service).comeIn("ana");
            for (String page : PAGES) {
                guest.open(page);
                if (page.startsWith("/points/") && !page.contains("/dose")) {
                    guest.until(
                            "the course",
                            () -> guest.ask(
                                            "document.querySelectorAll('.charts canvas').length > 0 || /No Ω is known/.test(document.body.innerText)")
                                    .equals("true"));
                }
                assertThat(guest.ask("document.documentElement.scrollWidth - innerWidth"))
                        .as("sideways scrolling of " + page)
                        .isEqualTo("0");
                assertThat(
                                guest.ask(
                                        "[...document.querySelectorAll('main *')].filter(e => e.getBoundingClientRect().right > innerWidth + 1"
                                                + " && !e.closest('svg, .charts, .unseen')).map(e => e.outerHTML.slice(0, 80)).join()"))
                        .as("wider than the screen on " + page)
                        .isEmpty();
                assertThat(guest.console()).as("console of " + page).isEmpty();
            }
        }
    }

    @Test
    void a_dose_is_marked_on_the_course_of_its_tank_and_said_in_words() {
        try (Browser browser = Browser.phone()) {
            Guest guest = new Guest(browser, service).comeIn("ana").open("/points/larval-3");

            guest.waitFor("#history-words", "Doses, marked on the chart: 54 g on ");

            guest.element(".charts").click();
            assertThat(guest.console()).isEmpty();
            guest.open("/points/larval-4");
            guest.until("the course", () -> guest.has(".charts h3"));
            assertThat(guest.text("#history-words")).doesNotContain("Doses");
        }
    }
}
