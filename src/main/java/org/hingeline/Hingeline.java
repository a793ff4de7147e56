package org.hingeline;

/** Main and composition root; the only class that sees every package. */
public final class Hingeline {
    private Hingeline() {}

    public static void main(String[] args) {
        System.out.println("Hingeline");
    }
}
