package org.hingeline.web.view;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * A pH electrode held against the tris standard.
 *
 * @param form fields trisTemp, trisTempUnit, trisSalt, reading, scale
 * @param finding what came of it; null before the form is sent, and when it was refused
 */
public record ElectrodeView(Form form, @Nullable Finding finding) {

    /**
     * How the electrode stands.
     *
     * @param sentence "The electrode reads 0.031 too low."
     * @param standing fit when it may be used as it is
     * @param should what it should have shown, on its own scale
     * @param total the standard's pH, total scale
     * @param deviation with sign
     * @param advice what to do, one sentence each
     * @param cautions what to know before relying on it
     */
    public record Finding(
            String sentence,
            Standing standing,
            String should,
            String total,
            String deviation,
            List<String> advice,
            List<String> cautions) {
        public Finding {
            advice = List.copyOf(advice);
            cautions = List.copyOf(cautions);
        }
    }
}
