package org.hingeline.web;

import gg.jte.ContentType;
import gg.jte.TemplateEngine;
import gg.jte.output.StringOutput;
import java.util.Map;

/** Renders the templates of {@code src/main/jte}, which the build compiles to classes. Safe for use by many threads. */
public final class Pages {
    private final TemplateEngine engine;

    /** Finds the compiled templates on the class path beside this class. */
    public Pages() {
        engine = TemplateEngine.createPrecompiled(
                null, ContentType.Html, Pages.class.getClassLoader(), "org.hingeline.web.pages");
    }

    /**
     * The page as HTML.
     *
     * @param template name of the file under {@code src/main/jte} without its ending: {@code status}, {@code fragments/path}
     * @param model the template's parameters by name
     * @throws gg.jte.TemplateException if there is no such template or a parameter is missing or of another type
     */
    public String render(String template, Map<String, Object> model) {
        StringOutput html = new StringOutput(16_384);
        engine.render(template + ".jte", model, html);
        return html.toString();
    }
}
