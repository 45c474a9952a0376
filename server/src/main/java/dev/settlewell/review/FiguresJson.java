package dev.settlewell.review;

import com.google.gson.JsonElement;
import com.google.gson.JsonNull;
import com.google.gson.JsonObject;
import com.google.gson.JsonPrimitive;
import dev.settlewell.channel.Alias;
import dev.settlewell.channel.Budget;
import dev.settlewell.channel.BudgetRow;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.channel.Figure;
import dev.settlewell.channel.Figures;
import dev.settlewell.channel.ScanFigures;
import java.util.Collection;
import java.util.List;

/** Figures as {@code schema/figures.schema.json} describes them. */
public final class FiguresJson {
  private final Envelope envelope;

  private FiguresJson(Review review) {
    this.envelope = new Envelope(review.locations());
  }

  public static String render(Review review) {
    FiguresJson json = new FiguresJson(review);
    JsonObject root = Envelope.head(review);
    root.add("sheets", Json.array(review.sheets(), json::sheet));
    Json.arrayIfAny(root, "failures", review.failures(), Envelope::failure);
    return Json.write(root);
  }

  private JsonObject sheet(Reviewed sheet) {
    String home = sheet.path();
    JsonObject object = Envelope.sheet(sheet);
    JsonObject converters = new JsonObject();
    sheet
        .analysis()
        .converters()
        .forEach((name, c) -> converters.add(name, figuresAlone(c.figures(), home)));
    object.add("converters", converters);
    JsonObject scans = new JsonObject();
    sheet.analysis().scans().forEach((name, scan) -> scans.add(name, scan(scan, home)));
    object.add("scans", scans);
    if (!sheet.analysis().unscanned().isEmpty()) {
      object.add("channels", channels(sheet.analysis().unscanned().values(), home));
    }
    return object;
  }

  private JsonObject scan(ScanFigures scan, String home) {
    JsonObject object = figuresAlone(scan.figures(), home);
    object.add("channels", channels(scan.channels().values(), home));
    return object;
  }

  private JsonObject channels(Collection<ChannelFigures> channels, String home) {
    JsonObject object = new JsonObject();
    channels.forEach(channel -> object.add(channel.channel().name(), channel(channel, home)));
    return object;
  }

  private JsonObject channel(ChannelFigures channel, String home) {
    JsonObject object = new JsonObject();
    object.add("place", envelope.place(channel.channel().place(), home));
    object.addProperty("visits", channel.visits());
    object.add("figures", figures(channel.figures(), home));
    Json.arrayIfAny(object, "aliases", channel.aliases(), alias -> alias(alias, channel));
    channel.budget().ifPresent(budget -> object.add("budget", budget(budget, home)));
    Json.arrayIfAny(
        object, "typical-only", channel.typicalOnly(), place -> envelope.place(place, home));
    if (!channel.faults().isEmpty()) {
      object.add("faults", Json.strings(channel.faults()));
    }
    return object;
  }

  private JsonObject figuresAlone(Figures figures, String home) {
    JsonObject object = new JsonObject();
    object.add("figures", figures(figures, home));
    return object;
  }

  private JsonElement figures(Figures figures, String home) {
    return Json.array(List.copyOf(figures.all()), figure -> figure(figure, home));
  }

  private JsonObject figure(Figure figure, String home) {
    JsonObject object = new JsonObject();
    object.addProperty("name", figure.name());
    state(figure, object);
    object.addProperty("unit", figure.unit());
    Json.number(object, "at", figure.at());
    if (!figure.formula().isEmpty()) {
      object.addProperty("formula", figure.formula());
    }
    Json.arrayIfAny(object, "operands", figure.operands(), operand -> operand(operand, home));
    return object;
  }

  private static void state(Figure figure, JsonObject object) {
    Figure.State state = figure.state();
    if (state instanceof Figure.State.Value v && Double.isFinite(v.value())) {
      Json.number(object, "value", v.value());
    } else if (state instanceof Figure.State.Value) {
      object.addProperty("none", "the computation gave no finite number");
    } else if (state instanceof Figure.State.Missing missing) {
      object.add(
          "missing", Json.array(missing.inputs(), input -> new JsonPrimitive(input.pointer())));
    } else if (state instanceof Figure.State.None none) {
      object.addProperty("none", none.why());
    } else if (state instanceof Figure.State.Unlimited) {
      object.addProperty("unlimited", true);
    } else {
      object.addProperty("none", "a value it rests on is wrong and has a finding of its own");
    }
  }

  private JsonObject operand(Figure.Operand operand, String home) {
    JsonObject object = new JsonObject();
    object.addProperty("name", operand.name());
    object.add(
        "value",
        Double.isFinite(operand.value()) ? Json.number(operand.value()) : JsonNull.INSTANCE);
    object.addProperty("unit", operand.unit());
    operand.place().ifPresent(place -> object.add("place", envelope.place(place, home)));
    return object;
  }

  private static JsonObject alias(Alias alias, ChannelFigures channel) {
    JsonObject object = new JsonObject();
    object.addProperty("interferer", alias.interferer());
    object.addProperty("harmonic", alias.harmonic());
    object.add("frequency", Json.quantity(alias.frequency(), "Hz"));
    JsonObject lands = new JsonObject();
    Json.number(lands, "low", alias.landsLow());
    Json.number(lands, "high", alias.landsHigh());
    lands.addProperty("unit", "Hz");
    object.add("lands-at", lands);
    Json.number(object, "gain", alias.gain());
    object.add("amplitude", Json.quantity(alias.amplitudeVolts(), "V"));
    Json.number(object, "amplitude-lsb", alias.amplitudeLsb());
    if (Double.isFinite(alias.amplitudeMeasured())) {
      String unit = channel.budget().map(Budget::unit).orElse("");
      object.add("amplitude-measured", Json.quantity(alias.amplitudeMeasured(), unit));
    }
    object.addProperty("in-band", alias.inBand());
    object.addProperty("reads-as-offset", alias.readsAsOffset());
    object.addProperty("aliased", alias.aliased());
    return object;
  }

  private JsonObject budget(Budget budget, String home) {
    JsonObject object = new JsonObject();
    object.add("at", Json.quantity(budget.at(), budget.unit()));
    object.add("at-ambient", Json.quantity(budget.ambient(), "°C"));
    object.addProperty("unit", budget.unit());
    Json.number(object, "hard-limit", budget.hardLimit());
    Json.number(object, "combined", budget.combined());
    Json.number(object, "expanded", budget.expanded());
    Json.number(object, "coverage-factor", budget.coverageFactor());
    Json.number(object, "offset", budget.offset());
    Json.number(object, "needs", budget.needs());
    if (budget.needs().isPresent()) {
      object.addProperty("judges", budget.worstCase() ? "hard-limit" : "expanded");
    }
    Json.number(object, "margin", budget.margin());
    if (!budget.typicalOnly().isEmpty()) {
      object.add("typical-only", Json.strings(budget.typicalOnly()));
    }
    object.add("rows", Json.array(budget.rows(), row -> row(row, home)));
    return object;
  }

  private JsonObject row(BudgetRow row, String home) {
    JsonObject object = new JsonObject();
    object.addProperty("name", row.name());
    Json.number(object, "limit", row.limit());
    Json.number(object, "standard", row.standard());
    Json.number(object, "share", row.share());
    object.addProperty("distribution", row.distribution());
    object.addProperty("bounded", row.bounded());
    Json.arrayIfAny(object, "places", row.places(), place -> envelope.place(place, home));
    return object;
  }
}
