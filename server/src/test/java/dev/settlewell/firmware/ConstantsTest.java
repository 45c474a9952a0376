package dev.settlewell.firmware;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import dev.settlewell.text.SourceText;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class ConstantsTest {
  private static List<Constant> find(String source) {
    return Constants.find(SourceText.of("a.h", source), "X");
  }

  private static Constant one(String source) {
    List<Constant> found = find(source);
    assertThat(found).as(source).hasSize(1);
    return found.get(0);
  }

  /** Values as a C compiler gives them (ISO/IEC 9899:2018, 6.4.4, 6.5, 6.6). */
  @ParameterizedTest
  @CsvSource(
      delimiter = ';',
      quoteCharacter = '"',
      value = {
        "24            ; 24    ; 0.5",
        "240u          ; 240   ; 0.5",
        "0x1F          ; 31    ; 0.5",
        "0b101         ; 5     ; 0.5",
        "010           ; 8     ; 0.5",
        "0             ; 0     ; 0.5",
        "1'000         ; 1000  ; 0.5",
        "UINT16_C(24)  ; 24    ; 0.5",
        "(24)          ; 24    ; 0.5",
        "-3            ; -3    ; 0.5",
        "(uint16_t)24  ; 24    ; 0.5",
        "24 * 10       ; 240   ; 0.5",
        "7 / 2         ; 3     ; 0.5",
        "-7 / 2        ; -3    ; 0.5",
        "7 % 4         ; 3     ; 0.5",
        "1 << 4 | 1    ; 17    ; 0.5",
        "2 + 3 * 4     ; 14    ; 0.5",
        "10 - 2 - 3    ; 5     ; 0.5",
        "0xFF & ~0x0F  ; 240   ; 0.5",
        "(int)2.9      ; 2     ; 0.5",
        "static_cast<int>(2.9f) ; 2 ; 0.5",
        "2.5           ; 2.5   ; 0.05",
        "2.50f         ; 2.5   ; 0.005",
        "2.            ; 2     ; 0.5",
        ".5            ; 0.5   ; 0.05",
        "1e3           ; 1000  ; 500",
        "1.5e-3        ; 0.0015; 0.00005",
        "2.0 * 3       ; 6     ; 0.15",
        "3.0 / 4       ; 0.75  ; 0.0125",
      })
  void evaluates_what_a_compiler_would(String expression, double value, double halfDigit) {
    Constant x = one("#define X " + expression + "\n");
    assertThat(x.why()).isEmpty();
    assertThat(x.value().orElseThrow())
        .isCloseTo(value, within(1e-12 * Math.max(1, Math.abs(value))));
    assertThat(x.halfDigit()).isCloseTo(halfDigit, within(1e-9));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "#define X 24",
        "  #  define   X   24   /* cycles */\n",
        "#define X \\\n  24\n",
        "static const uint16_t X = 24;",
        "constexpr int X{24};",
        "inline constexpr auto X = 24; // note",
        "const int A = 1, X = 24;",
        "enum { A = 1, X = 24, B };",
        "enum class Cycles : uint8_t {\n  X = 24,\n};",
        "// #define X 3\n#define X 24",
        "const char* s = \"X = 3\"; const int X = 24;",
        "/* X = 3 */ static constexpr unsigned X = 24u;",
        "#define A 12\n#define X (A * 2)\n",
        "enum { HALF = 12 };\nconst int X = HALF + HALF;"
      })
  void finds_every_way_to_define_a_constant(String source) {
    assertThat(one(source).value()).hasValue(24);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "int y = X;",
        "if (X == 24) {}",
        "#define X(a) 24",
        "#define XY 24",
        "#define Y X",
        "int X = 24;",
        "f(X = 24);",
        "const int y = X{24};",
        "const auto y = a + X;",
        "#undef X",
        "enum { A };",
        "// #define X 24",
        "X"
      })
  void takes_no_use_for_a_definition(String source) {
    assertThat(find(source)).isEmpty();
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "#define X", "#define X read()", "#define X Y", "#define X X", "#define X A\n#define A X",
        "#define X 1/0", "#define X 24 ms", "#define X 12abc", "#define X (24",
            "#define X 1 ? 2 : 3",
        "#define X 0xFFFFFFFFFFFFFFFF", "#define X 1 << 99", "#define X --3", "#define X 08"
      })
  void says_why_an_expression_has_no_value(String source) {
    Constant x = find(source).get(0);
    assertThat(x.value()).isEmpty();
    assertThat(x.why()).isNotBlank();
  }

  @Test
  void finds_the_definitions_of_all_branches_with_their_places() {
    String source = "#if FAST\n#define X 12\r\n#else\r\n#define X 24\n#endif\n";
    SourceText text = SourceText.of("a.h", source);
    assertThat(Constants.find(text, "X"))
        .extracting(x -> text.slice(x.place().span()))
        .containsExactly("12", "24");
  }

  @Test
  void deep_nesting_is_told_and_costs_nothing() {
    assertThat(one("#define X " + "(".repeat(100_000) + "1").why()).contains("deep");
    assertThat(one("#define X " + "- ".repeat(100_000) + "1").why()).contains("deep");
  }
}
