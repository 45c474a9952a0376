package dev.settlewell.lsp;

import com.google.gson.GsonBuilder;
import com.google.gson.JsonElement;
import com.google.gson.JsonNull;
import com.google.gson.JsonObject;
import com.google.gson.JsonParseException;
import com.google.gson.JsonParser;
import dev.settlewell.lsp.wire.BrokenFraming;
import dev.settlewell.lsp.wire.Frame;
import dev.settlewell.lsp.wire.FrameReader;
import dev.settlewell.lsp.wire.FrameWriter;
import java.io.IOException;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import org.eclipse.lsp4j.jsonrpc.MessageIssueException;
import org.eclipse.lsp4j.jsonrpc.RemoteEndpoint;
import org.eclipse.lsp4j.jsonrpc.json.JsonRpcMethod;
import org.eclipse.lsp4j.jsonrpc.json.MessageJsonHandler;
import org.eclipse.lsp4j.jsonrpc.messages.Message;
import org.eclipse.lsp4j.jsonrpc.messages.NotificationMessage;
import org.eclipse.lsp4j.jsonrpc.messages.RequestMessage;
import org.eclipse.lsp4j.jsonrpc.messages.ResponseError;
import org.eclipse.lsp4j.jsonrpc.messages.ResponseErrorCode;
import org.eclipse.lsp4j.jsonrpc.messages.ResponseMessage;
import org.eclipse.lsp4j.jsonrpc.validation.ReflectiveMessageValidator;

/** Takes the client's messages in their order, lets through what its life cycle allows. */
final class Connection {
  private static final String CANCEL = "$/cancelRequest";

  private final FrameReader in;
  private final FrameWriter out;
  private final MessageJsonHandler json;
  private final RemoteEndpoint remote;
  private final ReflectiveMessageValidator validator;
  private final Gate gate;
  private final Session session;

  Connection(FrameReader in, FrameWriter out, Methods methods, Session session) {
    this.in = in;
    this.out = out;
    this.session = session;
    this.gate = new Gate(methods.requests());
    Map<String, JsonRpcMethod> signatures = new HashMap<>(methods.signatures());
    signatures.putAll(Client.SIGNATURES);
    signatures.put(CANCEL, MessageJsonHandler.CANCEL_METHOD);
    this.json = new MessageJsonHandler(signatures);
    this.remote =
        new RemoteEndpoint(
            this::send, methods, fault -> session.faults().answer("a request", fault));
    this.validator = new ReflectiveMessageValidator(remote);
    json.setMethodProvider(remote);
    remote.setJsonHandler(json);
    session.client().connect(remote);
  }

  /** Reads to the end of the stream or to {@code exit}; gives the exit code. */
  int read() {
    try {
      for (Optional<Frame> frame = in.next(); frame.isPresent(); frame = in.next()) {
        if (frame.get() instanceof Frame.Refused refused) {
          refuse(ResponseErrorCode.InvalidRequest, refused.why());
        } else if (frame.get() instanceof Frame.Body body && !take(body.json())) {
          break;
        }
      }
    } catch (BrokenFraming broken) {
      System.err.println("the stream of messages is broken: " + broken.getMessage());
      return 1;
    } catch (IOException closed) {
      System.err.println("reading failed: " + closed.getMessage());
    }
    return gate.isShutDown() ? 0 : 1;
  }

  /** False at {@code exit}. */
  private boolean take(String text) {
    try {
      Message message = json.parseMessage(text);
      if (message == null) {
        refuse(ResponseErrorCode.ParseError, "an empty message");
        return true;
      }
      return take(message);
    } catch (MessageIssueException | JsonParseException | IllegalStateException unfit) {
      takeUnfit(text);
      return true;
    }
  }

  private boolean take(Message message) {
    if (message instanceof RequestMessage request) {
      Optional<ResponseError> refusal = gate.refuse(String.valueOf(request.getMethod()));
      if (refusal.isPresent()) {
        answer(request, refusal.get());
      } else {
        deliver(request);
      }
    } else if (message instanceof NotificationMessage notification) {
      if ("exit".equals(notification.getMethod())) {
        return false;
      }
      if (gate.passesNotifications()) {
        validator.consume(notification);
      }
    } else {
      remote.consume(message);
    }
    return true;
  }

  /** A client that forgets to say what it can is one that can nothing. */
  private void deliver(RequestMessage request) {
    if (request.getMethod().equals("initialize")) {
      remote.consume(request);
    } else {
      validator.consume(request);
    }
  }

  /** What the protocol library cannot read: answered where there is somebody to answer. */
  private void takeUnfit(String text) {
    JsonObject message;
    try {
      message = JsonParser.parseString(text).getAsJsonObject();
    } catch (JsonParseException | IllegalStateException noObject) {
      refuse(ResponseErrorCode.ParseError, "this is no message of the protocol");
      return;
    }
    String method = text(message, "method");
    if (!method.isEmpty() && message.has("id") && message.get("id").isJsonPrimitive()) {
      ResponseError error =
          gate.refuse(method)
              .orElse(
                  new ResponseError(
                      ResponseErrorCode.InvalidParams, "unfit parameters of " + method, null));
      out.write(failure(message.get("id"), error.getCode(), error.getMessage()));
    } else if (method.isEmpty()) {
      refuse(ResponseErrorCode.InvalidRequest, "a message without a method");
    } else {
      System.err.println("unfit parameters of " + method);
    }
  }

  private static String text(JsonObject message, String key) {
    JsonElement value = message.get(key);
    return value != null && value.isJsonPrimitive() ? value.getAsString() : "";
  }

  private void refuse(ResponseErrorCode code, String why) {
    System.err.println("message dropped: " + why);
    out.write(failure(JsonNull.INSTANCE, code.getValue(), why));
  }

  /** Written by hand: the library cannot write the null id of an answer to nobody. */
  private static String failure(JsonElement id, int code, String message) {
    JsonObject error = new JsonObject();
    error.addProperty("code", code);
    error.addProperty("message", message);
    JsonObject response = new JsonObject();
    response.addProperty("jsonrpc", "2.0");
    response.add("id", id);
    response.add("error", error);
    return new GsonBuilder().serializeNulls().create().toJson(response);
  }

  private void answer(RequestMessage request, ResponseError error) {
    ResponseMessage response = new ResponseMessage();
    response.setRawId(request.getRawId());
    response.setJsonrpc("2.0");
    response.setError(error);
    send(response);
  }

  private void send(Message message) {
    out.write(json.serialize(message));
  }
}
