package org.hingeline.browser;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.URI;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import org.openqa.selenium.OutputType;
import org.openqa.selenium.WebDriver;
import org.openqa.selenium.chrome.ChromeDriver;
import org.openqa.selenium.chrome.ChromeDriverService;
import org.openqa.selenium.chrome.ChromeOptions;

/**
 * A headless Chromium with a profile of its own, in the size of a phone or of a desk.
 *
 * <p>Browser and driver are those installed on the machine (Debian's {@code chromium} and {@code chromium-driver}, or
 * what HINGELINE_CHROMIUM and HINGELINE_CHROMEDRIVER name); nothing is ever downloaded. Where one is missing, opening
 * fails.
 */
public final class Browser implements AutoCloseable {
    private final ChromeDriver driver;
    private final Path profile;

    private Browser(ChromeDriver driver, Path profile) {
        this.driver = driver;
        this.profile = profile;
    }

    /** Opens a window of 390 x 844 CSS pixels, touch and mobile layout included. */
    public static Browser phone() {
        return open(390, 844, true);
    }

    /** Opens a window of 1280 x 900 CSS pixels. */
    public static Browser desktop() {
        return open(1280, 900, false);
    }

    private static Browser open(int widthPx, int heightPx, boolean mobile) {
        Path chromium = executable("HINGELINE_CHROMIUM", "/usr/bin/chromium");
        Path chromedriver = executable("HINGELINE_CHROMEDRIVER", "/usr/bin/chromedriver");
        Path profile = freshDirectory();
        var options = new ChromeOptions();
        options.setBinary(chromium.toFile());
        options.addArguments(
                "--headless",
                "--no-sandbox",
                "--disable-gpu",
                "--disable-quic",
                "--disable-dev-shm-usage",
                "--no-first-run",
                "--disable-background-networking",
                "--disable-component-update",
                "--disable-sync",
                "--hide-scrollbars",
                "--force-prefers-reduced-motion", // a page that still scrolls is clicked beside the mark
                "--user-data-dir=" + profile);
        var service = new ChromeDriverService.Builder()
                .usingDriverExecutable(chromedriver.toFile())
                .usingAnyFreePort()
                .withSilent(true)
                .build();
        ChromeDriver driver;
        try {
            driver = new ChromeDriver(service, options);
        } catch (RuntimeException e) {
            service.stop();
            delete(profile);
            throw e;
        }
        var browser = new Browser(driver, profile);
        try {
            browser.resize(widthPx, heightPx, mobile);
            driver.manage().timeouts().pageLoadTimeout(Duration.ofSeconds(30));
        } catch (RuntimeException e) {
            browser.close();
            throw e;
        }
        return browser;
    }

    /** Loads an address and waits for the page's load event. */
    public Browser go(URI address) {
        driver.get(address.toString());
        return this;
    }

    /** The driver itself: finding elements, typing, cookies. */
    public WebDriver driver() {
        return driver;
    }

    /** Runs a script in the page and answers what it returns as text. */
    public String ask(String script) {
        return String.valueOf(driver.executeScript("return (" + script + ")"));
    }

    /** Saves what the window shows as PNG, making the folders above it. */
    public void screenshot(Path file) {
        write(file, driver.getScreenshotAs(OutputType.BYTES));
    }

    /** Ends the browser and removes its profile. */
    @Override
    public void close() {
        try {
            driver.quit();
        } finally {
            delete(profile);
        }
    }

    // the window's own size would include a frame; this is the size that the page sees
    private void resize(int widthPx, int heightPx, boolean mobile) {
        driver.executeCdpCommand(
                "Emulation.setDeviceMetricsOverride",
                Map.of("width", widthPx, "height", heightPx, "deviceScaleFactor", 1, "mobile", mobile));
        if (mobile) {
            driver.executeCdpCommand("Emulation.setTouchEmulationEnabled", Map.of("enabled", true));
        }
    }

    private static Path executable(String variable, String usual) {
        String named = System.getenv(variable);
        Path path = Path.of(named == null || named.isBlank() ? usual : named);
        if (!Files.isExecutable(path)) {
            throw new IllegalStateException(
                    "no browser for the tests: %s is missing (ops/prepare-tests installs it)".formatted(path));
        }
        return path;
    }

    private static Path freshDirectory() {
        try {
            return Files.createTempDirectory("hingeline-browser");
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static void write(Path file, byte[] content) {
        try {
            Files.createDirectories(file.toAbsolutePath().getParent());
            Files.write(file, content);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static void delete(Path directory) {
        List<Path> deepestFirst;
        try (var all = Files.walk(directory)) {
            deepestFirst = all.sorted(Comparator.reverseOrder()).toList();
            for (Path path : deepestFirst) {
                Files.deleteIfExists(path);
            }
        } catch (IOException | UncheckedIOException e) {
            // the browser's last helper processes may still write; what stays behind is in the temporary folder
            System.err.println("left behind: " + directory);
        }
    }
}
