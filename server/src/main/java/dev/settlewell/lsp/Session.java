package dev.settlewell.lsp;

import java.util.List;
import java.util.function.UnaryOperator;

/**
 * One client from its first message to its last. The only thing that changes is which {@link View}
 * is the present one: mostly the thread that reads messages changes it, and the worker where it has
 * found files.
 */
final class Session {
  private final Client client;
  private final Faults faults;
  private final Worker worker;
  private volatile View view;

  Session(Client client, Desk desk) {
    this.client = client;
    this.faults = new Faults(client);
    this.worker = new Worker(fault -> faults.report("background work", fault));
    this.view =
        new View(
            Abilities.of(null, null), Settings.DEFAULT, Drafts.NONE, List.of(), List.of(), desk);
  }

  View view() {
    return view;
  }

  synchronized void change(UnaryOperator<View> step) {
    view = step.apply(view);
  }

  Client client() {
    return client;
  }

  Faults faults() {
    return faults;
  }

  Worker worker() {
    return worker;
  }
}
