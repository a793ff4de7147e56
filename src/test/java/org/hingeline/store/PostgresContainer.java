package org.hingeline.store;

import com.github.dockerjava.api.exception.NotFoundException;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.time.Duration;
import java.util.concurrent.atomic.AtomicInteger;
import org.testcontainers.DockerClientFactory;
import org.testcontainers.containers.wait.strategy.Wait;
import org.testcontainers.postgresql.PostgreSQLContainer;
import org.testcontainers.utility.DockerImageName;

/**
 * The one PostgreSQL of a test run: started when the first test asks for a database, ended with the JVM.
 *
 * <p>The image is what HINGELINE_POSTGRES_IMAGE names; without it the one that {@code ops/prepare-tests} built, if it
 * is there; otherwise the official one. Where there is no engine or no image, every test that asks fails.
 */
public final class PostgresContainer {
    private static final String OFFICIAL_IMAGE = "postgres:15";
    private static final String BUILT_IMAGE = "hingeline-postgres:15";
    private static final AtomicInteger COUNT = new AtomicInteger();

    /** Where to connect to an empty database, and as whom. */
    public record Database(String jdbcUrl, String user, String password) {}

    private PostgresContainer() {}

    /** Makes an empty database that nobody else uses. */
    public static Database freshDatabase() {
        PostgreSQLContainer server = Holder.SERVER;
        String name = "fresh" + COUNT.incrementAndGet();
        try (var connection =
                        DriverManager.getConnection(server.getJdbcUrl(), server.getUsername(), server.getPassword());
                var statement = connection.createStatement()) {
            statement.execute("CREATE DATABASE " + name);
        } catch (SQLException e) {
            throw new IllegalStateException("no database could be made in " + server.getDockerImageName(), e);
        }
        String url = "jdbc:postgresql://%s:%d/%s".formatted(server.getHost(), server.getMappedPort(5432), name);
        return new Database(url, server.getUsername(), server.getPassword());
    }

    private static final class Holder {
        static final PostgreSQLContainer SERVER = start();

        private static PostgreSQLContainer start() {
            var image = DockerImageName.parse(imageName()).asCompatibleSubstituteFor("postgres");
            var server = new PostgreSQLContainer(image)
                    .withUsername("test")
                    .withPassword("test")
                    .withDatabaseName("test")
                    .withCommand("postgres", "-c", "listen_addresses=*", "-c", "fsync=off");
            // over TCP: the official image first runs a server of its own that listens on a socket file only
            server.waitingFor(Wait.forSuccessfulCommand("pg_isready -h 127.0.0.1 -U test -d test")
                    .withStartupTimeout(Duration.ofSeconds(60)));
            server.start();
            Runtime.getRuntime().addShutdownHook(new Thread(server::stop, "postgres-stop"));
            return server;
        }

        private static String imageName() {
            String named = System.getenv("HINGELINE_POSTGRES_IMAGE");
            if (named != null && !named.isBlank()) {
                return named;
            }
            try {
                DockerClientFactory.lazyClient().inspectImageCmd(BUILT_IMAGE).exec();
                return BUILT_IMAGE;
            } catch (NotFoundException e) {
                return OFFICIAL_IMAGE;
            }
        }
    }
}
