package dev.settlewell.unit;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.text.Problem;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The long form of a value, as data sheets print limits. */
class LongFormTest {
  private static final Expected FARAD = Keys.expected("farad");
  private static final Expected OHM = Keys.expected("ohm");

  @ParameterizedTest
  @CsvSource({
    "4 pF, 5 pF, 8 pF, 5e-12, 4e-12, 8e-12",
    ", 5 pF, 7 pF, 5e-12, 5e-12, 7e-12",
    "4 pF, 5 pF, , 5e-12, 4e-12, 5e-12",
    "4 pF, , 8 pF, 6e-12, 4e-12, 8e-12",
    ", , 8 pF, 8e-12, 8e-12, 8e-12",
  })
  void limits(String min, String typical, String max, double nominal, double low, double high) {
    LongForm.Result result = LongForm.of(farad(min), farad(typical), farad(max));
    assertThat(result.faults()).isEmpty();
    Toleranced value = result.value().orElseThrow();
    assertThat(value.value()).isEqualTo(nominal);
    assertThat(value.min()).hasValue(low);
    assertThat(value.max()).hasValue(high);
    assertThat(value.typicalOnly()).isFalse();
  }

  @Test
  void typicalAloneIsExactAndSaysSo() {
    Toleranced value =
        LongForm.of(Optional.empty(), farad("5 pF"), Optional.empty()).value().orElseThrow();
    assertThat(value.typicalOnly()).isTrue();
    assertThat(value.min()).isEmpty();
    assertThat(value.max()).isEmpty();
  }

  @ParameterizedTest
  @CsvSource({
    "8 pF, 5 pF, , TYPICAL, VALUE_OUT_OF_RANGE",
    ", 9 pF, 8 pF, MAX, VALUE_OUT_OF_RANGE",
    "9 pF, , 8 pF, MAX, VALUE_OUT_OF_RANGE",
    "4 pF, , , MIN, MISSING_KEY",
    ", 5 pF ±1 %, 8 pF, TYPICAL, NOT_ONE_VALUE",
    ", 5 pF, 8 pF ±1 %, MAX, NOT_ONE_VALUE",
  })
  void faults(
      String min, String typical, String max, LongForm.Entry entry, Problem.Kind kind) {
    LongForm.Result result = LongForm.of(farad(min), farad(typical), farad(max));
    assertThat(result.value()).isEmpty();
    assertThat(result.faults())
        .singleElement()
        .satisfies(
            fault -> {
              assertThat(fault.entry()).isEqualTo(entry);
              assertThat(fault.kind()).isEqualTo(kind);
            });
  }

  @Test
  void limitsOfDifferentKinds() {
    Optional<Toleranced> volt = Values.quantity("5 V", Keys.expected("volt")).value();
    LongForm.Result result = LongForm.of(Optional.empty(), farad("5 pF"), volt);
    assertThat(result.faults().get(0).kind()).isEqualTo(Problem.Kind.WRONG_UNIT);
  }

  @Test
  void valueWithToleranceAndDriftIsTheShortForm() {
    Toleranced value = ohm("4.7 kΩ");
    Expected errors = LongForm.errorsOf(value, OHM);
    Optional<Deviation> tolerance = Values.deviation("±1 % (k=2)", errors).value();
    Optional<Deviation> drift = Values.deviation("±100 ppm/K", errors).value();
    assertThat(LongForm.of(value, tolerance, drift).value())
        .contains(ohm("4.7 kΩ ±1 % ±100 ppm/K (k=2)"));
  }

  @Test
  void nothingIsSaidTwice() {
    Toleranced value = ohm("4.7 kΩ ±2 % ±50 ppm/K");
    Expected errors = LongForm.errorsOf(value, OHM);
    Optional<Deviation> tolerance = Values.deviation("±1 %", errors).value();
    Optional<Deviation> drift = Values.deviation("±100 ppm/K", errors).value();
    assertThat(LongForm.of(value, tolerance, drift).faults())
        .extracting(LongForm.Fault::entry)
        .containsExactly(LongForm.Entry.TOLERANCE, LongForm.Entry.DRIFT);
    assertThat(LongForm.of(ohm("4.7 kΩ"), drift, tolerance).faults())
        .extracting(LongForm.Fault::entry)
        .containsExactly(LongForm.Entry.TOLERANCE, LongForm.Entry.DRIFT);
  }

  private static Toleranced ohm(String text) {
    return Values.component(text, OHM).value().orElseThrow();
  }

  private static Optional<Toleranced> farad(String text) {
    return text == null ? Optional.empty() : Values.component(text, FARAD).value();
  }
}
