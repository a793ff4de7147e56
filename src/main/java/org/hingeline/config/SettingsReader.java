package org.hingeline.config;

import java.net.URI;
import java.net.URISyntaxException;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.regex.Pattern;
import org.hingeline.config.Settings.DatabaseKind;
import org.hingeline.config.Settings.MailMode;
import org.hingeline.config.Settings.SecureCookies;
import org.hingeline.config.Settings.StartTls;
import org.hingeline.seawater.BoronRatio;
import org.hingeline.seawater.CarbonicAcidFit;
import org.jspecify.annotations.Nullable;

/** Reads settings strictly: an unknown key, a wrong type or a value out of range is an error, and all are told at once. */
public final class SettingsReader {
    private static final Pattern ADDRESS = Pattern.compile("[^\\s@<>,;\"()]+@[^\\s@<>,;\"()]+");
    private static final Pattern SECRET_IN_URL =
            Pattern.compile("(?i).*([?&](password|sslpassword)=|//[^/@]*:[^/@]*@).*");

    private SettingsReader() {}

    /** @throws BadSettings naming every problem, also when there is no such file or it is no YAML */
    public static Settings read(Path file) {
        return readText(file.toString(), YamlFile.text(file));
    }

    static Settings readText(String source, String yaml) {
        List<String> problems = new ArrayList<>();
        Section root = Section.root(YamlFile.parse(source, yaml), problems);
        Settings settings = new Settings(
                path(root, "dataFolder", "data"),
                server(root.section("server")),
                database(root.section("database")),
                backups(root.section("backups")),
                mail(root.section("mail")),
                delivery(root.section("delivery")),
                ageLimits(root.section("ageLimitsMin")),
                water(root.section("water")),
                intake(root.section("intake")),
                dosing(root.section("dosing")),
                accounts(root.section("accounts")));
        root.refuseOthers();
        if (!problems.isEmpty()) {
            throw new BadSettings(source, problems);
        }
        return settings;
    }

    private static Settings.Server server(Section in) {
        String host = in.text("host", "127.0.0.1");
        int port = in.whole("port", 8080, 0, 65535);
        String publicUrl = in.text("publicUrl");
        if (publicUrl != null && !isWebAddress(publicUrl)) {
            in.problem(
                    "publicUrl",
                    "\"" + publicUrl.replaceAll("//[^/@]*@", "//…@")
                            + "\" is not accepted; give an address such as https://water.example.org");
        }
        int maxBodyBytes = in.whole("maxBodyBytes", 16 * 1024 * 1024, 1024, 256 * 1024 * 1024);
        SecureCookies secureCookies = in.choice("secureCookies", SecureCookies.AUTO);
        in.refuseOthers();
        return new Settings.Server(
                host, port, publicUrl == null ? null : publicUrl.replaceAll("/+$", ""), maxBodyBytes, secureCookies);
    }

    private static Settings.Database database(Section in) {
        DatabaseKind kind = in.choice("kind", DatabaseKind.EMBEDDED);
        Path folder = path(in, "folder", "db");
        String url = in.text("url");
        if (kind == DatabaseKind.POSTGRESQL && url == null) {
            in.problem(
                    "url", "is missing; kind postgresql needs one such as jdbc:postgresql://db.example.org/hingeline");
        } else if (url != null && SECRET_IN_URL.matcher(url).matches()) {
            in.problem("url", "must not hold a password; put it in a file of its own and name that as passwordFile");
        } else if (url != null && !url.startsWith("jdbc:postgresql:")) {
            in.problem(
                    "url",
                    "\"" + url + "\" is not accepted; give one such as jdbc:postgresql://db.example.org/hingeline");
        }
        String user = in.text("user");
        Path passwordFile = path(in, "passwordFile");
        in.refuseOthers();
        return new Settings.Database(kind, folder, url, user, passwordFile);
    }

    private static Settings.Backups backups(Section in) {
        Duration every = Duration.ofHours(in.whole("everyHours", 6, 1, 168));
        int keep = in.whole("keep", 8, 1, 1000);
        Path folder = path(in, "folder", "backups");
        in.refuseOthers();
        return new Settings.Backups(every, keep, folder);
    }

    private static Settings.Mail mail(Section in) {
        MailMode mode = in.choice("mode", MailMode.FOLDER);
        String host = in.text("host");
        if (mode == MailMode.SMTP && host == null) {
            in.problem("host", "is missing; mode smtp needs the mail server's name, such as mail.example.org");
        }
        int port = in.whole("port", 587, 1, 65535);
        StartTls startTls = in.choice("startTls", StartTls.REQUIRED);
        String user = in.text("user");
        Path passwordFile = path(in, "passwordFile");
        if ((user == null) != (passwordFile == null)) {
            in.problem(
                    user == null ? "user" : "passwordFile",
                    "is missing; user and passwordFile are given together, or neither");
        }
        if (startTls == StartTls.OFF && user != null && host != null && !isThisMachine(host)) {
            in.problem(
                    "startTls",
                    "\"off\" is not accepted with user and host \"" + host
                            + "\": the password would cross the network in the clear; give required");
        }
        String from = in.text("from", "hingeline@localhost");
        if (!ADDRESS.matcher(from).matches() || from.length() > 254) {
            in.problem("from", "\"" + from + "\" is not accepted; give an e-mail address such as water@example.org");
        }
        String fromName = in.text("fromName", "Hingeline");
        Duration timeout = Duration.ofSeconds(in.whole("timeoutSeconds", 20, 1, 300));
        Path folder = path(in, "folder", "mail");
        in.refuseOthers();
        return new Settings.Mail(mode, host, port, startTls, user, passwordFile, from, fromName, timeout, folder);
    }

    private static Settings.Delivery delivery(Section in) {
        List<Duration> pauses =
                in.wholes("retryPausesSeconds", List.of(10, 30, 120, 600, 1800, 3600), 1, 86_400).stream()
                        .map(Duration::ofSeconds)
                        .toList();
        Duration giveUpAfter = Duration.ofHours(in.whole("giveUpAfterHours", 72, 1, 720));
        int perRunMost = in.whole("perRunMost", 50, 1, 1000);
        in.refuseOthers();
        return new Settings.Delivery(pauses, giveUpAfter, perRunMost);
    }

    private static Settings.AgeLimits ageLimits(Section in) {
        Duration ph = minutes(in, "ph", 15);
        Duration temperature = minutes(in, "temperature", 60);
        Duration salinity = minutes(in, "salinity", 360);
        Duration totalAlkalinity = minutes(in, "totalAlkalinity", 4320);
        in.refuseOthers();
        return new Settings.AgeLimits(ph, temperature, salinity, totalAlkalinity);
    }

    private static Settings.Water water(Section in) {
        CarbonicAcidFit constants =
                in.named("constants", CarbonicAcidFit.LUEKER_2000, CarbonicAcidFit.values(), CarbonicAcidFit::wireName);
        BoronRatio boron = in.named("boron", BoronRatio.LEE_2010, BoronRatio.values(), BoronRatio::wireName);
        in.refuseOthers();
        return new Settings.Water(constants, boron);
    }

    private static Settings.Intake intake(Section in) {
        Duration futureTolerance = Duration.ofSeconds(in.whole("futureToleranceSeconds", 120, 0, 3600));
        int maxRowsPerPost = in.whole("maxRowsPerPost", 10_000, 1, 100_000);
        // larger transactions are where the embedded database was seen to suffer from a kill
        int rowsPerTransaction = in.whole("rowsPerTransaction", 1000, 1, 5000);
        in.refuseOthers();
        return new Settings.Intake(futureTolerance, maxRowsPerPost, rowsPerTransaction);
    }

    private static Settings.Dosing dosing(Section in) {
        double phTotalMax = in.number("phTotalMax", 8.4, 7.5, 9);
        double omegaAragoniteMax = in.number("omegaAragoniteMax", 4.5, 1, 7);
        double phPerHourMax = in.number("phPerHourMax", 0.15, 0.01, 1);
        double aerateToUatm = in.number("aerateToUatm", 420, 100, 2000);
        double stockGramsPerLitre = in.number("stockGramsPerLitre", 50, 1, 200);
        double maxGramsPerTankAndDay = in.number("maxGramsPerTankAndDay", 2000, 0, 1_000_000);
        double secondPersonAboveG = in.number("secondPersonAboveG", 500, 0, 1_000_000);
        Duration mixing = Duration.ofMinutes(in.whole("mixingMin", 30, 1, 1440));
        in.refuseOthers();
        return new Settings.Dosing(
                phTotalMax,
                omegaAragoniteMax,
                phPerHourMax,
                aerateToUatm,
                stockGramsPerLitre,
                maxGramsPerTankAndDay,
                secondPersonAboveG,
                mixing);
    }

    private static Settings.Accounts accounts(Section in) {
        Duration session = Duration.ofHours(in.whole("sessionHours", 12, 1, 720));
        int lockAfterFailures = in.whole("lockAfterFailures", 5, 2, 100);
        Duration lock = Duration.ofMinutes(in.whole("lockMinutes", 15, 1, 1440));
        int minPasswordLength = in.whole("minPasswordLength", 10, 8, 100);
        in.refuseOthers();
        return new Settings.Accounts(session, lockAfterFailures, lock, minPasswordLength);
    }

    private static Duration minutes(Section in, String key, int standard) {
        return Duration.ofMinutes(in.whole(key, standard, 1, 43_200));
    }

    private static Path path(Section in, String key, String standard) {
        Path given = path(in, key);
        return given == null ? Path.of(standard) : given;
    }

    private static @Nullable Path path(Section in, String key) {
        String given = in.text(key);
        try {
            return given == null ? null : Path.of(given);
        } catch (InvalidPathException notOne) {
            in.problem(key, "\"" + given + "\" is not accepted; give the path of a file or folder");
            return null;
        }
    }

    private static boolean isWebAddress(String text) {
        try {
            URI uri = new URI(text);
            String scheme = uri.getScheme() == null ? "" : uri.getScheme().toLowerCase(Locale.ROOT);
            return (scheme.equals("http") || scheme.equals("https"))
                    && uri.getHost() != null
                    && uri.getUserInfo() == null
                    && uri.getQuery() == null
                    && uri.getFragment() == null;
        } catch (URISyntaxException notOne) {
            return false;
        }
    }

    private static boolean isThisMachine(String host) {
        return host.equals("localhost") || host.equals("::1") || host.startsWith("127.");
    }
}
