package org.hingeline.config;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;

/** A file that holds a password and nothing else; a line end after it does not count. */
public final class PasswordFile {
    private PasswordFile() {}

    /** @throws IllegalStateException naming the file, never what is in it */
    public static String read(Path file) {
        String text;
        try {
            text = Files.readString(file, StandardCharsets.UTF_8);
        } catch (IOException unreadable) {
            throw new IllegalStateException(
                    "password file " + file + " cannot be read ("
                            + unreadable.getClass().getSimpleName() + ")",
                    unreadable);
        }
        String password = text.stripTrailing();
        if (password.isEmpty() || password.lines().count() != 1) {
            throw new IllegalStateException("password file " + file + " must hold one line, the password");
        }
        return password;
    }
}
