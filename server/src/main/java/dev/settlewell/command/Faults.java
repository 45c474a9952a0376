package dev.settlewell.command;

/** How a fault of this program is told: enough to report it, no page of internals. */
final class Faults {
  private Faults() {}

  static String sentence(Throwable fault) {
    StackTraceElement[] trace = fault.getStackTrace();
    String where =
        trace.length == 0 ? "" : " at " + trace[0].getFileName() + ":" + trace[0].getLineNumber();
    String what = fault.getMessage() == null ? "" : " (" + fault.getMessage() + ")";
    return "a fault of settlewell itself, please report it: "
        + fault.getClass().getSimpleName()
        + what
        + where;
  }
}
