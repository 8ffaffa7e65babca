package railwalk.netlist;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.antlr.v4.runtime.BailErrorStrategy;
import org.antlr.v4.runtime.CharStreams;
import org.antlr.v4.runtime.CommonTokenStream;
import org.antlr.v4.runtime.RecognitionException;
import org.antlr.v4.runtime.Token;
import org.antlr.v4.runtime.misc.ParseCancellationException;
import org.jspecify.annotations.Nullable;
import railwalk.source.Diagnostic;
import railwalk.source.NearNames;
import railwalk.source.SourceSpan;
import railwalk.units.Measure;
import railwalk.units.ValueReader;
import railwalk.units.ValueReading;

/** Works out an expression with the parameters of a {@link Scope}. */
final class Expressions {
  private static final int LONGEST = 1000;
  private static final int DEEPEST = 40;

  /** Names of the functions, for suggestions. */
  private static final List<String> FUNCTIONS =
      List.of("sqrt", "exp", "log", "ln", "log10", "abs", "min", "max", "int", "pow", "sgn");

  private Expressions() {}

  /** Returns the value of {@code word}; NaN when it has none, which is then reported. */
  static double evaluate(Word word, Scope scope, Report report) {
    if (word.text().length() > LONGEST || depth(word.text()) > DEEPEST) {
      report.add(Problem.EXPRESSION_TOO_LONG, word.span());
      return Double.NaN;
    }
    ExpressionLexer lexer = new ExpressionLexer(CharStreams.fromString(word.text()));
    lexer.removeErrorListeners();
    ExpressionParser parser = new ExpressionParser(new CommonTokenStream(lexer));
    parser.removeErrorListeners();
    parser.setErrorHandler(new BailErrorStrategy());
    try {
      double value = new Evaluator(word, scope).visit(parser.whole().expression());
      if (!Double.isFinite(value)) {
        report.add(Problem.EXPRESSION_NOT_FINITE, word.span(), word.text());
        return Double.NaN;
      }
      return value;
    } catch (ParseCancellationException e) {
      Token offending =
          e.getCause() instanceof RecognitionException recognition
              ? recognition.getOffendingToken()
              : parser.getCurrentToken();
      report.add(syntax(word, offending));
    } catch (Unreadable e) {
      if (e.diagnostic != null) {
        report.add(e.diagnostic);
      }
    }
    return Double.NaN;
  }

  private static int depth(String text) {
    int depth = 0;
    int deepest = 0;
    int signs = 0;
    for (int i = 0; i < text.length(); i++) {
      char sign = text.charAt(i);
      depth += sign == '(' ? 1 : sign == ')' ? -1 : 0;
      signs = sign == '-' || sign == '+' || sign == '^' || sign == '*' ? signs + 1 : 0;
      deepest = Math.max(deepest, Math.max(depth, signs));
    }
    return deepest;
  }

  private static Diagnostic syntax(Word word, Token token) {
    if (token.getType() == Token.EOF) {
      return Problem.EXPRESSION_BREAKS_OFF.at(word.span(), word.text());
    }
    return Problem.EXPRESSION_SYNTAX.at(place(word, token), token.getText());
  }

  private static SourceSpan place(Word word, Token token) {
    SourceSpan span = word.span();
    int column = span.column() + 1 + token.getStartIndex();
    return new SourceSpan(span.text(), span.line(), column, token.getText().length());
  }

  /** Carries what is wrong out of the visitor; nothing when it has been reported. */
  private static final class Unreadable extends RuntimeException {
    private static final long serialVersionUID = 1;
    private final transient @Nullable Diagnostic diagnostic;

    Unreadable(@Nullable Diagnostic diagnostic) {
      super(null, null, false, false);
      this.diagnostic = diagnostic;
    }
  }

  private static final class Evaluator extends ExpressionBaseVisitor<Double> {
    private final Word word;
    private final Scope scope;

    Evaluator(Word word, Scope scope) {
      this.word = word;
      this.scope = scope;
    }

    @Override
    public Double visitNumber(ExpressionParser.NumberContext context) {
      Token token = context.NUMBER().getSymbol();
      ValueReading reading = ValueReader.read(token.getText(), Measure.NUMBER);
      if (reading instanceof ValueReading.Value value) {
        return value.amount();
      }
      String example = ((ValueReading.Refused) reading).hint();
      throw new Unreadable(
          Problem.EXPRESSION_NUMBER.at(
              place(word, token),
              token.getText(),
              example.isEmpty() ? "" : "did you mean " + example + "?"));
    }

    @Override
    public Double visitParameter(ExpressionParser.ParameterContext context) {
      Token token = context.NAME().getSymbol();
      String name = token.getText();
      if (!scope.knows(name)) {
        throw new Unreadable(
            Problem.PARAMETER_UNKNOWN.at(
                place(word, token), name, NearNames.hint(name, scope.names())));
      }
      double value = scope.value(name, new Word(name, place(word, token), Word.Form.PLAIN));
      if (Double.isNaN(value)) {
        throw new Unreadable(null);
      }
      return value;
    }

    @Override
    public Double visitParentheses(ExpressionParser.ParenthesesContext context) {
      return visit(context.expression());
    }

    @Override
    public Double visitPower(ExpressionParser.PowerContext context) {
      return Math.pow(visit(context.expression(0)), visit(context.expression(1)));
    }

    @Override
    public Double visitSigned(ExpressionParser.SignedContext context) {
      double value = visit(context.expression());
      return context.sign.getType() == ExpressionParser.MINUS ? -value : value;
    }

    @Override
    public Double visitProduct(ExpressionParser.ProductContext context) {
      double left = visit(context.expression(0));
      double right = visit(context.expression(1));
      return context.operator.getType() == ExpressionParser.TIMES ? left * right : left / right;
    }

    @Override
    public Double visitSum(ExpressionParser.SumContext context) {
      double left = visit(context.expression(0));
      double right = visit(context.expression(1));
      return context.operator.getType() == ExpressionParser.PLUS ? left + right : left - right;
    }

    @Override
    public Double visitFunction(ExpressionParser.FunctionContext context) {
      Token name = context.NAME().getSymbol();
      double[] arguments =
          context.expression().stream().mapToDouble(expression -> visit(expression)).toArray();
      String function = name.getText().toLowerCase(Locale.ROOT);
      if (!FUNCTIONS.contains(function)) {
        throw new Unreadable(
            Problem.FUNCTION_UNKNOWN.at(place(word, name), name.getText(), hint(function)));
      }
      int wanted = function.equals("pow") ? 2 : 1;
      boolean list = function.equals("min") || function.equals("max");
      if (!list && arguments.length != wanted) {
        throw new Unreadable(
            Problem.FUNCTION_ARGUMENTS.at(place(word, name), function, wanted, arguments.length));
      }
      return apply(function, arguments);
    }

    private static String hint(String function) {
      String near = NearNames.hint(function, FUNCTIONS);
      return near.isEmpty() ? "there are " + String.join(", ", FUNCTIONS) : near;
    }

    private static double apply(String function, double[] arguments) {
      double first = arguments[0];
      return switch (function) {
        case "sqrt" -> Math.sqrt(first);
        case "exp" -> Math.exp(first);
        case "log", "ln" -> Math.log(first);
        case "log10" -> Math.log10(first);
        case "abs" -> Math.abs(first);
        case "int" -> first < 0 ? Math.ceil(first) : Math.floor(first);
        case "sgn" -> Math.signum(first);
        case "pow" -> Math.pow(first, arguments[1]);
        case "min" -> Arrays.stream(arguments).min().orElse(first);
        default -> Arrays.stream(arguments).max().orElse(first);
      };
    }
  }
}
