package dev.settlewell.sheet;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import dev.settlewell.unit.Deviation;
import dev.settlewell.unit.Range;
import dev.settlewell.unit.Tolerance;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Kind;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.junit.jupiter.api.Test;

/** One sheet that uses every key there is: what the schema lists is what the binder hands out. */
class WholeSheetTest {
  private final Sheet press = Bound.sheet(Bound.resource("press.channels.yaml"));

  @Test
  void has_no_problem() {
    assertThat(Bound.problems(press)).isEmpty();
  }

  @Test
  void every_key_of_the_schema_is_read_and_nothing_else() {
    Map<String, Set<String>> stated = new HashMap<>();
    List<String> wrong = new ArrayList<>();
    walk(press.top(), stated, wrong);
    assertThat(wrong).isEmpty();
    for (Kind kind : Bound.VOCABULARY.kinds().values()) {
      if (kind.name().equals("long-form")) {
        continue;
      }
      Set<String> keys = new HashSet<>(stated.getOrDefault(kind.name(), Set.of()));
      for (Key key : kind.keys().values()) {
        boolean elsewhere = key.partOf().isPresent() || isAmplifierKeyOfFilter(kind, key);
        if (!elsewhere) {
          assertThat(keys).as("keys of %s", kind.name()).contains(key.name());
        }
      }
    }
  }

  private static boolean isAmplifierKeyOfFilter(Kind kind, Key key) {
    return kind.name().equals("filter")
        && Bound.VOCABULARY.kind("amplifier").keys().containsKey(key.name());
  }

  private static void walk(Object value, Map<String, Set<String>> stated, List<String> wrong) {
    if (value instanceof Part part) {
      assertThat(part.slots().keySet()).isEqualTo(slotsOf(Bound.VOCABULARY.kind(part.kind())));
      part.slots()
          .forEach(
              (key, slot) -> {
                if (slot.isStated()) {
                  stated.computeIfAbsent(part.kind(), kind -> new HashSet<>()).add(key);
                }
                walk(slot, stated, wrong);
              });
    } else if (value instanceof Slot<?> slot) {
      if (slot.isWrong()) {
        wrong.add(slot.pointer());
      }
      slot.stated().ifPresent(inner -> walk(inner, stated, wrong));
    } else if (value instanceof Collection<?> items) {
      items.forEach(item -> walk(item, stated, wrong));
    } else if (value instanceof Map<?, ?> map) {
      walk(map.values(), stated, wrong);
    }
  }

  private static Set<String> slotsOf(Kind kind) {
    Set<String> names = new HashSet<>();
    kind.keys().values().stream()
        .filter(key -> key.partOf().isEmpty())
        .forEach(key -> names.add(key.name()));
    return names;
  }

  // --- the shapes that readers of the sheet rely on --------------------------------------------

  private Part channel(String name) {
    return press.channels().get(name).value().stated().orElseThrow();
  }

  private Part stage(String channel, int index) {
    return channel(channel)
        .list("path", Part.class)
        .stated()
        .orElseThrow()
        .get(index)
        .stated()
        .orElseThrow();
  }

  private Part converter(String name) {
    return press.converters().get(name).value().stated().orElseThrow();
  }

  @Test
  void a_word_or_a_quantity() {
    assertThat(converter("sampler").either("reference").stated().orElseThrow().word())
        .contains("ref");
    Either voltage = converter("slow").either("reference").stated().orElseThrow();
    assertThat(voltage.word()).isEmpty();
    assertThat(voltage.quantity().orElseThrow().value()).isEqualTo(2.5);
    Toleranced share =
        converter("sampler")
            .either("hold-starts-at")
            .stated()
            .orElseThrow()
            .quantity()
            .orElseThrow();
    assertThat(share.value()).isEqualTo(0.5);
    assertThat(share.of()).contains("ref");
    assertThat(converter("slow").either("hold-starts-at").stated().orElseThrow().is("unknown"))
        .isTrue();
    Part cycle = press.scans().get("cycle").value().stated().orElseThrow();
    assertThat(cycle.either("rate").stated().orElseThrow().quantity().orElseThrow().value())
        .isEqualTo(2000);
    assertThat(channel("oil").either("acquisition").stated().orElseThrow().is("until-trigger"))
        .isTrue();
  }

  @Test
  void long_forms() {
    Toleranced hold = converter("sampler").quantity("hold-capacitor").stated().orElseThrow();
    assertThat(hold.value()).isEqualTo(4e-12);
    assertThat(hold.min()).hasValue(3e-12);
    assertThat(hold.max()).hasValue(6e-12);
    Toleranced on = converter("sampler").quantity("switch-resistance").stated().orElseThrow();
    assertThat(on.value()).isEqualTo(2000);
    assertThat(on.typicalOnly()).isFalse();
    Toleranced ref = press.supplies().get("ref").value().stated().orElseThrow();
    assertThat(ref.deviation().tolerances()).hasSize(1);
    assertThat(ref.deviation().drift().orElseThrow().box()).isPresent();
  }

  @Test
  void defaults_fill_tolerance_and_drift_separately() {
    Deviation code = stage("ram", 0).quantity("value").stated().orElseThrow().deviation();
    assertThat(code.tolerances()).extracting(Tolerance::plus).containsExactly(0.01);
    assertThat(code.drift().orElseThrow().perKelvin()).isCloseTo(1e-4, within(1e-18));
    Deviation shunt = stage("oil", 0).quantity("value").stated().orElseThrow().deviation();
    assertThat(shunt.tolerances()).extracting(Tolerance::plus).containsExactly(0.001);
    assertThat(shunt.drift().orElseThrow().perKelvin()).isCloseTo(25e-6, within(1e-18));
    Deviation longForm = stage("oil", 2).quantity("value").stated().orElseThrow().deviation();
    assertThat(longForm.tolerances()).hasSize(1);
    assertThat(longForm.drift()).isPresent();
    Toleranced typical = stage("oil", 3).quantity("value").stated().orElseThrow();
    assertThat(typical.typicalOnly()).isTrue();
    assertThat(typical.deviation().tolerances()).isEmpty();
    assertThat(stage("bore", 0).quantity("resistor").stated().orElseThrow().deviation().drift())
        .isPresent();
    assertThat(stage("hand-wheel", 0).quantity("lower").stated().orElseThrow().deviation().isNone())
        .isFalse();
    assertThat(stage("load", 0).quantity("output-resistance").stated().orElseThrow().deviation())
        .isEqualTo(Deviation.NONE);
  }

  @Test
  void interferers_are_couplings_and_an_empty_list_is_said() {
    List<Slot<Part>> ram = channel("ram").list("interferers", Part.class).stated().orElseThrow();
    assertThat(ram).hasSize(2);
    Part pump = ram.get(0).stated().orElseThrow();
    assertThat(pump.kind()).isEqualTo("coupling");
    assertThat(pump.text("interferer").stated()).contains("pump");
    assertThat(pump.quantity("amplitude").stated().orElseThrow().value()).isEqualTo(0.010);
    assertThat(ram.get(1).stated().orElseThrow().quantity("amplitude").isMissing()).isTrue();
    assertThat(channel("oil").list("interferers", Part.class).stated()).contains(List.of());
    assertThat(channel("load").list("interferers", Part.class).isMissing()).isTrue();
    assertThat(channel("bore").list("interferers", Part.class).stated().orElseThrow()).hasSize(2);
  }

  @Test
  void sensors_and_stages_go_by_their_kind() {
    Part sensor = channel("bore").part("sensor").stated().orElseThrow();
    assertThat(sensor.kind()).isEqualTo("thermistor");
    assertThat(sensor.pointer()).isEqualTo("/channels/bore/sensor/thermistor");
    Part beta = sensor.part("beta").stated().orElseThrow();
    assertThat(beta.quantity("value").stated().orElseThrow().value()).isEqualTo(3435);
    assertThat(beta.range("between").stated()).map(Range::high).contains(85.0);
    assertThat(stage("load", 0).number("gain").stated()).contains(100.0);
    assertThat(stage("bearing", 0).number("gain").stated().orElseThrow())
        .isCloseTo(19.953, within(0.001)); // 26 dB
    assertThat(channel("cell").part("sensor").stated().orElseThrow().kind()).isEqualTo("voltage");
    List<Slot<Part>> points =
        channel("tank")
            .part("sensor")
            .stated()
            .orElseThrow()
            .list("points", Part.class)
            .stated()
            .orElseThrow();
    assertThat(
            points.get(1).stated().orElseThrow().quantity("output").stated().orElseThrow().value())
        .isEqualTo(0.9);
    assertThat(
            channel("oil")
                .part("calibrated")
                .stated()
                .orElseThrow()
                .list("terms", String.class)
                .stated()
                .orElseThrow())
        .extracting(slot -> slot.stated().orElseThrow())
        .containsExactly("offset", "gain");
    assertThat(
            channel("bore")
                .part("band")
                .stated()
                .orElseThrow()
                .quantity("frequency")
                .stated()
                .orElseThrow()
                .value())
        .isEqualTo(1);
  }

  @Test
  void harmonics_and_pins_and_measured_units() {
    Part pump = press.interferers().get("pump").value().stated().orElseThrow();
    assertThat(pump.map("harmonics", Toleranced.class).stated().orElseThrow().keySet())
        .containsExactly("2", "3");
    assertThat(channel("ram").text("pin").stated()).contains("PA3");
    assertThat(channel("oil").text("pin").stated()).contains("4");
    assertThat(channel("oil").range("measures").stated().orElseThrow().unit().symbol())
        .isEqualTo("bar");
    // The sheet's own unit is the metre; 300 mm is 0.3 of it.
    assertThat(channel("ram").range("measures").stated().orElseThrow().high())
        .isCloseTo(0.3, within(1e-15));
  }
}
