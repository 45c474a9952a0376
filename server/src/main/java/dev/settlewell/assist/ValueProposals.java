package dev.settlewell.assist;

import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Engineering;
import dev.settlewell.unit.Expected;
import dev.settlewell.unit.PreferredValues;
import dev.settlewell.unit.PreferredValues.Series;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.unit.Values;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.NameKind;
import dev.settlewell.vocabulary.Shape;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Values that fit a key: words, names, what the hardware offers, what can be bought, units. */
final class ValueProposals {
  /** One whole value. */
  record Choice(String text, String detail, boolean isName) {}

  private static final Pattern NUMBER =
      Pattern.compile("([+-]?[0-9]+(?:\\.[0-9]+)?)\\s*(\\S*)\\s*");
  private static final Pattern ERRORS = Pattern.compile("(.*?)\\s*((?:±|\\+-|\\+/-).*)?");

  private final Checked checked;
  private final Key key;
  private final List<String> path;
  private final String typed;
  private final List<Choice> choices = new ArrayList<>();

  ValueProposals(Checked checked, Key key, List<String> path, String typed) {
    this.checked = checked;
    this.key = key;
    this.path = path;
    this.typed = typed;
  }

  List<Choice> choices() {
    if (key.name().equals("acquisition")) {
      offeredCycles();
    }
    preferred();
    units();
    key.refersTo().ifPresent(this::names);
    key.words().forEach(word -> add(word, ""));
    if (key.shape() == Shape.FLAG) {
      add("true", "");
      add("false", "");
    }
    key.standard().ifPresent(standard -> add(standard, "what holds without it"));
    key.examples().forEach(example -> add(example, "example"));
    return choices;
  }

  private void add(String text, String detail) {
    if (choices.stream().noneMatch(choice -> choice.text().equals(text))) {
      choices.add(new Choice(text, detail, false));
    }
  }

  private void names(NameKind kind) {
    Collection<String> names =
        switch (kind) {
          case SUPPLY -> checked.linked().supplies().keySet();
          case CONVERTER -> checked.linked().converters().keySet();
          case INTERFERER -> checked.linked().interferers().keySet();
          case SCAN -> checked.sheet().scans().keySet();
          case CHANNEL -> checked.sheet().channels().keySet();
        };
    names.forEach(name -> choices.add(new Choice(name, kind.word(), true)));
  }

  /** What the converter offers, those that suffice first, the shortest of them at the top. */
  private void offeredCycles() {
    Optional<ChannelFigures> channel =
        path.size() > 1
            ? checked.analysis().of(path.get(1)).stream().findFirst()
            : Optional.empty();
    OptionalDouble needed =
        channel
            .map(c -> c.figures().value("required-acquisition-cycles"))
            .orElse(OptionalDouble.empty());
    List<Choice> tooShort = new ArrayList<>();
    for (double cycles : offered(channel)) {
      String text = Engineering.digits(cycles, 12) + " cycles";
      if (needed.isPresent() && cycles < needed.getAsDouble()) {
        tooShort.add(new Choice(text, "too short: needs " + need(needed.getAsDouble()), false));
      } else {
        String why =
            needed.isPresent() ? "settles: needs " + need(needed.getAsDouble()) : "offered";
        choices.add(new Choice(text, why, false));
      }
    }
    choices.addAll(tooShort);
  }

  private static String need(double cycles) {
    return Engineering.digits(cycles, 3);
  }

  private List<Double> offered(Optional<ChannelFigures> channel) {
    Map<String, Named<Part>> all = checked.linked().converters();
    Optional<Part> converter =
        channel
            .flatMap(ChannelFigures::converter)
            .or(() -> all.size() == 1 ? all.values().stream().findFirst() : Optional.empty())
            .flatMap(named -> named.value().stated());
    if (converter.isEmpty() || !converter.get().has("acquisition-cycles")) {
      return List.of();
    }
    return converter.get().list("acquisition-cycles", Double.class).orElse(List.of()).stream()
        .flatMap((Slot<Double> slot) -> slot.stated().stream())
        .toList();
  }

  /** Beside a typed resistance or capacitance the values that can be bought. */
  private void preferred() {
    if (key.shape() != Shape.COMPONENT) {
      return;
    }
    Matcher parts = ERRORS.matcher(typed.strip());
    if (!parts.matches() || parts.group(1).isBlank()) {
      return;
    }
    Expected expected =
        new Expected(
            key.takes().dimensions(), Optional.empty(), false, true, key.takes().shuntSized());
    Optional<Toleranced> value = Values.component(parts.group(1), expected).value();
    if (value.isEmpty() || !(value.get().value() > 0)) {
      return;
    }
    String errors = parts.group(2) == null ? "" : " " + parts.group(2);
    for (Series series : List.of(Series.E24, Series.E96)) {
      PreferredValues.Neighbours near = PreferredValues.neighbours(series, value.get().value());
      for (double neighbour : new double[] {near.lower(), near.higher()}) {
        String text = Engineering.exact(neighbour, value.get().unit().symbol());
        add(text + errors, series.name());
      }
    }
  }

  /** Behind a bare number the units of the key. */
  private void units() {
    Matcher number = NUMBER.matcher(typed.strip());
    if (number.matches()) {
      for (String unit : key.units()) {
        add(number.group(1) + " " + unit, "");
      }
    }
  }
}
