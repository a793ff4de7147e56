package org.hingeline.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.hingeline.web.view.DoseRow;
import org.hingeline.web.view.DoseView.Outcome;
import org.hingeline.web.view.ErrorView;
import org.hingeline.web.view.Form;
import org.hingeline.web.view.LayoutView;
import org.hingeline.web.view.LayoutView.Role;
import org.hingeline.web.view.PathPoint;
import org.hingeline.web.view.Place;
import org.hingeline.web.view.PointView;
import org.hingeline.web.view.RecordView;
import org.hingeline.web.view.SetupView;
import org.hingeline.web.view.SignInView;
import org.hingeline.web.view.SiteChoice;
import org.hingeline.web.view.StatusView;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class PagesTest {
    private static final Pages PAGES = new Pages();
    private static final Instant NOW = Instant.parse("2026-05-14T02:12:00Z");
    private static final LookSamples SAMPLES = new LookSamples(NOW);
    private static final List<SiteChoice> ONE_SITE = List.of(new SiteChoice("vale", "Ria Cove", true));

    static Stream<Map.Entry<String, String>> every_page() {
        LayoutView manager = SAMPLES.layout("water");
        LayoutView two = SAMPLES.twoSites("alerts");
        Map<String, String> pages = new LinkedHashMap<>();
        pages.put("ordinary", page("status", manager, SAMPLES.ordinary()));
        pages.put("all fit", page("status", two, SAMPLES.allFit()));
        pages.put("bad night", page("status", manager, SAMPLES.badNight()));
        pages.put("nothing known", page("status", manager, SAMPLES.nothingKnown()));
        pages.put("no points", page("status", manager, new StatusView(null, List.of())));
        pages.put("point", page("point", manager, SAMPLES.point(false)));
        pages.put("point refused", page("point", two, SAMPLES.point(true)));
        pages.put("point unknown", page("point", manager, unknownPoint()));
        pages.put("alerts", page("alerts", two, SAMPLES.alerts()));
        pages.put("messages", page("messages", manager, SAMPLES.messages()));
        pages.put("setup", page("setup", manager, SAMPLES.setup(true)));
        pages.put("calculator", page("calculator", two, CalculatorSamples.empty()));
        pages.put("calculator refused", page("calculator", manager, CalculatorSamples.refused()));
        pages.put("calculator worked", page("calculator", manager, CalculatorSamples.worked()));
        pages.put("calculator of a point", page("calculator", two, CalculatorSamples.ofPoint("larval-3", NOW)));
        pages.put("electrode", page("electrode", two, CalculatorSamples.electrode()));
        for (Outcome outcome : Outcome.values()) {
            pages.put("dose " + outcome, page("dose", manager, SAMPLES.dose(outcome)));
        }
        pages.put(
                "sign-in",
                page("sign-in", LayoutView.signedOut("t"), new SignInView("", "", "Try again at 03:25.", "/alerts")));
        for (int status : new int[] {400, 403, 404, 500}) {
            pages.put("error " + status, page("error", manager, ErrorView.of(status)));
        }
        return pages.entrySet().stream();
    }

    @ParameterizedTest
    @MethodSource("every_page")
    void is_one_whole_document_without_anything_the_content_policy_forbids(Map.Entry<String, String> page) {
        String html = page.getValue();
        assertThat(html).startsWith("<!doctype html>").contains("<html lang=\"en\">", "<main id=\"main\"", "</html>");
        assertThat(html).doesNotContainPattern("<script(?![^>]*\\ssrc=)");
        assertThat(html).doesNotContainPattern("<style[\\s>]");
        assertThat(html).doesNotContainPattern("<[^>]*\\sstyle=");
        assertThat(html).doesNotContainPattern("<[^>]*\\son[a-z]+=");
        assertThat(html).doesNotContainPattern("(?:src|href|action)=\"(?:https?:|//|javascript:)");
        assertThat(html).doesNotContain("${", "@template", "@if", "@endif");
    }

    @ParameterizedTest
    @MethodSource("every_page")
    void has_one_heading_of_the_first_rank_and_no_id_twice(Map.Entry<String, String> page) {
        assertThat(found(page.getValue(), "<(h1)[\\s>]")).hasSize(1);
        assertThat(found(page.getValue(), "\\sid=\"([^\"]*)\""))
                .doesNotHaveDuplicates()
                .allSatisfy(id -> assertThat(id).doesNotContain(" "));
    }

    @ParameterizedTest
    @MethodSource("every_page")
    void labels_every_field_and_describes_it_by_what_is_there(Map.Entry<String, String> page) {
        String html = page.getValue();
        List<String> ids = found(html, "\\sid=\"([^\"]*)\"");
        List<String> labelled = found(html, "<label for=\"([^\"]*)\"");
        assertThat(found(html, "<(?:input|select) id=\"([^\"]*)\"")).isSubsetOf(labelled);
        for (String described : found(html, "aria-describedby=\"([^\"]*)\"")) {
            assertThat(described.split(" ")).isSubsetOf(ids);
        }
        assertThat(found(html, "<use href=\"#([^\"]*)\"")).isSubsetOf(ids);
    }

    @ParameterizedTest
    @MethodSource("every_page")
    void sends_the_forgery_token_with_every_post(Map.Entry<String, String> page) {
        for (String form : found(page.getValue(), "(?s)<form[^>]*method=\"post\"[^>]*>(.*?)</form>")) {
            assertThat(form).containsPattern("<input type=\"hidden\" name=\"csrf\" value=\"[^\"]+\">");
        }
    }

    @Test
    void says_first_what_is_wrong_and_what_to_do() {
        String html = page("status", SAMPLES.layout("water"), SAMPLES.ordinary());
        assertThat(html.indexOf("Larval 3 is short of carbonate. Water fit at 5 of 6 points."))
                .isPositive()
                .isLessThan(html.indexOf("Close the intake valve; draw from storage."));
        assertThat(html.indexOf("Close the intake valve; draw from storage."))
                .isLessThan(html.indexOf("class=\"strip\""));
        assertThat(words(html))
                .contains("Ω 1.62 ±0.11, under your 1.80 for 12 min. Measured 2 min ago.")
                .contains("C. gigas, 31 h after spawn: first shell");
    }

    @Test
    void the_part_that_is_fetched_again_is_the_part_of_the_page() {
        LayoutView layout = SAMPLES.layout("water");
        String part = page("fragments/status", layout, SAMPLES.badNight());
        assertThat(part).startsWith("<div id=\"live\" data-live=\"/fragments/status\"");
        assertThat(page("status", layout, SAMPLES.badNight())).contains(part.strip());
    }

    @Test
    void hostile_names_stay_words() {
        String hostile = "<script>alert(1)</script>\"'&<img src=x onerror=alert(1)>";
        PathPoint point = SAMPLES.fit("a/b?c#d", hostile, Place.TANK, "2.00");
        LayoutView layout = new LayoutView(
                hostile,
                "x\"&y",
                List.of(new SiteChoice("x\"&y", hostile, true), new SiteChoice("z", "z", false)),
                hostile,
                Role.MANAGER,
                "t",
                "UTC",
                SAMPLES.ago(0),
                "water",
                hostile);
        PointView inner = new PointView(
                point,
                List.of(),
                List.of(),
                List.of(hostile),
                hostile,
                hostile,
                SAMPLES.point(true).limits(),
                Form.empty(),
                null);
        List<String> pages = List.of(
                page("status", layout, new StatusView(null, List.of(point))),
                page("point", layout, inner),
                page("point", layout, dosed(inner, hostile)),
                page(
                        "record",
                        layout,
                        new RecordView(
                                hostile,
                                hostile,
                                hostile,
                                hostile,
                                hostile,
                                List.of(),
                                new Form(Map.of("lot", hostile, "key", hostile), Map.of("lot", hostile)))),
                page("calculator", layout, CalculatorSamples.ofPoint(hostile, NOW)),
                page(
                        "setup",
                        layout,
                        new SetupView(
                                SAMPLES.setup(true).sections(), new SetupView.ShownOnce("points", hostile, hostile))),
                page("sign-in", LayoutView.signedOut("t"), new SignInView(hostile, hostile, "", hostile)),
                page("error", layout, new ErrorView(404, hostile, hostile)));
        for (String html : pages) {
            assertThat(html).doesNotContain("<script>alert", "<img");
            assertThat(html).doesNotContainPattern("=\"[^\"]*\"[^\\s>/]");
        }
        assertThat(pages.get(0)).contains("href=\"/points/a%2Fb%3Fc%23d?site=x%22%26y\"");
    }

    @Test
    void viewers_are_offered_nothing_they_may_not_do() {
        LayoutView viewer = SAMPLES.layout("water", Role.VIEWER, ONE_SITE);
        for (String html : List.of(
                page("status", viewer, SAMPLES.badNight()),
                page("point", viewer, SAMPLES.point(false)),
                page("alerts", viewer, SAMPLES.alerts()))) {
            assertThat(found(html, "method=\"post\" action=\"([^\"]*)\"")).isSubsetOf("/sign-out");
            assertThat(html).doesNotContain("/setup", "/dose\"");
        }
    }

    @Test
    void a_refused_form_stands_open_with_what_was_typed_and_why_not() {
        String html = page("point", SAMPLES.layout("water"), SAMPLES.point(true));
        assertThat(html)
                .contains("value=\"a bit\"", "“a bit” is not a number; 0.05 would be.", "aria-invalid=\"true\"");
        assertThat(found(html, "<details( open)>")).hasSize(1);
        assertThat(page("point", SAMPLES.layout("water"), SAMPLES.point(false)))
                .doesNotContain("<details open>", "aria-invalid");
    }

    @Test
    void a_removed_limit_can_be_put_back_with_its_old_values() {
        assertThat(page("point", SAMPLES.layout("water"), SAMPLES.point(false)))
                .contains("action=\"/points/larval-3/limits/low%20salinity\"")
                .contains("<input type=\"hidden\" name=\"below\" value=\"25\">")
                .contains("Put back");
    }

    @Test
    void every_dose_page_says_who_decides_and_warns_of_the_wrong_bag() {
        for (Outcome outcome : Outcome.values()) {
            assertThat(page("dose", SAMPLES.layout("water"), SAMPLES.dose(outcome)))
                    .contains("A suggestion: a person confirms, a person doses.")
                    .contains("Decahydrate taken for anhydrous under-doses 2.7 times");
        }
    }

    @Test
    void every_file_a_page_asks_for_is_in_the_program() {
        List<String> files = every_page()
                .flatMap(p -> found(p.getValue(), "(?:src|href)=\"(/web(?:jars)?/[^\"]*)\"").stream())
                .distinct()
                .toList();
        assertThat(files)
                .hasSizeGreaterThan(4)
                .allSatisfy(file -> assertThat(getClass()
                                .getResource(file.replaceFirst("^/webjars", "/META-INF/resources/webjars")
                                        .replaceFirst("\\?.*", "")))
                        .isNotNull());
    }

    private static PointView dosed(PointView point, String words) {
        return new PointView(
                point.point(),
                point.state(),
                point.inputs(),
                point.cautions(),
                point.lowest(),
                point.lowestAt(),
                point.limits(),
                point.added(),
                null,
                List.of(new DoseRow(
                        words,
                        SAMPLES.ago(5),
                        words,
                        words,
                        words,
                        words,
                        true,
                        words,
                        words,
                        words,
                        true,
                        Form.of(Map.of("lot", words)))),
                words);
    }

    private static PointView unknownPoint() {
        return new PointView(
                SAMPLES.nothingKnown().path().get(0),
                List.of(),
                List.of(),
                List.of(),
                "",
                "",
                List.of(),
                Form.empty(),
                null);
    }

    private static String page(String template, LayoutView layout, Object view) {
        return PAGES.render(template, Map.of("layout", layout, "page", view));
    }

    private static String words(String html) {
        return html.replaceAll("<[^>]*>", "").replaceAll("\\s+", " ");
    }

    private static List<String> found(String html, String pattern) {
        List<String> found = new ArrayList<>();
        Matcher matcher = Pattern.compile(pattern).matcher(html);
        while (matcher.find()) {
            found.add(matcher.group(1));
        }
        return found;
    }
}
