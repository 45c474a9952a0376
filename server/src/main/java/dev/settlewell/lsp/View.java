package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.finding.Finding;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/**
 * One state of everything a request may read. It never changes, so an answer fits together.
 *
 * @param folders names of the workspace's folders
 * @param found sheets on disk below them
 */
record View(
    Abilities abilities,
    Settings settings,
    Drafts drafts,
    List<String> folders,
    List<String> found,
    Desk desk) {

  /** Empty where the client does not know the document, or both no longer agree on its text. */
  Optional<Checked> checked(String uri) {
    return named(Uris.name(uri));
  }

  Optional<Checked> named(String name) {
    boolean lost = drafts.get(name).map(draft -> draft.text().isEmpty()).orElse(false);
    return lost || !isSheet(name) ? Optional.empty() : desk.check(name, open());
  }

  /** Open sheets first, then those on disk where they are wanted. */
  Set<String> sheets() {
    Set<String> names = new LinkedHashSet<>();
    drafts.all().stream().map(Draft::name).filter(View::isSheet).forEach(names::add);
    if (settings.unopenedSheets()) {
      names.addAll(found);
    }
    return names;
  }

  Stream<Checked> all() {
    return sheets().stream().map(this::named).filter(Optional::isPresent).map(Optional::get);
  }

  List<Finding> trial(String name, String content) {
    return desk.trial(name, content, open());
  }

  Vocabulary vocabulary() {
    return desk.vocabulary();
  }

  Ranges ranges() {
    return new Ranges(abilities.encoding());
  }

  private Map<String, SourceText> open() {
    Map<String, SourceText> open = new LinkedHashMap<>();
    for (Draft draft : drafts.all()) {
      draft.text().ifPresent(text -> open.put(draft.name(), text));
    }
    return open;
  }

  /** The URI of a sheet: as its client spells it where it is open. */
  String uri(String name) {
    return drafts.get(name).map(Draft::uri).orElseGet(() -> Uris.uri(name));
  }

  /** Null where it is not open. */
  Integer version(String name) {
    return drafts.get(name).map(Draft::version).filter(Objects::nonNull).orElse(null);
  }

  /** Editors attach a server to whole languages; only channel sheets are ours, by their name. */
  static boolean isSheet(String name) {
    return name.endsWith(".channels.yaml") || name.endsWith(".channels.yml");
  }

  View with(Drafts other) {
    return new View(abilities, settings, other, folders, found, desk);
  }

  View with(Abilities other) {
    return new View(other, settings, drafts, folders, found, desk);
  }

  View with(Settings other) {
    return new View(abilities, other, drafts, folders, found, desk);
  }

  View withFolders(List<String> other) {
    return new View(abilities, settings, drafts, List.copyOf(other), found, desk);
  }

  View withFound(List<String> other) {
    return new View(abilities, settings, drafts, folders, List.copyOf(other), desk);
  }
}
