package dev.settlewell.assist;

import dev.settlewell.text.Place;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.List;

/** Paths that stand in a sheet, to be followed: used sheets and the firmware's sources. */
public final class Links {
  /** A stretch of the sheet and the path it leads to, as names of texts are. */
  public record Link(Place place, String target) {}

  private Links() {}

  public static List<Link> of(Checked checked, Vocabulary vocabulary) {
    String folder = folder(checked.text().name());
    return Outline.of(checked.tree(), vocabulary)
        .all()
        .filter(Links::isPath)
        .filter(piece -> !piece.valueText().isBlank())
        .map(piece -> new Link(piece.value().place(), resolve(folder, piece.valueText())))
        .toList();
  }

  private static boolean isPath(Piece piece) {
    boolean use =
        piece.role() == Piece.Role.ITEM && piece.parent().map(p -> p.isKey("use")).orElse(false);
    boolean firmware =
        piece.isKey("in") && piece.parent().map(p -> p.isKind("firmware-constant")).orElse(false);
    return use || firmware;
  }

  private static String folder(String path) {
    return path.substring(0, path.lastIndexOf('/') + 1);
  }

  private static String resolve(String folder, String relative) {
    Deque<String> steps = new ArrayDeque<>();
    for (String step : (folder + relative).split("/", -1)) {
      if (step.equals("..") && steps.size() > 1) {
        steps.removeLast();
      } else if (!step.equals(".")) {
        steps.addLast(step);
      }
    }
    return String.join("/", steps);
  }
}
