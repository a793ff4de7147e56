package org.hingeline.monitor;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.security.SecureRandom;
import java.util.Base64;
import java.util.HexFormat;

/** Makes keys and tokens of 256 random bits, and the hash under which they are kept. */
public final class Secrets {
    private static final int BYTES = 32;

    private final SecureRandom random;

    public Secrets(SecureRandom random) {
        this.random = random;
    }

    /** A new secret, to be shown once; the prefix tells people what it is. */
    public String make(String prefix) {
        byte[] bytes = new byte[BYTES];
        random.nextBytes(bytes);
        return prefix + Base64.getUrlEncoder().withoutPadding().encodeToString(bytes);
    }

    /**
     * SHA-256, in hex. A fast hash is enough for a secret of 256 random bits; passwords take {@link Passwords} instead.
     */
    public static String hash(String secret) {
        try {
            MessageDigest digest = MessageDigest.getInstance("SHA-256");
            return HexFormat.of().formatHex(digest.digest(secret.getBytes(StandardCharsets.UTF_8)));
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java has SHA-256", e);
        }
    }
}
