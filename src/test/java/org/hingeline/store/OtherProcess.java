package org.hingeline.store;

import java.io.IOException;
import java.nio.file.Path;
import java.util.concurrent.TimeUnit;

/** A program that opens the database in a folder, writes a site to it and keeps it open until it is killed. */
final class OtherProcess implements AutoCloseable {
    private final Process process;

    private OtherProcess(Process process) {
        this.process = process;
    }

    /** Starts the program and waits until its site is acknowledged. */
    static OtherProcess writing(Path folder) throws IOException {
        Process process = new ProcessBuilder(
                        Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                        "-cp",
                        System.getProperty("java.class.path"),
                        OtherProcess.class.getName(),
                        folder.toString())
                .redirectError(ProcessBuilder.Redirect.DISCARD)
                .start();
        OtherProcess other = new OtherProcess(process);
        for (String line; (line = process.inputReader().readLine()) != null; ) {
            if (line.equals("written")) {
                return other;
            }
        }
        other.close();
        throw new IllegalStateException("the other process ended early");
    }

    /** Kills it at once, as a power cut would. */
    @Override
    public void close() {
        process.destroyForcibly();
        try {
            if (!process.waitFor(20, TimeUnit.SECONDS)) {
                throw new IllegalStateException("the other process does not end");
            }
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    public static void main(String[] args) throws IOException {
        Samples.site(EmbeddedDatabase.open(Path.of(args[0])), "written-by-another");
        System.out.println("written");
        while (System.in.read() >= 0) {
            // stays until it is killed, or until whoever started it has ended
        }
        Runtime.getRuntime().halt(1);
    }
}
