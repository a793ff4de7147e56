package org.hingeline.web;

import java.nio.ByteBuffer;
import org.eclipse.jetty.http.HttpHeader;
import org.eclipse.jetty.server.Request;
import org.eclipse.jetty.server.Response;
import org.eclipse.jetty.server.handler.ErrorHandler;
import org.eclipse.jetty.util.Callback;

/** Tells as a problem what is refused before any route is looked for: a broken address, headers that are too large. */
final class EarlyRefusals extends ErrorHandler {
    @Override
    public boolean handle(Request request, Response response, Callback callback) {
        int status = response.getStatus();
        Problem problem = switch (status) {
            case 414, 431 -> Problem.of(status, "Too large", "the address or the headers are too long");
            case 400 -> Problem.of(400, "Not HTTP", "the address or a header of the request is not well formed");
            default -> Problem.of(status, status < 500 ? "Refused" : "Failed", "the request was not taken");
        };
        response.getHeaders().put(HttpHeader.CONTENT_TYPE, "application/problem+json");
        response.write(true, ByteBuffer.wrap(Json.MAPPER.writeValueAsBytes(problem)), callback);
        return true;
    }
}
