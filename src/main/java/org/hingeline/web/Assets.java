package org.hingeline.web;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.concurrent.ConcurrentHashMap;

/**
 * Addresses of the files that pages load, each with a mark of its content so that browsers may keep it for ever. Own files lie
 * under {@code /web} on the class path and are served at {@code /web/…}; libraries lie under {@code /META-INF/resources/webjars}
 * and are served at {@code /webjars/…}.
 */
public final class Assets {
    private static final ConcurrentHashMap<String, String> MARKS = new ConcurrentHashMap<>();

    private Assets() {}

    /** Address of an own file: {@code own("hingeline.css")} is {@code /web/hingeline.css?v=1a2b3c4d}. */
    public static String own(String file) {
        return "/web/" + file + "?v=" + MARKS.computeIfAbsent("/web/" + file, Assets::mark);
    }

    /** Address of a library's file: {@code library("uplot/1.6.30/dist/uPlot.min.css")}; its version is in the path already. */
    public static String library(String path) {
        return "/webjars/" + path;
    }

    private static String mark(String resource) {
        try (InputStream in = Assets.class.getResourceAsStream(resource)) {
            if (in == null) {
                throw new IllegalArgumentException("no file " + resource + " on the class path");
            }
            byte[] digest = MessageDigest.getInstance("SHA-256").digest(in.readAllBytes());
            return HexFormat.of().formatHex(digest, 0, 4);
        } catch (IOException e) {
            throw new UncheckedIOException("cannot read " + resource, e);
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java has SHA-256", e);
        }
    }
}
