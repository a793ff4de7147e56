package org.hingeline;

import java.io.IOException;
import java.io.InputStream;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.security.SecureRandom;
import java.util.Properties;
import org.hingeline.config.PlaceFileReader;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Role;
import org.hingeline.monitor.Secrets;

/**
 * How to get into the demonstration: made at its first start and kept beside its data, readable by the owner alone, so that
 * later starts print the same. A real installation keeps no secret in clear.
 */
record DemoAccess(String password, String gatewayKey, String accessToken) {
    static final String NAME = "keeper";
    private static final String PLACE = "/demo/hatchery.yaml";

    /** Reads the file, or sets the place up and writes it. */
    static DemoAccess of(Service service, Path file) {
        try {
            return Files.exists(file) ? read(file) : make(service, file);
        } catch (IOException e) {
            throw new UncheckedIOException(file + " cannot be used", e);
        }
    }

    private static DemoAccess read(Path file) throws IOException {
        Properties properties = new Properties();
        try (Reader reader = Files.newBufferedReader(file)) {
            properties.load(reader);
        }
        return new DemoAccess(
                properties.getProperty("password", ""),
                properties.getProperty("gatewayKey", ""),
                properties.getProperty("accessToken", ""));
    }

    private static DemoAccess make(Service service, Path file) throws IOException {
        Site site = service.place().apply(PlaceFileReader.readText("the demonstration's place", place()), "demo");
        String password = new Secrets(new SecureRandom()).make("").substring(0, 16);
        service.accounts().savePerson(site, NAME, "Night keeper", password, Role.MANAGER, "demo");
        DemoAccess access = new DemoAccess(
                password,
                service.accounts().makeGatewayKey(site, "pump pier", "demo"),
                service.accounts().makeAccessToken(site, "demo", Role.OPERATOR, "demo"));
        Properties properties = new Properties();
        properties.setProperty("password", access.password());
        properties.setProperty("gatewayKey", access.gatewayKey());
        properties.setProperty("accessToken", access.accessToken());
        Path part = file.resolveSibling(file.getFileName() + ".part");
        Files.deleteIfExists(part);
        Files.createFile(part, PosixFilePermissions.asFileAttribute(PosixFilePermissions.fromString("rw-------")));
        try (Writer writer = Files.newBufferedWriter(part)) {
            properties.store(writer, "access to the demonstration on this machine");
        }
        Files.move(part, file);
        return access;
    }

    private static String place() throws IOException {
        try (InputStream in = DemoAccess.class.getResourceAsStream(PLACE)) {
            if (in == null) {
                throw new IOException(PLACE + " is missing from the program");
            }
            return new String(in.readAllBytes(), StandardCharsets.UTF_8);
        }
    }
}
