package dev.settlewell.finding;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * One cause, one finding: what a graver finding of the same subject already says is left out. The
 * relation is the catalogue's, followed through: what {@code never-settles} covers covers on.
 */
final class Covers {
  private final Map<String, Set<String>> covered = new HashMap<>();

  Covers(List<Check> checks) {
    Map<String, List<String>> direct = new HashMap<>();
    checks.forEach(check -> direct.put(check.name(), check.covers()));
    checks.forEach(check -> covered.put(check.name(), closure(check.name(), direct)));
  }

  private static Set<String> closure(String name, Map<String, List<String>> direct) {
    Set<String> reached = new HashSet<>();
    Deque<String> open = new ArrayDeque<>(direct.getOrDefault(name, List.of()));
    while (!open.isEmpty()) {
      String next = open.pop();
      if (reached.add(next)) {
        open.addAll(direct.getOrDefault(next, List.of()));
      }
    }
    return reached;
  }

  List<Finding> uncovered(List<Finding> raised) {
    return raised.stream().filter(f -> raised.stream().noneMatch(by -> covers(by, f))).toList();
  }

  private boolean covers(Finding by, Finding finding) {
    boolean sameAbout =
        by.about().isEmpty() || finding.about().isEmpty() || by.about().equals(finding.about());
    return sameAbout
        && by.subject().equals(finding.subject())
        && covered.getOrDefault(by.name(), Set.of()).contains(finding.name());
  }
}
