package org.hingeline.kill;

import java.io.BufferedReader;
import java.io.File;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.URI;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/** The real service, {@code serve}, as a process of its own that can be killed. */
public final class ServiceProcess {
    private static final Pattern LISTENING = Pattern.compile("listening on \\S+ port (\\d+)");
    private static final Duration LONGEST_START = Duration.ofSeconds(90);
    private static final Duration LONGEST_STOP = Duration.ofSeconds(60);

    private final Process process;
    private final Path log;
    private final long startedNanos = System.nanoTime();
    private final CompletableFuture<Integer> port = new CompletableFuture<>();
    private final List<String> troubles = new ArrayList<>();
    private final Thread reader;
    private volatile long readyNanos;

    private ServiceProcess(Process process, Path log) {
        this.process = process;
        this.log = log;
        this.reader = new Thread(this::readLog, "log of " + process.pid());
        reader.setDaemon(true);
        reader.start();
    }

    /** What to run as arguments of {@code java}: the classes this test runs with, without the tests' own. */
    public static List<String> theseClasses() {
        String classes = Arrays.stream(System.getProperty("java.class.path").split(File.pathSeparator))
                .filter(entry -> !entry.endsWith("test-classes") && !entry.endsWith("test-classes/"))
                .collect(Collectors.joining(File.pathSeparator));
        // its lives are too short for the second compiler to pay
        return List.of("-XX:TieredStopAtLevel=1", "-XX:-UsePerfData", "-cp", classes, "org.hingeline.Hingeline");
    }

    /**
     * @param program what to run, as arguments of {@code java}
     * @param log what it writes is added to this file
     */
    public static ServiceProcess start(List<String> program, Path settings, Path log) {
        List<String> command = new ArrayList<>();
        command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
        command.add("@" + Path.of("ops", "java.options").toAbsolutePath());
        command.addAll(program);
        command.addAll(List.of("serve", "--config", settings.toString()));
        try {
            return new ServiceProcess(
                    new ProcessBuilder(command).redirectErrorStream(true).start(), log);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private void readLog() {
        try (BufferedReader lines = process.inputReader(StandardCharsets.UTF_8)) {
            for (String line = lines.readLine(); line != null; line = lines.readLine()) {
                Files.writeString(log, line + "\n", StandardOpenOption.CREATE, StandardOpenOption.APPEND);
                Matcher listening = LISTENING.matcher(line);
                if (listening.find()) {
                    readyNanos = System.nanoTime();
                    port.complete(Integer.valueOf(listening.group(1)));
                }
                if (line.contains(" ERROR ")) {
                    synchronized (troubles) {
                        troubles.add(line);
                    }
                }
            }
        } catch (IOException e) {
            port.completeExceptionally(e); // the pipe of a killed process may break
        }
        port.completeExceptionally(new IllegalStateException("the service ended before it was ready; see " + log));
    }

    /** Waits until it is ready. */
    public URI address() {
        try {
            return URI.create("http://127.0.0.1:" + port.get(LONGEST_START.toSeconds(), TimeUnit.SECONDS));
        } catch (ExecutionException | TimeoutException e) {
            process.destroyForcibly();
            throw new IllegalStateException("the service did not become ready; see " + log, e);
        } catch (InterruptedException e) {
            throw interrupted(e);
        }
    }

    /** From the start of the process to the line that says it listens. */
    public Duration startTime() {
        address();
        return Duration.ofNanos(readyNanos - startedNanos);
    }

    public long pid() {
        return process.pid();
    }

    /** Lines of the log at level ERROR. */
    public List<String> troubles() {
        synchronized (troubles) {
            return List.copyOf(troubles);
        }
    }

    /** SIGKILL. */
    public void kill() {
        process.destroyForcibly();
        await();
    }

    /** SIGTERM, and waits for the orderly end. */
    public void stop() {
        process.destroy();
        await();
    }

    private void await() {
        try {
            if (!process.waitFor(LONGEST_STOP.toSeconds(), TimeUnit.SECONDS)) {
                process.destroyForcibly();
                throw new IllegalStateException("process " + process.pid() + " did not end");
            }
            reader.join(LONGEST_STOP.toMillis());
        } catch (InterruptedException e) {
            throw interrupted(e);
        }
    }

    private IllegalStateException interrupted(InterruptedException e) {
        process.destroyForcibly();
        Thread.currentThread().interrupt();
        return new IllegalStateException(e);
    }
}
