package dev.settlewell.finding;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.finding.catalog.Catalog;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;

/**
 * Sheets of the pages with a line lost or a value a thousand times off: whatever they say, no check
 * fails, no message holds a figure that is none, and every finding stands inside the text.
 */
class MutatedSheetsTest {
  private static final int MUTANTS = Integer.getInteger("settlewell.mutants", 150);
  private static final Pattern NUMBER =
      Pattern.compile("(?<=[ {\\[-])[0-9]+(\\.[0-9]+)?(?=[ ,%}\\]])");
  private static final List<String> FACTORS = List.of("0", "0.001", "1000", "7", "-1", "1e9");

  @Test
  void noSheetMakesACheckFail() {
    List<String> sheets = new ArrayList<>();
    for (Check check : Catalog.CHECKS) {
      Pages.Page page = Pages.of(check.name()).orElseThrow();
      page.sheet("A sheet that has it").ifPresent(sheets::add);
    }
    for (long seed = 1; seed <= MUTANTS; seed++) {
      Random random = new Random(seed);
      String sheet = mutated(sheets.get(random.nextInt(sheets.size())), random);
      Judged judged = Judged.sheet(sheet);
      for (Finding finding : judged.findings()) {
        String told =
            finding.message() + finding.facts() + finding.related() + finding.candidates();
        assertThat(finding.name())
            .as("seed %d%n%s%n%s", seed, sheet, told)
            .isNotEqualTo(Findings.INTERNAL_FAULT);
        assertThat(told)
            .as("seed %d%n%s", seed, sheet)
            .doesNotContain("NaN")
            .doesNotContain("Infinity")
            .doesNotContain("undefined");
        assertThat(finding.place().end()).as("seed %d", seed).isLessThanOrEqualTo(sheet.length());
      }
    }
  }

  private static String mutated(String sheet, Random random) {
    return random.nextInt(3) == 0 ? withoutALine(sheet, random) : withAnotherNumber(sheet, random);
  }

  private static String withoutALine(String sheet, Random random) {
    List<String> lines = new ArrayList<>(sheet.lines().toList());
    lines.remove(random.nextInt(lines.size()));
    return String.join("\n", lines) + "\n";
  }

  private static String withAnotherNumber(String sheet, Random random) {
    List<int[]> numbers = new ArrayList<>();
    Matcher matcher = NUMBER.matcher(sheet);
    while (matcher.find()) {
      numbers.add(new int[] {matcher.start(), matcher.end()});
    }
    int[] at = numbers.get(random.nextInt(numbers.size()));
    String factor = FACTORS.get(random.nextInt(FACTORS.size()));
    double value = Double.parseDouble(sheet.substring(at[0], at[1])) * Double.parseDouble(factor);
    String written = new java.math.BigDecimal(value).stripTrailingZeros().toPlainString();
    return sheet.substring(0, at[0]) + written + sheet.substring(at[1]);
  }
}
