package org.modestead.host.bench.server;

import io.javalin.config.JettyConfig;
import java.nio.ByteBuffer;
import org.eclipse.jetty.http.HttpHeader;
import org.eclipse.jetty.http.HttpHeaderValue;
import org.eclipse.jetty.http.HttpStatus;
import org.eclipse.jetty.http.UriCompliance;
import org.eclipse.jetty.server.Request;
import org.eclipse.jetty.server.Response;
import org.eclipse.jetty.server.handler.ErrorHandler;
import org.eclipse.jetty.util.Callback;

/**
 * What the web server refuses before a route sees it, such as a path with a byte of zero, is refused as the routes refuse: with a sentence and the
 * headers of every answer. The server closes the connection behind such a refusal, and the answer says so: whoever sent it sends nothing
 * more there, where it would get no answer.
 */
final class PlainRefusals extends ErrorHandler {

    /** Makes a server refuse so, and take no path that can be read in two ways. */
    static void on(JettyConfig jetty) {
        jetty.modifyHttpConfiguration(http -> http.setUriCompliance(UriCompliance.DEFAULT));
        jetty.modifyServer(server -> server.setErrorHandler(new PlainRefusals()));
        jetty.modifyServletContextHandler(context -> context.setErrorHandler(new PlainRefusals()));
    }

    @Override
    protected void generateResponse(Request request, Response response, int status, String message, Throwable cause, Callback callback) {
        String seen = message == null || message.equals(HttpStatus.getMessage(status)) ? "its address or its head cannot be read"
                : "the web server refuses it (" + message + ")";
        RequestFault fault = new RequestFault(status, "request", seen, "ask for an address of the page");
        Gate.HEADERS.forEach(response.getHeaders()::put);
        response.getHeaders().put(HttpHeader.CONTENT_TYPE, "application/json");
        response.getHeaders().put(HttpHeader.CONNECTION, HttpHeaderValue.CLOSE);
        response.write(true, ByteBuffer.wrap(Answer.bytes(Answer.refusal(fault))), callback);
    }
}
