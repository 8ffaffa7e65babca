package railwalk.netlist;

import org.antlr.v4.runtime.BaseErrorListener;
import org.antlr.v4.runtime.DefaultErrorStrategy;
import org.antlr.v4.runtime.InputMismatchException;
import org.antlr.v4.runtime.Parser;
import org.antlr.v4.runtime.RecognitionException;
import org.antlr.v4.runtime.Recognizer;
import org.antlr.v4.runtime.Token;
import org.antlr.v4.runtime.misc.IntervalSet;
import org.jspecify.annotations.Nullable;
import railwalk.source.Diagnostic;
import railwalk.source.SourceSpan;
import railwalk.source.SourceText;

/**
 * What the parser says about a line that has not the shape of one, in plain words; the first remark
 * of a line counts.
 */
final class LineErrors extends BaseErrorListener {
  private final SourceText text;
  private @Nullable Diagnostic first;

  LineErrors(SourceText text) {
    this.text = text;
  }

  /** Returns the remark since the last call, and forgets it. */
  @Nullable Diagnostic take() {
    Diagnostic taken = first;
    first = null;
    return taken;
  }

  @Override
  public void syntaxError(
      Recognizer<?, ?> recognizer,
      Object offending,
      int line,
      int column,
      String message,
      @Nullable RecognitionException exception) {
    if (first == null && recognizer instanceof Parser parser && offending instanceof Token token) {
      first = describe(parser, token);
    }
  }

  private Diagnostic describe(Parser parser, Token token) {
    Token before = parser.getTokenStream().LT(-1);
    if (before != null && before.getType() == NetlistParser.EQUALS) {
      return Problem.NOTHING_AFTER_EQUALS.at(span(before));
    }
    switch (token.getType()) {
      case NetlistParser.NEWLINE, Token.EOF -> {
        Token open = openParenthesis(parser);
        if (open != null) {
          return Problem.UNCLOSED_PARENTHESIS.at(span(open));
        }
        return Problem.STRAY_SIGN.at(span(before == null ? token : before), ",");
      }
      case NetlistParser.JUNK -> {
        return junk(token);
      }
      case NetlistParser.EQUALS -> {
        return Problem.NOTHING_BEFORE_EQUALS.at(span(token));
      }
      default -> {
        return Problem.STRAY_SIGN.at(span(token), token.getText());
      }
    }
  }

  private Diagnostic junk(Token token) {
    String sign = token.getText();
    return switch (sign) {
      case "{" -> Problem.UNCLOSED_BRACE.at(span(token));
      case "'" -> Problem.UNCLOSED_QUOTE.at(span(token));
      case "}" -> Problem.STRAY_SIGN.at(span(token), sign);
      default ->
          Problem.UNPRINTABLE_SIGN.at(
              span(token), String.format("U+%04X", sign.isEmpty() ? 0 : sign.codePointAt(0)));
    };
  }

  private static @Nullable Token openParenthesis(Parser parser) {
    if (parser.getContext() instanceof NetlistParser.CallContext call) {
      return call.LPAREN().getSymbol();
    }
    if (parser.getContext() instanceof NetlistParser.GroupContext group) {
      return group.LPAREN().getSymbol();
    }
    return null;
  }

  private SourceSpan span(Token token) {
    return LineParser.span(text, token);
  }

  /** Gives up a line at its first error and goes on with the next. */
  static final class GiveUpLine extends DefaultErrorStrategy {
    @Override
    public void recover(Parser recognizer, RecognitionException e) {
      consumeUntil(recognizer, IntervalSet.of(NetlistParser.NEWLINE));
    }

    @Override
    public Token recoverInline(Parser recognizer) {
      throw new InputMismatchException(recognizer);
    }

    @Override
    public void sync(Parser recognizer) {
      // a line is short: the next match finds out by itself
    }
  }
}
