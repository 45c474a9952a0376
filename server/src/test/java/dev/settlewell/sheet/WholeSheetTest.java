package dev.settlewell.sheet;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class WholeSheetTest {
  private final Sheet press = Bound.sheet(Bound.resource("press.channels.yaml"));

  @Test
  void a_sheet_that_uses_every_key_has_no_problem() {
    assertThat(Bound.problems(press)).isEmpty();
  }
}
