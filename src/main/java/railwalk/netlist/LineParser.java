package railwalk.netlist;

import java.util.ArrayList;
import java.util.List;
import org.antlr.v4.runtime.CharStreams;
import org.antlr.v4.runtime.CommonTokenStream;
import org.antlr.v4.runtime.ParserRuleContext;
import org.antlr.v4.runtime.Token;
import org.antlr.v4.runtime.tree.ParseTree;
import org.jspecify.annotations.Nullable;
import railwalk.source.Diagnostic;
import railwalk.source.SourceSpan;
import railwalk.source.SourceText;

/** The one place that crosses from the grammar's tree to {@link Card}s. */
final class LineParser {
  private final SourceText text;

  private LineParser(SourceText text) {
    this.text = text;
  }

  /** Returns the lines of {@code text} from line {@code first} to before line {@code end}. */
  static List<Card> parse(SourceText text, int first, int end) {
    return new LineParser(text).cards(first, end);
  }

  /** Returns where {@code token} stands. */
  static SourceSpan span(SourceText text, Token token) {
    int length = token.getStopIndex() - token.getStartIndex() + 1;
    return new SourceSpan(text, token.getLine(), token.getCharPositionInLine() + 1, length);
  }

  private List<Card> cards(int first, int end) {
    String body = "\n" + String.join("\n", text.lines().subList(first - 1, end - 1)) + "\n";
    NetlistLexer lexer = new NetlistLexer(CharStreams.fromString(body));
    lexer.removeErrorListeners();
    lexer.setLine(first - 1);
    CommonTokenStream tokens = new CommonTokenStream(lexer);
    NetlistParser parser = new NetlistParser(tokens);
    LineErrors errors = new LineErrors(text);
    parser.removeErrorListeners();
    parser.addErrorListener(errors);
    parser.setErrorHandler(new LineErrors.GiveUpLine());
    List<Card> cards = new ArrayList<>();
    Diagnostic orphan = orphan(tokens.LT(1), tokens.get(0));
    while (parser.getCurrentToken().getType() != Token.EOF) {
      NetlistParser.LineContext line = parser.line();
      Diagnostic flaw = errors.take();
      Card card = card(line, orphan == null ? flaw : orphan);
      if (card != null) {
        cards.add(card);
        orphan = null;
      }
    }
    return cards;
  }

  /** Returns what is wrong when the very first line goes on with a line that is not there. */
  private @Nullable Diagnostic orphan(Token visible, Token first) {
    if (visible == first) {
      return null;
    }
    int line = first.getLine() + (int) first.getText().chars().filter(c -> c == '\n').count();
    return Problem.NOTHING_TO_CONTINUE.at(
        new SourceSpan(text, line, text.line(line).indexOf('+') + 1, 1));
  }

  private @Nullable Card card(NetlistParser.LineContext line, @Nullable Diagnostic flaw) {
    List<Field> fields = new ArrayList<>();
    boolean comma = false;
    for (ParseTree child : line.children == null ? List.<ParseTree>of() : line.children) {
      if (child instanceof NetlistParser.FieldContext field && field.exception == null) {
        fields.add(field(field, comma));
      }
      comma = child.getText().equals(",");
    }
    if (fields.isEmpty()) {
      return flaw == null ? null : new Card(nowhere(flaw), List.of(), flaw);
    }
    Field head = fields.get(0);
    if (head instanceof Field.Bare bare && !bare.word().isExpression()) {
      return new Card(bare.word(), fields.subList(1, fields.size()), flaw);
    }
    Diagnostic start = Problem.LINE_START.at(head.first().span(), head.first().text());
    return new Card(head.first(), List.of(), flaw == null ? start : flaw);
  }

  private static Word nowhere(Diagnostic flaw) {
    SourceSpan span = flaw.span();
    if (span == null) {
      throw new IllegalStateException("a line's flaw has a place");
    }
    return new Word("", span, Word.Form.PLAIN);
  }

  private Field field(NetlistParser.FieldContext field, boolean afterComma) {
    if (field instanceof NetlistParser.OptionContext option) {
      List<Word> values = option.value().stream().map(this::value).toList();
      return new Field.Option(word(option.WORD().getSymbol()), values);
    }
    if (field instanceof NetlistParser.CallContext call) {
      return new Field.Call(word(call.WORD().getSymbol()), arguments(call.argument()));
    }
    if (field instanceof NetlistParser.GroupContext group) {
      Word nameless = new Word("", span(text, group.getStart()), Word.Form.PLAIN);
      return new Field.Call(nameless, arguments(group.argument()));
    }
    return new Field.Bare(value(((NetlistParser.BareContext) field).value()), afterComma);
  }

  private List<Field> arguments(List<NetlistParser.ArgumentContext> contexts) {
    List<Field> arguments = new ArrayList<>();
    for (NetlistParser.ArgumentContext argument : contexts) {
      if (argument.value() == null) {
        continue;
      }
      Word value = value(argument.value());
      arguments.add(
          argument.WORD() == null
              ? new Field.Bare(value, false)
              : new Field.Option(word(argument.WORD().getSymbol()), List.of(value)));
    }
    return arguments;
  }

  private Word value(ParserRuleContext value) {
    return word(value.getStart());
  }

  private Word word(Token token) {
    String written = token.getText();
    return switch (token.getType()) {
      case NetlistLexer.EXPRESSION ->
          new Word(inside(written), span(text, token), Word.Form.EXPRESSION);
      case NetlistLexer.STRING -> new Word(inside(written), span(text, token), Word.Form.QUOTED);
      default -> new Word(written, span(text, token), Word.Form.PLAIN);
    };
  }

  private static String inside(String written) {
    return written.substring(1, written.length() - 1);
  }
}
