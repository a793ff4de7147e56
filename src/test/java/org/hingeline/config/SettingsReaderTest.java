package org.hingeline.config;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Pattern;
import org.hingeline.measure.Quantity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.dataformat.yaml.YAMLMapper;

class SettingsReaderTest {
    private static final Path SHIPPED = Path.of("config/hingeline.yaml");

    @TempDir
    Path folder;

    @Test
    void the_shipped_file_equals_the_defaults() {
        assertThat(SettingsReader.read(SHIPPED)).isEqualTo(Settings.defaults());
    }

    @Test
    void the_shipped_file_shows_every_setting_with_a_comment_before_it() throws Exception {
        List<String> lines = Files.readAllLines(SHIPPED);
        for (int i = 1; i < lines.size(); i++) {
            if (Pattern.matches("  [a-zA-Z]+:.*", lines.get(i))) {
                assertThat(lines.get(i - 1))
                        .as("line before \"" + lines.get(i) + "\"")
                        .startsWith("  #");
            }
        }
        // whatever the reader knows must be in the file: a stray key makes it list what it knows
        JsonNode shipped = YAMLMapper.builder().build().readTree(Files.readString(SHIPPED));
        List<String> sections = new ArrayList<>(shipped.propertyNames());
        sections.remove("dataFolder");
        assertThat(sections).hasSize(10);
        for (String section : sections) {
            String known = String.join(", ", shipped.get(section).propertyNames());
            assertThat(problems(section + ":\n  stray: 1"))
                    .containsExactly(section + ".stray: no such setting; known here: " + known);
        }
    }

    @Test
    void an_empty_file_means_the_defaults() {
        assertThat(SettingsReader.readText("x", "")).isEqualTo(Settings.defaults());
        assertThat(SettingsReader.readText("x", "# nothing\n")).isEqualTo(Settings.defaults());
        assertThat(SettingsReader.readText("x", "server:\nmail:\n")).isEqualTo(Settings.defaults());
    }

    @Test
    void what_is_set_is_taken_and_the_rest_stays() {
        Settings settings = SettingsReader.readText("x", """
                dataFolder: /var/lib/hingeline
                server: {port: 9000, publicUrl: "https://water.example.org/"}
                mail: {mode: smtp, host: mail.example.org, startTls: required, user: w, passwordFile: /etc/p}
                delivery: {retryPausesSeconds: [1, 2]}
                ageLimitsMin: {ph: 20}
                dosing: {phTotalMax: 8, phPerHourMax: 0.2}
                """);

        assertThat(settings.server().publicUrl()).isEqualTo("https://water.example.org");
        assertThat(settings.server().cookiesOverTlsOnly()).isTrue();
        assertThat(settings.server().host()).isEqualTo("127.0.0.1");
        assertThat(settings.mail().host()).isEqualTo("mail.example.org");
        assertThat(settings.mail().passwordFile()).isEqualTo(Path.of("/etc/p"));
        assertThat(settings.delivery().retryPauses()).containsExactly(Duration.ofSeconds(1), Duration.ofSeconds(2));
        assertThat(settings.delivery().giveUpAfter()).isEqualTo(Duration.ofHours(72));
        assertThat(settings.ageLimits().byQuantity())
                .containsEntry(Quantity.PH, Duration.ofMinutes(20))
                .containsEntry(Quantity.TOTAL_ALKALINITY, Duration.ofDays(3))
                .hasSize(4);
        assertThat(settings.dosing().phTotalMax()).isEqualTo(8.0);
        assertThat(settings.dosing().phPerHourMax()).isEqualTo(0.2);
        assertThat(settings.databaseFolder()).isEqualTo(Path.of("/var/lib/hingeline/db"));
        assertThat(settings.mailFolder()).isEqualTo(Path.of("/var/lib/hingeline/mail"));
    }

    @Test
    void off_means_off_and_not_false() {
        assertThat(SettingsReader.readText("x", "mail: {startTls: off}").mail().startTls())
                .isEqualTo(Settings.StartTls.OFF);
    }

    @Test
    void port_and_data_can_be_moved_together() {
        Settings moved = Settings.defaults().withPortAndData(9123, Path.of("/tmp/x"));

        assertThat(moved.server().publicUrl()).isEqualTo("http://127.0.0.1:9123");
        assertThat(moved.databaseFolder()).isEqualTo(Path.of("/tmp/x/db"));
        assertThat(moved.backupsFolder()).isEqualTo(Path.of("/tmp/x/backups"));
        assertThat(moved.mail()).isEqualTo(Settings.defaults().mail());
    }

    @Test
    void links_name_a_host_that_can_be_opened() {
        assertThat(SettingsReader.readText("x", "server: {host: 0.0.0.0}")
                        .server()
                        .publicUrl())
                .isEqualTo("http://localhost:8080");
        assertThat(SettingsReader.readText("x", "server: {host: '::1'}")
                        .server()
                        .publicUrl())
                .isEqualTo("http://[::1]:8080");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "server: {port: 65536}|server.port: 65536 is not accepted; give a whole number from 0 to 65535",
                "server: {port: -1}|server.port: -1 is not accepted; give a whole number from 0 to 65535",
                "server: {port: '8080'}|server.port: \"8080\" is not accepted; give a whole number from 0 to 65535",
                "server: {port: 80.5}|server.port: 80.5 is not accepted; give a whole number from 0 to 65535",
                "server: {port: true}|server.port: true is not accepted; give a whole number from 0 to 65535",
                "server: {port: [1]}|server.port: [1] is not accepted; give a whole number from 0 to 65535",
                "server: {port: 99999999999}|server.port: 99999999999 is not accepted; give a whole number from 0 to 65535",
                "server: {host: 5}|server.host: 5 is not accepted; give a text of 1 to 500 characters on one line",
                "server: {host: ' '}|server.host: \" \" is not accepted; give a text of 1 to 500 characters on one line",
                "server: {publicUrl: water.example.org}|server.publicUrl: \"water.example.org\" is not accepted; give an address such as https://water.example.org",
                "server: {publicUrl: 'ftp://x.org'}|server.publicUrl: \"ftp://x.org\" is not accepted; give an address such as https://water.example.org",
                "server: {publicUrl: 'http://me:pw@x.org'}|server.publicUrl: \"http://…@x.org\" is not accepted; give an address such as https://water.example.org",
                "server: {maxBodyBytes: 10}|server.maxBodyBytes: 10 is not accepted; give a whole number from 1024 to 268435456",
                "server: {secureCookies: maybe}|server.secureCookies: \"maybe\" is not accepted; give auto or always or never",
                "server: {secureCookies: AUTO}|server.secureCookies: \"AUTO\" is not accepted; give auto or always or never",
                "server: 8080|server: 8080 is not accepted; give settings, one \"key: value\" a line",
                "database: {kind: mysql}|database.kind: \"mysql\" is not accepted; give embedded or postgresql",
                "database: {kind: postgresql}|database.url: is missing; kind postgresql needs one such as jdbc:postgresql://db.example.org/hingeline",
                "database: {kind: postgresql, url: 'jdbc:h2:x'}|database.url: \"jdbc:h2:x\" is not accepted; give one such as jdbc:postgresql://db.example.org/hingeline",
                "backups: {everyHours: 0}|backups.everyHours: 0 is not accepted; give a whole number from 1 to 168",
                "backups: {keep: 0}|backups.keep: 0 is not accepted; give a whole number from 1 to 1000",
                "mail: {mode: pigeon}|mail.mode: \"pigeon\" is not accepted; give smtp or folder",
                "mail: {mode: smtp}|mail.host: is missing; mode smtp needs the mail server's name, such as mail.example.org",
                "mail: {startTls: false}|mail.startTls: false is not accepted; give required or off",
                "mail: {user: w}|mail.passwordFile: is missing; user and passwordFile are given together, or neither",
                "mail: {passwordFile: w}|mail.user: is missing; user and passwordFile are given together, or neither",
                "mail: {host: m.org, startTls: off, user: w, passwordFile: p}|mail.startTls: \"off\" is not accepted with user and host \"m.org\": the password would cross the network in the clear; give required",
                "mail: {from: hatchery}|mail.from: \"hatchery\" is not accepted; give an e-mail address such as water@example.org",
                "mail: {timeoutSeconds: 0}|mail.timeoutSeconds: 0 is not accepted; give a whole number from 1 to 300",
                "delivery: {retryPausesSeconds: []}|delivery.retryPausesSeconds: [] is not accepted; give a list of one or more whole numbers",
                "delivery: {retryPausesSeconds: [10, x]}|delivery.retryPausesSeconds[1]: \"x\" is not accepted; give a whole number from 1 to 86400",
                "delivery: {giveUpAfterHours: 0}|delivery.giveUpAfterHours: 0 is not accepted; give a whole number from 1 to 720",
                "delivery: {perRunMost: 0}|delivery.perRunMost: 0 is not accepted; give a whole number from 1 to 1000",
                "ageLimitsMin: {ph: 0}|ageLimitsMin.ph: 0 is not accepted; give a whole number from 1 to 43200",
                "ageLimitsMin: {dic: 5}|ageLimitsMin.dic: no such setting; known here: ph, temperature, salinity, totalAlkalinity",
                "intake: {futureToleranceSeconds: -1}|intake.futureToleranceSeconds: -1 is not accepted; give a whole number from 0 to 3600",
                "intake: {rowsPerTransaction: 9999}|intake.rowsPerTransaction: 9999 is not accepted; give a whole number from 1 to 5000",
                "water: {constants: best}|water.constants: \"best\" is not accepted; give lueker2000 or millero2006 or waters2014",
                "dosing: {phTotalMax: 9.5}|dosing.phTotalMax: 9.5 is not accepted; give a number from 7.5 to 9",
                "dosing: {phTotalMax: .nan}|dosing.phTotalMax: \"NaN\" is not accepted; give a number from 7.5 to 9",
                "dosing: {maxGramsPerTankAndDay: -1}|dosing.maxGramsPerTankAndDay: -1 is not accepted; give a number from 0 to 1000000",
                "dosing: {secondPersonAboveG: off}|dosing.secondPersonAboveG: \"off\" is not accepted; give a number from 0 to 1000000",
                "dosing: {phPerHourMax: 0}|dosing.phPerHourMax: 0 is not accepted; give a number from 0.01 to 1",
                "accounts: {minPasswordLength: 4}|accounts.minPasswordLength: 4 is not accepted; give a whole number from 8 to 100",
                "accounts: {lockAfterFailures: 1}|accounts.lockAfterFailures: 1 is not accepted; give a whole number from 2 to 100",
                "dataFolder: 7|dataFolder: 7 is not accepted; give a text of 1 to 500 characters on one line",
                "sever: {port: 1}|sever: no such setting; known here: dataFolder, server, database, backups, mail, delivery, ageLimitsMin, water, intake, dosing, accounts",
                "just words|the file: \"just words\" is not accepted; give settings, one \"key: value\" a line",
            })
    void a_bad_value_is_named_with_what_would_be_accepted(String yaml, String problem) {
        assertThat(problems(yaml)).containsExactly(problem);
    }

    @Test
    void every_problem_is_told_at_once() {
        String yaml = """
                server: {port: 70000, colour: blue}
                mail: {mode: smtp, from: nobody}
                dosing: {omegaAragoniteMax: "4"}
                extra: 1
                """;

        BadSettings bad = catchThrowableOfType(BadSettings.class, () -> SettingsReader.readText("hatchery.yaml", yaml));

        assertThat(bad.problems()).hasSize(6);
        assertThat(bad)
                .hasMessageStartingWith("hatchery.yaml cannot be used:\n  server.port: 70000")
                .hasMessageContaining("server.colour: no such setting")
                .hasMessageContaining("mail.host: is missing")
                .hasMessageContaining("mail.from: \"nobody\"")
                .hasMessageContaining("dosing.omegaAragoniteMax: \"4\" is not accepted; give a number from 1 to 7")
                .hasMessageContaining("extra: no such setting");
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "mail: {password: hunter2hunter2}",
                "database: {kind: postgresql, url: 'jdbc:postgresql://db/x?user=a&password=hunter2hunter2'}",
                "database: {kind: postgresql, url: 'jdbc:postgresql://a:hunter2hunter2@db/x'}",
                "mail: {user: hunter2hunter2, user: hunter2hunter2}",
                "mail: {user: 'hunter2hunter2",
            })
    void a_secret_put_in_the_wrong_place_is_refused_and_not_repeated(String yaml) {
        assertThat(problems(yaml)).hasSize(1).noneMatch(problem -> problem.contains("hunter2"));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "server: {port: 1",
                "server:\n\tport: 1",
                "server: {port: 1}\nserver: {port: 2}",
                "a: 1\n---\nb: 2"
            })
    void what_is_no_yaml_is_told_with_its_line(String yaml) {
        assertThat(problems(yaml))
                .singleElement()
                .asString()
                .startsWith("this is not YAML: ")
                .containsPattern("\\(line \\d+\\)$");
    }

    @Test
    void a_missing_file_is_told_by_name() {
        Path missing = folder.resolve("none.yaml");

        assertThatThrownBy(() -> SettingsReader.read(missing))
                .isInstanceOf(BadSettings.class)
                .hasMessage(missing
                        + " cannot be used:\n  the file cannot be read (NoSuchFileException); it must exist and be UTF-8"
                        + " text");
    }

    @Test
    void a_password_file_gives_its_one_line() throws Exception {
        Path file = Files.writeString(folder.resolve("p"), "correct horse\n");
        assertThat(PasswordFile.read(file)).isEqualTo("correct horse");

        Files.writeString(file, "two\nlines\n");
        assertThatThrownBy(() -> PasswordFile.read(file))
                .hasMessage("password file " + file + " must hold one line, the password")
                .hasMessageNotContaining("two");
        Files.writeString(file, "\n");
        assertThatThrownBy(() -> PasswordFile.read(file)).hasMessageContaining("must hold one line");
        assertThatThrownBy(() -> PasswordFile.read(folder.resolve("gone"))).hasMessageContaining("gone cannot be read");
    }

    private static List<String> problems(String yaml) {
        return catchThrowableOfType(BadSettings.class, () -> SettingsReader.readText("x", yaml))
                .problems();
    }
}
