package org.hingeline.browser;

import java.net.URI;
import java.time.Duration;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.function.BooleanSupplier;
import java.util.function.Supplier;
import java.util.stream.Collectors;
import org.hingeline.RunningService;
import org.openqa.selenium.By;
import org.openqa.selenium.WebDriver;
import org.openqa.selenium.WebDriverException;
import org.openqa.selenium.WebElement;
import org.openqa.selenium.logging.LogType;
import org.openqa.selenium.support.ui.WebDriverWait;

/** Somebody in front of the service's pages: opens them, reads, types, presses, and waits for what should come. */
final class Guest {
    private static final Duration PATIENCE = Duration.ofSeconds(15);

    private final Browser browser;
    private final WebDriver driver;
    private final URI address;

    Guest(Browser browser, RunningService service) {
        this.browser = browser;
        this.driver = browser.driver();
        this.address = service.address();
    }

    /** Signed out, on the sign-in page, with an empty console. */
    Guest arrive() {
        driver.manage().deleteAllCookies();
        open("/sign-in");
        console();
        return this;
    }

    Guest signIn(String name, String password) {
        type("name", name);
        type("password", password);
        press("Sign in");
        return this;
    }

    /** A person of the test's place, signed in and on the first page. */
    Guest comeIn(String name) {
        arrive().signIn(name, RunningService.PASSWORD);
        until("the first page", () -> !path().startsWith("/sign-in"));
        return this;
    }

    Guest open(String path) {
        browser.go(address.resolve(path));
        return this;
    }

    String path() {
        URI at = URI.create(driver.getCurrentUrl());
        return at.getPath() + (at.getQuery() == null ? "" : "?" + at.getQuery());
    }

    /** All that can be read on the page, in one line. */
    String text() {
        return text("body");
    }

    String text(String css) {
        return steadily(() -> element(css).getText()).replaceAll("\\s+", " ");
    }

    /** A live page may replace a part just while it is looked at; then it is looked at again. */
    private static <T> T steadily(Supplier<T> look) {
        for (int more = 5; ; more--) {
            try {
                return look.get();
            } catch (WebDriverException e) {
                if (more == 0) {
                    throw e;
                }
            }
        }
    }

    String html() {
        return driver.getPageSource();
    }

    WebElement element(String css) {
        return driver.findElement(By.cssSelector(css));
    }

    boolean has(String css) {
        return !driver.findElements(By.cssSelector(css)).isEmpty();
    }

    /** Types into the field of the form that is open, in place of what stood there. */
    Guest type(String field, String text) {
        WebElement input = visible("[name='" + field + "']:not([type=hidden])");
        input.clear();
        input.sendKeys(text);
        return this;
    }

    String value(String field) {
        return String.valueOf(
                visible("[name='" + field + "']:not([type=hidden])").getDomProperty("value"));
    }

    /** Presses the visible button, link or summary that begins with these words. */
    Guest press(String words) {
        return pressIn("body", words);
    }

    Guest pressIn(String css, String words) {
        steadily(() -> {
            element(css).findElements(By.cssSelector("button, a, summary")).stream()
                    .filter(WebElement::isDisplayed)
                    .filter(e -> e.getText().strip().startsWith(words))
                    .findFirst()
                    .orElseThrow(() -> new AssertionError("nothing to press called " + words + " in: " + text(css)))
                    .click();
            return true;
        });
        return this;
    }

    private WebElement visible(String css) {
        return driver.findElements(By.cssSelector(css)).stream()
                .filter(WebElement::isDisplayed)
                .findFirst()
                .orElseThrow(() -> new AssertionError("no visible " + css + " on: " + text()));
    }

    Guest waitFor(String words) {
        return waitFor("body", words);
    }

    /** Waits for words in a part of the page that may be replaced meanwhile. */
    Guest waitFor(String css, String words) {
        return until(words, () -> text(css).contains(words));
    }

    Guest until(String what, BooleanSupplier comes) {
        new WebDriverWait(driver, PATIENCE)
                .ignoring(WebDriverException.class)
                .withMessage(() -> what + " did not come; the page says: " + text())
                .until(d -> comes.getAsBoolean());
        return this;
    }

    String ask(String script) {
        return browser.ask(script);
    }

    WebElement focused() {
        return driver.switchTo().activeElement();
    }

    /** What the browser complained of since the last call, blocked content and failed scripts among it. */
    List<String> console() {
        return driver.manage().logs().get(LogType.BROWSER).getAll().stream()
                .map(entry -> entry.getLevel() + " " + entry.getMessage())
                .toList();
    }

    /** Posts a form as some other page or program might, with this guest's cookies; answers the status. */
    long postWithoutOurForm(String path, Map<String, String> fields) {
        String body = fields.entrySet().stream()
                .map(field -> "'%s':'%s'".formatted(field.getKey(), field.getValue()))
                .collect(Collectors.joining(","));
        return Long.parseLong(ask(String.format(
                Locale.ROOT,
                "fetch('%s', {method: 'POST', redirect: 'manual', body: new URLSearchParams({%s})})"
                        + ".then(a => a.status)",
                path,
                body)));
    }
}
