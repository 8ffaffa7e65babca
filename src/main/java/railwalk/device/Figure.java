package railwalk.device;

import java.math.BigDecimal;

/** Numbers of data files: a decimal number, an SI prefix, unit letters: 1.2mA, 62.5k, 20uF. */
final class Figure {
  private Figure() {}

  /** Returns the number in SI units, or NaN when {@code text} is none. */
  static double parse(String text) {
    int end = 0;
    while (end < text.length() && isNumberPart(text, end)) {
      end++;
    }
    if (end == 0) {
      return Double.NaN;
    }
    try {
      BigDecimal number = new BigDecimal(text.substring(0, end));
      return number
          .scaleByPowerOfTen(end == text.length() ? 0 : power(text.charAt(end)))
          .doubleValue();
    } catch (NumberFormatException e) {
      return Double.NaN;
    }
  }

  private static boolean isNumberPart(String text, int at) {
    char c = text.charAt(at);
    if (Character.isDigit(c) || c == '.' || c == '-' || c == '+') {
      return true;
    }
    return (c == 'e' || c == 'E')
        && at + 1 < text.length()
        && !Character.isLetter(text.charAt(at + 1));
  }

  private static int power(char prefix) {
    return switch (prefix) {
      case 'p' -> -12;
      case 'n' -> -9;
      case 'u' -> -6;
      case 'm' -> -3;
      case 'k' -> 3;
      case 'M' -> 6;
      default -> 0;
    };
  }
}
