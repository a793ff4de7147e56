package org.hingeline.browser;

import static org.assertj.core.api.Assertions.assertThat;

import com.sun.net.httpserver.HttpServer;
import java.io.IOException;
import java.net.InetAddress;
import java.net.InetSocketAddress;
import java.net.URI;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.By;

class BrowserTest {
    private static final String PAGE = """
            <!doctype html><html lang="en"><head><meta name="viewport" content="width=device-width">
            <title>Intake</title></head><body><p id="water">as it came</p>
            <button onclick="document.getElementById('water').textContent = 'drawn from storage'">Draw</button>
            </body></html>
            """;

    @TempDir
    Path folder;

    private HttpServer server;

    @BeforeEach
    void serve() throws IOException {
        server = HttpServer.create(new InetSocketAddress(InetAddress.getLoopbackAddress(), 0), 0);
        server.createContext("/", exchange -> {
            byte[] body = PAGE.getBytes(StandardCharsets.UTF_8);
            exchange.getResponseHeaders().add("Content-Type", "text/html; charset=utf-8");
            exchange.sendResponseHeaders(200, body.length);
            exchange.getResponseBody().write(body);
            exchange.close();
        });
        server.start();
    }

    @AfterEach
    void stop() {
        server.stop(0);
    }

    @Test
    void a_phone_shows_a_page_in_its_own_size_and_photographs_it() throws IOException {
        Path picture = folder.resolve("screens/phone.png");
        try (Browser phone = Browser.phone()) {
            phone.go(address());
            phone.screenshot(picture);

            assertThat(phone.driver().getTitle()).isEqualTo("Intake");
            assertThat(phone.ask("innerWidth + 'x' + innerHeight")).isEqualTo("390x844");
        }
        var image = ImageIO.read(picture.toFile());
        assertThat(image.getWidth() + "x" + image.getHeight()).isEqualTo("390x844");
    }

    @Test
    void a_desktop_follows_a_click() {
        try (Browser desktop = Browser.desktop()) {
            desktop.go(address());
            desktop.driver().findElement(By.tagName("button")).click();

            assertThat(desktop.driver().findElement(By.id("water")).getText()).isEqualTo("drawn from storage");
            assertThat(desktop.ask("innerWidth + 'x' + innerHeight")).isEqualTo("1280x900");
        }
    }

    @Test
    void each_browser_starts_with_a_profile_of_its_own() {
        try (Browser first = Browser.desktop()) {
            first.go(address());
            first.ask("localStorage.setItem('seen', 'yes')");
            assertThat(first.ask("localStorage.getItem('seen')")).isEqualTo("yes");
        }
        try (Browser second = Browser.desktop()) {
            second.go(address());
            assertThat(second.ask("localStorage.getItem('seen')")).isEqualTo("null");
        }
    }

    private URI address() {
        return URI.create("http://127.0.0.1:%d/".formatted(server.getAddress().getPort()));
    }
}
