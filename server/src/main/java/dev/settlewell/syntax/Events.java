package dev.settlewell.syntax;

import java.util.Optional;
import org.yaml.snakeyaml.LoaderOptions;
import org.yaml.snakeyaml.error.Mark;
import org.yaml.snakeyaml.error.MarkedYAMLException;
import org.yaml.snakeyaml.events.Event;
import org.yaml.snakeyaml.events.StreamEndEvent;
import org.yaml.snakeyaml.parser.ParserImpl;
import org.yaml.snakeyaml.reader.StreamReader;
import org.yaml.snakeyaml.scanner.ScannerException;

/**
 * The events of a YAML text. Where the parser fails the stream ends, and {@link #failure} tells
 * where: what came before still makes a tree.
 */
final class Events {

  /**
   * @param index the code point of the draft where the text was typed that the parser stumbled over
   * @param message the parser's own words
   */
  record Failure(int index, String message) {}

  private final ParserImpl parser;
  private Event ahead;
  private Failure failure;
  private int reached;

  Events(String text) {
    LoaderOptions options = new LoaderOptions();
    options.setCodePointLimit(Integer.MAX_VALUE);
    parser = new ParserImpl(new StreamReader(text), options);
  }

  Event peek() {
    if (ahead == null) {
      ahead = read();
      if (ahead.getEndMark() != null) {
        reached = Math.max(reached, ahead.getEndMark().getIndex());
      }
    }
    return ahead;
  }

  Event next() {
    Event event = peek();
    if (!(event instanceof StreamEndEvent)) {
      ahead = null;
    }
    return event;
  }

  Optional<Failure> failure() {
    return Optional.ofNullable(failure);
  }

  private Event read() {
    try {
      return parser.getEvent();
    } catch (MarkedYAMLException e) {
      failure = new Failure(blamed(e), String.valueOf(e.getProblem()));
    } catch (RuntimeException | StackOverflowError e) {
      failure = new Failure(reached, "");
    }
    return new StreamEndEvent(null, null);
  }

  /**
   * The scanner knows where the thing began that it could not end (a key, a quote), and that is the
   * line that was typed. The parser's context is the start of the whole mapping: far off.
   */
  private int blamed(MarkedYAMLException e) {
    Mark context = e.getContextMark();
    Mark problem = e.getProblemMark();
    if (e instanceof ScannerException && context != null) {
      return context.getIndex();
    }
    return problem != null ? problem.getIndex() : reached;
  }
}
