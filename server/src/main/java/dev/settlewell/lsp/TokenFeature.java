package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.assist.Tokens;
import dev.settlewell.text.Span;
import java.util.ArrayList;
import java.util.List;
import org.eclipse.lsp4j.Position;
import org.eclipse.lsp4j.Range;
import org.eclipse.lsp4j.SemanticTokens;
import org.eclipse.lsp4j.SemanticTokensLegend;
import org.eclipse.lsp4j.SemanticTokensParams;
import org.eclipse.lsp4j.SemanticTokensRangeParams;
import org.eclipse.lsp4j.SemanticTokensWithRegistrationOptions;
import org.eclipse.lsp4j.ServerCapabilities;

/** {@code textDocument/semanticTokens}, of a whole sheet or a range. */
final class TokenFeature implements Feature {
  /** In the order of {@link Tokens.Sort}. */
  private static final List<String> TYPES =
      List.of(
          "property",
          "type",
          "variable",
          "number",
          "operator",
          "keyword",
          "enumMember",
          "string",
          "comment");

  private static final List<String> MODIFIERS = List.of("declaration");

  @Override
  public void register(Methods methods) {
    methods.request(
        "textDocument/semanticTokens/full",
        SemanticTokensParams.class,
        (params, view, cancel) -> answer(params.getTextDocument().getUri(), null, view));
    methods.request(
        "textDocument/semanticTokens/range",
        SemanticTokensRangeParams.class,
        (params, view, cancel) ->
            answer(params.getTextDocument().getUri(), params.getRange(), view));
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    server.setSemanticTokensProvider(
        new SemanticTokensWithRegistrationOptions(
            new SemanticTokensLegend(TYPES, MODIFIERS), true, true));
  }

  private static SemanticTokens answer(String uri, Range range, View view) {
    return view.checked(uri)
        .map(sheet -> new SemanticTokens(encoded(sheet, range, view)))
        .orElse(null);
  }

  /** Five numbers a token, lines and columns counted from the token before. */
  private static List<Integer> encoded(Checked sheet, Range range, View view) {
    Span wanted =
        range == null
            ? new Span(0, sheet.text().length())
            : view.ranges().span(sheet.text(), range);
    List<Integer> data = new ArrayList<>();
    Position last = new Position(0, 0);
    for (Tokens.Token token : Tokens.of(sheet, view.vocabulary())) {
      if (!token.span().overlaps(wanted)) {
        continue;
      }
      Position start = view.ranges().position(sheet.text(), token.span().start());
      Position end = view.ranges().position(sheet.text(), token.span().end());
      int lines = start.getLine() - last.getLine();
      data.add(lines);
      data.add(lines == 0 ? start.getCharacter() - last.getCharacter() : start.getCharacter());
      data.add(end.getCharacter() - start.getCharacter());
      data.add(token.sort().ordinal());
      data.add(token.declaration() ? 1 : 0);
      last = start;
    }
    return data;
  }
}
